/** Figures the largest number of a column is printed with; the others follow its decimals. */
const FIGURES = 4;
const MOST_DECIMALS = 3;

/** One number of decimals for a whole column, so that its numbers stand under each other on the point. */
export function columnDecimals(values: readonly (number | null)[]): number {
  const largest = Math.max(0, ...values.map((value) => Math.abs(value ?? 0)));
  if (largest === 0) return 0;
  const whole = Math.floor(Math.log10(largest)) + 1;
  return Math.min(MOST_DECIMALS, Math.max(0, FIGURES - whole));
}
