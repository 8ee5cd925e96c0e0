import type { CurveModel } from './curve-model.ts';
import type { CurvePoint } from './curve-point.ts';
import type { DefinedDuctility } from './defined-ductility.ts';
import type { UltimateCause } from './ultimate-cause.ts';
import type { Trace } from './curve-trace.ts';

/** Two straight lines that stand for a curve. */
export interface Bilinear {
  readonly yieldCurvaturePerMm: number;
  readonly momentNmm: number;
  readonly rule: string;
}

export interface CurveDuctility {
  readonly byFirstYield: DefinedDuctility;
  readonly byBilinearYield: DefinedDuctility;
}

const BILINEAR_RULE =
  'two lines of the same area under them as the cracked section’s curve to ultimate: from the origin through first yield, then level to ultimate';

/** Plateau over peak moment above which two lines no longer stand for the curve. */
const HIGHEST_PLATEAU = 1.1;

/** Area under straight lines from the origin through the points, N (N·mm × 1/mm). */
function areaUnder(points: readonly CurvePoint[]): number {
  let area = 0;
  let curvature = 0;
  let moment = 0;
  for (const point of points) {
    area += 0.5 * (moment + point.momentNmm) * (point.curvaturePerMm - curvature);
    curvature = point.curvaturePerMm;
    moment = point.momentNmm;
  }
  return area;
}

/**
 * Equal-area idealisation (common practice). With slope K through first yield and plateau M, the area M φu − M²/2K equals
 * that of the curve, A: M = K φu (1 − √(1 − 2A/(K φu²))).
 * The curve bulges above its line before yield, so that M may pass the peak a little.
 * @returns null where no bar yields, or so late that M would have to pass the peak by more than 10 % (engine rule).
 */
export function bilinearOf({ points, firstYield, peak, ultimate }: Trace): Bilinear | null {
  if (!firstYield) return null;
  const slope = firstYield.momentNmm / firstYield.curvaturePerMm;
  const last = ultimate.curvaturePerMm;
  const inner = 1 - (2 * areaUnder(points)) / (slope * last * last);
  if (!(inner >= 0)) return null;
  const momentNmm = slope * last * (1 - Math.sqrt(inner));
  if (momentNmm > HIGHEST_PLATEAU * peak.momentNmm) return null;
  return { yieldCurvaturePerMm: momentNmm / slope, momentNmm, rule: BILINEAR_RULE };
}

const END_OF: Readonly<Record<UltimateCause, (model: CurveModel) => string>> = {
  'concrete-crushing': ({ crushingStrain }) => `the extreme fibre reaches ${shown(crushingStrain)}`,
  'core-crushing': ({ crushingStrain }) => `the edge of the confined core reaches ${shown(crushingStrain)}`,
  'bar-rupture': ({ steel }) => `the outermost bars break at ${shown(steel.ruptureStrain)}`,
  'moment-drop': () => 'the moment has fallen 20 % below its peak',
};

const shown = (strain: number) => String(Number(strain.toPrecision(4)));

/** The strain at which the steel yields, as it is written. */
export const yieldStrainOf = ({ symbols }: CurveModel) => `${symbols.fyDesign}/Es`;

/** What ended a curve, as a clause after “where”. */
export const endOf = (model: CurveModel, cause: UltimateCause) => END_OF[cause](model);

/** μφ by both yields, each with its definition. */
export function ductilitiesOf(model: CurveModel, trace: Trace, bilinear: Bilinear | null): CurveDuctility {
  const { firstYield, ultimate, cause } = trace;
  const where =
    model.yieldDepthMm === model.deepestMm
      ? 'the outermost tension layer'
      : 'the centroid of the tension steel';
  const laws = `${(model.core ?? model.cover).name} concrete, ${model.steel.name} steel${model.isDesignStrength ? ', design strengths' : ''}`;
  const yieldStrain = yieldStrainOf(model);
  const ultimateIs = `φu where ${endOf(model, cause)}; ${laws}`;
  const never = `no bar reaches ${yieldStrain} at ${where} before ultimate, so there is no yield curvature; ${ultimateIs}`;
  if (!firstYield) {
    const none = { value: null, definition: never };
    return { byFirstYield: none, byBilinearYield: none };
  }
  const last = ultimate.curvaturePerMm;
  const corner = `μφ = φu/φy; φy the corner of ${BILINEAR_RULE}; ${ultimateIs}`;
  return {
    byFirstYield: {
      value: last / firstYield.curvaturePerMm,
      definition: `μφ = φu/φy; φy where ${where} reaches ${yieldStrain} on the nonlinear curve; ${ultimateIs}`,
    },
    byBilinearYield: bilinear
      ? { value: last / bilinear.yieldCurvaturePerMm, definition: corner }
      : { value: null, definition: `${corner}; here the steel yields too near the end for such lines` },
  };
}
