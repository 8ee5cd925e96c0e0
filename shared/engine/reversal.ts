import { compressedOverhang, flangeOf, type Overhang, type ResolvedFlange } from './flange.ts';
import { neutralAxisDepth, type UltimateConstants } from './neutral-axis.ts';
import type { RuleSet } from './rules/rule-set.ts';
import type { DesignBasis, SectionInput } from './section.ts';
import type { SteelLayout } from './steel-layout.ts';

/** Layers with the faces changed over, kept from section to section. */
export interface ReversedLayers {
  readonly depths: Float64Array;
  readonly areas: Float64Array;
}

/** Constants of the section bent the other way: its own flange, if it has one at what was the tension face. */
export interface ReversalConstants extends UltimateConstants {
  overhangPerMm: number;
  overhangDepthMm: number;
}

/** Puts the constants of a web and its overhang in compression in place; the block's own are set already. */
export function setOverhang(k: ReversalConstants, { overhangMm, overhangDepthMm }: Overhang): void {
  k.overhangPerMm = k.blockStressMPa * overhangMm;
  k.overhangDepthMm = overhangDepthMm;
  k.flangeForcePerMm = k.blockForcePerMm + k.overhangPerMm * k.blockDepthFactor;
  k.overhangForceN = k.overhangPerMm * overhangDepthMm;
  k.flangeReachMm = overhangDepthMm / k.blockDepthFactor;
}

/** Overhang in compression once the faces are changed over. */
export const reversedOverhang = (webMm: number, flange: ResolvedFlange | null): Overhang =>
  compressedOverhang(
    webMm,
    flange && { ...flange, face: flange.face === 'tension' ? 'compression' : 'tension' },
  );

/**
 * Nominal strength of a section bent the other way, N·mm: the first n layers (mm, mm²) with their depths measured from the
 * other face. 0 without steel at the face that is then in tension. Shared by `evaluateSection` and the hot loop.
 */
export function reversedMomentNmm(
  layers: { readonly depths: Float64Array; readonly areas: Float64Array; readonly n: number },
  hasCompressionSteel: boolean,
  depthMm: number,
  k: ReversalConstants,
  reversed: ReversedLayers,
): number {
  if (!hasCompressionSteel) return 0;
  const { n } = layers;
  const { depths, areas } = reversed;
  for (let i = 0; i < n; i++) {
    depths[i] = depthMm - layers.depths[n - 1 - i]!;
    areas[i] = layers.areas[n - 1 - i]!;
  }
  const c = neutralAxisDepth(depths, areas, n, k);
  const a = k.blockDepthFactor * c;
  const deductionDepth = k.displacedConcrete === 'deduct' ? a : k.displacedConcrete === 'ignore' ? -1 : c;
  const inFlange = Math.min(a, k.overhangDepthMm);
  let moment = -(k.blockForcePerMm * c) * (a / 2) - k.overhangPerMm * inFlange * (inFlange / 2);
  for (let i = 0; i < n; i++) {
    const depth = depths[i]!;
    const elastic = k.esMPa * ((k.epsilonCu * (depth - c)) / c);
    const stress = elastic > k.fyMPa ? k.fyMPa : elastic < -k.fyMPa ? -k.fyMPa : elastic;
    moment += areas[i]! * (depth < deductionDepth ? stress + k.blockStressMPa : stress) * depth;
  }
  return moment;
}

/** The same for a section with placed steel. */
export function reversedStrengthNmm(
  section: SectionInput,
  layout: SteelLayout,
  basis: DesignBasis,
  rules: RuleSet,
): number {
  const { depths, areas } = layout;
  const n = depths.length;
  const blockStressMPa = rules.blockStressMPa(section.fcMPa);
  const blockDepthFactor = rules.blockDepthFactor(section.fcMPa);
  const constants = {
    blockForcePerMm: blockStressMPa * section.widthMm * blockDepthFactor,
    flangeForcePerMm: 0,
    overhangForceN: 0,
    flangeReachMm: 0,
    overhangPerMm: 0,
    overhangDepthMm: 0,
    blockStressMPa,
    blockDepthFactor,
    fyMPa: rules.designYieldMPa(section.fyMPa),
    esMPa: basis.esMPa,
    epsilonCu: rules.crushingStrain(section.fcMPa),
    displacedConcrete: basis.displacedConcrete,
  };
  setOverhang(constants, reversedOverhang(section.widthMm, flangeOf(section, rules)));
  return reversedMomentNmm({ depths, areas, n }, layout.asPrimeMm2 > 0, section.depthMm, constants, {
    depths: new Float64Array(n),
    areas: new Float64Array(n),
  });
}
