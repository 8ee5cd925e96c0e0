import type { AxisExtent } from './axis-extent.ts';
import type { PlotFrame } from './front-chart-input.ts';
import { fromPlot, toPlot, type AxisScale } from './plot-axis.ts';

/** The part of the plane that is shown, stored (SI) units; null is the whole front with nearly all of the cloud. */
export interface ChartWindow {
  readonly x: { readonly low: number; readonly high: number };
  readonly y: { readonly low: number; readonly high: number };
}

export interface Extents {
  readonly x: AxisExtent;
  readonly y: AxisExtent;
}

interface Scales {
  readonly x: AxisScale;
  readonly y: AxisScale;
}

export interface Spot {
  readonly xPx: number;
  readonly yPx: number;
}

/** Beyond this enlargement neighbouring values differ in digits nobody prints. */
const SMALLEST_SHARE = 1e-4;

const sideExtent = (min: number, max: number): AxisExtent => ({ min, max, step: 0 });

/** The extents of a window; null where it has no place on these axes, as zero on a logarithmic one. */
export function windowExtents(window: ChartWindow, scales: Scales): Extents | null {
  const side = (key: 'x' | 'y') =>
    sideExtent(toPlot(scales[key], window[key].low), toPlot(scales[key], window[key].high));
  const extents = { x: side('x'), y: side('y') };
  const isSound = [extents.x, extents.y].every(({ min, max }) => Number.isFinite(min) && max > min);
  return isSound ? extents : null;
}

export function windowOf({ x, y }: Extents, scales: Scales): ChartWindow {
  return {
    x: { low: fromPlot(scales.x, x.min), high: fromPlot(scales.x, x.max) },
    y: { low: fromPlot(scales.y, y.min), high: fromPlot(scales.y, y.max) },
  };
}

/** Place of a spot along both axes, as shares of the drawing area from its left bottom corner. */
export function shareAt({ xPx, yPx }: Spot, frame: PlotFrame): { readonly x: number; readonly y: number } {
  return {
    x: (xPx - frame.left) / (frame.width - frame.left - frame.right),
    y: 1 - (yPx - frame.top) / (frame.height - frame.top - frame.bottom),
  };
}

export const isInPlot = (spot: Spot, frame: PlotFrame): boolean => {
  const { x, y } = shareAt(spot, frame);
  return x >= 0 && x <= 1 && y >= 0 && y <= 1;
};

/** Enlarges (factor below 1) or reduces about a place given as shares, which stays where it is. */
export function zoomedExtents(
  extents: Extents,
  factor: number,
  about: { readonly x: number; readonly y: number } = { x: 0.5, y: 0.5 },
): Extents {
  const side = ({ min, max }: AxisExtent, share: number) => {
    const place = min + share * (max - min);
    return sideExtent(place - (place - min) * factor, place + (max - place) * factor);
  };
  return { x: side(extents.x, about.x), y: side(extents.y, about.y) };
}

/** Shifts what is shown by shares of itself. */
export function movedExtents(extents: Extents, by: { readonly x: number; readonly y: number }): Extents {
  const side = ({ min, max }: AxisExtent, share: number) =>
    sideExtent(min + share * (max - min), max + share * (max - min));
  return { x: side(extents.x, by.x), y: side(extents.y, by.y) };
}

/** What lies between two spots, cut to the drawing area. */
export function boxedExtents(extents: Extents, frame: PlotFrame, corners: readonly [Spot, Spot]): Extents {
  const [a, b] = corners.map((corner) => shareAt(corner, frame)) as [
    ReturnType<typeof shareAt>,
    ReturnType<typeof shareAt>,
  ];
  const side = ({ min, max }: AxisExtent, from: number, to: number) => {
    const at = (share: number) => min + Math.min(1, Math.max(0, share)) * (max - min);
    return sideExtent(at(Math.min(from, to)), at(Math.max(from, to)));
  };
  return { x: side(extents.x, a.x, b.x), y: side(extents.y, a.y, b.y) };
}

/** Null (the whole) where nothing would be enlarged any more; the extents kept where they would be too small to read. */
export function heldExtents(wanted: Extents, now: Extents, whole: Extents): Extents | null {
  const share = (key: 'x' | 'y') => (wanted[key].max - wanted[key].min) / (whole[key].max - whole[key].min);
  if (share('x') < SMALLEST_SHARE || share('y') < SMALLEST_SHARE) return now;
  return share('x') >= 1 && share('y') >= 1 ? null : wanted;
}
