import { inTransaction } from '../../db/client';
import { forgetResponsesBefore } from '../../db/queries/idempotency';
import { deleteEndedSessions } from '../../db/queries/sessions';
import type { Context } from '../context';

const sweepEveryMs = 3_600_000;
/** How long a repeated write still gets its stored answer. */
const responsesKeptMs = 24 * 3_600_000;

/** Removes sessions that have ended, and stored answers that nobody will ask for again. */
export function sweep({ db, clock }: Pick<Context, 'db' | 'clock'>): void {
  inTransaction(db, () => {
    deleteEndedSessions(db, clock.now());
    forgetResponsesBefore(db, clock.now() - responsesKeptMs);
  });
}

/** Sweeps now and every hour; the function given back ends it. */
export function keepSwept(context: Pick<Context, 'db' | 'clock'>): () => void {
  sweep(context);
  const timer = setInterval(() => sweep(context), sweepEveryMs);
  timer.unref();
  return () => clearInterval(timer);
}
