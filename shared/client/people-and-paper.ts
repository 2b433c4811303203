import { queryOptions, useMutation, useQuery, useQueryClient, type QueryClient } from '@tanstack/react-query';
import type { getByHand, getPeopleAndPaper, listByHand, listNumberStrips, typeByHand } from '../contracts/people-and-paper';
import type { ResponseOf, SentBodyOf } from '../contracts/route';
import { api, apiUrl } from './api';
import { progressQueryOptions } from './sittings';

type View = ResponseOf<typeof getPeopleAndPaper>;

export const peopleQueryOptions = (sittingId: string) =>
  queryOptions({ queryKey: ['people-and-paper', sittingId], queryFn: ({ signal }) => api<View>(`/sittings/${sittingId}/people-and-paper`, { signal }) });

export const usePeopleAndPaper = (sittingId: string, isWanted = true) => useQuery({ ...peopleQueryOptions(sittingId), enabled: isWanted });

export const stripUrl = (scriptId: string, version: string): string => apiUrl(`/scripts/${scriptId}/number-strip?v=${version}`);

function lookAgain(client: QueryClient, sittingId: string): void {
  for (const queryKey of [['people-and-paper', sittingId], ['candidates', sittingId], progressQueryOptions(sittingId).queryKey, ['number-strips', sittingId], ['by-hand', sittingId], ['waiting']]) void client.invalidateQueries({ queryKey });
}

/** What a lead can do about a sheet or a person; each answers with the whole view as it is then. */
export type PeopleAct =
  | { readonly act: 'bind'; readonly scriptId: string; readonly body: { readonly candidateId: string; readonly seen: string | null; readonly reason: string } }
  | { readonly act: 'swap'; readonly scriptId: string; readonly body: { readonly withScriptId: string; readonly seen: string; readonly seenOther: string; readonly reason: string } }
  | { readonly act: 'number-settled'; readonly scriptId: string; readonly body: { readonly seen: string | null; readonly reason: string } }
  | { readonly act: 'by-hand'; readonly candidateId: string; readonly body: { readonly reason: string } };

export function usePeopleAct(sittingId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (one: PeopleAct) => api<View>(one.act === 'by-hand' ? `/candidates/${one.candidateId}/by-hand` : `/scripts/${one.scriptId}/${one.act}`, { method: 'POST', body: one.body }),
    onSuccess: (view) => client.setQueryData(peopleQueryOptions(sittingId).queryKey, view),
    onSettled: () => lookAgain(client, sittingId),
  });
}

export const useNumberStrips = (sittingId: string) =>
  useQuery({ queryKey: ['number-strips', sittingId], staleTime: Infinity, queryFn: ({ signal }) => api<ResponseOf<typeof listNumberStrips>>(`/sittings/${sittingId}/number-strips?limit=40`, { signal }) });

/** Records what a strip says; tried again while the connection is away. */
export const useReadNumber = () =>
  useMutation({
    mutationFn: ({ id, scriptId, text }: { id: string; scriptId: string; text: string | null }) => api(`/number-readings/${id}`, { method: 'PUT', body: { scriptId, text } }),
    retry: (count, error) => error.name === 'OfflineError' && count < 60,
    retryDelay: 2000,
    networkMode: 'always',
  });

export const useLookAtPeopleAgain = (sittingId: string) => {
  const client = useQueryClient();
  return () => lookAgain(client, sittingId);
};

export const useHandScripts = (sittingId: string) =>
  useQuery({ queryKey: ['by-hand', sittingId], queryFn: ({ signal }) => api<ResponseOf<typeof listByHand>>(`/sittings/${sittingId}/by-hand`, { signal }) });

export const useHandSheet = (scriptId: string) =>
  useQuery({ queryKey: ['hand-sheet', scriptId], queryFn: ({ signal }) => api<ResponseOf<typeof getByHand>>(`/scripts/${scriptId}/by-hand`, { signal }) });

export function useTypeByHand(sittingId: string, scriptId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: SentBodyOf<typeof typeByHand>) => api(`/scripts/${scriptId}/by-hand`, { method: 'PUT', body }),
    onSuccess: () => lookAgain(client, sittingId),
  });
}
