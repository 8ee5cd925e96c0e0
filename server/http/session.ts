import type { RequestHandler } from 'express';
import session, { type Store } from 'express-session';
import type { Config } from '../config.ts';

declare module 'express-session' {
  interface SessionData {
    /** Who is signed in; absent before that. */
    personId?: string;
  }
}

/** A working day and the evening after it, counted from the last request. */
const SESSION_MS = 12 * 60 * 60 * 1000;
const COOKIE = 'fairweight.sid';

export const sessionMiddleware = (config: Config, store: Store): RequestHandler =>
  session({
    name: COOKIE,
    secret: config.sessionSecret,
    store,
    resave: false,
    saveUninitialized: false,
    rolling: true,
    // `auto`: marked Secure where the request came over TLS; on loopback it does not.
    cookie: { httpOnly: true, sameSite: 'lax', secure: 'auto', maxAge: SESSION_MS },
  });
