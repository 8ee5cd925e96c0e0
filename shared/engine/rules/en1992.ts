import { EN_SYMBOLS } from './code-symbols.ts';
import {
  blockDepthShare,
  blockStressShare,
  crushingStrainOf,
  elasticAxisShare,
  isHighStrength,
  meanTensionMPa,
  plasticAxisShare,
  secantModulusMPa,
} from './en1992-concrete.ts';
import { largestSpanToDepth, spanToDepthFormula, tabledBarSpacingMm } from './en1992-service.ts';
import { effectiveFlangeFormula, effectiveFlangeMm, meanTensionWidthMm } from './en1992-flange.ts';
import { designStepsOf } from './en1992-steps.ts';
import { en1998 } from './en1998.ts';
import { fullNationalValues, type FullNationalValues, type NationalValues } from './national-values.ts';
import type { Clauses, Formulas, RuleSet, Texts } from './rule-set.ts';
import type { StrutShearRules } from './shear-rules.ts';

/**
 * EN 1992-1-1:2004 with its recommended values or national ones; clause numbers and values from memory of the standard.
 * Strength counts on design values throughout: η fcd in the block, fyd in the steel, so that strength needs no further
 * reduction and curvatures are those of design values too.
 */
const BOOK = 'EN 1992-1-1';
/** Depth from which beams have bars along their sides (7.3.3(3)), mm. */
const SKIN_FROM_MM = 1000;
/** Least clear gap (8.2(2)), mm. */
const LEAST_GAP_MM = 20;
/** Mandrel of Table 8.1N: 4 φ to 16 mm, 7 φ above; half of it is the inside radius. */
const TIGHT_BEND_TO_MM = 16;
/** Slack of a diameter converted from another unit, mm. */
const SLACK_MM = 1e-6;

/** What of a basis makes the rules. */
export interface En1992Choices {
  readonly nationalValues?: NationalValues | null | undefined;
  /** Hoops of ductile frames end in 10 diameters behind the hook (EN 1998-1 5.6.1(2)). */
  readonly isDuctile?: boolean | undefined;
}

/** The rules of EN 1992-1-1, and of EN 1998-1 for ductile beams. */
export function en1992({ nationalValues, isDuctile = false }: En1992Choices = {}): RuleSet {
  const v = fullNationalValues(nationalValues);
  const fydOf = (fykMPa: number) => fykMPa / v.gammaS;
  const fcdOf = (fckMPa: number) => (v.alphaCc * fckMPa) / v.gammaC;
  const gapMm = (diameterMm: number, aggregateMm: number) =>
    Math.max(v.gapDiameters * diameterMm, aggregateMm + v.gapOverAggregateMm, LEAST_GAP_MM);
  return {
    id: 'en1992',
    title: 'EN 1992-1-1:2004',
    units: 'si',
    crushingStrain: crushingStrainOf,
    designYieldMPa: fydOf,
    blockStressMPa: (fckMPa) => blockStressShare(fckMPa) * fcdOf(fckMPa),
    blockDepthFactor: blockDepthShare,
    concreteModulusMPa: secantModulusMPa,
    ruptureModulusMPa: meanTensionMPa,
    strengthReduction: () => 1,
    fullReductionStrain: () => -Infinity,
    leastTensionStrain: () => null,
    largestAxisShare: (fckMPa) =>
      v.isPlasticAnalysis
        ? plasticAxisShare(fckMPa)
        : elasticAxisShare(fckMPa, { k1: v.axisK1, k2: v.axisK2, k3: v.axisK3, delta: v.redistribution }),
    largestFaceSteelShare: v.mostSteel,
    leastSteelMm2: ({ fcMPa, fyMPa, widthMm, dMm }) =>
      Math.max((v.leastSteel * meanTensionMPa(fcMPa)) / fyMPa, v.leastSteelFloor) * widthMm * dMm,
    leastSteelWidthMm: meanTensionWidthMm,
    effectiveFlangeMm,
    leastSteelWaiver: null,
    tensionControlledReduction: 1,
    barGapMm: gapMm,
    layerGapMm: gapMm,
    bendRadiusMm: (ds) => (ds <= TIGHT_BEND_TO_MM + SLACK_MM ? 2 * ds : 3.5 * ds),
    hookTailMm: (ds) => (isDuctile ? 10 * ds : Math.max(5 * ds, 50)),
    crackSpacingMm: (fykMPa) => tabledBarSpacingMm(serviceStressMPa(v, fykMPa), v.crackWidthMm),
    tieSpacingMm: (barMm) => v.tieDiameters * barMm,
    isTieSpacingWithinLeastSide: false,
    leastTieDiameterMm: () => 0,
    leastDepthMm: () => 0,
    largestSpanToDepth: (of) => largestSpanToDepth(of),
    shear: shearRules(v),
    curveConcrete: { law: 'parabola-rectangle', peakShare: v.alphaCc / v.gammaC },
    ...skinRules(v),
    seismic: en1998(v),
    designSteps: designStepsOf(v),
    symbols: EN_SYMBOLS,
    texts: textsOf(v),
    clauses: clausesOf(v),
    formulas: formulasOf(v),
  };
}

/** Assumed stress in the bars under quasi-permanent loads. */
const serviceStressMPa = (v: FullNationalValues, fykMPa: number) =>
  (v.serviceStressShare * fykMPa) / v.gammaS;

/** Bars along the sides of deep beams: pure tension, at half of the stress in the main bars (7.3.3(3)). */
const skinRules = (v: FullNationalValues) => ({
  isSkinSteelAsked: (depthMm: number) => depthMm >= SKIN_FROM_MM - SLACK_MM,
  skinSpacingMm: (fykMPa: number) => tabledBarSpacingMm(serviceStressMPa(v, fykMPa) / 2, v.crackWidthMm),
});

function shearRules(v: FullNationalValues): StrutShearRules {
  return {
    form: 'variable-strut',
    concrete: v.shearConcrete / v.gammaC,
    concreteFloor: v.shearFloor,
    strutStrengthMPa: (fckMPa) => (v.alphaCcShear * fckMPa) / v.gammaC,
    strutReduction: (fckMPa) => v.strutReduction * (1 - fckMPa / 250),
    stirrupDesignMPa: (fywkMPa) => fywkMPa / v.gammaS,
    leastCot: v.leastCot,
    mostCot: v.mostCot,
    leverArmShare: 0.9,
    leastStirrupRoot: v.leastStirrups,
    longestSpacingShare: v.stirrupSpacingShare,
    longestAcrossShare: v.legSpacingShare,
    longestAcrossMm: v.legSpacingMm,
  };
}

function clausesOf(v: FullNationalValues): Clauses {
  return {
    block: `${BOOK} 3.1.7(3)`,
    strengthReduction: `${BOOK} 3.2.7`,
    strength: `${BOOK} 6.1`,
    tensionStrain: `${BOOK} 5.5(4)`,
    concreteModulus: `${BOOK} Table 3.1`,
    ruptureModulus: `${BOOK} 7.1(2)`,
    leastSteel: `${BOOK} 9.2.1.1(1)`,
    barSpacing: `${BOOK} 8.2(2)`,
    hangers: `${BOOK} 9.2.2(2)`,
    crackControl: `${BOOK} 7.3.3(2), Table 7.3N`,
    compressionTies: `${BOOK} 9.2.1.2(3)`,
    shear: `${BOOK} 6.2.2, 6.2.3`,
    shearConcrete: `${BOOK} 6.2.2(1)`,
    shearStirrups: `${BOOK} 6.2.3(1) to (3)`,
    shearLimit: `${BOOK} 6.2.3(3)`,
    stirrupSpacing: `${BOOK} 9.2.2(5), (6), (8)`,
    spacingAlong: `${BOOK} 9.2.2(6)`,
    leastStirrups: `${BOOK} 9.2.2(5)`,
    leastDepth: `${BOOK} 7.4.2(2)`,
    axisDepth: `${BOOK} ${v.isPlasticAnalysis ? '5.6.2(2)' : '5.5(4)'}`,
    mostSteel: `${BOOK} 9.2.1.1(3)`,
    skinSteel: `${BOOK} 7.3.3(3)`,
    flangeWidth: `${BOOK} 5.3.2.1(3)`,
    steelLaw: `${BOOK} 3.2.7(2)`,
  };
}

function textsOf(v: FullNationalValues): Texts {
  return {
    shear: 'VRd ≥ VEd: the concrete alone, or stirrups and struts of the slope that carries most',
    stirrupsMissing: 'a beam has stirrups always',
    leastDepth:
      'least effective depth where deflections are not computed: span over d with the steel as provided, partitions that could be damaged',
    serviceStress: `σs taken as ${v.serviceStressShare} fyd, wk = ${v.crackWidthMm} mm`,
  };
}

function axisFormula(v: FullNationalValues, fckMPa: number): string {
  if (v.isPlasticAnalysis)
    return `${plasticAxisShare(fckMPa)} d, plastic analysis without a check of rotations`;
  const offset = isHighStrength(fckMPa) ? v.axisK3 : v.axisK1;
  return `(${v.redistribution} − ${offset}) d/(${v.axisK2} (0.6 + 0.0014/εcu3)), δ = ${v.redistribution}`;
}

function formulasOf(v: FullNationalValues): Formulas {
  return {
    blockDepthFactor: '0.8 − (fck − 50)/400, fck within 50 and 90 MPa',
    concreteModulus: '22000 ((fck + 8)/10)^0.3; MPa',
    ruptureModulus: 'fctm',
    leastSteel: `max(${v.leastSteel} fctm/fyk, ${v.leastSteelFloor}) b d`,
    strengthReduction: '1, the partial factors being in fcd and fyd',
    axisShare: (fckMPa) => axisFormula(v, fckMPa),
    crackSpacing: `Table 7.3N between its lines at σs for wk = ${v.crackWidthMm} mm`,
    skinSpacing: `Table 7.3N between its lines at σs/2 for wk = ${v.crackWidthMm} mm`,
    tieSpacing: `stirrup spacing within ${v.tieDiameters} diameters of the least compression bar`,
    leastSteelWidth: 'b + (bf − b) min(hf, h/2)/(h/2), the tension zone taken as half of the depth',
    effectiveFlange: effectiveFlangeFormula,
    leastDepth: () => 'span/(l/d)',
    spanToDepth: spanToDepthFormula,
  };
}

/** EN 1992-1-1:2004 with the recommended values. */
export const EN_1992 = en1992();
