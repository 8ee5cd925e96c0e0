import { onGrid } from '../engine/measures.ts';
import { concreteM3PerM, formworkM2PerM, type Pricing } from '../engine/pricing.ts';
import { stirrupKgPerM } from '../engine/stirrup-length.ts';
import type { Combination } from './combination.ts';
import { BAR_COUNT, CO2E, CONCRETE, COST, DEPTH, FORMWORK, STEEL, WIDTH } from './kernel-places.ts';
import type { Placement } from './prepared-sweep.ts';

/** What the amounts of one combination are at every depth. kg/m, money per m. */
export interface RowAmounts {
  readonly placement: Pick<Placement, 'stirrup' | 'widthMm' | 'unformed'>;
  readonly pricing: Pricing;
  /** Bars of the two faces. */
  readonly longitudinalKg: number;
  readonly withWaste: number;
  readonly barCount: number;
}

export function rowAmounts({ placement, tension, compression, concrete }: Combination): RowAmounts {
  const { pricing } = concrete;
  return {
    placement,
    pricing,
    longitudinalKg: tension.kgPerM + compression.kgPerM,
    withWaste: 1 + pricing.wasteShare,
    barCount: tension.barCount + compression.barCount,
  };
}

/**
 * Weight, cost, carbon, sizes and bars of the section at depth h (mm), with its stirrups' spacing and its skin steel, in
 * their places in a row of measures.
 */
export function writeAmounts(
  row: RowAmounts,
  h: number,
  { spacingMm, skinKg }: { readonly spacingMm: number; readonly skinKg: number },
  measures: Float64Array,
): void {
  const { placement, pricing, withWaste } = row;
  const { stirrup, widthMm, unformed } = placement;
  const longitudinalKg = row.longitudinalKg + skinKg;
  const lapsKg = longitudinalKg * pricing.lapShare;
  const longitudinalCost = longitudinalKg * (1 + pricing.lapShare) * withWaste * pricing.longitudinalPerKg;
  const stirrupKg = stirrup ? stirrupKgPerM(stirrup, widthMm, h, spacingMm) : 0;
  const netSteel = longitudinalKg + stirrupKg;
  const totalSteel = netSteel + lapsKg + (netSteel + lapsKg) * pricing.wasteShare;
  const concreteM3 = concreteM3PerM(widthMm, h);
  const formworkM2 = formworkM2PerM(widthMm, h, unformed.slabMm, unformed.hasEdge);
  const stirrupCost = stirrupKg === 0 ? 0 : stirrupKg * withWaste * pricing.stirrupPerKg;
  measures[STEEL] = onGrid(netSteel);
  measures[COST] = onGrid(
    longitudinalCost + stirrupCost + concreteM3 * pricing.concretePerM3 + formworkM2 * pricing.formworkPerM2,
  );
  measures[CO2E] = onGrid(totalSteel * pricing.steelCo2ePerKg + concreteM3 * pricing.concreteCo2ePerM3);
  measures[DEPTH] = h;
  measures[WIDTH] = widthMm;
  measures[CONCRETE] = onGrid(concreteM3);
  measures[FORMWORK] = onGrid(formworkM2);
  measures[BAR_COUNT] = row.barCount;
}
