import {
  SECTIONS_FILE_PATH,
  type SectionList,
  type TableFormat,
} from '#shared/contract/endpoints/file-endpoints.ts';
import { filtersText, type RangeFilters } from '#shared/sweep/range-filters.ts';
import type { View } from '#shared/sweep/problem.ts';
import { apiUrl } from '#client/src/lib/paths.ts';

interface SectionsAsked {
  readonly runId: string;
  readonly list: SectionList;
  readonly view: View;
  readonly bandShare: number;
  readonly filters: RangeFilters;
}

/** Where the service hands over what the run's page shows. */
export function sectionsFileUrl(
  { runId, list, view, bandShare, filters }: SectionsAsked,
  format: TableFormat,
): string {
  const query = new URLSearchParams({ list, x: view.x, y: view.y });
  if (list === 'front' && view.z) query.set('z', view.z);
  if (list === 'band') query.set('band', String(Math.round(bandShare * 1000) / 10));
  const ranges = filtersText(filters);
  if (ranges !== null) query.set('f', ranges);
  return `${apiUrl(SECTIONS_FILE_PATH, { id: runId, format })}?${query}`;
}
