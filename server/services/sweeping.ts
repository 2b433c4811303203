import { inTransaction } from '../../db/client';
import { forgetResponsesBefore } from '../../db/queries/idempotency';
import { deleteEndedSessions } from '../../db/queries/sessions';
import type { Context } from '../context';

const sweepEveryMs = 3_600_000;
/** How long a repeated write still gets its stored answer. */
const responsesKeptMs = 24 * 3_600_000;

/** Removes sessions that have ended, stored answers that nobody will ask for again, and parts of requests that broke off. */
export function sweep({ db, clock, parts }: Pick<Context, 'db' | 'clock' | 'parts'>): void {
  inTransaction(db, () => {
    deleteEndedSessions(db, clock.now());
    forgetResponsesBefore(db, clock.now() - responsesKeptMs);
  });
  void parts.sweepIncoming(sweepEveryMs, clock.now());
}

/** Sweeps now and every hour; the function given back ends it. */
export function keepSwept(context: Pick<Context, 'db' | 'clock' | 'parts'>): () => void {
  sweep(context);
  const timer = setInterval(() => sweep(context), sweepEveryMs);
  timer.unref();
  return () => clearInterval(timer);
}
