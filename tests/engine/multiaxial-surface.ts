/**
 * Strength under two lateral pressures straight from the five-parameter surface of Willam and Warnke with the meridians
 * that Mander gives (University of Canterbury, 1984; memory), stresses over f′co, tension positive: the axial stress is
 * lowered until its octahedral shear lies on the surface.
 */
export function multiaxialGain(oneShare: number, otherShare: number): number {
  const first = -Math.min(oneShare, otherShare);
  const second = -Math.max(oneShare, otherShare);
  let strong = 5;
  let weak = 0.5;
  for (let i = 0; i < 60; i++) {
    const axial = (strong + weak) / 2;
    if (isBeyond(first, second, -axial)) strong = axial;
    else weak = axial;
  }
  return weak;
}

function isBeyond(first: number, second: number, third: number): boolean {
  const mean = (first + second + third) / 3;
  const shear = Math.sqrt((first - second) ** 2 + (second - third) ** 2 + (third - first) ** 2) / 3;
  const cosine = (first - mean) / (Math.SQRT2 * shear);
  const t = 0.069232 - 0.661091 * mean - 0.04935 * mean ** 2;
  const c = 0.122965 - 1.150502 * mean - 0.315545 * mean ** 2;
  const d = 4 * (c ** 2 - t ** 2) * cosine ** 2;
  const limit =
    (c * (d / (2 * cosine) + (2 * t - c) * Math.sqrt(d + 5 * t ** 2 - 4 * t * c))) / (d + (2 * t - c) ** 2);
  return shear > limit;
}
