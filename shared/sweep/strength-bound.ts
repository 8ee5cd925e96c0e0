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
  /** What steel in compression displaces of the block, at its least: 0 where that is not deducted. */
  leastDisplacedMPa: number;
  /** Block depth over axis depth at its least, or 1 where concrete is deducted down to the axis. */
  leastDeductionReach: number;
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
  /** Centroids of a face's bars. */
  leastTensionCentroidMm: number;
  leastCompressionCentroidMm: number;
  /** Largest distance between layers of one compression group. */
  compressionSpreadMm: number;
}

/**
 * What compression takes off the moment T d of a tension T at least, N·mm. It is shared between the block, at half its own
 * depth, and the other steel, X at depth d′ (X < 0 pulls): X d′ + (T − X)²/(2 σ b), least where the block ends at d′, as far
 * as the steel can give it. Where the block ends below all layers though all of them push in full, that is the least;
 * elsewhere layers that push and pull at once gain at most half their force times their distance.
 */
function leastLossNmm(e: BoxExtremes, tensionN: number): number {
  const perMm = e.mostBlockStressMPa * e.widthMm;
  const otherN = e.mostCompressionMm2 * e.yieldMPa;
  if (tensionN - otherN >= perMm * e.mostCompressionDepthMm)
    return otherN * e.leastCompressionCentroidMm + (tensionN - otherN) ** 2 / (2 * perMm);
  const pushing = leastPushN(e, tensionN);
  const pulling = clamp(tensionN - perMm * e.mostCompressionDepthMm, -otherN, 0);
  const withPush = pushing * e.leastCompressionDepthMm + (tensionN - pushing) ** 2 / (2 * perMm);
  const withPull = pulling * e.mostCompressionDepthMm + (tensionN - pulling) ** 2 / (2 * perMm);
  return Math.min(withPush, withPull) - (otherN / 2) * e.compressionSpreadMm;
}

/** Push of the other steel that takes off least: until the block ends where that steel lies, or all it has, N. */
function leastPushN(e: BoxExtremes, tensionN: number): number {
  const otherN = e.mostCompressionMm2 * e.yieldMPa;
  const perMm = e.mostBlockStressMPa * e.widthMm;
  return clamp(tensionN - perMm * e.leastCompressionDepthMm, 0, Math.min(otherN, tensionN));
}

/**
 * Tension up to which the block ends above every tension layer when the other steel helps as it can, N. The moment is
 * concave in all forces, so up to there each layer that pulls in full is what gives most.
 */
function shallowUpToN(e: BoxExtremes): number {
  const otherN = e.leastCompressionDepthMm < e.leastInnermostDepthMm ? e.mostCompressionMm2 * e.yieldMPa : 0;
  return e.mostBlockStressMPa * e.widthMm * e.leastInnermostDepthMm + otherN;
}

/** Largest nominal moment, N·mm. Where the block could reach a tension layer, nothing is taken off for compression at all. */
export function mostMomentNmm(e: BoxExtremes): number {
  const fullN = e.mostTensionMm2 * e.yieldMPa;
  if (fullN > shallowUpToN(e))
    return fullN * e.mostOutermostDepthMm + e.mostCompressionMm2 * e.yieldMPa * e.mostCompressionDepthMm;
  return fullN * e.mostTensionDepthMm - leastLossNmm(e, fullN);
}

const NEED_STEPS = 6;

/**
 * Least tension steel that can give a nominal moment, mm²: T = (M + loss(T))/d from T = 0 upwards, each step still below the
 * answer since the loss rises with T; it begins as a gain where the other steel can pull. No more than may be without the
 * block reaching a tension layer: beyond that nothing is said.
 */
export function neededTensionMm2(e: BoxExtremes, momentNmm: number): number {
  const mostN = shallowUpToN(e);
  let tensionN = 0;
  for (let i = 0; i < NEED_STEPS && tensionN < mostN; i++)
    tensionN = Math.max(tensionN, (momentNmm + leastLossNmm(e, tensionN)) / e.mostTensionDepthMm);
  return Math.min(tensionN, mostN) / e.yieldMPa;
}

/** Where a block of `perMm` and other steel of `areaMm2` at one depth, less what it displaces, hold a tension, mm. */
function axisFor(
  e: BoxExtremes,
  { tensionN, depthMm, displacedMPa }: { tensionN: number; depthMm: number; displacedMPa: number },
): number {
  const perMm = e.mostBlockPerMm2 * e.widthMm;
  const alone = tensionN / perMm;
  const areaMm2 = e.mostCompressionMm2;
  if (alone <= depthMm || areaMm2 === 0) return alone;
  const elasticMPa = e.esMPa * e.mostCrushingStrain;
  const p = areaMm2 * (elasticMPa - displacedMPa) - tensionN;
  const root = (Math.sqrt(p * p + 4 * perMm * areaMm2 * elasticMPa * depthMm) - p) / (2 * perMm);
  // Stress × root, since the root may be zero.
  const elasticN = elasticMPa * (root - depthMm);
  if (elasticN >= e.yieldMPa * root) return (tensionN - areaMm2 * (e.yieldMPa - displacedMPa)) / perMm;
  return elasticN > displacedMPa * root ? root : alone;
}

/**
 * Least depth of the neutral axis at ultimate, mm: the least tension against the most compression. The tension holds its
 * yield force down to the depth where it begins to yield, so the axis lies at the root for full yield or at that depth,
 * whichever is less. Layers of the other steel count at their centroid: stress over depth is straight up to a yield that
 * only takes away (Jensen), as long as none yields in tension; above that depth they count at the layer nearest the face.
 * Where all of them lie in the block at that axis, and so at any deeper one, what they displace is taken off.
 */
export function leastAxisMm(e: BoxExtremes): number {
  const { yieldMPa, esMPa } = e;
  const tensionN = e.leastTensionMm2 * yieldMPa;
  const yieldStrain = yieldMPa / esMPa;
  const yieldsFromMm =
    (e.leastInnermostDepthMm * e.leastCrushingStrain) / (e.leastCrushingStrain + yieldStrain);
  const atNearest = axisFor(e, { tensionN, depthMm: e.leastCompressionDepthMm, displacedMPa: 0 });
  const depthMm = e.leastCompressionCentroidMm;
  const straightFromMm = e.mostCompressionDepthMm / (1 + yieldStrain / e.mostCrushingStrain);
  let axisMm = atNearest >= straightFromMm ? axisFor(e, { tensionN, depthMm, displacedMPa: 0 }) : atNearest;
  const inBlockFromMm = e.mostCompressionDepthMm / e.leastDeductionReach;
  if (e.leastDisplacedMPa > 0 && axisMm > Math.max(inBlockFromMm, straightFromMm)) {
    const deducted = axisFor(e, { tensionN, depthMm, displacedMPa: e.leastDisplacedMPa });
    axisMm = Math.max(axisMm, deducted);
  }
  return Math.max(0, Math.min(axisMm, yieldsFromMm));
}

/**
 * Least depth of the cracked elastic axis, mm, in the same sense. Elastic stress is straight over the depth, so each face
 * counts at its centroid; a layer on the wrong side of the axis only lowers the axis further.
 */
function leastCrackedAxisMm(e: BoxExtremes): number {
  const pull = e.leastModularRatio * e.leastTensionMm2;
  const d = e.leastTensionCentroidMm;
  const alone = (Math.sqrt(pull * pull + 2 * e.widthMm * pull * d) - pull) / e.widthMm;
  const dPrime = e.leastCompressionCentroidMm;
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
