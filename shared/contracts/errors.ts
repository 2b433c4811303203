import { z } from 'zod';

/** The closed list of error codes; each has one status. */
export const errorStatuses = {
  invalid_request: 400,
  not_signed_in: 401,
  not_allowed: 403,
  not_found: 404,
  conflict: 409,
  too_large: 413,
  too_many_requests: 429,
  internal: 500,
  not_ready: 503,
  no_space: 507,
} as const;

export type ErrorCode = keyof typeof errorStatuses;

export const errorBody = z.object({
  error: z.object({
    code: z.enum(Object.keys(errorStatuses) as [ErrorCode, ...ErrorCode[]]),
    message: z.string(),
    /** Sentences by the path of the field that is wrong. */
    fields: z.record(z.string(), z.string()).optional(),
    /** For a conflict: what is there now. */
    current: z.unknown().optional(),
    requestId: z.string(),
  }),
});
export type ErrorBody = z.infer<typeof errorBody>;
