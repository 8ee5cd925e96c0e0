import type { ResolvedFlange } from './flange.ts';
import type { DesignBasis, Demand } from './section.ts';
import { ruleSetOf } from './rules/rule-set-of.ts';

const SEISMIC_REST =
  'of the seismic detailing: shear from the strengths at the joints, lateral support of the bars, laps and anchorage, the beam’s fit to its column, and where hoops may be wider apart';

/** What no check covers for what is asked; shown wherever results are shown. */
export function notCheckedFor(
  basis: Pick<DesignBasis, 'ruleSet' | 'seismicSystem' | 'skinBar'>,
  { muNmm, vuN, spanMm, support }: Demand,
  flange: ResolvedFlange | null = null,
): readonly string[] {
  const isGiven = (value: number | null | undefined) => value !== null && value !== undefined;
  const { fc, fy, moment } = ruleSetOf(basis).symbols;
  const hasSystem = basis.seismicSystem !== undefined && basis.seismicSystem !== 'none';
  return [
    ...(isGiven(muNmm)
      ? [`whether ${moment} includes the self-weight of this section`]
      : ['strength against a moment']),
    'sections elsewhere along the span',
    `limits of the code on ${fc}, ${fy}, cover and lightweight concrete (normalweight is assumed)`,
    isGiven(vuN) ? 'shear and stirrup spacing elsewhere along the span' : 'shear',
    'torsion',
    ...flangeRest(flange),
    'crack width (the spacing of the bars is checked)',
    spanMm && support
      ? 'deflection, short and long term (least depth is checked)'
      : 'deflection and least depth',
    'anchorage, development and lap lengths',
    ...(basis.skinBar === undefined ? ['skin reinforcement of deep beams'] : []),
    ...(hasSystem ? [SEISMIC_REST] : ['seismic detailing']),
    ...(hasSystem && !spanMm ? ['clear span against depth'] : []),
    'axial force and biaxial bending',
    'lateral stability',
    'fire resistance and durability',
  ];
}

/** What a slab brings that is the slab's design, or is left to the drawing. */
function flangeRest(flange: ResolvedFlange | null): readonly string[] {
  if (flange === null) return [];
  return [
    'shear between web and slab, and the slab’s own bars across the web',
    ...(flange.face === 'tension' ? ['tension bars spread over the slab: all are placed in the web'] : []),
    ...(flange.shape === 'l' ? ['sideways bending of an L: the slab is taken to hold it'] : []),
  ];
}
