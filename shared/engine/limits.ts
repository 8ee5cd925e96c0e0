/**
 * Comparisons shared by `evaluateSection` and the sweep's hot loop, so that both draw each limit at the same bit.
 * The slack forgives rounding in unit conversion only (34 in / 8.5 in is 4 exactly). NaN never passes.
 */
const RELATIVE_SLACK = 1e-9;
/** Slack of a length, mm. */
const LENGTH_SLACK_MM = 1e-6;

export const isWithinLength = (valueMm: number, limitMm: number) => valueMm <= limitMm + LENGTH_SLACK_MM;
export const isSameLength = (aMm: number, bMm: number) => Math.abs(aMm - bMm) <= LENGTH_SLACK_MM;
export const isAtMostTimes = (value: number, factor: number, base: number) =>
  value <= factor * base * (1 + RELATIVE_SLACK);
export const isAtLeastTimes = (value: number, factor: number, base: number) =>
  value >= factor * base * (1 - RELATIVE_SLACK);

/**
 * Tension steel of a tension-controlled, singly reinforced section for moment Mu: As = σ b d/fy (1 − √(1 − 2 Mu/(φ σ b d²))),
 * σ the block's stress, b the flange's width while the block lies in it. Below it the overhang's steel σ (bf − b) hf/fy is
 * apart and the web takes the rest of Mu. Infinity where the section cannot carry it without compression steel.
 * N·mm, mm, MPa → mm².
 */
export function requiredSteelMm2(
  muNmm: number,
  reduction: number,
  section: {
    widthMm: number;
    dMm: number;
    blockStressMPa: number;
    fyMPa: number;
    overhangMm?: number;
    overhangDepthMm?: number;
  },
): number {
  const { widthMm, dMm, blockStressMPa, fyMPa, overhangMm = 0, overhangDepthMm = 0 } = section;
  const blockForce = reduction * blockStressMPa;
  if (overhangMm === 0) return steelOfBlockMm2(muNmm, blockForce, widthMm, section);
  const flangeMm = widthMm + overhangMm;
  const inFlange = steelOfBlockMm2(muNmm, blockForce, flangeMm, section);
  if (inFlange * fyMPa <= blockStressMPa * flangeMm * overhangDepthMm) return inFlange;
  const overhangN = blockStressMPa * overhangMm * overhangDepthMm;
  const webNmm = muNmm - reduction * overhangN * (dMm - overhangDepthMm / 2);
  return overhangN / fyMPa + steelOfBlockMm2(webNmm, blockForce, widthMm, section);
}

/** Steel of a rectangular block so wide; a function of its own, since the hot loop would make a closure anew each time. */
function steelOfBlockMm2(
  muNmm: number,
  reducedStressMPa: number,
  widthMm: number,
  { dMm, blockStressMPa, fyMPa }: { dMm: number; blockStressMPa: number; fyMPa: number },
): number {
  const inner = 1 - (2 * muNmm) / (reducedStressMPa * widthMm * dMm * dMm);
  if (!(inner >= 0)) return Infinity;
  return ((blockStressMPa * widthMm * dMm) / fyMPa) * (1 - Math.sqrt(inner));
}
