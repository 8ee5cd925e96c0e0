import type { SpanToDepthSection } from './rules/rule-set.ts';

/** What the least effective depth follows from; mm, mm², MPa. Areas and widths are shared by all depths of a row. */
export interface SpanToDepthInputs {
  readonly spanMm: number;
  readonly support: SpanToDepthSection['support'];
  readonly fckMPa: number;
  readonly fykMPa: number;
  readonly webMm: number;
  /** Width of the compression face. */
  readonly faceWidthMm: number;
  readonly asMm2: number;
  readonly asPrimeMm2: number;
}

/** The steel ratios that the rule is asked with at effective depth d. */
export function spanToDepthSection(of: SpanToDepthInputs, dMm: number): SpanToDepthSection {
  const area = of.faceWidthMm * dMm;
  const { spanMm, support, fckMPa, fykMPa } = of;
  return {
    spanMm,
    support,
    fckMPa,
    fykMPa,
    flangeToWeb: of.faceWidthMm / of.webMm,
    rho: of.asMm2 / area,
    rhoPrime: of.asPrimeMm2 / area,
  };
}

/** Least effective depth where deflections are not computed, mm: the span over the largest span to depth. */
export function leastEffectiveDepthMm(
  largest: (of: SpanToDepthSection) => number,
  of: SpanToDepthInputs,
  dMm: number,
): number {
  return of.spanMm / largest(spanToDepthSection(of, dMm));
}
