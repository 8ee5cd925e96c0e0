import { bilinearOf, ductilitiesOf, type Bilinear, type CurveDuctility } from './curve-marks.ts';
import { curveModel, type CurveInput, type CurveModel } from './curve-model.ts';
import type { CurvePoint } from './curve-point.ts';
import type { UltimateCause } from './ultimate-cause.ts';
import { Tracer, type Trace } from './curve-trace.ts';

/** Nonlinear moment–curvature of one section: sagging, no axial force. Curvature 1/mm, moment N·mm. */
export interface MomentCurvature {
  readonly model: CurveModel;
  /** From rest to ultimate, in order of curvature; the uncracked branch first where tension is drawn. */
  readonly points: readonly CurvePoint[];
  /** Uncracked section at the modulus of rupture; null where the axis leaves the section. */
  readonly cracking: CurvePoint | null;
  /** Null where no bar yields before the end. */
  readonly firstYield: CurvePoint | null;
  /** Highest moment of the cracked section. */
  readonly peak: CurvePoint;
  readonly ultimate: CurvePoint;
  readonly cause: UltimateCause;
  /** The first crack takes more than the cracked section can carry: it fails as it cracks. */
  readonly failsAtCracking: boolean;
  readonly bilinear: Bilinear | null;
  readonly ductility: CurveDuctility;
  /** Largest unbalanced force at the marks over the concrete's compression. */
  readonly equilibriumResidual: number;
}

const UNCRACKED_POINTS = 4;

/**
 * The full curve by the laws chosen: plane sections, perfect bond, the neutral axis solved at every curvature with the
 * running integrals of the laws. It ends at the first of crushing (extreme fibre, or the core's edge for a confined law), a
 * bar that breaks, or 20 % lost from the highest moment.
 * @throws InvalidSectionError for an unknown bar or a choice that is not a number above zero.
 */
export function momentCurvature(input: CurveInput): MomentCurvature {
  const model = curveModel(input);
  return curveOf(model, input.choices.hasTensionBeforeCracking ?? false);
}

/** The curve of a section whose laws are made already. */
function curveOf(model: CurveModel, hasTensionBeforeCracking = false): MomentCurvature {
  const tracer = new Tracer(model);
  const trace = tracer.trace();
  const cracking = tracer.findCracking() ?? null;
  const bilinear = bilinearOf(trace);
  const { firstYield, peak, ultimate, cause } = trace;
  const marks = firstYield ? [firstYield, peak, ultimate] : [peak, ultimate];
  return {
    model,
    points: hasTensionBeforeCracking && cracking ? withTension(tracer, trace, cracking) : trace.points,
    cracking,
    firstYield,
    peak,
    ultimate,
    cause,
    failsAtCracking: cracking !== null && cracking.momentNmm > peak.momentNmm,
    bilinear,
    ductility: ductilitiesOf(model, trace, bilinear),
    equilibriumResidual: Math.max(...marks.map((mark) => tracer.residualOf(mark))),
  };
}

/** The uncracked branch to the first crack, then the cracked section from the same curvature on. */
function withTension(tracer: Tracer, trace: Trace, cracking: CurvePoint): CurvePoint[] {
  const last = cracking.curvaturePerMm;
  const points: CurvePoint[] = [];
  for (let i = 1; i < UNCRACKED_POINTS; i++) points.push(tracer.uncrackedAt((last * i) / UNCRACKED_POINTS));
  points.push(cracking);
  if (last < trace.ultimate.curvaturePerMm) points.push(tracer.pointAt(last));
  return [...points, ...trace.points.filter((point) => point.curvaturePerMm > last)];
}
