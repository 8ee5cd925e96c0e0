import { MEASURE_IDS, type MeasureId } from '#shared/engine/measures.ts';
import type { BarStandard } from '#shared/engine/section.ts';
import { prepareSweep, type PreparedSweep } from '#shared/sweep/prepared-sweep.ts';
import type { Space, SweepProblem, View } from '#shared/sweep/problem.ts';
import { sweepColumns } from '#shared/sweep/sweep-range.ts';
import {
  inputPlace,
  inputValues,
  isInputKey,
  type ExploreKey,
  type InputKey,
} from '#shared/sweep/explore-axis.ts';

/** Sections judged at a time: their columns are 6 MB, and larger ones gained nothing. */
const STEP = 2 ** 16;

/**
 * Every section of a run that meets every check, as columns: the same numbers the service's run counted, made again in
 * the browser so that any range, pair of axes or enlargement is answered from all of them and none from a sample.
 */
export class FeasibleColumns {
  readonly space: Space;
  private readonly prepared: PreparedSweep;
  private readonly values: Readonly<Record<InputKey, readonly number[]>>;
  private readonly inputColumns = new Map<InputKey, Float64Array>();
  private capacity = 1 << 12;
  private length = 0;
  private indexColumn = new Uint32Array(this.capacity);
  private measureColumns = MEASURE_IDS.map(() => new Float64Array(this.capacity));

  constructor(problem: SweepProblem, view: View, standard: BarStandard) {
    this.prepared = prepareSweep(problem, view);
    this.space = this.prepared.space;
    this.values = inputValues(this.space, standard);
  }

  get count(): number {
    return this.length;
  }

  get index(): Uint32Array {
    return this.indexColumn.subarray(0, this.length);
  }

  /** Judges the next sections from `from` on; answers where to go on, the size of the space when done. */
  advance(from: number): number {
    const to = Math.min(from + STEP, this.space.size);
    const { masks, measures } = sweepColumns(this.prepared, from, to);
    masks.forEach((mask, place) => {
      if (mask === 0) this.append(from + place, measures, place * MEASURE_IDS.length);
    });
    return to;
  }

  measure(measure: MeasureId): Float64Array {
    return this.measureColumns[MEASURE_IDS.indexOf(measure)]!.subarray(0, this.length);
  }

  /** One value of all sections, in the order of their indices; asked for when all have been judged. */
  column(key: ExploreKey): Float64Array {
    if (!isInputKey(key)) return this.measure(key);
    const known = this.inputColumns.get(key);
    if (known !== undefined) return known;
    const column = this.inputColumn(key);
    this.inputColumns.set(key, column);
    return column;
  }

  private inputColumn(key: InputKey): Float64Array {
    const values = this.values[key];
    const placeOf = inputPlace(this.space, key);
    return Float64Array.from(this.index, (index) => values[placeOf(index)]!);
  }

  private append(index: number, measures: Float64Array, at: number): void {
    if (this.length === this.capacity) this.grow();
    this.indexColumn[this.length] = index;
    for (let i = 0; i < MEASURE_IDS.length; i++) this.measureColumns[i]![this.length] = measures[at + i]!;
    this.length++;
  }

  private grow(): void {
    this.capacity *= 2;
    const indices = new Uint32Array(this.capacity);
    indices.set(this.indexColumn);
    this.indexColumn = indices;
    this.measureColumns = this.measureColumns.map((column) => {
      const longer = new Float64Array(this.capacity);
      longer.set(column);
      return longer;
    });
  }
}
