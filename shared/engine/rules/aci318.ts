import { isWithinLength } from '../limits.ts';
import type { RuleSetId } from '../section.ts';
import { MM_PER_IN, MPA_PER_PSI } from '../units.ts';
import type { Support } from '../section.ts';
import { aciSeismic } from './aci318-seismic.ts';
import { ACI_SYMBOLS } from './code-symbols.ts';
import type { Clauses, Formulas, RuleSet, Texts } from './rule-set.ts';
import type { AdditiveShearRules } from './shear-rules.ts';

/**
 * ACI 318, editions 2014 and 2019, US customary and metric. The editions differ in the strain limits; the metric books
 * differ in rounded coefficients (3√f′c psi is 0.249√f′c MPa, the metric text says 0.25). Clause numbers from memory of
 * the standards.
 */
const EPSILON_CU = 0.003; // 22.2.2.1
const BLOCK_STRESS_SHARE = 0.85; // 22.2.2.4.1
const COMPRESSION_CONTROLLED = 0.65; // Table 21.2.2, ties
const TENSION_CONTROLLED = 0.9; // Table 21.2.2
const SHEAR_REDUCTION = 0.75; // Table 21.2.1
/** Steel stress at service of the crack-control rule as a share of fy, 24.3.2.1. */
const SERVICE_STRESS_SHARE = 2 / 3;

/** The numbers that the US and the metric book round differently. */
interface Coefficients {
  readonly units: 'us' | 'si';
  readonly blockDepthFactor: (fcMPa: number) => number;
  readonly concreteModulusMPa: (fcMPa: number) => number;
  readonly ruptureModulusMPa: (fcMPa: number) => number;
  /** Least steel ratio before fy: max(3√f′c, 200) psi or max(0.25√f′c, 1.4) MPa, as MPa. */
  readonly leastSteelStressMPa: (fcMPa: number) => number;
  /** Largest fy that may be put into the least steel. */
  readonly leastSteelFyCapMPa: number;
  readonly gapMm: number;
  readonly hookTailLeastMm: number;
  readonly largestTightBendMm: number;
  readonly formulas: Omit<
    Formulas,
    | 'strengthReduction'
    | 'tieSpacing'
    | 'skinSpacing'
    | 'effectiveFlange'
    | 'leastSteelWidth'
    | 'spanToDepth'
    | 'axisShare'
  >;
  /** 24.3.2: s ≤ first/fs − 2.5 cc and second/fs; MPa·mm. */
  readonly crackSpacing: readonly [number, number];
  /** Table 9.3.1.1 is for Grade 60 (420): factor 0.4 + fy/base. */
  readonly leastDepthFyBaseMPa: number;
  /** Ties of #3 (10M, 10) to this bar, the next size above (25.7.2.2). */
  readonly lightTie: { readonly upToBarMm: number; readonly lightMm: number; readonly heavyMm: number };
  readonly shear: Omit<AdditiveShearRules, 'form' | 'concreteWithoutStirrups' | 'stirrupsFromShare'> & {
    readonly withoutStirrups19: number;
    readonly stirrupsFromShare19: number;
  };
}

const ROOT_PSI = Math.sqrt(MPA_PER_PSI);

/** Span over least depth, Table 9.3.1.1. */
const SPAN_TO_DEPTH: Readonly<Record<Support, number>> = {
  simple: 16,
  'one-end-continuous': 18.5,
  'both-ends-continuous': 21,
  cantilever: 8,
};

const beta1 = (strengthAboveKnee: number) => Math.max(0.65, Math.min(0.85, 0.85 - 0.05 * strengthAboveKnee));

const US: Coefficients = {
  units: 'us',
  blockDepthFactor: (fcMPa) => beta1((fcMPa / MPA_PER_PSI - 4000) / 1000),
  concreteModulusMPa: (fcMPa) => 57000 * Math.sqrt(fcMPa / MPA_PER_PSI) * MPA_PER_PSI,
  ruptureModulusMPa: (fcMPa) => 7.5 * Math.sqrt(fcMPa / MPA_PER_PSI) * MPA_PER_PSI,
  leastSteelStressMPa: (fcMPa) => Math.max(3 * Math.sqrt(fcMPa / MPA_PER_PSI), 200) * MPA_PER_PSI,
  leastSteelFyCapMPa: 80000 * MPA_PER_PSI,
  gapMm: MM_PER_IN,
  hookTailLeastMm: 3 * MM_PER_IN,
  largestTightBendMm: 0.625 * MM_PER_IN,
  formulas: {
    blockDepthFactor: '0.85 − 0.05 (f′c − 4000)/1000, within 0.65 and 0.85; f′c in psi',
    concreteModulus: '57000 √f′c; psi',
    ruptureModulus: '7.5 √f′c; psi',
    leastSteel: 'max(3 √f′c, 200) b d/fy; psi, fy at most 80,000 psi',
    crackSpacing: 'min(15 · 40000/fs − 2.5 cc, 12 · 40000/fs); fs = 2/3 fy, psi and in',
    leastDepth: (support) => `span/${SPAN_TO_DEPTH[support]} (0.4 + fy/100000); psi`,
  },
  crackSpacing: [15 * MM_PER_IN * 40000 * MPA_PER_PSI, 12 * MM_PER_IN * 40000 * MPA_PER_PSI],
  leastDepthFyBaseMPa: 100000 * MPA_PER_PSI,
  lightTie: { upToBarMm: 1.27 * MM_PER_IN, lightMm: 0.375 * MM_PER_IN, heavyMm: 0.5 * MM_PER_IN },
  // √f′c in psi times a coefficient is psi: in MPa the coefficient is times √(MPa per psi)
  shear: {
    reduction: SHEAR_REDUCTION,
    concrete: 2 * ROOT_PSI,
    withoutStirrups19: 8 * ROOT_PSI,
    sizeDepthMm: 10 * MM_PER_IN,
    largestRootFc: 100 * ROOT_PSI,
    largestStirrupShare: 8 * ROOT_PSI,
    closeSpacingShare: 4 * ROOT_PSI,
    stirrupsFromShare19: ROOT_PSI,
    leastStirrupRoot: 0.75 * ROOT_PSI,
    leastStirrupFloorMPa: 50 * MPA_PER_PSI,
    fytCapMPa: 60000 * MPA_PER_PSI,
    longestSpacingMm: 24 * MM_PER_IN,
    formulas: {
      concrete: '2 √f′c b d; psi',
      concreteWithoutStirrups: '8 λs ρ^⅓ √f′c b d; psi, λs = √(2/(1 + d/10 in))',
      stirrupLimit: '8 √f′c b d; psi',
      leastStirrups: 'max(0.75 √f′c, 50) b/fyt; psi',
    },
  },
};

const METRIC: Coefficients = {
  units: 'si',
  // Table 22.2.2.4.3 of the metric book steps to 0.65 at 55 MPa, a little before the line gets there.
  blockDepthFactor: (fcMPa) => (fcMPa >= 55 ? 0.65 : beta1((fcMPa - 28) / 7)),
  concreteModulusMPa: (fcMPa) => 4700 * Math.sqrt(fcMPa),
  ruptureModulusMPa: (fcMPa) => 0.62 * Math.sqrt(fcMPa),
  leastSteelStressMPa: (fcMPa) => Math.max(0.25 * Math.sqrt(fcMPa), 1.4),
  leastSteelFyCapMPa: 550,
  gapMm: 25,
  hookTailLeastMm: 75,
  largestTightBendMm: 16,
  formulas: {
    blockDepthFactor: '0.85 − 0.05 (f′c − 28)/7, from 28 to 55 MPa; 0.85 below, 0.65 above',
    concreteModulus: '4700 √f′c; MPa',
    ruptureModulus: '0.62 √f′c; MPa',
    leastSteel: 'max(0.25 √f′c, 1.4) b d/fy; MPa, fy at most 550 MPa',
    crackSpacing: 'min(380 · 280/fs − 2.5 cc, 300 · 280/fs); fs = 2/3 fy, MPa and mm',
    leastDepth: (support) => `span/${SPAN_TO_DEPTH[support]} (0.4 + fy/700); MPa`,
  },
  crackSpacing: [380 * 280, 300 * 280],
  leastDepthFyBaseMPa: 700,
  lightTie: { upToBarMm: 32.3, lightMm: 9.5, heavyMm: 12.7 },
  shear: {
    reduction: SHEAR_REDUCTION,
    concrete: 0.17,
    withoutStirrups19: 0.66,
    sizeDepthMm: 250,
    largestRootFc: 8.3,
    largestStirrupShare: 0.66,
    closeSpacingShare: 0.33,
    stirrupsFromShare19: 0.083,
    leastStirrupRoot: 0.062,
    leastStirrupFloorMPa: 0.35,
    fytCapMPa: 420,
    longestSpacingMm: 600,
    formulas: {
      concrete: '0.17 √f′c b d; MPa',
      concreteWithoutStirrups: '0.66 λs ρ^⅓ √f′c b d; MPa, λs = √(2/(1 + 0.004 d))',
      stirrupLimit: '0.66 √f′c b d; MPa',
      leastStirrups: 'max(0.062 √f′c, 0.35) b/fyt; MPa',
    },
  },
};

const TEXTS: Texts = {
  shear: 'φVn ≥ Vu with the stirrups there are, Vs counted to the section limit',
  stirrupsMissing: 'Vu asks for stirrups',
  leastDepth: 'least depth where deflections are not computed, nothing attached that they could damage',
  serviceStress: 'fs = 2/3 fy',
};

const clausesOf = (book: string, year: Edition['year']): Clauses => ({
  block: `${book} 22.2.2.4`,
  strengthReduction: `${book} Table 21.2.2`,
  strength: `${book} 9.5.1.1, 22.2`,
  tensionStrain: `${book} 9.3.3.1`,
  concreteModulus: `${book} 19.2.2.1`,
  ruptureModulus: `${book} 19.2.3.1`,
  leastSteel: `${book} 9.6.1.2, 9.6.1.3`,
  barSpacing: `${book} 25.2.1, 25.2.2`,
  hangers: `${book} 25.7.1.2`,
  crackControl: `${book} 24.3.2`,
  compressionTies: `${book} 9.7.6.4, 25.7.2`,
  shear: `${book} 22.5`,
  shearConcrete: `${book} 22.5.5.1`,
  shearStirrups: `${book} ${year === '19' ? '22.5.8.5.3' : '22.5.10.5.3'}`,
  shearLimit: `${book} 22.5.1.2`,
  stirrupSpacing: `${book} 9.6.3, 9.7.6.2.2`,
  spacingAlong: `${book} 9.7.6.2.2`,
  leastStirrups: `${book} 9.6.3`,
  leastDepth: `${book} Table 9.3.1.1`,
  axisDepth: `${book} 9.3.3.1`,
  mostSteel: `${book} 9.3.3.1`,
  skinSteel: `${book} 9.7.2.3`,
  flangeWidth: `${book} Table 6.3.2.1`,
  steelLaw: `${book} 20.2.2.1`,
});

interface Edition {
  readonly id: RuleSetId;
  readonly year: '14' | '19';
  readonly isMetric: boolean;
}

/** One ACI 318 rule set. */
export function aci318({ id, year, isMetric }: Edition): RuleSet & { readonly shear: AdditiveShearRules } {
  const book = `ACI 318${isMetric ? 'M' : ''}-${year}`;
  const c = isMetric ? METRIC : US;
  /** Strain from which a section is tension-controlled, Table 21.2.2. */
  const tensionControlledStrain = (epsilonTy: number) => (year === '19' ? epsilonTy + 0.003 : 0.005);
  const crackSpacingMm = (fyMPa: number, clearCoverMm: number) => {
    const serviceStress = SERVICE_STRESS_SHARE * fyMPa;
    return Math.min(
      c.crackSpacing[0] / serviceStress - 2.5 * clearCoverMm,
      c.crackSpacing[1] / serviceStress,
    );
  };
  const leastTieDiameterMm = (barDiameterMm: number) =>
    barDiameterMm <= c.lightTie.upToBarMm + 0.01 ? c.lightTie.lightMm : c.lightTie.heavyMm;
  const leastSteelShare = (fcMPa: number, fyMPa: number) =>
    c.leastSteelStressMPa(fcMPa) / Math.min(fyMPa, c.leastSteelFyCapMPa);
  return {
    id,
    title: book,
    units: c.units,
    crushingStrain: () => EPSILON_CU,
    designYieldMPa: (fyMPa) => fyMPa,
    blockStressMPa: (fcMPa) => BLOCK_STRESS_SHARE * fcMPa,
    blockDepthFactor: c.blockDepthFactor,
    concreteModulusMPa: c.concreteModulusMPa,
    ruptureModulusMPa: c.ruptureModulusMPa,
    strengthReduction(epsilonT, epsilonTy) {
      const share = (epsilonT - epsilonTy) / (tensionControlledStrain(epsilonTy) - epsilonTy);
      return (
        COMPRESSION_CONTROLLED +
        (TENSION_CONTROLLED - COMPRESSION_CONTROLLED) * Math.max(0, Math.min(1, share))
      );
    },
    fullReductionStrain: tensionControlledStrain,
    leastTensionStrain: (epsilonTy) => (year === '19' ? epsilonTy + 0.003 : 0.004),
    largestAxisShare: () => null,
    largestFaceSteelShare: null,
    leastSteelMm2: ({ fcMPa, fyMPa, widthMm, dMm }) => leastSteelShare(fcMPa, fyMPa) * widthMm * dMm,
    leastSteelWidthMm: ({ widthMm, flange, support }) =>
      // 9.6.1.2 (b): statically determinate, flange in tension
      flange?.face === 'tension' && support === 'cantilever'
        ? Math.min(flange.widthMm, 2 * widthMm)
        : widthMm,
    effectiveFlangeMm: ({ shape, webMm, thicknessMm, clearToNextWebMm, spanMm }) =>
      shape === 't'
        ? webMm + 2 * Math.min(8 * thicknessMm, clearToNextWebMm / 2, spanMm / 8)
        : webMm + Math.min(6 * thicknessMm, clearToNextWebMm / 2, spanMm / 12),
    leastSteelWaiver: 4 / 3,
    tensionControlledReduction: TENSION_CONTROLLED,
    barGapMm: (diameterMm, aggregateMm) => Math.max(c.gapMm, diameterMm, (4 / 3) * aggregateMm),
    layerGapMm: () => c.gapMm,
    // Table 25.3.2: inside bend diameter 4 db to #5 / 16 mm, 6 db above
    bendRadiusMm: (ds) => (ds <= c.largestTightBendMm + 0.01 ? 2 * ds : 3 * ds),
    hookTailMm: (ds) => Math.max(6 * ds, c.hookTailLeastMm),
    crackSpacingMm,
    tieSpacingMm: (barDiameterMm, stirrupDiameterMm) => Math.min(16 * barDiameterMm, 48 * stirrupDiameterMm),
    isTieSpacingWithinLeastSide: true,
    leastTieDiameterMm,
    leastDepthMm: (spanMm, support, fyMPa) =>
      (spanMm / SPAN_TO_DEPTH[support]) * (0.4 + fyMPa / c.leastDepthFyBaseMPa),
    largestSpanToDepth: null,
    shear: {
      form: 'additive',
      ...c.shear,
      concreteWithoutStirrups: year === '19' ? c.shear.withoutStirrups19 : null,
      stirrupsFromShare: year === '19' ? c.shear.stirrupsFromShare19 : null,
    },
    isSkinSteelAsked: (depthMm) => !isWithinLength(depthMm, isMetric ? 900 : 36 * MM_PER_IN),
    skinSpacingMm: crackSpacingMm,
    seismic: aciSeismic({ title: book, year, isMetric, leastSteelShare, leastTieDiameterMm }),
    designSteps: () => [],
    symbols: ACI_SYMBOLS,
    texts: TEXTS,
    clauses: clausesOf(book, year),
    formulas: {
      ...c.formulas,
      leastSteelWidth: 'min(bf, 2 b), flange in tension of a cantilever',
      spanToDepth: () => '',
      axisShare: () => '',
      effectiveFlange: ({ shape }) =>
        shape === 't' ? 'b + 2 min(8 hf, sw/2, ln/8)' : 'b + min(6 hf, sw/2, ln/12)',
      skinSpacing: c.formulas.crackSpacing,
      tieSpacing: 'stirrup spacing within 16 bar and 48 stirrup diameters and the least side',
      strengthReduction:
        year === '19'
          ? '0.65 + 0.25 (εt − εty)/0.003, within 0.65 and 0.90'
          : '0.65 + 0.25 (εt − εty)/(0.005 − εty), within 0.65 and 0.90',
    },
  };
}
