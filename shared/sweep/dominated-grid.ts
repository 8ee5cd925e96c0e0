/** Cells along x and y: enough that few points slip through, few enough to be filled in a tenth of a millisecond. */
const CELLS = 64;

/** The lesser of two numbers, of which either may be missing (NaN). */
export const lesser = (a: number, b: number): number => (b < a || a !== a ? b : a);

/** Which of CELLS even stretches a value lies in; what lies beyond the ends is in the outermost. Never falls as it rises. */
class Stretches {
  private readonly low: number;
  private readonly perUnit: number;

  constructor(values: Float64Array) {
    let low = Infinity;
    let high = -Infinity;
    for (const value of values) {
      if (value > -Infinity && value < low) low = value;
      if (value < Infinity && value > high) high = value;
    }
    const perUnit = CELLS / (high - low);
    this.low = low;
    this.perUnit = perUnit > 0 && perUnit < Infinity ? perUnit : 0;
  }

  cellOf(value: number): number {
    const at = (value - this.low) * this.perUnit;
    // NaN, as without any stretch, is in the first: nothing is shown to be beaten there.
    return at >= CELLS ? CELLS - 1 : at > 0 ? Math.trunc(at) : 0;
  }
}

/**
 * Shows quickly of most points that a front of three measures beats them: the least z of the front's points that lie in
 * cells strictly before the point's own, in x and in y. What it does not show may still be beaten.
 */
export class DominatedGrid {
  private readonly xStretches: Stretches;
  private readonly yStretches: Stretches;
  /** By x cell, then y cell; NaN where no point lies before. */
  private readonly leastBefore = new Float64Array(CELLS * CELLS).fill(NaN);

  constructor({ x, y, z }: { readonly x: Float64Array; readonly y: Float64Array; readonly z: Float64Array }) {
    this.xStretches = new Stretches(x);
    this.yStretches = new Stretches(y);
    const { leastBefore } = this;
    for (let i = 0; i < x.length; i++) {
      const xAt = this.xStretches.cellOf(x[i]!) + 1;
      const yAt = this.yStretches.cellOf(y[i]!) + 1;
      if (xAt === CELLS || yAt === CELLS) continue;
      const at = xAt * CELLS + yAt;
      leastBefore[at] = lesser(leastBefore[at]!, z[i]!);
    }
    for (let xAt = 1; xAt < CELLS; xAt++) {
      for (let yAt = 1; yAt < CELLS; yAt++) {
        const at = xAt * CELLS + yAt;
        const before = lesser(leastBefore[at - 1]!, leastBefore[at - CELLS]!);
        leastBefore[at] = lesser(leastBefore[at]!, before);
      }
    }
  }

  /** Whether a point of the front is less in x and in y, and no more in z. */
  isBeaten(x: number, y: number, z: number): boolean {
    return this.leastBefore[this.xStretches.cellOf(x) * CELLS + this.yStretches.cellOf(y)]! <= z;
  }
}
