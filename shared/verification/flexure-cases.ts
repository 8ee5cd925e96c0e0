import { requiredSteelMm2 } from '#shared/engine/limits.ts';
import { ACI_318_14 } from '#shared/engine/rules/aci318-14.ts';
import { ACI_318_19 } from '#shared/engine/rules/aci318-19.ts';
import { ACI_318M_14 } from '#shared/engine/rules/aci318m-14.ts';
import { concreteM3PerM } from '#shared/engine/pricing.ts';
import { MM_PER_IN, MPA_PER_PSI } from '#shared/engine/units.ts';
import { evaluateMetric, evaluateUs } from './layered-section.ts';
import { listOf, type ComputeCase } from './published-case.ts';

const kipIn = (kipFt: number) => 12 * kipFt;

/** Steel ratio at which the outermost layer reaches `strain`, by bisection on As; psi, a 10 × 10 in section. */
function ratioAtStrain(fc: number, fy: number, strain: number): number {
  let low = 0.0001;
  let high = 0.2;
  for (let i = 0; i < 60; i++) {
    const mid = (low + high) / 2;
    if (evaluateUs({ b: 10, d: 10, As: mid * 100, fc, fy }).eps_t > strain) low = mid;
    else high = mid;
  }
  return low;
}

/** Least strain at which a rule set's φ is `phi`, by bisection. */
function strainAtPhi(phi: number, reduction: (strain: number) => number): number {
  let low = 0;
  let high = 0.02;
  for (let i = 0; i < 60; i++) {
    const mid = (low + high) / 2;
    if (reduction(mid) >= phi - 1e-12) high = mid;
    else low = mid;
  }
  return high;
}

const axisOverDepth = (strain: number) => 0.003 / (0.003 + strain);

const us = (printed: Parameters<typeof evaluateUs>[0]) => {
  const { a, c, eps_t, Mn, phi, phiMn, evaluation } = evaluateUs(printed);
  return { a, c, eps_t, Mn, phi, phiMn, Mn_kip_in: kipIn(Mn), evaluation };
};

const plain = (printed: Parameters<typeof evaluateUs>[0]) => {
  const { a, c, eps_t, Mn, phi, phiMn, Mn_kip_in } = us(printed);
  return { a, c, eps_t, Mn, phi, phiMn, Mn_kip_in };
};

const metricStrength = (printed: Parameters<typeof evaluateMetric>[0]) => {
  const flexure = evaluateMetric(printed).flexure!;
  return { a: flexure.blockDepthMm, eps_t: flexure.tensionStrain, phiMn: flexure.designMomentNmm / 1e6 };
};

export const FLEXURE_CASES: Readonly<Record<string, ComputeCase>> = {
  'ACI-S01': ({ b, h, d, As, fc, fy, span_ft }) => {
    const concreteFt3PerFt = concreteM3PerM(b * MM_PER_IN, h * MM_PER_IN) / 0.3048 ** 2;
    const self_weight_klf = concreteFt3PerFt * 0.15;
    const Mu = ((1.2 * (1.4 + self_weight_klf) + 1.6 * 1.5) * span_ft ** 2) / 8;
    return { ...plain({ b, h, d, As, fc, fy }), self_weight_klf, Mu };
  },
  'ACI-S02': plain,
  'ACI-S04': metricStrength,
  'ACI-S06': ({ b, d, As, fc, fy }) => ({ ...metricStrength({ b, d, As, fc, fy }), rho_max: As / (b * d) }),
  'ACI-S07': ({ b, d_support, d_midspan, As, fdc, fdy }) => {
    const at = (d: number) => us({ b, d, As, fc: fdc, fy: fdy });
    const rho_b = ratioAtStrain(fdc, fdy, fdy / 29e6);
    // The handbook's least steel is the older 200/fy with the static fy: the branch of the rule below 4,444 psi.
    const bd = { widthMm: 100, dMm: 100 };
    const rho_min =
      ACI_318_14.leastSteelMm2({ ...bd, fcMPa: 4000 * MPA_PER_PSI, fyMPa: 60000 * MPA_PER_PSI }) / 1e4;
    return {
      a: at(d_support).a,
      M_support_lb_in: at(d_support).Mn_kip_in * 1000,
      M_midspan_lb_in: at(d_midspan).Mn_kip_in * 1000,
      rho_b,
      rho_max: 0.75 * rho_b,
      rho_min,
    };
  },
  'ACI-S10': ({ b, d, fc, fy, Mu }) => {
    const section = { widthMm: b, dMm: d, blockStressMPa: ACI_318M_14.blockStressMPa(fc), fyMPa: fy };
    const As_req = requiredSteelMm2(Mu * 1e6, 0.9, section);
    const leastAt = (strength: number) =>
      ACI_318M_14.leastSteelMm2({ fcMPa: strength, fyMPa: fy, widthMm: b, dMm: d });
    return {
      Ec: ACI_318M_14.concreteModulusMPa(fc),
      As_min_sqrt: leastAt(fc),
      // 1.4 governs at 31.36 MPa and below
      As_min_1p4: leastAt(20),
      As_req,
      a: evaluateMetric({ b, d, As: As_req, fc, fy }).flexure!.blockDepthMm,
      c_max_eps_0p005: axisOverDepth(strainAtPhi(0.9, (e) => ACI_318M_14.strengthReduction(e, 0.002))) * d,
    };
  },
  'ACI-S12': (inputs) => {
    const { evaluation, ...rest } = us(inputs);
    const least = evaluation.checks.find((check) => check.id === 'least-steel')!.demand!;
    return { a: rest.a, c: rest.c, eps_t: rest.eps_t, Mn: rest.Mn, As_min: least / MM_PER_IN ** 2 };
  },
  'ACI-S14': plain,
  'ACI-S16': plain,
  'ACI-S17': plain,
  'ACI-B01': (_, raw) => ({
    beta1: listOf<number>(raw, 'fc').map((psi) => ACI_318_19.blockDepthFactor(psi * MPA_PER_PSI)),
  }),
  'ACI-B03': (_, raw) => {
    const balanced = (fy: number) =>
      listOf<number>(raw, 'fc').map((psi) => ratioAtStrain(psi, fy, fy / 29e6));
    return { rho_b_40: balanced(40000), rho_b_60: balanced(60000) };
  },
  'ACI-B04': (_, raw) => {
    const { eps_ty_taken: eps_ty } = raw.edition_14 as { eps_ty_taken: number };
    const phi14 = (strain: number) => ACI_318_14.strengthReduction(strain, eps_ty);
    const { fy: grades } = raw.edition_19 as unknown as { fy: readonly number[] };
    return {
      c_dt_14_tension_controlled: axisOverDepth(strainAtPhi(0.9, phi14)),
      c_dt_14_compression_controlled: axisOverDepth(strainAtPhi(0.65 + 1e-9, phi14)),
      phi_14_at_c_dt_0p5: phi14(0.003),
      c_dt_19_TC: grades.map((fy) =>
        axisOverDepth(strainAtPhi(0.9, (e) => ACI_318_19.strengthReduction(e, fy / 29e6))),
      ),
    };
  },
  'ACI-D04': ({ b, h, d, d2, fc, fy }) => {
    const { flexure, ductility } = evaluateMetric(
      { b, h, d, As: 1472.62, d2, As2: 981.75, fc, fy },
      { displacedConcrete: 'deduct-above-axis' },
    );
    return {
      c: flexure!.neutralAxisMm,
      a: flexure!.blockDepthMm,
      Mn: flexure!.nominalMomentNmm / 1e6,
      phi_u_per_mm: ductility!.curvatureUltimatePerMm,
    };
  },
};
