/**
 * Moves labels apart along one direction so that neighbours keep `least` between them, each as near its own place as
 * the order allows, all within [low, high] when there is room. The order of the input is kept in the output.
 */
export function spreadLabels(
  wanted: readonly number[],
  least: number,
  limits: { readonly low: number; readonly high: number },
): number[] {
  const order = wanted.map((_, k) => k).sort((a, b) => wanted[a]! - wanted[b]!);
  const placed = new Array<number>(wanted.length).fill(0);
  let floor = limits.low;
  for (const k of order) {
    placed[k] = Math.max(wanted[k]!, floor);
    floor = placed[k] + least;
  }
  let ceiling = limits.high;
  for (const k of order.toReversed()) {
    placed[k] = Math.min(placed[k]!, ceiling);
    ceiling = placed[k] - least;
  }
  return placed;
}
