import type { ErrorRequestHandler, RequestHandler } from 'express';
import multer from 'multer';
import { errorStatuses, type ErrorBody } from '../../shared/contracts/errors';
import type { Context } from '../context';
import { AppError, invalidRequest, isDiskFull, noSpace, notFound } from '../errors';

interface WithStatus {
  readonly status?: number;
  readonly type?: string;
}

/** Errors of the middleware before us, in our own words. */
function asAppError(error: unknown): AppError | null {
  if (error instanceof AppError) return error;
  if (isDiskFull(error)) return noSpace();
  if (error instanceof multer.MulterError) {
    return error.code === 'LIMIT_FILE_SIZE' ? new AppError('too_large', 'A part holds at most 8 MiB.') : invalidRequest(`The upload is not as described: ${error.message}.`);
  }
  const { status, type } = (typeof error === 'object' && error !== null ? error : {}) as WithStatus;
  if (type === 'entity.too.large') return new AppError('too_large', 'The request is too large.');
  if (type === 'entity.parse.failed') return invalidRequest('The request is not valid JSON.');
  if (status === 400) return invalidRequest('The address or the request could not be understood.');
  return null;
}

export const unknownAddress: RequestHandler = () => {
  throw notFound();
};

/** Body of every error: code, sentence, fields, request id. What is unknown is logged whole and answered plainly. */
export const errorHandler =
  ({ log }: Pick<Context, 'log'>): ErrorRequestHandler =>
  (error: unknown, req, res, next) => {
    if (res.headersSent) {
      next(error);
      return;
    }
    const requestId = String(req.id);
    const known = asAppError(error);
    if (!known) log.error({ err: error, requestId }, 'unexpected');
    const shown = known ?? new AppError('internal', 'Something went wrong on the server. Nothing was stored by this request.');
    const body: ErrorBody = { error: { code: shown.code, message: shown.message, ...shown.details, requestId } };
    res.status(errorStatuses[shown.code]).json(body);
  };
