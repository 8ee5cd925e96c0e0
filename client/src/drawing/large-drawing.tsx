import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { calloutsOf } from '#shared/drawing/callouts.ts';
import { EdgeDimension, GapChain, HeightDimension, WidthDimension } from './dimension-line.tsx';
import { SectionBody, type Placement } from './section-body.tsx';
import type { SectionGeometry } from '#shared/drawing/section-geometry.ts';
import { spreadLabels } from '#shared/drawing/spread-labels.ts';

/** The sheet the drawing is laid out on, in its own pixels; the page scales the whole of it. */
const SHEET = { width: 340, height: 384, left: 66, right: 104, top: 26, bottom: 66 } as const;
const LABEL_PITCH_PX = 15;
/** Dash-dot, as the trade draws an axis. */
const AXIS_DASH = '9 3 1.5 3';

export interface LargeDrawingProps {
  readonly section: SectionInput;
  readonly geometry: SectionGeometry;
  readonly units: UnitSystem;
}

function place(geometry: SectionGeometry): Placement {
  const room = {
    width: SHEET.width - SHEET.left - SHEET.right,
    height: SHEET.height - SHEET.top - SHEET.bottom,
  };
  const pxPerMm = Math.min(room.width / geometry.widthMm, room.height / geometry.depthMm);
  return {
    pxPerMm,
    xPx: SHEET.left + (room.width - geometry.widthMm * pxPerMm) / 2,
    yPx: SHEET.top + (room.height - geometry.depthMm * pxPerMm) / 2,
  };
}

function Callouts({ section, geometry, units, at }: LargeDrawingProps & { readonly at: Placement }) {
  const callouts = calloutsOf(section, geometry, units);
  const labelX = at.xPx + geometry.widthMm * at.pxPerMm + 22;
  const ys = spreadLabels(
    callouts.map((callout) => at.yPx + callout.yMm * at.pxPerMm),
    LABEL_PITCH_PX,
    { low: SHEET.top, high: SHEET.height - SHEET.bottom },
  );
  return callouts.map((callout, k) => {
    const y = at.yPx + callout.yMm * at.pxPerMm;
    const labelY = ys[k] ?? y;
    return (
      <g key={`${callout.text} ${callout.yMm}`}>
        {callout.tone === 'steel' && (
          <path
            d={`M ${at.xPx + callout.xMm * at.pxPerMm} ${y} H ${labelX - 12} L ${labelX - 3} ${labelY}`}
            className="fill-none stroke-muted"
            strokeWidth={0.8}
          />
        )}
        <text
          x={labelX}
          y={labelY}
          dominantBaseline="central"
          className={callout.tone === 'steel' ? 'fill-steel' : 'fill-ink'}
        >
          {callout.text}
        </text>
      </g>
    );
  });
}

function NeutralAxis({ geometry, at }: { readonly geometry: SectionGeometry; readonly at: Placement }) {
  if (geometry.neutralAxisMm === null) return null;
  const y = at.yPx + geometry.neutralAxisMm * at.pxPerMm;
  return (
    <path
      d={`M ${at.xPx - 8} ${y} H ${at.xPx + geometry.widthMm * at.pxPerMm + 18}`}
      className="fill-none stroke-ink"
      strokeWidth={1}
      strokeDasharray={AXIS_DASH}
    />
  );
}

function Dimensions({
  geometry,
  units,
  at,
}: Omit<LargeDrawingProps, 'section'> & { readonly at: Placement }) {
  const s = at.pxPerMm;
  const length = (mm: number, digits = 4) => formatQuantity(mm, 'length', units, { hideUnit: true, digits });
  const bottom = at.yPx + geometry.depthMm * s;
  const row = geometry.rows.find((candidate) => candidate.face === 'tension' && candidate.layer === 0);
  const gaps = row?.clearGaps ?? [];
  const least = Math.min(...gaps.map((gap) => gap.toMm - gap.fromMm));
  const d = geometry.effectiveDepthMm;
  return (
    <g>
      <HeightDimension
        fromPx={at.yPx}
        toPx={bottom}
        atPx={at.xPx - 42}
        label={`h ${length(geometry.depthMm)}`}
      />
      {d !== null && (
        <HeightDimension fromPx={at.yPx} toPx={at.yPx + d * s} atPx={at.xPx - 16} label={`d ${length(d)}`} />
      )}
      {gaps.length > 0 && (
        <GapChain
          stopsPx={gaps.flatMap((gap) => [at.xPx + gap.fromMm * s, at.xPx + gap.toMm * s])}
          atPx={bottom + 12}
          label={`clear ${length(least, 3)}${gaps.length > 1 ? ' each' : ''}`}
        />
      )}
      {geometry.coverMm > 0 && (
        <EdgeDimension
          fromPx={at.xPx}
          toPx={at.xPx + geometry.coverMm * s}
          atPx={at.yPx - 8}
          label={`cover ${length(geometry.coverMm)}`}
        />
      )}
      <WidthDimension
        fromPx={at.xPx}
        toPx={at.xPx + geometry.widthMm * s}
        atPx={bottom + (gaps.length > 0 ? 40 : 16)}
        label={`b ${length(geometry.widthMm)}`}
      />
    </g>
  );
}

/** One section with its dimensions and callouts, drawn to fit its sheet. */
export function LargeDrawing({ section, geometry, units }: LargeDrawingProps) {
  const at = place(geometry);
  const centreX = at.xPx + (geometry.widthMm * at.pxPerMm) / 2;
  return (
    <g className="font-mono text-[11px]">
      <SectionBody geometry={geometry} at={at} hasHooks />
      <NeutralAxis geometry={geometry} at={at} />
      <Dimensions geometry={geometry} units={units} at={at} />
      <Callouts section={section} geometry={geometry} units={units} at={at} />
      {!geometry.fits && (
        <text
          x={centreX}
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

export const LARGE_VIEW_BOX = `0 0 ${SHEET.width} ${SHEET.height}`;
