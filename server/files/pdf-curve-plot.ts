import { CURVE_SHEET, curvePlan, type CurvePlan, type CurvePlanInput } from '#shared/drawing/curve-plan.ts';
import { PDF_COLOURS, type PdfColour, type PdfFlow } from './pdf-flow.ts';

const RIGHT = CURVE_SHEET.width - CURVE_SHEET.right;
const BOTTOM = CURVE_SHEET.height - CURVE_SHEET.bottom;
const TICK_PX = 5;
const LABEL_PX = 11;
const DOT_PX = 3.2;
/** Share of the size by which a base line lies below the middle of a figure. */
const MIDDLE_TO_BASELINE = 0.35;

/** A moment–curvature plot in lines, circles and text: `scale` points for one pixel of its plan. */
export function drawCurvePlot(
  flow: PdfFlow,
  input: CurvePlanInput,
  box: { readonly xPt: number; readonly yPt: number; readonly scale: number },
): void {
  const plan = curvePlan(input);
  flow.doc.save().translate(box.xPt, box.yPt).scale(box.scale);
  drawAxes(flow, plan);
  for (const { yPx, text } of plan.levels) {
    stroke(flow, `M ${CURVE_SHEET.left} ${yPx} H ${RIGHT}`, { colour: 'muted', widthPx: 0.8, dash: [1, 3] });
    write(flow, text, { xPx: RIGHT, yPx: yPx + 12, align: 'end' });
  }
  for (const curve of plan.curves) drawCurve(flow, curve);
  flow.doc.restore();
}

function drawAxes(flow: PdfFlow, { xTicks, yTicks, xTitle, yTitle }: CurvePlan): void {
  const ruler = [
    `M ${CURVE_SHEET.left} ${CURVE_SHEET.top - 8} V ${BOTTOM} H ${RIGHT}`,
    ...xTicks.map(({ atPx }) => `M ${atPx} ${BOTTOM} v ${TICK_PX}`),
    ...yTicks.map(({ atPx }) => `M ${CURVE_SHEET.left} ${atPx} h ${-TICK_PX}`),
  ];
  for (const path of ruler) stroke(flow, path, { colour: 'ink', widthPx: 0.9 });
  for (const { atPx, text } of xTicks)
    write(flow, text, { xPx: atPx, yPx: BOTTOM + TICK_PX + LABEL_PX, align: 'middle' });
  for (const { atPx, text } of yTicks)
    write(flow, text, {
      xPx: CURVE_SHEET.left - TICK_PX - 4,
      yPx: atPx + MIDDLE_TO_BASELINE * LABEL_PX,
      align: 'end',
    });
  write(flow, xTitle, { xPx: RIGHT, yPx: CURVE_SHEET.height - 6, align: 'end' });
  write(flow, yTitle, { xPx: 8, yPx: 12, align: 'start' });
}

function drawCurve(flow: PdfFlow, { path, twoLines, dots, numbers }: CurvePlan['curves'][number]): void {
  if (twoLines !== null) stroke(flow, twoLines, { colour: 'steel', widthPx: 1, dash: [5, 3] });
  stroke(flow, path, { colour: 'ink', widthPx: 1.5 });
  for (const { xPx, yPx } of dots)
    flow.doc.circle(xPx, yPx, DOT_PX).lineWidth(1.3).fillAndStroke('#ffffff', PDF_COLOURS.ink);
  for (const { xPx, yPx, text } of numbers) write(flow, text, { xPx, yPx, align: 'middle', isBold: true });
}

interface StrokeStyle {
  readonly colour: PdfColour;
  readonly widthPx: number;
  readonly dash?: readonly [number, number];
}

function stroke({ doc }: PdfFlow, path: string, { colour, widthPx, dash }: StrokeStyle): void {
  doc.path(path).lineWidth(widthPx).strokeColor(PDF_COLOURS[colour]);
  if (dash) doc.dash(dash[0], { space: dash[1] });
  doc.stroke().undash();
}

interface Written {
  readonly xPx: number;
  /** Base line. */
  readonly yPx: number;
  readonly align: 'start' | 'middle' | 'end';
  readonly isBold?: boolean;
}

function write(flow: PdfFlow, text: string, { xPx, yPx, align, isBold = false }: Written): void {
  const style = {
    sizePt: LABEL_PX,
    font: isBold ? 'bold' : 'plain',
    colour: isBold ? 'ink' : 'muted',
  } as const;
  const width = flow.measure(text, style);
  flow.write(text, xPx - (align === 'start' ? 0 : align === 'middle' ? width / 2 : width), yPx, style);
}
