import { isCurveMeasure } from '../engine/curve-basis.ts';
import type { Space, SweepProblem } from './problem.ts';
import { expandSpace, SPACE_AXES, type SpaceAxis } from './space.ts';

/** For each axis, outermost first, the place in the wider space of each of its values in the narrower one; ascending. */
type AxisPlaces = Readonly<Record<SpaceAxis, readonly number[]>>;

/** A space that holds every section of another, and more. Plain data that crosses threads. */
export interface Widening {
  readonly places: AxisPlaces;
  /** Sections of the narrower space. */
  readonly taken: number;
  /** Sections that are new. */
  readonly added: number;
}

const valuesOf = (space: Space): Readonly<Record<SpaceAxis, readonly unknown[]>> => ({
  width: space.widthsMm,
  cover: space.coversMm,
  stirrups: space.stirrups,
  tension: space.tension,
  compression: space.compression,
  fy: space.fyMPa,
  fc: space.fcMPa,
  depth: space.depthsMm,
});

/** Whether two pieces of JSON say the same, whatever the order of their keys; what is undefined is as if left out. */
function isSameData(a: unknown, b: unknown): boolean {
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return a === b;
  const keysOf = (of: object) =>
    Object.entries(of).flatMap(([key, value]) => (value === undefined ? [] : [key]));
  const keys = keysOf(a);
  const read = (of: object, key: string) => (of as Record<string, unknown>)[key];
  return (
    Array.isArray(a) === Array.isArray(b) &&
    keys.length === keysOf(b).length &&
    keys.every((key) => isSameData(read(a, key), read(b, key)))
  );
}

/** Where each of the narrower values stands among the wider ones, in the same order; null where one is missing. */
function placesAmong(narrow: readonly unknown[], wide: readonly unknown[]): number[] | null {
  const places: number[] = [];
  let next = 0;
  for (const value of narrow) {
    while (next < wide.length && !isSameData(wide[next], value)) next++;
    if (next === wide.length) return null;
    places.push(next++);
  }
  return places;
}

/**
 * How one problem is another with further values on its axes: the same basis, rates, demand and rules, and every value
 * there was, in the same order, so that indices keep their order and the lowest of a tie stays the lowest. Null where it
 * is not, or adds nothing; and where μφ is read off the full curve, since near misses are then known for one view only.
 */
export function wideningOf(narrow: SweepProblem, wide: SweepProblem): Widening | null {
  const isAlike =
    isSameData(narrow.basis, wide.basis) &&
    isSameData(narrow.demand, wide.demand) &&
    isSameData(narrow.rules, wide.rules) &&
    isSameData(narrow.space.flange ?? null, wide.space.flange ?? null);
  if (!isAlike || isCurveMeasure(wide.basis)) return null;
  const from = expandSpace(narrow.space, narrow.basis.barStandard);
  const to = expandSpace(wide.space, wide.basis.barStandard);
  if (!(from.size > 0 && to.size > from.size)) return null;
  const [old, all] = [valuesOf(from), valuesOf(to)];
  const places: Partial<Record<SpaceAxis, readonly number[]>> = {};
  for (const axis of SPACE_AXES) {
    const among = placesAmong(old[axis], all[axis]);
    if (among === null) return null;
    places[axis] = among;
  }
  return { places: places as AxisPlaces, taken: from.size, added: to.size - from.size };
}

/** Lengths of the axes of a space, outermost first. */
const lengthsOf = (space: Space): number[] => {
  const values = valuesOf(space);
  return SPACE_AXES.map((axis) => values[axis].length);
};

/** The index in the wider space of an index of the narrower one; both ascend together. */
export function renumbering({ places }: Widening, wide: Space): (index: number) => number {
  const inner = SPACE_AXES.toReversed();
  const lengths = lengthsOf(wide).toReversed();
  return (index) => {
    let rest = index;
    let scale = 1;
    let renumbered = 0;
    inner.forEach((axis, i) => {
      const own = places[axis];
      renumbered += own[rest % own.length]! * scale;
      rest = Math.floor(rest / own.length);
      scale *= lengths[i]!;
    });
    return renumbered;
  };
}

/** A part of one row of depths. */
export type VisitRow = (rowNumber: number, from: number, to: number) => void;

/**
 * The sections that only the wider space has, in the order of their indices: what is at place n, without a list of them.
 */
export class AddedSections {
  readonly #lengths: readonly number[];
  /** For each axis but the depth: 1 where the value was there before, and how many were before each place. */
  readonly #outer: readonly { readonly isTaken: Uint8Array; readonly takenBefore: Float64Array }[];
  /** Rows of the narrower space below one value of each axis. */
  readonly #takenPer: readonly number[];
  readonly #depthCount: number;
  readonly #addedDepths: readonly number[];
  readonly #rowCount: number;

  constructor({ places }: Widening, wide: Space) {
    const lengths = lengthsOf(wide);
    const outerAxes = SPACE_AXES.slice(0, -1);
    this.#lengths = lengths.slice(0, -1);
    this.#rowCount = this.#lengths.reduce((product, length) => product * length, 1);
    this.#outer = outerAxes.map((axis, i) => {
      const isTaken = new Uint8Array(lengths[i]!);
      for (const place of places[axis]) isTaken[place] = 1;
      const takenBefore = new Float64Array(lengths[i]! + 1);
      isTaken.forEach((taken, place) => (takenBefore[place + 1] = takenBefore[place]! + taken));
      return { isTaken, takenBefore };
    });
    this.#takenPer = outerAxes.map((_, i) =>
      outerAxes.slice(i + 1).reduce((product, axis) => product * places[axis].length, 1),
    );
    this.#depthCount = lengths.at(-1)!;
    const takenDepths = new Set(places.depth);
    this.#addedDepths = wide.depthsMm.flatMap((_, j) => (takenDepths.has(j) ? [] : [j]));
  }

  #digits(rowNumber: number): number[] {
    let rest = rowNumber;
    const digits = this.#lengths.toReversed().map((length) => {
      const digit = rest % length;
      rest = Math.floor(rest / length);
      return digit;
    });
    return digits.reverse();
  }

  /** Rows before this one that the narrower space has. */
  #takenRowsBefore(rowNumber: number): number {
    if (rowNumber === this.#rowCount) return this.#outer[0]!.takenBefore.at(-1)! * this.#takenPer[0]!;
    let count = 0;
    for (const [i, digit] of this.#digits(rowNumber).entries()) {
      const { isTaken, takenBefore } = this.#outer[i]!;
      count += takenBefore[digit]! * this.#takenPer[i]!;
      if (isTaken[digit] === 0) break;
    }
    return count;
  }

  /** Added sections in the rows before this one. */
  #addedBefore(rowNumber: number): number {
    const takenDepths = this.#depthCount - this.#addedDepths.length;
    return rowNumber * this.#depthCount - this.#takenRowsBefore(rowNumber) * takenDepths;
  }

  /** The row that holds the n-th added section. */
  #rowAt(place: number): number {
    let low = 0;
    let high = this.#rowCount;
    while (high - low > 1) {
      const mid = Math.floor((low + high) / 2);
      if (this.#addedBefore(mid) <= place) low = mid;
      else high = mid;
    }
    return low;
  }

  /** The added sections at places [from, to), row by row, in runs of neighbouring depths. */
  visit(from: number, to: number, visitRow: VisitRow): void {
    if (from >= to) return;
    let rowNumber = this.#rowAt(from);
    let place = this.#addedBefore(rowNumber);
    for (; place < to; rowNumber++) {
      const isTakenRow = this.#digits(rowNumber).every((digit, i) => this.#outer[i]!.isTaken[digit] === 1);
      const depths = isTakenRow ? this.#addedDepths : null;
      const count = depths === null ? this.#depthCount : depths.length;
      const first = Math.max(0, from - place);
      const end = Math.min(count, to - place);
      if (depths === null) visitRow(rowNumber, first, end);
      else visitRuns(depths.slice(first, end), (run) => visitRow(rowNumber, run.from, run.to));
      place += count;
    }
  }
}

function visitRuns(
  depths: readonly number[],
  visit: (run: { readonly from: number; readonly to: number }) => void,
): void {
  for (let i = 0; i < depths.length;) {
    const from = depths[i]!;
    let length = 1;
    while (i + length < depths.length && depths[i + length] === from + length) length++;
    visit({ from, to: from + length });
    i += length;
  }
}
