import type { SectionGeometry, StirrupOutline } from '#shared/drawing/section-geometry.ts';

/** Where the section stands in the picture: its top left corner and pixels per mm. */
export interface Placement {
  readonly xPx: number;
  readonly yPx: number;
  readonly pxPerMm: number;
}

/** Thinner than this a line would fade on screen, so a leg drawn at a small scale keeps it. */
const LEAST_LEG_PX = 1;
const LEAST_BAR_RADIUS_PX = 1.1;
const LEAST_BAND_PX = 1.5;
/** ACI 25.3.2: the straight end of a 135° hook is six diameters, and 3 in at least. */
const HOOK_DIAMETERS = 6;
const LEAST_HOOK_MM = 75;

interface BodyProps {
  readonly geometry: SectionGeometry;
  readonly at: Placement;
  readonly hasHooks: boolean;
}

/** The 135° hook of a closed stirrup, turned into the core at the top left corner. */
function Hook({ stirrup, at }: { readonly stirrup: StirrupOutline; readonly at: Placement }) {
  const lengthMm = Math.max(HOOK_DIAMETERS * stirrup.legThicknessMm, LEAST_HOOK_MM);
  const reach = (Math.min(lengthMm, stirrup.widthMm / 2, stirrup.heightMm / 2) * at.pxPerMm) / Math.SQRT2;
  const bend = stirrup.cornerRadiusMm * at.pxPerMm;
  const x = at.xPx + stirrup.xMm * at.pxPerMm;
  const y = at.yPx + stirrup.yMm * at.pxPerMm;
  /** The two ends leave the bend where it has turned by 135°, on either side of the diagonal. */
  const near = bend * (1 - Math.SQRT1_2);
  const far = bend * (1 + Math.SQRT1_2);
  return (
    <path
      d={`M ${x + near} ${y + far} l ${reach} ${reach} M ${x + far} ${y + near} l ${reach} ${reach}`}
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
      <rect
        x={at.xPx}
        y={at.yPx}
        width={geometry.widthMm * s}
        height={geometry.depthMm * s}
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
