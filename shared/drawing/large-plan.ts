import type { UnitSystem } from '../contract/design-basis.ts';
import type { SectionInput } from '../engine/section.ts';
import { formatQuantity } from '../print/format-quantity.ts';
import { calloutsOf } from './callouts.ts';
import {
  edgeDimension,
  gapChain,
  heightDimension,
  shortHeightDimension,
  widthDimension,
} from './dimension-lines.ts';
import type { Placement } from './placement.ts';
import type { Label, Part, Stroke } from './plan-part.ts';
import { drawnDepth, type SectionGeometry } from './section-geometry.ts';
import { spreadLabels } from './spread-labels.ts';

/** A dimensioned section: where it stands, and every line and label around it, in the sheet's own pixels. */
export interface LargePlan {
  readonly at: Placement;
  readonly strokes: readonly Stroke[];
  readonly labels: readonly Label[];
}

/** The sheet the drawing is laid out on; page and paper scale the whole of it. */
export const LARGE_SHEET = { width: 340, height: 384, left: 66, right: 104, top: 26, bottom: 66 } as const;
/** Room above a slab for its width and, in hogging, for the gaps between the bars in it. */
const TOP_OVER_SLAB_PX = 58;
/** Room to the right of a slab for its thickness. */
const BESIDE_SLAB_PX = 66;
/** Dash-dot, as the trade draws an axis. */
export const AXIS_DASH_PX = [9, 3, 1.5, 3] as const;
export const LABEL_SIZE_PX = 11;
const LABEL_PITCH_PX = 15;
/** Below the soffit of a slab, callouts have room beside the web. */
const UNDER_SLAB_PX = 13;

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

const topRoomPx = ({ flange }: SectionGeometry) => (flange === null ? LARGE_SHEET.top : TOP_OVER_SLAB_PX);

/** As large as the sheet allows: callouts stand beside the web, under the slab where there is one. */
function place(geometry: SectionGeometry): Placement {
  const { widthMm, depthMm, leftMm, rightMm } = geometry;
  const inner = LARGE_SHEET.width - LARGE_SHEET.left;
  const top = topRoomPx(geometry);
  const height = LARGE_SHEET.height - top - LARGE_SHEET.bottom;
  const pxPerMm = Math.min(
    (inner - LARGE_SHEET.right) / (widthMm - leftMm),
    (inner - BESIDE_SLAB_PX) / (rightMm - leftMm),
    height / depthMm,
  );
  const drawnPx = Math.max(
    (widthMm - leftMm) * pxPerMm + LARGE_SHEET.right,
    (rightMm - leftMm) * pxPerMm + (geometry.flange === null ? 0 : BESIDE_SLAB_PX),
  );
  return {
    pxPerMm,
    xPx: LARGE_SHEET.left - leftMm * pxPerMm + (inner - drawnPx) / 2,
    yPx: top + (height - depthMm * pxPerMm) / 2,
  };
}

function neutralAxis(geometry: SectionGeometry, at: Placement): Part {
  const { neutralAxisMm, flange, leftMm, rightMm, widthMm } = geometry;
  if (neutralAxisMm === null) return { strokes: [], labels: [] };
  const yMm = drawnDepth(geometry, neutralAxisMm);
  const y = at.yPx + yMm * at.pxPerMm;
  const isInSlab = flange !== null && yMm <= flange.thicknessMm;
  const [from, to] = isInSlab
    ? [at.xPx + leftMm * at.pxPerMm - 6, at.xPx + rightMm * at.pxPerMm + 6]
    : [at.xPx - 8, at.xPx + widthMm * at.pxPerMm + 18];
  return { strokes: [{ path: `M ${from} ${y} H ${to}`, tone: 'ink', widthPx: 1, isAxis: true }], labels: [] };
}

function callouts(
  section: SectionInput,
  geometry: SectionGeometry,
  units: UnitSystem,
  at: Placement,
): Part[] {
  const named = calloutsOf(section, geometry, units);
  const labelX = at.xPx + geometry.widthMm * at.pxPerMm + 22;
  const { flange } = geometry;
  const underSlab = at.yPx + (flange?.thicknessMm ?? 0) * at.pxPerMm + UNDER_SLAB_PX;
  const ys = spreadLabels(
    named.map((callout) => at.yPx + callout.yMm * at.pxPerMm),
    LABEL_PITCH_PX,
    {
      low: flange === null ? LARGE_SHEET.top : underSlab,
      high: LARGE_SHEET.height - LARGE_SHEET.bottom,
    },
  );
  return named.map(({ text, tone, xMm, yMm }, k) => {
    const y = at.yPx + yMm * at.pxPerMm;
    const labelY = ys[k] ?? y;
    const path = `M ${at.xPx + xMm * at.pxPerMm} ${y} H ${labelX - 12} L ${labelX - 3} ${labelY}`;
    const isLed = tone === 'steel' || Math.abs(labelY - y) > LABEL_PITCH_PX;
    return {
      strokes: isLed ? [{ path, tone: 'muted', widthPx: 0.8 }] : [],
      labels: [{ text, xPx: labelX, yPx: labelY, anchor: 'start', tone, isCentred: true, isUpright: false }],
    };
  });
}

function dimensions(geometry: SectionGeometry, units: UnitSystem, at: Placement): Part[] {
  const { widthMm, depthMm, flange } = geometry;
  const x = (mm: number) => at.xPx + mm * at.pxPerMm;
  const y = (mm: number) => at.yPx + mm * at.pxPerMm;
  const length = (mm: number, digits = 4) => formatQuantity(mm, 'length', units, { hideUnit: true, digits });
  const d = geometry.effectiveDepthMm;
  const left = x(geometry.leftMm);
  const gaps = barGaps(geometry, at, length);
  const hasGapsBelow = gaps.length > 0 && !geometry.isHogging;
  const steelY = d === null ? 0 : y(drawnDepth(geometry, d));
  return [
    heightDimension([y(0), y(depthMm)], left - 42, `h ${length(depthMm)}`),
    ...(d === null ? [] : [heightDimension(depthSpan(geometry, y, steelY), left - 16, `d ${length(d)}`)]),
    ...gaps,
    ...cover(geometry, at, length),
    widthDimension(
      [x(0), x(widthMm)],
      y(depthMm) + (hasGapsBelow || flange !== null ? 40 : 16),
      `${flange === null ? 'b' : 'bw'} ${length(widthMm)}`,
      'below',
    ),
    ...slab(geometry, at, length),
  ];
}

/** d is measured from the compression face: from the top down, or in hogging from the bottom up. */
const depthSpan = (geometry: SectionGeometry, y: (mm: number) => number, steelY: number) =>
  geometry.isHogging ? ([steelY, y(geometry.depthMm)] as const) : ([y(0), steelY] as const);

type LengthText = (mm: number, digits?: number) => string;

/** Gaps of the tension bars nearest their face, beside that face. */
function barGaps(geometry: SectionGeometry, at: Placement, length: LengthText): Part[] {
  const row = geometry.rows.find((candidate) => candidate.face === 'tension' && candidate.layer === 0);
  const gaps = row?.clearGaps ?? [];
  if (gaps.length === 0) return [];
  const least = Math.min(...gaps.map((gap) => gap.toMm - gap.fromMm));
  const stops = gaps.flatMap((gap) => [gap.fromMm, gap.toMm].map((mm) => at.xPx + mm * at.pxPerMm));
  const text = `clear ${length(least, 3)}${gaps.length > 1 ? ' each' : ''}`;
  return geometry.isHogging
    ? [gapChain(stops, at.yPx - 11, text, 'above')]
    : [gapChain(stops, at.yPx + geometry.depthMm * at.pxPerMm + 12, text, 'below')];
}

/** At a corner of the web: on top of a rectangle, at the foot of a web under its slab. */
function cover(geometry: SectionGeometry, at: Placement, length: LengthText): Part[] {
  const { coverMm, widthMm, depthMm, flange } = geometry;
  if (coverMm <= 0) return [];
  const x = (mm: number) => at.xPx + mm * at.pxPerMm;
  const text = `cover ${length(coverMm)}`;
  return flange === null
    ? [edgeDimension([x(0), x(coverMm)], at.yPx - 8, text)]
    : [edgeDimension([x(widthMm - coverMm), x(widthMm)], at.yPx + depthMm * at.pxPerMm + 12, text)];
}

/** Width and thickness of the slab. */
function slab({ flange, isHogging, rows }: SectionGeometry, at: Placement, length: LengthText): Part[] {
  if (flange === null) return [];
  const left = at.xPx + flange.leftMm * at.pxPerMm;
  const right = at.xPx + flange.rightMm * at.pxPerMm;
  const soffit = at.yPx + flange.thicknessMm * at.pxPerMm;
  const above = at.yPx - (isHogging && rows.length > 0 ? 36 : 16);
  return [
    widthDimension([left, right], above, `bf ${length(flange.widthMm)}`, 'above'),
    shortHeightDimension([at.yPx, soffit], right + 12, `hf ${length(flange.thicknessMm)}`),
  ];
}
