import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { AxisCount, EdgeShare } from '#shared/sweep/result.ts';
import { formatNumber, formatQuantity, formatWhole } from '#shared/print/format-quantity.ts';
import { unitLabel } from '#shared/print/units.ts';
import { rulerBarPx, rulerMarks } from './axis-ruler-model.ts';

const FRAME = { widthPx: 236, insetPx: 12, barPx: 24, labelPitchPx: 40 } as const;
const BASE_Y = 30;
const HEIGHT = 52;
/** Below this share of the front an end of the range is no matter of concern. */
const WORTH_TELLING = 0.05;

interface AxisRulerProps {
  readonly name: string;
  readonly symbol: string;
  readonly kind: 'length' | 'stress';
  readonly units: UnitSystem;
  readonly counts: readonly AxisCount[];
  /** False where nobody counted how many meet every check: then the values stand alone. */
  readonly isCounted: boolean;
  /** Sections within the ranges set at each value, in the order of the counts; null where none is set. */
  readonly within: readonly number[] | null;
  readonly selected: number | null;
  readonly edges: readonly EdgeShare[];
}

function edgeWords(edges: readonly EdgeShare[], ends: readonly [string, string]): string | null {
  const told = edges.filter(({ share }) => share >= WORTH_TELLING).toSorted((a, b) => b.share - a.share);
  if (told.length === 0) return null;
  const parts = told.map(({ share, end }) => {
    const value = end === 'low' ? ends[0] : ends[1];
    return `${formatNumber(share * 100, 2, true)} % of front at ${value}`;
  });
  return parts.join(', ');
}

/** One axis drawn as a scale ruler: what share of each value meets every check, and where the chosen section lies. */
export function AxisRuler({
  name,
  symbol,
  kind,
  units,
  counts,
  isCounted,
  within,
  selected,
  edges,
}: AxisRulerProps) {
  const marks = rulerMarks(counts, FRAME, within);
  const barPx = rulerBarPx(counts.length, FRAME);
  const print = (value: number | undefined) => formatQuantity(value, kind, units, { hideUnit: true });
  const ends = [print(marks[0]?.value), print(marks.at(-1)?.value)] as const;
  const words = edgeWords(edges, ends);
  const chosen = marks.find((mark) => selected !== null && Math.abs(mark.value - selected) < 1e-6 * selected);
  const spoken = marks
    .filter((mark) => mark.isLabelled || mark === chosen)
    .map((mark) => `${print(mark.value)}: ${formatNumber(mark.share * 100, 2, true)} %`)
    .join('; ');
  return (
    <div className="keep-together">
      <p className="flex flex-wrap items-baseline gap-x-2">
        <span className="font-semibold">
          {name} {symbol}
        </span>
        <span className="text-xs text-muted">{unitLabel(kind, units)}</span>
        {words !== null && (
          <span className="ml-auto text-xs text-near" title="The best may lie outside this range">
            {words}
          </span>
        )}
      </p>
      <svg
        viewBox={`0 0 ${FRAME.widthPx} ${HEIGHT}`}
        className="mt-1 block h-auto w-full max-w-[22rem]"
        role="img"
        aria-label={
          isCounted
            ? `Share that meets every check by ${name} ${symbol}: ${spoken}`
            : `${name} ${symbol}, ${marks.length} values from ${ends[0]} to ${ends[1]}`
        }
      >
        {marks.map((mark) => (
          <g key={mark.value}>
            <title>
              {isCounted
                ? `${print(mark.value)}: ${formatWhole(mark.feasible)} of ${formatWhole(mark.evaluated)} meet every check`
                : print(mark.value)}
            </title>
            <rect x={mark.xPx - barPx} y={0} width={2 * barPx} height={BASE_Y} fill="transparent" />
            <rect
              x={mark.xPx - barPx / 2}
              y={BASE_Y - mark.heightPx}
              width={barPx}
              height={mark.heightPx}
              className="fill-meets"
              opacity={within === null ? 0.6 : 0.2}
            />
            {within !== null && (
              <rect
                x={mark.xPx - barPx / 2}
                y={BASE_Y - mark.withinPx}
                width={barPx}
                height={mark.withinPx}
                className="fill-meets"
                opacity={0.65}
              />
            )}
            {mark.hasTick && (
              <line
                x1={mark.xPx}
                x2={mark.xPx}
                y1={BASE_Y}
                y2={BASE_Y + (mark.isLabelled ? 7 : 4)}
                className="stroke-ink"
              />
            )}
            {mark.isLabelled && (
              <text
                x={mark.xPx}
                y={BASE_Y + 19}
                textAnchor="middle"
                className={`font-mono text-[11px] ${mark === chosen ? 'fill-ink font-semibold' : 'fill-muted'}`}
              >
                {print(mark.value)}
              </text>
            )}
          </g>
        ))}
        <line
          x1={2}
          x2={FRAME.widthPx - 2}
          y1={BASE_Y}
          y2={BASE_Y}
          className="stroke-ink"
          strokeWidth={1.3}
        />
        {chosen !== undefined && (
          <path
            d={`M ${chosen.xPx - 5} ${BASE_Y - 9} h 10 l -5 8.5 z`}
            className="fill-steel stroke-paper"
            strokeWidth={1}
          />
        )}
      </svg>
    </div>
  );
}
