import { crackedAxisDepth } from '../engine/cracked-section.ts';
import { neutralAxisDepth, type UltimateConstants } from '../engine/neutral-axis.ts';
import type { SortedLayers } from '../engine/reversal.ts';
import type { Combination } from './combination.ts';
import type { PreparedSweep } from './prepared-sweep.ts';
import { RowAxis } from './row-axis.ts';
import type { RowColumns } from './row-columns.ts';

/** A cracked axis nearer to a layer than this share of its depth is looked for layer by layer. */
const MARGIN = 1e-9;

/** Axes and strength of the sections of one row, and their layers. */
export class KernelFlexure {
  /** Layers of the section last placed, by depth. */
  readonly layers: SortedLayers;
  private readonly ultimate: UltimateConstants;
  private readonly cracked = {
    widthMm: 0,
    modularRatio: 0,
    ratioAbove: 0,
    overhangMm: 0,
    overhangDepthMm: 0,
  };
  private readonly axis: RowAxis;
  /** First moment of a tension layer's transformed area for its depth, mm², innermost layer first. */
  private readonly transformedMm2: Float64Array;
  /** Layers above the cracked axis, the sums they fix, and the depths between which they are these. */
  private readonly state = { above: -1, area: 0, moment: 0, low: 0, high: 0 };
  private combination: Combination | null = null;
  private readonly columns: RowColumns;

  constructor(prepared: PreparedSweep, columns: RowColumns, layerCount: number) {
    const { basis } = prepared.problem;
    this.columns = columns;
    this.axis = new RowAxis(layerCount);
    this.transformedMm2 = new Float64Array(layerCount);
    this.layers = {
      depths: new Float64Array(layerCount),
      areas: new Float64Array(layerCount),
      n: 0,
      compressionCount: 0,
    };
    this.ultimate = {
      blockForcePerMm: 0,
      flangeForcePerMm: 0,
      overhangForceN: 0,
      flangeReachMm: 0,
      blockStressMPa: 0,
      blockDepthFactor: 0,
      fyMPa: 0,
      esMPa: basis.esMPa,
      epsilonCu: 0,
      displacedConcrete: basis.displacedConcrete,
    };
  }

  /** Everything that the depths of one combination share. */
  begin(combination: Combination, yieldMPa: number): void {
    const { placement, tension, compression, concrete } = combination;
    const { ultimate, cracked, layers } = this;
    const { blockStressMPa, blockDepthFactor } = concrete;
    const { widthMm } = placement;
    const { overhangMm, overhangDepthMm } = placement.overhang;
    const overhangPerMm = blockStressMPa * overhangMm;
    this.combination = combination;
    ultimate.blockForcePerMm = blockStressMPa * widthMm * blockDepthFactor;
    ultimate.flangeForcePerMm = ultimate.blockForcePerMm + overhangPerMm * blockDepthFactor;
    ultimate.overhangForceN = overhangPerMm * overhangDepthMm;
    ultimate.flangeReachMm = overhangDepthMm / blockDepthFactor;
    ultimate.blockStressMPa = blockStressMPa;
    ultimate.blockDepthFactor = blockDepthFactor;
    ultimate.fyMPa = yieldMPa;
    ultimate.epsilonCu = concrete.crushingStrain;
    cracked.widthMm = widthMm;
    cracked.overhangMm = overhangMm;
    cracked.overhangDepthMm = overhangDepthMm;
    cracked.modularRatio = concrete.modularRatio;
    cracked.ratioAbove = concrete.ratioAbove;
    const nc = compression.layerCount;
    const nt = tension.layerCount;
    for (let i = 0; i < nc; i++) {
      layers.depths[i] = compression.offsets[i]!;
      layers.areas[i] = compression.areas[i]!;
    }
    for (let i = 0; i < nt; i++) {
      layers.areas[nc + i] = tension.areas[nt - 1 - i]!;
      this.transformedMm2[i] = concrete.modularRatio * layers.areas[nc + i]!;
    }
    layers.n = nc + nt;
    layers.compressionCount = nc;
    // the layers above the last row's axis are mostly those above this one's
    if (this.state.above >= 0) this.setAbove(Math.min(this.state.above, nc));
  }

  /** The layers of the section at place j, into `layers`. */
  place(j: number): void {
    const { tension, compression } = this.combination!;
    const { depths, n } = this.layers;
    const h = this.columns.h[j]!;
    if (tension.shareOfDepth !== 0) depths[n - 1] = this.columns.d[j]!;
    else for (let i = 0; i < tension.layerCount; i++) depths[n - 1 - i] = h - tension.offsets[i]!;
    if (compression.layerCount > 0 && compression.shareOfDepth !== 0)
      depths[0] = compression.shareOfDepth * h;
  }

  /** Fills d, dt, c, nominal and kd of the placed sections at places [from, to). */
  fill(from: number, to: number): void {
    const { tension, compression } = this.combination!;
    const { h, d, dt } = this.columns;
    const share = tension.shareOfDepth;
    const centroidMm = tension.centroidOffsetMm;
    const outermostMm = tension.offsets[0]!;
    for (let j = from; j < to; j++) {
      d[j] = h[j]! - (share === 0 ? centroidMm : share * h[j]!);
      dt[j] = share === 0 ? h[j]! - outermostMm : d[j]!;
    }
    const shared = this.firstOfShared(from, to);
    for (let j = from; j < shared; j++) this.solve(j);
    if (shared < to) this.share(shared, to);
    if (share === 0 && compression.shareOfDepth === 0) this.crack(from, to);
    else for (let j = from; j < to; j++) this.crackAt(j);
  }

  /** First of the places that share the row's axis; `to` for none. */
  private firstOfShared(from: number, to: number): number {
    const { tension, compression } = this.combination!;
    const { h } = this.columns;
    const { axis } = this;
    axis.find(compression, tension, h[to - 1]!, this.ultimate);
    const innermostMm = tension.offsets[tension.layerCount - 1]!;
    let first = from;
    while (first < to && !(h[first]! - innermostMm >= axis.fromMm)) first++;
    return first;
  }

  /** Axis and strength of one section. */
  private solve(j: number): void {
    this.place(j);
    const { depths, areas, n } = this.layers;
    const c = neutralAxisDepth(depths, areas, n, this.ultimate);
    this.columns.c[j] = c;
    this.columns.nominal[j] = this.momentOf(c, n);
  }

  /** Moment about the compression face of the block and the first `count` layers with the axis at c, N·mm. */
  private momentOf(c: number, count: number): number {
    const { depths, areas } = this.layers;
    const { blockForcePerMm, blockStressMPa, blockDepthFactor, fyMPa, esMPa, epsilonCu } = this.ultimate;
    const { displacedConcrete } = this.ultimate;
    const { overhangMm, overhangDepthMm } = this.cracked;
    const reach = displacedConcrete === 'deduct' ? blockDepthFactor : displacedConcrete === 'ignore' ? -1 : 1;
    const deductionDepth = reach * c;
    const a = blockDepthFactor * c;
    const inFlange = Math.min(a, overhangDepthMm);
    let moment = -(blockForcePerMm * c) * (a / 2) - blockStressMPa * overhangMm * inFlange * (inFlange / 2);
    for (let i = 0; i < count; i++) {
      const depth = depths[i]!;
      const elastic = esMPa * ((epsilonCu * (depth - c)) / c);
      const stress = elastic > fyMPa ? fyMPa : elastic < -fyMPa ? -fyMPa : elastic;
      moment += areas[i]! * (depth < deductionDepth ? stress + blockStressMPa : stress) * depth;
    }
    return moment;
  }

  /** Axis and strength of sections whose tension layers all yield at the row's axis. */
  private share(from: number, to: number): void {
    const { tension, compression } = this.combination!;
    const { h, c, nominal } = this.columns;
    const { axisMm } = this.axis;
    const ofCompression = this.momentOf(axisMm, compression.layerCount);
    for (let j = from; j < to; j++) {
      c[j] = axisMm;
      nominal[j] = ofCompression;
    }
    for (let i = tension.layerCount - 1; i >= 0; i--) {
      const forceN = tension.areas[i]! * this.ultimate.fyMPa;
      const offsetMm = tension.offsets[i]!;
      for (let j = from; j < to; j++) nominal[j]! += forceN * (h[j]! - offsetMm);
    }
  }

  private crackAt(j: number): void {
    this.place(j);
    const { depths, areas, n } = this.layers;
    this.columns.kd[j] = crackedAxisDepth(depths, areas, n, this.cracked);
  }

  /**
   * Cracked axes of a row: from section to section the same layers lie above it, so that the sums of `crackedAxisDepth` over
   * the compression face stay. A root between the layers it was found for is the root; else they are counted again.
   */
  private crack(from: number, to: number): void {
    const { tension } = this.combination!;
    const { h, kd } = this.columns;
    const { state, transformedMm2 } = this;
    const { widthMm, overhangMm, overhangDepthMm } = this.cracked;
    const nt = tension.layerCount;
    const { offsets } = tension;
    const innermostMm = offsets[nt - 1]!;
    const flangeMm = widthMm + overhangMm;
    const overhangMm2 = overhangMm * overhangDepthMm;
    for (let j = from; j < to; j++) {
      const s1 = state.area;
      let s2 = state.moment;
      for (let i = 0; i < nt; i++) s2 += transformedMm2[i]! * (h[j]! - offsets[nt - 1 - i]!);
      let x = NaN;
      if (overhangMm !== 0) x = (2 * s2) / (s1 + Math.sqrt(s1 * s1 + 2 * flangeMm * s2));
      if (!(x <= overhangDepthMm)) {
        const area = s1 + overhangMm2;
        const moment = s2 + 0.5 * overhangMm2 * overhangDepthMm;
        x = (2 * moment) / (area + Math.sqrt(area * area + 2 * widthMm * moment));
      }
      if (state.above >= 0 && x > state.low && x < state.high && x < (h[j]! - innermostMm) * (1 - MARGIN))
        kd[j] = x;
      else {
        this.crackAt(j);
        this.countAbove(kd[j]!);
      }
    }
  }

  /** Fixes the layers above a cracked axis at `kd` for the sections that follow. */
  private countAbove(kd: number): void {
    const { depths, n } = this.layers;
    let above = 0;
    while (above < n && depths[above]! < kd) above++;
    this.setAbove(above);
  }

  /** The sums and bounds of an axis below so many layers; none where one of them is a tension layer. */
  private setAbove(above: number): void {
    const { state, transformedMm2 } = this;
    const { depths, areas, n, compressionCount } = this.layers;
    const { modularRatio, ratioAbove } = this.cracked;
    state.above = above <= compressionCount ? above : -1;
    state.low = above > 0 ? depths[above - 1]! * (1 + MARGIN) : 0;
    state.high = above < compressionCount ? depths[above]! * (1 - MARGIN) : Infinity;
    state.area = 0;
    state.moment = 0;
    for (let i = 0; i < compressionCount; i++) {
      const transformed = (i < above ? ratioAbove : modularRatio) * areas[i]!;
      state.area += transformed;
      state.moment += transformed * depths[i]!;
    }
    for (let i = 0; i < n - compressionCount; i++) state.area += transformedMm2[i]!;
  }
}
