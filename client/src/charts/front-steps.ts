export interface XY {
  readonly x: number;
  readonly y: number;
}

/**
 * The edge of what can be had: ordered from the best x, it keeps the y of one mark until the next mark is reached and
 * steps there, because between two marks nothing better than the first exists.
 */
export function frontSteps(front: readonly XY[], worst: { readonly x: number; readonly y: number }): XY[] {
  const first = front[0];
  const last = front.at(-1);
  if (first === undefined || last === undefined) return [];
  const corners: XY[] = [{ x: first.x, y: worst.y }, first];
  front.slice(1).forEach((point, k) => {
    corners.push({ x: point.x, y: front[k]!.y }, point);
  });
  return [...corners, { x: worst.x, y: last.y }];
}
