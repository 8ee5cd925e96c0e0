import type { AxisExtent } from './axis-extent.ts';
import type { PlotFrame } from './front-chart-input.ts';

export interface Mark {
  readonly index: number;
  /** Places along the axes as they are laid out. */
  readonly x: number;
  readonly y: number;
}

/** A finger covers about this much, CSS pixels. */
export const REACH_PX = 24;

/** The mark under or next to the pointer, so that a click near a small mark still picks a real section. */
export function nearestMark(
  marks: readonly Mark[],
  pointer: { readonly xPx: number; readonly yPx: number },
  plot: { readonly frame: PlotFrame; readonly xExtent: AxisExtent; readonly yExtent: AxisExtent },
): Mark | undefined {
  const { frame, xExtent, yExtent } = plot;
  const innerWidth = frame.width - frame.left - frame.right;
  const innerHeight = frame.height - frame.top - frame.bottom;
  let best: Mark | undefined;
  let bestPx = REACH_PX;
  for (const mark of marks) {
    const xPx = frame.left + ((mark.x - xExtent.min) / (xExtent.max - xExtent.min)) * innerWidth;
    const yPx = frame.top + (1 - (mark.y - yExtent.min) / (yExtent.max - yExtent.min)) * innerHeight;
    const distance = Math.hypot(xPx - pointer.xPx, yPx - pointer.yPx);
    if (distance < bestPx) {
      best = mark;
      bestPx = distance;
    }
  }
  return best;
}
