import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { changeAttendance, confirmClassList, getNames, listCandidates, previewClassList } from '../contracts/class-list';
import type { ResponseOf, SentBodyOf } from '../contracts/route';
import { api, ApiError } from './api';
import { progressQueryOptions } from './sittings';

type List = ResponseOf<typeof listCandidates>;
type Candidate = List['candidates'][number];

export const candidatesQueryOptions = (sittingId: string) =>
  queryOptions({
    queryKey: ['candidates', sittingId],
    queryFn: ({ signal }) => api<List>(`/sittings/${sittingId}/candidates`, { signal }),
  });

export const useCandidates = (sittingId: string) => useQuery(candidatesQueryOptions(sittingId));

/** Only for those who may see names; asked for by them alone. */
export const useNames = (sittingId: string, isWanted: boolean) =>
  useQuery({
    queryKey: ['names', sittingId],
    enabled: isWanted,
    queryFn: ({ signal }) => api<ResponseOf<typeof getNames>>(`/sittings/${sittingId}/names`, { signal }),
  });

export const usePreviewClassList = (sittingId: string) =>
  useMutation({
    mutationFn: (text: string) => api<ResponseOf<typeof previewClassList>>(`/sittings/${sittingId}/class-list/preview`, { method: 'POST', body: { text } }),
  });

export function useConfirmClassList(sittingId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: SentBodyOf<typeof confirmClassList>) =>
      api<ResponseOf<typeof confirmClassList>>(`/sittings/${sittingId}/class-list/confirm`, { method: 'POST', body }),
    onSuccess: () =>
      Promise.all([candidatesQueryOptions(sittingId).queryKey, ['names', sittingId], progressQueryOptions(sittingId).queryKey].map((queryKey) => client.invalidateQueries({ queryKey }))),
  });
}

/** Shows a change of attendance at once; what the server says stands. */
export function useChangeAttendance(sittingId: string) {
  const client = useQueryClient();
  const { queryKey } = candidatesQueryOptions(sittingId);
  const keep = (candidate: Candidate) =>
    client.setQueryData<List>(queryKey, (list) => list && { candidates: list.candidates.map((known) => (known.id === candidate.id ? candidate : known)) });
  return useMutation({
    mutationFn: ({ candidate, attendance }: { candidate: Candidate; attendance: Candidate['attendance'] }) =>
      api<ResponseOf<typeof changeAttendance>>(`/candidates/${candidate.id}`, { method: 'PATCH', rev: candidate.rev, body: { attendance } }),
    onMutate: ({ candidate, attendance }) => void keep({ ...candidate, attendance }),
    onSuccess: (candidate) => {
      keep(candidate);
      return client.invalidateQueries({ queryKey: progressQueryOptions(sittingId).queryKey });
    },
    onError: (error, { candidate }) => {
      keep(candidate);
      if (error instanceof ApiError) void client.invalidateQueries({ queryKey });
    },
  });
}
