import { compressedOverhang, flangeOf, type Overhang, type ResolvedFlange } from './flange.ts';
import { isAtLeastTimes } from './limits.ts';
import { neutralAxisDepth, type UltimateConstants } from './neutral-axis.ts';
import type { RuleSet } from './rules/rule-set.ts';
import type { DesignBasis, SectionInput } from './section.ts';
import type { SteelLayout } from './steel-layout.ts';

/** The section bent the other way: its constants, with its own flange if it has one at what was the tension face. */
export interface Reversal {
  // apart from the overhang, so that every caller of the solver hands it objects of one shape
  readonly ultimate: UltimateConstants;
  overhangPerMm: number;
  overhangDepthMm: number;
  /** Of the section last solved; 0 before. */
  neutralAxisMm: number;
  readonly depths: Float64Array;
  readonly areas: Float64Array;
}

/** Room for n layers; everything else is set per combination. */
export const reversalOf = (
  { esMPa, displacedConcrete }: Pick<DesignBasis, 'esMPa' | 'displacedConcrete'>,
  n: number,
): Reversal => ({
  ultimate: {
    blockForcePerMm: 0,
    flangeForcePerMm: 0,
    overhangForceN: 0,
    flangeReachMm: 0,
    blockStressMPa: 0,
    blockDepthFactor: 0,
    fyMPa: 0,
    esMPa,
    epsilonCu: 0,
    displacedConcrete,
  },
  overhangPerMm: 0,
  overhangDepthMm: 0,
  neutralAxisMm: 0,
  depths: new Float64Array(n),
  areas: new Float64Array(n),
});

/** Puts one concrete, one steel and one web in place. */
export function setBlock(
  { ultimate: k }: Reversal,
  of: {
    readonly blockStressMPa: number;
    readonly blockDepthFactor: number;
    readonly crushingStrain: number;
    readonly widthMm: number;
    readonly yieldMPa: number;
  },
): void {
  k.blockStressMPa = of.blockStressMPa;
  k.blockDepthFactor = of.blockDepthFactor;
  k.blockForcePerMm = of.blockStressMPa * of.widthMm * of.blockDepthFactor;
  k.fyMPa = of.yieldMPa;
  k.epsilonCu = of.crushingStrain;
}

/** Puts a web and its overhang in compression in place; the block and the steel are set already. */
export function setOverhang(reversal: Reversal, { overhangMm, overhangDepthMm }: Overhang): void {
  const { ultimate: k } = reversal;
  reversal.overhangPerMm = k.blockStressMPa * overhangMm;
  reversal.overhangDepthMm = overhangDepthMm;
  k.flangeForcePerMm = k.blockForcePerMm + reversal.overhangPerMm * k.blockDepthFactor;
  k.overhangForceN = reversal.overhangPerMm * overhangDepthMm;
  k.flangeReachMm = overhangDepthMm / k.blockDepthFactor;
}

/** Overhang in compression once the faces are changed over. */
export const reversedOverhang = (webMm: number, flange: ResolvedFlange | null): Overhang =>
  compressedOverhang(
    webMm,
    flange && { ...flange, face: flange.face === 'tension' ? 'compression' : 'tension' },
  );

/** Sorted layers of a section, mm and mm²; the first n are used, the first `compressionCount` of them at that face. */
export interface SortedLayers {
  readonly depths: Float64Array;
  readonly areas: Float64Array;
  n: number;
  compressionCount: number;
}

/**
 * Nominal strength of a section bent the other way, N·mm: its layers with their depths measured from the other face. 0
 * without steel at the face that is then in tension. Shared by `evaluateSection` and the hot loop.
 */
function reversedMomentNmm(layers: SortedLayers, depthMm: number, reversal: Reversal): number {
  if (layers.compressionCount === 0) return 0;
  const { n } = layers;
  const { depths, areas, ultimate: k } = reversal;
  for (let i = 0; i < n; i++) {
    depths[i] = depthMm - layers.depths[n - 1 - i]!;
    areas[i] = layers.areas[n - 1 - i]!;
  }
  const c = neutralAxisDepth(depths, areas, n, k);
  reversal.neutralAxisMm = c;
  const a = k.blockDepthFactor * c;
  const deductionDepth = k.displacedConcrete === 'deduct' ? a : k.displacedConcrete === 'ignore' ? -1 : c;
  const inFlange = Math.min(a, reversal.overhangDepthMm);
  let moment = -(k.blockForcePerMm * c) * (a / 2) - reversal.overhangPerMm * inFlange * (inFlange / 2);
  for (let i = 0; i < n; i++) {
    const depth = depths[i]!;
    const elastic = k.esMPa * ((k.epsilonCu * (depth - c)) / c);
    const stress = elastic > k.fyMPa ? k.fyMPa : elastic < -k.fyMPa ? -k.fyMPa : elastic;
    moment += areas[i]! * (depth < deductionDepth ? stress + k.blockStressMPa : stress) * depth;
  }
  return moment;
}

/** Steel of the two faces as asked: areas, and the depths of their centroids from the compression face. */
interface FacesOfSteel {
  asMm2: number;
  dMm: number;
  asPrimeMm2: number;
  dPrimeMm: number;
}

/** Bounds are trusted only this far from the limit. */
const BOUND_MARGIN = 1e-6;

/**
 * Whether the strength bent the other way is at least `leastNmm`, for the hot loop: by bounds where they settle it, which
 * saves most of the solver's work, else exactly. Above: every bar at fy, nothing taken off for the concrete. Below: the
 * steel then in tension is known to yield, and compression acts no deeper than the deepest bar of the other face or half
 * the block that balances it.
 */
export function isReversalMet(
  layers: SortedLayers,
  faces: FacesOfSteel,
  depthMm: number,
  leastNmm: number,
  reversal: Reversal,
): boolean {
  const { compressionCount } = layers;
  if (compressionCount > 0 && leastNmm > 0) {
    const { blockForcePerMm, blockDepthFactor, blockStressMPa, fyMPa, esMPa, epsilonCu } = reversal.ultimate;
    const { asMm2, asPrimeMm2 } = faces;
    const leverMm = depthMm - faces.dPrimeMm;
    const largestMPa = Math.max(fyMPa, blockStressMPa);
    const most = largestMPa * (asPrimeMm2 * leverMm + asMm2 * (depthMm - faces.dMm));
    if (most < leastNmm * (1 - BOUND_MARGIN)) return false;
    const tensionN = asPrimeMm2 * fyMPa;
    const deepestMm = depthMm - layers.depths[compressionCount]!;
    const axisMm = (tensionN + asMm2 * blockStressMPa) / blockForcePerMm;
    const shallowestMm = depthMm - layers.depths[compressionCount - 1]!;
    const doesYield =
      Math.max(deepestMm, axisMm) * (1 + fyMPa / (esMPa * epsilonCu)) < shallowestMm * (1 - BOUND_MARGIN);
    const pressureMm = Math.max(deepestMm, (blockDepthFactor * axisMm) / 2);
    const least = tensionN * (leverMm - pressureMm) - asMm2 * blockStressMPa * pressureMm;
    if (doesYield && least > leastNmm * (1 + BOUND_MARGIN)) return true;
  }
  return isAtLeastTimes(reversedMomentNmm(layers, depthMm, reversal), 1, leastNmm);
}

/** The same strength for a section with placed steel, and the axis it was found with (0 without such steel). */
export function reversedStrength(
  section: SectionInput,
  layout: SteelLayout,
  basis: DesignBasis,
  rules: RuleSet,
): { readonly momentNmm: number; readonly neutralAxisMm: number } {
  const { depths, areas, faces } = layout;
  const n = depths.length;
  const reversal = reversalOf(basis, n);
  setBlock(reversal, {
    blockStressMPa: rules.blockStressMPa(section.fcMPa),
    blockDepthFactor: rules.blockDepthFactor(section.fcMPa),
    crushingStrain: rules.crushingStrain(section.fcMPa),
    widthMm: section.widthMm,
    yieldMPa: rules.designYieldMPa(section.fyMPa),
  });
  setOverhang(reversal, reversedOverhang(section.widthMm, flangeOf(section, rules)));
  const compressionCount = faces.filter((face) => face === 'compression').length;
  const layers = { depths, areas, n, compressionCount };
  const momentNmm = reversedMomentNmm(layers, section.depthMm, reversal);
  return { momentNmm, neutralAxisMm: reversal.neutralAxisMm };
}
