const MOST_STEPS = 80;
/** Width of a bracket, over the root, that is none. */
const NO_WIDTH = 1e-13;

/** A function of one number whose root is sought. */
export interface Sought {
  valueAt(x: number): number;
}

/** `rootOf` a function. */
export const bracketedRoot = (valueAt: (x: number) => number, low: number, high: number): number =>
  rootOf({ valueAt }, low, high);

/**
 * Root of a continuous function between two bounds; NaN unless they bracket one. Inverse quadratic interpolation wherever
 * the last three values bend little enough for it, halving elsewhere, so that a kink cannot hold it up (Chandrupatla,
 * Advances in Engineering Software 28, 1997; memory).
 */
export function rootOf(sought: Sought, low: number, high: number): number {
  let last = low;
  let lastValue = sought.valueAt(last);
  let other = high;
  let otherValue = sought.valueAt(other);
  if (lastValue === 0) return last;
  if (otherValue === 0) return other;
  if (!(lastValue < 0 !== otherValue < 0) || Number.isNaN(lastValue + otherValue)) return NaN;
  // a straight line first: most of these functions are nearly one
  let share = lastValue / (lastValue - otherValue);
  for (let step = 0; step < MOST_STEPS; step++) {
    const x = last + share * (other - last);
    const value = sought.valueAt(x);
    if (value === 0) return x;
    let before = last;
    let beforeValue = lastValue;
    if (value < 0 !== lastValue < 0) {
      before = other;
      beforeValue = otherValue;
      other = last;
      otherValue = lastValue;
    }
    last = x;
    lastValue = value;
    const width = Math.abs(other - last);
    const least = NO_WIDTH * Math.abs(last);
    if (width <= least) break;
    share = shareOf(
      (last - other) / (before - other),
      { last: lastValue, other: otherValue, before: beforeValue },
      (before - last) / (other - last),
    );
    share = Math.min(Math.max(share, least / width / 2), 1 - least / width / 2);
  }
  return Math.abs(lastValue) < Math.abs(otherValue) ? last : other;
}

/** Share of the bracket to go: of three values, interpolated where the curve through them is monotone, else half. */
function shareOf(
  place: number,
  { last, other, before }: { readonly last: number; readonly other: number; readonly before: number },
  reach: number,
): number {
  const rise = (last - other) / (before - other);
  if (!(1 - Math.sqrt(1 - place) < rise && rise < Math.sqrt(place))) return 0.5;
  return (
    (last / (other - last)) * (before / (other - before)) +
    reach * (last / (before - last)) * (other / (before - other))
  );
}
