/** What must hold for any section, drawn at random by the tests; they take their sentences, numbers and seeds from here. */
export interface TestedProperty {
  /** A rule that must hold, or an answer found a second way by code that shares nothing with the first. */
  readonly kind: 'property' | 'comparison';
  readonly statement: string;
  /** What is drawn at random. */
  readonly of: 'sections' | 'laws' | 'arrangements' | 'sweeps' | 'sets of points';
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

const flanges = {
  'flange-of-web': {
    kind: 'property',
    statement: 'A T whose flange is as wide as its web is the rectangle, to the bit, in every result',
    of: 'sections',
    runs: 500,
    seed: 61,
  },
  'flange-width': {
    kind: 'property',
    statement:
      'Nominal strength rises with the width of a flange in compression, and both neutral axes lie higher',
    of: 'sections',
    runs: 500,
    seed: 62,
  },
  'flange-hogging': {
    kind: 'property',
    statement: 'With the slab in tension a T is its web at yield and at ultimate, and cracks later',
    of: 'sections',
    runs: 500,
    seed: 63,
  },
  'flange-equilibrium': {
    kind: 'comparison',
    statement:
      'The neutral axis of a T balances to 1e-9 of the concrete force, is the deepest axis that does, and equals an independent bisection where displaced concrete is ignored',
    of: 'sections',
    runs: 1500,
    seed: 64,
    atLeast: { count: 300, what: 'blocks deeper than the flange' },
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
  'naive-front-in-three': {
    kind: 'comparison',
    statement: 'The front in three measures equals the O(n²) definition on tie-heavy integer grids',
    of: 'sets of points',
    runs: 3000,
    seed: 3,
  },
  'cut-front-in-three': {
    kind: 'property',
    statement:
      'The front in three measures is the same however its points are cut, and in whatever order the parts are joined',
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

const curves = {
  'curve-lean': {
    kind: 'property',
    statement:
      'The ductility that a sweep reads off a curve, and its first yield, peak and ultimate, are those of the whole curve to the bit',
    of: 'sections',
    runs: 400,
    seed: 77,
    atLeast: { count: 200, what: 'curves that yield' },
  },
  'law-integrals': {
    kind: 'comparison',
    statement:
      'Closed-form integrals of a concrete law are those of adaptive quadrature; tabulated ones within 5e-5 from a quarter of the peak strain on',
    of: 'laws',
    runs: 300,
    seed: 51,
  },
  'curve-strips': {
    kind: 'comparison',
    statement:
      'The moment–curvature curve and an independent summation of strips agree: peak moment within 0.5 %, yield and ultimate curvature within 2 %, or within these with finer strips, at an end that is only touched, or where the section has more than one axis',
    of: 'sections',
    runs: 5500,
    seed: 52,
    atLeast: { count: 5000, what: 'sections' },
  },
  'block-strips': {
    kind: 'comparison',
    statement:
      'Nominal strength by the rectangular block and by a summation of strips agree within 0.5 %, the curvature at ultimate within 2 %',
    of: 'sections',
    runs: 1200,
    seed: 53,
    atLeast: { count: 1000, what: 'sections' },
  },
  'curve-equilibrium': {
    kind: 'property',
    statement:
      'Every point of a moment–curvature curve balances to 1e-9 of the concrete’s force, and the moment is the same about the face as about the axis',
    of: 'sections',
    runs: 1500,
    seed: 54,
  },
  'curve-scaled': {
    kind: 'property',
    statement:
      'A section twice as large in every length has half the curvatures, eight times the moments and the same ductility on its curve',
    of: 'sections',
    runs: 300,
    seed: 55,
  },
  'curve-tension-steel': {
    kind: 'property',
    statement:
      'On the curve the peak moment rises and ductility falls with more tension steel, where crushing ends the curve',
    of: 'sections',
    runs: 500,
    seed: 56,
    atLeast: { count: 250, what: 'pairs of curves' },
  },
  'curve-concrete': {
    kind: 'property',
    statement:
      'On the parabola–rectangle curve the peak moment and ductility rise with f′c at the same crushing strain',
    of: 'sections',
    runs: 300,
    seed: 57,
  },
} as const satisfies Record<string, TestedProperty>;

const stirrups = {
  'stirrups-largest': {
    kind: 'comparison',
    statement:
      'A designed stirrup spacing is the largest of all multiples of the step that meets every limit, tried one by one; with none, a check fails',
    of: 'sections',
    runs: 150,
    seed: 3,
    atLeast: { count: 60, what: 'spacings' },
  },
  'stirrups-shear': {
    kind: 'property',
    statement: 'A designed stirrup spacing is never wider under a heavier shear',
    of: 'sections',
    runs: 150,
    seed: 4,
  },
  'stirrups-books': {
    kind: 'property',
    statement:
      'The inch-pound and the metric edition of ACI 318-19 design stirrup spacings at most one step apart',
    of: 'sections',
    runs: 150,
    seed: 5,
  },
} as const satisfies Record<string, TestedProperty>;

export const PROPERTIES = {
  ...ductility,
  ...strength,
  ...flanges,
  ...bars,
  ...stirrups,
  ...curves,
  ...sweeps,
};

export const TESTED_PROPERTIES: readonly TestedProperty[] = Object.values(PROPERTIES);

export const PROPERTIES_INTRODUCTION =
  'Rules that hold for any section, tried by the tests on what is drawn at random from fixed seeds.';

export const COMPARISONS_INTRODUCTION =
  'The same answer found a second way by code written apart. The hot loop and the engine that explains share the solvers of the two neutral axes and the comparisons with limits; the bisection holds the solver at ultimate.';
