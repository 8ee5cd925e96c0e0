import type { z } from 'zod';
import type { Issue } from '#shared/contract/errors.ts';
import { invalidInput, notFound } from '../errors.ts';

type Path = Issue['path'];
type RawIssue = z.core.$ZodIssue;

const plainPath = (path: readonly PropertyKey[]): Path =>
  path.map((part) => (typeof part === 'symbol' ? String(part) : part));

/** All issues with their full paths. Of a union's branches the one nearest to fitting speaks. */
function plainIssues(issues: readonly RawIssue[], base: readonly PropertyKey[] = []): Issue[] {
  return issues.flatMap((issue) => {
    const path = [...base, ...issue.path];
    const branches = issue.code === 'invalid_union' ? [...issue.errors] : [];
    const nearest = branches.sort((a, b) => a.length - b.length)[0];
    if (nearest !== undefined && nearest.length > 0) return plainIssues(nearest, path);
    return [{ path: plainPath(path), message: issue.message }];
  });
}

/** PostgreSQL stores neither U+0000 nor half a surrogate pair. */
const isStorable = (text: string) => !/\0|\p{Surrogate}/u.test(text);

function findUnstorableText(value: unknown, path: Path = []): Issue[] {
  if (typeof value === 'string') {
    return isStorable(value) ? [] : [{ path, message: 'The text holds a character that cannot be stored' }];
  }
  if (typeof value !== 'object' || value === null) return [];
  if (Array.isArray(value)) return value.flatMap((entry, i) => findUnstorableText(entry, [...path, i]));
  return Object.entries(value).flatMap(([key, entry]) => findUnstorableText(entry, [...path, key]));
}

export function requireValidBody<S extends z.ZodType>(schema: S, body: unknown): z.infer<S> {
  const parsed = schema.safeParse(body);
  if (!parsed.success) throw invalidInput(plainIssues(parsed.error.issues));
  const unstorable = findUnstorableText(parsed.data);
  if (unstorable.length > 0) throw invalidInput(unstorable);
  return parsed.data;
}

/** An address whose parts cannot name anything names nothing: 404, not 400. */
export function requireValidParams<S extends z.ZodType>(schema: S, params: unknown): z.infer<S> {
  const parsed = schema.safeParse(params);
  if (!parsed.success) throw notFound('This address');
  return parsed.data;
}
