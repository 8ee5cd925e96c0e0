import type { Direction } from '#shared/engine/measures.ts';
import type { DensityCell, FrontPoint, Point } from '#shared/sweep/result.ts';
import type { AxisExtent } from './axis-extent.ts';
import type { AxisScale } from './plot-axis.ts';

/** One axis as the reader sees it. `perSi` turns the stored SI value into the unit printed on the axis. */
export interface ChartAxis extends AxisScale {
  readonly title: string;
  readonly unit: string;
  readonly direction: Direction;
  readonly formatTick: (shown: number) => string;
}

export interface ChartColours {
  readonly paper: string;
  readonly ink: string;
  readonly muted: string;
  readonly rule: string;
  readonly steel: string;
  readonly meets: string;
  readonly near: string;
}

/** Room of the axes and the drawing area, in CSS pixels. */
export interface PlotFrame {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

/** A pinned section as a flag; x and y in SI. */
export interface ChartPin {
  readonly label: string;
  readonly index: number;
  readonly x: number;
  readonly y: number;
}

/** How a third measure is told by the marks of the front. */
export const MARK_STYLES = ['tint', 'size'] as const;
export type MarkStyle = (typeof MARK_STYLES)[number];

/** A third measure on the front's marks: for each of them 0 (least) … 1 (most), null where it has no value. */
export interface MarkScale {
  readonly style: MarkStyle;
  readonly shares: readonly (number | null)[];
}

/** All measures in SI, as results carry them; extents as the axes are laid out. */
export interface FrontChartInput {
  readonly x: ChartAxis;
  readonly y: ChartAxis;
  readonly xExtent: AxisExtent;
  readonly yExtent: AxisExtent;
  readonly frame: PlotFrame;
  /** Drawn as the stepped line. */
  readonly front: readonly FrontPoint[];
  /** What is marked: the front's own points, or those of the front in three measures. */
  readonly marks: readonly FrontPoint[];
  /** The front without ranges, drawn faintly where ranges are set. */
  readonly outline: readonly Point[];
  readonly markScale: MarkScale | null;
  readonly band: readonly Point[];
  /** Near-best band as a share of the best x, 0 … 0.1. */
  readonly bandShare: number;
  readonly pins: readonly ChartPin[];
  readonly selected: Point | null;
  readonly target: { readonly axis: 'x' | 'y'; readonly value: number; readonly label: string } | null;
  readonly colours: ChartColours;
  /** What the pointer reads on a section. */
  readonly describe: (index: number) => string;
}

/** What is drawn, whatever its size and colours: a picture of it can be made in any. */
export type FrontPicture = Omit<FrontChartInput, 'frame' | 'colours'> & {
  readonly cells: readonly DensityCell[];
};

/** Direction words beside the title, with the arrow along the axis they belong to. */
export function betterWords(axis: 'x' | 'y', direction: Direction): string {
  if (axis === 'x') return direction === 'less' ? '← less is better' : 'more is better →';
  return direction === 'less' ? '↓ less is better' : '↑ more is better';
}

export const axisTitle = (axis: ChartAxis): string =>
  axis.unit === '' ? axis.title : `${axis.title}, ${axis.unit}`;
