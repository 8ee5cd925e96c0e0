import { crackedAxisDepth } from '#shared/engine/cracked-section.ts';
import { elasticSection } from '#shared/engine/elastic.ts';
import { placeSteel } from '#shared/engine/steel-layout.ts';
import type { RuleSet } from '#shared/engine/rules/rule-set.ts';
import { ACI_318M_19 } from '#shared/engine/rules/aci318m-19.ts';
import { evaluateMetric, METRIC_BASIS, metricSection } from './layered-section.ts';
import { listOf, type ComputeCase } from './published-case.ts';

/** The moment–curvature note's own modulus and modulus of rupture, which are not the code's. */
const NOTE_RULES: RuleSet = {
  ...ACI_318M_19,
  concreteModulusMPa: (fc) => 5000 * Math.sqrt(fc),
  ruptureModulusMPa: (fc) => 0.7 * Math.sqrt(fc),
};
const BAR_25 = 981.7477 / 2;

function elasticOf(printed: Parameters<typeof metricSection>[0], rules: RuleSet) {
  const section = metricSection(printed);
  const layout = placeSteel(section, METRIC_BASIS, 2).layout!;
  return elasticSection(section, layout, METRIC_BASIS, rules);
}

/** Cracked axis and inertia of layers above and below, straight from the numeric core. */
function cracked(layers: readonly (readonly [depth: number, area: number])[], b: number, n: number) {
  const depths = Float64Array.from(layers, ([depth]) => depth);
  const areas = Float64Array.from(layers, ([, area]) => area);
  const section = { widthMm: b, modularRatio: n, ratioAbove: n - 1, overhangMm: 0, overhangDepthMm: 0 };
  const kd = crackedAxisDepth(depths, areas, layers.length, section);
  const inertia = layers.reduce(
    (sum, [depth, area]) => sum + (depth < kd ? n - 1 : n) * area * (depth - kd) ** 2,
    (b * kd ** 3) / 3,
  );
  return { kd, inertia };
}

export const ELASTIC_CASES: Readonly<Record<string, ComputeCase>> = {
  'MC-01': ({ b, h, d, d2, fc, fy }) => {
    const As = 3 * BAR_25;
    const As2 = 2 * BAR_25;
    const e = elasticOf({ b, h, d, As, d2, As2, fc, fy }, NOTE_RULES);
    const kd = e.crackedAxisMm;
    const atLinearLimit = (0.7 * fc) / e.ecMPa / kd;
    return {
      Ec: e.ecMPa,
      n: e.modularRatio,
      fr: e.ruptureModulusMPa,
      c_uncracked: e.uncrackedAxisMm,
      phi_cr: e.crackingCurvaturePerMm,
      Mcr: e.crackingMomentNmm / 1e6,
      c_cracked: kd,
      I_comp_steel: (e.modularRatio - 1) * As2 * (kd - d2) ** 2,
      I_tens_steel: e.modularRatio * As * (d - kd) ** 2,
      phi_after_crack: e.crackingMomentNmm / (e.ecMPa * e.crackedInertiaMm4),
      phi_at_0p7fc: atLinearLimit,
      M_at_0p7fc: (e.ecMPa * e.crackedInertiaMm4 * atLinearLimit) / 1e6,
      phi_y: e.yieldMomentNmm / (e.ecMPa * e.crackedInertiaMm4),
    };
  },
  'MC-02': ({ b, h, d, d2 }) => {
    const As = 2 * BAR_25;
    const e = elasticOf({ b, h, d, As, d2, As2: As, fc: 35, fy: 420 }, NOTE_RULES);
    const each = (e.modularRatio - 1) * As;
    const Ig = (b * h ** 3) / 12;
    return {
      A_total: b * h + 2 * each,
      c: e.uncrackedAxisMm,
      I_each_steel: (e.uncrackedInertiaMm4 - Ig) / 2,
      Ig,
      phi_cr: e.crackingCurvaturePerMm,
    };
  },
  'MC-03': ({ b, d, As, Es, Ecc }) => {
    const m = Es / Ecc;
    const { kd } = cracked([[d, As]], b, m);
    return { m, x: kd, z: d - kd / 3 };
  },
  'MC-04': ({ b, h, d, As, fc, fy, M }) => {
    const e = elasticOf({ b, h, d, As, fc, fy }, ACI_318M_19);
    const fs = (e.modularRatio * M * 1e6 * (d - e.crackedAxisMm)) / e.crackedInertiaMm4;
    return {
      Ec: e.ecMPa,
      n: e.modularRatio,
      fr: e.ruptureModulusMPa,
      // The source takes the gross section here, not the transformed one.
      Mcr: (e.ruptureModulusMPa * b * h ** 2) / 6 / 1e6,
      c: e.crackedAxisMm,
      Icr: e.crackedInertiaMm4,
      fs,
      fc_top: (M * 1e6 * e.crackedAxisMm) / e.crackedInertiaMm4,
      T_kN: (fs * As) / 1000,
    };
  },
  'MC-08': (_, raw) => {
    const { b, d, As, n } = raw.check1 as unknown as { b: number; d: number; As: number; n: number };
    const one = cracked([[d, As]], b, n);
    // n as the note prints it
    const nNote = 6.761234;
    const area = (Math.PI * 25 ** 2) / 4;
    const two = cracked(
      [
        [62.5, 2 * area],
        [387.5, 3 * area],
      ],
      300,
      nNote,
    );
    return { kd_1: one.kd, Icr_1: one.inertia, kd_2: two.kd, Icr_2: two.inertia };
  },
  'ACI-L01': ({ h }, raw) => {
    const given = listOf<readonly [number, number, number]>(raw, 'layers');
    const steel = given.map(([n, area, y]) => ({
      depthMm: h - y,
      areaMm2: n * area,
      face: 'tension' as const,
    }));
    const section = {
      ...metricSection({ b: 12, h, d: 20, As: 6, fc: 4, fy: 60 }),
      reinforcement: { kind: 'layers' as const, layers: steel },
    };
    const { dMm } = placeSteel(section, METRIC_BASIS, 2).layout!;
    return { ybar: h - dMm, d: dMm };
  },
  'MC-10': (_, raw) => ({
    mu_phi: listOf<readonly [fyKsi: number, shareOfRho: number, rho: number]>(raw, 'points').map((point) => {
      const { muPhi, assumesRight } = parkPaulayPoint(...point);
      return assumesRight
        ? muPhi
        : {
            belowPrinted: muPhi,
            because: 'the closed form assumes that the compression steel yields; it does not',
          };
    }),
  }),
};

/** Curvature ductility of the doubly reinforced rectangle of MC-10 as the engine finds it, and whether A′s yields. */
function parkPaulayPoint(fyKsi: number, shareOfRho: number, rho: number) {
  // psi and in scaled to MPa and mm; ratios do not care. Displaced concrete ignored, as the closed form does.
  const psi = 0.006894757293168361;
  const { flexure, ductility } = evaluateMetric(
    {
      b: 300,
      h: 550,
      d: 500,
      As: rho * 300 * 500,
      d2: 50,
      As2: shareOfRho * rho * 300 * 500,
      fc: 4000 * psi,
      fy: fyKsi * 1000 * psi,
    },
    { ruleSet: 'aci318-19', esMPa: 29e6 * psi, displacedConcrete: 'ignore' },
  );
  const top = flexure!.layers.find((layer) => layer.face === 'compression');
  return { muPhi: ductility!.curvatureDuctility, assumesRight: !top || (top.yields && top.stressMPa < 0) };
}
