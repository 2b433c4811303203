import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { getPaperFile, previewPaperQti, putPaperQti } from '../contracts/paper-file';
import type { ResponseOf } from '../contracts/route';
import { api, ApiError, apiTagged } from './api';
import { itemsQueryOptions } from './items';
import { progressQueryOptions, sittingQueryOptions } from './sittings';

const zip = 'application/zip';

/** The paper as it is when the question is put, and the tag that names it: what is taken later gives way to nothing else. */
export const usePaperNow = (sittingId: string) =>
  useQuery({ queryKey: ['paper-file', sittingId], staleTime: 0, gcTime: 0, refetchOnWindowFocus: false, refetchOnReconnect: false, queryFn: () => apiTagged<ResponseOf<typeof getPaperFile>>(`/sittings/${sittingId}/paper.json`) });

function useRefreshPaper(sittingId: string) {
  const client = useQueryClient();
  return () => {
    for (const queryKey of [itemsQueryOptions(sittingId).queryKey, ['paper-file', sittingId], ['layout', sittingId], progressQueryOptions(sittingId).queryKey, sittingQueryOptions(sittingId).queryKey]) void client.invalidateQueries({ queryKey });
  };
}

/** Replaces the paper by what a file holds. Throws before sending when the file is no JSON. */
export function useTakePaperFile(sittingId: string) {
  return useMutation({
    mutationFn: async ({ tag, file }: { tag: string; file: File }) => {
      let body: unknown;
      try {
        body = JSON.parse(await file.text());
      } catch {
        throw new ApiError('invalid_request', 'This file is not JSON. Choose one that was saved here.');
      }
      return api<unknown>(`/sittings/${sittingId}/paper.json`, { method: 'PUT', rev: tag, body });
    },
    onSettled: useRefreshPaper(sittingId),
  });
}

/** What a package would bring; stores nothing. */
export const useQtiPreview = (sittingId: string, file: File) =>
  useQuery({
    queryKey: ['qti-preview', sittingId, file.name, file.size, file.lastModified],
    staleTime: 0,
    gcTime: 0,
    retry: false,
    refetchOnWindowFocus: false,
    queryFn: ({ signal }) => api<ResponseOf<typeof previewPaperQti>>(`/sittings/${sittingId}/paper.qti.zip/preview`, { method: 'POST', file: { bytes: file, type: zip }, signal }),
  });

export function useTakePaperQti(sittingId: string) {
  return useMutation({
    mutationFn: ({ mark, rest, file }: { mark: string; rest: boolean; file: File }) =>
      api<ResponseOf<typeof putPaperQti>>(`/sittings/${sittingId}/paper.qti.zip?rest=${rest ? 'take' : 'none'}`, { method: 'PUT', rev: mark, file: { bytes: file, type: zip } }),
    onSettled: useRefreshPaper(sittingId),
  });
}
