import { keepPreviousData, queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { getItemBank } from '../contracts/item-bank';
import type { getItem, ItemDraft, listItems, lockPaper, spotTest, workKey } from '../contracts/items';
import type { ResponseOf, SentBodyOf } from '../contracts/route';
import { api } from './api';
import { staleTimes } from './query-client';
import { progressQueryOptions, sittingQueryOptions } from './sittings';

type ItemList = ResponseOf<typeof listItems>;
type Item = ResponseOf<typeof getItem>;

export const itemsQueryOptions = (sittingId: string) =>
  queryOptions({
    queryKey: ['items', sittingId],
    queryFn: ({ signal }) => api<ItemList>(`/sittings/${sittingId}/items`, { signal }),
  });

export const useItemBank = (sittingId: string) =>
  useQuery({ queryKey: ['item-bank', sittingId], staleTime: staleTimes.steady, queryFn: ({ signal }) => api<ResponseOf<typeof getItemBank>>(`/sittings/${sittingId}/item-bank`, { signal }) });

export const useItems = (sittingId: string) => useQuery(itemsQueryOptions(sittingId));

/** What the server makes of a draft of an item, where that stands on its paper; the last answer stays while the next is worked. */
export const useWorkedDraft = ({ sittingId, itemId, number }: { readonly sittingId: string; readonly itemId: string; readonly number: number }, draft: ItemDraft, isNeeded: boolean) =>
  useQuery({
    queryKey: ['worked-draft', sittingId, itemId, number, draft],
    enabled: isNeeded,
    staleTime: staleTimes.steady,
    placeholderData: keepPreviousData,
    queryFn: ({ signal }) => api<ResponseOf<typeof workKey>>('/keys', { method: 'POST', body: { sittingId, itemId, draft }, signal }),
  });

interface Tried {
  readonly text: string;
  readonly beside: { readonly followed: string; readonly second: string; readonly method: readonly string[] };
  /** Null where the stored item is the one to try. */
  readonly draft: ItemDraft | null;
}

/** How a text would be marked, with what else its mark rests on. */
export const useSpotTest = (itemId: string, { text, beside, draft }: Tried) =>
  useQuery({
    queryKey: ['spot-test', itemId, text, beside, draft],
    enabled: text !== '',
    staleTime: staleTimes.steady,
    placeholderData: keepPreviousData,
    retry: false,
    queryFn: ({ signal }) =>
      api<ResponseOf<typeof spotTest>>(`/items/${itemId}/spot-test`, { method: 'POST', body: { text, ...beside, ...(draft === null ? {} : { draft }) }, signal }),
  });

/** Puts one item into the list that is shown. */
function useKeepItem(sittingId: string) {
  const client = useQueryClient();
  return (item: Item) =>
    client.setQueryData<ItemList>(itemsQueryOptions(sittingId).queryKey, (list) => {
      if (!list) return list;
      const isKnown = list.items.some(({ id }) => id === item.id);
      return { ...list, items: isKnown ? list.items.map((known) => (known.id === item.id ? item : known)) : [...list.items, item] };
    });
}

function useRefreshCounts(sittingId: string) {
  const client = useQueryClient();
  return () => {
    void client.invalidateQueries({ queryKey: progressQueryOptions(sittingId).queryKey });
    void client.invalidateQueries({ queryKey: ['layout', sittingId] });
  };
}

export function useMakeItem(sittingId: string) {
  const keep = useKeepItem(sittingId);
  const refresh = useRefreshCounts(sittingId);
  return useMutation({
    mutationFn: ({ draft, once }: { draft: ItemDraft; once: string }) => api<Item>(`/sittings/${sittingId}/items`, { method: 'POST', body: draft, idempotencyKey: once }),
    onSuccess: (item) => {
      keep(item);
      refresh();
    },
  });
}

/** Items follow from each other: a change of one may open or close what another can follow. */
function useWorkAnew(sittingId: string) {
  const client = useQueryClient();
  return () => {
    for (const queryKey of [itemsQueryOptions(sittingId).queryKey, ['worked-draft', sittingId], ['spot-test']]) void client.invalidateQueries({ queryKey });
  };
}

export function useSaveItem(sittingId: string) {
  const keep = useKeepItem(sittingId);
  const workAnew = useWorkAnew(sittingId);
  return useMutation({
    mutationFn: ({ itemId, rev, draft }: { itemId: string; rev: number; draft: ItemDraft }) => api<Item>(`/items/${itemId}`, { method: 'PUT', rev, body: draft }),
    onSuccess: (item) => {
      keep(item);
      workAnew();
    },
  });
}

export function useRemoveItem(sittingId: string) {
  const client = useQueryClient();
  const refresh = useRefreshCounts(sittingId);
  return useMutation({
    mutationFn: ({ itemId, rev }: { itemId: string; rev: number }) => api<void>(`/items/${itemId}`, { method: 'DELETE', rev }),
    onSettled: () => {
      refresh();
      return client.invalidateQueries({ queryKey: itemsQueryOptions(sittingId).queryKey });
    },
  });
}

/** Shows the new order at once, and the server's when it answers. */
export function useOrderItems(sittingId: string) {
  const client = useQueryClient();
  const { queryKey } = itemsQueryOptions(sittingId);
  return useMutation({
    mutationFn: (items: readonly string[]) => api<ItemList>(`/sittings/${sittingId}/item-order`, { method: 'PUT', body: { items } }),
    onMutate: async (order) => {
      await client.cancelQueries({ queryKey });
      client.setQueryData<ItemList>(queryKey, (list) => {
        if (!list) return list;
        const byId = new Map(list.items.map((item) => [item.id, item]));
        return { ...list, items: order.flatMap((id, index) => { const item = byId.get(id); return item ? [{ ...item, number: index + 1 }] : []; }) };
      });
    },
    onSuccess: (list) => client.setQueryData(queryKey, list),
    onError: () => client.invalidateQueries({ queryKey }),
  });
}

export function useLockPaper(sittingId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: SentBodyOf<typeof lockPaper>) => api<ResponseOf<typeof lockPaper>>(`/sittings/${sittingId}/lock`, { method: 'POST', body }),
    onSuccess: () =>
      Promise.all(
        [itemsQueryOptions(sittingId).queryKey, sittingQueryOptions(sittingId).queryKey, progressQueryOptions(sittingId).queryKey, ['layout', sittingId], ['candidates', sittingId], ['sheet-preview', sittingId]].map((queryKey) =>
          client.invalidateQueries({ queryKey }),
        ),
      ),
  });
}
