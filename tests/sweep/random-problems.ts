import fc from 'fast-check';
import { BARS } from '#shared/engine/bars.ts';
import { CONCRETE_LAW_IDS, STEEL_LAW_IDS, type CurveChoices } from '#shared/engine/curve-choices.ts';
import {
  BAR_STANDARDS,
  BEND_ALLOWANCES,
  DISPLACED_CONCRETE,
  FACES,
  FLANGE_SHAPES,
  RULE_SET_IDS,
  SUPPORTS,
  YIELD_CURVATURE_AT,
  type Flange,
  type Rates,
} from '#shared/engine/section.ts';
import { RULE_SETS } from '#shared/engine/rules/rule-sets.ts';
import { seismicSystemsOf } from '#shared/engine/seismic.ts';
import type { SpaceDefinition, SteelSetsDefinition, SweepProblem } from '#shared/sweep/problem.ts';
import { randomNationalValues } from './random-national-values.ts';

/** Random sweep problems of a few hundred sections, over every code, bar standard, convention and rule. */
const orNull = <T>(arbitrary: fc.Arbitrary<T>) => fc.option(arbitrary, { nil: null });
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const listOf = (min: number, max: number, maxLength = 3) =>
  fc
    .array(between(min, max), { minLength: 1, maxLength })
    .map((values) => ({ kind: 'list' as const, values }));

const ratesOf = (fcMPa: readonly number[]): fc.Arbitrary<Rates> =>
  fc.record({
    currency: fc.constant('EUR'),
    steelPerKg: orNull(between(0.5, 3)),
    stirrupPerKg: orNull(between(0.5, 3)),
    formworkPerM2: orNull(between(20, 90)),
    concrete: fc.constant(fcMPa.map((f) => ({ fcMPa: f, costPerM3: 80 + f, co2eKgPerM3: 150 + 3 * f }))),
    steelCo2ePerKg: orNull(between(0.5, 2)),
    lapShare: between(0, 0.2),
    wasteShare: between(0, 0.1),
  });

function barSets(
  standard: keyof typeof BARS,
  minCount: number,
  isEmptyAllowed: boolean,
): fc.Arbitrary<SteelSetsDefinition> {
  const sizes = BARS[standard].slice(1, 9).map((bar) => bar.designation);
  const group = fc
    .uniqueArray(fc.constantFrom(...sizes), { minLength: 2, maxLength: 2 })
    .chain(([a, b]) =>
      fc.tuple(
        fc.constant(a!),
        fc.integer({ min: 1, max: 4 }),
        fc.constant(b!),
        fc.integer({ min: 1, max: 4 }),
      ),
    )
    .map(([a, m, b, n]) => [
      { bar: a, count: m },
      { bar: b, count: n },
    ]);
  return fc.record({
    kind: fc.constant('bars' as const),
    sizes: fc.uniqueArray(fc.constantFrom(...sizes), { minLength: 1, maxLength: 3 }),
    counts: fc.uniqueArray(fc.integer({ min: minCount, max: 9 }), { minLength: 1, maxLength: 3 }),
    none: isEmptyAllowed ? fc.boolean() : fc.constant(false),
    mixed: fc.array(group, { maxLength: 2 }),
  });
}

const areaSets = (min: number): fc.Arbitrary<SteelSetsDefinition> =>
  fc.record({
    kind: fc.constant('areas' as const),
    areasMm2: fc.array(between(min, 6000), { minLength: 1, maxLength: 3 }),
    at: fc.oneof(fc.record({ offsetMm: between(20, 140) }), fc.record({ shareOfDepth: between(0.05, 0.45) })),
  });

/** Slabs on webs to 700 mm in sections from 150 mm on, at either face. */
const curve: fc.Arbitrary<CurveChoices> = fc.record({
  concreteLaw: fc.constantFrom(...CONCRETE_LAW_IDS),
  steelLaw: fc.constantFrom(...STEEL_LAW_IDS),
  crushingStrain: fc.constantFrom(undefined, 0.003),
  hoopYieldMPa: fc.constantFrom(undefined, 300),
});

const flange: fc.Arbitrary<Flange> = fc.record({
  shape: fc.constantFrom(...FLANGE_SHAPES),
  thicknessMm: between(40, 145),
  face: fc.constantFrom(...FACES),
  width: fc.oneof(
    fc.record({ kind: fc.constant('given' as const), widthMm: between(700, 3000) }),
    fc.record({
      kind: fc.constant('effective' as const),
      clearToNextWebMm: between(200, 5000),
      spanMm: between(2000, 12000),
      support: fc.constantFrom(...SUPPORTS),
    }),
  ),
});

const rules = (sizes: readonly string[]) =>
  fc.record({
    minDepthToWidth: orNull(between(0.5, 1.5)),
    maxDepthToWidth: orNull(between(1.5, 4)),
    maxLayers: fc.integer({ min: 1, max: 3 }),
    oneSizePerFace: fc.boolean(),
    excludedBars: fc.array(fc.constantFrom(...sizes), { maxLength: 1 }),
    columnWidthMm: orNull(fc.constant(400)),
    minCompressionShare: orNull(between(0, 0.6)),
    requireHangers: fc.boolean(),
  });

export const randomProblem: fc.Arbitrary<SweepProblem> = fc
  .record({
    standard: fc.constantFrom(...BAR_STANDARDS),
    isArea: fc.boolean(),
    fcMPa: fc.array(between(15, 85), { minLength: 1, maxLength: 2 }),
  })
  .chain(({ standard, isArea, fcMPa }) => {
    const space: fc.Arbitrary<SpaceDefinition> = fc.record({
      width: fc.oneof(
        listOf(150, 700),
        fc.constant({ kind: 'range' as const, from: 300, to: 500, step: 100 }),
      ),
      depth: fc.oneof(
        listOf(150, 1200, 4),
        listOf(850, 1600, 3),
        fc.constant({ kind: 'range' as const, from: 350, to: 800, step: 150 }),
      ),
      fc: fc.constant({ kind: 'list' as const, values: fcMPa }),
      fy: listOf(250, 600, 2),
      cover: listOf(20, 60, 2),
      stirrups: fc.array(
        orNull(
          fc.record({
            bar: fc.constantFrom(...BARS[standard].slice(0, 3).map((b) => b.designation)),
            legs: fc.integer({ min: 2, max: 4 }),
            spacingMm: between(75, 300),
            isDesigned: fc.constantFrom(undefined, false, true, true),
          }),
        ),
        { minLength: 1, maxLength: 2 },
      ),
      tension: isArea ? areaSets(100) : barSets(standard, 1, false),
      compression: isArea ? areaSets(0) : barSets(standard, 1, true),
      flange: orNull(flange),
    });
    const basis = fc.constantFrom(...RULE_SET_IDS).chain((ruleSet) =>
      fc.record({
        ruleSet: fc.constant(ruleSet),
        seismicSystem: fc.constantFrom(undefined, ...seismicSystemsOf(RULE_SETS[ruleSet])),
        barStandard: fc.constant(standard),
        esMPa: fc.constantFrom(200000, 199948),
        maxAggregateMm: between(10, 40),
        bendAllowance: fc.constantFrom(...BEND_ALLOWANCES),
        displacedConcrete: fc.constantFrom(...DISPLACED_CONCRETE),
        yieldCurvatureAt: fc.constantFrom(...YIELD_CURVATURE_AT),
        fytMPa: fc.constantFrom(280, 420, 550),
        slabMm: fc.constantFrom(0, 150),
        skinBar: fc.constantFrom(undefined, null, ...BARS[standard].slice(1, 3).map((b) => b.designation)),
        barOversize: fc.constantFrom(undefined, 1.15),
        stirrupStepMm: fc.constantFrom(undefined, 10, 25.4),
        leastStirrupSpacingMm: fc.constantFrom(undefined, 100),
        rates: orNull(ratesOf(fcMPa)),
        nationalValues: orNull(randomNationalValues),
      }),
    );
    const demand = fc.record({
      muNmm: orNull(between(0, 9e8)),
      ductilityTarget: orNull(between(1, 12)),
      depthCapMm: orNull(between(300, 900)),
      vuN: orNull(between(0, 6e5)),
      spanMm: orNull(between(2000, 12000)),
      support: orNull(fc.constantFrom(...SUPPORTS)),
    });
    return fc.record({ space, basis, demand, rules: rules(BARS[standard].map((b) => b.designation)) });
  });

/** The same with μφ read off the full curve. */
const randomCurveProblem: fc.Arbitrary<SweepProblem> = fc
  .record({
    problem: randomProblem,
    ductilityMeasure: fc.constantFrom('curve-first-yield' as const, 'curve-bilinear' as const),
    curve: fc.option(curve, { nil: undefined }),
  })
  .map(({ problem, ...measured }) => ({ ...problem, basis: { ...problem.basis, ...measured } }));

/** A curve costs a hundred times the rest of a section: one problem in eight draws them. */
export const randomProblemByAnyMeasure = fc.oneof(
  { weight: 7, arbitrary: randomProblem },
  { weight: 1, arbitrary: randomCurveProblem },
);
