/** Ends of an axis as it is laid out (see plot-axis.ts); a step of 0 leaves its ticks to be chosen. */
export interface AxisExtent {
  readonly min: number;
  readonly max: number;
  readonly step: number;
}

/** Below this share of the kept axis the drawing would sit in a corner: then the axis is fitted anew. */
const LEAST_USED_SHARE = 0.5;

/** Distance of about so many ticks over a span: 1, 2 or 5 times a power of ten. */
export function tickStep(span: number, tickCount: number): number {
  const rough = span / tickCount;
  const power = 10 ** Math.floor(Math.log10(rough));
  const lead = rough / power;
  if (lead <= 1) return power;
  if (lead <= 2) return 2 * power;
  return lead <= 5 ? 5 * power : 10 * power;
}

/** Round ends around the values with about `tickCount` ticks at 1, 2 or 5 times a power of ten. */
export function fitExtent(low: number, high: number, tickCount: number): AxisExtent {
  if (!Number.isFinite(low) || !Number.isFinite(high)) return { min: 0, max: 1, step: 0.2 };
  const isPoint = high - low <= Math.abs(high) * 1e-9;
  const halo = isPoint ? Math.max(Math.abs(high) * 0.1, 0.5) : 0;
  const step = tickStep(high - low + 2 * halo, tickCount);
  const min = Math.floor((low - halo) / step + 1e-9) * step;
  const max = Math.ceil((high + halo) / step - 1e-9) * step;
  return { min: Number(min.toPrecision(12)), max: Number(max.toPrecision(12)), step };
}

/**
 * The extent to draw next. While a run is going on, the axis stays where it is as long as everything is on it and uses
 * a fair part of it, so that the eye can follow the front instead of the scale.
 */
export function nextExtent(previous: AxisExtent | null, wanted: AxisExtent): AxisExtent {
  if (previous === null) return wanted;
  const holds = wanted.min >= previous.min && wanted.max <= previous.max;
  const used = (wanted.max - wanted.min) / (previous.max - previous.min);
  return holds && used >= LEAST_USED_SHARE ? previous : wanted;
}
