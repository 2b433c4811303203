import type { ErrorBody, ErrorCode } from '../contracts/errors';

/** Empty in production: the app and the interface share one origin. */
const base = process.env.EXPO_PUBLIC_API_URL ?? '';

export const apiUrl = (path: string): string => `${base}/api${path}`;

/** What the server refused, in its own words. */
export class ApiError extends Error {
  constructor(
    readonly code: ErrorCode,
    message: string,
    readonly fields: Readonly<Record<string, string>> = {},
    readonly current: unknown = undefined,
  ) {
    super(message);
    this.name = 'ApiError';
  }
}

/** The server was not reached: nothing is known of what it did. */
export class OfflineError extends Error {
  constructor() {
    super('The server was not reached. Check the connection, then try again.');
    this.name = 'OfflineError';
  }
}

interface Sent {
  readonly method?: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  readonly body?: unknown;
  readonly form?: FormData;
  /** Bytes of a file as they are, with their media type. */
  readonly file?: { readonly bytes: Blob; readonly type: string };
  /** What the write saw: a rev, or the tag that a paper came with. */
  readonly rev?: number | string;
  readonly idempotencyKey?: string;
  readonly signal?: AbortSignal | null;
}

async function errorOf(response: Response): Promise<ApiError> {
  const body = (await response.json().catch(() => null)) as ErrorBody | null;
  if (!body?.error) return new ApiError('internal', 'The server answered in a way that is not understood. Try again.');
  const { code, message, fields, current } = body.error;
  return new ApiError(code, message, fields, current);
}

/** One call of the interface. Throws ApiError for a refusal and OfflineError when nothing answered. */
export async function api<Answer>(path: string, sent: Sent = {}): Promise<Answer> {
  const response = await answered(path, sent);
  if (response.status === 204) return undefined as Answer;
  return (await response.json()) as Answer;
}

/** The same with the ETag it came with, for a write that has to name what it saw. */
export async function apiTagged<Answer>(path: string): Promise<{ readonly answer: Answer; readonly tag: string }> {
  const response = await answered(path, {});
  return { answer: (await response.json()) as Answer, tag: response.headers.get('ETag') ?? '' };
}

/** The same for a file. */
export const apiBlob = async (path: string): Promise<Blob> => (await answered(path, {})).blob();

async function answered(path: string, sent: Sent): Promise<Response> {
  const headers: Record<string, string> = {};
  if (sent.body !== undefined) headers['Content-Type'] = 'application/json';
  if (sent.file !== undefined) headers['Content-Type'] = sent.file.type;
  if (sent.rev !== undefined) headers['If-Match'] = String(sent.rev);
  if (sent.idempotencyKey !== undefined) headers['Idempotency-Key'] = sent.idempotencyKey;
  const body = sent.form ?? sent.file?.bytes ?? (sent.body === undefined ? undefined : JSON.stringify(sent.body));
  let response: Response;
  try {
    response = await fetch(apiUrl(path), {
      method: sent.method ?? 'GET',
      headers,
      credentials: base === '' ? 'same-origin' : 'include',
      signal: sent.signal ?? null,
      ...(body === undefined ? {} : { body }),
    });
  } catch (error) {
    if (sent.signal?.aborted) throw error;
    throw new OfflineError();
  }
  if (!response.ok) throw await errorOf(response);
  return response;
}
