import type { Rates } from '#shared/engine/section.ts';
import type { DisplayKind } from '#shared/print/units.ts';
import type { RunInput } from './run-input.ts';

type Print = (value: number | null | undefined, kind: DisplayKind) => string;

/** The rates a run froze; none where there are none, or the reader may not see them. */
export function rateInputs(rates: Rates | null, print: Print): readonly Omit<RunInput, 'group'>[] {
  if (rates === null) return [];
  const money = (value: number | null, kind: DisplayKind) =>
    value === null ? 'not known' : `${rates.currency} ${print(value, kind)}`;
  const plain = (value: number | null, kind: DisplayKind) =>
    value === null ? 'not known' : print(value, kind);
  return [
    { label: 'Currency', stored: rates.currency, text: rates.currency },
    { label: 'Longitudinal bars', stored: rates.steelPerKg, text: money(rates.steelPerKg, 'money-per-mass') },
    {
      label: 'Stirrups, rate',
      stored: rates.stirrupPerKg,
      text: money(rates.stirrupPerKg, 'money-per-mass'),
    },
    { label: 'Formwork', stored: rates.formworkPerM2, text: money(rates.formworkPerM2, 'money-per-surface') },
    ...rates.concrete.flatMap(({ fcMPa, costPerM3, co2eKgPerM3 }) => {
      const mix = print(fcMPa, 'stress');
      return [
        { label: `Concrete ${mix}`, stored: costPerM3, text: money(costPerM3, 'money-per-volume') },
        {
          label: `Concrete ${mix}, carbon`,
          stored: co2eKgPerM3,
          text: plain(co2eKgPerM3, 'co2e-per-volume'),
        },
      ];
    }),
    {
      label: 'Steel, carbon',
      stored: rates.steelCo2ePerKg,
      text: plain(rates.steelCo2ePerKg, 'co2e-per-mass'),
    },
    { label: 'Laps', stored: rates.lapShare, text: print(rates.lapShare, 'percent') },
    { label: 'Waste', stored: rates.wasteShare, text: print(rates.wasteShare, 'percent') },
  ];
}
