import { findActor, rolesInCourse } from '../../db/queries/people';
import type { GuardRole } from '../../shared/contracts/route';
import type { Context } from '../context';
import { AppError, notAllowed, notFound } from '../errors';

/** Who is asking; every service takes one first. */
export interface Actor {
  readonly personId: string;
  readonly isOfficer: boolean;
}

/** Proof that a guard ran: services hand it to what must not run unchecked. */
export interface CourseAccess {
  readonly actor: Actor;
  readonly courseId: string;
  readonly roles: ReadonlySet<GuardRole>;
  readonly settlesReadings: boolean;
}

/** The person behind a session, or not_signed_in when the session or the person has ended. */
export function requireActor({ db }: Pick<Context, 'db'>, personId: string | undefined): Actor {
  const found = personId === undefined ? undefined : findActor(db, personId);
  if (!found) throw new AppError('not_signed_in', 'Sign in first.');
  return { personId: found.id, isOfficer: found.isOfficer };
}

/** not_found for those without any role there, not_allowed for those whose role does not do this. */
export function requireCourseRole(
  { db }: Pick<Context, 'db'>,
  actor: Actor,
  courseId: string,
  allowed: readonly GuardRole[],
): CourseAccess {
  const held = rolesInCourse(db, actor.personId, courseId);
  const roles = new Set<GuardRole>(held.map((membership) => membership.role));
  if (actor.isOfficer) roles.add('officer');
  if (roles.size === 0) throw notFound();
  if (!allowed.some((role) => roles.has(role))) throw notAllowed();
  return { actor, courseId, roles, settlesReadings: held.some((membership) => membership.settlesReadings) };
}
