import { inTransaction } from '../../db/client';
import { allCourses, findPerson, membershipsOf } from '../../db/queries/people';
import { deleteSessionsOf } from '../../db/queries/sessions';
import type { Me } from '../../shared/contracts/session';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { notFound } from '../errors';
import { recordAct } from './audit';

/** Who is signed in, with the roles held in each course. */
export function whoAmI({ db }: Pick<Context, 'db'>, actor: Actor): Me {
  const person = findPerson(db, actor.personId);
  if (!person) throw notFound();
  const courses = new Map<string, Me['courses'][number]>();
  if (actor.isOfficer) {
    for (const row of allCourses(db)) courses.set(row.courseId, { id: row.courseId, code: row.code, title: row.title, roles: [], settlesReadings: false });
  }
  for (const row of membershipsOf(db, actor.personId)) {
    const known = courses.get(row.courseId) ?? { id: row.courseId, code: row.code, title: row.title, roles: [], settlesReadings: false };
    courses.set(row.courseId, { ...known, roles: [...known.roles, row.role], settlesReadings: known.settlesReadings || row.settlesReadings });
  }
  return { id: person.id, name: person.name ?? '', isOfficer: person.isOfficer, courses: [...courses.values()] };
}

/** Puts into the trail who came and went, and who was turned away. */
export function recordSessionAct(context: Context, personId: string | null, act: 'signed-in' | 'sign-in-refused' | 'signed-out'): void {
  inTransaction(context.db, () => recordAct(context, { actor: personId, act }));
}

/** Ends every session of the person, this one included. */
export function endAllSessions(context: Context, actor: Actor): void {
  inTransaction(context.db, () => {
    deleteSessionsOf(context.db, actor.personId);
    recordAct(context, { actor: actor.personId, act: 'signed-out-everywhere' });
  });
}
