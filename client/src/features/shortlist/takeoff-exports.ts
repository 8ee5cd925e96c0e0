import { TAKEOFF_FILE_PATH, type TableFormat } from '#shared/contract/endpoints/file-endpoints.ts';
import { apiUrl } from '#client/src/lib/paths.ts';
import { fetchAndSave } from '#client/src/lib/save-file.ts';
import type { ExportGroup } from '#client/src/ui/export-menu.tsx';

function takeoffUrl(projectId: string, pins: readonly string[], format: TableFormat): string {
  const query = pins.length === 0 ? '' : `?pins=${pins.join(',')}`;
  return `${apiUrl(TAKEOFF_FILE_PATH, { id: projectId, format })}${query}`;
}

/** The takeoff of these candidates, the first being what the others are compared with; of all that stand without a choice. */
export function takeoffExports(
  { id }: { readonly id: string },
  pins: readonly string[],
  which = pins.length === 0 ? 'all that stand' : `${pins.length} ticked`,
): ExportGroup {
  return {
    name: 'Takeoff',
    items: [
      {
        label: 'Takeoff, XLSX',
        note: `${which}; recalculates with the rates in its cells`,
        run: () => fetchAndSave(takeoffUrl(id, pins, 'xlsx'), 'takeoff.xlsx'),
      },
      {
        label: 'Takeoff, CSV',
        note: `${which}; one line for each size and position`,
        run: () => fetchAndSave(takeoffUrl(id, pins, 'csv'), 'takeoff.csv'),
      },
    ],
  };
}
