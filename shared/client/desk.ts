import { queryOptions, useQuery } from '@tanstack/react-query';
import { createStore, del, entries, set, type UseStore } from 'idb-keyval';
import { useSyncExternalStore } from 'react';
import type { DeskLease, getDeskStanding, getRecentReadings, takeBackReading, takeLeases } from '../contracts/desk';
import type { ResponseOf } from '../contracts/route';
import { api } from './api';
import { cropUrl } from './pictures';
import { ReadingQueue, type KeptReading, type QueueView, type ReadingStore } from './reading-queue';

export const standingQueryOptions = (sittingId: string) =>
  queryOptions({
    queryKey: ['desk-standing', sittingId],
    queryFn: ({ signal }) => api<ResponseOf<typeof getDeskStanding>>(`/desk/standing?sitting=${sittingId}`, { signal }),
  });

export const recentQueryOptions = (sittingId: string, itemId: string) =>
  queryOptions({
    queryKey: ['desk-recent', sittingId, itemId],
    queryFn: ({ signal }) => api<ResponseOf<typeof getRecentReadings>>(`/desk/recent?sitting=${sittingId}&item=${itemId}`, { signal }),
  });

export const useStanding = (sittingId: string) => useQuery(standingQueryOptions(sittingId));
export const useRecent = (sittingId: string, itemId: string) => useQuery(recentQueryOptions(sittingId, itemId));

export const fetchLeases = async (itemId: string, count: number): Promise<DeskLease[]> =>
  (await api<ResponseOf<typeof takeLeases>>('/desk/leases', { method: 'POST', body: { itemId, count } })).leases;

export const takeBack = (readingId: string) => api<ResponseOf<typeof takeBackReading>>(`/readings/${readingId}/take-back`, { method: 'POST' });

/** Gives an answer back unread; where that does not get through, the lease runs out by itself. */
export const giveBack = (leaseId: string): void => void api(`/desk/leases/${leaseId}`, { method: 'DELETE' }).catch(() => undefined);

const warmed = new Set<string>();

/** Asks for the cut-outs of answers ahead, so that the next is there at once. */
export function warmPictures(leases: readonly DeskLease[]): void {
  for (const { answerId, crops } of leases) {
    for (const crop of crops) {
      const url = cropUrl(answerId, crop);
      if (warmed.has(url)) continue;
      warmed.add(url);
      const image = new Image();
      image.src = url;
      // Decoded now, not when it is shown.
      image.decode().catch(() => warmed.delete(url));
    }
  }
}

/** Where there is no storage in the browser, readings stay in the page's memory. */
function memoryStore(): ReadingStore {
  const kept = new Map<string, KeptReading>();
  return {
    all: async () => [...kept.values()],
    put: async (reading) => void kept.set(reading.id, reading),
    remove: async (id) => void kept.delete(id),
  };
}

function deviceStore(personId: string): ReadingStore {
  if (typeof indexedDB === 'undefined') return memoryStore();
  let opened: UseStore | undefined;
  const store = (): UseStore => (opened ??= createStore(`meniscus-readings-${personId}`, 'readings'));
  return {
    all: async () => (await entries<string, KeptReading>(store())).map(([, reading]) => reading),
    put: (reading) => set(reading.id, reading, store()),
    remove: (id) => del(id, store()),
  };
}

const sendReading = async ({ id, answerId, leaseId, text, code, note, method = [], openedAt }: KeptReading): Promise<void> => {
  await api(`/readings/${id}`, { method: 'PUT', body: { answerId, leaseId, method, openedAt, ...(text === undefined ? {} : { text }), ...(code === undefined ? {} : { code }), ...(note === undefined ? {} : { note }) } });
};

/** Until the pause is over or the connection returns, whichever is first. */
const pause = (ms: number): Promise<void> =>
  new Promise((resolve) => {
    const done = () => {
      clearTimeout(timer);
      window.removeEventListener('online', done);
      resolve();
    };
    const timer = setTimeout(done, ms);
    window.addEventListener('online', done);
  });

const queues = new Map<string, ReadingQueue>();

/** The queue of one person on this device; another person who signs in does not send its readings. */
export function queueOf(personId: string): ReadingQueue {
  const known = queues.get(personId);
  if (known) return known;
  const queue = new ReadingQueue({ store: deviceStore(personId), send: sendReading, wait: pause });
  queues.set(personId, queue);
  return queue;
}

/** Sends what this person has left on the device, from whatever screen; what others have left waits for them. */
export function sendReadingsOf(personId: string | null): void {
  for (const [owner, queue] of queues) if (owner !== personId) queue.pause();
  if (personId === null) return;
  const queue = queueOf(personId);
  queue.tryAgain();
  void queue.resume();
}

export function useReadingQueue(personId: string): { readonly queue: ReadingQueue; readonly view: QueueView } {
  const queue = queueOf(personId);
  const view = useSyncExternalStore(queue.subscribe, queue.snapshot, queue.snapshot);
  return { queue, view };
}
