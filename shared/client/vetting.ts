import { queryOptions, useMutation, useQuery, useQueryClient, type QueryClient } from '@tanstack/react-query';
import type { ResponseOf, SentBodyOf } from '../contracts/route';
import type { getVetting, vetItem, VettingItem } from '../contracts/vetting';
import { api } from './api';

type Vetting = ResponseOf<typeof getVetting>;

export const vettingQueryOptions = (sittingId: string) => queryOptions({ queryKey: ['vetting', sittingId], queryFn: ({ signal }) => api<Vetting>(`/sittings/${sittingId}/vetting`, { signal }) });

export const useVetting = (sittingId: string) => useQuery(vettingQueryOptions(sittingId));

const keepItem = (client: QueryClient, sittingId: string, item: VettingItem): void =>
  void client.setQueryData(vettingQueryOptions(sittingId).queryKey, (before) => (before ? { items: before.items.map((one) => (one.itemId === item.itemId ? item : one)) } : before));

export function useCheckKey(sittingId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ itemId, rev, text }: { itemId: string; rev: number; text: string }) => api<VettingItem>(`/items/${itemId}/vetting-check`, { method: 'PUT', rev, body: { text } }),
    onSuccess: (item) => keepItem(client, sittingId, item),
    onError: () => client.invalidateQueries({ queryKey: vettingQueryOptions(sittingId).queryKey }),
  });
}

export function useVet(sittingId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ itemId, rev, body }: { itemId: string; rev: number; body: SentBodyOf<typeof vetItem> }) => api<VettingItem>(`/items/${itemId}/vetting`, { method: 'POST', rev, body }),
    onSuccess: (item) => keepItem(client, sittingId, item),
    onError: () => client.invalidateQueries({ queryKey: vettingQueryOptions(sittingId).queryKey }),
  });
}
