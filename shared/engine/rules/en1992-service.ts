import type { Support } from '../section.ts';
import type { SpanToDepthSection } from './rule-set.ts';

/** Serviceability without calculation by EN 1992-1-1:2004: Table 7.3N and 7.4.2 (memory of the standard). */

/** Steel stress of each line of Table 7.3N, MPa. */
const TABLE_STRESS_MPA = [160, 200, 240, 280, 320, 360] as const;
/** Largest bar spacing of Table 7.3N, mm, by wk; where the table ends, none will do. */
const TABLE_SPACING_MM: Readonly<Record<number, readonly number[]>> = {
  0.4: [300, 300, 250, 200, 150, 100],
  0.3: [300, 250, 200, 150, 100, 50],
  0.2: [200, 150, 100, 50],
};

/**
 * Largest spacing of bars for crack control, mm: Table 7.3N between its lines, the first line below them, 0 beyond its
 * end: there the crack width needs calculating.
 */
export function tabledBarSpacingMm(stressMPa: number, crackWidthMm: number): number {
  const spacings = TABLE_SPACING_MM[crackWidthMm]!;
  if (stressMPa <= TABLE_STRESS_MPA[0]) return spacings[0]!;
  for (let i = 1; i < spacings.length; i++) {
    const [low, high] = [TABLE_STRESS_MPA[i - 1]!, TABLE_STRESS_MPA[i]!];
    if (stressMPa <= high)
      return spacings[i - 1]! + ((spacings[i]! - spacings[i - 1]!) * (stressMPa - low)) / (high - low);
  }
  return 0;
}

/** K of Table 7.4N. */
const SPAN_FACTOR: Readonly<Record<Support, number>> = {
  simple: 1,
  'one-end-continuous': 1.3,
  'both-ends-continuous': 1.5,
  cantilever: 0.4,
};

/** Stress for which 7.16 is written, MPa, and the fyk it goes with. */
const REFERENCE_STRESS_MPA = 310;
const REFERENCE_FYK_MPA = 500;
/** Longest span without 7/leff, and the flange over the web from which 0.8 applies. */
const LONG_SPAN_MM = 7000;
const WIDE_FLANGE = 3;

/** σs where the steel is as much as strength requires, MPa (7.17 with As,prov = As,req). */
const deflectionStressMPa = (fykMPa: number) => REFERENCE_STRESS_MPA * (fykMPa / REFERENCE_FYK_MPA);

/**
 * Largest span over effective depth (7.16a, b; 7.4.2(2)): K [11 + 1.5 √fck ρ0/ρ + 3.2 √fck (ρ0/ρ − 1)^1.5] to ρ0 = 10⁻³ √fck,
 * K [11 + 1.5 √fck ρ0/(ρ − ρ′) + √fck √(ρ′/ρ0)/12] above; times 310/σs, 0.8 for flanges over three webs wide and 7 m over a
 * longer span. ρ − ρ′ counts no less than ρ0, where the book's form has no end.
 */
export function largestSpanToDepth(
  of: SpanToDepthSection,
  stressMPa = deflectionStressMPa(of.fykMPa),
): number {
  const { fckMPa, rho, rhoPrime, support } = of;
  const root = Math.sqrt(fckMPa);
  const reference = 0.001 * root;
  let basic: number;
  if (rho <= reference) {
    const over = reference / rho;
    basic = 11 + 1.5 * root * over + 3.2 * root * ((over - 1) * Math.sqrt(over - 1));
  } else {
    basic =
      11 +
      (1.5 * root * reference) / Math.max(rho - rhoPrime, reference) +
      (root / 12) * Math.sqrt(rhoPrime / reference);
  }
  return (
    SPAN_FACTOR[support] * basic * (REFERENCE_STRESS_MPA / stressMPa) * flangeFactor(of) * spanFactor(of)
  );
}

const flangeFactor = ({ flangeToWeb }: SpanToDepthSection) => (flangeToWeb > WIDE_FLANGE ? 0.8 : 1);
const spanFactor = ({ spanMm }: SpanToDepthSection) => (spanMm > LONG_SPAN_MM ? LONG_SPAN_MM / spanMm : 1);

/** The same as the book prints it, by the branch and the factors that apply. */
export function spanToDepthFormula(of: SpanToDepthSection): string {
  const isLight = of.rho <= 0.001 * Math.sqrt(of.fckMPa);
  const basic = isLight
    ? '11 + 1.5 √fck ρ0/ρ + 3.2 √fck (ρ0/ρ − 1)^1.5'
    : '11 + 1.5 √fck ρ0/(max(ρ − ρ′, ρ0)) + √fck √(ρ′/ρ0)/12';
  const flange = flangeFactor(of) === 1 ? '' : ' 0.8';
  const longSpan = spanFactor(of) === 1 ? '' : ' (7 m/span)';
  return `${SPAN_FACTOR[of.support]} (${basic}) (500/fyk)${flange}${longSpan}; ρ0 = 0.001 √fck`;
}
