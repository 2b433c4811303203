import type { ErrorCode } from '../shared/contracts/errors';

interface Details {
  readonly fields?: Record<string, string>;
  readonly current?: unknown;
}

/** An error whose message is meant for the person who asked. */
export class AppError extends Error {
  constructor(
    readonly code: ErrorCode,
    message: string,
    readonly details: Details = {},
  ) {
    super(message);
    this.name = 'AppError';
  }
}

export const invalidRequest = (message: string, fields?: Record<string, string>) =>
  new AppError('invalid_request', message, fields ? { fields } : {});

/** Also the answer for a thing that is somebody else's. */
export const notFound = () => new AppError('not_found', 'There is nothing at this address, or it is not yours to see.');

export const notAllowed = (message = 'Your role does not allow this.') => new AppError('not_allowed', message);

export const conflict = (message: string, current?: unknown) => new AppError('conflict', message, current === undefined ? {} : { current });

export const noSpace = () => new AppError('no_space', 'The disk of the server is full. What arrived is kept; tell whoever looks after it, then send the rest.');

/** Whether a write failed because the disk has no room, or the person's share of it. */
export const isDiskFull = (error: unknown): boolean => error instanceof Error && 'code' in error && (error.code === 'ENOSPC' || error.code === 'EDQUOT' || error.code === 'SQLITE_FULL');
