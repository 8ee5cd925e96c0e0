function channels(hex: string): [number, number, number] {
  const digits = hex.replace('#', '');
  const full = digits.length === 3 ? [...digits].map((digit) => digit + digit).join('') : digits;
  return [0, 2, 4].map((at) => Number.parseInt(full.slice(at, at + 2), 16)) as [number, number, number];
}

/** The colour so far on the way from one to another, 0 … 1; both as `#rrggbb`. */
export function mixColours(from: string, to: string, share: number): string {
  const [a, b] = [channels(from), channels(to)];
  const mixed = a.map((value, k) => Math.round(value + (b[k]! - value) * share));
  return `#${mixed.map((value) => value.toString(16).padStart(2, '0')).join('')}`;
}
