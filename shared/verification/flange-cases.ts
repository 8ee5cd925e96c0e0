import { flangeOf } from '#shared/engine/flange.ts';
import { requiredSteelMm2 } from '#shared/engine/limits.ts';
import { ACI_318_19 } from '#shared/engine/rules/aci318-19.ts';
import { ACI_318M_14 } from '#shared/engine/rules/aci318m-14.ts';
import { MPA_PER_PSI } from '#shared/engine/units.ts';
import { evaluateMetric, evaluateUs } from './layered-section.ts';
import type { ComputeCase } from './published-case.ts';

/**
 * Web and slab where the source prints neither, in: the block stays within the slab, so that neither enters the result. The
 * web is narrow on purpose, since taking it for the flange would show.
 */
const UNPRINTED = { b: 10, hf: 4 };

/** Far enough for neither the next web nor the span to govern, mm. */
const FAR_MM = 1e6;

/** A T worked by hand; its steel at the soffit, then at the slab. */
function workedT(
  { bf, bw, hf, h, d, As, fc, fy }: Parameters<ComputeCase>[0],
  slabAt: 'compression' | 'tension',
) {
  const evaluation = evaluateMetric({ b: bw, bf, hf, slabAt, h, d, As, fc, fy });
  return {
    flexure: evaluation.flexure!,
    elastic: evaluation.elastic!,
    ductility: evaluation.ductility!,
    leastSteelMm2: evaluation.checks.find((check) => check.id === 'least-steel')!.demand!,
  };
}

export const FLANGE_CASES: Readonly<Record<string, ComputeCase>> = {
  'ACI-T01': ({ bf, d, As, fc, fy }) => {
    const { a, c, eps_t, phiMn, evaluation } = evaluateUs({ ...UNPRINTED, bf, d, As, fc, fy });
    const T = evaluation.flexure!.layers[0]!.forceN / (1000 * MPA_PER_PSI * 25.4 ** 2);
    return { T, Ac: a * bf, a, c, eps_t, z: d - a / 2, phiMn, phiMn_kip_in: 12 * phiMn };
  },
  'ACI-T03': ({ b_eff, d, h, fc, fy, Mu }) => {
    const T = (Mu * 12) / (0.9 * 19.5);
    return { T, a: evaluateUs({ ...UNPRINTED, bf: b_eff, h, d, As: (T * 1000) / fy, fc, fy }).a };
  },
  'ACI-T04': ({ bw, hf }) => {
    const width = { kind: 'effective', clearToNextWebMm: FAR_MM, spanMm: FAR_MM } as const;
    const flange = { shape: 't', thicknessMm: hf, face: 'compression', width } as const;
    return { bw_plus_16hf: flangeOf({ widthMm: bw, flange }, ACI_318M_14)!.widthMm };
  },
  'ACI-T05': ({ bw, bf, hf, d, As, fc, fy }) => {
    const { a, c, eps_t, phiMn } = evaluateUs({ b: bw, bf, hf, h: d + 4, d, As, fc, fy });
    return { a, c, eps_t, phiMn_kip_in: 12 * phiMn };
  },
  'ACI-T06': ({ bw, b_eff, hf, d, fc, fy, Mu }) => {
    // psi and in scaled to MPa and mm: areas do not care
    const section = {
      widthMm: bw,
      dMm: d,
      blockStressMPa: ACI_318_19.blockStressMPa(fc),
      fyMPa: fy,
      overhangMm: b_eff - bw,
      overhangDepthMm: hf,
    };
    return { As: requiredSteelMm2(Mu * 12_000, 0.9, section) };
  },
  'HAND-03': (inputs) => {
    const sagging = workedT(inputs, 'compression');
    const hogging = workedT({ ...inputs, As: inputs.As / 2 }, 'tension');
    return {
      a: sagging.flexure.blockDepthMm,
      c: sagging.flexure.neutralAxisMm,
      eps_t: sagging.flexure.tensionStrain,
      Mn_kNm: sagging.flexure.nominalMomentNmm / 1e6,
      kd: sagging.elastic.crackedAxisMm,
      Icr: sagging.elastic.crackedInertiaMm4,
      My_kNm: sagging.elastic.yieldMomentNmm / 1e6,
      y: sagging.elastic.uncrackedAxisMm,
      Iut: sagging.elastic.uncrackedInertiaMm4,
      Mcr_kNm: sagging.elastic.crackingMomentNmm / 1e6,
      mu_phi: sagging.ductility.curvatureDuctility,
      As_min: sagging.leastSteelMm2,
      a_hogging: hogging.flexure.blockDepthMm,
      Mn_hogging_kNm: hogging.flexure.nominalMomentNmm / 1e6,
      y_hogging: hogging.elastic.uncrackedAxisMm,
      Iut_hogging: hogging.elastic.uncrackedInertiaMm4,
      Mcr_hogging_kNm: hogging.elastic.crackingMomentNmm / 1e6,
    };
  },
};
