import { crackedAxisDepth } from './cracked-section.ts';
import type { CurveModel } from './curve-model.ts';

/** Points of the curve to first yield, and from there to the end. */
const ELASTIC_POINTS = 6;
const PLASTIC_POINTS = 22;
/** Points after yield crowd towards it, where the curve bends. */
const CROWDING = 1.6;

export const GRID_POINTS = ELASTIC_POINTS + PLASTIC_POINTS;
const CROWDED = Array.from({ length: PLASTIC_POINTS + 1 }, (_, i) => (i / PLASTIC_POINTS) ** CROWDING);

/**
 * Curvatures at which a curve is solved, up to its last: even to about first yield of the cracked elastic section, then
 * crowded towards it.
 */
export class CurvatureGrid {
  /** Axis of the cracked elastic section, mm. */
  readonly elasticAxisMm: number;
  private readonly bend: number;
  private readonly last: number;

  constructor(model: CurveModel, last: number) {
    const modularRatio = model.steel.esMPa / model.tension.ecMPa;
    const kd = crackedAxisDepth(model.depths, model.areas, model.depths.length, {
      widthMm: model.widthMm,
      modularRatio,
      ratioAbove: model.isDisplacedDeducted ? modularRatio - 1 : modularRatio,
      overhangMm: model.overhangTopMm === 0 ? model.overhangMm : 0,
      overhangDepthMm: model.overhangBottomMm,
    });
    const elasticYield = model.steel.yieldStrain / (model.yieldDepthMm - kd);
    this.elasticAxisMm = kd;
    this.bend = elasticYield > 0 && elasticYield < 0.6 * last ? elasticYield : 0.3 * last;
    this.last = last;
  }

  /** Curvature of a point, 1/mm; the last one's for any later. */
  at(i: number): number {
    if (i < ELASTIC_POINTS) return (this.bend * (i + 1)) / ELASTIC_POINTS;
    if (i >= GRID_POINTS - 1) return this.last;
    return this.bend + (this.last - this.bend) * CROWDED[i - ELASTIC_POINTS + 1]!;
  }
}
