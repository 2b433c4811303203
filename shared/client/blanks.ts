import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { getBlankSuggestions, recordBlankReadings } from '../contracts/blanks';
import type { ResponseOf, SentBodyOf } from '../contracts/route';
import { api } from './api';
import { takeBack } from './desk';

export type BlankSheet = ResponseOf<typeof getBlankSuggestions>;

export interface SheetPlace {
  readonly item?: string | undefined;
  /** The last answer of the sheet before. */
  readonly cursor?: string | undefined;
  /** Counts the sheets, so that going back to a place asks anew. */
  readonly round: number;
}

/** A sheet is held for its reader, so it is asked for once and forgotten when it is left. */
const sheetQueryOptions = (sittingId: string, { item, cursor, round }: SheetPlace) =>
  queryOptions({
    queryKey: ['blank-sheet', sittingId, item ?? null, cursor ?? null, round],
    staleTime: Infinity,
    gcTime: 0,
    refetchOnWindowFocus: false,
    refetchOnReconnect: false,
    queryFn: ({ signal }) => {
      const asked = new URLSearchParams({ ...(item === undefined ? {} : { item }), ...(cursor === undefined ? {} : { cursor }) });
      return api<BlankSheet>(`/sittings/${sittingId}/blank-suggestions?${asked.toString()}`, { signal });
    },
  });

export const useBlankSheet = (sittingId: string, place: SheetPlace) => useQuery(sheetQueryOptions(sittingId, place));

type Sent = SentBodyOf<typeof recordBlankReadings>;

const send = (sittingId: string, body: Sent) => api<ResponseOf<typeof recordBlankReadings>>(`/sittings/${sittingId}/blank-readings`, { method: 'POST', body });

/** Gives a sheet back unread; where that does not get through, its leases run out by themselves. */
export const giveSheetBack = (sittingId: string, leaseIds: readonly string[]): void => {
  if (leaseIds.length > 0) void send(sittingId, { readings: [], giveBack: [...leaseIds], openedAt: Date.now() }).catch(() => undefined);
};

function useCountedAgain(sittingId: string): () => void {
  const client = useQueryClient();
  return () => {
    for (const key of [['waiting'], ['progress', sittingId], ['desk-standing', sittingId], ['desk-recent', sittingId]]) void client.invalidateQueries({ queryKey: key });
  };
}

export function useRecordBlanks(sittingId: string) {
  const countAgain = useCountedAgain(sittingId);
  return useMutation({ mutationFn: (body: Sent) => send(sittingId, body), onSuccess: countAgain });
}

/** Takes a whole lot back, one reading after the other; one that no longer counts is passed over. */
export function useTakeBackLot(sittingId: string) {
  const countAgain = useCountedAgain(sittingId);
  return useMutation({
    mutationFn: async (readingIds: readonly string[]) => {
      let taken = 0;
      let problem: unknown = null;
      for (const id of readingIds) {
        await takeBack(id).then(
          () => (taken += 1),
          (error: unknown) => (problem = error),
        );
      }
      if (taken === 0 && problem instanceof Error) throw problem;
      return taken;
    },
    onSettled: countAgain,
  });
}
