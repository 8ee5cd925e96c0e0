/**
 * Bounds on strength and curvature of every section of a box, by reasoning and not by trial: each follows from equilibrium
 * with every quantity at the end of its range that helps most. Lengths mm, areas mm², stresses MPa. tests/sweep holds them
 * against enumeration.
 */
export interface BoxExtremes {
  /** Largest block width, and block stress × block depth factor at its largest. */
  widthMm: number;
  mostBlockStressMPa: number;
  mostBlockPerMm2: number;
  leastCrushingStrain: number;
  mostCrushingStrain: number;
  leastModularRatio: number;
  mostModularRatio: number;
  /** Counted above the axis: n or n − 1 at its largest. */
  mostRatioAbove: number;
  yieldMPa: number;
  esMPa: number;
  leastTensionMm2: number;
  mostTensionMm2: number;
  mostCompressionMm2: number;
  /** Depths from the compression face. */
  mostTensionDepthMm: number;
  mostOutermostDepthMm: number;
  leastInnermostDepthMm: number;
  leastCompressionDepthMm: number;
  mostCompressionDepthMm: number;
  /** Largest distance between layers of one compression group. */
  compressionSpreadMm: number;
}

/**
 * What compression takes off the moment T d of a tension T at least, N·mm. It is shared between the block, at half its own
 * depth, and the other steel, X at depth d′ (X < 0 pulls): X d′ + (T − X)²/(2 σ b), least where the block ends at d′, as far
 * as the steel can give it. Layers of the other steel that push and pull at once gain at most half its force times their
 * distance.
 */
function leastLossNmm(e: BoxExtremes, tensionN: number): number {
  const perMm = e.mostBlockStressMPa * e.widthMm;
  const otherN = e.mostCompressionMm2 * e.yieldMPa;
  const lossWith = (x: number, atMm: number) => x * atMm + (tensionN - x) ** 2 / (2 * perMm);
  const pushing = clamp(tensionN - perMm * e.leastCompressionDepthMm, 0, Math.min(otherN, tensionN));
  const pulling = clamp(tensionN - perMm * e.mostCompressionDepthMm, -otherN, 0);
  const least = Math.min(
    lossWith(pushing, e.leastCompressionDepthMm),
    lossWith(pulling, e.mostCompressionDepthMm),
  );
  return least - (otherN / 2) * e.compressionSpreadMm;
}

/** The block may reach a tension layer: bounds that let every layer pull in full do not hold. */
function isBlockDeep(e: BoxExtremes): boolean {
  const steelN = (e.mostTensionMm2 + e.mostCompressionMm2) * e.yieldMPa;
  return steelN > e.mostBlockStressMPa * e.widthMm * e.leastInnermostDepthMm;
}

/**
 * Largest nominal moment, N·mm. M = T d − loss(T) rises with every layer's tension while the block does not reach that
 * layer; where it could, nothing is taken off for compression at all.
 */
export function mostMomentNmm(e: BoxExtremes): number {
  const fullN = e.mostTensionMm2 * e.yieldMPa;
  if (isBlockDeep(e))
    return fullN * e.mostOutermostDepthMm + e.mostCompressionMm2 * e.yieldMPa * e.mostCompressionDepthMm;
  return fullN * e.mostTensionDepthMm - leastLossNmm(e, fullN);
}

const NEED_STEPS = 4;

/**
 * Least tension steel that can give a nominal moment, mm²: T = (M + loss(T))/d from T = 0 upwards, each step still below the
 * answer since the loss rises with T; it begins as a gain where the other steel can pull. Zero where the block could reach
 * the tension steel.
 */
export function neededTensionMm2(e: BoxExtremes, momentNmm: number): number {
  if (isBlockDeep(e)) return 0;
  let tensionN = 0;
  for (let i = 0; i < NEED_STEPS; i++)
    tensionN = Math.max(tensionN, (momentNmm + leastLossNmm(e, tensionN)) / e.mostTensionDepthMm);
  return tensionN / e.yieldMPa;
}

/**
 * Least depth of the neutral axis at ultimate, mm: the least tension against the most compression, no concrete displaced.
 * The tension holds its yield force down to the depth where it begins to yield, so the axis lies at the root for full yield
 * or at that depth, whichever is less.
 */
export function leastAxisMm(e: BoxExtremes): number {
  const { yieldMPa, esMPa } = e;
  const tensionN = e.leastTensionMm2 * yieldMPa;
  const perMm = e.mostBlockPerMm2 * e.widthMm;
  const yieldsFromMm =
    (e.leastInnermostDepthMm * e.leastCrushingStrain) / (e.leastCrushingStrain + yieldMPa / esMPa);
  let axisMm = tensionN / perMm;
  const dPrime = e.leastCompressionDepthMm;
  if (axisMm > dPrime && e.mostCompressionMm2 > 0) {
    const elastic = e.mostCompressionMm2 * esMPa * e.mostCrushingStrain;
    const p = elastic - tensionN;
    const root = (Math.sqrt(p * p + 4 * perMm * elastic * dPrime) - p) / (2 * perMm);
    const stress = (esMPa * e.mostCrushingStrain * (root - dPrime)) / root;
    axisMm = stress > yieldMPa ? (tensionN - e.mostCompressionMm2 * yieldMPa) / perMm : root;
  }
  return Math.max(0, Math.min(axisMm, yieldsFromMm));
}

/** Least depth of the cracked elastic axis, mm, in the same sense. */
function leastCrackedAxisMm(e: BoxExtremes): number {
  const pull = e.leastModularRatio * e.leastTensionMm2;
  const d = e.leastInnermostDepthMm;
  const alone = (Math.sqrt(pull * pull + 2 * e.widthMm * pull * d) - pull) / e.widthMm;
  const dPrime = e.leastCompressionDepthMm;
  if (!(alone > dPrime)) return alone;
  const push = e.mostRatioAbove * e.mostCompressionMm2;
  const sum = pull + push;
  return (Math.sqrt(sum * sum + 2 * e.widthMm * (pull * d + push * dPrime)) - sum) / e.widthMm;
}

/** Largest closed-path curvature ductility: μφ = (εcu/c) (d − kd)/εy. */
export function mostCurvatureDuctility(e: BoxExtremes): number {
  const reach = e.mostOutermostDepthMm - leastCrackedAxisMm(e);
  return ((e.mostCrushingStrain / leastAxisMm(e)) * reach) / (e.yieldMPa / e.esMPa);
}

const clamp = (value: number, low: number, high: number) => Math.max(low, Math.min(high, value));
