import { evaluateSection } from '#shared/engine/evaluate.ts';
import type { FlexureResult } from '#shared/engine/evaluation.ts';
import { requiredSteelMm2 } from '#shared/engine/limits.ts';
import { tabledBarSpacingMm } from '#shared/engine/rules/en1992-service.ts';
import { en1992 } from '#shared/engine/rules/en1992.ts';
import type { NationalValues } from '#shared/engine/rules/national-values.ts';
import type { Support } from '#shared/engine/section.ts';
import { cotTheta, strutShearOf, vRdcN, vRdMaxN, vRdsN } from '#shared/engine/shear-strut.ts';
import { METRIC_BASIS, metricSection, NO_DEMAND, NO_RULES } from './layered-section.ts';
import { listOf, type ComputeCase } from './published-case.ts';

type Printed = Parameters<typeof metricSection>[0];

/** αcc as the British annex has it in bending. */
const BRITISH: NationalValues = { alphaCc: 0.85 };
const number = (raw: unknown) => raw as number;

function flexureOf(printed: Printed, nationalValues: NationalValues): FlexureResult {
  const basis = { ...METRIC_BASIS, ruleSet: 'en1992', nationalValues, displacedConcrete: 'ignore' } as const;
  const { flexure } = evaluateSection(metricSection(printed), { basis, demand: NO_DEMAND, rules: NO_RULES });
  if (!flexure) throw new Error('no strength');
  return flexure;
}

/** The steel for a moment by the closed form, and the section with it; mm, N·mm. */
function designed(at: { b: number; d: number; fck: number; fyk: number }, momentNmm: number) {
  const { b, d, fck, fyk } = at;
  const rules = en1992({ nationalValues: BRITISH });
  const As = requiredSteelMm2(momentNmm, 1, {
    widthMm: b,
    dMm: d,
    blockStressMPa: rules.blockStressMPa(fck),
    fyMPa: rules.designYieldMPa(fyk),
    overhangMm: 0,
    overhangDepthMm: 0,
  });
  const flexure = flexureOf({ b, d, As, fc: fck, fy: fyk }, BRITISH);
  return { As, z: d - flexure.blockDepthMm / 2 };
}

/** The value at which a rising function is zero. */
function zeroOf(rising: (value: number) => number, low: number, high: number): number {
  let [from, to] = [low, high];
  for (let i = 0; i < 60; i++) {
    const middle = (from + to) / 2;
    if (rising(middle) > 0) to = middle;
    else from = middle;
  }
  return from;
}

/** Shear of a web without bars' sizes: legs by their area, mm². */
function shearOf(
  at: { b: number; fck: number; fywk: number; asw: number; s: number },
  values: NationalValues,
) {
  const { shear } = en1992({ nationalValues: values });
  if (shear.form !== 'variable-strut') throw new Error('no struts');
  const stirrups = { widthMm: at.b, fytMPa: at.fywk, avMm2: at.asw, spacingMm: at.s, legSpacingMm: 0 };
  return strutShearOf(shear, at.fck, stirrups);
}

/** Crushing of the struts as a stress on b times 0.9 d, MPa. */
const strutStress = (fck: number, cot: number) =>
  vRdMaxN(shearOf({ b: 1, fck, fywk: 500, asw: 1, s: 1 }, {}), 1 / 0.9, cot);

const strutStresses: ComputeCase = (_, raw) => ({
  v_cot2p5: listOf<number>(raw, 'fck').map((fck) => strutStress(fck, 2.5)),
  v_cot1: listOf<number>(raw, 'fck').map((fck) => strutStress(fck, 1)),
});

/** A flanged section with the British αcc; mm, MPa. */
const flanged: ComputeCase = ({ bw, bf, hf, d, As }, { fck, fyk }) => {
  const flexure = flexureOf({ b: bw, bf, hf, d, As, fc: number(fck), fy: number(fyk) }, BRITISH);
  return { s: flexure.blockDepthMm, MRd_kNm: flexure.nominalMomentNmm / 1e6 };
};

/** How each case of EN 1992-1-1 and EN 1998-1 is computed with the engine. */
export const EUROCODE_CASES: Readonly<Record<string, ComputeCase>> = {
  'EC2-T01': flanged,
  'EC2-T02': flanged,
  'EC2-01': (_, raw) => ({
    z_over_d: listOf<number>(raw, 'K').map((K) => {
      const z = designed({ b: 1000, d: 1000, fck: 30, fyk: 500 }, K * 30e9).z / 1000;
      // the table's own cap, up to this K alone
      return K <= 0.04 ? Math.min(z, 0.95) : z;
    }),
  }),
  'EC2-02': (_, raw) => ({
    Kp: listOf<number>(raw, 'delta').map((redistribution) => {
      // the table rounds 0.8 αcc/γc to 0.45
      const rules = en1992({
        nationalValues: { alphaCc: (0.45 * 1.5) / 0.8, redistribution, axisK1: 0.4, axisK2: 1 },
      });
      const blockShare = rules.blockDepthFactor(30) * rules.largestAxisShare(30)!;
      return (rules.blockStressMPa(30) * blockShare * (1 - blockShare / 2)) / 30;
    }),
  }),
  'EC2-03': (_, raw) => {
    const rules = en1992();
    const fyMPa = number(raw.fyk);
    return {
      fctm: listOf<number>(raw, 'fck').map((fck) => rules.ruptureModulusMPa(fck)),
      pct: listOf<number>(raw, 'fck').map((fcMPa) =>
        rules.leastSteelMm2({ fcMPa, fyMPa, widthMm: 100, dMm: 1 }),
      ),
    };
  },
  'EC2-05': (inputs, raw) => {
    const { v_cot2p5, v_cot1 } = strutStresses(inputs, raw) as Record<string, readonly number[]>;
    return { v_cot2p5: v_cot2p5!, v_cot1: v_cot1!.slice(0, 1) };
  },
  'EC2-06': strutStresses,
  'EC2-08': ({ b, d, As }, raw) => {
    const flexure = flexureOf({ b, d, As, fc: number(raw.fck), fy: number(raw.fyk) }, BRITISH);
    return { s: flexure.blockDepthMm, x: flexure.neutralAxisMm, MRd: flexure.designMomentNmm / 1e6 };
  },
  'EC2-09': ({ b, d, d2, M }, raw) => {
    const [fc, fy] = [number(raw.fck), number(raw.fyk)];
    // tension steel that puts the axis at 0.45 d beside some compression steel, and then the moment
    const withAxis = (As2: number) => {
      const at = (As: number) => flexureOf({ b, d, d2, As, As2, fc, fy }, BRITISH);
      const As = zeroOf((steel) => at(steel).neutralAxisMm - 0.45 * d, 500, 4000);
      return { As, MRd: at(As).designMomentNmm / 1e6 };
    };
    const As2 = zeroOf((steel) => withAxis(steel).MRd - M, 1, 1500);
    return { K: (M * 1e6) / (b * d * d * fc), As2, As: withAxis(As2).As };
  },
  'EN-01': (_, raw) => {
    const rules = en1992();
    const each = (of: (fck: number) => number) => listOf<number>(raw, 'fck').map(of);
    return {
      fctm: each((fck) => rules.ruptureModulusMPa(fck)),
      Ecm: each((fck) => rules.concreteModulusMPa(fck) / 1000),
      eps_cu3: each((fck) => rules.crushingStrain(fck) * 1000),
    };
  },
  'EN-02': (_, raw) => ({
    l_d: listOf<Support>(raw, 'support').map((support) =>
      listOf<number>(raw, 'rho_pct').map((percent) =>
        en1992().largestSpanToDepth!({
          ...{ spanMm: 6000, support, fckMPa: number(raw.fck), fykMPa: number(raw.fyk) },
          ...{ rho: percent / 100, rhoPrime: 0, flangeToWeb: 1 },
        }),
      ),
    ),
  }),
  'EN-03': (_, raw) => {
    const k = shearOf({ b: 1000, fck: number(raw.fck), fywk: 500, asw: 0, s: Infinity }, {});
    return {
      v_Rdc: listOf<number>(raw, 'rho_pct').map((percent) =>
        listOf<number>(raw, 'd').map((d) => vRdcN(k, d, percent * 10 * d) / (1000 * d)),
      ),
    };
  },
  'EN-04': ({ b, d, M }, raw) => {
    const fck = number(raw.fck);
    const found = designed({ b, d, fck, fyk: number(raw.fyk) }, M * 1e6);
    return { K: (M * 1e6) / (b * d * d * fck), ...found };
  },
  'EN-05': ({ b }, raw) => {
    const [asw, s] = [number(raw.Asw), number(raw.s)];
    const given = { b, fck: number(raw.fck), fywk: 1.15 * number(raw.fywd), asw, s };
    const k = shearOf(given, { strutReduction: 0.7, alphaCcShear: 0.85 });
    const cot = cotTheta(k, s);
    return { cot_theta: cot, VRd_s: vRdsN(k, number(raw.z) / 0.9, cot, s) / 1000 };
  },
  'EN-06': (_, raw) => ({
    s: listOf<number>(raw, 'wk').map((wk) =>
      listOf<number>(raw, 'stress').map((stress) => tabledBarSpacingMm(stress, wk)),
    ),
  }),
  'EN-07': (_, raw) => {
    const { dcm, dch } = en1992().seismic;
    const [h, fyMPa] = [number(raw.h), number(raw.fyk)];
    const spacing = (rules: typeof dcm) => {
      const { hoops } = rules!;
      const byBarsMm = hoops!.byBarsMm(number(raw.dbL), number(raw.dbw), fyMPa);
      return Math.min(byBarsMm, hoops!.shareOfDepth * h);
    };
    const limits = dcm!.steelLimits!('tension', {
      ...{ fcMPa: number(raw.fck), fyMPa, esMPa: 200000, ductilityTarget: number(raw.mu_phi) },
    });
    return {
      s_dcm: spacing(dcm),
      s_dch: spacing(dch),
      rho_min: limits.leastShare,
      rho_max_less_rho2: limits.mostShare,
    };
  },
};
