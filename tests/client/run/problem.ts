import type { DesignBasis, Demand, UserRules } from '#shared/engine/section.ts';
import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';

export const BASIS = {
  ruleSet: 'aci318m-19',
  barStandard: 'iso',
  esMPa: 200_000,
  fytMPa: 420,
  maxAggregateMm: 20,
  bendAllowance: 'corner-in-bend',
  displacedConcrete: 'deduct',
  yieldCurvatureAt: 'outermost-layer',
  slabMm: 0,
  rates: null,
} as const satisfies DesignBasis;
export const NO_DEMAND: Demand = { muNmm: null, ductilityTarget: null, depthCapMm: null };
export const NO_RULES = {
  minDepthToWidth: null,
  maxDepthToWidth: null,
  maxLayers: 2,
  oneSizePerFace: true,
  excludedBars: [] as string[],
  columnWidthMm: null,
  minCompressionShare: null,
  requireHangers: false,
} satisfies UserRules;

/** A small sweep with sections of every fate: met, too weak, too brittle, not to be placed. */
export const DEFINITION: SweepDefinition = {
  space: {
    width: { kind: 'range', from: 250, to: 400, step: 50 },
    depth: { kind: 'range', from: 400, to: 700, step: 50 },
    fc: { kind: 'list', values: [25, 30, 35] },
    fy: { kind: 'list', values: [420] },
    cover: { kind: 'list', values: [40] },
    stirrups: [{ bar: '10', legs: 2, spacingMm: 150 }],
    tension: { kind: 'bars', sizes: ['20', '25', '32'], counts: [2, 3, 4, 5, 6], none: false },
    compression: { kind: 'bars', sizes: ['16'], counts: [2, 3], none: true },
  },
  demand: { muNmm: 250e6, ductilityTarget: 4, depthCapMm: 650 },
  rules: NO_RULES,
  view: { x: 'steelKgPerM', y: 'curvatureDuctility' },
};
