import { z } from 'zod';
import { defineRoute } from './route';

export const getHealth = defineRoute({
  method: 'get',
  path: '/health',
  summary: 'The process is up.',
  access: { who: 'anyone' },
  response: z.object({ ok: z.literal(true), version: z.string() }),
});

export const getReady = defineRoute({
  method: 'get',
  path: '/ready',
  summary: 'The database answers and is migrated.',
  access: { who: 'anyone' },
  response: z.object({ ok: z.literal(true) }),
});

export const getOpenApi = defineRoute({
  method: 'get',
  path: '/openapi.json',
  summary: 'This interface as OpenAPI 3.1.',
  access: { who: 'anyone' },
  response: z.record(z.string(), z.unknown()),
});

export const serviceRoutes = { getHealth, getReady, getOpenApi };
