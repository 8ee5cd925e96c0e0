import type { Candidate, SharedShortlist } from '#shared/contract/records.ts';
import { MEASURE_DIRECTION, type Direction, type MeasureId } from '#shared/engine/measures.ts';
import type { DisplayKind } from '#shared/print/units.ts';

/** A candidate as signed-in members and as readers of a link see it. */
export type ShownCandidate = Candidate | SharedShortlist['candidates'][number];

export interface ComparisonRow {
  readonly id: string;
  readonly label: string;
  readonly kind: DisplayKind;
  /** Null where the row does not judge. */
  readonly better: Direction | null;
  /** One per candidate; null is not known. */
  readonly values: readonly (number | null)[];
  /** Whether the candidate is the best of the row; several when they tie, none when all are alike or one is missing. */
  readonly isBest: readonly boolean[];
  /** The value the others are compared with; null without a baseline, or where its value is not known. */
  readonly baseline: number | null;
}

export interface RowSource {
  readonly id: string;
  readonly label: string;
  readonly kind: DisplayKind;
  readonly better: Direction | null;
  readonly of: (candidate: ShownCandidate) => number | null;
}

const measure = (id: MeasureId, label: string, kind: DisplayKind): RowSource => ({
  id,
  label,
  kind,
  better: MEASURE_DIRECTION[id],
  of: (candidate) => candidate.snapshot.evaluation.measures[id],
});

const MEASURE_ROWS: readonly RowSource[] = [
  measure('steelKgPerM', 'Steel, net', 'mass-per-length'),
  measure('costPerM', 'Cost', 'money-per-length'),
  measure('curvatureDuctility', 'Ductility μφ', 'ratio'),
  measure('depthMm', 'Depth h', 'length'),
  measure('designStrengthNmm', 'Design strength', 'moment'),
  measure('utilisation', 'Utilisation', 'ratio'),
  measure('co2eKgPerM', 'Carbon', 'co2e-per-length'),
];

const TAKEOFF_ROWS: readonly RowSource[] = [
  {
    id: 'laps',
    label: 'Laps and waste',
    kind: 'tonnes',
    better: null,
    of: (c) => c.takeoff.lapsTonnes + c.takeoff.wasteTonnes,
  },
  {
    id: 'steel-total',
    label: 'Steel in all',
    kind: 'tonnes',
    better: 'less',
    of: (c) => c.takeoff.totalTonnes,
  },
  { id: 'concrete', label: 'Concrete', kind: 'volume', better: 'less', of: (c) => c.takeoff.concreteM3 },
  { id: 'formwork', label: 'Formwork', kind: 'surface', better: 'less', of: (c) => c.takeoff.formworkM2 },
  { id: 'cost-total', label: 'Cost', kind: 'money', better: 'less', of: (c) => c.takeoff.cost },
  { id: 'co2e-total', label: 'Carbon', kind: 'co2e', better: 'less', of: (c) => c.takeoff.co2eKg },
];

const STEEL_POSITIONS = ['tension', 'compression', 'skin', 'stirrups'] as const;

/** Rows of measures per length of beam. */
export const measureRows = (candidates: readonly ShownCandidate[], baselineId: string | null) =>
  rowsOf(MEASURE_ROWS, candidates, baselineId);

/** One row for each source. */
export const rowsOf = (
  sources: readonly RowSource[],
  candidates: readonly ShownCandidate[],
  baselineId: string | null,
): ComparisonRow[] => sources.map((source) => rowOf(source, candidates, baselineId));

/** Rows of the takeoff for span × count: first the tonnes of each bar size by position, then the sums. */
export function takeoffRows(candidates: readonly ShownCandidate[], baselineId: string | null) {
  const barRows = STEEL_POSITIONS.flatMap((position) => {
    const own = candidates.flatMap((c) => c.takeoff.lines.filter((line) => line.position === position));
    const bars = [...new Set(own.map((line) => line.bar))].sort(byBarSize);
    return bars.map((bar): RowSource => ({
      id: `bar-${bar}-${position}`,
      label: `${bar} ${position}`,
      kind: 'tonnes',
      better: null,
      of: (candidate) => {
        const lines = candidate.takeoff.lines.filter(
          (line) => line.bar === bar && line.position === position,
        );
        return lines.length === 0 ? null : lines.reduce((sum, line) => sum + line.tonnes, 0);
      },
    }));
  });
  return rowsOf([...barRows, ...TAKEOFF_ROWS], candidates, baselineId);
}

const byBarSize = (a: string, b: string): number => sizeNumber(a) - sizeNumber(b) || a.localeCompare(b);
const sizeNumber = (bar: string): number => Number(/\d+/.exec(bar)?.[0] ?? 0);

function rowOf(
  source: RowSource,
  candidates: readonly ShownCandidate[],
  baselineId: string | null,
): ComparisonRow {
  const values = candidates.map(source.of);
  const base = candidates.findIndex((candidate) => candidate.id === baselineId);
  return {
    id: source.id,
    label: source.label,
    kind: source.kind,
    better: source.better,
    values,
    isBest: areComparable(candidates) ? bestOf(values, source.better) : values.map(() => false),
    baseline: base === -1 ? null : values[base]!,
  };
}

/** Best is only said among sections for one and the same beam. */
export const areComparable = (candidates: readonly ShownCandidate[]): boolean =>
  new Set(candidates.map((candidate) => candidate.beam.id)).size === 1;

/** Two computed values closer than this share are the same to anyone who reads them. */
const SAME_SHARE = 1e-9;

function bestOf(values: readonly (number | null)[], better: Direction | null): readonly boolean[] {
  const none = values.map(() => false);
  const known = values.filter((value) => value !== null);
  if (better === null || known.length < values.length || known.length < 2) return none;
  const best = better === 'less' ? Math.min(...known) : Math.max(...known);
  const isBest = known.map((value) => Math.abs(value - best) <= SAME_SHARE * Math.abs(best));
  return isBest.every(Boolean) ? none : isBest;
}
