import fc from 'fast-check';
import { CONCRETE_LAW_IDS, STEEL_LAW_IDS, type CurveChoices } from '#shared/engine/curve-choices.ts';
import type { CurveInput } from '#shared/engine/curve-model.ts';
import {
  FACES,
  FLANGE_SHAPES,
  YIELD_CURVATURE_AT,
  type Layer,
  type SectionInput,
} from '#shared/engine/section.ts';
import { placeSteel, type SteelLayout } from '#shared/engine/steel-layout.ts';
import { METRIC_BASIS } from '#shared/verification/layered-section.ts';

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const integerBetween = (min: number, max: number) => fc.integer({ min, max });

/** Beams from a 150 × 200 to a 900 × 1500, every other with a slab at either face, steel from 0.15 to 3.5 % in up to three layers, f′c from 2500 to 12 000 psi. */
const drawn = fc.record({
  b: between(150, 900),
  h: between(200, 1500),
  cover: between(20, 50),
  inset: between(5, 30),
  logRatio: between(Math.log(0.0015), Math.log(0.035)),
  layers: integerBetween(1, 3),
  topShare: fc.option(between(0.1, 1), { nil: 0 }),
  fcMPa: between(17.24, 82.74),
  fyMPa: between(250, 690),
  hoop: fc.constantFrom('10', '12', '16'),
  legs: integerBetween(2, 4),
  spacing: between(60, 300),
  isDeducted: fc.boolean(),
  yieldCurvatureAt: fc.constantFrom(...YIELD_CURVATURE_AT),
  slab: fc.option(
    fc.record({
      shape: fc.constantFrom(...FLANGE_SHAPES),
      face: fc.constantFrom(...FACES),
      overhangShare: between(0, 6),
      thicknessShare: between(0.05, 0.35),
    }),
    { nil: null },
  ),
});
type Drawn = typeof drawn extends fc.Arbitrary<infer T> ? T : never;

function sectionOf(d: Drawn): SectionInput {
  const depth = d.h - d.cover - 10 - d.inset;
  const steel = Math.exp(d.logRatio) * d.b * depth;
  const kept = Array.from({ length: d.layers }, (_, i) => depth - 50 * i).filter((y) => y > 0.6 * d.h);
  const tension = kept.map((depthMm): Layer => ({ depthMm, areaMm2: steel / kept.length, face: 'tension' }));
  const top: Layer = { depthMm: d.cover + 10 + d.inset, areaMm2: d.topShare * steel, face: 'compression' };
  return {
    widthMm: d.b,
    depthMm: d.h,
    fcMPa: d.fcMPa,
    fyMPa: d.fyMPa,
    coverMm: d.cover,
    stirrup: { bar: d.hoop, legs: d.legs, spacingMm: d.spacing },
    reinforcement: { kind: 'layers', layers: [top, ...tension] },
    flange: d.slab && {
      shape: d.slab.shape,
      face: d.slab.face,
      thicknessMm: d.slab.thicknessShare * d.h,
      width: { kind: 'given', widthMm: (1 + d.slab.overhangShare) * d.b },
    },
  };
}

type RandomCurve = CurveInput & { readonly layout: SteelLayout };

/** So many sections that can be built, each with its curve's input; all laws come by turns unless one is given. */
export function randomCurves(
  { runs, seed }: { readonly runs: number; readonly seed: number },
  choices?: CurveChoices,
): RandomCurve[] {
  return fc.sample(drawn, { numRuns: runs, seed }).flatMap((d, i) => {
    const section = sectionOf(d);
    const basis = {
      ...METRIC_BASIS,
      displacedConcrete: d.isDeducted ? ('deduct' as const) : ('ignore' as const),
      yieldCurvatureAt: d.yieldCurvatureAt,
    };
    const { layout, arrangement } = placeSteel(section, basis, 2);
    const concreteLaw = CONCRETE_LAW_IDS[i % CONCRETE_LAW_IDS.length]!;
    const steelLaw = STEEL_LAW_IDS[Math.floor(i / CONCRETE_LAW_IDS.length) % STEEL_LAW_IDS.length]!;
    if (!layout) return [];
    return [{ section, layout, arrangement, basis, choices: choices ?? { concreteLaw, steelLaw } }];
  });
}
