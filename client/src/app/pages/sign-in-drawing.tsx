/**
 * What the product is about, in its own hand and without numbers: sections from shallow to deep on one ground line, and
 * above each how much steel it takes, joined to a front. One is chosen.
 */
const SECTIONS = [
  { width: 132, height: 168, bars: 6, steelY: -250, isChosen: false },
  { width: 120, height: 196, bars: 5, steelY: -178, isChosen: false },
  { width: 108, height: 226, bars: 4, steelY: -122, isChosen: true },
  { width: 96, height: 268, bars: 3, steelY: -88, isChosen: false },
  { width: 96, height: 312, bars: 2, steelY: -72, isChosen: false },
] as const;

type Drawn = (typeof SECTIONS)[number] & { readonly x: number };

const TOP_Y = -300;
const GROUND_Y = 340;
const BOTTOM_Y = 400;
const GAP = 44;
const COVER = 14;
const BAR_RADIUS = 7;
const CORNER = COVER + BAR_RADIUS + 4;

const middle = ({ x, width }: Drawn): number => x + width / 2;

export function SignInDrawing() {
  const drawn: Drawn[] = SECTIONS.map((section, i) => ({
    ...section,
    x: SECTIONS.slice(0, i).reduce((x, before) => x + before.width + GAP, 24),
  }));
  const last = drawn.at(-1)!;
  const right = last.x + last.width + 24;
  const front = drawn.map(
    (section, i) => `${i === 0 ? 'M' : 'H'}${middle(section)}${i === 0 ? ' ' : 'V'}${section.steelY}`,
  );
  return (
    <svg viewBox={`0 ${TOP_Y} ${right} ${BOTTOM_Y - TOP_Y}`} className="w-full" aria-hidden="true">
      {drawn.map((section) => (
        <path
          key={section.x}
          d={`M${middle(section)} ${section.steelY}V${GROUND_Y - section.height}`}
          stroke="var(--rule)"
          strokeWidth="1.5"
        />
      ))}
      <path d={front.join('')} fill="none" stroke="var(--ink)" strokeWidth="2" />
      {drawn.map((section) => (
        <g key={section.x}>
          <Diamond section={section} />
          <DrawnSection section={section} />
        </g>
      ))}
      <path d={`M0 ${GROUND_Y}H${right}`} stroke="var(--ink)" strokeWidth="1.5" />
    </svg>
  );
}

function Diamond({ section }: { readonly section: Drawn }) {
  const at = `translate(${middle(section)} ${section.steelY}) rotate(45)`;
  return (
    <>
      <rect
        transform={at}
        x="-6"
        y="-6"
        width="12"
        height="12"
        fill={section.isChosen ? 'var(--steel)' : 'var(--paper)'}
        stroke="var(--ink)"
        strokeWidth="1.5"
      />
      {section.isChosen && (
        <path
          transform={`translate(${middle(section)} ${section.steelY})`}
          d="M0 -8V-52H46L37 -41L46 -30H0"
          fill="var(--steel)"
          stroke="var(--steel)"
          strokeWidth="1.5"
        />
      )}
    </>
  );
}

function DrawnSection({ section }: { readonly section: Drawn }) {
  const { x, width, height, bars, isChosen } = section;
  const y = GROUND_Y - height;
  const step = (width - 2 * CORNER) / (bars - 1);
  return (
    <>
      <rect x={x} y={y} width={width} height={height} fill="var(--concrete)" stroke="var(--concrete-edge)" />
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
          cx={x + CORNER + step * i}
          cy={GROUND_Y - CORNER}
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
    </>
  );
}
