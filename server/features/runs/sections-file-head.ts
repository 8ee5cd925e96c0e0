import type { SectionList } from '#shared/contract/endpoints/file-endpoints.ts';
import { notCheckedFor } from '#shared/engine/not-checked.ts';
import { ruleSetOf } from '#shared/engine/rules/rule-set-of.ts';
import { unitSystemLabel } from '#shared/print/basis-labels.ts';
import { formatNumber, formatWhole } from '#shared/print/format-quantity.ts';
import { measureLabel } from '#shared/print/measure-labels.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import { rangeWords } from '#shared/print/range-words.ts';
import { filterEntries, type RangeFilters } from '#shared/sweep/range-filters.ts';
import type { View } from '#shared/sweep/problem.ts';
import type { HeadLine } from '../../files/table-file.ts';
import type { RunRecord, ViewRow } from './queries.ts';

export interface SectionsAsked {
  readonly list: SectionList;
  readonly filters: RangeFilters;
  readonly bandShare: number;
  readonly view: View;
}

function listWords({ list, bandShare, view }: SectionsAsked, reader: MeasureReader): string {
  const [x, y, z] = [view.x, view.y, ...(view.z ? [view.z] : [])].map((measure) => {
    const { name, betterText } = measureLabel(measure, reader.units, reader.code);
    return `${name} (${betterText})`;
  });
  if (list === 'front' && z !== undefined)
    return `Front of ${x}, ${y} and ${z}: none can be bettered in one without loss in another`;
  if (list === 'front') return `Front of ${x} and ${y}: none is better in both`;
  if (list === 'band')
    return `Near-best band: within ${formatNumber(bandShare * 100, 3, true)} % of the best ${x}`;
  return `All that meet the listed checks, the best ${x} first`;
}

/** What stands above the sections of a run: where they come from, what was asked, and what they are not. No clock is read. */
export function sectionsFileHead(
  { run, sweep, beam, project }: RunRecord,
  view: ViewRow,
  asked: SectionsAsked & { readonly reader: MeasureReader },
): readonly HeadLine[] {
  const { reader } = asked;
  const { title } = ruleSetOf(run.basis);
  const ranges = filterEntries(asked.filters).map(([key, range]) => rangeWords(key, range, reader));
  const evaluated = `${formatWhole(view.evaluated)} of ${formatWhole(run.sectionCount)}`;
  return [
    ['Project', `${project.name} (${project.number})`],
    ['Beam', `${beam.mark} ${beam.location}`.trim()],
    ['Sweep', sweep.name],
    ['Run', run.number],
    ['Started', run.createdAt.toISOString()],
    ['Sections evaluated', view.state === 'finished' ? evaluated : `${evaluated}, ${view.state}`],
    ['Hash of the result', view.hash ?? 'none: the run is not finished'],
    ['Design code', title],
    ['Engine of the run', run.engineVersion],
    ['Units', unitSystemLabel(reader.units)],
    ['Sections', listWords(asked, reader)],
    ['Ranges', ranges.length === 0 ? 'none' : ranges.join('; ')],
    [
      'What it says',
      `Each section meets the listed checks of ${title}, and nothing is said of what is not listed.`,
    ],
    ['Not checked', notCheckedFor(run.basis, run.definition.demand).join('; ')],
    ['Caution', 'A licensed engineer verifies the design under the codes that apply at the site.'],
  ];
}
