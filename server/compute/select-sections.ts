import { MEASURE_DIRECTION, MEASURE_IDS, type MeasureId } from '#shared/engine/measures.ts';
import { inputPlace, inputValues, isInputKey, type ExploreKey } from '#shared/sweep/explore-axis.ts';
import { FrontBuilder } from '#shared/sweep/front.ts';
import { FrontInThreeBuilder, MOST_HELD_IN_THREE } from '#shared/sweep/front-in-three.ts';
import { prepareSweep, type PreparedSweep } from '#shared/sweep/prepared-sweep.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import {
  filterEntries,
  highestWithin,
  lowestWithin,
  type RangeFilters,
  type ValueRange,
} from '#shared/sweep/range-filters.ts';
import { sweepColumns } from '#shared/sweep/sweep-range.ts';

/** Sections judged at a time: their columns are 6 MB. */
const STEP = 2 ** 16;
/** Rounding of the last digit must not drop a section that lies on the edge of the band. */
const BAND_SLACK = 1e-9;

export interface SelectQuery {
  readonly problem: SweepProblem;
  readonly view: View;
  readonly list: 'front' | 'band' | 'all';
  /** Near-best band as a share of the best leading measure. */
  readonly bandShare: number;
  readonly filters: RangeFilters;
  /** More than so many are counted and not kept. */
  readonly most: number;
}

export interface SelectedSection {
  readonly index: number;
  /** Sections with exactly these two measures; 1 off the front. */
  readonly tieCount: number;
}

/** Sections that meet every check and lie within the ranges, best leading measure first; `sections` is null beyond `most`. */
export interface Selection {
  readonly count: number;
  readonly sections: readonly SelectedSection[] | null;
}

type Visit = (index: number, measures: Float64Array, at: number) => void;
type Test = (index: number, measures: Float64Array, at: number) => boolean;

const isWithin = (value: number, low: number, high: number) => value >= low && value <= high;

function testOf({ space, problem }: PreparedSweep, name: ExploreKey, range: ValueRange): Test {
  const [low, high] = [lowestWithin(range), highestWithin(range)];
  if (!isInputKey(name)) {
    const place = MEASURE_IDS.indexOf(name);
    return (_index, measures, at) => isWithin(measures[at + place]!, low, high);
  }
  const values = inputValues(space, problem.basis.barStandard)[name];
  const isKept = values.map((value) => isWithin(value, low, high));
  const placeOf = inputPlace(space, name);
  return (index) => isKept[placeOf(index)]!;
}

/** Judges the whole space again, by the hot loop, and shows what meets every check and lies within the ranges. */
function visitWithin(prepared: PreparedSweep, filters: RangeFilters, visit: Visit): void {
  const tests = filterEntries(filters).map(([key, range]) => testOf(prepared, key, range));
  const { size } = prepared.space;
  for (let from = 0; from < size; from += STEP) {
    const { masks, measures } = sweepColumns(prepared, from, Math.min(from + STEP, size));
    for (let place = 0; place < masks.length; place++) {
      if (masks[place] !== 0) continue;
      const at = place * MEASURE_IDS.length;
      if (tests.every((test) => test(from + place, measures, at))) visit(from + place, measures, at);
    }
  }
}

const signOf = (measure: MeasureId) => (MEASURE_DIRECTION[measure] === 'less' ? 1 : -1);

function selectFront(prepared: PreparedSweep, { view, filters }: SelectQuery): Selection {
  const front = new FrontBuilder();
  const [x, y] = [MEASURE_IDS.indexOf(view.x), MEASURE_IDS.indexOf(view.y)];
  const [sx, sy] = [signOf(view.x), signOf(view.y)];
  visitWithin(prepared, filters, (index, measures, at) =>
    front.add(sx * measures[at + x]!, sy * measures[at + y]!, index),
  );
  const sections = front.ties.map((ties, i) => ({ index: ties[0]!, tieCount: front.tieCounts[i]! }));
  return { count: sections.length, sections };
}

/** The front in three measures; `sections` is null where it is too long to be held. */
function selectFrontInThree(
  prepared: PreparedSweep,
  { view, filters }: SelectQuery,
  third: MeasureId,
): Selection {
  const front = new FrontInThreeBuilder();
  const [x, y, z] = [view.x, view.y, third].map((measure) => MEASURE_IDS.indexOf(measure)) as Three;
  const [sx, sy, sz] = [view.x, view.y, third].map(signOf) as Three;
  visitWithin(prepared, filters, (index, measures, at) =>
    front.add(sx * measures[at + x]!, sy * measures[at + y]!, sz * measures[at + z]!, index),
  );
  const { tieCounts, ties, tieEnds, isTooLong } = front.finish();
  if (isTooLong) return { count: MOST_HELD_IN_THREE, sections: null };
  const sections = Array.from(tieCounts, (tieCount, i) => ({
    index: ties[i === 0 ? 0 : tieEnds[i - 1]!]!,
    tieCount,
  }));
  return { count: sections.length, sections };
}

type Three = [number, number, number];

interface Placed extends SelectedSection {
  readonly x: number;
}

/** Those whose leading measure is at most so much, oriented. A section without it comes last. */
function selectUpTo(prepared: PreparedSweep, query: SelectQuery, limit: number): Selection {
  const x = MEASURE_IDS.indexOf(query.view.x);
  const sx = signOf(query.view.x);
  const kept: Placed[] = [];
  let count = 0;
  visitWithin(prepared, query.filters, (index, measures, at) => {
    const value = sx * measures[at + x]!;
    if (value > limit || (limit !== Infinity && value !== value)) return;
    if (count++ < query.most) kept.push({ index, x: value, tieCount: 1 });
  });
  if (count > query.most) return { count, sections: null };
  const last = (value: number) => (value === value ? value : Infinity);
  kept.sort((a, b) => (last(a.x) === last(b.x) ? a.index - b.index : last(a.x) - last(b.x)));
  return { count, sections: kept };
}

/** The best leading measure within the ranges, oriented; Infinity where there is none. */
function bestOf(prepared: PreparedSweep, { view, filters }: SelectQuery): number {
  const x = MEASURE_IDS.indexOf(view.x);
  const sx = signOf(view.x);
  let best = Infinity;
  visitWithin(prepared, filters, (_index, measures, at) => {
    const value = sx * measures[at + x]!;
    if (value < best) best = value;
  });
  return best;
}

export function selectSections(query: SelectQuery): Selection {
  const prepared = prepareSweep(query.problem, query.view);
  const { z } = query.view;
  if (query.list === 'front')
    return z ? selectFrontInThree(prepared, query, z) : selectFront(prepared, query);
  if (query.list === 'all') return selectUpTo(prepared, query, Infinity);
  const best = bestOf(prepared, query);
  if (best === Infinity) return { count: 0, sections: [] };
  return selectUpTo(prepared, query, best + Math.abs(best) * (query.bandShare + BAND_SLACK));
}
