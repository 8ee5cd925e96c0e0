import { crackedAxisDepth } from './cracked-section.ts';
import type { CurveModel } from './curve-model.ts';

/** Points of the curve to first yield, and from there to the end. */
const ELASTIC_POINTS = 6;
const PLASTIC_POINTS = 22;
/** Points after yield crowd towards it, where the curve bends. */
const CROWDING = 1.6;

/** Curvatures at which a curve is solved, up to its last: even to about first yield of the cracked elastic section, then crowded towards it. */
export function curvatureGrid(model: CurveModel, last: number): Float64Array {
  const modularRatio = model.steel.esMPa / model.tension.ecMPa;
  const kd = crackedAxisDepth(model.depths, model.areas, model.depths.length, {
    widthMm: model.widthMm,
    modularRatio,
    ratioAbove: model.isDisplacedDeducted ? modularRatio - 1 : modularRatio,
    overhangMm: model.overhangTopMm === 0 ? model.overhangMm : 0,
    overhangDepthMm: model.overhangBottomMm,
  });
  const elasticYield = model.steel.yieldStrain / (model.yieldDepthMm - kd);
  const bend = elasticYield > 0 && elasticYield < 0.6 * last ? elasticYield : 0.3 * last;
  const grid = new Float64Array(ELASTIC_POINTS + PLASTIC_POINTS);
  for (let i = 0; i < ELASTIC_POINTS; i++) grid[i] = (bend * (i + 1)) / ELASTIC_POINTS;
  for (let i = 1; i <= PLASTIC_POINTS; i++)
    grid[ELASTIC_POINTS + i - 1] = bend + (last - bend) * (i / PLASTIC_POINTS) ** CROWDING;
  grid[grid.length - 1] = last;
  return grid;
}
