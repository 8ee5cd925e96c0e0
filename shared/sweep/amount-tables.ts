import { getBar } from '../engine/bars.ts';
import { flangeOf } from '../engine/flange.ts';
import { pricingFor, unformedSides, type Pricing, type UnformedSides } from '../engine/pricing.ts';
import { ruleSetOf } from '../engine/rules/rule-set-of.ts';
import type { Rates } from '../engine/section.ts';
import { stirrupShape, type StirrupShape } from '../engine/stirrup-length.ts';
import { amountsOfSet } from './face-table.ts';
import type { RowAmounts } from './kernel-amounts.ts';
import type { Space, SweepProblem } from './problem.ts';
import { expandSpace } from './space.ts';

type SetAmounts = ReturnType<typeof amountsOfSet>;

/**
 * What weights, cost and carbon of a section follow from, given its place on each axis; without arranging a bar, so that
 * tables of any space are made in no time. The same functions as the hot loop's, so the same numbers to the bit.
 */
export interface AmountTables {
  readonly space: Space;
  readonly tension: readonly SetAmounts[];
  readonly compression: readonly SetAmounts[];
  /** By cover, then stirrup. */
  readonly shapes: readonly (StirrupShape | null)[];
  readonly unformed: readonly UnformedSides[];
}

/** @throws InvalidSectionError for an empty axis or an unknown bar. */
export function amountTables({ space: definition, basis }: SweepProblem): AmountTables {
  const { barStandard } = basis;
  const space = expandSpace(definition, barStandard);
  const rules = ruleSetOf(basis);
  return {
    space,
    tension: space.tension.map((set) => amountsOfSet(set, barStandard)),
    compression: space.compression.map((set) => amountsOfSet(set, barStandard)),
    shapes: space.coversMm.flatMap((coverMm) =>
      space.stirrups.map(
        (stirrup) => stirrup && stirrupShape(getBar(barStandard, stirrup.bar), stirrup, coverMm, rules),
      ),
    ),
    unformed: space.widthsMm.map((widthMm) =>
      unformedSides(flangeOf({ widthMm, flange: space.flange }, rules), basis.slabMm),
    ),
  };
}

/** Pricing of each concrete strength of the space. */
export const pricingsOf = ({ space }: AmountTables, rates: Rates | null): readonly Pricing[] =>
  space.fcMPa.map((fcMPa) => pricingFor(rates, fcMPa));

/** Place of a row of depths on each of the other axes. */
export interface RowDigits {
  readonly fcAt: number;
  readonly fyAt: number;
  readonly compressionAt: number;
  readonly tensionAt: number;
  readonly stirrupAt: number;
  readonly coverAt: number;
  readonly widthAt: number;
}

export function rowDigits(space: Space, rowNumber: number): RowDigits {
  let rest = rowNumber;
  const next = (length: number) => {
    const at = rest % length;
    rest = Math.floor(rest / length);
    return at;
  };
  return {
    fcAt: next(space.fcMPa.length),
    fyAt: next(space.fyMPa.length),
    compressionAt: next(space.compression.length),
    tensionAt: next(space.tension.length),
    stirrupAt: next(space.stirrups.length),
    coverAt: next(space.coversMm.length),
    widthAt: rest,
  };
}

/** What all depths of a row share, at the prices of its concrete. */
export function amountsOfRow(tables: AmountTables, at: RowDigits, pricing: Pricing): RowAmounts {
  const { space } = tables;
  const tension = tables.tension[at.tensionAt]!;
  const compression = tables.compression[at.compressionAt]!;
  return {
    placement: {
      stirrup: tables.shapes[at.coverAt * space.stirrups.length + at.stirrupAt]!,
      widthMm: space.widthsMm[at.widthAt]!,
      unformed: tables.unformed[at.widthAt]!,
    },
    pricing,
    longitudinalKg: tension.kgPerM + compression.kgPerM,
    withWaste: 1 + pricing.wasteShare,
    barCount: tension.barCount + compression.barCount,
  };
}
