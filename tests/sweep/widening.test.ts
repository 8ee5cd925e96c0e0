import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { MeasureId } from '#shared/engine/measures.ts';
import { expandAxis } from '#shared/sweep/axis.ts';
import { decodeFrames } from '#shared/sweep/feasible-frame.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { mergeChunks } from '#shared/sweep/merge.ts';
import { mergeNearMisses, renumberNearMisses } from '#shared/sweep/near-misses.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import type { AxisDefinition, SteelSetsDefinition, SweepProblem, View } from '#shared/sweep/problem.ts';
import { chunkOfView } from '#shared/sweep/rank-kept.ts';
import { spaceSize } from '#shared/sweep/space.ts';
import { openSweep, sweepRange } from '#shared/sweep/sweep-range.ts';
import { takeOverCounts, takeOverFrame } from '#shared/sweep/take-over.ts';
import { AddedSections, renumbering, wideningOf } from '#shared/sweep/widening.ts';
import {
  cutsOf,
  problemWithSections,
  rankProblem,
  sweepKeeping,
  viewsOf,
  type KeptSweep,
} from './keeping.ts';
import { OFFICE_PROBLEM } from './office-problem.ts';

/** Drops every value whose draw is low, but for the first that would leave none. */
type Drop = <T>(values: readonly T[], least?: number) => T[];

const axisWithout = (axis: AxisDefinition, drop: Drop): AxisDefinition => ({
  kind: 'list',
  values: drop(expandAxis(axis)),
});

const setsWithout = (sets: SteelSetsDefinition, drop: Drop): SteelSetsDefinition =>
  sets.kind === 'areas'
    ? { ...sets, areasMm2: drop(sets.areasMm2) }
    : {
        ...sets,
        sizes: drop(sets.sizes),
        counts: drop(sets.counts),
        ...(sets.mixed && { mixed: drop(sets.mixed, 0) }),
      };

function narrowed(problem: SweepProblem, draws: readonly number[]): SweepProblem {
  let at = 0;
  const drop: Drop = (values, least = 1) => {
    const kept = values.filter(() => draws[at++ % draws.length]! > 0.4);
    return kept.length >= least ? kept : values.slice(0, least);
  };
  const { space } = problem;
  return {
    ...problem,
    space: {
      ...space,
      width: axisWithout(space.width, drop),
      depth: axisWithout(space.depth, drop),
      fc: axisWithout(space.fc, drop),
      fy: axisWithout(space.fy, drop),
      cover: axisWithout(space.cover, drop),
      stirrups: drop(space.stirrups),
      tension: setsWithout(space.tension, drop),
      compression: setsWithout(space.compression, drop),
    },
  };
}

/** The wider problem from what was kept of the narrower one, and its added sections in pieces. */
function sweepWidened(narrow: KeptSweep, wide: SweepProblem, view: View, pieces: number): KeptSweep {
  const widening = wideningOf(narrow.problem, wide)!;
  const prepared = prepareSweep(wide, view);
  const { space } = prepared;
  const frames = narrow.frames.flatMap((frame) => decodeFrames(takeOverFrame(frame, widening, space)!));
  const taken = {
    counted: takeOverCounts(narrow.counted, widening, space),
    nearMisses: renumberNearMisses(narrow.nearMisses, renumbering(widening, space)),
  };
  const first = {
    problem: wide,
    frames,
    nearMisses: taken.nearMisses,
    counted: chunkOfView(taken, rankProblem(wide, frames, view), view)!,
  };
  const added = new AddedSections(widening, space);
  return cutsOf(widening.added, pieces).reduce((sum, [from, to]) => {
    const steps = openSweep(prepared, { keeping: { hasNumbers: true }, added });
    steps.advance(from, to);
    const { frame, nearMisses } = steps.kept()!;
    return {
      ...sum,
      counted: mergeChunks(steps.finish(), sum.counted),
      frames: [...sum.frames, ...decodeFrames(frame!)],
      nearMisses: mergeNearMisses(sum.nearMisses, nearMisses),
    };
  }, first);
}

const fresh = (problem: SweepProblem, view: View) =>
  finishResult(problem, view, sweepRange(prepareSweep(problem, view), 0, spaceSize(problem.space)));

describe('a sweep with further values on its axes', () => {
  it('takes what a run of the narrower one kept, and gives the result and hash of a fresh sweep', () => {
    let [widened, feasible] = [0, 0];
    fc.assert(
      fc.property(
        problemWithSections,
        fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 30, maxLength: 30 }),
        fc.array(fc.nat(), { minLength: 6, maxLength: 6 }),
        fc.integer({ min: 1, max: 4 }),
        (wide, draws, picks, pieces) => {
          const narrow = narrowed(wide, draws);
          if (wideningOf(narrow, wide) === null) {
            expect(spaceSize(narrow.space)).toBe(spaceSize(wide.space));
            return;
          }
          const known = viewsOf(wide);
          const viewAt = (i: number): View => {
            // Depth against width: hardly a section without a tie.
            if (picks[i]! % 3 === 0) return { x: 'depthMm', y: 'widthMm' };
            const x = known[picks[i]! % known.length]!;
            const others = known.filter((measure: MeasureId) => measure !== x);
            const [y, z] = [0, 1].map((step) => others[(picks[i + 1]! + step) % others.length]!);
            return { x, y: y!, ...(picks[i]! % 2 === 0 && { z: z! }) };
          };
          const [own, view, later] = [viewAt(0), viewAt(2), viewAt(4)];
          const kept = sweepWidened(sweepKeeping(narrow, own, pieces), wide, view, pieces);
          expect(finishResult(wide, view, kept.counted)).toEqual(fresh(wide, view));
          // What the wider run keeps serves other views as well.
          const ranked = rankProblem(wide, kept.frames, later);
          const chunk = chunkOfView(kept, ranked, later)!;
          expect(finishResult(wide, later, chunk)).toEqual(fresh(wide, later));
          widened++;
          feasible += kept.counted.feasible;
        },
      ),
      { numRuns: 250, seed: 4127 },
    );
    expect(widened).toBeGreaterThan(200);
    expect(feasible).toBeGreaterThan(2000);
  });

  it('visits every added section once, by ascending index, from any place', () => {
    const wide = OFFICE_PROBLEM;
    const narrow = narrowed(wide, [0.1, 0.9, 0.7, 0.2, 0.8, 0.5, 0.3]);
    const widening = wideningOf(narrow, wide)!;
    const { space } = prepareSweep(wide, { x: 'depthMm', y: 'widthMm' });
    const old = new Set(
      Array.from({ length: widening.taken }, (_, index) => renumbering(widening, space)(index)),
    );
    expect(old.size).toBe(widening.taken);
    const added = new AddedSections(widening, space);
    const cuts = cutsOf(widening.added, 7);
    const seen: number[] = [];
    for (const [from, to] of cuts)
      added.visit(from, to, (row, first, end) => {
        for (let j = first; j < end; j++) seen.push(row * space.depthsMm.length + j);
      });
    expect(seen).toEqual(
      Array.from({ length: space.size }, (_, index) => index).filter((index) => !old.has(index)),
    );
  });

  const WIDE: SweepProblem = {
    ...OFFICE_PROBLEM,
    space: { ...OFFICE_PROBLEM.space, width: { kind: 'range', from: 250, to: 500, step: 50 } },
  };
  const { basis, demand, rules, space } = OFFICE_PROBLEM;
  const withCurve = (problem: SweepProblem): SweepProblem => ({
    ...problem,
    basis: { ...basis, ductilityMeasure: 'curve-first-yield' },
  });
  const reordered: SweepProblem = {
    ...WIDE,
    space: {
      ...WIDE.space,
      tension: { kind: 'bars', sizes: ['40', '32', '28', '25', '20', '16'], counts: [2], none: false },
    },
  };

  it('is recognised by its axes', () => {
    expect(wideningOf(OFFICE_PROBLEM, WIDE)).toMatchObject({ taken: spaceSize(space) });
    expect(wideningOf(WIDE, OFFICE_PROBLEM)).toBeNull();
  });

  it.each<[string, SweepProblem, SweepProblem]>([
    ['the same space', WIDE, WIDE],
    ['another demand', { ...OFFICE_PROBLEM, demand: { ...demand, muNmm: 1 } }, WIDE],
    [
      'other rates',
      { ...OFFICE_PROBLEM, basis: { ...basis, rates: { ...basis.rates!, steelPerKg: 9 } } },
      WIDE,
    ],
    ['other rules', { ...OFFICE_PROBLEM, rules: { ...rules, maxLayers: 1 } }, WIDE],
    [
      'a value that is left out',
      { ...OFFICE_PROBLEM, space: { ...space, fc: { kind: 'list', values: [25, 27] } } },
      WIDE,
    ],
    ['sizes in another order', OFFICE_PROBLEM, reordered],
    ['the full curve as measure', withCurve(OFFICE_PROBLEM), withCurve(WIDE)],
  ])('is not taken from a run with %s', (_, narrow, wide) => {
    expect(wideningOf(narrow, wide)).toBeNull();
  });
});
