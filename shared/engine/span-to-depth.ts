import type { SpanToDepthSection } from './rules/rule-set.ts';

/**
 * What the least effective depth follows from, with the ratios of the depth last asked for: one object is reused for all
 * depths of a row. mm, mm², MPa.
 */
export interface SpanToDepthAt extends SpanToDepthSection {
  rho: number;
  rhoPrime: number;
  /** Width of the compression face. */
  readonly faceWidthMm: number;
  readonly asMm2: number;
  readonly asPrimeMm2: number;
}

export function spanToDepthAt(
  of: Omit<SpanToDepthAt, 'rho' | 'rhoPrime' | 'flangeToWeb'> & { readonly webMm: number },
): SpanToDepthAt {
  const { spanMm, support, fckMPa, fykMPa, webMm, faceWidthMm, asMm2, asPrimeMm2 } = of;
  return {
    spanMm,
    support,
    fckMPa,
    fykMPa,
    flangeToWeb: faceWidthMm / webMm,
    faceWidthMm,
    asMm2,
    asPrimeMm2,
    rho: 0,
    rhoPrime: 0,
  };
}

/** Least effective depth where deflections are not computed, mm: the span over the largest span to depth at d. */
export function leastEffectiveDepthMm(
  largest: (of: SpanToDepthSection) => number,
  at: SpanToDepthAt,
  dMm: number,
): number {
  const area = at.faceWidthMm * dMm;
  at.rho = at.asMm2 / area;
  at.rhoPrime = at.asPrimeMm2 / area;
  return at.spanMm / largest(at);
}
