import type { Quantities, SteelLine } from './evaluation.ts';
import { KG_PER_TONNE } from './units.ts';

/** Quantities of all beams of one mark. Cost and carbon are null where a rate is missing. */
export interface Takeoff {
  readonly spanMm: number;
  readonly count: number;
  readonly lines: readonly { bar: string; position: SteelLine['position']; tonnes: number }[];
  readonly netTonnes: number;
  readonly lapsTonnes: number;
  readonly wasteTonnes: number;
  readonly totalTonnes: number;
  readonly concreteM3: number;
  readonly formworkM2: number;
  readonly cost: number | null;
  readonly currency: string | null;
  readonly co2eKg: number | null;
}

/** Quantities per metre × span (mm) × number of beams; the section is taken constant along the span. */
export function takeoff(quantities: Quantities, spanMm: number, count: number): Takeoff {
  const metres = (spanMm / 1000) * count;
  const tonnes = (kgPerM: number) => (kgPerM * metres) / KG_PER_TONNE;
  const scaled = (amount: number | null | undefined) =>
    amount === null || amount === undefined ? null : amount * metres;
  return {
    spanMm,
    count,
    lines: quantities.steel.map(({ bar, position, kgPerM }) => ({ bar, position, tonnes: tonnes(kgPerM) })),
    netTonnes: tonnes(quantities.netSteelKgPerM),
    lapsTonnes: tonnes(quantities.lapsKgPerM),
    wasteTonnes: tonnes(quantities.wasteKgPerM),
    totalTonnes: tonnes(quantities.totalSteelKgPerM),
    concreteM3: quantities.concreteM3PerM * metres,
    formworkM2: quantities.formworkM2PerM * metres,
    cost: scaled(quantities.cost?.total),
    currency: quantities.cost?.currency ?? null,
    co2eKg: scaled(quantities.co2eKgPerM),
  };
}
