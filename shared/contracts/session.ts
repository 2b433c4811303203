import { z } from 'zod';
import { membershipRoles } from './enums';
import { uuid } from './parts';
import { defineRoute } from './route';

export const me = z.object({
  id: uuid,
  name: z.string(),
  isOfficer: z.boolean(),
  courses: z.array(
    z.object({ id: uuid, code: z.string(), title: z.string(), roles: z.array(z.enum(membershipRoles)), settlesReadings: z.boolean() }),
  ),
});
export type Me = z.infer<typeof me>;

export const signIn = defineRoute({
  method: 'post',
  path: '/session',
  summary: 'Sign in with e-mail and password.',
  access: { who: 'anyone' },
  body: z.strictObject({ email: z.string().trim().min(1).max(254), password: z.string().min(1).max(1024) }),
  response: me,
});

export const signOut = defineRoute({
  method: 'delete',
  path: '/session',
  summary: 'Sign out here.',
  access: { who: 'signed-in' },
  status: 204,
});

export const signOutEverywhere = defineRoute({
  method: 'delete',
  path: '/sessions',
  summary: 'End every session of the person who is signed in.',
  access: { who: 'signed-in' },
  status: 204,
});

export const getMe = defineRoute({
  method: 'get',
  path: '/me',
  summary: 'Who is signed in, with roles by course.',
  access: { who: 'signed-in' },
  response: me,
});

export const sessionRoutes = { signIn, signOut, signOutEverywhere, getMe };
