import { expect, it, vi } from 'vitest';
import { ApiError, OfflineError } from './api';
import { ReadingQueue, type KeptReading, type QueueEnds } from './reading-queue';

const reading = (id: string): KeptReading => ({ id, sittingId: 's', itemId: 'i', answerId: `a-${id}`, leaseId: 'l', candidateNumber: 'W1', text: '6.10', openedAt: 1, keptAt: Number(id) });

/** A device store and a server that loses, refuses or takes what it is sent. */
function ends(answers: (error: KeptReading) => Error | null = () => null) {
  const device = new Map<string, KeptReading>();
  const server = new Map<string, number>();
  const order: string[] = [];
  const made: QueueEnds = {
    store: {
      all: async () => [...device.values()],
      put: async (one) => void device.set(one.id, one),
      remove: async (id) => void device.delete(id),
    },
    send: async (one) => {
      expect(device.has(one.id)).toBe(true);
      const error = answers(one);
      if (!(error instanceof OfflineError) || error.message === 'lost') server.set(one.id, (server.get(one.id) ?? 0) + 1);
      order.push(one.id);
      if (error) throw error;
    },
    wait: () => Promise.resolve(),
  };
  return { made, device, server, order };
}

it('is on the device before it is sent, and leaves it only once the server has it', async () => {
  const { made, device, order } = ends();
  const queue = new ReadingQueue(made);
  await queue.keep(reading('1'));
  await queue.keep(reading('2'));
  await vi.waitFor(() => expect(queue.snapshot().recorded).toBe(2));
  expect(order).toEqual(['1', '2']);
  expect(device.size).toBe(0);
});

it('keeps readings over a lost connection, sends them later in order, and the same one again after a lost answer', async () => {
  let fails = 3;
  const lost = new OfflineError();
  lost.message = 'lost';
  const { made, device, server } = ends(() => (fails-- > 0 ? (fails === 1 ? lost : new OfflineError()) : null));
  const queue = new ReadingQueue(made);
  const seen: boolean[] = [];
  queue.subscribe(() => seen.push(queue.snapshot().isOffline));
  await queue.keep(reading('1'));
  await vi.waitFor(() => expect(queue.snapshot().recorded).toBe(1));
  expect(seen).toContain(true);
  expect(queue.snapshot().isOffline).toBe(false);
  // Under one id: the server answers a repeat as the same reading.
  expect([...server]).toEqual([['1', 2]]);
  expect(device.size).toBe(0);
});

it('names a refusal, keeps the reading to look at, and lets the others go on', async () => {
  const { made, device } = ends(({ id }) => (id === '1' ? new ApiError('conflict', 'You have read this answer already.') : null));
  const queue = new ReadingQueue(made);
  await queue.keep(reading('1'));
  await queue.keep(reading('2'));
  await vi.waitFor(() => expect(queue.snapshot().recorded).toBe(1));
  expect(queue.snapshot().refused).toMatchObject([{ id: '1', refusal: 'You have read this answer already.' }]);
  expect(device.get('1')?.refusal).toBeDefined();
  await queue.forget('1');
  expect(device.size).toBe(0);
});

it('waits for a sign-in without losing or sending anything', async () => {
  let isSignedIn = false;
  const { made, device, order } = ends(() => (isSignedIn ? null : new ApiError('not_signed_in', 'Sign in first.')));
  const queue = new ReadingQueue(made);
  await queue.keep(reading('1'));
  await vi.waitFor(() => expect(queue.snapshot().needsSignIn).toBe(true));
  expect([device.size, order.length]).toEqual([1, 1]);
  isSignedIn = true;
  queue.tryAgain();
  await vi.waitFor(() => expect(queue.snapshot().recorded).toBe(1));
});

it('takes up in order what an earlier page left', async () => {
  const { made, device, order } = ends();
  for (const id of ['3', '1', '2']) device.set(id, reading(id));
  const queue = new ReadingQueue(made);
  await queue.resume();
  await vi.waitFor(() => expect(queue.snapshot().recorded).toBe(3));
  expect(order).toEqual(['1', '2', '3']);
});

it.each(['internal', 'not_ready', 'too_many_requests'] as const)('tries again when the server says %s', async (code) => {
  let fails = 2;
  const { made, device } = ends(() => (fails-- > 0 ? new ApiError(code, 'Not just now.') : null));
  const queue = new ReadingQueue(made);
  await queue.keep(reading('1'));
  await vi.waitFor(() => expect(queue.snapshot().recorded).toBe(1));
  expect([queue.snapshot().refused.length, device.size]).toEqual([0, 0]);
});

it('sends a refused reading again when asked, under the same id', async () => {
  let isRefused = true;
  const { made, device, order } = ends(() => (isRefused ? new ApiError('not_found', 'Not found.') : null));
  const queue = new ReadingQueue(made);
  await queue.keep(reading('1'));
  await vi.waitFor(() => expect(queue.snapshot().refused.length).toBe(1));
  isRefused = false;
  await queue.sendAgain('1');
  await vi.waitFor(() => expect(queue.snapshot().recorded).toBe(1));
  expect([order, device.size]).toEqual([['1', '1'], 0]);
});

it('sends nothing while paused for another person', async () => {
  const { made, device, order } = ends();
  const queue = new ReadingQueue(made);
  queue.pause();
  await queue.keep(reading('1'));
  await Promise.resolve();
  expect([device.size, order.length, queue.snapshot().needsSignIn]).toEqual([1, 0, true]);
});
