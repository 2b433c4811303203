import { expect, it, vi } from 'vitest';
import type { UploadView } from '../contracts/scans';
import { ApiError, OfflineError } from './api';
import { FileSender, type SendingEnds } from './file-sender';

const partSize = 4;

/** A server in memory: files by name with the parts that arrived, and a fault to throw for a while. */
function standIn(faults: { offline?: number; refuse?: string } = {}) {
  const kept = new Map<string, Map<number, number>>();
  const completed: string[] = [];
  let offline = faults.offline ?? 0;
  let most = 0;
  let open = 0;
  const view = (id: string, size: number): UploadView => ({ id, fileName: id, size, partSize, parts: [...(kept.get(id)?.keys() ?? [])], state: 'sending', problem: null, pages: [] });
  const answer = async <Answer>(make: () => Answer): Promise<Answer> => {
    open += 1;
    most = Math.max(most, open);
    await Promise.resolve();
    open -= 1;
    if (offline > 0) {
      offline -= 1;
      throw new OfflineError();
    }
    return make();
  };
  const ends: SendingEnds = {
    begin: (_batch, file) =>
      answer(() => {
        if (file.name === faults.refuse) throw new ApiError('conflict', 'This batch is cancelled.');
        if (!kept.has(file.name)) kept.set(file.name, new Map());
        return view(file.name, file.size);
      }),
    part: (id, part, bytes) =>
      answer(() => {
        kept.get(id)?.set(part, bytes.size);
        return view(id, 0);
      }),
    complete: (id) => answer(() => (completed.push(id), view(id, 0))),
    wait: () => Promise.resolve(),
  };
  return { ends, kept, completed, most: () => most };
}

const fileOf = (name: string, size: number) => new File([new Uint8Array(size)], name);
const whenAll = (sender: FileSender, state: string) => vi.waitFor(() => expect(sender.snapshot().every((file) => file.state === state)).toBe(true));

it('sends every part once, three files at a time', async () => {
  const server = standIn();
  const sender = new FileSender(server.ends);
  sender.add('b', ['a', 'b', 'c', 'd', 'e'].map((name) => fileOf(name, 10)));
  await whenAll(sender, 'sent');
  expect([...server.kept.values()].map((parts) => [...parts])).toEqual(Array.from({ length: 5 }, () => [[0, 4], [1, 4], [2, 2]]));
  expect(server.completed.sort()).toEqual(['a', 'b', 'c', 'd', 'e']);
  expect(server.most()).toBe(3);
});

it('waits out a lost connection and goes on where it was', async () => {
  const server = standIn({ offline: 4 });
  const sender = new FileSender(server.ends);
  const seen = new Set<string>();
  sender.subscribe(() => sender.snapshot().forEach(({ state }) => seen.add(state)));
  sender.add('b', [fileOf('a', 10)]);
  await whenAll(sender, 'sent');
  expect(seen).toContain('offline');
  expect([...(server.kept.get('a') ?? [])]).toEqual([[0, 4], [1, 4], [2, 2]]);
});

it('passes over parts that arrived before a break', async () => {
  const server = standIn();
  server.kept.set('a', new Map([[0, 4], [1, 99]]));
  const sender = new FileSender(server.ends);
  sender.add('b', [fileOf('a', 10)]);
  await whenAll(sender, 'sent');
  expect(server.kept.get('a')?.get(1)).toBe(99);
  expect(server.kept.get('a')?.get(2)).toBe(2);
});

it('names a refusal and lets the rest go on; once more after that is asked for', async () => {
  const server = standIn({ refuse: 'bad' });
  const sender = new FileSender(server.ends);
  sender.add('b', [fileOf('bad', 3), fileOf('good', 3)]);
  await vi.waitFor(() => expect(sender.snapshot().map(({ state, problem }) => [state, problem])).toEqual([['refused', 'This batch is cancelled.'], ['sent', null]]));
  sender.drop(({ state }) => state === 'sent');
  const [refused] = sender.snapshot();
  sender.again(refused?.key ?? '');
  await vi.waitFor(() => expect(sender.snapshot()[0]?.state).toBe('refused'));
  expect(sender.snapshot()).toHaveLength(1);
});
