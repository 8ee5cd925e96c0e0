import { afterAll, describe, expect, it } from 'vitest';
import { computeCase, isComputed, type ComputedCase } from '#shared/verification/book.ts';
import { evaluateMetric } from '#shared/verification/layered-section.ts';
import { OUT_OF_SCOPE } from '#shared/verification/out-of-scope.ts';
import { findWorst } from '#shared/verification/summary.ts';
import { getCase, PUBLISHED_CASES } from '#shared/verification/topics.ts';

describe('published cases', () => {
  const byTopic = new Map<string, ComputedCase[]>();
  afterAll(() => {
    const lines = [...byTopic].map(([topic, all]) => {
      const { caseId, comparison } = findWorst(all)!;
      const values = all.reduce((sum, { comparisons }) => sum + comparisons.length, 0);
      return `  ${topic}: ${values} values, worst relative difference ${comparison.relative.toExponential(1)} (${caseId} ${comparison.name})`;
    });
    console.log(`Published cases\n${lines.join('\n')}`);
  });

  it('are each computed here or named as out of scope', () => {
    const unaccounted = PUBLISHED_CASES.filter((published) => !isComputed(published))
      .map(({ id }) => id)
      .filter((id) => !(id in OUT_OF_SCOPE));
    expect(unaccounted).toEqual([]);
  });

  for (const published of PUBLISHED_CASES.filter(isComputed))
    it(`${published.id} is reproduced within ${published.tolerance}: ${published.source} (${published.provenance})`, () => {
      const result = computeCase(published);
      expect(result.comparisons.length).toBeGreaterThan(0);
      byTopic.set(published.topic, [...(byTopic.get(published.topic) ?? []), result]);
      expect(result.comparisons.filter(({ isWithin }) => !isWithin)).toEqual([]);
      expect(result.isReproduced).toBe(true);
    });

  it('ACI-D04 with displaced concrete ignored gives c = 73.899 mm and Mn = 218.39 kN·m, as its flag says', () => {
    const { flexure } = evaluateMetric(
      { b: 300, h: 450, d: 387.5, As: 1472.62, d2: 62.5, As2: 981.75, fc: 35, fy: 420 },
      { displacedConcrete: 'ignore' },
    );
    expect(flexure!.neutralAxisMm).toBeCloseTo(73.899, 2);
    expect(flexure!.nominalMomentNmm / 1e6).toBeCloseTo(218.39, 1);
    expect(flexure!.layers[0]!.yields).toBe(false);
  });

  it('MC-10 (Park & Paulay 1975, closed form, memory): equal where A′s yields as assumed, lower where it does not', () => {
    const { comparisons } = computeCase(getCase('MC-10'));
    const below = comparisons.filter(({ allowed }) => allowed.kind === 'below');
    const equal = comparisons.filter(({ allowed }) => allowed.kind === 'relative');
    expect(below.length + equal.length).toBe(32);
    expect(below.length).toBeGreaterThan(0);
    for (const { computed, printed } of below) expect(computed).toBeLessThan(printed);
    expect(equal.length).toBeGreaterThan(8);
    expect(equal.filter(({ relative }) => relative > 0.002)).toEqual([]);
  });
});
