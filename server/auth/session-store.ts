import { createHash } from 'node:crypto';
import { Store, type SessionData } from 'express-session';
import { deleteSession, findSession, saveSession, touchSession } from '../../db/queries/sessions';
import type { Context } from '../context';

/** How stale the last-seen time may grow before a request writes it again. */
const touchEveryMs = 60_000;

const hashOf = (id: string): string => createHash('sha256').update(id).digest('hex');

interface SignedInData extends SessionData {
  passport?: { user?: string };
}

/** Sessions of express-session in SQLite. The database never holds a usable cookie: ids are kept hashed. */
export class SqliteSessionStore extends Store {
  readonly #context: Pick<Context, 'db' | 'clock' | 'config'>;
  readonly #seen = new Map<string, number>();

  constructor(context: Pick<Context, 'db' | 'clock' | 'config'>) {
    super();
    this.#context = context;
  }

  override get(id: string, callback: (error: unknown, session?: SessionData | null) => void): void {
    const { db, clock } = this.#context;
    try {
      const idHash = hashOf(id);
      const found = findSession(db, idHash, clock.now());
      if (found) this.#seen.set(idHash, found.seenAt);
      callback(null, found ? (JSON.parse(found.data) as SessionData) : null);
    } catch (error) {
      callback(error);
    }
  }

  override set(id: string, session: SignedInData, callback?: (error?: unknown) => void): void {
    const { db, clock, config } = this.#context;
    try {
      const now = clock.now();
      saveSession(db, {
        idHash: hashOf(id),
        person: session.passport?.user ?? null,
        data: JSON.stringify(session),
        createdAt: now,
        seenAt: now,
        endsAt: now + config.sessionMs,
      });
      callback?.();
    } catch (error) {
      callback?.(error);
    }
  }

  override destroy(id: string, callback?: (error?: unknown) => void): void {
    try {
      deleteSession(this.#context.db, hashOf(id));
      this.#seen.delete(hashOf(id));
      callback?.();
    } catch (error) {
      callback?.(error);
    }
  }

  override touch(id: string, _session: SessionData, callback?: () => void): void {
    const { db, clock, config } = this.#context;
    const idHash = hashOf(id);
    const now = clock.now();
    if (now - (this.#seen.get(idHash) ?? 0) > touchEveryMs) {
      touchSession(db, idHash, now, now + config.sessionMs);
      this.#seen.set(idHash, now);
    }
    callback?.();
  }
}
