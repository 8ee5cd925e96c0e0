import type { Request, RequestHandler } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import { tooManyRequests } from '../errors.ts';
import { isLoopbackAddress } from './loopback.ts';

const MINUTE_MS = 60_000;
const SIGN_IN_WINDOW_MS = 15 * MINUTE_MS;
/** Wrong passwords for one e-mail from one address. */
const SIGN_IN_FAILURES = 10;
/** Wrong passwords from one address whatever the e-mail: an office shares one, a guesser tries many names. */
const SIGN_IN_FAILURES_OF_ADDRESS = 100;

/** This machine is one address: its programs may choose among the 16 million of 127.0.0.0/8. */
function addressOf({ ip = '' }: Request): string {
  return isLoopbackAddress(ip) ? 'loopback' : ipKeyGenerator(ip);
}

interface Limit {
  readonly windowMs: number;
  readonly limit: number;
  readonly message: string;
  readonly keyOf: (req: Request) => string;
  /** Which answers count; all when absent. */
  readonly counts?: (status: number) => boolean;
}

// Counters are kept in memory: there is one process, and a restart that forgets them is no help to a guesser.
const limiter = ({ windowMs, limit, message, keyOf, counts }: Limit): RequestHandler =>
  rateLimit({
    windowMs,
    limit,
    keyGenerator: keyOf,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    // No proxy is trusted, so a forwarded address is rightly ignored.
    validate: { xForwardedForHeader: false, forwardedHeader: false },
    handler: (_req, _res, next) => next(tooManyRequests(message)),
    ...(counts === undefined
      ? {}
      : { skipSuccessfulRequests: true, requestWasSuccessful: (_req, res) => !counts(res.statusCode) }),
  });

export const limitRequests = (perMinute: number): RequestHandler =>
  limiter({
    windowMs: MINUTE_MS,
    limit: perMinute,
    message: 'Too many requests from this address. Wait a minute and try again.',
    keyOf: addressOf,
  });

const emailOf = (req: Request): string => {
  const body: unknown = req.body;
  const email = typeof body === 'object' && body !== null && 'email' in body ? body.email : '';
  return typeof email === 'string' ? email.trim().toLowerCase().slice(0, 200) : '';
};

/** Only failures count: whoever knows the password is never shut out by having signed in often. */
export const limitSignIn = (): RequestHandler[] => {
  const failures = {
    windowMs: SIGN_IN_WINDOW_MS,
    message: 'Too many failed attempts to sign in. Wait a quarter of an hour and try again.',
    counts: (status: number) => status === 401,
  };
  return [
    limiter({ ...failures, limit: SIGN_IN_FAILURES_OF_ADDRESS, keyOf: addressOf }),
    limiter({ ...failures, limit: SIGN_IN_FAILURES, keyOf: (req) => `${addressOf(req)} ${emailOf(req)}` }),
  ];
};
