import type { RateBase } from '#shared/contract/ranking.ts';
import {
  LEAST_CHANGE,
  MOST_CHANGE,
  RATE_KEYS,
  type RateChanges,
  type RateKey,
} from '#shared/sweep/rate-changes.ts';
import { formatNumber } from '#shared/print/format-quantity.ts';

/** Rates a run's sections are ranked at instead of its own: which ones, and what they are changed by, per cent. */
export interface AskedRates {
  readonly base: RateBase;
  readonly changes: RateChanges;
}

const NAMES: Readonly<Record<RateKey, string>> = {
  steel: 'steel',
  stirrups: 'stirrups',
  concrete: 'concrete',
  formwork: 'formwork',
  steelCarbon: 'carbon of steel',
  concreteCarbon: 'carbon of concrete',
};
export const rateName = (key: RateKey): string => NAMES[key];

const changedKeys = ({ changes }: AskedRates): RateKey[] =>
  RATE_KEYS.filter((key) => (changes[key] ?? 0) !== 0);

/** The rates with one change set; null where nothing differs from the run's own any more. */
export function withChange(asked: AskedRates, key: RateKey, percent: number): AskedRates | null {
  const { [key]: _, ...rest } = asked.changes;
  return orNone({ ...asked, changes: percent === 0 ? rest : { ...rest, [key]: percent } });
}

export const withBase = (asked: AskedRates | null, base: RateBase): AskedRates | null =>
  orNone({ base, changes: asked?.changes ?? {} });

const orNone = (asked: AskedRates): AskedRates | null =>
  asked.base === 'run' && changedKeys(asked).length === 0 ? null : asked;

/** `today;steel:10;formwork:-15`: what differs, never a rate itself, which is the office's own business. */
export const ratesText = (asked: AskedRates | null): string | null =>
  asked && [asked.base, ...changedKeys(asked).map((key) => `${key}:${asked.changes[key]!}`)].join(';');

/** Reads what anyone may have typed: what makes no sense is as if it were not there. */
export function readRates(text: string | null): AskedRates | null {
  const [base = '', ...parts] = (text ?? '').split(';');
  if (base !== 'run' && base !== 'today') return null;
  const changes: Partial<Record<RateKey, number>> = {};
  for (const part of parts) {
    const [name, value] = part.split(':');
    const key = RATE_KEYS.find((one) => one === name);
    const percent = value === undefined || value === '' ? NaN : Number(value);
    if (key !== undefined && percent >= LEAST_CHANGE && percent <= MOST_CHANGE) changes[key] = percent;
  }
  return orNone({ base, changes });
}

export const percentText = (percent: number): string =>
  `${percent > 0 ? '+' : '−'}${formatNumber(Math.abs(percent), 3, true)} %`;

/** "The price book of today, steel +10 %". */
export function ratesWords(asked: AskedRates): string {
  const base = asked.base === 'today' ? 'the price book of today' : 'the run’s own rates';
  return [
    base,
    ...changedKeys(asked).map((key) => `${rateName(key)} ${percentText(asked.changes[key]!)}`),
  ].join(', ');
}
