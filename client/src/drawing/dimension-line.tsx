/** Half length of the oblique stroke that ends a dimension. */
const TICK_PX = 3.5;

interface DimensionProps {
  readonly fromPx: number;
  readonly toPx: number;
  /** Position across the measured direction. */
  readonly atPx: number;
  readonly label: string;
}

const tick = (x: number, y: number) => `M ${x - TICK_PX} ${y + TICK_PX} L ${x + TICK_PX} ${y - TICK_PX}`;

/** A measure along x, its number under the line. */
export function WidthDimension({ fromPx, toPx, atPx, label }: DimensionProps) {
  return (
    <g>
      <path
        d={`M ${fromPx} ${atPx} H ${toPx} ${tick(fromPx, atPx)} ${tick(toPx, atPx)}`}
        className="fill-none stroke-muted"
      />
      <text x={(fromPx + toPx) / 2} y={atPx + 14} textAnchor="middle" className="fill-ink">
        {label}
      </text>
    </g>
  );
}

/** A short measure at an edge, too short to write over: its number stands behind it. */
export function EdgeDimension({ fromPx, toPx, atPx, label }: DimensionProps) {
  return (
    <g>
      <path
        d={`M ${fromPx} ${atPx} H ${toPx} ${tick(fromPx, atPx)} ${tick(toPx, atPx)}`}
        className="fill-none stroke-muted"
      />
      <text x={toPx + 7} y={atPx} dominantBaseline="central" className="fill-ink">
        {label}
      </text>
    </g>
  );
}

/** A measure along y, its number turned to be read from the right, as on a drawing. */
export function HeightDimension({ fromPx, toPx, atPx, label }: DimensionProps) {
  const middle = (fromPx + toPx) / 2;
  return (
    <g>
      <path
        d={`M ${atPx} ${fromPx} V ${toPx} ${tick(atPx, fromPx)} ${tick(atPx, toPx)}`}
        className="fill-none stroke-muted"
      />
      <text
        x={atPx - 5}
        y={middle}
        textAnchor="middle"
        transform={`rotate(-90 ${atPx - 5} ${middle})`}
        className="fill-ink"
      >
        {label}
      </text>
    </g>
  );
}

/** Several measures in a row between the same two faces, under one shared number. */
export function GapChain({
  stopsPx,
  atPx,
  label,
}: {
  readonly stopsPx: readonly number[];
  readonly atPx: number;
  readonly label: string;
}) {
  const first = stopsPx[0];
  const last = stopsPx.at(-1);
  if (first === undefined || last === undefined) return null;
  return (
    <g>
      <path
        d={`M ${first} ${atPx} H ${last} ${stopsPx.map((stop) => `M ${stop} ${atPx - 4} v 8`).join(' ')}`}
        className="fill-none stroke-muted"
      />
      <text x={(first + last) / 2} y={atPx + 15} textAnchor="middle" className="fill-ink">
        {label}
      </text>
    </g>
  );
}
