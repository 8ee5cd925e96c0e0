import type { UserRules } from '#shared/engine/section.ts';
import { MM_PER_IN, MPA_PER_KSI, MPA_PER_PSI } from '#shared/engine/units.ts';
import type { AxisDefinition, SpaceDefinition, SteelSetsDefinition, View } from '#shared/sweep/problem.ts';

/** A saved sweep of the demo and the run it was started for. The demand is the beam's own. */
export interface DemoSweep {
  readonly key: string;
  readonly project: string;
  readonly beam: string;
  readonly name: string;
  /** Days after the demo's first day. */
  readonly day: number;
  readonly space: SpaceDefinition;
  readonly rules: UserRules;
  readonly view: View;
  /** Views opened later on the finished run. */
  readonly moreViews: readonly View[];
}

const RULES: UserRules = {
  minDepthToWidth: 1,
  maxDepthToWidth: 3,
  maxLayers: 2,
  oneSizePerFace: true,
  excludedBars: [],
  columnWidthMm: null,
  minCompressionShare: null,
  requireHangers: true,
};

const STEEL_BY_DEPTH: View = { x: 'steelKgPerM', y: 'depthMm' };
const COST_BY_DEPTH: View = { x: 'costPerM', y: 'depthMm' };

const inches = (from: number, to: number, step: number): AxisDefinition => ({
  kind: 'range',
  from: from * MM_PER_IN,
  to: to * MM_PER_IN,
  step: step * MM_PER_IN,
});
const psi = (...values: number[]): AxisDefinition => ({
  kind: 'list',
  values: values.map((value) => value * MPA_PER_PSI),
});
const range = (from: number, to: number, step: number): AxisDefinition => ({ kind: 'range', from, to, step });
const list = (...values: number[]): AxisDefinition => ({ kind: 'list', values });
const upTo = (last: number): number[] => Array.from({ length: last - 1 }, (_, i) => i + 2);

const bars = (sizes: readonly string[], most: number, none = false): SteelSetsDefinition => ({
  kind: 'bars',
  sizes: [...sizes],
  counts: upTo(most),
  none,
});

const US_FIXED = {
  fy: list(60 * MPA_PER_KSI),
  cover: list(1.5 * MM_PER_IN),
  stirrups: [{ bar: '#3', legs: 2, spacingMm: 8 * MM_PER_IN }],
};
const EN_FIXED = {
  fy: list(500),
  cover: list(35),
  stirrups: [{ bar: '8', legs: 2, spacingMm: 250, isDesigned: true }],
};
const SI_FIXED = {
  fy: list(420),
  cover: list(40),
  stirrups: [{ bar: '10', legs: 2, spacingMm: 200 }],
};

export const DEMO_SWEEPS: readonly DemoSweep[] = [
  {
    key: 'reading-room',
    project: 'library',
    beam: 'B1',
    name: 'Office forms, 2 in steps',
    day: 2,
    // 5 × 17 × 4 × (5 × 11) × (1 + 3 × 4) = 243,100 sections.
    space: {
      ...US_FIXED,
      width: inches(10, 18, 2),
      depth: inches(16, 32, 1),
      fc: psi(4000, 5000, 6000, 7000),
      tension: bars(['#6', '#7', '#8', '#9', '#10'], 12),
      compression: bars(['#5', '#6', '#7'], 5, true),
    },
    rules: RULES,
    view: STEEL_BY_DEPTH,
    moreViews: [COST_BY_DEPTH, { x: 'steelKgPerM', y: 'curvatureDuctility' }],
  },
  {
    key: 'reading-room-fine',
    project: 'library',
    beam: 'B1',
    name: 'Every inch of width, more compression bars',
    day: 3,
    // 11 × 33 × 4 × (5 × 11) × (1 + 3 × 5) = 1,277,760 sections.
    space: {
      ...US_FIXED,
      width: inches(10, 20, 1),
      depth: inches(16, 32, 0.5),
      fc: psi(4000, 5000, 6000, 7000),
      tension: bars(['#6', '#7', '#8', '#9', '#10'], 12),
      compression: bars(['#5', '#6', '#8'], 6, true),
    },
    rules: RULES,
    view: COST_BY_DEPTH,
    moreViews: [STEEL_BY_DEPTH],
  },
  {
    key: 'stacks',
    project: 'library',
    beam: 'B2',
    name: 'Office forms',
    day: 3,
    // 4 × 9 × 2 × (4 × 9) × (1 + 2 × 3) = 18,144 sections.
    space: {
      ...US_FIXED,
      width: inches(12, 18, 2),
      depth: inches(18, 34, 2),
      fc: psi(4000, 5000),
      tension: bars(['#7', '#8', '#9', '#10'], 10),
      compression: bars(['#6', '#7'], 4, true),
    },
    rules: RULES,
    view: COST_BY_DEPTH,
    moreViews: [],
  },
  {
    key: 'entrance-shallow',
    project: 'library',
    beam: 'B3',
    name: 'As shallow as the ceiling asks',
    day: 4,
    // 4 × 5 × 4 × (3 × 9) × (1 + 2 × 4) = 19,440 sections, none deep enough for 780 kip·ft and μφ ≥ 6.
    space: {
      ...US_FIXED,
      width: inches(12, 18, 2),
      depth: inches(12, 16, 1),
      fc: psi(4000, 5000, 6000, 7000),
      tension: bars(['#8', '#9', '#10'], 10),
      compression: bars(['#7', '#8'], 5, true),
    },
    rules: { ...RULES, minDepthToWidth: null },
    view: STEEL_BY_DEPTH,
    moreViews: [],
  },
  {
    key: 'roof',
    project: 'library',
    beam: 'B4',
    name: 'One mix, singly reinforced',
    day: 6,
    // 3 × 12 × 1 × (4 × 7) × 1 = 1,008 sections.
    space: {
      ...US_FIXED,
      width: inches(10, 14, 2),
      depth: inches(14, 25, 1),
      fc: psi(4000),
      tension: bars(['#6', '#7', '#8', '#9'], 8),
      compression: { kind: 'bars', sizes: ['#4'], counts: [2], none: false },
    },
    rules: RULES,
    view: STEEL_BY_DEPTH,
    moreViews: [],
  },
  {
    key: 'ground-floor',
    project: 'clinic',
    beam: 'G1',
    name: 'Standard forms, 50 mm steps',
    day: 11,
    // 5 × 13 × 3 × (4 × 9) × (1 + 2 × 3) = 49,140 sections.
    space: {
      ...SI_FIXED,
      width: range(300, 500, 50),
      depth: range(400, 1000, 50),
      fc: list(25, 30, 35),
      tension: bars(['16', '20', '25', '28'], 10),
      compression: bars(['16', '20'], 4, true),
    },
    rules: RULES,
    view: COST_BY_DEPTH,
    moreViews: [STEEL_BY_DEPTH],
  },
  {
    key: 'plant-room',
    project: 'library',
    beam: 'B7',
    name: 'Slab worked in, stirrups designed',
    day: 6,
    // 4 × 9 × 2 × (4 × 7) × (1 + 2 × 3) = 14,112 sections.
    space: {
      ...US_FIXED,
      stirrups: [{ bar: '#4', legs: 2, spacingMm: 12 * MM_PER_IN, isDesigned: true }],
      width: inches(12, 18, 2),
      depth: inches(18, 30, 1.5),
      fc: psi(4000, 5000),
      tension: bars(['#7', '#8', '#9', '#10'], 8),
      compression: bars(['#5', '#6'], 4, true),
      flange: {
        shape: 't',
        thicknessMm: 5 * MM_PER_IN,
        face: 'compression',
        width: { kind: 'effective', clearToNextWebMm: 84 * MM_PER_IN, spanMm: 300 * MM_PER_IN },
      },
    },
    rules: RULES,
    view: COST_BY_DEPTH,
    moreViews: [STEEL_BY_DEPTH],
  },
  {
    key: 'arcade-columns',
    project: 'arcade',
    beam: 'P1',
    name: 'Hogging at the columns, slab in tension',
    day: 14,
    // 5 × 8 × 2 × (3 × 7) × (2 × 4) = 13,440 sections.
    space: {
      ...EN_FIXED,
      width: range(250, 450, 50),
      depth: range(400, 750, 50),
      fc: list(30, 35),
      tension: bars(['16', '20', '25'], 8),
      compression: bars(['16', '20'], 5),
      flange: {
        shape: 't',
        thicknessMm: 160,
        face: 'tension',
        width: {
          kind: 'effective',
          clearToNextWebMm: 2700,
          spanMm: 6400,
          support: 'both-ends-continuous',
        },
      },
    },
    rules: RULES,
    view: STEEL_BY_DEPTH,
    moreViews: [COST_BY_DEPTH],
  },
];
