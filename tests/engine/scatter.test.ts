import { describe, expect, it } from 'vitest';
import { evaluateSection, type EvaluationContext } from '#shared/engine/evaluate.ts';
import { InvalidSectionError } from '#shared/engine/preconditions.ts';
import { scatterOf, USUAL_SCATTER, type ScatterId } from '#shared/engine/scatter.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { METRIC_BASIS, NO_DEMAND, NO_RULES } from '#shared/verification/layered-section.ts';
import { HOOPED } from './hooped-section.ts';
import { nonNull } from './non-null.ts';

const contextOf = (muNmm: number | null): EvaluationContext => ({
  basis: { ...METRIC_BASIS, bendAllowance: 'corner-in-bend' },
  demand: { ...NO_DEMAND, muNmm },
  rules: NO_RULES,
});
const variantOf = (id: ScatterId, section: SectionInput, context: EvaluationContext) =>
  nonNull(scatterOf(section, context).variants.find((variant) => variant.id === id));

/** HAND-01 as plain layers, its bars moved inwards. */
const layered = (shift: number): SectionInput => ({
  ...HOOPED,
  reinforcement: {
    kind: 'layers',
    layers: [
      { depthMm: 58 + shift, areaMm2: 402.123859659494, face: 'compression' },
      { depthMm: 437.5 - shift, areaMm2: 1472.62155637022, face: 'tension' },
    ],
  },
});

describe('the scatter of a candidate', () => {
  it('moves the bars of both faces with the cover: the strength is that of layers drawn there', () => {
    for (const [id, shift] of [
      ['cover-less', -10],
      ['cover-more', 10],
    ] as const) {
      const { outcome, from, to } = variantOf(id, HOOPED, contextOf(null));
      const drawn = evaluateSection(layered(shift), contextOf(null));
      expect(nonNull(outcome?.designMomentNmm) / drawn.flexure!.designMomentNmm).toBeCloseTo(1, 12);
      expect(nonNull(outcome?.curvatureDuctility) / drawn.ductility!.curvatureDuctility).toBeCloseTo(1, 12);
      expect([from, to]).toEqual([40, 40 + shift]);
    }
  });

  it('keeps the cage as bent: bars that just fit still fit with more cover', () => {
    const tight: SectionInput = {
      ...HOOPED,
      widthMm: 225,
      reinforcement: { kind: 'bars', tension: [{ bar: '25', count: 3 }], compression: [] },
    };
    const { widthNeededMm } = evaluateSection(tight, contextOf(null)).arrangement!.faces[0]!;
    const { outcome } = variantOf('cover-more', { ...tight, widthMm: widthNeededMm }, contextOf(null));
    expect(outcome!.failing).not.toContain('bar-fit');
  });

  it('tells a candidate that is used up as drawn which variants break it, by which check, and how far', () => {
    const { designMomentNmm } = evaluateSection(HOOPED, contextOf(null)).flexure!;
    const context = contextOf(designMomentNmm);
    const { asDrawn, variants, holds } = scatterOf(HOOPED, context);
    expect(asDrawn.meetsListedChecks).toBe(true);
    expect(asDrawn.governing).toMatchObject({ id: 'strength', ratio: 1 });
    expect(holds).toBe(false);
    const byId = new Map(variants.map((variant) => [variant.id, variant]));
    for (const id of ['cover-more', 'strength-low'] as const) {
      const { outcome, newlyFailing } = nonNull(byId.get(id));
      expect(newlyFailing).toEqual(['strength']);
      expect(outcome!.meetsListedChecks).toBe(false);
      expect(outcome!.governing!.ratio).toBeCloseTo(designMomentNmm / outcome!.designMomentNmm!, 12);
      expect(outcome!.governing!.ratio).toBeGreaterThan(1);
    }
    for (const id of ['cover-less', 'strength-high'] as const)
      expect(nonNull(byId.get(id)).outcome!.meetsListedChecks).toBe(true);
    expect(scatterOf(HOOPED, contextOf(0.9 * designMomentNmm)).holds).toBe(true);
  });

  it('takes weaker and stronger concrete by the shares given', () => {
    const choices = { ...USUAL_SCATTER, lowStrengthShare: 0.8, highStrengthShare: 1.25 };
    const { variants } = scatterOf(HOOPED, contextOf(null), choices);
    const strengths = variants.filter(({ id }) => id.startsWith('strength'));
    expect(strengths.map(({ to }) => to)).toEqual([24, 37.5]);
    for (const { to, outcome } of strengths) {
      const own = evaluateSection({ ...HOOPED, fcMPa: to }, contextOf(null));
      expect(outcome!.curvatureDuctility).toBe(own.ductility!.curvatureDuctility);
    }
  });

  it('fits bars with their deformations: bars that just fit by their name no longer do, least of all the thickest', () => {
    const tight: SectionInput = {
      ...HOOPED,
      widthMm: 225,
      reinforcement: { kind: 'bars', tension: [{ bar: '25', count: 3 }], compression: [] },
    };
    const context = { ...contextOf(null), rules: { ...NO_RULES, maxLayers: 1 } };
    const neededAt = (barOversize: number) =>
      evaluateSection(tight, { ...context, basis: { ...context.basis, barOversize } }).arrangement!.faces[0]!
        .widthNeededMm;
    const widthMm = (neededAt(1.1) + neededAt(1.14)) / 2;
    const oversizes = scatterOf({ ...tight, widthMm }, context).variants.filter(
      ({ id }) => id === 'bar-oversize',
    );
    expect(oversizes.map(({ from, to, newlyFailing }) => [from, to, newlyFailing])).toEqual([
      [1, 1.1, []],
      [1, 1.14, ['bar-fit']],
      [1, 1.18, ['bar-fit']],
    ]);
  });

  it('keeps the spacing that stirrups were designed to: weaker concrete has to do with it', () => {
    const designed = { ...HOOPED, stirrup: { bar: '10', legs: 2, spacingMm: 400, isDesigned: true } };
    const context = contextOf(null);
    const asked = (vuN: number) => ({ ...context, demand: { ...context.demand, vuN } });
    // as much shear as the spacing found takes, so that anything less fails
    const { stirrups } = evaluateSection(designed, asked(250e3));
    const given = { ...HOOPED, stirrup: { bar: '10', legs: 2, spacingMm: stirrups!.spacingMm } };
    const shear = evaluateSection(given, asked(250e3)).checks.find(({ id }) => id === 'shear')!;
    const used = asked(shear.capacity!);
    expect(evaluateSection(designed, used).stirrups!.spacingMm).toBe(stirrups!.spacingMm);
    expect(variantOf('strength-low', designed, used).newlyFailing).toContain('shear');
    expect(variantOf('strength-high', designed, used).newlyFailing).not.toContain('shear');
  });

  it('counts a beam without room as one that fails, and cover that is not there as one that is not asked', () => {
    const thin = { ...HOOPED, coverMm: 5 };
    expect(variantOf('cover-less', thin, contextOf(null))).toMatchObject({ outcome: null, newlyFailing: [] });
    const { depthNeededMm } = evaluateSection(HOOPED, contextOf(null)).arrangement!;
    const shallow = { ...HOOPED, depthMm: depthNeededMm + 19 };
    expect(variantOf('cover-more', shallow, contextOf(null)).newlyFailing).toContain('bar-fit');
    expect(() => scatterOf(HOOPED, contextOf(null), { ...USUAL_SCATTER, lowStrengthShare: 0 })).toThrow(
      InvalidSectionError,
    );
  });
});
