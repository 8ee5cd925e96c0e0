import type { ErrorCode, Issue } from '#shared/contract/errors.ts';

/** Everything the service refuses with. Made by the functions below, answered by http/error-handler.ts. */
export class HttpError extends Error {
  override readonly name = 'HttpError';
  readonly status: number;
  readonly code: ErrorCode;
  readonly issues: readonly Issue[];

  constructor({ status, code, message, issues = [] }: HttpErrorInit) {
    super(message);
    this.status = status;
    this.code = code;
    this.issues = issues;
  }
}

interface HttpErrorInit {
  readonly status: number;
  readonly code: ErrorCode;
  readonly message: string;
  readonly issues?: readonly Issue[];
}

export const invalidInput = (issues: readonly Issue[], message = 'Some of the input cannot be used') =>
  new HttpError({ status: 400, code: 'invalid-input', message, issues });

/** A request that cannot even be read: broken JSON, too large, an unknown encoding. */
export const unreadableRequest = (status: number, message: string) =>
  new HttpError({ status, code: 'invalid-input', message });

export const unauthenticated = () =>
  new HttpError({
    status: 401,
    code: 'unauthenticated',
    message: 'You are not signed in, or your session has ended. Sign in again to go on.',
  });

/** The same words whether the e-mail is unknown, the password is wrong or the account is shut. */
export const wrongCredentials = () =>
  new HttpError({
    status: 401,
    code: 'wrong-credentials',
    message: 'The e-mail and the password do not belong together',
  });

export const csrfRefused = () =>
  new HttpError({
    status: 403,
    code: 'csrf',
    message: 'This page is out of date with your session. Reload it and try again.',
  });

export const forbidden = (message: string) => new HttpError({ status: 403, code: 'forbidden', message });

/** Also the answer for what exists but is none of the reader's business. `what` begins the sentence: "Beam". */
export const notFound = (what: string) =>
  new HttpError({ status: 404, code: 'not-found', message: `${what} was not found` });

export const conflict = (message: string, issues: readonly Issue[] = []) =>
  new HttpError({ status: 409, code: 'conflict', message, issues });

export const tooManySections = (message: string, issues: readonly Issue[]) =>
  new HttpError({ status: 422, code: 'too-many-sections', message, issues });

export const tooManyRequests = (message: string) =>
  new HttpError({ status: 429, code: 'too-many-requests', message });

export const databaseAway = () =>
  new HttpError({
    status: 503,
    code: 'internal',
    message: 'The database does not answer at the moment. Nothing was changed; try again shortly.',
  });

export const internalError = () =>
  new HttpError({
    status: 500,
    code: 'internal',
    message: 'Something went wrong on our side. Nothing was changed; the request id helps to find out why.',
  });
