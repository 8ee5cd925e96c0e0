import { csrfSync } from 'csrf-sync';
import type { Request } from 'express';
import { csrfRefused } from '../errors.ts';

/** Synchroniser tokens: GET /api/session hands one out, every other method must send it back in `x-csrf-token`. */
const { generateToken, isRequestValid } = csrfSync({ size: 32 });

export const csrfTokenOf = (req: Request): string => generateToken(req);

export function requireCsrfToken(req: Request): void {
  if (!isRequestValid(req)) throw csrfRefused();
}
