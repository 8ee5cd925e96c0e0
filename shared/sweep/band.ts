/** Near-best sections kept, so that a table of them stays readable; beyond it the band is marked as cut. */
export const MAX_BAND_KEPT = 400;
/** Widest band a person may look at, share of the best. */
export const BAND_SHARE = 0.1;

/** Largest oriented x (less is better) that is within the band of the best. */
function bandLimit(best: number): number {
  return best + BAND_SHARE * Math.abs(best);
}

export interface BandPoint {
  readonly index: number;
  readonly x: number;
  readonly y: number;
}

const byBest = (a: BandPoint, b: BandPoint) => a.x - b.x || a.index - b.index;

/**
 * The MAX_BAND_KEPT + 1 best sections in the leading measure (less is better, ties by index): one more than shown, so that
 * a cut can be told. Taking the best k is associative and commutative, so chunks can be merged in any order.
 */
export class BandBuilder {
  private points: BandPoint[] = [];
  private limit = Infinity;
  private best = Infinity;

  /** No section with a larger x can be in the band of all that were added, or will be. */
  get reach(): number {
    return Math.min(this.limit, bandLimit(this.best));
  }

  add(index: number, x: number, y: number): void {
    if (!(x <= this.limit)) return;
    if (x < this.best) this.best = x;
    this.points.push({ index, x, y });
    if (this.points.length >= 4 * MAX_BAND_KEPT) this.cut();
  }

  private cut(): void {
    this.points = bestOf(this.points);
    const best = this.points[0];
    if (!best) return;
    const last = this.points[this.points.length - 1]!;
    this.limit = this.points.length > MAX_BAND_KEPT ? last.x : bandLimit(best.x);
  }

  finish(): BandPoint[] {
    this.cut();
    return this.points;
  }
}

/** Best first, within the band, at most MAX_BAND_KEPT + 1. */
export function bestOf(points: readonly BandPoint[]): BandPoint[] {
  const sorted = points.toSorted(byBest);
  const best = sorted[0];
  return best ? sorted.filter((p) => p.x <= bandLimit(best.x)).slice(0, MAX_BAND_KEPT + 1) : [];
}
