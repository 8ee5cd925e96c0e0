import type { ResolvedFlange } from '../engine/flange.ts';
import { requiredSteelMm2 } from '../engine/limits.ts';
import type { Combination } from './combination.ts';
import { AXIS_DEPTH, DUCTILITY, LEAST_STEEL, MOST_STEEL, STRENGTH, TENSION_STRAIN } from './kernel-places.ts';
import type { PreparedSweep } from './prepared-sweep.ts';
import type { RowColumns } from './row-columns.ts';

/** Depths nearer to that of the waiver than this share are asked the rule itself. */
const MARGIN = 1e-9;

/** Design strength, μφ and the checks of strength, ductility and amounts of steel, of placed sections. */
export class KernelStrength {
  private readonly prepared: PreparedSweep;
  private readonly columns: RowColumns;
  /** Whether μφ is the closed path's, and its check with it. */
  private readonly isClosedPath: boolean;
  private readonly leastSteelSection = { fcMPa: 0, fyMPa: 0, widthMm: 0, dMm: 1 };
  private readonly required = {
    widthMm: 0,
    dMm: 0,
    blockStressMPa: 0,
    fyMPa: 0,
    overhangMm: 0,
    overhangDepthMm: 0,
  };
  /** Effective depth from which the least steel is waived, and the least at which that depth decides, mm. */
  private readonly waiver = { fromMm: Infinity, decidesFromMm: Infinity };

  constructor(prepared: PreparedSweep, columns: RowColumns, isClosedPath: boolean) {
    this.prepared = prepared;
    this.columns = columns;
    this.isClosedPath = isClosedPath;
  }

  /** Fills design and muPhi at places [from, to) and adds what fails; d, dt, c, kd and nominal are filled. */
  fill(combination: Combination, yieldMPa: number, from: number, to: number): void {
    const { problem, ruleSet } = this.prepared;
    const { esMPa, yieldCurvatureAt } = problem.basis;
    const { d, dt, c, kd, nominal, design, muPhi, masks } = this.columns;
    const epsilonCu = combination.concrete.crushingStrain;
    const epsilonTy = yieldMPa / esMPa;
    const leastStrain = ruleSet.leastTensionStrain(epsilonTy) ?? -Infinity;
    const axisShare = ruleSet.largestAxisShare(combination.concrete.fcMPa) ?? Infinity;
    const fullStrain = ruleSet.fullReductionStrain(epsilonTy);
    const fullReduction = ruleSet.strengthReduction(Infinity, epsilonTy);
    const muNmm = problem.demand.muNmm ?? -Infinity;
    const target = this.isClosedPath ? (problem.demand.ductilityTarget ?? -Infinity) : -Infinity;
    const isStrengthAsked = problem.demand.muNmm !== null;
    const isDuctilityAsked = this.isClosedPath && problem.demand.ductilityTarget !== null;
    const yieldFrom = yieldCurvatureAt === 'centroid' ? d : dt;
    for (let j = from; j < to; j++) {
      const axis = c[j]!;
      const epsilonT = (epsilonCu * (dt[j]! - axis)) / axis;
      const reduction =
        epsilonT >= fullStrain ? fullReduction : ruleSet.strengthReduction(epsilonT, epsilonTy);
      const designNmm = reduction * nominal[j]!;
      const ductility = epsilonCu / axis / (epsilonTy / (yieldFrom[j]! - kd[j]!));
      design[j] = designNmm;
      muPhi[j] = ductility;
      let mask = masks[j]!;
      if (isStrengthAsked && !(designNmm >= muNmm)) mask |= STRENGTH;
      if (isDuctilityAsked && !(ductility >= target)) mask |= DUCTILITY;
      if (!(epsilonT >= leastStrain)) mask |= TENSION_STRAIN;
      if (!(axis <= axisShare * d[j]!)) mask |= AXIS_DEPTH;
      masks[j] = mask;
    }
    this.addMostSteel(combination, from, to);
    this.addLeastSteel(combination, from, to);
  }

  private addMostSteel({ placement, tension, compression }: Combination, from: number, to: number): void {
    const share = this.prepared.ruleSet.largestFaceSteelShare;
    if (share === null) return;
    const { h, masks } = this.columns;
    const { widthMm } = placement;
    const largestMm2 = Math.max(tension.areaMm2, compression.areaMm2);
    for (let j = from; j < to; j++) if (!(largestMm2 <= share * widthMm * h[j]!)) masks[j]! |= MOST_STEEL;
  }

  private addLeastSteel(combination: Combination, from: number, to: number): void {
    const { placement, tension, concrete, fyMPa } = combination;
    const { leastSteelSection, waiver } = this;
    const { h, d, masks } = this.columns;
    const asMm2 = tension.areaMm2;
    const flange = placement.flange?.face === 'tension' ? placement.flange : null;
    leastSteelSection.fcMPa = concrete.fcMPa;
    leastSteelSection.fyMPa = fyMPa;
    leastSteelSection.widthMm = placement.widthMm;
    let perMm = this.prepared.ruleSet.leastSteelMm2(leastSteelSection);
    this.beginWaiver(combination);
    for (let j = from; j < to; j++) {
      if (flange) perMm = this.leastSteelPerMm(placement.widthMm, flange, h[j]!);
      const dMm = d[j]!;
      if (asMm2 >= perMm * dMm) continue;
      const isClear = dMm >= waiver.decidesFromMm && Math.abs(dMm - waiver.fromMm) > MARGIN * waiver.fromMm;
      if (!(isClear ? dMm > waiver.fromMm : this.isWaived(asMm2, dMm))) masks[j]! |= LEAST_STEEL;
    }
  }

  /** Least steel over d where a flange is in tension, by the width that counts at depth h, mm. */
  private leastSteelPerMm(widthMm: number, flange: ResolvedFlange, depthMm: number): number {
    const { problem, ruleSet } = this.prepared;
    const support = problem.demand.support ?? null;
    this.leastSteelSection.widthMm = ruleSet.leastSteelWidthMm({ widthMm, depthMm, flange, support });
    return ruleSet.leastSteelMm2(this.leastSteelSection);
  }

  /**
   * The steel required for Mu is A at the depth where the block of A alone carries it, d = Mu/(φ A fy) + A fy/(2 σ b), and less
   * in deeper sections: so As ≥ 4/3 of it from the depth of A = As/(4/3) on. Decides only where the block of A takes less
   * than half of d and lies in the flange, if there is one.
   */
  private beginWaiver({ placement, tension, concrete, fyMPa }: Combination): void {
    const { problem, ruleSet } = this.prepared;
    const { required, waiver } = this;
    const { widthMm } = placement;
    const { overhangMm, overhangDepthMm } = placement.overhang;
    const { blockStressMPa } = concrete;
    const muNmm = problem.demand.muNmm;
    const isNever = ruleSet.leastSteelWaiver === null || muNmm === null;
    waiver.fromMm = Number.MAX_VALUE;
    waiver.decidesFromMm = isNever ? 0 : Infinity;
    if (isNever) return;
    required.widthMm = widthMm;
    required.blockStressMPa = blockStressMPa;
    required.fyMPa = fyMPa;
    required.overhangMm = overhangMm;
    required.overhangDepthMm = overhangDepthMm;
    const forceN = (tension.areaMm2 / ruleSet.leastSteelWaiver) * fyMPa;
    const blockMm = forceN / (blockStressMPa * (widthMm + overhangMm));
    if (overhangMm !== 0 && !(blockMm <= overhangDepthMm * (1 - MARGIN))) return;
    waiver.fromMm = muNmm / (ruleSet.tensionControlledReduction * forceN) + blockMm / 2;
    waiver.decidesFromMm = 2 * blockMm;
  }

  /** As at least 4/3 of the steel Mu requires. */
  private isWaived(asMm2: number, dMm: number): boolean {
    const { problem, ruleSet } = this.prepared;
    const { required } = this;
    const { muNmm } = problem.demand;
    const waiver = ruleSet.leastSteelWaiver;
    if (muNmm === null || waiver === null) return false;
    required.dMm = dMm;
    const requiredMm2 = requiredSteelMm2(muNmm, ruleSet.tensionControlledReduction, required);
    return requiredMm2 < Infinity && asMm2 >= waiver * requiredMm2;
  }
}
