/** Parts of a run's address that say something of that run's own sections. */
const OF_ONE_RUN = ['i', 'zx', 'zy'];

/**
 * What of a run's address goes on to the next run of the same sweep, with its question mark: measures, ranges, columns, band. The
 * chosen section and the enlarged part belong to the run they were chosen on.
 */
export function carriedSearch(search: string, without: readonly string[] = []): string {
  const params = new URLSearchParams(search);
  for (const key of [...OF_ONE_RUN, ...without]) params.delete(key);
  const text = params.toString();
  return text === '' ? '' : `?${text}`;
}
