import { tickStep, type AxisExtent } from './axis-extent.ts';

/** How a measure is laid along an axis: in the unit it is read in, or by the logarithm of that. */
export interface AxisScale {
  readonly perSi: number;
  readonly isLog: boolean;
}

/** Stored value → place along the axis. What is not above zero has no place on a logarithmic one (NaN). */
export function toPlot({ perSi, isLog }: AxisScale, si: number): number {
  const shown = si * perSi;
  if (!isLog) return shown;
  return shown > 0 ? Math.log10(shown) : Number.NaN;
}

export const fromPlot = ({ perSi, isLog }: AxisScale, place: number): number =>
  (isLog ? 10 ** place : place) / perSi;

/** What is printed at a place along the axis. */
export const shownAt = ({ isLog }: Pick<AxisScale, 'isLog'>, place: number): number =>
  isLog ? 10 ** place : place;

/** A tick at the very end of an axis is one, whatever its last digit. */
const END_SLACK = 1e-9;

function multiples(low: number, high: number, step: number): number[] {
  const slack = (high - low) * END_SLACK;
  const first = Math.ceil((low - slack) / step);
  const last = Math.floor((high + slack) / step);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, k) =>
    Number(((first + k) * step).toPrecision(12)),
  );
}

/** 1, 2 and 5 in every decade between two values. */
function decadeTicks(low: number, high: number): number[] {
  const from = Math.floor(Math.log10(low));
  const decades = Math.ceil(Math.log10(high)) - from + 1;
  return Array.from({ length: decades }, (_, k) => [1, 2, 5].map((lead) => lead * 10 ** (from + k)))
    .flat()
    .filter((value) => value >= low * (1 - END_SLACK) && value <= high * (1 + END_SLACK));
}

/** Fewer ticks than this and a logarithmic axis is divided evenly, as between 70 and 100. */
const LEAST_DECADE_TICKS = 4;

/** Places of the ticks. An extent with a step is divided by it; any other by 1, 2 or 5 times a power of ten. */
export function plotTicks(extent: AxisExtent, isLog: boolean, tickCount: number): number[] {
  const { min, max, step } = extent;
  if (!isLog) return multiples(min, max, step > 0 ? step : tickStep(max - min, tickCount));
  const [low, high] = [10 ** min, 10 ** max];
  const decades = decadeTicks(low, high);
  const values =
    decades.length >= LEAST_DECADE_TICKS ? decades : multiples(low, high, tickStep(high - low, tickCount));
  return values.map((value) => Math.log10(value));
}
