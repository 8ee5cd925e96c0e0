import { useCallback, useMemo, useState } from 'react';
import type { Run } from '#shared/contract/records.ts';
import { isSameView, type View } from '#shared/sweep/problem.ts';
import type { DensityCell, FrontPoint, Point, ResultInThree, ViewResult } from '#shared/sweep/result.ts';
import type { ChartLayout, CloudSpot } from '#client/src/charts/front-chart.tsx';
import { bandWithin } from '#shared/sweep/band-within.ts';
import type { Cut, CutQuery } from './cut.ts';
import type { ExploreKey } from '#shared/sweep/explore-axis.ts';
import { filtersText, hasFilters, isWithinFilters, type RangeFilters } from '#shared/sweep/range-filters.ts';
import { filtersPart, type RunAddress } from './run-address.ts';
import type { RunAddressControls } from './use-run-address.ts';
import type { SectionSource } from './section-source.ts';
import { useFeasible, type FeasibleState } from './use-feasible.ts';

/** What the chart, the strip and the lists show: one set for all of them. */
export interface Shown {
  readonly front: readonly FrontPoint[];
  /** Null in two measures, and until it is found. */
  readonly inThree: ResultInThree | null;
  /** What has a mark, a drawing and a row: the front, in three measures where that is at hand. */
  readonly listed: readonly FrontPoint[];
  readonly band: readonly Point[];
  readonly isBandCut: boolean;
  readonly cells: readonly DensityCell[];
  /** The front without ranges where ranges are set. */
  readonly outline: readonly Point[];
  /** Sections within the ranges; null where only the listed ones could be asked. */
  readonly count: number | null;
}

export interface Explore {
  readonly state: FeasibleState;
  readonly filters: RangeFilters;
  /** `isSettled` once a hand has let go: only then the address follows. */
  readonly setFilters: (filters: RangeFilters, isSettled: boolean) => void;
  readonly shown: Shown;
  readonly spreads: Cut['spreads'];
  readonly axisCounts: Cut['axisCounts'] | null;
  readonly onLayout: (layout: ChartLayout) => void;
  readonly pick: (spot: CloudSpot) => Promise<number | null>;
}

const NOTHING: Shown = {
  ...{ front: [], inThree: null, listed: [], band: [], isBandCut: false },
  ...{ cells: [], outline: [], count: null },
};

interface ExploreInput {
  readonly run: Run;
  readonly view: View;
  readonly result: ViewResult | null;
  readonly isFinished: boolean;
  readonly source: SectionSource;
  readonly address: RunAddressControls;
  /** Whose spread is shown now. */
  readonly keys: readonly ExploreKey[];
}

/** Ranges while a hand drags one; the address is written when it lets go. */
function useFilters({ filters, write }: RunAddressControls) {
  const [draft, setDraft] = useState<RangeFilters | null>(null);
  const setFilters = useCallback(
    (next: RangeFilters, isSettled: boolean) => {
      setDraft(isSettled ? null : next);
      if (isSettled) write(filtersPart(next));
    },
    [write],
  );
  return { filters: draft ?? filters, setFilters };
}

function useQuery(
  { view, keys }: ExploreInput,
  filters: RangeFilters,
  { isXLog, isYLog }: Pick<RunAddress, 'isXLog' | 'isYLog'>,
) {
  const [layout, setLayout] = useState<ChartLayout | null>(null);
  const query = useMemo<CutQuery>(
    () => ({
      view,
      filters,
      keys,
      window:
        layout === null
          ? null
          : {
              x: { ...layout.x, isLog: isXLog, cells: layout.cells.x },
              y: { ...layout.y, isLog: isYLog, cells: layout.cells.y },
            },
    }),
    [view, filters, keys, layout, isXLog, isYLog],
  );
  return { query, onLayout: setLayout };
}

/** With what is listed of the front beside it. */
const withListed = (shown: Omit<Shown, 'listed'>): Shown => ({
  ...shown,
  listed: shown.inThree !== null && shown.inThree.points.length > 0 ? shown.inThree.points : shown.front,
});

interface Asked {
  readonly view: View;
  readonly result: ViewResult;
  readonly source: SectionSource;
}

/** The run's front in three measures; null while another view's result stands in for it. */
const ofRun = ({ view, result }: Pick<Asked, 'view' | 'result'>): ResultInThree | null =>
  isSameView(view, result.view) ? (result.frontInThree ?? null) : null;

/** Without the sections at hand, ranges sort out what the run listed by name; its cloud stays whole. */
function listedShown({ view, result, source }: Asked, filters: RangeFilters, share: number): Shown {
  const isKept = ({ index }: Point) => isWithinFilters(source.evaluatedAt(index), filters);
  const isFiltered = hasFilters(filters);
  const band = bandWithin(result, share);
  const inThree = ofRun({ view, result });
  return withListed({
    front: isFiltered ? result.front.filter(isKept) : result.front,
    inThree: isFiltered && inThree !== null ? keptOf(inThree, isKept) : inThree,
    band: isFiltered ? band.filter(isKept) : band,
    isBandCut: result.isBandCut && band.length === result.band.length,
    cells: result.density,
    outline: isFiltered ? result.front : [],
    count: isFiltered ? null : result.feasible,
  });
}

function keptOf({ count, points }: ResultInThree, isKept: (point: Point) => boolean): ResultInThree {
  const kept = points.filter(isKept);
  // Where not all of them were listed, how many lie within the ranges is not known.
  return { count: count === points.length ? kept.length : null, points: kept };
}

function cutShown({ view, result }: Asked, cut: Cut, share: number, isFiltered: boolean): Shown {
  const band = bandWithin({ view: result.view, front: cut.front, band: cut.band }, share);
  return withListed({
    front: isFiltered ? cut.front : result.front,
    inThree: isFiltered ? cut.inThree : ofRun({ view, result }),
    band: isFiltered ? band : bandWithin(result, share),
    isBandCut: cut.isBandCut && band.length === cut.band.length,
    cells: cut.density ?? result.density,
    outline: isFiltered ? result.front : [],
    count: cut.count,
  });
}

export function useExplore(input: ExploreInput): Explore {
  const { run, view, result, isFinished, source, address } = input;
  const { filters, setFilters } = useFilters(address);
  const { query, onLayout } = useQuery(input, filters, address);
  const feasible = useFeasible(run, { isFinished, feasible: result?.feasible ?? null }, query);
  const { bandShare, isXLog, isYLog } = address;
  const answered = feasible.cut;
  const cut = answered !== null && isSameView(answered.of.view, view) ? answered : null;

  const shown = useMemo(() => {
    if (result === null) return NOTHING;
    const asked = { view, result, source };
    if (cut === null) return listedShown(asked, filters, bandShare);
    return cutShown(asked, cut.cut, bandShare, filtersText(cut.of.filters) !== null);
  }, [view, result, cut, filters, bandShare, source]);

  const { pick: ask } = feasible;
  const pick = useCallback(
    (spot: CloudSpot) =>
      ask({
        view,
        filters,
        at: spot.at,
        perPx: spot.perPx,
        reachPx: spot.reachPx,
        isLog: { x: isXLog, y: isYLog },
      }),
    [ask, view, filters, isXLog, isYLog],
  );
  return {
    state: feasible.state,
    filters,
    setFilters,
    shown,
    spreads: cut?.cut.spreads ?? NO_SPREADS,
    axisCounts: cut?.cut.axisCounts ?? null,
    onLayout,
    pick,
  };
}

const NO_SPREADS: Cut['spreads'] = {};
