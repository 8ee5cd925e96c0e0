import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { AXIS_DASH_PX, LARGE_SHEET, largePlan } from '#shared/drawing/large-plan.ts';
import type { Label, Stroke } from '#shared/drawing/plan-part.ts';
import type { SectionGeometry } from '#shared/drawing/section-geometry.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { SectionBody } from './section-body.tsx';

export interface LargeDrawingProps {
  readonly section: SectionInput;
  readonly geometry: SectionGeometry;
  readonly units: UnitSystem;
}

function DrawnStroke({ path, tone, widthPx, isAxis }: Stroke) {
  return (
    <path
      d={path}
      className={tone === 'ink' ? 'fill-none stroke-ink' : 'fill-none stroke-muted'}
      strokeWidth={widthPx}
      strokeDasharray={isAxis ? AXIS_DASH_PX.join(' ') : undefined}
    />
  );
}

function DrawnLabel({ text, xPx, yPx, anchor, tone, isCentred, isUpright }: Label) {
  return (
    <text
      x={xPx}
      y={yPx}
      textAnchor={anchor}
      dominantBaseline={isCentred ? 'central' : undefined}
      transform={isUpright ? `rotate(-90 ${xPx} ${yPx})` : undefined}
      className={tone === 'steel' ? 'fill-steel' : 'fill-ink'}
    >
      {text}
    </text>
  );
}

/** One section with its dimensions and callouts, drawn to fit its sheet. */
export function LargeDrawing({ section, geometry, units }: LargeDrawingProps) {
  const { at, strokes, labels } = largePlan(section, geometry, units);
  return (
    <g className="font-mono text-[11px]">
      <SectionBody geometry={geometry} at={at} hasHooks />
      {strokes.map((stroke) => (
        <DrawnStroke key={stroke.path} {...stroke} />
      ))}
      {labels.map((label) => (
        <DrawnLabel key={`${label.text} ${label.xPx} ${label.yPx}`} {...label} />
      ))}
      {!geometry.fits && (
        <text
          x={at.xPx + (geometry.widthMm * at.pxPerMm) / 2}
          y={at.yPx + (geometry.depthMm * at.pxPerMm) / 2}
          textAnchor="middle"
          className="fill-fails font-sans text-[13px]"
        >
          does not fit
        </text>
      )}
    </g>
  );
}

export const LARGE_VIEW_BOX = `0 0 ${LARGE_SHEET.width} ${LARGE_SHEET.height}`;
