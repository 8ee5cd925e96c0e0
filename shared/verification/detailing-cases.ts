import { ACI_318_14 } from '#shared/engine/rules/aci318-14.ts';
import { ACI_318_19 } from '#shared/engine/rules/aci318-19.ts';
import { ACI_318M_19 } from '#shared/engine/rules/aci318m-19.ts';
import { SUPPORTS, type Support } from '#shared/engine/section.ts';
import { leastStirrupsPerMm, stirrupShearN, type AdditiveShear } from '#shared/engine/shear-additive.ts';
import { concreteShearN, stirrupSpacingLimitMm } from '#shared/engine/shear.ts';
import { MM2_PER_IN2, MM_PER_IN, MPA_PER_PSI, N_PER_KIP } from '#shared/engine/units.ts';
import { listOf, type ComputeCase } from './published-case.ts';

/** Stirrups given by area, psi and in. */
function usShear(given: { bw: number; fc: number; fyt: number; Av: number; s: number }): AdditiveShear {
  const rules = ACI_318_14.shear;
  const rootFc = Math.sqrt(given.fc * MPA_PER_PSI);
  const widthMm = given.bw * MM_PER_IN;
  const fytMPa = given.fyt * MPA_PER_PSI;
  return {
    form: 'additive',
    rules,
    rootFc,
    widthMm,
    fytMPa,
    avMm2: given.Av * MM2_PER_IN2,
    spacingMm: given.s * MM_PER_IN,
    legSpacingMm: 0,
    leastAvPerMm: leastStirrupsPerMm(rules, rootFc, widthMm, fytMPa),
  };
}

const kip = (newton: number) => newton / N_PER_KIP;
const number = (raw: unknown) => raw as number;

/** Least number of bars whose centres are no further apart than `spacing` in a width; two at least. */
const fewestBars = (clearIn: number, spacingIn: number) =>
  Math.max(2, Math.ceil(clearIn / spacingIn - 1e-9) + 1);

/** How each published case of crack control, least depth and shear is computed with the engine. */
export const DETAILING_CASES: Readonly<Record<string, ComputeCase>> = {
  'ACI-C01': (_, raw) => ({
    // fs = 2/3 fy: 40 ksi is Grade 60, 280 MPa is Grade 420
    s_in:
      ACI_318_19.crackSpacingMm(1.5 * number(raw.fs_ksi) * 1000 * MPA_PER_PSI, number(raw.cc) * MM_PER_IN) /
      MM_PER_IN,
    s_mm: ACI_318M_19.crackSpacingMm(1.5 * number(raw.fs_si), number(raw.cc_si)),
  }),
  'BAR-F03': (_, raw) => {
    const cc = number(raw.cc);
    const spacing = ACI_318_19.crackSpacingMm(60000 * MPA_PER_PSI, cc * MM_PER_IN) / MM_PER_IN;
    return {
      n_min: listOf<number>(raw, 'bars').map((bar) =>
        listOf<number>(raw, 'bw').map((bw) => fewestBars(bw - 2 * (cc + bar / 16), spacing)),
      ),
    };
  },
  'ACI-H01': ({ fy }, raw) => {
    const order: readonly Support[] = SUPPORTS;
    const least = (support: Support, psi: number) =>
      ACI_318_19.leastDepthMm(number(raw.l_in) * MM_PER_IN, support, psi * MPA_PER_PSI) / MM_PER_IN;
    return {
      h: order.map((support) => least(support, fy)),
      factor_80ksi: least('simple', number(raw.fy_alt)) / least('simple', fy),
    };
  },
  'ACI-V01': ({ d, fc }, raw) => {
    const given = { bw: number(raw.bw), fc, fyt: number(raw.fyt), Av: number(raw.Av), s: 1 };
    const k = usShear(given);
    const dMm = d * MM_PER_IN;
    const phiVc = kip(0.75 * concreteShearN(k, dMm, 1));
    const Vs = (number(raw.Vu) - phiVc) / 0.75;
    // Above the trigger and below 4√f′c b d: d/2 or Av,min, whichever is less; the rest of Vn is stirrups.
    const perInch = kip(stirrupShearN({ ...k, avMm2: 1e-3 * k.avMm2 }, dMm)) * 1e3;
    return {
      phiVc,
      half_phiVc: phiVc / 2,
      Vs,
      s1: perInch / Vs,
      s_d2: stirrupSpacingLimitMm(k, number(raw.Vu) * N_PER_KIP, dMm, concreteShearN(k, dMm, 1)) / MM_PER_IN,
      s_50bw: k.avMm2 / k.leastAvPerMm / MM_PER_IN,
    };
  },
  'ACI-V03': ({ d, fc }, raw) => {
    const s = number(raw.s);
    const k = usShear({ bw: number(raw.bw), fc, fyt: number(raw.fyt), Av: 0.22, s });
    const Vu = number(raw.wu_klf) * (number(raw.half_span_ft) - d / 12);
    return {
      Vu,
      half_phiVc: kip(0.75 * concreteShearN(k, d * MM_PER_IN, 1)) / 2,
      Av_min: (k.leastAvPerMm * k.spacingMm) / MM2_PER_IN2,
    };
  },
  'ACI-V04': ({ d }, raw) => ({
    phiVs: listOf<number>(raw, 's').map((s) =>
      // a wide, strong section, so that the section limit does not cut the stirrups' share
      kip(
        0.75 *
          stirrupShearN(
            usShear({ bw: 60, fc: 6000, fyt: number(raw.fyt), Av: number(raw.Av), s }),
            d * MM_PER_IN,
          ),
      ),
    ),
  }),
};
