import { MEASURE_IDS } from '../engine/measures.ts';
import type { BarStandard } from '../engine/section.ts';
import type { RowDigits } from './amount-tables.ts';
import { inputValues, isInputKey, type InputKey } from './explore-axis.ts';
import type { Space } from './problem.ts';
import { filterEntries, highestWithin, lowestWithin, type RangeFilters } from './range-filters.ts';

interface MeasureBounds {
  readonly place: number;
  readonly low: number;
  readonly high: number;
}

const DIGIT_OF = {
  fc: 'fcAt',
  fy: 'fyAt',
  cover: 'coverAt',
  tensionSteel: 'tensionAt',
  compressionSteel: 'compressionAt',
} as const satisfies Record<InputKey, keyof RowDigits>;

/** Ranges someone set, as the ranking asks them: of a whole row what its axes say, of each section its measures. */
export class RowFilter {
  readonly #rows: readonly { readonly digit: keyof RowDigits; readonly isWithin: readonly boolean[] }[];
  readonly #measures: readonly MeasureBounds[];

  constructor(filters: RangeFilters, space: Space, standard: BarStandard) {
    const inputs = inputValues(space, standard);
    const entries = filterEntries(filters).map(([key, range]) => ({
      key,
      low: lowestWithin(range),
      high: highestWithin(range),
    }));
    this.#rows = entries.flatMap(({ key, low, high }) =>
      isInputKey(key)
        ? [{ digit: DIGIT_OF[key], isWithin: inputs[key].map((value) => value >= low && value <= high) }]
        : [],
    );
    this.#measures = entries.flatMap(({ key, low, high }) =>
      isInputKey(key) ? [] : [{ place: MEASURE_IDS.indexOf(key), low, high }],
    );
  }

  isRowWithin(at: RowDigits): boolean {
    return this.#rows.every(({ digit, isWithin }) => isWithin[at[digit]]!);
  }

  /** A value that is not known lies in no range. */
  isWithin(measures: Float64Array): boolean {
    for (const { place, low, high } of this.#measures) {
      const value = measures[place]!;
      if (!(value >= low && value <= high)) return false;
    }
    return true;
  }
}
