import { createHash } from 'node:crypto';
import { auditHead, insertAuditEntry } from '../../db/queries/audit';
import type { AuditAct } from '../../shared/contracts/enums';
import type { Context } from '../context';

export interface Act {
  readonly actor: string | null;
  readonly act: AuditAct;
  readonly sitting?: string;
  readonly subject?: string;
  readonly before?: Record<string, unknown>;
  readonly after?: Record<string, unknown>;
  readonly reason?: string;
}

/** Writes one entry of the trail. Call it inside the transaction of the act, so that neither stands without the other. */
export function recordAct({ db, clock }: Pick<Context, 'db' | 'clock'>, entry: Act): void {
  const head = auditHead(db);
  const row = {
    n: (head?.n ?? 0) + 1,
    at: clock.now(),
    actor: entry.actor,
    act: entry.act,
    sitting: entry.sitting ?? null,
    subject: entry.subject ?? null,
    before: entry.before ? JSON.stringify(entry.before) : null,
    after: entry.after ? JSON.stringify(entry.after) : null,
    reason: entry.reason ?? null,
    prevHash: head?.hash ?? '',
  };
  insertAuditEntry(db, { ...row, hash: createHash('sha256').update(JSON.stringify(row)).digest('hex') });
}
