import type { ConcreteLaw } from '#shared/engine/concrete-laws/concrete-law.ts';
import { hognestad } from '#shared/engine/concrete-laws/hognestad.ts';
import { twoPressureGain } from '#shared/engine/concrete-laws/mander-strength.ts';
import { todeschini } from '#shared/engine/concrete-laws/todeschini.ts';
import type { ConcreteLawId } from '#shared/engine/curve-choices.ts';
import { momentCurvature } from '#shared/engine/moment-curvature.ts';
import { curvatureDuctilityFor, plasticHingeLengthMm } from '#shared/engine/plastic-hinge.ts';
import { placeSteel } from '#shared/engine/steel-layout.ts';
import { handSection } from './hand-worked-case.ts';
import { METRIC_BASIS } from './layered-section.ts';
import { listOf, type ComputeCase } from './published-case.ts';

/** Mean stress to a strain over the peak, and depth of the resultant over that of the axis. */
function blockFactors(law: ConcreteLaw, strain: number) {
  const force = law.forceIntegral(strain);
  return {
    mean: force / strain / law.peakStressMPa,
    depth: 1 - law.momentIntegral(strain) / force / strain,
  };
}

/** The hand-worked section's curve with a law and a crushing strain. */
function handCurve(concreteLaw: ConcreteLawId, crushingStrain: number) {
  const section = handSection([{ bar: '16', count: 2 }]);
  const { layout, arrangement } = placeSteel(section, METRIC_BASIS, 2);
  return momentCurvature({
    section,
    layout: layout!,
    arrangement,
    basis: METRIC_BASIS,
    choices: { concreteLaw, steelLaw: 'elastic-plastic', crushingStrain },
  });
}

export const CURVE_CASES: Readonly<Record<string, ComputeCase>> = {
  'MN-02': (_, raw) => ({
    ratio: listOf<number>(raw, 'fl_over_fco').map((share) => twoPressureGain(share, share)),
  }),
  'HG-01': (_, raw) => {
    const peakStrain = raw.eps_0 as number;
    const law = hognestad(1, { peakStrain, crushingStrain: raw.eps_end as number });
    const [early, late, atPeak] = [0.003, 0.0038, peakStrain].map((strain) => blockFactors(law, strain));
    return {
      alpha_003: early!.mean,
      gamma_003: early!.depth,
      alpha_0038: late!.mean,
      gamma_0038: late!.depth,
      alpha_at_eps0: atPeak!.mean,
      gamma_at_eps0: atPeak!.depth,
    };
  },
  'TD-01': (_, raw) => {
    const law = todeschini(30, 4700 * Math.sqrt(30));
    const factors = listOf<number>(raw, 'values').map((x) => blockFactors(law, x * law.peakStrain));
    return { mean: factors.map(({ mean }) => mean), k2: factors.map(({ depth }) => depth) };
  },
  'MC-11': (_, raw) => ({
    mu_phi: listOf<number>(raw, 'lp_over_l').map((share) =>
      curvatureDuctilityFor(raw.mu_delta as number, share),
    ),
  }),
  'MC-12': (_, raw) => ({
    Lp_SI_mm: plasticHingeLengthMm({
      lengthMm: raw.L_mm as number,
      expectedYieldMPa: raw.fy_MPa as number,
      barDiameterMm: raw.db_mm as number,
    }),
  }),
  'HAND-02': (_, raw) => {
    const strains = listOf<number>(raw, 'eps_cu');
    const parabolaLine = strains.map((strain) => handCurve('hognestad', strain));
    const parabolaRectangle = strains.map((strain) => handCurve('parabola-rectangle', strain));
    const moments = [...parabolaLine, ...parabolaRectangle].map(({ ultimate }) => ultimate.momentNmm / 1e6);
    return {
      phi_y: parabolaLine[0]!.firstYield!.curvaturePerMm,
      mu_phi_hognestad: parabolaLine.map(({ ductility }) => ductility.byFirstYield.value!),
      mu_phi_parabola_rectangle: parabolaRectangle.map(({ ductility }) => ductility.byFirstYield.value!),
      M_least_kNm: Math.min(...moments),
      M_largest_kNm: Math.max(...moments),
    };
  },
};
