import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Candidate } from '#shared/contract/records.ts';
import type { SteelLine } from '#shared/engine/evaluation.ts';
import { pricingFor } from '#shared/engine/pricing.ts';
import { positionName } from '#shared/print/position-name.ts';
import { toDisplay, type DisplayKind } from '#shared/print/units.ts';
import { plainNumber } from './plain-cell.ts';

export type TakeoffCandidate = Pick<
  Candidate,
  'id' | 'label' | 'state' | 'beam' | 'snapshot' | 'hash' | 'createdAt' | 'takeoff'
>;

/** One kind of steel of a candidate. */
export interface SteelItem {
  readonly position: string;
  /** Empty where steel was given as an area. */
  readonly bar: string;
  /** Bars, or legs of a stirrup. */
  readonly count: number;
  /** Mass per length of beam, kg/m. */
  readonly kgPerM: number;
}

/** What an estimator prices of one candidate, stored (SI) units; a missing rate or factor is null. */
export interface TakeoffLines {
  readonly metres: number;
  readonly longitudinal: readonly SteelItem[];
  readonly stirrups: readonly SteelItem[];
  readonly lapShare: number;
  readonly wasteShare: number;
  readonly concreteM3PerM: number;
  readonly formworkM2PerM: number;
  readonly currency: string | null;
  readonly rates: Readonly<Record<RateName, number | null>>;
}

export const RATE_NAMES = [
  'bars',
  'stirrups',
  'concrete',
  'formwork',
  'steelCarbon',
  'concreteCarbon',
] as const;
export type RateName = (typeof RATE_NAMES)[number];

export const RATE_KIND = {
  bars: 'money-per-mass',
  stirrups: 'money-per-mass',
  concrete: 'money-per-volume',
  formwork: 'money-per-surface',
  steelCarbon: 'co2e-per-mass',
  concreteCarbon: 'co2e-per-volume',
} as const satisfies Record<RateName, DisplayKind>;

const known = (rate: number) => (Number.isNaN(rate) ? null : rate);
const share = (part: number, whole: number) => (whole === 0 ? 0 : part / whole);
const massOf = (items: readonly SteelItem[]) => items.reduce((sum, { kgPerM }) => sum + kgPerM, 0);

export function takeoffLines({ snapshot, beam }: TakeoffCandidate): TakeoffLines {
  const { section, evaluation, basis } = snapshot;
  const { quantities } = evaluation;
  const pricing = pricingFor(basis.rates, section.fcMPa);
  const itemOf = ({ bar, position, count, kgPerM }: SteelLine): SteelItem => ({
    position: positionName(position, section),
    bar: bar === 'area' ? '' : bar,
    count,
    kgPerM,
  });
  const isStirrup = ({ position }: SteelLine) => position === 'stirrups';
  const longitudinal = quantities.steel.filter((line) => !isStirrup(line)).map(itemOf);
  return {
    metres: (beam.spanMm / 1000) * beam.count,
    longitudinal,
    stirrups: quantities.steel.filter(isStirrup).map(itemOf),
    // From the quantities, which everybody sees, not from the rates.
    lapShare: share(quantities.lapsKgPerM, massOf(longitudinal)),
    wasteShare: share(quantities.wasteKgPerM, quantities.netSteelKgPerM + quantities.lapsKgPerM),
    concreteM3PerM: quantities.concreteM3PerM,
    formworkM2PerM: quantities.formworkM2PerM,
    currency: basis.rates?.currency ?? null,
    rates: {
      bars: known(pricing.longitudinalPerKg),
      stirrups: known(pricing.stirrupPerKg),
      concrete: known(pricing.concretePerM3),
      formwork: known(pricing.formworkPerM2),
      steelCarbon: known(pricing.steelCo2ePerKg),
      concreteCarbon: known(pricing.concreteCo2ePerM3),
    },
  };
}

/** In the project's units, with the figures a spreadsheet keeps. */
export const shown = (value: number | null, kind: DisplayKind, units: UnitSystem): number | null =>
  value === null ? null : plainNumber(toDisplay(value, kind, units));
