import { keepPreviousData, queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { getSheetPreview, listPrintings, makePrinting } from '../contracts/printings';
import type { ResponseOf, SentBodyOf } from '../contracts/route';
import type { PaperSize } from '../sheets/geometry';
import { api, apiUrl } from './api';
import { progressQueryOptions } from './sittings';

type Printings = ResponseOf<typeof listPrintings>;

/** While sheets are being made their count is looked at again. */
const watchingMs = 800;

const isMaking = (printings: Printings | undefined): boolean => printings?.printings.some(({ state }) => state === 'making') ?? false;

export const printingsQueryOptions = (sittingId: string) =>
  queryOptions({
    queryKey: ['printings', sittingId],
    queryFn: ({ signal }) => api<Printings>(`/sittings/${sittingId}/printings`, { signal }),
    refetchInterval: ({ state }) => (isMaking(state.data) ? watchingMs : false),
  });

export const sheetPreviewQueryOptions = (sittingId: string, paperSize: PaperSize) =>
  queryOptions({
    queryKey: ['sheet-preview', sittingId, paperSize],
    queryFn: ({ signal }) => api<ResponseOf<typeof getSheetPreview>>(`/sittings/${sittingId}/sheet-preview?paperSize=${paperSize}`, { signal }),
    placeholderData: keepPreviousData,
  });

export const usePrintings = (sittingId: string) => useQuery(printingsQueryOptions(sittingId));
export const useSheetPreview = (sittingId: string, paperSize: PaperSize) => useQuery(sheetPreviewQueryOptions(sittingId, paperSize));

export const printingFileUrl = (printingId: string): string => apiUrl(`/printings/${printingId}/file`);

export function useMakePrinting(sittingId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ body, once }: { body: SentBodyOf<typeof makePrinting>; once: string }) => api<ResponseOf<typeof makePrinting>>(`/sittings/${sittingId}/printings`, { method: 'POST', body, idempotencyKey: once }),
    onSettled: () =>
      Promise.all([printingsQueryOptions(sittingId).queryKey, ['sheet-preview', sittingId], progressQueryOptions(sittingId).queryKey, ['candidates', sittingId]].map((queryKey) => client.invalidateQueries({ queryKey }))),
  });
}
