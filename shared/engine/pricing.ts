import type { ResolvedFlange } from './flange.ts';
import type { Rates } from './section.ts';

/** Rates of one run and one mix with missing ones as NaN, so that a missing rate spreads to the total by itself. */
export interface Pricing {
  readonly longitudinalPerKg: number;
  readonly stirrupPerKg: number;
  readonly concretePerM3: number;
  readonly formworkPerM2: number;
  readonly steelCo2ePerKg: number;
  readonly concreteCo2ePerM3: number;
  readonly lapShare: number;
  readonly wasteShare: number;
}

/** Two strengths within this are the same mix, MPa. */
const SAME_MIX_MPA = 0.01;

const orMissing = (rate: number | null | undefined) => rate ?? NaN;

/** The rates that apply to concrete of strength f′c (MPa). Without a price book allowances are nil and rates missing. */
export function pricingFor(rates: Rates | null, fcMPa: number): Pricing {
  const mix = rates?.concrete.find((rate) => Math.abs(rate.fcMPa - fcMPa) <= SAME_MIX_MPA);
  return {
    longitudinalPerKg: orMissing(rates?.steelPerKg),
    stirrupPerKg: orMissing(rates?.stirrupPerKg),
    concretePerM3: orMissing(mix?.costPerM3),
    formworkPerM2: orMissing(rates?.formworkPerM2),
    steelCo2ePerKg: orMissing(rates?.steelCo2ePerKg),
    concreteCo2ePerM3: orMissing(mix?.co2eKgPerM3),
    lapShare: rates?.lapShare ?? 0,
    wasteShare: rates?.wasteShare ?? 0,
  };
}

/** What is not formed of the two sides, mm: the slab's height, and whether one side is the edge of the slab and formed whole. */
export interface UnformedSides {
  readonly slabMm: number;
  readonly hasEdge: boolean;
}

/** The slab of a section's own flange, or of the design basis (mm) for a rectangle. */
export function unformedSides(flange: ResolvedFlange | null, basisSlabMm: number): UnformedSides {
  return { slabMm: flange?.thicknessMm ?? basisSlabMm, hasEdge: flange?.shape === 'l' };
}

/** Formed surface per metre: soffit and two sides, less the slab's height on each, but for an edge, m²/m. */
export function formworkM2PerM(widthMm: number, depthMm: number, slabMm: number, hasEdge = false): number {
  const sidesMm = 2 * Math.max(0, depthMm - slabMm);
  return (widthMm + sidesMm + (hasEdge ? Math.min(depthMm, slabMm) : 0)) / 1000;
}

/** Gross concrete of the web through the slab per metre, m³/m; the steel's volume is not taken off (common practice). */
export function concreteM3PerM(widthMm: number, depthMm: number): number {
  return (widthMm * depthMm) / 1e6;
}
