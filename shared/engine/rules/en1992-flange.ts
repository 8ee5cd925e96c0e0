import type { FlangeSetting } from '../flange.ts';
import type { Face, Support } from '../section.ts';

/** Effective width and mean tension width of flanges by EN 1992-1-1:2004 5.3.2.1, 9.2.1.1 (memory of the standard). */

/**
 * l0 over the span: the length between points of zero moment of Figure 5.2, neighbouring spans taken as equal. A support that
 * was not said counts as simple in sagging and as continuous in hogging.
 */
function zeroMomentShare(face: Face, support: Support | null): number {
  if (support === 'cantilever') return 1;
  if (face === 'tension') return 0.3;
  return { simple: 1, 'one-end-continuous': 0.85, 'both-ends-continuous': 0.7 }[support ?? 'simple'];
}

/** beff = b + Σ beff,i, beff,i = 0.2 bi + 0.1 l0 within 0.2 l0 and bi, bi half of the clear distance; mm. */
export function effectiveFlangeMm(of: FlangeSetting): number {
  const { shape, face, support, webMm, clearToNextWebMm, spanMm } = of;
  const l0 = zeroMomentShare(face, support) * spanMm;
  const half = clearToNextWebMm / 2;
  const side = Math.min(0.2 * half + 0.1 * l0, 0.2 * l0, half);
  return webMm + (shape === 't' ? 2 : 1) * side;
}

export function effectiveFlangeFormula({
  shape,
  face,
  support,
}: Pick<FlangeSetting, 'shape' | 'face' | 'support'>): string {
  return `b + ${shape === 't' ? '2 ' : ''}min(0.1 sw + 0.1 l0, 0.2 l0, sw/2), l0 = ${zeroMomentShare(face, support)} ln`;
}

/**
 * bt: the web, or with a flange in tension the mean width of the tension zone, taken as half of the depth (common practice,
 * no source); mm.
 */
export function meanTensionWidthMm(of: {
  readonly widthMm: number;
  readonly depthMm: number;
  readonly flange: { readonly face: Face; readonly widthMm: number; readonly thicknessMm: number } | null;
}): number {
  const { widthMm, depthMm, flange } = of;
  if (flange?.face !== 'tension') return widthMm;
  const zoneMm = depthMm / 2;
  return widthMm + ((flange.widthMm - widthMm) * Math.min(flange.thicknessMm, zoneMm)) / zoneMm;
}
