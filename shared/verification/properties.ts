/** What must hold for any section, drawn at random by the tests; they take their sentences, numbers and seeds from here. */
export interface TestedProperty {
  /** A rule that must hold, or an answer found a second way by code that shares nothing with the first. */
  readonly kind: 'property' | 'comparison';
  readonly statement: string;
  /** What is drawn at random. */
  readonly of: 'sections' | 'arrangements' | 'sweeps' | 'sets of points';
  /** How many are drawn. */
  readonly runs: number;
  readonly seed: number;
  /** The test fails unless at least so many of what it names were really compared. */
  readonly atLeast?: { readonly count: number; readonly what: string };
}

const ductility = {
  'ductility-tension-steel': {
    kind: 'property',
    statement: 'Curvature ductility falls with more tension steel',
    of: 'sections',
    runs: 500,
    seed: 7,
  },
  'ductility-compression-steel': {
    kind: 'property',
    statement:
      'Curvature ductility rises with more compression steel while that steel is above the neutral axis',
    of: 'sections',
    runs: 500,
    seed: 7,
  },
  'ductility-concrete': {
    kind: 'property',
    statement:
      'Curvature ductility rises with stronger concrete at the same steel, but for the step of the metric β1 at 55 MPa',
    of: 'sections',
    runs: 500,
    seed: 8,
  },
} as const satisfies Record<string, TestedProperty>;

const strength = {
  'strength-width': {
    kind: 'property',
    statement: 'Nominal strength rises with width',
    of: 'sections',
    runs: 500,
    seed: 7,
  },
  'strength-depth': {
    kind: 'property',
    statement: 'Nominal strength rises with depth',
    of: 'sections',
    runs: 500,
    seed: 7,
  },
  'strength-concrete': {
    kind: 'property',
    statement: 'Nominal strength rises with concrete strength',
    of: 'sections',
    runs: 500,
    seed: 7,
  },
  'strength-tension-steel': {
    kind: 'property',
    statement: 'Nominal strength rises with tension steel',
    of: 'sections',
    runs: 500,
    seed: 7,
  },
  'split-layer': {
    kind: 'property',
    statement: 'A section does not change when a layer is split in two at the same depth',
    of: 'sections',
    runs: 300,
    seed: 5,
  },
  'scaled-section': {
    kind: 'property',
    statement:
      'A section scaled is the same beam: twice every length gives eight times Mn and the same curvature ductility',
    of: 'sections',
    runs: 300,
    seed: 6,
  },
  equilibrium: {
    kind: 'property',
    statement:
      'The neutral axis balances every section to 1e-9 of the concrete force, and is the deepest axis that does',
    of: 'sections',
    runs: 1500,
    seed: 318,
  },
  bisection: {
    kind: 'comparison',
    statement: 'The neutral axis equals an independent bisection where displaced concrete is ignored',
    of: 'sections',
    runs: 1500,
    seed: 20,
  },
} as const satisfies Record<string, TestedProperty>;

const bars = {
  'bars-remeasured': {
    kind: 'comparison',
    statement:
      'Bars measured again from their coordinates alone never violate a gap, a cover, symmetry or the line of the bars below',
    of: 'arrangements',
    runs: 4000,
    seed: 25,
    atLeast: { count: 800, what: 'arrangements that fit' },
  },
  'width-needed': {
    kind: 'property',
    statement: 'Bars fit in exactly the width they are said to need, and not in a tenth of a millimetre less',
    of: 'arrangements',
    runs: 1500,
    seed: 26,
  },
} as const satisfies Record<string, TestedProperty>;

const sweeps = {
  'two-layers': {
    kind: 'comparison',
    statement:
      'The sweep’s hot loop and the engine that explains agree bit for bit in every measure and every check of every section',
    of: 'sweeps',
    runs: 400,
    seed: 20261201,
    atLeast: { count: 20_000, what: 'sections' },
  },
  outcome: {
    kind: 'comparison',
    statement:
      'Counts, front, band, best values, density and misses of a sweep are those of evaluating every section by itself',
    of: 'sweeps',
    runs: 100,
    seed: 31,
  },
  'naive-front': {
    kind: 'comparison',
    statement:
      'The front equals the O(n²) definition on tie-heavy integer grids, in every pair of directions',
    of: 'sets of points',
    runs: 3000,
    seed: 2,
  },
  'front-order': {
    kind: 'property',
    statement: 'The front does not depend on the order of arrival',
    of: 'sets of points',
    runs: 1000,
    seed: 3,
  },
  'merge-cuts': {
    kind: 'property',
    statement:
      'A sweep gives the same result and hash however it is cut and in whatever order its parts arrive',
    of: 'sweeps',
    runs: 150,
    seed: 11,
  },
  'merge-algebra': {
    kind: 'property',
    statement: 'Merging the parts of a sweep is associative, commutative, and neutral with nothing',
    of: 'sweeps',
    runs: 150,
    seed: 12,
  },
  'cannot-fit': {
    kind: 'property',
    statement: 'A sweep counts the sections that cannot fit without evaluating them',
    of: 'sweeps',
    runs: 100,
    seed: 32,
  },
} as const satisfies Record<string, TestedProperty>;

export const PROPERTIES = { ...ductility, ...strength, ...bars, ...sweeps };

export const TESTED_PROPERTIES: readonly TestedProperty[] = Object.values(PROPERTIES);

export const PROPERTIES_INTRODUCTION =
  'Rules that hold for any section, tried by the tests on what is drawn at random from fixed seeds.';

export const COMPARISONS_INTRODUCTION =
  'The same answer found a second way by code written apart. The hot loop and the engine that explains share the solvers of the two neutral axes and the comparisons with limits; the bisection holds the solver at ultimate.';
