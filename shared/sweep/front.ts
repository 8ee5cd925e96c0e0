import type { FrontPoint } from './result.ts';

/**
 * The lowest indices of sections that tie exactly that are kept by name; the count of ties is always exact. Sixteen
 * covers what a person would page through; a flat measure (depth against width) ties by the hundred thousand.
 */
export const MAX_TIES_KEPT = 16;

/**
 * Exact front of points whose measures are both "less is better", built one point at a time.
 *
 * Ties and duplicates: of points equal in both measures all belong to the front; the lowest index represents them, the
 * count says how many there are. A point equal in one measure and worse in the other is dominated.
 * Kept as columns sorted by x ascending, so y strictly descends.
 */
export class FrontBuilder {
  readonly xs: number[] = [];
  readonly ys: number[] = [];
  readonly ties: number[][] = [];
  readonly tieCounts: number[] = [];

  /** Offers a section; `indices` are its ties, ascending, and `count` how many there are in all. */
  add(x: number, y: number, index: number): void {
    const at = this.placeOf(x, y);
    if (at === DOMINATED) return;
    if (at < 0) {
      const tie = -at - TIE_OFFSET;
      this.tieCounts[tie]!++;
      addTie(this.ties[tie]!, index);
      return;
    }
    this.insert(at, { x, y, ties: [index], tieCount: 1 });
  }

  addAll(x: number, y: number, ties: readonly number[], tieCount: number): void {
    const at = this.placeOf(x, y);
    if (at === DOMINATED) return;
    if (at < 0) {
      const tie = -at - TIE_OFFSET;
      this.tieCounts[tie]! += tieCount;
      for (const index of ties) addTie(this.ties[tie]!, index);
      return;
    }
    this.insert(at, { x, y, ties: [...ties], tieCount });
  }

  /** Whether a point is at least as good as (x, y) in both measures and better in one. */
  isBeaten(x: number, y: number): boolean {
    const { xs, ys } = this;
    let low = 0;
    let high = xs.length;
    while (low < high) {
      const mid = (low + high) >>> 1;
      if (xs[mid]! <= x) low = mid + 1;
      else high = mid;
    }
    if (low === 0) return false;
    const left = low - 1;
    return ys[left]! < y || (ys[left] === y && xs[left]! < x);
  }

  /** Insertion place ≥ 0, −(tie) − TIE_OFFSET for an exact tie, or DOMINATED. NaN is always dominated. */
  private placeOf(x: number, y: number): number {
    const { xs, ys } = this;
    let low = 0;
    let high = xs.length;
    while (low < high) {
      const mid = (low + high) >>> 1;
      if (xs[mid]! <= x) low = mid + 1;
      else high = mid;
    }
    if (low > 0) {
      const left = low - 1;
      if (!(y < ys[left]!)) return ys[left] === y && xs[left] === x ? -left - TIE_OFFSET : DOMINATED;
      return xs[left] === x ? left : low;
    }
    return x === x && y === y ? 0 : DOMINATED;
  }

  private insert(at: number, point: { x: number; y: number; ties: number[]; tieCount: number }): void {
    const { xs, ys } = this;
    let end = at;
    while (end < xs.length && ys[end]! >= point.y) end++;
    xs.splice(at, end - at, point.x);
    ys.splice(at, end - at, point.y);
    this.ties.splice(at, end - at, point.ties);
    this.tieCounts.splice(at, end - at, point.tieCount);
  }
}

const DOMINATED = -1;
const TIE_OFFSET = 2;

function addTie(ties: number[], index: number): void {
  if (ties.length === MAX_TIES_KEPT && index > ties[MAX_TIES_KEPT - 1]!) return;
  let at = ties.length;
  while (at > 0 && ties[at - 1]! > index) at--;
  ties.splice(at, 0, index);
  if (ties.length > MAX_TIES_KEPT) ties.pop();
}

/** Points with two measures and a sign for each: +1 less is better, −1 more is better. */
export interface Signs {
  readonly x: 1 | -1;
  readonly y: 1 | -1;
}

/**
 * The non-dominated points of a list, ordered from best x: exact, with ties as in FrontBuilder. Points with NaN in
 * either measure are never on the front.
 */
export function nonDominated(
  points: readonly { readonly index: number; readonly x: number; readonly y: number }[],
  signs: Signs,
): FrontPoint[] {
  const builder = new FrontBuilder();
  for (const { index, x, y } of points) builder.add(signs.x * x, signs.y * y, index);
  return frontPoints(builder, signs);
}

/** The points of a builder in the measures' own signs, from best x. */
function frontPoints(builder: FrontBuilder, signs: Signs): FrontPoint[] {
  return builder.xs.map((x, i) => ({
    index: builder.ties[i]![0]!,
    x: signs.x * x,
    y: signs.y * builder.ys[i]!,
    tieCount: builder.tieCounts[i]!,
    ties: builder.ties[i]!,
  }));
}
