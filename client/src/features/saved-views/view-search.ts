import { viewAddressSchema, type SavedView, type ViewAddress } from '#shared/contract/saved-view.ts';
import { measureLabel } from '#shared/print/measure-labels.ts';
import { MEASURE_IDS, type MeasureId } from '#shared/engine/measures.ts';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { paths } from '#client/src/lib/paths.ts';

/**
 * What is kept of an address: everything in it, and what it leaves to the page's own choice said out loud, so that the view
 * shows the same when that choice becomes another.
 */
export function keptAddress(
  params: URLSearchParams,
  said: Readonly<Record<string, string | null>>,
): ViewAddress {
  const address: Record<string, string> = {};
  const one = viewAddressSchema.safeParse.bind(viewAddressSchema);
  for (const [key, value] of params) if (one({ [key]: value }).success) address[key] = value;
  for (const [key, value] of Object.entries(said)) if (value !== null) address[key] = value;
  return address;
}

const searchOf = (address: ViewAddress): string => new URLSearchParams(address).toString();

/** The run's page as it was saved. */
export const viewPath = (projectId: string, { runId, address }: SavedView): string =>
  `${paths.run(projectId, runId)}?${searchOf(address)}`;

/** Whether two addresses show the same, whichever section is chosen. */
export function isSameView(a: ViewAddress, b: ViewAddress): boolean {
  const parts = (address: ViewAddress) =>
    JSON.stringify(
      Object.entries(address)
        .filter(([key]) => key !== 'i')
        .sort(([one], [other]) => one.localeCompare(other)),
    );
  return parts(a) === parts(b);
}

const isMeasure = (text: string | undefined): text is MeasureId => MEASURE_IDS.some((id) => id === text);

/** `Depth against Steel, filtered`: what a view shows, in a few words. */
export function viewWords({ address }: SavedView, units: UnitSystem): string {
  const { x, y, f } = address;
  const name = (measure: MeasureId) => measureLabel(measure, units).name;
  const pair =
    isMeasure(x) && isMeasure(y) ? `${name(y)} against ${name(x).toLowerCase()}` : 'Measures of the run';
  return f === undefined || f === '' ? pair : `${pair}, filtered`;
}
