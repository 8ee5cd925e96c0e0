import { isCurveMeasure } from '../engine/curve-basis.ts';
import { isAtLeastTimes, isAtMostTimes, isWithinLength } from '../engine/limits.ts';
import { MEASURE_IDS } from '../engine/measures.ts';
import type { Combination } from './combination.ts';
import { rowAmounts, writeAmounts, type RowAmounts } from './kernel-amounts.ts';
import { KernelCurve } from './kernel-curve.ts';
import { fixedMask, KernelDetailing } from './kernel-detailing.ts';
import { KernelFlexure } from './kernel-flexure.ts';
import {
  BAR_FIT,
  DEPTH_CAP,
  DEPTH_TO_WIDTH,
  DESIGN_STRENGTH,
  DUCTILITY,
  MU_PHI,
  UTILISATION,
} from './kernel-places.ts';
import { KernelSeismic } from './kernel-seismic.ts';
import { KernelStrength } from './kernel-strength.ts';
import {
  isAboveTension,
  isPlain,
  leastDepthMm,
  type Placement,
  type PreparedSweep,
} from './prepared-sweep.ts';
import { rowColumns, type RowColumns } from './row-columns.ts';
import type { Tally } from './tally.ts';

/** Per-section columns, for comparing the hot loop with `evaluateSection`; measures are in rows of MEASURE_IDS. */
export interface SweepColumns {
  readonly masks: Uint32Array;
  readonly measures: Float64Array;
}

/** Columns being filled, and the index their first place stands for; null in a sweep. */
export type Recorder = (SweepColumns & { readonly first: number }) | null;

/** Layers of one section at most: four a face by the contract, with room for plain layers. */
const MAX_LAYERS = 16;

/** Where one innermost row (all depths of one combination) starts, and which part of it to do. */
interface Row {
  readonly firstIndex: number;
  readonly from: number;
  readonly to: number;
}

interface Sized {
  readonly placement: Placement | null;
  readonly fyMPa: number;
  readonly from: number;
  readonly to: number;
}

/** Whether a mask has one bit at most: only such sections are of use beyond being counted. */
const failsOneAtMost = (mask: number) => (mask & (mask - 1)) === 0;

/** The hot loop over one row of depths, pass by pass over its columns, with what it reuses from row to row. */
export class Kernel {
  /** The steel of the section in hand as built: its stirrups' spacing and skin steel. */
  readonly built = { spacingMm: Infinity, skinKg: 0 };
  private readonly measures = new Float64Array(MEASURE_IDS.length);
  private readonly columns: RowColumns;
  /** What the size masks are filled for. */
  private sized: Sized = { placement: null, fyMPa: NaN, from: 0, to: 0 };
  private readonly flexure: KernelFlexure;
  private readonly strength: KernelStrength;
  private readonly detailing: KernelDetailing;
  private readonly seismic: KernelSeismic | null;
  /** Null where μφ is the closed path's. */
  private readonly curve: KernelCurve | null;
  private readonly prepared: PreparedSweep;
  private readonly tally: Tally;
  private readonly recorder: Recorder;

  constructor(prepared: PreparedSweep, tally: Tally, recorder: Recorder) {
    this.prepared = prepared;
    this.tally = tally;
    this.recorder = recorder;
    const columns = rowColumns(prepared.space.depthsMm);
    this.columns = columns;
    this.curve = isCurveMeasure(prepared.problem.basis) ? new KernelCurve(prepared) : null;
    this.flexure = new KernelFlexure(prepared, columns, MAX_LAYERS);
    this.strength = new KernelStrength(prepared, columns, this.curve === null);
    this.detailing = new KernelDetailing(prepared, columns);
    this.seismic = prepared.seismic && new KernelSeismic(prepared, prepared.seismic, columns, MAX_LAYERS);
  }

  /** The hot loop: all depths of one combination. Returns the number of sections that meet every check. */
  runRow(combination: Combination, row: Row): number {
    const { placement, tension, compression } = combination;
    this.detailing.begin(combination);
    this.seismic?.begin(combination);
    this.startMasks(combination, row);
    const { depthEvaluated } = this.tally;
    for (let j = row.from; j < row.to; j++) depthEvaluated[j]!++;

    const leastMm = leastDepthMm(placement, tension, compression);
    const { h } = this.columns;
    let placedFrom = row.from;
    while (placedFrom < row.to && !isWithinLength(leastMm, h[placedFrom]!)) placedFrom++;
    this.refuse(row, row.from, placedFrom);
    if (placedFrom === row.to) return 0;
    const amounts = rowAmounts(combination);
    if (!isPlain(tension)) return this.runPlaced(combination, amounts, row, placedFrom, row.to);

    let feasible = 0;
    for (let from = placedFrom; from < row.to;) {
      const isPlaced = isAboveTension(tension, compression, h[from]!);
      let to = from + 1;
      while (to < row.to && isAboveTension(tension, compression, h[to]!) === isPlaced) to++;
      if (isPlaced) feasible += this.runPlaced(combination, amounts, row, from, to);
      else this.refuse(row, from, to);
      from = to;
    }
    return feasible;
  }

  /** What is failed without placed bars. */
  private startMasks(combination: Combination, { from, to }: Row): void {
    const { prepared, sized } = this;
    const { masks, sizeMasks } = this.columns;
    const { placement, fyMPa } = combination;
    const isKnown = sized.placement === placement && sized.fyMPa === fyMPa;
    if (!isKnown || from < sized.from || to > sized.to) {
      this.fillSizeMasks(placement, from, to);
      this.sized = { placement, fyMPa, from, to };
    }
    const fixed = fixedMask(combination, prepared.problem.rules, prepared.seismic);
    for (let j = from; j < to; j++) masks[j] = sizeMasks[j]! | fixed;
    this.detailing.addTies(from, to);
  }

  private fillSizeMasks({ widthMm }: Placement, from: number, to: number): void {
    const { demand, rules } = this.prepared.problem;
    const { h, sizeMasks } = this.columns;
    const least = rules.minDepthToWidth ?? -Infinity;
    const most = rules.maxDepthToWidth ?? Infinity;
    const capMm = demand.depthCapMm ?? Infinity;
    for (let j = from; j < to; j++) {
      const depthMm = h[j]!;
      const isShaped = isAtLeastTimes(depthMm, least, widthMm) && isAtMostTimes(depthMm, most, widthMm);
      sizeMasks[j] = (isShaped ? 0 : DEPTH_TO_WIDTH) | (isWithinLength(depthMm, capMm) ? 0 : DEPTH_CAP);
    }
    this.detailing.addSizeMasks(from, to);
    this.seismic?.addSizeMasks(from, to);
  }

  /** Sections at places [from, to) whose bars cannot be placed. */
  private refuse(row: Row, from: number, to: number): void {
    const { masks } = this.columns;
    for (let j = from; j < to; j++) masks[j]! |= BAR_FIT;
    this.count(from, to);
    if (!this.recorder) return;
    const shift = row.firstIndex - this.recorder.first;
    for (let j = from; j < to; j++) this.recorder.masks[shift + j] = masks[j]!;
  }

  private runPlaced(
    combination: Combination,
    amounts: RowAmounts,
    row: Row,
    from: number,
    to: number,
  ): number {
    const yieldMPa = this.prepared.ruleSet.designYieldMPa(combination.fyMPa);
    const { flexure, detailing, seismic, curve } = this;
    flexure.begin(combination, yieldMPa);
    flexure.fill(from, to);
    this.strength.fill(combination, yieldMPa, from, to);
    detailing.addPlacedMasks(from, to);
    if (seismic !== null) seismic.addPlacedMasks(from, to, flexure);
    if (curve !== null) this.drawCurves(curve, combination, row, from, to);
    this.count(from, to);
    return this.keep(combination, amounts, row, from, to);
  }

  /** μφ off the full curve of the sections that meet every other check, and its own check. */
  private drawCurves(
    curve: KernelCurve,
    combination: Combination,
    { firstIndex }: Row,
    from: number,
    to: number,
  ): void {
    const { masks, muPhi } = this.columns;
    const target = this.prepared.problem.demand.ductilityTarget;
    curve.begin(combination);
    for (let j = from; j < to; j++) {
      muPhi[j] = masks[j] === 0 ? this.curveMuPhi(curve, firstIndex, j) : NaN;
      if (masks[j] === 0 && target !== null && !(muPhi[j]! >= target)) masks[j] = DUCTILITY;
    }
  }

  private curveMuPhi(curve: KernelCurve, firstIndex: number, j: number): number {
    const { flexure, built } = this;
    flexure.place(j);
    this.take(j);
    return curve.muPhi(firstIndex + j, flexure.layers, this.columns.d[j]!, built);
  }

  /** Counts the failures of places [from, to); neighbours mostly fail the same. */
  private count(from: number, to: number): void {
    const { masks } = this.columns;
    for (let j = from; j < to;) {
      const mask = masks[j]!;
      let next = j + 1;
      while (next < to && masks[next] === mask) next++;
      this.tally.countMask(mask, next - j);
      j = next;
    }
  }

  /** Hands on what is feasible, or would be but for one check; returns the number of the feasible. */
  private keep(
    combination: Combination,
    amounts: RowAmounts,
    { firstIndex }: Row,
    from: number,
    to: number,
  ): number {
    const { tally, measures, recorder } = this;
    const { h, masks, muPhi, design } = this.columns;
    const { depthFeasible } = tally;
    const muNmm = this.prepared.problem.demand.muNmm ?? NaN;
    let feasible = 0;
    for (let j = from; j < to; j++) {
      const mask = masks[j]!;
      if (!failsOneAtMost(mask) && recorder === null) continue;
      this.take(j);
      writeAmounts(amounts, h[j]!, this.built, measures);
      measures[MU_PHI] = muPhi[j]!;
      measures[DESIGN_STRENGTH] = design[j]!;
      measures[UTILISATION] = muNmm / design[j]!;
      if (recorder) {
        const place = firstIndex + j - recorder.first;
        recorder.masks[place] = mask;
        recorder.measures.set(measures, place * MEASURE_IDS.length);
      }
      if (mask === 0) {
        feasible++;
        depthFeasible[j]!++;
        tally.addFeasible(firstIndex + j, measures);
      } else if (failsOneAtMost(mask)) this.keepFailing(mask, firstIndex, j);
    }
    return feasible;
  }

  /** A section at place j that fails one check, its measures written. */
  private keepFailing(mask: number, firstIndex: number, j: number): void {
    const { tally, measures, curve } = this;
    const failed = 31 - Math.clz32(mask);
    if (curve !== null && mask !== DUCTILITY) {
      const target = this.prepared.problem.demand.ductilityTarget;
      if (!tally.wouldBeBestWithout(failed, measures, MU_PHI)) return;
      measures[MU_PHI] = this.curveMuPhi(curve, firstIndex, j);
      if (target !== null && !(measures[MU_PHI]! >= target)) return;
    }
    tally.addFailingOnly(failed, firstIndex + j, measures);
  }

  private take(j: number): void {
    this.built.spacingMm = this.columns.spacingMm[j]!;
    this.built.skinKg = this.columns.skinKg[j]!;
  }
}
