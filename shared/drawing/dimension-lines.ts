import type { Label, Part, Stroke } from './plan-part.ts';

/** From one place to another along the measure, px. */
export type Span = readonly [fromPx: number, toPx: number];

/** Half length of the oblique stroke that ends a dimension. */
const TICK_PX = 3.5;
const INK = { anchor: 'middle', tone: 'ink', isCentred: false, isUpright: false } as const;

const tick = (x: number, y: number) => `M ${x - TICK_PX} ${y + TICK_PX} L ${x + TICK_PX} ${y - TICK_PX}`;
const muted = (path: string): readonly Stroke[] => [{ path, tone: 'muted', widthPx: 1 }];
const label = (text: string, xPx: number, yPx: number, more: Partial<Label> = {}): readonly Label[] => [
  { ...INK, text, xPx, yPx, ...more },
];

/** Whether the number stands above its line or below it. */
export type Side = 'above' | 'below';
const OFFSET_PX: Readonly<Record<Side, number>> = { above: -6, below: 14 };

/** A measure along x. */
export const widthDimension = ([from, to]: Span, atPx: number, text: string, side: Side): Part => ({
  strokes: muted(`M ${from} ${atPx} H ${to} ${tick(from, atPx)} ${tick(to, atPx)}`),
  labels: label(text, (from + to) / 2, atPx + OFFSET_PX[side]),
});

/** A short measure at an edge, too short to write over: its number stands behind it. */
export const edgeDimension = ([from, to]: Span, atPx: number, text: string): Part => ({
  strokes: muted(`M ${from} ${atPx} H ${to} ${tick(from, atPx)} ${tick(to, atPx)}`),
  labels: label(text, to + 7, atPx, { anchor: 'start', isCentred: true }),
});

/** A measure along y, its number read from the right. */
export const heightDimension = ([from, to]: Span, atPx: number, text: string): Part => ({
  strokes: muted(`M ${atPx} ${from} V ${to} ${tick(atPx, from)} ${tick(atPx, to)}`),
  labels: label(text, atPx - 5, (from + to) / 2, { isUpright: true }),
});

/** A measure along y too short to write along: its number stands to the right of it. */
export const shortHeightDimension = ([from, to]: Span, atPx: number, text: string): Part => ({
  strokes: muted(`M ${atPx} ${from} V ${to} ${tick(atPx, from)} ${tick(atPx, to)}`),
  labels: label(text, atPx + 7, (from + to) / 2, { anchor: 'start', isCentred: true }),
});

/** Several measures in a row between the same two faces, with one shared number. */
export const gapChain = (stops: readonly number[], atPx: number, text: string, side: Side): Part => ({
  strokes: muted(
    `M ${stops[0]} ${atPx} H ${stops.at(-1)} ${stops.map((stop) => `M ${stop} ${atPx - 4} v 8`).join(' ')}`,
  ),
  labels: label(text, (stops[0]! + stops.at(-1)!) / 2, atPx + (side === 'above' ? -7 : 15)),
});
