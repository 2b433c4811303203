import { queryOptions, useMutation, useQuery, useQueryClient, type QueryClient } from '@tanstack/react-query';
import { useCallback, useSyncExternalStore } from 'react';
import type { ResponseOf } from '../contracts/route';
import type { beginUpload, getBatch, listBatches, listLoosePages, makeBatch, placePage } from '../contracts/scans';
import { api } from './api';
import { FileSender, type SendingEnds, type SendingFile } from './file-sender';
import { isTold, useEventsOf } from './sitting-events';
import { progressQueryOptions } from './sittings';

type Upload = ResponseOf<typeof beginUpload>;
type Batch = ResponseOf<typeof getBatch>;
type PageImage = ResponseOf<typeof placePage>;

const lookAgainMs = 1500;

export const batchesQueryOptions = (sittingId: string) =>
  queryOptions({
    queryKey: ['batches', sittingId],
    queryFn: ({ signal }) => api<ResponseOf<typeof listBatches>>(`/sittings/${sittingId}/batches`, { signal }),
    // Looked at again while something is on its way, unless the server tells of it.
    refetchInterval: ({ state }) => (!isTold(sittingId) && state.data?.batches.some(({ files }) => files.received > 0 || files.sending > 0) ? lookAgainMs : false),
  });

export const batchQueryOptions = (batchId: string) =>
  queryOptions({
    queryKey: ['batch', batchId],
    queryFn: ({ signal }) => api<Batch>(`/batches/${batchId}`, { signal }),
    refetchInterval: ({ state: { data } }) => (data && !isTold(data.sittingId) && (data.files.received > 0 || data.files.sending > 0) ? lookAgainMs : false),
  });

export const looseQueryOptions = (sittingId: string) =>
  queryOptions({
    queryKey: ['loose-pages', sittingId],
    queryFn: ({ signal }) => api<ResponseOf<typeof listLoosePages>>(`/sittings/${sittingId}/loose-pages`, { signal }),
  });

export const useBatches = (sittingId: string) => useQuery(batchesQueryOptions(sittingId));
export const useBatch = (batchId: string | null) => useQuery({ ...batchQueryOptions(batchId ?? ''), enabled: batchId !== null });
export const useLoosePages = (sittingId: string) => useQuery(looseQueryOptions(sittingId));

/** Everything that shows where pages are. */
export function lookAtPagesAgain(client: QueryClient, sittingId: string): void {
  void client.invalidateQueries({ queryKey: batchesQueryOptions(sittingId).queryKey });
  void client.invalidateQueries({ queryKey: ['batch'] });
  void client.invalidateQueries({ queryKey: looseQueryOptions(sittingId).queryKey });
  void client.invalidateQueries({ queryKey: progressQueryOptions(sittingId).queryKey });
}

/** Looks again whenever the server tells that something changed; where it cannot tell, the queries ask by themselves. */
export function usePagesTold(sittingId: string): void {
  const client = useQueryClient();
  const look = useCallback(() => lookAtPagesAgain(client, sittingId), [client, sittingId]);
  useEventsOf(sittingId, look);
}

async function begin(batchId: string, file: { readonly name: string; readonly size: number }): Promise<Upload> {
  const { uploads } = await api<Batch>(`/batches/${batchId}`);
  const broken = uploads.find(({ state, fileName, size }) => state === 'sending' && fileName === file.name && size === file.size);
  return broken ?? api<Upload>(`/batches/${batchId}/uploads`, { method: 'POST', body: { fileName: file.name, size: file.size } });
}

const ends: SendingEnds = {
  begin,
  part: (uploadId, part, bytes) => {
    const form = new FormData();
    form.append('file', bytes, 'part');
    return api<Upload>(`/uploads/${uploadId}/parts/${part}`, { method: 'PUT', form });
  },
  complete: (uploadId) => api<Upload>(`/uploads/${uploadId}/complete`, { method: 'POST' }),
  wait: (ms) =>
    new Promise((resolve) => {
      const timer = setTimeout(resolve, ms);
      window.addEventListener(
        'online',
        () => {
          clearTimeout(timer);
          resolve();
        },
        { once: true },
      );
    }),
};

/** One sender for the whole app: files go on being sent while other screens are open. */
export const fileSender = new FileSender(ends);

export const useSendingFiles = (): readonly SendingFile[] => useSyncExternalStore(fileSender.subscribe, fileSender.snapshot, fileSender.snapshot);

export function useMakeBatch(sittingId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ bundle, once }: { bundle: string; once: string }) => api<ResponseOf<typeof makeBatch>>(`/sittings/${sittingId}/batches`, { method: 'POST', body: { bundle }, idempotencyKey: once }),
    onSuccess: () => client.invalidateQueries({ queryKey: batchesQueryOptions(sittingId).queryKey }),
  });
}

export function useCancelBatch(sittingId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (batchId: string) => api(`/batches/${batchId}`, { method: 'PATCH', body: { state: 'cancelled' } }),
    onSuccess: (_answer, batchId) => {
      fileSender.drop((file) => file.batchId === batchId);
      lookAtPagesAgain(client, sittingId);
    },
  });
}

/** Has the pages of a stuck file made again. */
export function useRetryUpload(sittingId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (uploadId: string) => api<Upload>(`/uploads/${uploadId}/retry`, { method: 'POST' }),
    onSettled: () => lookAtPagesAgain(client, sittingId),
  });
}

export type PageAct =
  | { readonly act: 'place'; readonly body: { readonly candidateId: string; readonly pageNo: number } }
  | { readonly act: 'turn'; readonly body: { readonly by: number } }
  | { readonly act: 'discard'; readonly body?: undefined }
  | { readonly act: 'loosen'; readonly body: { readonly reopen: boolean } };

export function useSortPage(sittingId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ pageId, rev, act, body }: { pageId: string; rev: number } & PageAct) => api<PageImage>(`/page-images/${pageId}/${act}`, { method: 'POST', rev, ...(body ? { body } : {}) }),
    onSettled: () => lookAtPagesAgain(client, sittingId),
  });
}
