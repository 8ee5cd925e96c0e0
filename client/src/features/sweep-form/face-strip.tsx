import type { FitPreview, PlacedGroup } from './fit-preview.ts';

interface FaceStripProps {
  readonly preview: FitPreview;
  readonly widthMm: number;
  readonly bars: PlacedGroup['bars'];
  readonly isAtTop: boolean;
  readonly pxPerMm: number;
}

/** Depth of the cut, px: room for a few layers. */
const HEIGHT_PX = 34;
const EDGE_PX = 1;

/** One face of a section, cut off above the bars: concrete, stirrup and the bars where they stand. */
export function FaceStrip({ preview, widthMm, bars, isAtTop, pxPerMm: s }: FaceStripProps) {
  const { coverMm, stirrupBar, bendRadiusMm } = preview;
  const width = widthMm * s;
  const reach = Math.max(0, ...bars.map(({ offsetMm, diameterMm }) => offsetMm + diameterMm / 2)) * s;
  const height = Math.max(HEIGHT_PX, reach + 6);
  // From the bars' own face; the picture is turned over for bars at the top.
  const up = (offsetPx: number) => (isAtTop ? EDGE_PX + offsetPx : height - EDGE_PX - offsetPx);
  const end = isAtTop ? height : 0;
  const leg = stirrupBar === null ? 0 : stirrupBar.diameterMm * s;
  const inset = coverMm * s + leg / 2;
  const radius = Math.min((bendRadiusMm + (stirrupBar?.diameterMm ?? 0) / 2) * s, width / 2 - inset);
  const turn = isAtTop ? 1 : 0;
  const [left, right] = [EDGE_PX + inset, EDGE_PX + width - inset];
  return (
    <svg width={width + 2 * EDGE_PX} height={height} className="shrink-0" aria-hidden="true">
      <rect
        x={EDGE_PX}
        y={isAtTop ? EDGE_PX : 0}
        width={width}
        height={height - EDGE_PX}
        className="fill-concrete"
      />
      <path
        d={`M${EDGE_PX} ${end}V${up(0)}H${EDGE_PX + width}V${end}`}
        className="fill-none stroke-concrete-edge"
      />
      {stirrupBar !== null && width > 2 * inset && (
        <path
          d={`M${left} ${end}V${up(inset + radius)}A${radius} ${radius} 0 0 ${turn} ${left + radius} ${up(inset)}H${right - radius}A${radius} ${radius} 0 0 ${turn} ${right} ${up(inset + radius)}V${end}`}
          className="fill-none stroke-steel"
          strokeWidth={Math.max(1, leg)}
          opacity={0.6}
        />
      )}
      {bars.map(({ xMm, offsetMm, diameterMm }) => (
        <circle
          key={`${xMm} ${offsetMm}`}
          cx={EDGE_PX + xMm * s}
          cy={up(offsetMm * s)}
          r={Math.max(1.2, (diameterMm / 2) * s)}
          className="fill-steel"
        />
      ))}
    </svg>
  );
}
