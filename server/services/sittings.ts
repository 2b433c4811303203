import { v7 as uuidv7 } from 'uuid';
import { inTransaction } from '../../db/client';
import { findCourse, insertSitting, nextPrintNumber, sittingsOfCourse, updateSitting } from '../../db/queries/courses';
import { paperLockedAt } from '../../db/queries/papers';
import { allCourses, membershipsOf } from '../../db/queries/people';
import { answersOfSitting } from '../../db/queries/settling';
import type { SittingRow } from '../../db/queries/sittings';
import type { BodyOf } from '../../shared/contracts/route';
import type { changeSitting as changeContract, CourseView, makeSitting as makeContract, SittingView } from '../../shared/contracts/sittings';
import { requireCourseRole, type Actor, type CourseAccess } from '../auth/access';
import type { Context } from '../context';
import { conflict, invalidRequest } from '../errors';
import { recordAct } from './audit';
import { settleAnswers } from './settle';
import { bumpSitting, requireSitting } from './sitting-access';

const staff = ['lead', 'reader', 'external', 'officer'] as const;

/** Courses with the roles held there; the exams officer sees every course. */
export function coursesOf({ db }: Context, actor: Actor): CourseView[] {
  const courses = new Map<string, CourseView>();
  if (actor.isOfficer) for (const { courseId, code, title } of allCourses(db)) courses.set(courseId, { id: courseId, code, title, roles: [] });
  for (const { courseId, code, title, role } of membershipsOf(db, actor.personId)) {
    const known = courses.get(courseId) ?? { id: courseId, code, title, roles: [] };
    courses.set(courseId, { ...known, roles: [...known.roles, role] });
  }
  return [...courses.values()].sort((one, other) => one.code.localeCompare(other.code));
}

function sittingView({ db }: Context, sitting: SittingRow, access: CourseAccess): SittingView {
  const course = findCourse(db, sitting.course);
  if (!course) throw new Error(`Sitting ${sitting.id} has no course.`);
  const { id, printNumber, title, heldOn, status, desk, secondPolicy, totalRounding, boardDate, seq, rev } = sitting;
  return {
    ...{ id, printNumber, title, heldOn, status, desk, secondPolicy, totalRounding, boardDate, seq, rev },
    courseId: course.id,
    courseCode: course.code,
    courseTitle: course.title,
    timeZone: course.timeZone,
    lockedAt: paperLockedAt(db, sitting.id),
    roles: [...access.roles],
  };
}

export function sittingsIn(context: Context, actor: Actor, courseId: string): SittingView[] {
  const access = requireCourseRole(context, actor, courseId, staff);
  return sittingsOfCourse(context.db, courseId).map((sitting) => sittingView(context, sitting, access));
}

export function sittingFor(context: Context, actor: Actor, sittingId: string): SittingView {
  const { sitting, access } = requireSitting(context, actor, sittingId, staff);
  return sittingView(context, sitting, access);
}

/** Begins a sitting; printed sheets will carry the next free number. */
export function createSitting(context: Context, actor: Actor, courseId: string, wanted: BodyOf<typeof makeContract>): SittingView {
  const { db } = context;
  requireCourseRole(context, actor, courseId, ['lead']);
  const id = uuidv7();
  inTransaction(db, () => {
    const row = { id, course: courseId, printNumber: nextPrintNumber(db), ...wanted };
    insertSitting(db, row);
    bumpSitting(db, id);
    recordAct(context, { actor: actor.personId, act: 'sitting-made', sitting: id, subject: id, after: row });
  });
  return sittingFor(context, actor, id);
}

/** Changes a sitting; a new policy or rounding counts readings due and totals again. */
export function changeSitting(context: Context, actor: Actor, sittingId: string, rev: number, body: BodyOf<typeof changeContract>): SittingView {
  const { db } = context;
  requireSitting(context, actor, sittingId, ['lead']);
  const changes = Object.fromEntries(Object.entries(body).filter(([, value]) => value !== undefined)) as Partial<SittingRow>;
  if (Object.keys(changes).length === 0) throw invalidRequest('Nothing to change was named.');
  inTransaction(db, () => {
    const { sitting } = requireSitting(context, actor, sittingId, ['lead']);
    if (sitting.rev !== rev) throw conflict('Someone changed this sitting meanwhile. Yours was not stored.', sittingFor(context, actor, sittingId));
    const before = Object.fromEntries(Object.keys(changes).map((name) => [name, sitting[name as keyof SittingRow]]));
    updateSitting(db, sittingId, changes);
    bumpSitting(db, sittingId);
    recordAct(context, { actor: actor.personId, act: 'sitting-changed', sitting: sittingId, subject: sittingId, before, after: changes });
    const counts = changes.secondPolicy !== undefined || changes.totalRounding !== undefined;
    if (counts && sitting.schemeVersion !== null) settleAnswers(context, answersOfSitting(db, sittingId));
  });
  return sittingFor(context, actor, sittingId);
}
