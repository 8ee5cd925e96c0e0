import { areComparable, type ShownCandidate } from './comparison.ts';

/** Materials whose rate moves alone. Bars and stirrups are one steel here: their rates move together. */
export const FLIP_MATERIALS = ['steel', 'concrete', 'formwork'] as const;
export type FlipMaterial = (typeof FLIP_MATERIALS)[number];

/** Today's cheapest would be beaten by another once the rate of one material is `factor` times what it is. */
export interface PriceFlip {
  readonly cheapest: string;
  readonly challenger: string;
  readonly material: FlipMaterial;
  readonly factor: number;
}

type Parts = Readonly<Record<FlipMaterial, number>>;

function partsOf({ snapshot }: ShownCandidate): Parts | null {
  const { cost } = snapshot.evaluation.quantities;
  if (cost === null) return null;
  const { steel, stirrups, concrete, formwork } = cost;
  if (steel === null || stirrups === null || concrete === null || formwork === null) return null;
  return { steel: steel + stirrups, concrete, formwork };
}

const total = (parts: Parts): number => parts.steel + parts.concrete + parts.formwork;

/** Rates move within a factor of five either way in the worst of years; beyond that nobody plans. */
const WIDEST = 5;

/**
 * For each other candidate of the same beam, and each material, the rate at which it costs as much as today's cheapest:
 * total + (f − 1) × part is the same for both. Those within a factor of five, the nearest to today's rate first. None
 * where beams differ, currencies differ, a cost is not known, or two tie for the cheapest.
 */
export function priceFlips(candidates: readonly ShownCandidate[]): PriceFlip[] {
  if (candidates.length < 2 || !areComparable(candidates)) return [];
  const currencies = new Set(candidates.map((c) => c.snapshot.evaluation.quantities.cost?.currency));
  if (currencies.size > 1) return [];
  const priced = candidates.flatMap((candidate) => {
    const parts = partsOf(candidate);
    return parts === null ? [] : [{ label: candidate.label, parts }];
  });
  if (priced.length < candidates.length) return [];
  const [cheapest, ...others] = priced.toSorted((a, b) => total(a.parts) - total(b.parts));
  if (cheapest === undefined) return [];
  return others
    .flatMap(({ label, parts }) =>
      FLIP_MATERIALS.flatMap((material) => {
        const gap = total(parts) - total(cheapest.parts);
        const lever = cheapest.parts[material] - parts[material];
        const factor = 1 + gap / lever;
        const isWithin = gap > 0 && factor >= 1 / WIDEST && factor <= WIDEST;
        return isWithin ? [{ cheapest: cheapest.label, challenger: label, material, factor }] : [];
      }),
    )
    .toSorted((a, b) => Math.abs(Math.log(a.factor)) - Math.abs(Math.log(b.factor)));
}
