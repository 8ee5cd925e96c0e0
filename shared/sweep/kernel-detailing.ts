import { barCoverMm } from '../engine/checks-detailing.ts';
import { isAtLeastTimes, isSameLength, isWithinLength } from '../engine/limits.ts';
import type { DesignBasis, UserRules } from '../engine/section.ts';
import type { SeismicRules } from '../engine/rules/seismic-rules.ts';
import { concreteShearN, designShearN, detailingSpacingMm, stirrupSpacingLimitMm } from '../engine/shear.ts';
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
import type { PreparedSweep } from './prepared-sweep.ts';

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
  /** Spacing of the stirrups of the section last looked at, mm. */
  spacingMm = Infinity;
  skinKg = 0;

  private readonly at = spacingState();
  private readonly basis: DesignBasis;
  private readonly vuN: number;
  private combination: Combination | null = null;
  private readonly rules = spacingRules();
  private readonly books: SpacingBooks;
  private readonly setting: SpacingSetting;
  private hasStirrups = false;
  private isDesigned = false;
  private isTieTooSmall = false;
  /** Whether hoops are asked, and are there and thick enough. */
  private hasHoopLimit = false;
  private placedMask = 0;
  private tiesMm = Infinity;
  private isTieWithinDepth = false;
  private leastDepthMm = -Infinity;
  /** Null where the span is not asked, or the code gives the overall depth. */
  private spanToDepth: SpanToDepthAt | null = null;
  private allowedSkinMm = NaN;

  private readonly prepared: PreparedSweep;

  constructor(prepared: PreparedSweep) {
    this.prepared = prepared;
    this.basis = prepared.problem.basis;
    this.vuN = prepared.problem.demand.vuN ?? NaN;
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
    this.combination = combination;
    this.isDesigned = given?.isDesigned === true;
    this.at.asMm2 = tension.areaMm2;
    this.at.hasSkin = false;
    this.spacingMm = given?.spacingMm ?? Infinity;
    this.skinKg = 0;
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

  /** Checks of a section of depth h (mm) that want no placed bars: ties of stirrups as given, and least depth. */
  sizeMask(h: number): number {
    let mask = isWithinLength(this.leastDepthMm, h) ? 0 : LEAST_DEPTH;
    if (this.isTieTooSmall || (!this.isDesigned && !this.isTied(this.spacingMm, h))) mask |= COMPRESSION_TIES;
    return mask;
  }

  private isTied(spacingMm: number, h: number): boolean {
    return isWithinLength(spacingMm, this.tiesMm) && (!this.isTieWithinDepth || isWithinLength(spacingMm, h));
  }

  /** Checks of placed bars: `j` is the depth's place in the space, `innermostMm` the tension layer nearest mid-depth. */
  placedMaskAt(j: number, h: number, d: number, innermostMm: number): number {
    let mask = this.placedMask;
    const { deep } = this.prepared;
    if (deep !== null) mask |= this.skinMask(deep[j] === 1, h, innermostMm);
    if (this.spanToDepth !== null) mask |= this.deflectionMask(this.spanToDepth, d);
    if (this.isDesigned) mask |= this.designMask(h, d);
    else if (this.vuN === this.vuN) mask |= this.givenMask(d);
    if (this.hasHoopLimit && !isWithinLength(this.spacingMm, hoopLimitMm(this.rules, d, h, this.at.hasSkin)))
      mask |= HOOP_SPACING;
    return mask;
  }

  private deflectionMask(at: SpanToDepthAt, d: number): number {
    const leastMm = leastEffectiveDepthMm(this.prepared.ruleSet.largestSpanToDepth!, at, d);
    return isWithinLength(leastMm, d) ? 0 : LEAST_DEPTH;
  }

  private skinMask(isDeep: boolean, h: number, innermostMm: number): number {
    this.at.hasSkin = false;
    this.skinKg = 0;
    if (!isDeep) return 0;
    const bar = this.prepared.skin?.bar ?? null;
    if (!bar) return SKIN_STEEL;
    const perSide = skinBarsPerSide(h, innermostMm, this.allowedSkinMm);
    if (perSide !== perSide) return SKIN_STEEL;
    this.at.hasSkin = perSide > 0;
    this.skinKg = skinKgPerM(perSide, bar.massKgPerM);
    return 0;
  }

  private designMask(h: number, d: number): number {
    const { at, vuN } = this;
    const { shear } = this.combination!;
    at.dMm = d;
    at.depthMm = h;
    const spacingMm = designSpacingMm(at, shear, this.rules);
    this.spacingMm = spacingMm;
    let mask = this.isTied(spacingMm, h) ? 0 : COMPRESSION_TIES;
    if (vuN === vuN && !(at.designN >= vuN)) mask |= SHEAR;
    if (!isWithinLength(spacingMm, detailingSpacingMm(shear, d, at.isHalved))) mask |= STIRRUP_SPACING;
    return mask;
  }

  private givenMask(d: number): number {
    const { vuN } = this;
    const { shear, tension } = this.combination!;
    const concreteN = concreteShearN(shear, d, tension.areaMm2);
    const mask = designShearN(shear, d, concreteN) >= vuN ? 0 : SHEAR;
    const limitMm = stirrupSpacingLimitMm(shear, vuN, d, concreteN);
    return limitMm === Infinity || isWithinLength(shear.spacingMm, limitMm) ? mask : mask | STIRRUP_SPACING;
  }
}
