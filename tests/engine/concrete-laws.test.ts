import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import type { ConcreteLaw } from '#shared/engine/concrete-laws/concrete-law.ts';
import { hognestad } from '#shared/engine/concrete-laws/hognestad.ts';
import { kentPark, kentParkConfined } from '#shared/engine/concrete-laws/kent-park.ts';
import { manderConfined, manderUnconfined } from '#shared/engine/concrete-laws/mander.ts';
import { equalPressureGain, twoPressureGain } from '#shared/engine/concrete-laws/mander-strength.ts';
import {
  parabolaRectangle,
  parabolaRectangleConstants,
} from '#shared/engine/concrete-laws/parabola-rectangle.ts';
import { todeschini } from '#shared/engine/concrete-laws/todeschini.ts';
import { MPA_PER_PSI } from '#shared/engine/units.ts';
import { PROPERTIES } from '#shared/verification/properties.ts';
import { integral } from './adaptive-quadrature.ts';
import { confinementOf, HOOPED } from './hooped-section.ts';
import { multiaxialGain } from './multiaxial-surface.ts';
import { nonNull } from './non-null.ts';

const hoops = nonNull(confinementOf(HOOPED));
/** The hooped core with its pressures and hoop steel scaled together. */
const hoopsTimes = (factor: number) => ({
  ...hoops,
  volumetricRatio: factor * hoops.volumetricRatio,
  volumetricRatioOutside: factor * hoops.volumetricRatioOutside,
  pressureAcrossMPa: factor * hoops.pressureAcrossMPa,
  pressureDeepMPa: factor * hoops.pressureDeepMPa,
});

interface LawUnderTest {
  readonly make: (fcMPa: number, factor: number) => ConcreteLaw;
  /** Largest relative error from a quarter of the peak strain on. */
  readonly error: number;
  /** The same in a table's first steps, where f is hardly more than zero. */
  readonly earlyError: number;
}

const CLOSED = { error: 1e-10, earlyError: 1e-10 };
const TABLE = { error: 5e-5, earlyError: 3e-4 };

/** Closed forms are held to rounding, tables to their own error; both against quadrature of the published f(ε). */
const LAWS: Readonly<Record<string, LawUnderTest>> = {
  Hognestad: { make: (fcMPa) => hognestad(fcMPa), ...CLOSED },
  Todeschini: { make: (fcMPa) => todeschini(fcMPa, 4700 * Math.sqrt(fcMPa)), ...CLOSED },
  'Kent–Park': { make: (fcMPa) => kentPark(fcMPa), ...CLOSED },
  'Kent–Park confined': {
    make: (fcMPa, factor) => kentParkConfined(fcMPa, hoopsTimes(factor)),
    ...CLOSED,
  },
  'parabola–rectangle': { make: (fcMPa) => parabolaRectangle(fcMPa), ...CLOSED },
  Mander: { make: (fcMPa) => manderUnconfined(fcMPa), ...TABLE },
  'Mander confined': { make: (fcMPa, factor) => manderConfined(fcMPa, hoopsTimes(factor)), ...TABLE },
};

const { runs, seed } = PROPERTIES['law-integrals'];
const draw = fc.tuple(
  fc.double({ min: 17.2, max: 82.7, noNaN: true }),
  fc.double({ min: 0.05, max: 8, noNaN: true }),
  fc.double({ min: 0.01, max: 1.3, noNaN: true }),
);

describe('running integrals of a concrete law', () => {
  for (const [name, { make, error, earlyError }] of Object.entries(LAWS))
    it(`${name}: F and G are those of adaptive quadrature within ${error}`, () => {
      const worst = { late: 0, early: 0, stress: 0 };
      for (const [fcMPa, factor, share] of fc.sample(draw, { numRuns: runs, seed })) {
        const law = make(fcMPa, factor);
        const strain = share * law.crushingStrain;
        const span = [0, strain] as const;
        const fine = (size: number) => ({ kinks: law.kinkStrains, error: 1e-13 * size });
        const ours = [law.forceIntegral(strain), law.momentIntegral(strain)] as const;
        const force = integral((e) => law.stress(e), span, fine(ours[0]));
        const moment = integral((e) => law.stress(e) * e, span, fine(ours[1]));
        const off = Math.max(Math.abs(ours[0] / force - 1), Math.abs(ours[1] / moment - 1));
        const when = strain < law.peakStrain / 4 ? 'early' : 'late';
        worst[when] = Math.max(worst[when], off);
        const offStress = Math.abs(law.nearStress(strain) - law.stress(strain)) / law.peakStressMPa;
        worst.stress = Math.max(worst.stress, offStress);
      }
      console.log(
        `  ${name}: integrals within ${worst.late.toExponential(1)}, below a quarter of the peak strain ${worst.early.toExponential(1)}, stress ${worst.stress.toExponential(1)}`,
      );
      expect(worst.late).toBeLessThan(error);
      expect(worst.early).toBeLessThan(earlyError);
      expect(worst.stress).toBeLessThan(2 * error);
    });

  it.each(Object.entries(LAWS))('%s: F′ is f, G′ is f ε, and both stand still in tension', (_, { make }) => {
    const law = make(40, 1);
    for (let i = 1; i <= 60; i++) {
      const strain = (i / 47) * law.crushingStrain;
      const h = 1e-7 * strain;
      const slopeOf = (of: (e: number) => number) => (of(strain + h) - of(strain - h)) / (2 * h);
      const f = law.nearStress(strain);
      expect(Math.abs(slopeOf((e) => law.forceIntegral(e)) - f)).toBeLessThan(1e-5 * law.peakStressMPa);
      expect(Math.abs(slopeOf((e) => law.momentIntegral(e)) / strain - f)).toBeLessThan(
        1e-5 * law.peakStressMPa,
      );
    }
    expect([law.stress(-1e-3), law.forceIntegral(-1e-3), law.momentIntegral(-1e-3)]).toEqual([0, 0, 0]);
  });

  it.each(Object.entries(LAWS))(
    '%s: f′c of 2500 and of 12 000 psi give a finite law with its peak where it says',
    (_, { make }) => {
      for (const psi of [2500, 12000]) {
        const law = make(psi * MPA_PER_PSI, 1);
        expect(law.stress(law.peakStrain)).toBeCloseTo(law.peakStressMPa, 9);
        for (const nearby of [0.9, 1.1])
          expect(law.stress(nearby * law.peakStrain)).toBeLessThanOrEqual(law.peakStressMPa);
        expect(law.crushingStrain).toBeGreaterThan(law.peakStrain);
        expect(law.formula).not.toMatch(/NaN|Infinity|undefined/);
      }
    },
  );
});

describe('published constants of the laws', () => {
  it('EN 1992-1-1 Table 3.1 (memory): strains in ‰ and n of C50, C60, C70, C80, C90', () => {
    const rows: readonly (readonly [number, number, number, number])[] = [
      [50, 2.0, 3.5, 2.0],
      [60, 2.3, 2.9, 1.6],
      [70, 2.4, 2.7, 1.45],
      [80, 2.5, 2.6, 1.4],
      [90, 2.6, 2.6, 1.4],
    ];
    for (const [fck, ec2, ecu2, n] of rows) {
      const constants = parabolaRectangleConstants(fck);
      expect(constants.peakStrain * 1000).toBeCloseTo(ec2, 1);
      expect(constants.crushingStrain * 1000).toBeCloseTo(ecu2, 1);
      expect(Math.abs(constants.exponent - n)).toBeLessThan(0.05);
    }
  });

  it('Hognestad falls 15 % to 0.0038, Kent–Park to half at ε50u and to 0.2 f′c', () => {
    expect(hognestad(30).stress(0.0038)).toBeCloseTo(0.85 * 30, 9);
    // (3 + 0.29 × 30)/(145 × 30 − 1000) = 11.7/3350
    expect(kentPark(30).stress(11.7 / 3350)).toBeCloseTo(15, 9);
    expect(kentPark(30).stress(0.01)).toBeCloseTo(6, 9);
  });

  it('Kent–Park confined by hand: K, Zm and the crushing strain of ρs = 0.01, fyh 300, h″/sh = 4, f′c 30', () => {
    const law = kentParkConfined(30, {
      ...hoops,
      volumetricRatioOutside: 0.01,
      hoopYieldMPa: 300,
      outsideWidthMm: 400,
      spacingMm: 100,
    });
    // K = 1 + 0.01 × 300/30 = 1.1; Zm = 0.5/(11.7/3350 + 0.75 × 0.01 × 2 − 0.0022) = 30.6889
    expect(law.peakStressMPa).toBeCloseTo(33, 9);
    expect(law.peakStrain).toBeCloseTo(0.0022, 9);
    expect(law.stress(0.0122)).toBeCloseTo(33 * (1 - 0.01 * 30.6889), 3);
    expect(law.stress(0.05)).toBeCloseTo(6.6, 9);
    expect(law.crushingStrain).toBeCloseTo(0.013, 9);
  });

  it('Mander’s unconfined curve starts with Ec = 5000 √f′c, passes f′c at 0.002 and is spent at 0.005', () => {
    const law = manderUnconfined(30);
    expect(law.stress(1e-7) / 1e-7).toBeCloseTo(5000 * Math.sqrt(30), -1);
    expect(law.stress(0.002)).toBeCloseTo(30, 9);
    expect(law.stress(0.005)).toBe(0);
  });

  it('Mander’s confined strain at the peak is εco (1 + 5 (f′cc/f′co − 1)), and no pressure means no gain', () => {
    const law = manderConfined(30, hoops);
    const gain = law.peakStressMPa / 30;
    expect(gain).toBeGreaterThan(1.05);
    expect(law.peakStrain).toBeCloseTo(0.002 * (1 + 5 * (gain - 1)), 12);
    expect(twoPressureGain(0, 0)).toBe(1);
  });

  it('the gain under two pressures is that of the multiaxial surface (Mander, 1984; memory) within 2 %', () => {
    let worst = 0;
    for (const larger of [0.02, 0.05, 0.1, 0.15, 0.2, 0.3])
      for (const ratio of [0, 0.1, 0.25, 0.5, 0.75, 1]) {
        const gain = twoPressureGain(ratio * larger, larger);
        worst = Math.max(worst, Math.abs(gain / multiaxialGain(ratio * larger, larger) - 1));
        expect(gain).toBe(twoPressureGain(larger, ratio * larger));
      }
    console.log(`  two pressures against the multiaxial surface: within ${worst.toExponential(1)}`);
    expect(worst).toBeLessThan(0.02);
    for (const share of [0.05, 0.1, 0.2, 0.3])
      expect(Math.abs(twoPressureGain(share, share) / equalPressureGain(share) - 1)).toBeLessThan(0.003);
  });
});
