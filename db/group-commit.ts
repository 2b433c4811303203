import { inTransaction, type Database } from './client';

/** A commit waits for the disk; so many acts at most wait for the same one. */
const mostInGroup = 64;

interface Waiting {
  readonly work: () => unknown;
  readonly resolve: (result: unknown) => void;
  readonly reject: (error: unknown) => void;
}

type Outcome = { readonly ok: true; readonly result: unknown } | { readonly ok: false; readonly error: unknown };

const queues = new WeakMap<Database, Waiting[]>();

/** Runs one act in a savepoint of its own, so that its refusal touches no other. */
function attempt(db: Database, work: () => unknown): Outcome {
  try {
    return { ok: true, result: inTransaction(db, work as () => never) };
  } catch (error) {
    // A full disk may end the whole transaction: what ran before is gone, and what follows would commit alone.
    if (!db.$client.inTransaction) throw error;
    return { ok: false, error };
  }
}

function commitGroup(db: Database, group: readonly Waiting[]): void {
  let outcomes: readonly Outcome[];
  try {
    outcomes = inTransaction(db, () => group.map(({ work }) => attempt(db, work)));
  } catch (error) {
    // Nothing of the group is on disk.
    for (const { reject } of group) reject(error);
    return;
  }
  group.forEach(({ resolve, reject }, index) => {
    const outcome = outcomes[index];
    if (outcome?.ok) resolve(outcome.result);
    else reject(outcome?.error);
  });
}

/**
 * Runs synchronous work that is one act; acts that arrive in the same turn of the event loop share one commit, each in a savepoint.
 * Resolves only once the commit is on disk; a refused act rejects with its own error and leaves the others as they are.
 */
export function committedTogether<Result>(db: Database, work: () => Result extends Promise<unknown> ? never : Result): Promise<Result> {
  const queue = queues.get(db) ?? [];
  queues.set(db, queue);
  return new Promise<Result>((resolve, reject) => {
    queue.push({ work, resolve: resolve as (result: unknown) => void, reject });
    if (queue.length > 1) return;
    setImmediate(() => {
      const waiting = queue.splice(0);
      for (let at = 0; at < waiting.length; at += mostInGroup) commitGroup(db, waiting.slice(at, at + mostInGroup));
    });
  });
}
