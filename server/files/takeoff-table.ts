import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { toDisplay, unitLabel, type DisplayKind } from '#shared/print/units.ts';
import type { PlainCell } from './plain-cell.ts';
import type { TableColumn } from './table-file.ts';
import { RATE_KIND, shown, takeoffLines, type RateName, type TakeoffCandidate } from './takeoff-lines.ts';

/** One line of a candidate's takeoff, in the project's units. */
export interface TakeoffRow {
  readonly candidate: TakeoffCandidate;
  readonly item: string;
  readonly bar: string;
  readonly number: number | null;
  readonly quantity: number | null;
  readonly unit: string;
  readonly massTonnes: number | null;
  readonly rate: number | null;
  readonly cost: number | null;
  readonly currency: string | null;
  readonly factor: number | null;
  readonly carbon: number | null;
}

interface RowInput {
  readonly item: string;
  readonly kind: 'mass' | 'volume' | 'surface';
  /** Per metre of beam, stored units. */
  readonly perM: number;
  readonly rate: RateName;
  readonly factor: RateName | null;
  readonly bar?: string;
  readonly number?: number;
}

/** The lines of one candidate; laps and waste stand on their own, so the costs add up to the cost in all. */
export function takeoffRows(candidate: TakeoffCandidate, units: UnitSystem): TakeoffRow[] {
  const lines = takeoffLines(candidate);
  const { rates, lapShare, wasteShare, metres, longitudinal, stirrups } = lines;
  const massOf = (items: typeof longitudinal) => items.reduce((sum, { kgPerM }) => sum + kgPerM, 0);
  const barsKg = massOf(longitudinal);
  const steel = (item: string, perM: number, rate: 'bars' | 'stirrups', rest: object = {}): RowInput => ({
    item,
    kind: 'mass',
    perM,
    rate,
    factor: 'steelCarbon',
    ...rest,
  });
  const inputs: RowInput[] = [
    ...longitudinal.map(({ position, bar, count, kgPerM }) =>
      steel(`Bars, ${position}`, kgPerM, 'bars', { bar, number: count }),
    ),
    steel('Laps', barsKg * lapShare, 'bars'),
    steel('Waste of bars and laps', barsKg * (1 + lapShare) * wasteShare, 'bars'),
    ...stirrups.map(({ bar, count, kgPerM }) =>
      steel(`Stirrups, ${count} legs`, kgPerM, 'stirrups', { bar, number: count }),
    ),
    ...(stirrups.length === 0 ? [] : [steel('Waste of stirrups', massOf(stirrups) * wasteShare, 'stirrups')]),
    {
      item: 'Concrete',
      kind: 'volume',
      perM: lines.concreteM3PerM,
      rate: 'concrete',
      factor: 'concreteCarbon',
    },
    { item: 'Formwork', kind: 'surface', perM: lines.formworkM2PerM, rate: 'formwork', factor: null },
  ];
  const times = (amount: number, rate: number | null) => (rate === null ? null : amount * rate);
  return inputs.map(({ item, kind, perM, rate, factor, bar = '', number = null }) => {
    const amount = perM * metres;
    const isMass = kind === 'mass';
    return {
      candidate,
      item,
      bar,
      number,
      quantity: shown(amount, kind, units),
      unit: unitLabel(kind, units),
      massTonnes: isMass ? shown(amount / 1000, 'tonnes', units) : null,
      rate: shown(rates[rate], RATE_KIND[rate], units),
      cost: shown(times(amount, rates[rate]), 'money', units),
      currency: lines.currency,
      factor: factor === null ? null : shown(rates[factor], RATE_KIND[factor], units),
      carbon: factor === null ? null : shown(times(amount, rates[factor]), 'co2e', units),
    };
  });
}

/** Columns of the takeoff as one flat table, to be filtered and summed as anyone likes. */
export function takeoffColumns(units: UnitSystem, isMoneyShown: boolean): TableColumn<TakeoffRow>[] {
  const column = (head: string, width: number, cell: (row: TakeoffRow) => PlainCell) => ({
    head,
    width,
    cell,
  });
  const length = (kind: DisplayKind) => (mm: number) => Number(toDisplay(mm, kind, units).toPrecision(9));
  return [
    column('Candidate', 10, ({ candidate }) => candidate.label),
    column('State', 12, ({ candidate }) => candidate.state),
    column('Beam', 10, ({ candidate }) => candidate.beam.mark),
    column('Location', 24, ({ candidate }) => candidate.beam.location),
    column(`Span, ${unitLabel('span', units)}`, 10, ({ candidate }) => length('span')(candidate.beam.spanMm)),
    column('Beams', 8, ({ candidate }) => candidate.beam.count),
    column('Item', 26, ({ item }) => item),
    column('Bar', 8, ({ bar }) => bar),
    column('Number', 8, ({ number }) => number),
    column('Quantity', 12, ({ quantity }) => quantity),
    column('Unit', 8, ({ unit }) => unit),
    column(`Mass, ${unitLabel('tonnes', units)}`, 12, ({ massTonnes }) => massTonnes),
    ...(isMoneyShown
      ? [
          column('Rate', 10, ({ rate }) => rate),
          column('Cost', 12, ({ cost }) => cost),
          column('Currency', 10, ({ currency }) => currency),
          column('Carbon factor', 12, ({ factor }) => factor),
          column(`Carbon, ${unitLabel('co2e', units)}`, 12, ({ carbon }) => carbon),
        ]
      : []),
  ];
}
