import { bumpSittingSeq, findSitting, isPaperLocked, type SittingRow } from '../../db/queries/sittings';
import type { Database } from '../../db/client';
import type { GuardRole } from '../../shared/contracts/route';
import { requireCourseRole, type Actor, type CourseAccess } from '../auth/access';
import type { Context } from '../context';
import { conflict, notFound } from '../errors';

export interface SittingAccess {
  readonly sitting: SittingRow;
  readonly access: CourseAccess;
}

/** The sitting, for an actor with one of the roles in its course; see requireCourseRole for what others get. */
export function requireSitting(context: Pick<Context, 'db'>, actor: Actor, sittingId: string | undefined, roles: readonly GuardRole[]): SittingAccess {
  const sitting = sittingId === undefined ? undefined : findSitting(context.db, sittingId);
  if (!sitting) throw notFound();
  return { sitting, access: requireCourseRole(context, actor, sitting.course, roles) };
}

/** The next number of change of the sitting; call it in the transaction of every change. */
export const bumpSitting = (db: Database, sittingId: string): number => bumpSittingSeq(db, sittingId);

/** Throws a conflict once the paper is locked. */
export function requireOpenPaper(context: Pick<Context, 'db'>, sitting: SittingRow): void {
  if (isPaperLocked(context.db, sitting.id)) throw conflict('The paper is locked. From the lock on the scheme changes by amendment only.');
}

/** Throws a conflict until the paper is locked. */
export function requireLockedPaper(context: Pick<Context, 'db'>, sitting: SittingRow): void {
  if (!isPaperLocked(context.db, sitting.id)) throw conflict('The paper is still open to change. Lock it first.');
}
