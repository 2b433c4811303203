import type { Logger } from 'pino';
import { v7 as uuidv7 } from 'uuid';
import type { Database } from '../../db/client';
import { beatJob, claimJob, failJob, finishJob, insertJob, nextRunAt, openJobs, reviveJobs } from '../../db/queries/jobs';
import type { Clock } from '../context';
import type { JobHandler, Jobs } from './jobs';

const triesAllowed = 4;
/** Far more often than power fails in a row: a job that was under way each time is the likely cause. */
const crashesAllowed = 30;
const leaseMs = 10 * 60_000;

interface Settings {
  readonly db: Database;
  readonly clock: Clock;
  readonly log: Logger;
  /** How many jobs are worked on at once. */
  readonly lanes: number;
}

/** Jobs in the database's job table, worked off by this process; handlers give heavy work to worker threads. */
export function createSqliteJobs({ db, clock, log, lanes }: Settings): Jobs {
  const handlers = new Map<string, JobHandler>();
  const underWay = new Set<Promise<void>>();
  let running = false;
  let timer: NodeJS.Timeout | undefined;

  const work = async (claimed: NonNullable<ReturnType<typeof claimJob>>): Promise<void> => {
    try {
      const handler = handlers.get(claimed.kind);
      if (!handler) throw new Error(`Nothing here does jobs of the kind ${claimed.kind}.`);
      await handler(claimed.payload, () => beatJob(db, claimed.id, clock.now() + leaseMs));
      finishJob(db, claimed.id);
    } catch (error) {
      const message = error instanceof Error ? error.message : String(error);
      const again = claimed.tries < triesAllowed ? { runAt: clock.now() + 500 * 2 ** claimed.tries } : null;
      log.error({ err: error, job: claimed.id, kind: claimed.kind, again: again !== null }, 'job failed');
      failJob(db, claimed.id, message, again);
    }
  };

  const fill = (): void => {
    if (!running) return;
    clearTimeout(timer);
    while (underWay.size < lanes) {
      const claimed = claimJob(db, clock.now(), clock.now() + leaseMs);
      if (!claimed) break;
      const done = work(claimed).finally(() => {
        underWay.delete(done);
        fill();
      });
      underWay.add(done);
    }
    const next = underWay.size === 0 ? nextRunAt(db) : null;
    if (next !== null) timer = setTimeout(fill, Math.max(10, next - clock.now()));
  };

  return {
    handle: (kind, handler) => void handlers.set(kind, handler),
    add: (kind, dedupeKey, payload) => {
      insertJob(db, { id: uuidv7(), kind, dedupeKey, payload, runAt: clock.now() });
      setImmediate(fill);
    },
    run: () => {
      reviveJobs(db, crashesAllowed);
      running = true;
      fill();
    },
    settle: async () => {
      while (openJobs(db) > 0) {
        fill();
        await Promise.race([...underWay, new Promise((resolve) => setTimeout(resolve, 20))]);
      }
      await Promise.all(underWay);
    },
    stop: async () => {
      running = false;
      clearTimeout(timer);
      await Promise.all(underWay);
    },
  };
}
