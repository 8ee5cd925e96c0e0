/**
 * Strength of confined over unconfined concrete under equal lateral pressures, f′cc/f′co = −1.254 +
 * 2.254 √(1 + 7.94 p) − 2 p with p = f′l/f′co (Mander, Priestley and Park, ASCE J. Struct. Eng. 114-8, 1988; memory).
 */
export function equalPressureGain(pressureShare: number): number {
  return -1.254 + 2.254 * Math.sqrt(1 + 7.94 * pressureShare) - 2 * pressureShare;
}

/**
 * The same for two pressures, as shares of f′co, in the closed form that Chang and Mander fitted to the multiaxial surface
 * (NCEER-94-0006, 1994; memory): f′cc/f′co = 1 + A p (0.1 + 0.9/(1 + B p)), p the mean pressure, A and B by the ratio of the
 * smaller to the larger. Within 0.3 % of `equalPressureGain` where the two are equal.
 */
export function twoPressureGain(oneShare: number, otherShare: number): number {
  const larger = Math.max(oneShare, otherShare);
  if (!(larger > 0)) return 1;
  const ratio = Math.min(oneShare, otherShare) / larger;
  const mean = (oneShare + otherShare) / 2;
  const a = 6.8886 - (0.6069 + 17.275 * ratio) * Math.exp(-4.989 * ratio);
  const b = 4.5 / ((5 / a) * (0.9849 - 0.6306 * Math.exp(-3.8939 * ratio)) - 0.1) - 5;
  return 1 + a * mean * (0.1 + 0.9 / (1 + b * mean));
}
