import type { FieldPath, FieldValues, UseFormSetError } from 'react-hook-form';
import { ApiError, messageOf } from './api-error.ts';

/**
 * Puts each issue of a refusal beside its field. Returns what belongs to no field, to be shown at the form's foot;
 * null when every issue found its place.
 */
export function placeIssues<F extends FieldValues>(
  error: unknown,
  setError: UseFormSetError<F>,
  hasField: (path: string) => boolean,
): string | null {
  if (!(error instanceof ApiError) || error.issues.length === 0) return messageOf(error);
  const homeless: string[] = [];
  let isFirst = true;
  for (const issue of error.issues) {
    const path = issue.path.join('.');
    if (hasField(path)) {
      setError(path as FieldPath<F>, { type: 'server', message: issue.message }, { shouldFocus: isFirst });
      isFirst = false;
    } else homeless.push(issue.message);
  }
  return homeless.length === 0 ? null : homeless.join(' ');
}
