/** The value, or a failed test: for results a section of the test must have. */
export function nonNull<T>(value: T | null | undefined): T {
  if (value === null || value === undefined) throw new Error('a result is missing');
  return value;
}
