import { describe, expect, it } from 'vitest';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import type { DesignBasis, SectionInput } from '#shared/engine/section.ts';
import { takeoff } from '#shared/engine/takeoff.ts';
import { METRIC_BASIS, NO_DEMAND, NO_RULES } from '#shared/verification/layered-section.ts';

/** 400 × 1000, 4-25 bottom in one layer: y = 1000 − 62.5; cover 40, hoops 10, fy 420; by hand. */
const SECTION: SectionInput = {
  widthMm: 400,
  depthMm: 1000,
  fcMPa: 30,
  fyMPa: 420,
  coverMm: 40,
  stirrup: { bar: '10', legs: 2, spacingMm: 150 },
  reinforcement: { kind: 'bars', tension: [{ bar: '25', count: 4 }], compression: [] },
};

const evaluate = (basis: Partial<DesignBasis>, section: Partial<SectionInput> = {}) =>
  evaluateSection(
    { ...SECTION, ...section },
    { basis: { ...METRIC_BASIS, ...basis }, demand: NO_DEMAND, rules: NO_RULES },
  );
const checkOf = (evaluation: ReturnType<typeof evaluate>) =>
  evaluation.checks.find((check) => check.id === 'skin-steel');

describe('skin steel', () => {
  it('stands along both sides from the tension bars to mid-depth at the crack-control spacing', () => {
    // s = min(380 − 2.5 · 50, 300) = 255; (937.5 − 500)/255 = 1.72: two bars a side, 218.75 apart
    const { skin, quantities, working } = evaluate({ skinBar: '12' });
    expect(skin).toMatchObject({ bar: '12', perSide: 2, spacingMm: 218.75 });
    expect(skin!.allowedMm).toBeCloseTo(255, 9);
    expect(skin!.bars.map(({ xMm, yMm }) => [xMm, yMm])).toEqual([
      [56, 718.75],
      [56, 500],
      [344, 718.75],
      [344, 500],
    ]);
    expect(quantities.steel.find((line) => line.position === 'skin')).toMatchObject({ bar: '12', count: 4 });
    expect(working.find((line) => line.id === 'skin-bars')!.value).toBe(2);
  });

  it('weighs, laps and is bought as bars, and adds nothing to the strength', () => {
    const without = evaluate({});
    const given = evaluate({ skinBar: '12' });
    // 4 · 0.888 kg/m
    expect(given.quantities.netSteelKgPerM - without.quantities.netSteelKgPerM).toBeCloseTo(4 * 0.888, 2);
    expect(given.flexure).toEqual(without.flexure);
    const rates = {
      ...{
        currency: 'EUR',
        steelPerKg: 2,
        stirrupPerKg: 3,
        formworkPerM2: 0,
        concrete: [],
        steelCo2ePerKg: 1,
      },
      ...{ lapShare: 0.1, wasteShare: 0 },
    };
    const steelCost = (skinBar?: string) => evaluate({ rates, skinBar }).quantities.cost!.steel!;
    expect(steelCost('12') - steelCost()).toBeCloseTo(4 * 0.888 * 1.1 * 2, 1);
    expect(takeoff(given.quantities, 10_000, 2).lines).toContainEqual(
      expect.objectContaining({ position: 'skin', bar: '12' }),
    );
  });

  it('is asked of sections deeper than 900, and of none where the basis says nothing', () => {
    expect(checkOf(evaluate({ skinBar: '12' }, { depthMm: 900 }))).toBeUndefined();
    expect(evaluate({ skinBar: '12' }, { depthMm: 900 }).skin).toBeNull();
    expect(checkOf(evaluate({}))).toBeUndefined();
    expect(checkOf(evaluate({ skinBar: '12' }))).toMatchObject({ passes: true, demand: 218.75 });
    expect(checkOf(evaluate({ skinBar: null }))).toMatchObject({ passes: false, demand: null });
    // 152 of side cover leave no spacing
    const thick = checkOf(evaluate({ skinBar: '12' }, { coverMm: 150, widthMm: 700 }));
    expect(thick).toMatchObject({ passes: false, reason: 'the side cover allows no spacing' });
  });

  it('of an unknown bar is refused with its place', () => {
    expect(() => evaluate({ skinBar: '13' })).toThrow('13');
  });
});

describe('bars with ribs', () => {
  it('want more width and stand closer, while d and the areas stay nominal', () => {
    const of = (barOversize?: number, widthMm = 400) =>
      evaluate({ barOversize }, { widthMm }).arrangement!.faces[0]!;
    const plain = of();
    const ribbed = of(1.15);
    // 2 (40 + 11.5 + 14.375) + 3 · 28.75 + 3 · 25.33
    expect(plain.widthNeededMm).toBeCloseTo(2 * 62.5 + 75 + 3 * (4 / 3) * 19, 9);
    expect(ribbed.widthNeededMm).toBeCloseTo(2 * 65.875 + 86.25 + 3 * (4 / 3) * 19, 9);
    expect(ribbed.clearGapMm!).toBeLessThan(plain.clearGapMm!);
    expect(evaluate({ barOversize: 1.15 }).geometry).toEqual(evaluate({}).geometry);
    // 276 and 294 wide
    expect(of(1, 290).layerCounts).toEqual([4]);
    expect(of(1.15, 290).layerCounts).toEqual([2, 2]);
  });
});
