import { outlinePath } from '#shared/drawing/concrete-outline.ts';
import { hookPath } from '#shared/drawing/hook-path.ts';
import type { Placement } from '#shared/drawing/placement.ts';
import type { SectionGeometry, StirrupOutline } from '#shared/drawing/section-geometry.ts';

/** Thinner than this a line would fade on screen, so a leg drawn at a small scale keeps it. */
const LEAST_LEG_PX = 1;
const LEAST_BAR_RADIUS_PX = 1.1;
const LEAST_BAND_PX = 1.5;
/** Skin bars are rings: they are there, and not counted in strength. */
const SKIN_LINE_SHARE = 0.5;
const LEAST_SKIN_LINE_PX = 0.8;

interface BodyProps {
  readonly geometry: SectionGeometry;
  readonly at: Placement;
  readonly hasHooks: boolean;
}

function Hook({ stirrup, at }: { readonly stirrup: StirrupOutline; readonly at: Placement }) {
  return (
    <path
      d={hookPath(stirrup, at)}
      className="fill-none stroke-steel"
      strokeWidth={Math.max(stirrup.legThicknessMm * at.pxPerMm, LEAST_LEG_PX)}
      strokeLinecap="butt"
      opacity={0.8}
    />
  );
}

function StirrupShape({ stirrup, at }: { readonly stirrup: StirrupOutline; readonly at: Placement }) {
  const s = at.pxPerMm;
  const top = at.yPx + stirrup.yMm * s;
  const thickness = Math.max(stirrup.legThicknessMm * s, LEAST_LEG_PX);
  return (
    <g className="fill-none stroke-steel" strokeWidth={thickness} opacity={0.8}>
      <rect
        x={at.xPx + stirrup.xMm * s}
        y={top}
        width={stirrup.widthMm * s}
        height={stirrup.heightMm * s}
        rx={stirrup.cornerRadiusMm * s}
      />
      {stirrup.innerLegsMm.map((legMm) => (
        <line
          key={legMm}
          x1={at.xPx + legMm * s}
          x2={at.xPx + legMm * s}
          y1={top}
          y2={top + stirrup.heightMm * s}
        />
      ))}
    </g>
  );
}

/** Concrete, stirrup and steel of one section, without dimensions. What cannot be built is only outlined. */
export function SectionBody({ geometry, at, hasHooks }: BodyProps) {
  const { stirrup } = geometry;
  const s = at.pxPerMm;
  return (
    <g>
      <path
        d={outlinePath(geometry.outline, at)}
        className={geometry.fits ? 'fill-concrete stroke-concrete-edge' : 'fill-none stroke-concrete-edge'}
        strokeWidth={1}
        strokeDasharray={geometry.fits ? undefined : '4 3'}
      />
      {geometry.fits && stirrup !== null && <StirrupShape stirrup={stirrup} at={at} />}
      {geometry.fits && stirrup !== null && hasHooks && <Hook stirrup={stirrup} at={at} />}
      {geometry.bars.map((bar) => (
        <circle
          key={`${bar.xMm} ${bar.yMm}`}
          cx={at.xPx + bar.xMm * s}
          cy={at.yPx + bar.yMm * s}
          r={Math.max(bar.radiusMm * s, LEAST_BAR_RADIUS_PX)}
          className="fill-steel"
        />
      ))}
      {geometry.skinBars.map((bar) => (
        <circle
          key={`${bar.xMm} ${bar.yMm}`}
          cx={at.xPx + bar.xMm * s}
          cy={at.yPx + bar.yMm * s}
          r={Math.max(bar.radiusMm * s, LEAST_BAR_RADIUS_PX)}
          className="fill-concrete stroke-steel"
          strokeWidth={Math.max(bar.radiusMm * s * SKIN_LINE_SHARE, LEAST_SKIN_LINE_PX)}
        />
      ))}
      {geometry.bands.map((band) => (
        <rect
          key={`${band.yMm} ${band.face}`}
          x={at.xPx + band.xMm * s}
          y={at.yPx + band.yMm * s}
          width={band.widthMm * s}
          height={Math.max(band.heightMm * s, LEAST_BAND_PX)}
          className="fill-steel"
        />
      ))}
    </g>
  );
}
