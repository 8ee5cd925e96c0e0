import type { Issue } from '#shared/contract/errors.ts';
import { ApiError } from './api-error.ts';

/** Messages by the path of the contract, its keys joined by dots. */
export type FieldErrors = ReadonlyMap<string, string>;

/** The first message of each field. `root` is the part of the paths all fields share, left out of the keys. */
export function errorsByField(
  issues: readonly { readonly path: readonly PropertyKey[]; readonly message: string }[],
  root?: string,
): FieldErrors {
  const errors = new Map<string, string>();
  for (const { path, message } of issues) {
    const key = (path[0] === root ? path.slice(1) : path).map(String).join('.');
    if (!errors.has(key)) errors.set(key, message);
  }
  return errors;
}

/** The message of a field, or of the first of the values it holds. */
export function errorUnder(errors: FieldErrors, path: string): string | undefined {
  const own = errors.get(path);
  if (own !== undefined) return own;
  for (const [key, message] of errors) if (key.startsWith(`${path}.`)) return message;
  return undefined;
}

/** What the service found wrong, as issues; none for a failure of another kind. */
export const issuesOf = (error: unknown): readonly Issue[] => (error instanceof ApiError ? error.issues : []);
