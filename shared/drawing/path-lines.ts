export interface PathPoint {
  readonly x: number;
  readonly y: number;
}

const STEP = /([MLHVlhv])\s*(-?[\d.]+(?:e-?\d+)?)(?:[\s,]+(-?[\d.]+(?:e-?\d+)?))?/g;

/** The straight lines of a path, for what cannot draw one; our plans have moves and lines only. */
export function pathLines(path: string): PathPoint[][] {
  const lines: PathPoint[][] = [];
  let at: PathPoint = { x: 0, y: 0 };
  for (const [, letter, first, second] of path.matchAll(STEP)) {
    const [a, b] = [Number(first), Number(second ?? 0)];
    if (letter === 'M') {
      at = { x: a, y: b };
      lines.push([at]);
      continue;
    }
    if (letter === 'L') at = { x: a, y: b };
    else if (letter === 'l') at = { x: at.x + a, y: at.y + b };
    else if (letter === 'H' || letter === 'h') at = { x: letter === 'H' ? a : at.x + a, y: at.y };
    else at = { x: at.x, y: letter === 'V' ? a : at.y + a };
    lines.at(-1)!.push(at);
  }
  return lines;
}
