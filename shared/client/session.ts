import { queryOptions, useMutation, useQuery, useQueryClient, type QueryClient } from '@tanstack/react-query';
import type { ResponseOf, SentBodyOf } from '../contracts/route';
import type { getMe, signIn } from '../contracts/session';
import { api, ApiError } from './api';
import { staleTimes } from './query-client';

type Me = ResponseOf<typeof getMe>;

/** Null when nobody is signed in. */
export const meQueryOptions = () =>
  queryOptions({
    queryKey: ['me'],
    staleTime: staleTimes.steady,
    queryFn: async ({ signal }): Promise<Me | null> => {
      try {
        return await api<Me>('/me', { signal });
      } catch (error) {
        if (error instanceof ApiError && error.code === 'not_signed_in') return null;
        throw error;
      }
    },
  });

/** NOTE the query of who is signed in stays: a screen that watches it would not see a new one in its place. */
const forgetOthersData = (client: QueryClient): void => client.removeQueries({ predicate: ({ queryKey }) => queryKey[0] !== 'me' });

export const useMe = () => useQuery(meQueryOptions());

export function useSignIn() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: SentBodyOf<typeof signIn>) => api<Me>('/session', { method: 'POST', body }),
    onSuccess: (me) => {
      forgetOthersData(client);
      client.setQueryData(meQueryOptions().queryKey, me);
    },
  });
}

/** Here, or everywhere this person is signed in. What the browser kept of the person's images goes with it. */
export function useSignOut() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (where: 'here' | 'everywhere') => api<void>(where === 'here' ? '/session' : '/sessions', { method: 'DELETE' }),
    onSuccess: () => {
      forgetOthersData(client);
      client.setQueryData(meQueryOptions().queryKey, null);
    },
  });
}
