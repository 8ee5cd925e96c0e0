import { ACI_318_14 } from '#shared/engine/rules/aci318-14.ts';
import { ACI_318_19 } from '#shared/engine/rules/aci318-19.ts';
import type { SeismicRules } from '#shared/engine/rules/seismic-rules.ts';
import { faceLeastMm2, faceMostMm2, leastWebMm } from '#shared/engine/seismic.ts';
import { longestAlongMm, shearConstantsOf } from '#shared/engine/shear.ts';
import { hoopLimitMm, setSpacingRules, spacingRules } from '#shared/engine/stirrup-design.ts';
import { MM2_PER_IN2, MM_PER_IN, MPA_PER_PSI } from '#shared/engine/units.ts';
import { listOf, type ComputeCase } from './published-case.ts';

const number = (raw: unknown) => raw as number;
const PSI_PER_KSI = 1000;

/** Hoop spacing in inches for d, the smallest bar and the hoop in inches and the grade in ksi. */
function hoopSpacing(
  seismic: SeismicRules,
  of: { d: number; bar: number; hoop: number; grade: number },
): number {
  const rules = spacingRules();
  setSpacingRules(
    rules,
    {
      widestMm: Infinity,
      stirrupMm: of.hoop * MM_PER_IN,
      widthMm: Infinity,
      fyMPa: of.grade * PSI_PER_KSI * MPA_PER_PSI,
      tiedBarMm: NaN,
      leastBarMm: of.bar * MM_PER_IN,
      skinBarMm: Infinity,
    },
    { basis: {}, ruleSet: ACI_318_19, seismic },
  );
  return hoopLimitMm(rules, of.d * MM_PER_IN, 1.1 * of.d * MM_PER_IN, false) / MM_PER_IN;
}

const special19 = ACI_318_19.seismic.special!;
const special14 = ACI_318_14.seismic.special!;
const intermediate19 = ACI_318_19.seismic.intermediate!;

/** How each case of seismic detailing by ACI 318 is computed with the engine. */
export const SEISMIC_CASES: Readonly<Record<string, ComputeCase>> = {
  'SEIS-01': ({ d, b }) => {
    const k = shearConstantsOf(ACI_318_19.shear, {
      fcMPa: 28,
      widthMm: b * MM_PER_IN,
      coverMm: 0,
      stirrup: null,
      stirrupBar: null,
      fytMPa: 420,
    });
    return { s_max_outside_hinge: longestAlongMm(k, d * MM_PER_IN, false) / MM_PER_IN };
  },
  'SEIS-02': ({ d }, raw) => ({
    s_hinge: listOf<number>(raw, 'grade').map((grade) =>
      hoopSpacing(special19, { d, bar: number(raw.db), hoop: 0.5, grade }),
    ),
  }),
  'SEIS-03': (_, raw) => ({
    s_hinge: listOf<number>(raw, 'd').map((d, i) =>
      hoopSpacing(special14, { d, bar: listOf<number>(raw, 'db')[i]!, hoop: 0.5, grade: 60 }),
    ),
  }),
  'SEIS-04': (_, raw) => ({
    s_hinge: listOf<number>(raw, 'd').map((d) =>
      hoopSpacing(intermediate19, { d, bar: number(raw.db), hoop: number(raw.ds), grade: 60 }),
    ),
  }),
  'SEIS-05': (_, raw) => ({
    b_min: listOf<number>(raw, 'h').map((h) => leastWebMm(special19.leastWidth!, h * MM_PER_IN) / MM_PER_IN),
    ln_min: special19.leastSpanToDepth! * number(raw.d),
  }),
  'SEIS-06': ({ b, d, fc }, raw) => {
    const steel = (seismic: SeismicRules, grade: number, of: typeof faceMostMm2) => {
      const limits = seismic.steelLimits!('tension', {
        fcMPa: fc * MPA_PER_PSI,
        fyMPa: grade * PSI_PER_KSI * MPA_PER_PSI,
        esMPa: 200000,
        ductilityTarget: null,
      });
      return of(limits, b * MM_PER_IN, d * MM_PER_IN, 0) / MM2_PER_IN2;
    };
    const grades = listOf<number>(raw, 'grade');
    return {
      As_max_19: grades.map((grade) => steel(special19, grade, faceMostMm2)),
      As_max_14: steel(special14, grades[0]!, faceMostMm2),
      As_min: grades.map((grade) => steel(special19, grade, faceLeastMm2)),
    };
  },
};
