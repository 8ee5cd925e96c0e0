import { crackedAxisDepth } from '../engine/cracked-section.ts';
import { barCoverMm } from '../engine/checks-detailing.ts';
import {
  isAtLeastTimes,
  isAtMostTimes,
  isSameLength,
  isWithinLength,
  requiredSteelMm2,
} from '../engine/limits.ts';
import { MEASURE_IDS, onGrid } from '../engine/measures.ts';
import { neutralAxisDepth } from '../engine/neutral-axis.ts';
import { concreteM3PerM, formworkM2PerM } from '../engine/pricing.ts';
import { concreteShearN, designShearN, stirrupSpacingLimitMm, type ShearConstants } from '../engine/shear.ts';
import { stirrupKgPerM } from '../engine/stirrup-length.ts';
import type { FaceEntry } from './face-table.ts';
import {
  BAR_FIT,
  HANGER_BARS,
  STRENGTH,
  DUCTILITY,
  TENSION_STRAIN,
  LEAST_STEEL,
  DEPTH_TO_WIDTH,
  DEPTH_CAP,
  COLUMN_WIDTH,
  COMPRESSION_SHARE,
  BAR_RULES,
  CRACK_CONTROL,
  COMPRESSION_TIES,
  SHEAR,
  STIRRUP_SPACING,
  LEAST_DEPTH,
  AXIS_DEPTH,
  MOST_STEEL,
  STEEL,
  COST,
  CO2E,
  DEPTH,
  WIDTH,
  CONCRETE,
  FORMWORK,
  MU_PHI,
  DESIGN_STRENGTH,
  UTILISATION,
  BAR_COUNT,
} from './kernel-places.ts';
import {
  isAboveTension,
  isPlain,
  leastDepthMm,
  offsetOf,
  type ConcreteConstants,
  type Placement,
  type PreparedSweep,
} from './prepared-sweep.ts';
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

/** One combination of everything but the depth. */
interface Combination {
  readonly placement: Placement;
  readonly tension: FaceEntry;
  readonly compression: FaceEntry;
  readonly concrete: ConcreteConstants;
  readonly shear: ShearConstants;
  readonly fyMPa: number;
}

/** The hot loop over one row of depths, with what it reuses from row to row. */
export class Kernel {
  private readonly depths = new Float64Array(MAX_LAYERS);
  private readonly areas = new Float64Array(MAX_LAYERS);
  private readonly measures = new Float64Array(MEASURE_IDS.length);
  private readonly ultimate;
  private readonly cracked = { widthMm: 0, modularRatio: 0, ratioAbove: 0 };
  private readonly leastSteelSection = { fcMPa: 0, fyMPa: 0, widthMm: 0, dMm: 1 };

  private readonly prepared: PreparedSweep;
  private readonly tally: Tally;
  private readonly recorder: Recorder;

  constructor(prepared: PreparedSweep, tally: Tally, recorder: Recorder) {
    this.prepared = prepared;
    this.tally = tally;
    this.recorder = recorder;
    const { basis } = prepared.problem;
    this.ultimate = {
      blockForcePerMm: 0,
      blockStressMPa: 0,
      blockDepthFactor: 0,
      fyMPa: 0,
      esMPa: basis.esMPa,
      epsilonCu: 0,
      displacedConcrete: basis.displacedConcrete,
    };
  }

  /** The checks that look neither at the depth nor at the numbers. */
  private fixedMask({ placement, tension, compression }: Combination): number {
    const { rules } = this.prepared.problem;
    let mask = 0;
    const hasBars = tension.barCount === tension.barCount;
    if (
      rules.requireHangers &&
      placement.stirrup &&
      hasBars &&
      !(Math.min(tension.barCount, compression.barCount) >= placement.stirrup.legs)
    )
      mask |= HANGER_BARS;
    if (rules.columnWidthMm !== null && !isSameLength(placement.widthMm, rules.columnWidthMm))
      mask |= COLUMN_WIDTH;
    if (
      rules.minCompressionShare !== null &&
      !isAtLeastTimes(compression.givenAreaMm2, rules.minCompressionShare, tension.givenAreaMm2)
    )
      mask |= COMPRESSION_SHARE;
    if (tension.breaksBarRules || compression.breaksBarRules) mask |= BAR_RULES;
    return mask;
  }

  /**
   * The hot loop: all depths of one combination. Longer than a function should be, since each hoisted value is a division
   * or a call saved a million times. Returns the number of sections that meet every check.
   */
  runRow(combination: Combination, row: Row): number {
    const { placement, tension, compression, concrete, fyMPa } = combination;
    const { problem, ruleSet, space } = this.prepared;
    const { basis, demand, rules } = problem;
    const { tally, recorder, depths, areas, measures, ultimate, cracked } = this;
    const { depthFeasible, depthEvaluated } = tally;
    const depthsMm = space.depthsMm;
    const widthMm = placement.widthMm;

    const muNmm = demand.muNmm;
    const target = demand.ductilityTarget;
    const capMm = demand.depthCapMm;
    const { minDepthToWidth, maxDepthToWidth } = rules;
    const fixedMask = this.fixedMask(combination);
    const isPlainSteel = isPlain(tension);
    const leastMm = leastDepthMm(placement, tension, compression);

    const { blockStressMPa, blockDepthFactor } = concrete;
    const esMPa = basis.esMPa;
    const epsilonCu = concrete.crushingStrain;
    // yield stress that strength counts on; the least steel and the detailing rules take fy as it is named
    const yieldMPa = ruleSet.designYieldMPa(fyMPa);
    const epsilonTy = yieldMPa / esMPa;
    const leastStrain = ruleSet.leastTensionStrain(epsilonTy) ?? -Infinity;
    const largestAxisShare = ruleSet.largestAxisShare(concrete.fcMPa) ?? Infinity;
    const faceSteelShare = ruleSet.largestFaceSteelShare;
    const largestFaceSteelMm2 = Math.max(tension.areaMm2, compression.areaMm2);
    const blockForcePerMm = blockStressMPa * widthMm * blockDepthFactor;
    ultimate.blockForcePerMm = blockForcePerMm;
    ultimate.blockStressMPa = blockStressMPa;
    ultimate.blockDepthFactor = blockDepthFactor;
    ultimate.fyMPa = yieldMPa;
    ultimate.epsilonCu = epsilonCu;
    cracked.widthMm = widthMm;
    cracked.modularRatio = concrete.modularRatio;
    cracked.ratioAbove = concrete.ratioAbove;
    const deductionReach =
      basis.displacedConcrete === 'deduct' ? blockDepthFactor : basis.displacedConcrete === 'ignore' ? -1 : 1;
    const isYieldAtCentroid = basis.yieldCurvatureAt === 'centroid';
    const leastSteelSection = this.leastSteelSection;
    leastSteelSection.fcMPa = concrete.fcMPa;
    leastSteelSection.fyMPa = fyMPa;
    leastSteelSection.widthMm = widthMm;
    const leastSteelPerMm = ruleSet.leastSteelMm2(leastSteelSection);
    const asMm2 = tension.areaMm2;
    const { placedMask, tieSpacingMm, leastDepthMm: leastForDeflection } = this.detailing(combination);
    const vuN = demand.vuN ?? null;
    const shear = vuN === null ? null : combination.shear;

    const nc = compression.layerCount;
    const n = nc + tension.layerCount;
    for (let i = 0; i < nc; i++) {
      depths[i] = compression.offsets[i]!;
      areas[i] = compression.areas[i]!;
    }
    for (let i = 0; i < tension.layerCount; i++) areas[n - 1 - i] = tension.areas[i]!;

    const { stirrup } = placement;
    const { pricing } = concrete;
    const longitudinalKg = tension.kgPerM + compression.kgPerM;
    const lapsKg = longitudinalKg * pricing.lapShare;
    const withWaste = 1 + pricing.wasteShare;
    const longitudinalCost = longitudinalKg * (1 + pricing.lapShare) * withWaste * pricing.longitudinalPerKg;
    const barCount = tension.barCount + compression.barCount;

    let feasibleInRow = 0;
    for (let j = row.from; j < row.to; j++) {
      const h = depthsMm[j]!;
      let mask = fixedMask;
      if (
        (minDepthToWidth !== null && !isAtLeastTimes(h, minDepthToWidth, widthMm)) ||
        (maxDepthToWidth !== null && !isAtMostTimes(h, maxDepthToWidth, widthMm))
      )
        mask |= DEPTH_TO_WIDTH;
      if (capMm !== null && !isWithinLength(h, capMm)) mask |= DEPTH_CAP;
      if (!isWithinLength(tieSpacingMm, h)) mask |= COMPRESSION_TIES;
      if (!isWithinLength(leastForDeflection, h)) mask |= LEAST_DEPTH;
      depthEvaluated[j]!++;

      const d = h - offsetOf(tension, h);
      const isPlaced =
        isWithinLength(leastMm, h) && (!isPlainSteel || isAboveTension(tension, compression, h));
      if (tension.shareOfDepth !== 0) depths[n - 1] = d;
      else for (let i = 0; i < tension.layerCount; i++) depths[n - 1 - i] = h - tension.offsets[i]!;
      if (nc > 0 && compression.shareOfDepth !== 0) depths[0] = compression.shareOfDepth * h;
      if (!isPlaced) {
        mask |= BAR_FIT;
        tally.countMask(mask);
        if (recorder) recorder.masks[row.firstIndex + j - recorder.first] = mask;
        continue;
      }

      const c = neutralAxisDepth(depths, areas, n, ultimate);
      const a = blockDepthFactor * c;
      const deductionDepth = deductionReach * c;
      let nominal = -(blockForcePerMm * c) * (a / 2);
      for (let i = 0; i < n; i++) {
        const depth = depths[i]!;
        const elastic = esMPa * ((epsilonCu * (depth - c)) / c);
        const stress = elastic > yieldMPa ? yieldMPa : elastic < -yieldMPa ? -yieldMPa : elastic;
        nominal += areas[i]! * (depth < deductionDepth ? stress + blockStressMPa : stress) * depth;
      }
      const dt = depths[n - 1]!;
      const epsilonT = (epsilonCu * (dt - c)) / c;
      const design = ruleSet.strengthReduction(epsilonT, epsilonTy) * nominal;
      const kd = crackedAxisDepth(depths, areas, n, cracked);
      const muPhi = epsilonCu / c / (epsilonTy / ((isYieldAtCentroid ? d : dt) - kd));

      if (muNmm !== null && !(design >= muNmm)) mask |= STRENGTH;
      if (target !== null && !(muPhi >= target)) mask |= DUCTILITY;
      if (!(epsilonT >= leastStrain)) mask |= TENSION_STRAIN;
      if (!(c <= largestAxisShare * d)) mask |= AXIS_DEPTH;
      if (faceSteelShare !== null && !(largestFaceSteelMm2 <= faceSteelShare * widthMm * h))
        mask |= MOST_STEEL;
      if (!(asMm2 >= leastSteelPerMm * d) && !this.isLeastSteelWaived(asMm2, d, concrete, fyMPa))
        mask |= LEAST_STEEL;
      mask |= placedMask;
      if (shear !== null && vuN !== null) {
        const concreteN = concreteShearN(shear, d, asMm2);
        if (!(designShearN(shear, d, concreteN) >= vuN)) mask |= SHEAR;
        const limitMm = stirrupSpacingLimitMm(shear, vuN, d, concreteN);
        if (limitMm !== Infinity && !isWithinLength(shear.spacingMm, limitMm)) mask |= STIRRUP_SPACING;
      }
      tally.countMask(mask);

      if (mask !== 0 && (mask & (mask - 1)) !== 0 && recorder === null) continue;
      const stirrupKg = stirrup ? stirrupKgPerM(stirrup, widthMm, h) : 0;
      const netSteel = longitudinalKg + stirrupKg;
      const totalSteel = netSteel + lapsKg + (netSteel + lapsKg) * pricing.wasteShare;
      const concreteM3 = concreteM3PerM(widthMm, h);
      const formworkM2 = formworkM2PerM(widthMm, h, basis.slabMm);
      const stirrupCost = stirrupKg === 0 ? 0 : stirrupKg * withWaste * pricing.stirrupPerKg;
      measures[STEEL] = onGrid(netSteel);
      measures[COST] = onGrid(
        longitudinalCost +
          stirrupCost +
          concreteM3 * pricing.concretePerM3 +
          formworkM2 * pricing.formworkPerM2,
      );
      measures[CO2E] = onGrid(totalSteel * pricing.steelCo2ePerKg + concreteM3 * pricing.concreteCo2ePerM3);
      measures[DEPTH] = h;
      measures[WIDTH] = widthMm;
      measures[CONCRETE] = onGrid(concreteM3);
      measures[FORMWORK] = onGrid(formworkM2);
      measures[MU_PHI] = muPhi;
      measures[DESIGN_STRENGTH] = design;
      measures[UTILISATION] = muNmm === null ? NaN : muNmm / design;
      measures[BAR_COUNT] = barCount;
      if (mask === 0) {
        feasibleInRow++;
        depthFeasible[j]!++;
        tally.addFeasible(row.firstIndex + j, measures);
      } else if ((mask & (mask - 1)) === 0)
        tally.addFailingOnly(31 - Math.clz32(mask), row.firstIndex + j, measures);
      if (recorder) {
        const place = row.firstIndex + j - recorder.first;
        recorder.masks[place] = mask;
        recorder.measures.set(measures, place * MEASURE_IDS.length);
      }
    }
    return feasibleInRow;
  }

  /** What detailing asks of a combination: a mask for placed bars, and the least depth for ties (their spacing) and deflection. */
  private detailing({ placement, tension, compression, fyMPa }: Combination) {
    const { problem, ruleSet } = this.prepared;
    const { coverMm, stirrupBar, given } = placement;
    let placedMask = 0;
    if (tension.largestSpacingMm === tension.largestSpacingMm) {
      const limitMm = ruleSet.crackSpacingMm(fyMPa, barCoverMm(coverMm, stirrupBar));
      if (!isWithinLength(tension.largestSpacingMm, limitMm)) placedMask |= CRACK_CONTROL;
    }
    // A spacing beyond any depth fails at every depth; none is asked without compression bars.
    let tieSpacingMm = -Infinity;
    if (compression.largestBarMm === compression.largestBarMm) {
      const isTied =
        given !== null &&
        stirrupBar !== null &&
        isWithinLength(ruleSet.leastTieDiameterMm(compression.largestBarMm), stirrupBar.diameterMm) &&
        isWithinLength(
          given.spacingMm,
          Math.min(
            ruleSet.tieSpacingMm(compression.leastBarMm, stirrupBar.diameterMm),
            ruleSet.isTieSpacingWithinLeastSide ? placement.widthMm : Infinity,
          ),
        );
      if (!isTied) tieSpacingMm = Infinity;
      else if (ruleSet.isTieSpacingWithinLeastSide) tieSpacingMm = given.spacingMm;
    }
    const { spanMm, support } = problem.demand;
    const leastDepthMm = spanMm && support ? ruleSet.leastDepthMm(spanMm, support, fyMPa) : -Infinity;
    return { placedMask, tieSpacingMm, leastDepthMm };
  }

  /** As at least 4/3 of the steel Mu requires; asked only where As,min is not met, so it need not be fast. */
  private isLeastSteelWaived(
    asMm2: number,
    dMm: number,
    concrete: ConcreteConstants,
    fyMPa: number,
  ): boolean {
    const { problem, ruleSet } = this.prepared;
    const { muNmm } = problem.demand;
    const waiver = ruleSet.leastSteelWaiver;
    if (muNmm === null || waiver === null) return false;
    const { widthMm } = this.cracked;
    const { blockStressMPa } = concrete;
    const required = requiredSteelMm2(muNmm, ruleSet.tensionControlledReduction, {
      widthMm,
      dMm,
      blockStressMPa,
      fyMPa,
    });
    return required < Infinity && asMm2 >= waiver * required;
  }
}
