import { describe, expect, it } from 'vitest';
import type { Measures } from '#shared/engine/measures.ts';
import {
  areComparable,
  measureRows,
  takeoffRows,
  type ShownCandidate,
} from '#client/src/features/shortlist/comparison.ts';

interface Facts {
  readonly id: string;
  readonly beamId?: string;
  readonly measures?: Partial<Measures>;
  readonly lines?: readonly (readonly [bar: string, tonnes: number])[];
}

/** A candidate with the few facts the comparison reads. */
function candidate({ id, beamId = 'beam', measures = {}, lines = [] }: Facts): ShownCandidate {
  return {
    id,
    beam: { id: beamId },
    snapshot: { evaluation: { measures } },
    takeoff: {
      lines: lines.map(([bar, tonnes]) => ({ bar, position: 'tension', tonnes })),
      lapsTonnes: 0,
      wasteTonnes: 0,
      totalTonnes: lines.reduce((sum, [, tonnes]) => sum + tonnes, 0),
      concreteM3: 1,
      formworkM2: 1,
      cost: null,
      co2eKg: null,
    },
  } as unknown as ShownCandidate;
}

const row = (candidates: readonly ShownCandidate[], id: string, baseline: string | null = null) =>
  [...measureRows(candidates, baseline), ...takeoffRows(candidates, baseline)].find((r) => r.id === id)!;

describe('candidates side by side', () => {
  const a = candidate({ id: 'a', measures: { steelKgPerM: 20, curvatureDuctility: 6, depthMm: 700 } });
  const b = candidate({ id: 'b', measures: { steelKgPerM: 24, curvatureDuctility: 9, depthMm: 600 } });
  const c = candidate({ id: 'c', measures: { steelKgPerM: 20, curvatureDuctility: 7, depthMm: 600 } });

  it('marks the least steel and the most ductility as best', () => {
    expect(row([a, b], 'steelKgPerM').isBest).toEqual([true, false]);
    expect(row([a, b], 'curvatureDuctility').isBest).toEqual([false, true]);
  });

  it('marks all that tie, and none when all are alike', () => {
    expect(row([a, b, c], 'steelKgPerM').isBest).toEqual([true, false, true]);
    expect(row([b, c], 'depthMm').isBest).toEqual([false, false]);
  });

  it('names no best while one value is not known', () => {
    const unpriced = candidate({ id: 'd', measures: { costPerM: null } });
    const priced = candidate({ id: 'e', measures: { costPerM: 300 } });
    expect(row([priced, unpriced], 'costPerM').isBest).toEqual([false, false]);
    expect(row([priced, unpriced], 'costPerM').values).toEqual([300, null]);
  });

  it('names no best between sections for different beams', () => {
    const other = candidate({ id: 'x', beamId: 'other', measures: { steelKgPerM: 1 } });
    expect(areComparable([a, other])).toBe(false);
    expect(row([a, other], 'steelKgPerM').isBest).toEqual([false, false]);
  });

  it('gives the baseline’s value, and none where it is not known', () => {
    expect(row([a, b], 'steelKgPerM', 'b').baseline).toBe(24);
    expect(row([a, b], 'steelKgPerM').baseline).toBeNull();
    expect(row([a, b], 'costPerM', 'b').baseline ?? null).toBeNull();
  });

  it('lists the tonnes of each bar size by position, sizes in order, absent ones blank', () => {
    const many = candidate({
      id: 'm',
      lines: [
        ['#10', 1],
        ['#3', 0.25],
        ['#10', 0.5],
      ],
    });
    const few = candidate({ id: 'f', lines: [['#8', 2]] });
    const bars = takeoffRows([many, few], null).filter((r) => r.id.startsWith('bar-'));
    expect(bars.map(({ label, values }) => [label, ...values])).toEqual([
      ['#3 tension', 0.25, null],
      ['#8 tension', null, 2],
      ['#10 tension', 1.5, null],
    ]);
  });
});
