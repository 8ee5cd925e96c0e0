import { barCoverMm } from '../engine/checks-detailing.ts';
import { isAtLeastTimes, isSameLength, isWithinLength } from '../engine/limits.ts';
import type { DesignBasis, UserRules } from '../engine/section.ts';
import type { SeismicRules } from '../engine/rules/seismic-rules.ts';
import { designShearN, detailingSpacingMm } from '../engine/shear.ts';
import { largestStirrupFactor, stirrupForceFactor } from '../engine/shear-additive.ts';
import { skinBarsPerSide, skinKgPerM } from '../engine/skin-steel.ts';
import {
  designSpacingMm,
  hoopLimitMm,
  setSpacingRules,
  spacingRules,
  spacingState,
  type SpacingBooks,
  type SpacingSetting,
} from '../engine/stirrup-design.ts';
import { leastEffectiveDepthMm, spanToDepthAt, type SpanToDepthAt } from '../engine/span-to-depth.ts';
import type { Combination } from './combination.ts';
import {
  BAR_RULES,
  COLUMN_WIDTH,
  COMPRESSION_SHARE,
  COMPRESSION_TIES,
  CRACK_CONTROL,
  HANGER_BARS,
  HOOP_SPACING,
  LEAST_DEPTH,
  SEISMIC_BARS,
  SHEAR,
  SKIN_STEEL,
  STIRRUP_SPACING,
} from './kernel-places.ts';
import { KernelShear } from './kernel-shear.ts';
import type { PreparedSweep } from './prepared-sweep.ts';
import type { RowColumns } from './row-columns.ts';

/** The checks that look neither at the depth nor at the numbers. */
export function fixedMask(
  { placement, tension, compression }: Combination,
  rules: UserRules,
  seismic: SeismicRules | null,
): number {
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
  const through = seismic?.continuousBars;
  if (through && hasBars && !(Math.min(tension.throughBars, compression.throughBars) >= through.count))
    mask |= SEISMIC_BARS;
  return mask;
}

const barOr = (diameterMm: number, none: number) => (diameterMm === diameterMm ? diameterMm : none);

/** Crack control, ties, stirrups and side bars of one row of depths, with the spacing and skin steel the weights take. */
export class KernelDetailing {
  private readonly at = spacingState();
  private readonly basis: DesignBasis;
  private readonly vuN: number;
  private combination: Combination | null = null;
  private readonly rules = spacingRules();
  private readonly books: SpacingBooks;
  private readonly setting: SpacingSetting;
  private givenSpacingMm = Infinity;
  private hasStirrups = false;
  private isDesigned = false;
  private isTieTooSmall = false;
  /** Whether hoops are asked, and are there and thick enough. */
  private hasHoopLimit = false;
  /** Checks of placed bars that no depth changes. */
  private placedMask = 0;
  private tiesMm = Infinity;
  private isTieWithinDepth = false;
  private leastDepthMm = -Infinity;
  /** Null where the span is not asked, or the code gives the overall depth. */
  private spanToDepth: SpanToDepthAt | null = null;
  private allowedSkinMm = NaN;

  private readonly prepared: PreparedSweep;
  private readonly columns: RowColumns;
  private readonly shear: KernelShear;

  constructor(prepared: PreparedSweep, columns: RowColumns) {
    this.prepared = prepared;
    this.columns = columns;
    this.basis = prepared.problem.basis;
    this.vuN = prepared.problem.demand.vuN ?? NaN;
    this.shear = new KernelShear(columns, this.vuN);
    this.at.vuN = this.vuN;
    const { ruleSet, seismic, skin } = prepared;
    this.books = { basis: this.basis, ruleSet, seismic };
    this.setting = {
      ...{ widestMm: Infinity, stirrupMm: 0, widthMm: 0, fyMPa: 0, tiedBarMm: NaN, leastBarMm: Infinity },
      skinBarMm: skin?.bar?.diameterMm ?? Infinity,
    };
  }

  /** Everything that the depths of one combination share. */
  begin(combination: Combination): void {
    const { ruleSet, skin } = this.prepared;
    const { placement, tension, compression, fyMPa } = combination;
    const { given, stirrupBar, coverMm, widthMm } = placement;
    const last = this.combination;
    this.combination = combination;
    const isSameSteel =
      last !== null && last.tension === tension && last.compression === compression && last.fyMPa === fyMPa;
    if (isSameSteel) {
      this.beginDeflection(combination);
      return;
    }
    this.isDesigned = given?.isDesigned === true;
    this.at.asMm2 = tension.areaMm2;
    this.givenSpacingMm = given?.spacingMm ?? Infinity;
    this.hasStirrups = stirrupBar !== null;
    if (given && stirrupBar) {
      const { setting } = this;
      setting.widestMm = given.spacingMm;
      setting.stirrupMm = stirrupBar.diameterMm;
      setting.widthMm = widthMm;
      setting.fyMPa = fyMPa;
      setting.tiedBarMm = compression.leastBarMm;
      setting.leastBarMm = Math.min(
        barOr(tension.leastBarMm, Infinity),
        barOr(compression.leastBarMm, Infinity),
      );
      setSpacingRules(this.rules, setting, this.books);
    }
    this.placedMask = 0;
    const barsCoverMm = barCoverMm(coverMm, stirrupBar);
    if (tension.largestSpacingMm === tension.largestSpacingMm) {
      const limitMm = ruleSet.crackSpacingMm(fyMPa, barsCoverMm);
      if (!isWithinLength(tension.largestSpacingMm, limitMm)) this.placedMask |= CRACK_CONTROL;
    }
    this.beginTies(combination);
    this.beginHoops(combination);
    this.beginDeflection(combination);
    if (skin?.bar) this.allowedSkinMm = ruleSet.skinSpacingMm(fyMPa, barsCoverMm);
  }

  private beginTies({ placement, compression }: Combination): void {
    const { ruleSet } = this.prepared;
    const { largestBarMm } = compression;
    const isAsked = largestBarMm === largestBarMm;
    const { stirrupBar } = placement;
    this.isTieTooSmall =
      isAsked &&
      !(stirrupBar && isWithinLength(ruleSet.leastTieDiameterMm(largestBarMm), stirrupBar.diameterMm));
    const { rules } = this;
    const isBound = isAsked && this.hasStirrups;
    this.tiesMm = isBound ? Math.min(rules.tiesMm, rules.leastSideMm) : Infinity;
    this.isTieWithinDepth = isBound && rules.leastSideMm !== Infinity;
  }

  private beginHoops({ placement, tension, compression }: Combination): void {
    const hoops = this.prepared.seismic?.hoops;
    if (!hoops) return;
    const largestMm = Math.max(barOr(tension.largestBarMm, 0), barOr(compression.largestBarMm, 0));
    const { stirrupBar } = placement;
    this.hasHoopLimit =
      stirrupBar !== null && isWithinLength(hoops.leastHoopMm(largestMm), stirrupBar.diameterMm);
    if (!this.hasHoopLimit) this.placedMask |= HOOP_SPACING;
  }

  private beginDeflection({ placement, tension, compression, concrete, fyMPa }: Combination): void {
    const { ruleSet, problem } = this.prepared;
    const { spanMm, support } = problem.demand;
    if (!spanMm || !support) return;
    if (ruleSet.largestSpanToDepth === null) {
      this.leastDepthMm = ruleSet.leastDepthMm(spanMm, support, fyMPa);
      return;
    }
    const { widthMm, overhang } = placement;
    this.spanToDepth = spanToDepthAt({
      spanMm,
      support,
      fckMPa: concrete.fcMPa,
      fykMPa: fyMPa,
      webMm: widthMm,
      faceWidthMm: widthMm + overhang.overhangMm,
      asMm2: tension.areaMm2,
      asPrimeMm2: compression.areaMm2,
    });
  }

  /** Adds the least depth to the size masks at places [from, to). */
  addSizeMasks(from: number, to: number): void {
    const { leastDepthMm } = this;
    const { h, sizeMasks } = this.columns;
    for (let j = from; j < to; j++) if (!isWithinLength(leastDepthMm, h[j]!)) sizeMasks[j]! |= LEAST_DEPTH;
  }

  /** Adds the ties of stirrups as given, placed bars or not. */
  addTies(from: number, to: number): void {
    const { h, masks } = this.columns;
    const { isTieTooSmall, givenSpacingMm } = this;
    // depths ascend, so what ties the first one ties all of them
    const isMet = !isTieTooSmall && (this.isDesigned || this.isTied(givenSpacingMm, h[from]!));
    if (isMet) return;
    for (let j = from; j < to; j++)
      if (isTieTooSmall || !this.isTied(givenSpacingMm, h[j]!)) masks[j]! |= COMPRESSION_TIES;
  }

  private isTied(spacingMm: number, h: number): boolean {
    return isWithinLength(spacingMm, this.tiesMm) && (!this.isTieWithinDepth || isWithinLength(spacingMm, h));
  }

  /** Spacing and skin steel of sections at places [from, to), and what their placed bars fail. */
  addPlacedMasks(from: number, to: number): void {
    const { placedMask } = this;
    const { masks, spacingMm, skinKg } = this.columns;
    if (placedMask !== 0) for (let j = from; j < to; j++) masks[j]! |= placedMask;
    if (this.prepared.deep === null) for (let j = from; j < to; j++) skinKg[j] = 0;
    else this.addSkin(this.prepared.deep, from, to);
    if (this.spanToDepth !== null) this.addDeflection(this.spanToDepth, from, to);
    if (this.isDesigned) this.addDesign(from, to);
    else {
      for (let j = from; j < to; j++) spacingMm[j] = this.givenSpacingMm;
      if (this.vuN === this.vuN) this.addGiven(from, to);
    }
    if (this.hasHoopLimit) this.addHoops(from, to);
  }

  private addSkin(deep: Uint8Array, from: number, to: number): void {
    const { tension } = this.combination!;
    const { h, dt, masks, skinKg } = this.columns;
    const { allowedSkinMm } = this;
    const bar = this.prepared.skin?.bar ?? null;
    const innermostMm = tension.offsets[tension.layerCount - 1]!;
    for (let j = from; j < to; j++) {
      skinKg[j] = 0;
      if (deep[j] !== 1) continue;
      const innermost = tension.shareOfDepth === 0 ? h[j]! - innermostMm : dt[j]!;
      const perSide = bar ? skinBarsPerSide(h[j]!, innermost, allowedSkinMm) : NaN;
      if (perSide === perSide) skinKg[j] = skinKgPerM(perSide, bar!.massKgPerM);
      else masks[j]! |= SKIN_STEEL;
    }
  }

  private addDeflection(at: SpanToDepthAt, from: number, to: number): void {
    const { d, masks } = this.columns;
    const largest = this.prepared.ruleSet.largestSpanToDepth!;
    for (let j = from; j < to; j++)
      if (!isWithinLength(leastEffectiveDepthMm(largest, at, d[j]!), d[j]!)) masks[j]! |= LEAST_DEPTH;
  }

  private addGiven(from: number, to: number): void {
    const { givenMasks } = this.shear.given(this.combination!, from, to);
    const { masks } = this.columns;
    for (let j = from; j < to; j++) masks[j]! |= givenMasks[j]!;
  }

  /** Spacing by `designSpacingMm`, its limits that the depths of many rows share worked out once. */
  private addDesign(from: number, to: number): void {
    const { rules, vuN, tiesMm, isTieWithinDepth } = this;
    const { shear } = this.combination!;
    const { h, d, masks, spacingMm, skinKg } = this.columns;
    const { limitMm, detailMm, concreteN } = this.shear.designed(this.combination!, rules, from, to);
    const { stepMm, leastMm } = rules;
    const tiedMm = Math.min(rules.tiesMm, rules.leastSideMm);
    const isDepthTied = rules.leastSideMm !== Infinity;
    const ofBars = Math.min(tiedMm, rules.hoopsByBarsMm);
    const ofBarsWithSkin = Math.min(tiedMm, rules.hoopsByBarsWithSkinMm);
    const leastAreaMm = shear.avMm2 / shear.leastAvPerMm;
    const isAsked = vuN === vuN;
    const isAdditive = shear.form === 'additive';
    const reduction = isAdditive ? shear.rules.reduction : NaN;
    const forceFactor = isAdditive ? stirrupForceFactor(shear) : NaN;
    const largestFactor = isAdditive ? largestStirrupFactor(shear) : NaN;
    for (let j = from; j < to; j++) {
      const dMm = d[j]!;
      const bars = skinKg[j]! > 0 ? ofBarsWithSkin : ofBars;
      const byRow = isDepthTied && h[j]! < bars ? h[j]! : bars;
      const neededMm = limitMm[j]! < byRow ? limitMm[j]! : byRow;
      let spacing = Math.floor((neededMm + 1e-6) / stepMm) * stepMm;
      if (!(spacing > leastMm && isWithinLength(spacing, neededMm))) spacing = leastMm;
      let mask = 0;
      if (isAsked) {
        const designN = isAdditive
          ? reduction * (concreteN[j]! + Math.min((forceFactor * dMm) / spacing, largestFactor * dMm))
          : designShearN(shear, dMm, concreteN[j]!, spacing);
        const isEnough = designN >= vuN;
        if (!(spacing <= leastAreaMm) || (!isEnough && spacing > leastMm)) {
          this.designAt(j);
          continue;
        }
        if (!isEnough) mask = SHEAR;
      }
      spacingMm[j] = spacing;
      if (!isWithinLength(spacing, tiesMm) || (isTieWithinDepth && !isWithinLength(spacing, h[j]!)))
        mask |= COMPRESSION_TIES;
      if (!isWithinLength(spacing, detailMm[j]!)) mask |= STIRRUP_SPACING;
      masks[j]! |= mask;
    }
  }

  /** The design of one section step by step: where the least stirrups are not met, or the closed form ends above a step. */
  private designAt(j: number): void {
    const { at, vuN } = this;
    const { shear } = this.combination!;
    const { h, d, masks, spacingMm, skinKg } = this.columns;
    at.dMm = d[j]!;
    at.depthMm = h[j]!;
    at.hasSkin = skinKg[j]! > 0;
    const spacing = designSpacingMm(at, shear, this.rules);
    spacingMm[j] = spacing;
    if (!this.isTied(spacing, h[j]!)) masks[j]! |= COMPRESSION_TIES;
    if (!(at.designN >= vuN)) masks[j]! |= SHEAR;
    if (!isWithinLength(spacing, detailingSpacingMm(shear, d[j]!, at.isHalved))) masks[j]! |= STIRRUP_SPACING;
  }

  private addHoops(from: number, to: number): void {
    const { rules } = this;
    const { h, d, masks, spacingMm, skinKg } = this.columns;
    for (let j = from; j < to; j++)
      if (!isWithinLength(spacingMm[j]!, hoopLimitMm(rules, d[j]!, h[j]!, skinKg[j]! > 0)))
        masks[j]! |= HOOP_SPACING;
  }
}
