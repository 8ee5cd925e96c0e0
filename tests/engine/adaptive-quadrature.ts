/** ∫f from a to b by adaptive Simpson's rule to an absolute error, split at the strains where f changes its formula. */
export function integral(
  f: (x: number) => number,
  [a, b]: readonly [number, number],
  { kinks, error }: { readonly kinks: readonly number[]; readonly error: number },
): number {
  const edges = [a, ...kinks.filter((x) => x > a && x < b).sort((p, q) => p - q), b];
  let sum = 0;
  for (let i = 1; i < edges.length; i++) {
    const [from, to] = [edges[i - 1]!, edges[i]!];
    const middle = (from + to) / 2;
    const at = { from, to, ends: [f(from), f(middle), f(to)] as const };
    sum += halved(f, at, error, 40);
  }
  return sum;
}

interface Piece {
  readonly from: number;
  readonly to: number;
  readonly ends: readonly [number, number, number];
}

const simpson = (width: number, [a, m, b]: Piece['ends']) => (width / 6) * (a + 4 * m + b);

function halved(f: (x: number) => number, { from, to, ends }: Piece, error: number, depth: number): number {
  const middle = (from + to) / 2;
  const [fa, fm, fb] = ends;
  const left: Piece = { from, to: middle, ends: [fa, f((from + middle) / 2), fm] };
  const right: Piece = { from: middle, to, ends: [fm, f((middle + to) / 2), fb] };
  const whole = simpson(to - from, ends);
  const parts = simpson(middle - from, left.ends) + simpson(to - middle, right.ends);
  if (depth === 0 || Math.abs(parts - whole) <= 15 * error) return parts + (parts - whole) / 15;
  return halved(f, left, error / 2, depth - 1) + halved(f, right, error / 2, depth - 1);
}
