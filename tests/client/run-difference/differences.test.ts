import { describe, expect, it } from 'vitest';
import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import { spaceSize } from '#shared/sweep/space.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { sectionKey } from '#shared/sweep/section-index.ts';
import { absenceWords } from '#client/src/features/run-difference/absence-words.ts';
import { absenceOf, frontDifferences } from '#client/src/features/run-difference/front-differences.ts';
import { inputDifferences } from '#client/src/features/run-difference/input-differences.ts';
import {
  bestDifferences,
  checkDifferences,
  countDifferences,
  verdictOf,
} from '#client/src/features/run-difference/result-differences.ts';
import { createSectionSource } from '#client/src/features/run/section-source.ts';
import { BASIS, DEFINITION } from '../run/problem.ts';

function ran(definition: SweepDefinition) {
  const problem = { ...definition, basis: BASIS };
  const prepared = prepareSweep(problem, definition.view);
  const result = finishResult(problem, definition.view, sweepRange(prepared, 0, spaceSize(definition.space)));
  const sections = createSectionSource({ definition, basis: BASIS });
  return { result, sections, front: result.front, run: { definition, basis: BASIS, engineVersion: '1.1.0' } };
}
const BASE = ran(DEFINITION);
const WIDER = ran({
  ...DEFINITION,
  space: { ...DEFINITION.space, width: { kind: 'range', from: 250, to: 500, step: 50 } },
});
const STRICTER = ran({ ...DEFINITION, demand: { ...DEFINITION.demand, ductilityTarget: 9 } });

describe('what went into two runs', () => {
  it('is the same for the same inputs', () => {
    expect(inputDifferences(BASE.run, BASE.run, 'si')).toEqual([]);
  });

  it('differs by name, in the project’s units, group by group', () => {
    expect(inputDifferences(BASE.run, WIDER.run, 'si')).toEqual([
      {
        group: 'Ranges',
        rows: [{ label: 'Width b', before: '250 to 400 by 50 mm', after: '250 to 500 by 50 mm' }],
      },
    ]);
    const other = {
      ...STRICTER.run,
      engineVersion: '1.2.0',
      basis: { ...BASIS, maxAggregateMm: 25 },
      definition: { ...STRICTER.run.definition, rules: { ...DEFINITION.rules, excludedBars: ['32'] } },
    };
    expect(inputDifferences(BASE.run, other, 'si').map(({ group, rows }) => [group, rows[0]])).toEqual([
      ['Demand', { label: 'Ductility μφ at least', before: '4', after: '9' }],
      ['Rules', { label: 'Sizes never used', before: 'none', after: '32' }],
      ['Design basis', { label: 'Largest aggregate', before: '20 mm', after: '25 mm' }],
      ['How it ran', { label: 'Engine', before: '1.1.0', after: '1.2.0' }],
    ]);
  });

  it('shows what is finer than the print, and rates only where both are seen', () => {
    const finer = {
      ...BASE.run,
      definition: { ...DEFINITION, demand: { ...DEFINITION.demand, muNmm: 250_000_001 } },
    };
    expect(inputDifferences(BASE.run, finer, 'si')[0]!.rows[0]).toMatchObject({
      before: '250 kN·m (250000000)',
      after: '250 kN·m (250000001)',
    });
    const rates = {
      currency: 'EUR',
      steelPerKg: 1.5,
      stirrupPerKg: null,
      formworkPerM2: 40,
      concrete: [{ fcMPa: 30, costPerM3: 120, co2eKgPerM3: null }],
      steelCo2ePerKg: 0.8,
      lapShare: 0.1,
      wasteShare: 0,
    };
    const priced = (steelPerKg: number) => ({
      ...BASE.run,
      basis: { ...BASIS, rates: { ...rates, steelPerKg } },
    });
    expect(inputDifferences(priced(1.5), priced(1.8), 'si')).toEqual([
      { group: 'Rates', rows: [{ label: 'Longitudinal bars', before: 'EUR 1.5/kg', after: 'EUR 1.8/kg' }] },
    ]);
  });
});

describe('two fronts', () => {
  it('share their sections whatever their indices; gained, lost and kept are all there are', () => {
    const { kept, gained, lost } = frontDifferences(BASE, WIDER);
    expect(kept.length + lost.length).toBe(BASE.front.length);
    expect(new Set(kept.map(({ after }) => after)).size + gained.length).toBe(WIDER.front.length);
    expect(kept.length).toBeGreaterThan(0);
    expect(gained.length).toBeGreaterThan(0);
    for (const { before, after } of kept) expect([after.x, after.y]).toEqual([before.x, before.y]);
    expect(frontDifferences(BASE, BASE)).toMatchObject({ gained: [], lost: [] });
    expect(frontDifferences({ ...BASE, front: [] }, BASE)).toMatchObject({ kept: [], lost: [] });
  });

  it('say of each section that is not on the other why it is not', () => {
    const words = (from: typeof BASE, to: typeof BASE, of: 'gained' | 'lost') =>
      frontDifferences(from, to)[of].map((point) => {
        const [own, there] = of === 'gained' ? [to, from] : [from, to];
        const section = own.sections.sectionAt(point.index);
        const absence = absenceOf(section, there.sections);
        if (absence.kind === 'beaten')
          expect(there.front.map((one) => sectionKey(there.sections.sectionAt(one.index)))).not.toContain(
            sectionKey(section),
          );
        return absenceWords(absence);
      });
    expect(words(BASE, WIDER, 'gained').some((one) => one === 'not in its ranges: width')).toBe(true);
    expect(new Set(words(BASE, WIDER, 'lost'))).toEqual(
      new Set(frontDifferences(BASE, WIDER).lost.map(() => 'meets every check there, and is beaten')),
    );
    expect(words(BASE, STRICTER, 'lost').every((one) => one === 'fails curvature ductility')).toBe(true);
  });
});

describe('two results', () => {
  it('count what changed, and say nothing of what was not counted', () => {
    const counts = countDifferences(BASE.result, STRICTER.result);
    expect(counts.find(({ label }) => label === 'Meet every check')).toMatchObject({
      before: BASE.result.feasible,
      after: STRICTER.result.feasible,
    });
    expect(
      checkDifferences(BASE.result, STRICTER.result).find(({ check }) => check === 'curvature-ductility')!
        .after,
    ).toBeGreaterThan(
      checkDifferences(BASE.result, STRICTER.result).find(({ check }) => check === 'curvature-ductility')!
        .before,
    );
    expect(checkDifferences({ ...BASE.result, failures: [] }, BASE.result)).toEqual([]);
  });

  it('tell better from worse by the measure’s own direction', () => {
    expect(verdictOf('steelKgPerM', 10, 9)).toBe('better');
    expect(verdictOf('curvatureDuctility', 6, 5)).toBe('worse');
    expect(verdictOf('depthMm', 500, 500)).toBe('same');
    const steel = bestDifferences(BASE.result, STRICTER.result).find(
      ({ measure }) => measure === 'steelKgPerM',
    )!;
    expect(['worse', 'same']).toContain(steel.verdict);
    expect(bestDifferences({ ...BASE.result, best: [] }, BASE.result)[0]).toMatchObject({
      before: null,
      verdict: null,
    });
  });
});
