import { describe, expect, it } from 'vitest';
import { momentCurvature } from '#shared/engine/moment-curvature.ts';
import {
  curvatureDuctilityFor,
  displacementDuctility,
  plasticHingeLengthMm,
  plasticHingeOf,
} from '#shared/engine/plastic-hinge.ts';
import { placeSteel } from '#shared/engine/steel-layout.ts';
import { MM_PER_IN, MPA_PER_KSI } from '#shared/engine/units.ts';
import { METRIC_BASIS, metricSection } from '#shared/verification/layered-section.ts';
import { HOOPED } from './hooped-section.ts';
import { nonNull } from './non-null.ts';

const curveOf = (section: typeof HOOPED) => {
  const { layout, arrangement } = placeSteel(section, METRIC_BASIS, 2);
  return momentCurvature({
    section,
    layout: nonNull(layout),
    arrangement,
    basis: METRIC_BASIS,
    choices: { concreteLaw: 'hognestad', steelLaw: 'elastic-plastic' },
  });
};
const CANTILEVER = { lengthMm: 2000, expectedYieldMPa: 460, barDiameterMm: 25 };

describe('the plastic hinge', () => {
  it('is as long in inches and ksi as in mm and MPa: 0.08 L + 0.15 fye db (Paulay and Priestley, memory)', () => {
    const [lengthIn, ksi, barIn] = [80, 60, 1];
    const metric = plasticHingeLengthMm({
      lengthMm: lengthIn * MM_PER_IN,
      expectedYieldMPa: ksi * MPA_PER_KSI,
      barDiameterMm: barIn * MM_PER_IN,
    });
    // 0.022 per MPa is 0.1517 per ksi, printed 0.15
    expect(metric / MM_PER_IN / (0.08 * lengthIn + 0.15 * ksi * barIn)).toBeCloseTo(1.0066, 4);
  });

  it('gives back the displacement ductility that asked for a curvature ductility', () => {
    for (const share of [0.05, 0.1, 0.2, 0.35])
      expect(displacementDuctility(curvatureDuctilityFor(4, share), share)).toBeCloseTo(4, 12);
    expect(displacementDuctility(1, 0.1)).toBe(1);
  });

  it('turns a curve into rotation and displacement ductility by the sentences it states', () => {
    const curve = curveOf(HOOPED);
    const hinge = plasticHingeOf(curve, CANTILEVER);
    const { yieldCurvaturePerMm } = nonNull(curve.bilinear);
    // 0.08 × 2000 + 0.022 × 460 × 25
    expect(hinge.hingeLengthMm).toBeCloseTo(413, 9);
    expect(hinge.plasticRotation).toBeCloseTo(
      (curve.ultimate.curvaturePerMm - yieldCurvaturePerMm) * 413,
      12,
    );
    const mu = curve.ductility.byBilinearYield.value!;
    expect(hinge.displacementDuctility).toBeCloseTo(1 + 3 * (mu - 1) * 0.2065 * (1 - 0.10325), 9);
    expect(hinge.definition).toContain('0.022 fye db');
  });

  it('has neither where no bar yields, and refuses a length of zero', () => {
    const section = metricSection({ b: 300, h: 500, d: 440, As: 6000, fc: 30, fy: 420 });
    const hinge = plasticHingeOf(curveOf(section), CANTILEVER);
    expect([hinge.plasticRotation, hinge.displacementDuctility]).toEqual([null, null]);
    expect(() => plasticHingeOf(curveOf(HOOPED), { ...CANTILEVER, lengthMm: 0 })).toThrow(
      'Length to contraflexure',
    );
  });
});
