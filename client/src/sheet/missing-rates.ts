import type { Rates } from '#shared/engine/section.ts';

/** Two strengths within this are the same mix, MPa; as the engine matches them. */
const SAME_MIX_MPA = 0.01;

const mixOf = (rates: Rates, fcMPa: number) =>
  rates.concrete.find((rate) => Math.abs(rate.fcMPa - fcMPa) <= SAME_MIX_MPA);

/** Which rates a section's cost is waiting for, in words; empty when the cost is complete. */
export function missingRates(rates: Rates | null, fcMPa: number): readonly string[] {
  if (rates === null) return ['no price book'];
  return [
    rates.steelPerKg === null ? 'rate of longitudinal bars' : '',
    rates.stirrupPerKg === null ? 'rate of stirrups' : '',
    (mixOf(rates, fcMPa)?.costPerM3 ?? null) === null ? 'rate of concrete of this strength' : '',
    rates.formworkPerM2 === null ? 'rate of formwork' : '',
  ].filter((name) => name !== '');
}

/** Which carbon factors a section is waiting for, in words; empty when its carbon is complete. */
export function missingFactors(rates: Rates | null, fcMPa: number): readonly string[] {
  if (rates === null) return ['no price book'];
  return [
    rates.steelCo2ePerKg === null ? 'carbon factor of steel' : '',
    (mixOf(rates, fcMPa)?.co2eKgPerM3 ?? null) === null ? 'carbon factor of concrete of this strength' : '',
  ].filter((name) => name !== '');
}
