import type { Rates } from '#shared/engine/section.ts';

/** Two strengths within this are the same mix, MPa; as the engine matches them. */
const SAME_MIX_MPA = 0.01;

/** Which rates a section's cost is waiting for, in words; empty when the cost is complete. */
export function missingRates(rates: Rates | null, fcMPa: number): readonly string[] {
  if (rates === null) return ['no price book'];
  const mix = rates.concrete.find((rate) => Math.abs(rate.fcMPa - fcMPa) <= SAME_MIX_MPA);
  return [
    rates.steelPerKg === null ? 'longitudinal bars' : '',
    rates.stirrupPerKg === null ? 'stirrups' : '',
    mix === undefined || mix.costPerM3 === null ? 'concrete of this f′c' : '',
    rates.formworkPerM2 === null ? 'formwork' : '',
  ].filter((name) => name !== '');
}
