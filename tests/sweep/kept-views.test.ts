import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Rates } from '#shared/engine/section.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import type { View } from '#shared/sweep/problem.ts';
import { chunkOfView } from '#shared/sweep/rank-kept.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { problemWithSections, rankProblem, sweepKeeping, viewsOf } from './keeping.ts';

const otherRates = (rates: Rates | null): Rates | null =>
  rates && {
    ...rates,
    steelPerKg: rates.steelPerKg === null ? 2 : rates.steelPerKg * 1.17,
    formworkPerM2: 11,
    lapShare: rates.lapShare / 2,
  };

describe('sections kept for other views', () => {
  it('give any view at any rates as sweeping the space again does, to the hash', () => {
    let feasible = 0;
    fc.assert(
      fc.property(
        problemWithSections,
        fc.integer({ min: 1, max: 5 }),
        fc.array(fc.nat(), { minLength: 4, maxLength: 4 }),
        (problem, pieces, picks) => {
          const known = viewsOf(problem);
          const viewAt = (i: number): View => {
            const x = known[picks[i]! % known.length]!;
            const others = known.filter((measure) => measure !== x);
            const [y, z] = [0, 1].map((step) => others[(picks[i + 1]! + step) % others.length]!);
            return { x, y: y!, ...(picks[i]! % 2 === 0 && { z: z! }) };
          };
          const view = viewAt(2);
          const kept = sweepKeeping(problem, viewAt(0), pieces);
          const prepared = prepareSweep(problem, view);
          const fresh = sweepRange(prepared, 0, prepared.space.size);
          const chunk = chunkOfView(kept, rankProblem(problem, kept.frames, view), view)!;
          expect(finishResult(problem, view, chunk)).toEqual(finishResult(problem, view, fresh));
          feasible += fresh.feasible;

          const repriced = {
            ...problem,
            basis: { ...problem.basis, rates: otherRates(problem.basis.rates) },
          };
          const again = prepareSweep(repriced, view);
          const { front, band, density } = sweepRange(again, 0, again.space.size);
          expect(rankProblem(repriced, kept.frames, view)).toMatchObject({ front, band, density });
        },
      ),
      { numRuns: 250, seed: 412 },
    );
    expect(feasible).toBeGreaterThan(2000);
  });
});
