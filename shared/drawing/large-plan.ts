import type { UnitSystem } from '../contract/design-basis.ts';
import type { SectionInput } from '../engine/section.ts';
import { formatQuantity } from '../print/format-quantity.ts';
import { calloutsOf } from './callouts.ts';
import type { SectionGeometry } from './section-geometry.ts';
import { spreadLabels } from './spread-labels.ts';

/** Where the section stands in the picture: its top left corner and pixels per mm. */
export interface Placement {
  readonly xPx: number;
  readonly yPx: number;
  readonly pxPerMm: number;
}

/** A line of the drawing as an SVG path, which paper draws too. */
export interface Stroke {
  readonly path: string;
  readonly tone: 'muted' | 'ink';
  readonly widthPx: number;
  readonly isAxis?: boolean;
}

/** A word or number of the drawing. `y` is the middle of its height where it is centred, its base line otherwise. */
export interface Label {
  readonly text: string;
  readonly xPx: number;
  readonly yPx: number;
  readonly anchor: 'start' | 'middle';
  readonly tone: 'steel' | 'ink';
  readonly isCentred: boolean;
  /** Turned to be read from the right, as on a drawing. */
  readonly isUpright: boolean;
}

/** A dimensioned section: where it stands, and every line and label around it, in the sheet's own pixels. */
export interface LargePlan {
  readonly at: Placement;
  readonly strokes: readonly Stroke[];
  readonly labels: readonly Label[];
}

/** The sheet the drawing is laid out on; page and paper scale the whole of it. */
export const LARGE_SHEET = { width: 340, height: 384, left: 66, right: 104, top: 26, bottom: 66 } as const;
/** Dash-dot, as the trade draws an axis. */
export const AXIS_DASH_PX = [9, 3, 1.5, 3] as const;
export const LABEL_SIZE_PX = 11;
const LABEL_PITCH_PX = 15;
/** Half length of the oblique stroke that ends a dimension. */
const TICK_PX = 3.5;

export function largePlan(section: SectionInput, geometry: SectionGeometry, units: UnitSystem): LargePlan {
  const at = place(geometry);
  const parts = [
    neutralAxis(geometry, at),
    ...dimensions(geometry, units, at),
    ...callouts(section, geometry, units, at),
  ];
  return {
    at,
    strokes: parts.flatMap(({ strokes }) => strokes),
    labels: parts.flatMap(({ labels }) => labels),
  };
}

interface Part {
  readonly strokes: readonly Stroke[];
  readonly labels: readonly Label[];
}

function place(geometry: SectionGeometry): Placement {
  const room = {
    width: LARGE_SHEET.width - LARGE_SHEET.left - LARGE_SHEET.right,
    height: LARGE_SHEET.height - LARGE_SHEET.top - LARGE_SHEET.bottom,
  };
  const pxPerMm = Math.min(room.width / geometry.widthMm, room.height / geometry.depthMm);
  return {
    pxPerMm,
    xPx: LARGE_SHEET.left + (room.width - geometry.widthMm * pxPerMm) / 2,
    yPx: LARGE_SHEET.top + (room.height - geometry.depthMm * pxPerMm) / 2,
  };
}

function neutralAxis(geometry: SectionGeometry, at: Placement): Part {
  if (geometry.neutralAxisMm === null) return { strokes: [], labels: [] };
  const y = at.yPx + geometry.neutralAxisMm * at.pxPerMm;
  const path = `M ${at.xPx - 8} ${y} H ${at.xPx + geometry.widthMm * at.pxPerMm + 18}`;
  return { strokes: [{ path, tone: 'ink', widthPx: 1, isAxis: true }], labels: [] };
}

function callouts(
  section: SectionInput,
  geometry: SectionGeometry,
  units: UnitSystem,
  at: Placement,
): Part[] {
  const named = calloutsOf(section, geometry, units);
  const labelX = at.xPx + geometry.widthMm * at.pxPerMm + 22;
  const ys = spreadLabels(
    named.map((callout) => at.yPx + callout.yMm * at.pxPerMm),
    LABEL_PITCH_PX,
    { low: LARGE_SHEET.top, high: LARGE_SHEET.height - LARGE_SHEET.bottom },
  );
  return named.map(({ text, tone, xMm, yMm }, k) => {
    const y = at.yPx + yMm * at.pxPerMm;
    const labelY = ys[k] ?? y;
    const path = `M ${at.xPx + xMm * at.pxPerMm} ${y} H ${labelX - 12} L ${labelX - 3} ${labelY}`;
    return {
      strokes: tone === 'steel' ? [{ path, tone: 'muted', widthPx: 0.8 }] : [],
      labels: [{ text, xPx: labelX, yPx: labelY, anchor: 'start', tone, isCentred: true, isUpright: false }],
    };
  });
}

function dimensions(geometry: SectionGeometry, units: UnitSystem, at: Placement): Part[] {
  const s = at.pxPerMm;
  const length = (mm: number, digits = 4) => formatQuantity(mm, 'length', units, { hideUnit: true, digits });
  const bottom = at.yPx + geometry.depthMm * s;
  const right = at.xPx + geometry.widthMm * s;
  const row = geometry.rows.find((candidate) => candidate.face === 'tension' && candidate.layer === 0);
  const gaps = row?.clearGaps ?? [];
  const least = Math.min(...gaps.map((gap) => gap.toMm - gap.fromMm));
  const d = geometry.effectiveDepthMm;
  const stops = gaps.flatMap((gap) => [at.xPx + gap.fromMm * s, at.xPx + gap.toMm * s]);
  return [
    heightDimension([at.yPx, bottom], at.xPx - 42, `h ${length(geometry.depthMm)}`),
    ...(d === null ? [] : [heightDimension([at.yPx, at.yPx + d * s], at.xPx - 16, `d ${length(d)}`)]),
    ...(gaps.length === 0
      ? []
      : [gapChain(stops, bottom + 12, `clear ${length(least, 3)}${gaps.length > 1 ? ' each' : ''}`)]),
    ...(geometry.coverMm > 0
      ? [
          edgeDimension(
            [at.xPx, at.xPx + geometry.coverMm * s],
            at.yPx - 8,
            `cover ${length(geometry.coverMm)}`,
          ),
        ]
      : []),
    widthDimension([at.xPx, right], bottom + (gaps.length > 0 ? 40 : 16), `b ${length(geometry.widthMm)}`),
  ];
}

type Span = readonly [fromPx: number, toPx: number];
const tick = (x: number, y: number) => `M ${x - TICK_PX} ${y + TICK_PX} L ${x + TICK_PX} ${y - TICK_PX}`;
const muted = (path: string): readonly Stroke[] => [{ path, tone: 'muted', widthPx: 1 }];
const INK = { anchor: 'middle', tone: 'ink', isCentred: false, isUpright: false } as const;

/** A measure along x, its number under the line. */
const widthDimension = ([from, to]: Span, atPx: number, text: string): Part => ({
  strokes: muted(`M ${from} ${atPx} H ${to} ${tick(from, atPx)} ${tick(to, atPx)}`),
  labels: [{ ...INK, text, xPx: (from + to) / 2, yPx: atPx + 14 }],
});

/** A short measure at an edge, too short to write over: its number stands behind it. */
const edgeDimension = ([from, to]: Span, atPx: number, text: string): Part => ({
  strokes: muted(`M ${from} ${atPx} H ${to} ${tick(from, atPx)} ${tick(to, atPx)}`),
  labels: [{ ...INK, text, xPx: to + 7, yPx: atPx, anchor: 'start', isCentred: true }],
});

const heightDimension = ([from, to]: Span, atPx: number, text: string): Part => ({
  strokes: muted(`M ${atPx} ${from} V ${to} ${tick(atPx, from)} ${tick(atPx, to)}`),
  labels: [{ ...INK, text, xPx: atPx - 5, yPx: (from + to) / 2, isUpright: true }],
});

/** Several measures in a row between the same two faces, under one shared number. */
const gapChain = (stops: readonly number[], atPx: number, text: string): Part => ({
  strokes: muted(
    `M ${stops[0]} ${atPx} H ${stops.at(-1)} ${stops.map((stop) => `M ${stop} ${atPx - 4} v 8`).join(' ')}`,
  ),
  labels: [{ ...INK, text, xPx: (stops[0]! + stops.at(-1)!) / 2, yPx: atPx + 15 }],
});
