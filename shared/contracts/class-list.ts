import { z } from 'zod';
import { attendances } from './enums';
import { idParams, rev, uuid } from './parts';
import { defineRoute } from './route';

const leads = { who: 'course', roles: ['lead'] } as const;

const listText = z.string().min(1, 'There is no text.').max(1_000_000, 'A class list is at most 1 MB.');

export const listRow = z.object({
  line: z.int(),
  number: z.string(),
  name: z.string().nullable(),
  email: z.string().nullable(),
  outcome: z.enum(['new', 'changed', 'unchanged']),
});
export type ListRow = z.infer<typeof listRow>;

export const listError = z.object({ line: z.int(), column: z.int(), message: z.string() });
export type ListError = z.infer<typeof listError>;

export const listPreview = z.object({
  rows: z.array(listRow),
  errors: z.array(listError),
  /** Candidates who stand on the list and not in this text; they stay. */
  notInText: z.int(),
  counts: z.object({ new: z.int(), changed: z.int(), unchanged: z.int() }),
  /** Of the text and of what it would do; null while there are errors. */
  hash: z.string().nullable(),
});
export type ListPreview = z.infer<typeof listPreview>;

export const previewClassList = defineRoute({
  method: 'post',
  path: '/sittings/:id/class-list/preview',
  summary: 'What a class list in CSV would do, row by row, with errors by line and column. Imports nothing.',
  access: leads,
  params: idParams,
  body: z.strictObject({ text: listText }),
  response: listPreview,
});

export const confirmClassList = defineRoute({
  method: 'post',
  path: '/sittings/:id/class-list/confirm',
  summary: 'Import a class list as previewed: all of it or nothing.',
  access: leads,
  params: idParams,
  body: z.strictObject({ text: listText, hash: z.string().length(64) }),
  response: z.object({ added: z.int(), changed: z.int(), unchanged: z.int(), scripts: z.int() }),
});

export const getNames = defineRoute({
  method: 'get',
  path: '/sittings/:id/names',
  summary: 'Names and addresses by candidate: for the lead and the exams officer only.',
  access: { who: 'course', roles: ['lead', 'officer'] },
  params: idParams,
  response: z.object({ names: z.array(z.object({ candidateId: uuid, name: z.string().nullable(), email: z.string().nullable() })) }),
});

export const candidateView = z.object({
  id: uuid,
  number: z.string(),
  attendance: z.enum(attendances),
  scriptNumber: z.int().nullable(),
  pagesIn: z.int(),
  /** Pages that should come; 0 for someone who is not to be marked. */
  pagesDue: z.int(),
  rev,
});
export type CandidateView = z.infer<typeof candidateView>;

export const listCandidates = defineRoute({
  method: 'get',
  path: '/sittings/:id/candidates',
  summary: 'The class list by candidate number, without names.',
  access: { who: 'course', roles: ['lead', 'reader', 'external'] },
  params: idParams,
  response: z.object({ candidates: z.array(candidateView) }),
});

export const changeAttendance = defineRoute({
  method: 'patch',
  path: '/candidates/:id',
  summary: 'Change the attendance of a candidate. Names the rev it saw.',
  access: leads,
  params: idParams,
  body: z.strictObject({ attendance: z.enum(attendances) }),
  response: candidateView,
});

export const classListRoutes = { previewClassList, confirmClassList, getNames, listCandidates, changeAttendance };
