import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { getBoxes, putSample, saveBoxes } from '../contracts/layouts';
import type { ResponseOf, SentBodyOf } from '../contracts/route';
import { api, apiUrl } from './api';
import { itemsQueryOptions } from './items';
import { progressQueryOptions } from './sittings';

type Layout = ResponseOf<typeof getBoxes>;

export const layoutQueryOptions = (sittingId: string) =>
  queryOptions({
    queryKey: ['layout', sittingId],
    queryFn: ({ signal }) => api<Layout>(`/sittings/${sittingId}/layouts/1/boxes`, { signal }),
  });

export const useLayout = (sittingId: string) => useQuery(layoutQueryOptions(sittingId));

/** The address of a page's picture; its hash in it, so that a new picture is a new address. */
export const sampleUrl = (sittingId: string, pageNo: number, sample: string): string => apiUrl(`/sittings/${sittingId}/layouts/1/pages/${pageNo}/sample?v=${sample.slice(0, 12)}`);

function useKeepLayout(sittingId: string) {
  const client = useQueryClient();
  return (layout: Layout) => {
    client.setQueryData(layoutQueryOptions(sittingId).queryKey, layout);
    void client.invalidateQueries({ queryKey: itemsQueryOptions(sittingId).queryKey });
    void client.invalidateQueries({ queryKey: progressQueryOptions(sittingId).queryKey });
  };
}

export function useSaveLayout(sittingId: string) {
  const keep = useKeepLayout(sittingId);
  return useMutation({
    mutationFn: ({ rev, body }: { rev: number; body: SentBodyOf<typeof saveBoxes> }) =>
      api<Layout>(`/sittings/${sittingId}/layouts/1/boxes`, { method: 'PUT', rev, body }),
    onSuccess: keep,
  });
}

export function useSendSample(sittingId: string) {
  const keep = useKeepLayout(sittingId);
  return useMutation({
    mutationFn: ({ pageNo, file }: { pageNo: number; file: Blob }) => {
      const form = new FormData();
      form.append('file', file);
      return api<ResponseOf<typeof putSample>>(`/sittings/${sittingId}/layouts/1/pages/${pageNo}/sample`, { method: 'POST', form });
    },
    onSuccess: keep,
  });
}
