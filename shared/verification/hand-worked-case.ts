import { evaluateSection } from '#shared/engine/evaluate.ts';
import type { Evaluation } from '#shared/engine/evaluation.ts';
import type { BarGroup, SectionInput } from '#shared/engine/section.ts';
import { METRIC_BASIS, NO_DEMAND, NO_RULES } from './layered-section.ts';
import type { ComputeCase } from './published-case.ts';

/** HAND-01, 300 × 500 with 3-25: worked by hand and by an independent script for this project; no outside source. */
export const handSection = (compression: BarGroup): SectionInput => ({
  widthMm: 300,
  depthMm: 500,
  fcMPa: 30,
  fyMPa: 420,
  coverMm: 40,
  stirrup: { bar: '10', legs: 2, spacingMm: 150 },
  reinforcement: { kind: 'bars', tension: [{ bar: '25', count: 3 }], compression },
});

/** The section of HAND-01 with the top bars given. */
export const evaluateHandSection = (compression: BarGroup): Evaluation =>
  evaluateSection(handSection(compression), { basis: METRIC_BASIS, demand: NO_DEMAND, rules: NO_RULES });

export const HAND_WORKED_CASES: Readonly<Record<string, ComputeCase>> = {
  'HAND-01': () => {
    const { geometry, flexure, elastic, ductility, checks, arrangement } = evaluateHandSection([
      { bar: '16', count: 2 },
    ]);
    const bare = evaluateHandSection([]);
    return {
      d: geometry!.dMm,
      d2: geometry!.dPrimeMm!,
      beta1: flexure!.beta1,
      c: flexure!.neutralAxisMm,
      a: flexure!.blockDepthMm,
      fs2_MPa: -flexure!.layers[0]!.stressMPa,
      eps_t: flexure!.tensionStrain,
      Mn_kNm: flexure!.nominalMomentNmm / 1e6,
      phi: flexure!.strengthReduction,
      phiMn_kNm: flexure!.designMomentNmm / 1e6,
      As_min: checks.find((check) => check.id === 'least-steel')!.demand!,
      clear_gap: arrangement!.faces[0]!.clearGapMm!,
      n: elastic!.modularRatio,
      kd: elastic!.crackedAxisMm,
      Icr: elastic!.crackedInertiaMm4,
      phi_y: ductility!.curvatureYieldPerMm,
      phi_u: ductility!.curvatureUltimatePerMm,
      mu_phi: ductility!.curvatureDuctility,
      fc_at_yield_share: elastic!.concreteStressShareAtYield,
      a_no_top_steel: bare.flexure!.blockDepthMm,
      c_no_top_steel: bare.flexure!.neutralAxisMm,
      Mn_no_top_steel_kNm: bare.flexure!.nominalMomentNmm / 1e6,
      eps_t_no_top_steel: bare.flexure!.tensionStrain,
      mu_phi_no_top_steel: bare.ductility!.curvatureDuctility,
    };
  },
};
