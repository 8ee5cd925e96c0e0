import {
  DxfWriter,
  LWPolylineFlags,
  point2d,
  point3d,
  TextHorizontalAlignment,
  TextVerticalAlignment,
  Units,
} from '@tarikjabiri/dxf';
import { hookPath } from '#shared/drawing/hook-path.ts';
import { LABEL_SIZE_PX, largePlan } from '#shared/drawing/large-plan.ts';
import { pathLines } from '#shared/drawing/path-lines.ts';
import type { Label, Stroke } from '#shared/drawing/plan-part.ts';
import type { SectionGeometry, StirrupOutline } from '#shared/drawing/section-geometry.ts';
import { MM_PER_IN } from '#shared/engine/units.ts';
import type { LargeDrawingProps } from './large-drawing.tsx';

/** Layers by what is on them, with their colours of the AutoCAD colour index. */
export const DXF_LAYERS = {
  concrete: { name: 'CONCRETE', colour: 8 },
  bars: { name: 'BARS', colour: 1 },
  stirrups: { name: 'STIRRUPS', colour: 3 },
  dimensions: { name: 'DIMENSIONS', colour: 7 },
  axis: { name: 'NEUTRAL-AXIS', colour: 4 },
  notes: { name: 'NOTES', colour: 7 },
} as const;
type Layer = keyof typeof DXF_LAYERS;

/** tan(90°/4): how far a polyline's segment bulges to be a quarter of a circle. */
const QUARTER_BULGE = Math.tan(Math.PI / 8);
/** Older readers take plain ASCII only; this escape is read by all. */
const plain = (text: string): string =>
  text.replace(
    /[^\x20-\x7e]/g,
    (letter) => `\\U+${letter.charCodeAt(0).toString(16).toUpperCase().padStart(4, '0')}`,
  );

interface Corner {
  readonly xMm: number;
  readonly yMm: number;
  readonly bulge?: number;
}

/** Draws in the unit of the file, from the top left corner of the section, with y upwards as drawings have it. */
class SectionDxf {
  private readonly dxf = new DxfWriter();
  private readonly perMm: number;

  constructor(units: LargeDrawingProps['units']) {
    this.perMm = units === 'us' ? 1 / MM_PER_IN : 1;
    this.dxf.setUnits(units === 'us' ? Units.Inches : Units.Millimeters);
    this.dxf.setVariable('$MEASUREMENT', { 70: units === 'us' ? 0 : 1 });
    this.dxf.setVariable('$LASTSAVEDBY', { 1: 'Fairweight' });
    this.dxf.addLType(
      'CENTER',
      'Center ____ _ ____',
      [1.25, -0.25, 0.25, -0.25].map((part) => part * 40 * this.perMm),
    );
    for (const [layer, { name, colour }] of Object.entries(DXF_LAYERS))
      this.dxf.addLayer(name, colour, layer === 'axis' ? 'CENTER' : 'Continuous');
  }

  finish = (): string => this.dxf.stringify();

  outline(corners: readonly Corner[], layer: Layer, isClosed = true): void {
    const { perMm } = this;
    this.dxf.addLWPolyline(
      corners.map(({ xMm, yMm, bulge = 0 }) => ({ point: point2d(xMm * perMm, -yMm * perMm), bulge })),
      { layerName: DXF_LAYERS[layer].name, flags: isClosed ? LWPolylineFlags.Closed : LWPolylineFlags.None },
    );
  }

  circle({ xMm, yMm, radiusMm }: SectionGeometry['bars'][number], layer: Layer): void {
    const { perMm } = this;
    this.dxf.addCircle(point3d(xMm * perMm, -yMm * perMm), radiusMm * perMm, {
      layerName: DXF_LAYERS[layer].name,
    });
  }

  text(
    value: string,
    xMm: number,
    yMm: number,
    { heightMm, isMiddle = false, isCentred = false, isUpright = false, layer }: TextStyle,
  ): void {
    const at = point3d(xMm * this.perMm, -yMm * this.perMm);
    this.dxf.addText(at, heightMm * this.perMm, plain(value), {
      layerName: DXF_LAYERS[layer].name,
      rotation: isUpright ? 90 : 0,
      horizontalAlignment: isMiddle ? TextHorizontalAlignment.Center : TextHorizontalAlignment.Left,
      verticalAlignment: isCentred ? TextVerticalAlignment.Middle : TextVerticalAlignment.BaseLine,
      secondAlignmentPoint: at,
    });
  }
}

interface TextStyle {
  readonly heightMm: number;
  readonly layer: Layer;
  readonly isMiddle?: boolean;
  readonly isCentred?: boolean;
  readonly isUpright?: boolean;
}

interface Box {
  readonly xMm: number;
  readonly yMm: number;
  readonly widthMm: number;
  readonly heightMm: number;
}

/** A rectangle with round corners, clockwise as drawn on screen, which turns the other way up here. */
function roundedCorners({ xMm: x, yMm: y, widthMm: width, heightMm: height }: Box, radius: number): Corner[] {
  const [right, bottom, bulge] = [x + width, y + height, -QUARTER_BULGE];
  return [
    { xMm: x + radius, yMm: y },
    { xMm: right - radius, yMm: y, bulge },
    { xMm: right, yMm: y + radius },
    { xMm: right, yMm: bottom - radius, bulge },
    { xMm: right - radius, yMm: bottom },
    { xMm: x + radius, yMm: bottom, bulge },
    { xMm: x, yMm: bottom - radius },
    { xMm: x, yMm: y + radius, bulge },
  ];
}

/** Both edges of the closed stirrup, its inner legs, and the centre lines of its hook. */
function drawStirrup(dxf: SectionDxf, stirrup: StirrupOutline): void {
  const half = stirrup.legThicknessMm / 2;
  for (const out of [half, -half])
    dxf.outline(
      roundedCorners(
        {
          xMm: stirrup.xMm - out,
          yMm: stirrup.yMm - out,
          widthMm: stirrup.widthMm + 2 * out,
          heightMm: stirrup.heightMm + 2 * out,
        },
        Math.max(0, stirrup.cornerRadiusMm + out),
      ),
      'stirrups',
    );
  for (const legMm of stirrup.innerLegsMm)
    for (const xMm of [legMm - half, legMm + half])
      dxf.outline(
        [
          { xMm, yMm: stirrup.yMm + half },
          { xMm, yMm: stirrup.yMm + stirrup.heightMm - half },
        ],
        'stirrups',
        false,
      );
  for (const line of pathLines(hookPath(stirrup, { xPx: 0, yPx: 0, pxPerMm: 1 })))
    dxf.outline(
      line.map(({ x, y }) => ({ xMm: x, yMm: y })),
      'stirrups',
      false,
    );
}

/**
 * The section with its dimensions and callouts as a DXF file: the drawing of the page, to scale, in inches or millimetres
 * of the real thing, on layers of its own. `notes` are written below it.
 */
export function sectionDxf(
  { section, geometry, units }: LargeDrawingProps,
  notes: readonly string[],
): string {
  const dxf = new SectionDxf(units);
  const { at, strokes, labels } = largePlan(section, geometry, units);
  const toMm = (px: number) => px / at.pxPerMm;
  const heightMm = toMm(LABEL_SIZE_PX * 0.8);
  dxf.outline(geometry.outline, 'concrete');
  if (geometry.fits && geometry.stirrup !== null) drawStirrup(dxf, geometry.stirrup);
  for (const bar of [...geometry.bars, ...geometry.skinBars]) dxf.circle(bar, 'bars');
  for (const band of geometry.bands) dxf.outline(roundedCorners(band, 0), 'bars');
  const place = (x: number, y: number): Corner => ({ xMm: toMm(x - at.xPx), yMm: toMm(y - at.yPx) });
  const drawStroke = ({ path, isAxis }: Stroke) => {
    for (const line of pathLines(path))
      dxf.outline(
        line.map(({ x, y }) => place(x, y)),
        isAxis ? 'axis' : 'dimensions',
        false,
      );
  };
  const drawLabel = ({ text, xPx, yPx, anchor, isCentred, isUpright }: Label) => {
    const { xMm, yMm } = place(xPx, yPx);
    dxf.text(text, xMm, yMm, {
      heightMm,
      isMiddle: anchor === 'middle',
      isCentred,
      isUpright,
      layer: 'dimensions',
    });
  };
  strokes.forEach(drawStroke);
  labels.forEach(drawLabel);
  const below = geometry.depthMm + toMm(70);
  notes.forEach((note, i) =>
    dxf.text(note, Math.min(0, geometry.leftMm), below + i * heightMm * 1.7, { heightMm, layer: 'notes' }),
  );
  return dxf.finish();
}
