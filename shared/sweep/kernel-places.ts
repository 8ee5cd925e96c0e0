import { CHECK_IDS, type CheckId } from '../engine/evaluation.ts';
import { MEASURE_IDS, type MeasureId } from '../engine/measures.ts';

/** Bits of a failure mask and places in a row of measures, as constants the compiler can fold into the hot loop. */
const bit = (check: CheckId) => 1 << CHECK_IDS.indexOf(check);
export const BAR_FIT = bit('bar-fit');
export const HANGER_BARS = bit('hanger-bars');
export const STRENGTH = bit('strength');
export const DUCTILITY = bit('curvature-ductility');
export const TENSION_STRAIN = bit('tension-strain');
export const LEAST_STEEL = bit('least-steel');
export const DEPTH_TO_WIDTH = bit('depth-to-width');
export const DEPTH_CAP = bit('depth-cap');
export const COLUMN_WIDTH = bit('column-width');
export const COMPRESSION_SHARE = bit('compression-share');
export const BAR_RULES = bit('bar-rules');
export const CRACK_CONTROL = bit('crack-control');
export const COMPRESSION_TIES = bit('compression-ties');
export const SHEAR = bit('shear');
export const STIRRUP_SPACING = bit('stirrup-spacing');
export const LEAST_DEPTH = bit('least-depth');
export const AXIS_DEPTH = bit('axis-depth');
export const MOST_STEEL = bit('most-steel');

const at = (measure: MeasureId) => MEASURE_IDS.indexOf(measure);
export const STEEL = at('steelKgPerM');
export const COST = at('costPerM');
export const CO2E = at('co2eKgPerM');
export const DEPTH = at('depthMm');
export const WIDTH = at('widthMm');
export const CONCRETE = at('concreteM3PerM');
export const FORMWORK = at('formworkM2PerM');
export const MU_PHI = at('curvatureDuctility');
export const DESIGN_STRENGTH = at('designStrengthNmm');
export const UTILISATION = at('utilisation');
export const BAR_COUNT = at('barCount');
