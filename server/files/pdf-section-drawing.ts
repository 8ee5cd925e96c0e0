import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { outlinePath } from '#shared/drawing/concrete-outline.ts';
import { hookPath } from '#shared/drawing/hook-path.ts';
import { AXIS_DASH_PX, LABEL_SIZE_PX, largePlan } from '#shared/drawing/large-plan.ts';
import type { Placement } from '#shared/drawing/placement.ts';
import type { Label } from '#shared/drawing/plan-part.ts';
import type { SectionGeometry, StirrupOutline } from '#shared/drawing/section-geometry.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { PDF_COLOURS, type PdfFlow } from './pdf-flow.ts';

interface Drawn {
  readonly section: SectionInput;
  readonly geometry: SectionGeometry;
  readonly units: UnitSystem;
}

/** The section as the engine placed it, to scale, in lines and circles: `scale` points for one pixel of its plan. */
export function drawSection(
  flow: PdfFlow,
  { section, geometry, units }: Drawn,
  box: { readonly xPt: number; readonly yPt: number; readonly scale: number },
): void {
  const { doc } = flow;
  const { at, strokes, labels } = largePlan(section, geometry, units);
  doc.save().translate(box.xPt, box.yPt).scale(box.scale);
  drawBody(doc, geometry, at);
  for (const { path, tone, widthPx, isAxis } of strokes) {
    doc.path(path).lineWidth(widthPx).strokeColor(PDF_COLOURS[tone]);
    if (isAxis) doc.dash(AXIS_DASH_PX[0], { space: AXIS_DASH_PX[1] });
    doc.stroke().undash();
  }
  for (const label of labels) drawLabel(flow, label);
  doc.restore();
}

function drawBody(doc: PDFKit.PDFDocument, geometry: SectionGeometry, at: Placement): void {
  const s = at.pxPerMm;
  doc
    .path(outlinePath(geometry.outline, at))
    .lineWidth(1)
    .fillAndStroke(PDF_COLOURS.concrete, PDF_COLOURS.concreteEdge);
  if (geometry.stirrup !== null) drawStirrup(doc, geometry.stirrup, at);
  for (const bar of geometry.bars)
    doc.circle(at.xPx + bar.xMm * s, at.yPx + bar.yMm * s, bar.radiusMm * s).fill(PDF_COLOURS.steel);
  for (const bar of geometry.skinBars)
    doc
      .circle(at.xPx + bar.xMm * s, at.yPx + bar.yMm * s, bar.radiusMm * s)
      .lineWidth(Math.max(bar.radiusMm * s * 0.5, 0.8))
      .fillAndStroke(PDF_COLOURS.concrete, PDF_COLOURS.steel);
  for (const band of geometry.bands)
    doc
      .rect(at.xPx + band.xMm * s, at.yPx + band.yMm * s, band.widthMm * s, Math.max(band.heightMm * s, 1))
      .fill(PDF_COLOURS.steel);
}

function drawStirrup(doc: PDFKit.PDFDocument, stirrup: StirrupOutline, at: Placement): void {
  const s = at.pxPerMm;
  const top = at.yPx + stirrup.yMm * s;
  doc
    .lineWidth(Math.max(stirrup.legThicknessMm * s, 1))
    .strokeColor(PDF_COLOURS.steel)
    .strokeOpacity(0.8);
  doc
    .roundedRect(
      at.xPx + stirrup.xMm * s,
      top,
      stirrup.widthMm * s,
      stirrup.heightMm * s,
      stirrup.cornerRadiusMm * s,
    )
    .stroke();
  for (const legMm of stirrup.innerLegsMm)
    doc
      .moveTo(at.xPx + legMm * s, top)
      .lineTo(at.xPx + legMm * s, top + stirrup.heightMm * s)
      .stroke();
  doc.path(hookPath(stirrup, at)).stroke().strokeOpacity(1);
}

/** Share of the size by which a centred label's base line lies below its middle. */
const MIDDLE_TO_BASELINE = 0.36;

function drawLabel(flow: PdfFlow, { text, xPx, yPx, anchor, tone, isCentred, isUpright }: Label): void {
  const { doc } = flow;
  const style = { sizePt: LABEL_SIZE_PX, colour: tone };
  const shift = anchor === 'middle' ? flow.measure(text, style) / 2 : 0;
  const baseline = isCentred ? yPx + MIDDLE_TO_BASELINE * LABEL_SIZE_PX : yPx;
  doc.save();
  if (isUpright) doc.rotate(-90, { origin: [xPx, yPx] });
  flow.write(text, xPx - shift, baseline, style);
  doc.restore();
}
