import type { SweepProblem } from '#shared/sweep/problem.ts';
import { spaceSize } from '#shared/sweep/space.ts';

/** A sweep an office would run: 5 widths × 17 depths × 4 strengths × 5 sizes × 2–12 bars × 12 top sets; invented rates. */
export const OFFICE_PROBLEM: SweepProblem = {
  space: {
    width: { kind: 'range', from: 250, to: 450, step: 50 },
    depth: { kind: 'range', from: 400, to: 800, step: 25 },
    fc: { kind: 'list', values: [25, 30, 35, 40] },
    fy: { kind: 'list', values: [420] },
    cover: { kind: 'list', values: [40] },
    stirrups: [{ bar: '10', legs: 2, spacingMm: 150 }],
    tension: {
      kind: 'bars',
      sizes: ['16', '20', '25', '28', '32'],
      counts: [2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12],
      none: false,
    },
    compression: { kind: 'bars', sizes: ['12', '16', '20', '25'], counts: [2, 3, 4], none: false },
  },
  basis: {
    ruleSet: 'aci318m-19',
    barStandard: 'iso',
    esMPa: 200000,
    fytMPa: 420,
    maxAggregateMm: 19,
    bendAllowance: 'corner-in-bend',
    displacedConcrete: 'deduct',
    yieldCurvatureAt: 'outermost-layer',
    slabMm: 0,
    rates: {
      currency: 'EUR',
      steelPerKg: 1.35,
      stirrupPerKg: 1.6,
      formworkPerM2: 38,
      concrete: [25, 30, 35, 40].map((fcMPa) => ({
        fcMPa,
        costPerM3: 78 + fcMPa,
        co2eKgPerM3: 150 + 4 * fcMPa,
      })),
      steelCo2ePerKg: 1.2,
      lapShare: 0.06,
      wasteShare: 0.03,
    },
  },
  demand: { muNmm: 300e6, ductilityTarget: 6, depthCapMm: null },
  rules: {
    minDepthToWidth: 1,
    maxDepthToWidth: 3.5,
    maxLayers: 2,
    oneSizePerFace: true,
    excludedBars: [],
    columnWidthMm: null,
    minCompressionShare: null,
    requireHangers: true,
  },
};

export const OFFICE_SIZE = spaceSize(OFFICE_PROBLEM.space);
