import { curveChoicesOf, ductilityMeasureOf, isCurveMeasure } from './curve-basis.ts';
import { bilinearOf, ductilitiesOf, type Bilinear } from './curve-marks.ts';
import { curveModel, type CurveModel } from './curve-model.ts';
import { Tracer, type Trace } from './curve-trace.ts';
import type { DefinedDuctility } from './defined-ductility.ts';
import type { Arrangement, CurveDuctilityResult, DuctilityResult } from './evaluation.ts';
import type { DesignBasis, DuctilityMeasure, SectionInput } from './section.ts';
import type { SteelLayout } from './steel-layout.ts';

/** Marks of a curve that ductility asks for. */
export interface CurveEnds {
  readonly trace: Trace;
  readonly bilinear: Bilinear | null;
}

/**
 * First yield, peak, ultimate and the bilinear yield of a curve, and no more: the numbers of `momentCurvature` to the bit,
 * without the first crack, the uncracked branch and the words.
 */
export function curveEnds(model: CurveModel): CurveEnds {
  const trace = new Tracer(model).trace();
  return { trace, bilinear: bilinearOf(trace) };
}

/** μφ of a curve by one of its yields; NaN where no bar yields, or too late for two lines to stand for the curve. */
export function curveMuPhi({ trace, bilinear }: CurveEnds, measure: DuctilityMeasure): number {
  const last = trace.ultimate.curvaturePerMm;
  if (measure === 'curve-bilinear') return bilinear ? last / bilinear.yieldCurvaturePerMm : NaN;
  return trace.firstYield ? last / trace.firstYield.curvaturePerMm : NaN;
}

/** What the full curve says of a section's ductility; null where the basis measures by the closed path. */
export function curveDuctilityOf(
  section: SectionInput,
  placed: { readonly layout: SteelLayout; readonly arrangement: Arrangement | null },
  basis: DesignBasis,
): CurveDuctilityResult | null {
  if (!isCurveMeasure(basis)) return null;
  const model = curveModel({ section, ...placed, basis, choices: curveChoicesOf(basis) });
  const { trace, bilinear } = curveEnds(model);
  const { firstYield, ultimate, cause } = trace;
  return {
    curvatureFirstYieldPerMm: firstYield?.curvaturePerMm ?? null,
    curvatureBilinearYieldPerMm: bilinear?.yieldCurvaturePerMm ?? null,
    curvatureUltimatePerMm: ultimate.curvaturePerMm,
    cause,
    ...ductilitiesOf(model, trace, bilinear),
  };
}

/** The μφ that a basis holds against the target, with its definition; null where there is none to measure. */
export function measuredDuctility(
  basis: DesignBasis,
  closed: DuctilityResult | null,
  curve: CurveDuctilityResult | null,
): DefinedDuctility | null {
  const measure = ductilityMeasureOf(basis);
  if (measure === 'closed')
    return closed && { value: closed.curvatureDuctility, definition: closed.definition };
  return curve && (measure === 'curve-bilinear' ? curve.byBilinearYield : curve.byFirstYield);
}
