/**
 * Depth of the neutral axis of the cracked, linear elastic section, mm (general practice; the closed form for one and
 * two layers stands in the handbooks as kd = √(2 n ρ + (n ρ)²) − n ρ and its doubly reinforced companion).
 *
 * Layers sorted by depth. A layer below the axis counts n A; one above it `above` × A, with above = n − 1 where the
 * concrete it displaces is deducted, n where it is not. First moments about the axis: b x²/2 + S₁ x − S₂ = 0.
 * A flange in compression counts its overhang bf − b: with the axis inside it the web is as wide as the flange, below it the
 * overhang is one more area with its own centroid. Shared by `evaluateSection` and the sweep's hot loop.
 */
export function crackedAxisDepth(
  depths: Float64Array,
  areas: Float64Array,
  n: number,
  section: {
    widthMm: number;
    modularRatio: number;
    ratioAbove: number;
    overhangMm: number;
    overhangDepthMm: number;
  },
): number {
  const { widthMm, modularRatio, ratioAbove, overhangMm, overhangDepthMm } = section;
  let layersAbove = 0;
  while (layersAbove < n - 1) {
    // First moment with the axis at this layer: negative means the axis lies deeper.
    const x = depths[layersAbove]!;
    let moment = 0.5 * widthMm * x * x;
    if (overhangMm !== 0) {
      const covered = Math.min(x, overhangDepthMm);
      moment += overhangMm * covered * (x - 0.5 * covered);
    }
    for (let i = 0; i < layersAbove; i++) moment += ratioAbove * areas[i]! * (x - depths[i]!);
    for (let i = layersAbove + 1; i < n; i++) moment -= modularRatio * areas[i]! * (depths[i]! - x);
    if (moment >= 0) break;
    layersAbove++;
  }
  let s1 = 0;
  let s2 = 0;
  for (let i = 0; i < n; i++) {
    const transformed = (i < layersAbove ? ratioAbove : modularRatio) * areas[i]!;
    s1 += transformed;
    s2 += transformed * depths[i]!;
  }
  if (overhangMm !== 0) {
    const inFlange = (2 * s2) / (s1 + Math.sqrt(s1 * s1 + 2 * (widthMm + overhangMm) * s2));
    if (inFlange <= overhangDepthMm) return inFlange;
    const area = overhangMm * overhangDepthMm;
    s1 += area;
    s2 += 0.5 * area * overhangDepthMm;
  }
  return (2 * s2) / (s1 + Math.sqrt(s1 * s1 + 2 * widthMm * s2));
}

/** Moment of inertia of the compressed concrete about the axis at kd, mm⁴: web and overhang. */
export function compressedInertiaMm4(
  kd: number,
  { widthMm, overhangMm, overhangDepthMm }: { widthMm: number; overhangMm: number; overhangDepthMm: number },
): number {
  const below = Math.max(0, kd - overhangDepthMm);
  return (widthMm * kd * kd * kd) / 3 + (overhangMm * (kd * kd * kd - below * below * below)) / 3;
}
