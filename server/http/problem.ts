import type { ErrorRequestHandler, Request, Response } from 'express';
import { MulterError } from 'multer';
import type { Logger } from 'pino';
import { z } from 'zod';
import type { Problem } from '../contract/common';
import { AppError, ERROR_STATUS, ERROR_TITLE, errorOfPostgres } from '../errors';
import { faultsOfZod } from '../plain-faults';
import { maskTokens } from './mask-tokens';
import { requestIdOf } from './request-id';

/** Any thrown thing as an AppError; unknown ones become a plain "internal" that gives nothing away. */
function toAppError(error: unknown, uploadLimitMb: number): AppError {
  if (error instanceof AppError) return error;
  if (error instanceof z.ZodError)
    return new AppError('invalid', 'Some values are not allowed.', { faults: faultsOfZod(error, 'body') });
  if (error instanceof MulterError)
    return error.code === 'LIMIT_FILE_SIZE'
      ? new AppError('too-large', `The file is larger than ${uploadLimitMb} MB.`)
      : new AppError('bad-request', `The upload could not be read: ${error.message}.`);
  if (error instanceof Error && 'type' in error) {
    if (error.type === 'entity.too.large')
      return new AppError('too-large', 'The request is larger than 8 MB.');
    if (error.type === 'entity.parse.failed')
      return new AppError('bad-request', 'The body is not valid JSON.');
    if (typeof error.type === 'string' && /^(encoding|charset)\.unsupported$/.test(error.type))
      return new AppError('unsupported-media', 'The encoding of the body is not supported.');
  }
  if (error instanceof Error && 'status' in error && error.status === 400)
    return new AppError('bad-request', 'The request could not be read.');
  return errorOfPostgres(error) ?? new AppError('internal', 'The fault has been logged. Try again.');
}

export function sendProblem(request: Request, response: Response, error: AppError): void {
  const status = ERROR_STATUS[error.code];
  const problem: Problem = {
    type: `/api/docs/problems#${error.code}`,
    title: ERROR_TITLE[error.code],
    status,
    code: error.code,
    detail: error.message,
    instance: request.originalUrl.split('?')[0] ?? '',
    requestId: requestIdOf(request),
    ...(error.details.faults && { faults: error.details.faults }),
    ...(error.details.current !== undefined && { current: error.details.current }),
  };
  if (error.details.retryAfterS) response.set('Retry-After', String(Math.ceil(error.details.retryAfterS)));
  response.status(status).type('application/problem+json').send(JSON.stringify(problem));
}

export const problemHandler =
  (log: Logger, uploadLimitMb: number): ErrorRequestHandler =>
  (error: unknown, request, response, next) => {
    const told = toAppError(error, uploadLimitMb);
    if (told.code === 'internal' || told.code === 'unavailable')
      log.error(
        { err: error, requestId: requestIdOf(request), path: maskTokens(request.originalUrl) },
        'request failed',
      );
    if (response.headersSent) return next(error);
    sendProblem(request, response, told);
  };
