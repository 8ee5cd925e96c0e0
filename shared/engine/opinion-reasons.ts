import { Tracer } from './curve-trace.ts';
import type { FibreCurve } from './fibre.ts';
import type { MomentCurvature } from './moment-curvature.ts';
import { emptyBalance, netForceN } from './section-balance.ts';

/** A limit is only touched where the section nowhere passes it by more than this share. */
const TOUCHED = 0.01;
const KEPT_SHARE = 0.8;
/** States looked at between two ends, and axes over a section's depth. */
const STATES = 101;
const AXES = 400;

const TOUCHES =
  'between the two ends the section stays within 1 % of a limit without passing it: which of its states is called the end hangs on rounding';
const SEVERAL_AXES =
  'the section balances about more than one axis at the strain of its peak, and the two ways take another one each';

/** Why a curve and its strips differ, where that is known; null where it is not. */
export function reasonForDifference(
  curve: MomentCurvature,
  fibre: FibreCurve,
  isPeakTheSame: boolean,
): string | null {
  if (isPeakTheSame && isTouching(curve, fibre)) return TOUCHES;
  return hasSeveralAxes(curve) ? SEVERAL_AXES : null;
}

/** From the earlier end to the later one the section never passes a limit by more than the share that counts as touching. */
function isTouching(curve: MomentCurvature, fibre: FibreCurve): boolean {
  const { model, peak } = curve;
  const ends = [curve.ultimate.curvaturePerMm, fibre.ultimate.curvaturePerMm].sort((a, b) => a - b);
  const tracer = new Tracer(model);
  const between = Array.from({ length: STATES }, (_, i) => ends[0]! + (i / STATES) * (ends[1]! - ends[0]!));
  return between.every((curvature) => {
    const point = tracer.pointAt(curvature);
    const crushing = point.topStrain - curvature * model.crushingDepthMm;
    return (
      crushing <= (1 + TOUCHED) * model.crushingStrain &&
      point.tensionStrain <= (1 + TOUCHED) * model.steel.ruptureStrain &&
      point.momentNmm >= (1 - TOUCHED) * KEPT_SHARE * peak.momentNmm
    );
  });
}

/**
 * At the peak's own strain the section has more than one axis, as where a wide slab is lost beside a confined core: the
 * halving of the axis and the walk along the curve may each take another.
 */
function hasSeveralAxes({ model, peak }: MomentCurvature): boolean {
  const out = emptyBalance();
  const isPushed = Array.from({ length: AXES }, (_, i) => {
    const axisMm = ((i + 0.5) / AXES) * model.deepestMm;
    const state = { curvature: peak.topStrain / axisMm, topStrain: peak.topStrain };
    return netForceN(model, 'cracked', state, out) > 0;
  });
  return isPushed.filter((pushed, i) => i > 0 && pushed !== isPushed[i - 1]).length > 1;
}
