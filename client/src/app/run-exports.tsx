import type { RefObject } from 'react';
import { MOST_ROWS_IN_FILE, type SectionList } from '#shared/contract/endpoints/file-endpoints.ts';
import type { Project, Run } from '#shared/contract/records.ts';
import { ruleSetLabel } from '#shared/print/basis-labels.ts';
import { exploreLabel } from '#shared/print/explore-label.ts';
import { fileName } from '#shared/print/file-name.ts';
import { formatNumber, formatWhole } from '#shared/print/format-quantity.ts';
import { rangeWords } from '#shared/print/range-words.ts';
import { filterEntries, hasFilters } from '#shared/sweep/range-filters.ts';
import type { FrontPicture } from '#client/src/charts/front-chart-input.ts';
import { ratesWords } from '#client/src/features/run/asked-rates.ts';
import { sectionsFileUrl } from '#client/src/features/run/sections-file-url.ts';
import type { useRunView } from '#client/src/features/run/use-run-view.ts';
import { fetchAndSave, saveFile } from '#client/src/lib/save-file.ts';
import { addressExports } from '#client/src/ui/address-exports.ts';
import { ExportMenu, type ExportGroup, type ExportItem } from '#client/src/ui/export-menu.tsx';

interface RunExportsProps {
  readonly run: Run;
  readonly project: Project;
  readonly state: ReturnType<typeof useRunView>;
  /** What the chart last drew. */
  readonly picture: RefObject<FrontPicture | null>;
}

const FORMATS = ['csv', 'xlsx'] as const;

function sectionItems({ run, state }: RunExportsProps): ExportItem[] {
  const { explore, address, view, result } = state;
  const { filters, shown } = explore;
  const isFinished = state.progress?.state === 'finished';
  const lists: readonly { list: SectionList; words: string; count: number | null; note: string }[] = [
    {
      list: 'front',
      words: view.z ? 'Front in three measures' : 'Front',
      count: shown.listed.length,
      note: `${formatWhole(shown.inThree?.count ?? shown.listed.length)} sections`,
    },
    {
      list: 'band',
      words: `Near-best band, ${formatNumber(address.bandShare * 100, 3, true)} %`,
      count: shown.isBandCut ? null : shown.band.length,
      note: `${shown.isBandCut ? 'over ' : ''}${formatWhole(shown.band.length)} sections`,
    },
    {
      list: 'all',
      words: hasFilters(filters) ? 'All within the ranges' : 'All that meet the checks',
      count: shown.count,
      note: shown.count === null ? 'every section, the best first' : `${formatWhole(shown.count)} sections`,
    },
  ];
  return lists
    .filter(({ list }) => list !== 'band' || address.bandShare > 0)
    .flatMap(({ list, words, count, note }) => {
      const isTooLong = address.rates === null && count !== null && count > MOST_ROWS_IN_FILE;
      const isUnavailable = result === null || isTooLong || (list === 'all' && !isFinished);
      const asked = { runId: run.id, list, view, bandShare: address.bandShare, filters };
      return FORMATS.map((format) => ({
        label: `${words}, ${format.toUpperCase()}`,
        note: isTooLong
          ? `${note}: more than ${formatWhole(MOST_ROWS_IN_FILE)}, set a range`
          : address.rates === null
            ? note
            : 'at the run’s own rates, not those on the page',
        isUnavailable,
        run: () => fetchAndSave(sectionsFileUrl(asked, format), `sections.${format}`),
      }));
    });
}

/** What a chart that lies alone on somebody's disk has to say. */
function captionOf({ run, project, state }: RunExportsProps): string[] {
  const { address, explore, progress, reader } = state;
  const { third, markStyle, bandShare } = address;
  const ranges = filterEntries(explore.filters).map(([key, range]) => rangeWords(key, range, reader));
  const shown = [
    address.rates === null ? '' : `ranked at ${ratesWords(address.rates)}: no record of the run`,
    bandShare > 0 ? `near-best band ${formatNumber(bandShare * 100, 3, true)} %` : '',
    third === null
      ? ''
      : `marks ${markStyle === 'tint' ? 'tinted' : 'sized'} by ${exploreLabel(third, reader).name}`,
    ranges.length === 0 ? '' : `only ${ranges.join(', ')}`,
  ].filter((part) => part !== '');
  const hash = progress?.state === 'finished' ? (state.result?.hash ?? '') : 'none yet';
  const part = progress !== null && progress.state !== 'finished' ? `, ${progress.state}` : '';
  return [
    `${project.name} (${project.number}) · ${run.beam.mark} ${run.beam.location} · ${run.sweepName}, run ${run.number}`,
    `${formatWhole(progress?.evaluated ?? 0)} of ${formatWhole(run.sectionCount)} sections evaluated${part} · hash ${hash} · engine ${run.engineVersion} · ${ruleSetLabel(run.basis.ruleSet)}`,
    ...(shown.length === 0 ? [] : [`Shown: ${shown.join('; ')}`]),
    'Each section drawn meets the listed checks. A licensed engineer verifies the design under the codes that apply.',
  ];
}

function chartGroup(props: RunExportsProps): ExportGroup {
  const { run, project, picture, state } = props;
  const measures = [state.view.y, state.view.x].map((measure) => exploreLabel(measure, state.reader).name);
  const name = (extension: string) =>
    fileName([project.number, run.beam.mark, 'run', run.number, ...measures], extension);
  const drawn = () => {
    if (picture.current === null) throw new Error('There is no chart yet');
    return picture.current;
  };
  const isUnavailable = state.result === null || state.result.front.length === 0;
  return {
    name: 'Chart as shown',
    items: [
      {
        label: 'Chart as SVG',
        isUnavailable,
        run: async () => {
          const { frontPictureSvg } = await import('#client/src/charts/front-picture.ts');
          saveFile(frontPictureSvg(drawn(), captionOf(props)), name('svg'), 'image/svg+xml');
        },
      },
      {
        label: 'Chart as PNG',
        isUnavailable,
        run: async () => {
          const { frontPicturePng } = await import('#client/src/charts/front-picture.ts');
          saveFile(await frontPicturePng(drawn(), captionOf(props)), name('png'));
        },
      },
    ],
  };
}

/** Everything of a run that can be taken away: its sections, the chart as it stands, the address. */
export function RunExports(props: RunExportsProps) {
  return (
    <ExportMenu
      groups={[{ name: 'Sections', items: sectionItems(props) }, chartGroup(props), addressExports()]}
    />
  );
}
