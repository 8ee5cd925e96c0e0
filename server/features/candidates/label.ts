const LETTERS = 26;

/** A, B, … Z, AA, AB, … for 0, 1, … */
export function labelOf(position: number): string {
  const last = String.fromCharCode(65 + (position % LETTERS));
  return position < LETTERS ? last : labelOf(Math.floor(position / LETTERS) - 1) + last;
}
