import type { ErrorRequestHandler, Request } from 'express';
import type { ErrorBody } from '#shared/contract/errors.ts';
import { isDatabaseAway } from '../db/database-error.ts';
import { databaseAway, HttpError, internalError, unreadableRequest } from '../errors.ts';
import type { Log } from '../log.ts';

/** By the `type` that the body parser puts on its errors. */
const UNREADABLE: Readonly<Record<string, string>> = {
  'entity.parse.failed': 'The body is not valid JSON',
  'entity.too.large': 'The body is too large',
  'encoding.unsupported': 'The encoding of the body is not supported',
  'charset.unsupported': 'The body must be UTF-8',
};

const textOf = (error: object, key: string): string => (key in error ? String(Reflect.get(error, key)) : '');

/** Given by request-log.ts, before anything can fail. */
const requestIdOf = ({ id }: Request): string => (typeof id === 'string' ? id : '');

/** Errors of the packages in front of the handlers carry a 4xx status; everything else unknown is ours. */
function toHttpError(error: unknown): HttpError {
  if (error instanceof HttpError) return error;
  if (isDatabaseAway(error)) return databaseAway();
  if (typeof error !== 'object' || error === null) return internalError();
  const status = Number(textOf(error, 'status'));
  if (status < 400 || status >= 500 || !Number.isInteger(status)) return internalError();
  return unreadableRequest(status, UNREADABLE[textOf(error, 'type')] ?? 'The request could not be read');
}

/** The one way out for every refusal and failure. Express tells it by its four parameters. */
export const errorHandler =
  (log: Log): ErrorRequestHandler =>
  (error: unknown, req, res, next) => {
    const { status, code, message, issues } = toHttpError(error);
    if (status >= 500) log.error({ err: error, requestId: req.id }, message);
    if (res.headersSent) {
      next(error);
      return;
    }
    const body: ErrorBody = { error: { code, message, issues: [...issues], requestId: requestIdOf(req) } };
    res.status(status).json(body);
  };
