/** A row of sections on one ground line, from shallow to deep: what the product is about, drawn in its own hand. */
const SECTIONS = [
  { width: 132, height: 168, bars: 6, isChosen: false },
  { width: 120, height: 196, bars: 5, isChosen: false },
  { width: 108, height: 226, bars: 4, isChosen: true },
  { width: 96, height: 268, bars: 3, isChosen: false },
  { width: 96, height: 312, bars: 2, isChosen: false },
] as const;

const GROUND_Y = 340;
const GAP = 44;
const COVER = 14;
const BAR_RADIUS = 7;

export function SignInDrawing() {
  const placed = SECTIONS.map((section, i) => ({
    ...section,
    x: SECTIONS.slice(0, i).reduce((x, before) => x + before.width + GAP, 24),
  }));
  const last = placed.at(-1)!;
  return (
    <svg viewBox={`0 0 ${last.x + last.width + 24} 400`} className="w-full" aria-hidden="true">
      {placed.map(({ x, width, height, bars, isChosen }) => {
        const y = GROUND_Y - height;
        const span = width - 2 * (COVER + BAR_RADIUS + 4);
        return (
          <g key={x}>
            <rect
              x={x}
              y={y}
              width={width}
              height={height}
              fill="var(--concrete)"
              stroke="var(--concrete-edge)"
            />
            <rect
              x={x + COVER}
              y={y + COVER}
              width={width - 2 * COVER}
              height={height - 2 * COVER}
              rx="9"
              fill="none"
              stroke="var(--steel)"
              strokeWidth="4"
              opacity="0.75"
            />
            {Array.from({ length: bars }, (_, i) => (
              <circle
                key={i}
                cx={x + COVER + BAR_RADIUS + 4 + (span * i) / (bars - 1)}
                cy={GROUND_Y - COVER - BAR_RADIUS - 4}
                r={BAR_RADIUS}
                fill="var(--steel)"
              />
            ))}
            {isChosen && (
              <rect
                x={x - 12}
                y={y - 12}
                width={width + 24}
                height={height + 24}
                fill="none"
                stroke="var(--steel)"
                strokeWidth="2"
              />
            )}
          </g>
        );
      })}
      <path d={`M0 ${GROUND_Y}H${last.x + last.width + 24}`} stroke="var(--ink)" strokeWidth="1.5" />
    </svg>
  );
}
