import { outlinePath } from '#shared/drawing/concrete-outline.ts';
import { hookPath } from '#shared/drawing/hook-path.ts';
import { AXIS_DASH_PX, LABEL_SIZE_PX, LARGE_SHEET, largePlan } from '#shared/drawing/large-plan.ts';
import type { Placement } from '#shared/drawing/placement.ts';
import type { Label, Stroke } from '#shared/drawing/plan-part.ts';
import type { SectionGeometry } from '#shared/drawing/section-geometry.ts';
import { PAPER_COLOURS } from '#client/src/lib/paper-colours.ts';
import { escapeXml, svgText } from '#client/src/lib/svg-text.ts';
import type { LargeDrawingProps } from './large-drawing.tsx';

const NOTE_PITCH_PX = 14;
const NOTE_SIZE_PX = 9;

const attributes = (pairs: Readonly<Record<string, string | number | undefined>>): string =>
  Object.entries(pairs)
    .filter(([, value]) => value !== undefined)
    .map(
      ([name, value]) =>
        ` ${name}="${typeof value === 'number' ? Number(value.toFixed(3)) : escapeXml(value!)}"`,
    )
    .join('');
const tag = (name: string, pairs: Readonly<Record<string, string | number | undefined>>): string =>
  `<${name}${attributes(pairs)}/>`;

function steel(geometry: SectionGeometry, at: Placement): string[] {
  const s = at.pxPerMm;
  const circle = ({ xMm, yMm, radiusMm }: SectionGeometry['bars'][number], look: object) =>
    tag('circle', { cx: at.xPx + xMm * s, cy: at.yPx + yMm * s, r: radiusMm * s, ...look });
  return [
    ...geometry.bars.map((bar) => circle(bar, { fill: PAPER_COLOURS.steel })),
    ...geometry.skinBars.map((bar) =>
      circle(bar, {
        fill: PAPER_COLOURS.concrete,
        stroke: PAPER_COLOURS.steel,
        'stroke-width': Math.max(bar.radiusMm * s * 0.5, 0.8),
      }),
    ),
    ...geometry.bands.map(({ xMm, yMm, widthMm, heightMm }) =>
      tag('rect', {
        x: at.xPx + xMm * s,
        y: at.yPx + yMm * s,
        width: widthMm * s,
        height: Math.max(heightMm * s, 1.5),
        fill: PAPER_COLOURS.steel,
      }),
    ),
  ];
}

function stirrups({ stirrup, fits }: SectionGeometry, at: Placement): string[] {
  if (stirrup === null || !fits) return [];
  const s = at.pxPerMm;
  const top = at.yPx + stirrup.yMm * s;
  const look = {
    fill: 'none',
    stroke: PAPER_COLOURS.steel,
    'stroke-width': Math.max(stirrup.legThicknessMm * s, 1),
    opacity: 0.8,
  };
  return [
    tag('rect', {
      x: at.xPx + stirrup.xMm * s,
      y: top,
      width: stirrup.widthMm * s,
      height: stirrup.heightMm * s,
      rx: stirrup.cornerRadiusMm * s,
      ...look,
    }),
    ...stirrup.innerLegsMm.map((legMm) =>
      tag('path', { d: `M ${at.xPx + legMm * s} ${top} v ${stirrup.heightMm * s}`, ...look }),
    ),
    tag('path', { d: hookPath(stirrup, at), ...look }),
  ];
}

const drawnStroke = ({ path, tone, widthPx, isAxis }: Stroke): string =>
  tag('path', {
    d: path,
    fill: 'none',
    stroke: PAPER_COLOURS[tone],
    'stroke-width': widthPx,
    'stroke-dasharray': isAxis ? AXIS_DASH_PX.join(' ') : undefined,
  });

const drawnLabel = ({ text, xPx, yPx, anchor, tone, isCentred, isUpright }: Label): string =>
  svgText(text, {
    x: xPx,
    y: yPx,
    sizePx: LABEL_SIZE_PX,
    fill: PAPER_COLOURS[tone],
    face: 'numbers',
    anchor,
    isCentred,
    ...(isUpright ? { turn: `rotate(-90 ${xPx} ${yPx})` } : {}),
  });

/** The drawing of the page as a picture that stands by itself: on white paper whatever the screen's, with `notes` below. */
export function sectionSvg(
  { section, geometry, units }: LargeDrawingProps,
  notes: readonly string[],
): string {
  const { at, strokes, labels } = largePlan(section, geometry, units);
  const height = LARGE_SHEET.height + 8 + notes.length * NOTE_PITCH_PX;
  const body = [
    tag('rect', { width: LARGE_SHEET.width, height, fill: PAPER_COLOURS.paper }),
    tag('path', {
      d: outlinePath(geometry.outline, at),
      fill: geometry.fits ? PAPER_COLOURS.concrete : 'none',
      stroke: PAPER_COLOURS.concreteEdge,
      'stroke-width': 1,
      'stroke-dasharray': geometry.fits ? undefined : '4 3',
    }),
    ...stirrups(geometry, at),
    ...steel(geometry, at),
    ...strokes.map(drawnStroke),
    ...labels.map(drawnLabel),
    ...notes.map((note, i) =>
      svgText(note, {
        x: 8,
        y: LARGE_SHEET.height + (i + 1) * NOTE_PITCH_PX - 4,
        sizePx: NOTE_SIZE_PX,
        fill: PAPER_COLOURS.muted,
        face: 'words',
      }),
    ),
  ];
  return `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${LARGE_SHEET.width} ${height}" width="${2 * LARGE_SHEET.width}" height="${2 * height}">${body.join('')}</svg>`;
}
