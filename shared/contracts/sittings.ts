import { z } from 'zod';
import { deskModes, membershipRoles, secondPolicies, sittingStatuses, totalRoundings } from './enums';
import { idParams, instant, rev, uuid } from './parts';
import { defineRoute } from './route';

const staff = { who: 'course', roles: ['lead', 'reader', 'external', 'officer'] } as const;
const leads = { who: 'course', roles: ['lead'] } as const;

const day = z.iso.date('Write a date as 2026-05-06.');
const title = z.string().trim().min(1, 'Give it a title.').max(120);

export const courseView = z.object({ id: uuid, code: z.string(), title: z.string(), roles: z.array(z.enum(membershipRoles)) });
export type CourseView = z.infer<typeof courseView>;

/** The same for every role: nothing here comes from a key. */
export const sittingView = z.object({
  id: uuid,
  courseId: uuid,
  courseCode: z.string(),
  courseTitle: z.string(),
  timeZone: z.string(),
  printNumber: z.int(),
  title: z.string(),
  heldOn: z.string(),
  status: z.enum(sittingStatuses),
  desk: z.enum(deskModes),
  secondPolicy: z.enum(secondPolicies),
  totalRounding: z.enum(totalRoundings),
  boardDate: z.string().nullable(),
  /** When the paper was locked; null while it is open to change. */
  lockedAt: instant.nullable(),
  /** What the person who asks may be here. */
  roles: z.array(z.enum([...membershipRoles, 'officer'])),
  seq: z.int(),
  rev,
});
export type SittingView = z.infer<typeof sittingView>;

export const listCourses = defineRoute({
  method: 'get',
  path: '/courses',
  summary: 'The courses of the person who is signed in; all of them for the exams officer.',
  access: { who: 'signed-in' },
  response: z.object({ courses: z.array(courseView) }),
});

export const listSittings = defineRoute({
  method: 'get',
  path: '/courses/:id/sittings',
  summary: 'The sittings of a course, newest first.',
  access: staff,
  params: idParams,
  response: z.object({ sittings: z.array(sittingView) }),
});

export const makeSitting = defineRoute({
  method: 'post',
  path: '/courses/:id/sittings',
  summary: 'Begin a sitting of a course.',
  access: leads,
  params: idParams,
  body: z.strictObject({ title, heldOn: day, secondPolicy: z.enum(secondPolicies).default('none'), totalRounding: z.enum(totalRoundings).default('none') }),
  response: sittingView,
  status: 201,
});

export const getSitting = defineRoute({
  method: 'get',
  path: '/sittings/:id',
  summary: 'One sitting.',
  access: staff,
  params: idParams,
  response: sittingView,
});

export const changeSitting = defineRoute({
  method: 'patch',
  path: '/sittings/:id',
  summary: 'Change title, date, second readings, rounding of totals or the date of the board. Names the rev it saw.',
  access: leads,
  params: idParams,
  body: z
    .strictObject({
      title,
      heldOn: day,
      secondPolicy: z.enum(secondPolicies),
      totalRounding: z.enum(totalRoundings),
      boardDate: day.nullable(),
    })
    .partial(),
  response: sittingView,
});

export const sittingRoutes = { listCourses, listSittings, makeSitting, getSitting, changeSitting };
