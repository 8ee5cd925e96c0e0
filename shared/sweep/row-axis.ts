import { neutralAxisDepth, unbalancedForce, type UltimateConstants } from '../engine/neutral-axis.ts';
import type { FaceEntry } from './face-table.ts';

/** Layers of one face: distances from it, nearest first, mm, and areas, mm². */
type FaceLayers = Pick<FaceEntry, 'layerCount' | 'offsets' | 'areas' | 'shareOfDepth'>;

/** Nearer than this to a change of state, as a share of the axis depth, an axis is solved for each section. */
const MARGIN = 1e-9;
/** The same for the layers that the block must not reach, where a bound is used. */
const BOUND_MARGIN = 1e-6;

/**
 * The neutral axis that all sections of a row share. With every tension layer at yield the equilibrium of
 * `neutralAxisDepth` does not ask how deep these lie, so neither does its root: from a least depth of the innermost tension
 * layer on it is one number for the whole row, to the bit, as long as no layer is near a change of state (then the root
 * could be that of either).
 *
 * What has to hold at every such depth: each tension layer yields at the axis; layers that the deduction of displaced
 * concrete is tried at give the same answer. At a layer of the compression face the force on the other side is that of yield
 * or less, so a deduction refused with yield is refused; where it is taken, the tension layers are asked to yield there
 * too. At a tension layer the block's own force beyond the axis outweighs all the concrete displaced.
 */
export class RowAxis {
  /** Depth of the shared axis, mm; NaN without one. */
  axisMm = NaN;
  /** Depth of the innermost tension layer from which it holds, mm; Infinity without one. */
  fromMm = Infinity;
  private readonly depths: Float64Array;
  private readonly areas: Float64Array;

  constructor(layerCount: number) {
    this.depths = new Float64Array(layerCount);
    this.areas = new Float64Array(layerCount);
  }

  /** Looks for the axis shared by sections to `depthMm` deep with steel at their compression and at their tension face. */
  find(compressed: FaceLayers, pulled: FaceLayers, depthMm: number, k: UltimateConstants): void {
    this.axisMm = NaN;
    this.fromMm = Infinity;
    if (compressed.shareOfDepth !== 0 || pulled.shareOfDepth !== 0 || pulled.layerCount === 0) return;
    const { depths, areas } = this;
    const nc = compressed.layerCount;
    const n = nc + pulled.layerCount;
    for (let i = 0; i < nc; i++) {
      depths[i] = compressed.offsets[i]!;
      areas[i] = compressed.areas[i]!;
    }
    for (let i = nc; i < n; i++) {
      depths[i] = depthMm - pulled.offsets[n - 1 - i]!;
      areas[i] = pulled.areas[n - 1 - i]!;
    }
    const c = neutralAxisDepth(depths, areas, n, k);
    if (!(c > 0) || this.isNearChange(c, nc, k)) return;
    this.fromMm = this.leastDepthMm(c, nc, n, k);
    this.axisMm = c;
  }

  /** Whether a compression layer is about to change its state, or the block to leave the flange. */
  private isNearChange(c: number, nc: number, k: UltimateConstants): boolean {
    const near = MARGIN * c;
    if (k.overhangForceN !== 0 && Math.abs(c - k.flangeReachMm) <= near) return true;
    const yieldRatio = k.fyMPa / (k.esMPa * k.epsilonCu);
    for (let i = 0; i < nc; i++) {
      const depth = this.depths[i]!;
      if (Math.abs(depth - (1 + yieldRatio) * c) <= near || Math.abs(depth - (1 - yieldRatio) * c) <= near)
        return true;
    }
    return false;
  }

  /** Least depth of the innermost tension layer for the axis at c, mm; Infinity where a deduction is undecided. */
  private leastDepthMm(c: number, nc: number, n: number, k: UltimateConstants): number {
    const { depths, areas } = this;
    const toYield = (1 + k.fyMPa / (k.esMPa * k.epsilonCu)) * (1 + MARGIN);
    if (k.displacedConcrete === 'ignore') return toYield * c;
    const reach = k.displacedConcrete === 'deduct' ? k.blockDepthFactor : 1;
    let steelMm2 = 0;
    for (let i = 0; i < n; i++) steelMm2 += areas[i]!;
    // as deep as they may be, the tension layers yield wherever the axis is tried
    for (let i = nc; i < n; i++) depths[i] = Infinity;
    let deducted = 0;
    let deepestTried = 0;
    for (let count = nc; count > 0 && deducted === 0; count--) {
      const atLayer = depths[count - 1]! / reach;
      const force = unbalancedForce(depths, areas, n, k, atLayer, count);
      if (Math.abs(force) <= MARGIN * (k.fyMPa * steelMm2 + k.flangeForcePerMm * atLayer)) return Infinity;
      if (force >= 0) continue;
      deducted = count;
      deepestTried = atLayer;
    }
    const least = toYield * Math.max(c, deepestTried);
    if (n - nc < 2) return least;
    let displacedMm2 = 0;
    for (let i = deducted; i < n - 1; i++) displacedMm2 += areas[i]!;
    const beyond = c + (k.blockStressMPa * displacedMm2) / k.blockForcePerMm;
    return Math.max(least, reach * beyond * (1 + BOUND_MARGIN));
  }
}
