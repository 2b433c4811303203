import { v7 as uuidv7 } from 'uuid';
import { inTransaction, type Database } from '../client';
import { course, membership, person } from '../schema';
import { cast, type CastName } from './cast';

export interface SeededPeople {
  readonly courseId: string;
  readonly otherCourseId: string;
  readonly people: Readonly<Record<CastName, string>>;
}

/** Two courses and the cast, all with one password hash. */
export function seedPeople(db: Database, passwordHash: string, now: number): SeededPeople {
  return inTransaction(db, () => {
    const courseId = uuidv7();
    const otherCourseId = uuidv7();
    db.insert(course)
      .values([
        { id: courseId, code: 'CHM 214', title: 'Atomic structure and bonding', timeZone: 'Europe/London' },
        { id: otherCourseId, code: 'CHM 105', title: 'Foundations of chemistry', timeZone: 'Europe/London' },
      ])
      .run();
    const ids = {} as Record<CastName, string>;
    for (const [key, member] of Object.entries(cast) as [CastName, (typeof cast)[CastName]][]) {
      const id = uuidv7();
      ids[key] = id;
      db.insert(person).values({ id, name: member.name, email: member.email, passwordHash, isOfficer: 'isOfficer' in member }).run();
      const held = [...member.roles.map((role) => [courseId, role] as const), ...('elsewhere' in member ? member.elsewhere : []).map((role) => [otherCourseId, role] as const)];
      for (const [where, role] of held) db.insert(membership).values({ id: uuidv7(), person: id, course: where, role, from: now }).run();
    }
    return { courseId, otherCourseId, people: ids };
  });
}
