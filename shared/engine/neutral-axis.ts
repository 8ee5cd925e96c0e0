import type { DisplacedConcrete } from './section.ts';

/** Constants of one concrete, one steel and one width at ultimate. */
export interface UltimateConstants {
  /** Block force of the web per mm of neutral-axis depth: block stress × block depth factor × web width, N/mm. */
  blockForcePerMm: number;
  /** The same with the flange's width, while the block lies in the flange. */
  flangeForcePerMm: number;
  /** Block force of a flange's overhang over its whole thickness, N; 0 without one in compression. */
  overhangForceN: number;
  /** Axis depth at which the block leaves the flange: thickness over block depth factor, mm. */
  flangeReachMm: number;
  blockStressMPa: number;
  blockDepthFactor: number;
  fyMPa: number;
  esMPa: number;
  epsilonCu: number;
  displacedConcrete: DisplacedConcrete;
}

const MAX_STATE_CHANGES = 12;

/**
 * Depth of the neutral axis at ultimate, mm, for layers sorted by depth (mm, mm²; the first n entries are used).
 *
 * Steel is elastic–perfectly plastic in both signs. With the yield state of each layer fixed, axial equilibrium times c
 * is the quadratic α c² + P c − Q = 0; the state that its own root confirms is the answer. Without displaced concrete the
 * unbalanced force rises steadily with c, so there is one root. Deducting displaced concrete makes it drop by σ A where
 * the block reaches a layer, so that two roots can lie side by side; the deeper axis is taken: bars are deducted whenever
 * there is an equilibrium with them inside the block, which gives the lower ductility.
 *
 * With a flange in compression the block has the flange's width to its thickness and the web's below: two such quadratics,
 * the lower one with the overhang's whole force as a constant; which of them holds is part of the state.
 *
 * Shared by `evaluateSection` and the sweep's hot loop. Returns NaN where no equilibrium exists (no steel in tension).
 */
export function neutralAxisDepth(
  depths: Float64Array,
  areas: Float64Array,
  n: number,
  k: UltimateConstants,
): number {
  let deducted = 0;
  if (k.displacedConcrete !== 'ignore') {
    const reach = k.displacedConcrete === 'deduct' ? k.blockDepthFactor : 1;
    // The deepest layer is never inside the block: it is the one that pulls.
    for (let count = n - 1; count > 0; count--) {
      const atLayer = depths[count - 1]! / reach;
      if (unbalancedForce(depths, areas, n, k, atLayer, count) < 0) {
        deducted = count;
        break;
      }
    }
  }
  return rootWithDeducted(depths, areas, n, k, deducted);
}

/**
 * Compression minus tension, N, with the axis at c and the first `deducted` layers displacing concrete. A layer at
 * Infinity yields.
 */
export function unbalancedForce(
  depths: Float64Array,
  areas: Float64Array,
  n: number,
  k: UltimateConstants,
  c: number,
  deducted: number,
): number {
  const strainScale = (k.esMPa * k.epsilonCu) / c;
  let force = k.blockForcePerMm * c;
  // the lesser of the two lines: they cross where the block leaves the flange
  if (k.overhangForceN !== 0) force = Math.min(k.flangeForcePerMm * c, force + k.overhangForceN);
  for (let i = 0; i < n; i++) {
    const elastic = strainScale * (c - depths[i]!);
    const stress = elastic > k.fyMPa ? k.fyMPa : elastic < -k.fyMPa ? -k.fyMPa : elastic;
    force += areas[i]! * (i < deducted ? stress - k.blockStressMPa : stress);
  }
  return force;
}

/** The one root with a fixed set of deducted layers: the axis that is the root of its own state. */
function rootWithDeducted(
  depths: Float64Array,
  areas: Float64Array,
  n: number,
  k: UltimateConstants,
  deducted: number,
): number {
  let c = 0.25 * depths[n - 1]!;
  for (let change = 0; change < MAX_STATE_CHANGES; change++) {
    const next = rootOfState(depths, areas, n, k, deducted, c);
    if (next === c) return c;
    c = next;
  }
  return bracketedRoot(depths, areas, n, k, deducted);
}

/** Root for the state at an axis c: which layers yield, and whether the block lies in the flange. */
function rootOfState(
  depths: Float64Array,
  areas: Float64Array,
  n: number,
  k: UltimateConstants,
  deducted: number,
  c: number,
): number {
  const yieldRatio = k.fyMPa / (k.esMPa * k.epsilonCu);
  const elasticStress = k.esMPa * k.epsilonCu;
  const tensionYieldDepth = (1 + yieldRatio) * c;
  const compressionYieldDepth = (1 - yieldRatio) * c;
  const isInFlange = k.overhangForceN !== 0 && c <= k.flangeReachMm;
  let displaced = 0;
  for (let i = 0; i < deducted; i++) displaced += areas[i]!;
  let p = (isInFlange ? 0 : k.overhangForceN) - displaced * k.blockStressMPa;
  let q = 0;
  for (let i = 0; i < n; i++) {
    const d = depths[i]!;
    const a = areas[i]!;
    if (d >= tensionYieldDepth) p -= a * k.fyMPa;
    else if (d <= compressionYieldDepth) p += a * k.fyMPa;
    else {
      p += a * elasticStress;
      q += a * elasticStress * d;
    }
  }
  return positiveRoot(isInFlange ? k.flangeForcePerMm : k.blockForcePerMm, p, q);
}

/** Positive root of α c² + P c − Q = 0, in the form that does not cancel. */
function positiveRoot(alpha: number, p: number, q: number): number {
  const root = Math.sqrt(p * p + 4 * alpha * q);
  return p > 0 ? (2 * q) / (p + root) : (root - p) / (2 * alpha);
}

/**
 * For states that follow each other in a circle (one section in forty of a wild mixture): bisection until the axis in hand
 * has the root's own state, so that the root is the same wherever it was looked for from.
 */
function bracketedRoot(
  depths: Float64Array,
  areas: Float64Array,
  n: number,
  k: UltimateConstants,
  deducted: number,
): number {
  let low = 0;
  let high = 4 * depths[n - 1]!;
  if (!(unbalancedForce(depths, areas, n, k, high, deducted) > 0)) return NaN;
  for (;;) {
    const mid = 0.5 * (low + high);
    if (mid <= low || mid >= high) return mid;
    const c = rootOfState(depths, areas, n, k, deducted, mid);
    if (rootOfState(depths, areas, n, k, deducted, c) === c) return c;
    if (unbalancedForce(depths, areas, n, k, mid, deducted) > 0) high = mid;
    else low = mid;
  }
}
