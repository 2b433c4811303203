import { and, eq, isNull, sql } from 'drizzle-orm';
import { preparedOnce, type Database } from '../client';
import { course, membership, person } from '../schema';

const statements = preparedOnce((db) => ({
  actor: db
    .select({ id: person.id, isOfficer: person.isOfficer })
    .from(person)
    .where(and(eq(person.id, sql.placeholder('id')), isNull(person.erasedAt)))
    .prepare(),
  roles: db
    .select({ role: membership.role, settlesReadings: membership.settlesReadings })
    .from(membership)
    .where(
      and(eq(membership.person, sql.placeholder('person')), eq(membership.course, sql.placeholder('course')), isNull(membership.until)),
    )
    .prepare(),
}));

export const findActor = (db: Database, id: string) => statements(db).actor.get({ id });

/** The open roles of a person in a course. */
export const rolesInCourse = (db: Database, personId: string, courseId: string) =>
  statements(db).roles.all({ person: personId, course: courseId });

export function findPersonByEmail(db: Database, email: string) {
  return db.select().from(person).where(and(eq(sql`lower(${person.email})`, email.toLowerCase()), isNull(person.erasedAt))).get();
}

export const findPerson = (db: Database, id: string) => db.select().from(person).where(eq(person.id, id)).get();

export function membershipsOf(db: Database, personId: string) {
  return db
    .select({ courseId: course.id, code: course.code, title: course.title, role: membership.role, settlesReadings: membership.settlesReadings })
    .from(membership)
    .innerJoin(course, eq(course.id, membership.course))
    .where(and(eq(membership.person, personId), isNull(membership.until), isNull(course.archivedAt)))
    .orderBy(course.code)
    .all();
}

export const allCourses = (db: Database) =>
  db.select({ courseId: course.id, code: course.code, title: course.title }).from(course).where(isNull(course.archivedAt)).orderBy(course.code).all();
