import type { DensityCell } from './result.ts';

/**
 * Density grid without bounds known beforehand: a value's cell is its binary exponent and the five leading bits of its
 * mantissa, 32 cells to each doubling, about 2–3 % wide. Exact, so grids add up in any order. Values ≥ 0.
 */
const CELL_SHIFT = 15;

const scratch = new Float64Array(1);
const words = new Uint32Array(scratch.buffer);
scratch[0] = 1;
/** Which 32-bit word of a double holds sign and exponent on this machine. */
const HIGH = words[1] === 0x3ff00000 ? 1 : 0;

/** Cell of a value ≥ 0; below 2^16. */
function cellOf(value: number): number {
  scratch[0] = value;
  return words[HIGH]! >>> CELL_SHIFT;
}

/** Lower bound of a cell. */
function lowerBound(cell: number): number {
  words[HIGH] = cell << CELL_SHIFT;
  words[1 - HIGH] = 0;
  return scratch[0]!;
}

const EMPTY = 0xffffffff;

/** Counts of points per cell in an open-addressed table: a few nanoseconds a point. */
export class DensityBuilder {
  private keys = new Uint32Array(1 << 12).fill(EMPTY);
  private counts = new Float64Array(1 << 12);
  private used = 0;

  add(x: number, y: number): void {
    this.addCount(cellOf(x) * 65536 + cellOf(y), 1);
  }

  addCount(key: number, count: number): void {
    const mask = this.keys.length - 1;
    let at = (Math.imul(key, 0x9e3779b1) >>> 12) & mask;
    while (this.keys[at] !== EMPTY && this.keys[at] !== key) at = (at + 1) & mask;
    if (this.keys[at] === EMPTY) {
      this.keys[at] = key;
      this.used++;
      this.counts[at] = count;
      if (this.used * 2 > this.keys.length) this.grow();
    } else this.counts[at]! += count;
  }

  private grow(): void {
    const { keys, counts } = this;
    this.keys = new Uint32Array(keys.length * 2).fill(EMPTY);
    this.counts = new Float64Array(keys.length * 2);
    this.used = 0;
    keys.forEach((key, i) => {
      if (key !== EMPTY) this.addCount(key, counts[i]!);
    });
  }

  /** Cells sorted by key, as columns. */
  finish(): Density {
    const order = [...this.keys.keys()].filter((i) => this.keys[i] !== EMPTY);
    order.sort((a, b) => this.keys[a]! - this.keys[b]!);
    return {
      keys: Uint32Array.from(order, (i) => this.keys[i]!),
      counts: Float64Array.from(order, (i) => this.counts[i]!),
    };
  }
}

/** Cells as columns: key = x cell × 2^16 + y cell. */
export interface Density {
  readonly keys: Uint32Array;
  readonly counts: Float64Array;
}

/** Sum of two grids, both sorted by key: a merge of two lists, since each chunk of a run passes here. */
export function addDensities(a: Density, b: Density): Density {
  const keys = new Uint32Array(a.keys.length + b.keys.length);
  const counts = new Float64Array(keys.length);
  let length = 0;
  for (let i = 0, j = 0; i < a.keys.length || j < b.keys.length; length++) {
    const left = i < a.keys.length ? a.keys[i]! : Infinity;
    const right = j < b.keys.length ? b.keys[j]! : Infinity;
    keys[length] = Math.min(left, right);
    counts[length] = (left <= right ? a.counts[i++]! : 0) + (right <= left ? b.counts[j++]! : 0);
  }
  return { keys: keys.slice(0, length), counts: counts.slice(0, length) };
}

/** A chart draws no more; two wide measures could fill forty thousand, three megabytes of JSON with each progress event. */
const MAX_CELLS = 6000;

/** Cells with their bounds in the measures' own units; beside each other joined, in both measures alike, where too many. */
export function densityCells(density: Density): DensityCell[] {
  let shift = 0;
  let joined = joinCells(density, shift);
  while (joined.size > MAX_CELLS) joined = joinCells(density, ++shift);
  return [...joined].map(([key, count]) => {
    const xCell = Math.floor(key / 65536);
    const yCell = key % 65536;
    return {
      x0: lowerBound(xCell << shift),
      x1: lowerBound((xCell + 1) << shift),
      y0: lowerBound(yCell << shift),
      y1: lowerBound((yCell + 1) << shift),
      count,
    };
  });
}

/** Counts of cells 2^shift as wide, by key; keys arrive sorted, so the order is the same for equal grids. */
function joinCells({ keys, counts }: Density, shift: number): Map<number, number> {
  const joined = new Map<number, number>();
  keys.forEach((key, i) => {
    const wide = ((key >>> 16) >>> shift) * 65536 + ((key & 0xffff) >>> shift);
    joined.set(wide, (joined.get(wide) ?? 0) + counts[i]!);
  });
  return joined;
}
