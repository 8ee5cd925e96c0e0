import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Rates } from '#shared/engine/section.ts';
import { SectionDrawing } from '#client/src/drawing/section-drawing.tsx';
import { faceWord } from '#shared/print/face-word.ts';
import { formatDifferenceTo, formatQuantity } from '#shared/print/format-quantity.ts';
import { barsText, sizeText, steelText, stirrupText } from '#shared/print/section-text.ts';
import { candidateStateLabel } from '#client/src/lib/state-labels.ts';
import { unitLabel } from '#shared/print/units.ts';
import { missingFactors, missingRates } from '#client/src/sheet/missing-rates.ts';
import { StateTag } from '#client/src/ui/state-tag.tsx';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { CandidateFlag } from './candidate-flag.tsx';
import { costRows } from './cost-lines.ts';
import { measureRows, takeoffRows, type ComparisonRow, type ShownCandidate } from './comparison.ts';

/** Height of the tallest section on the common ground line, px. */
const DRAWING_PX = 220;

interface CompareTableProps {
  readonly candidates: readonly ShownCandidate[];
  readonly units: UnitSystem;
  readonly baselineId: string | null;
  readonly hasMoney: boolean;
  /** Names the table where a page has several. */
  readonly label?: string;
}

/** Two candidates at the ends of a wide screen are hard to compare: so many stand no further apart than this. */
const WIDTH_OF: Readonly<Record<number, string>> = {
  2: 'max-w-[52rem]',
  3: 'max-w-[68rem]',
  4: 'max-w-[84rem]',
};

const MONEY_ROWS = ['costPerM', 'cost-total'];

/** Candidates as columns, standing on one ground line at one scale; what is compared as rows. */
export function CompareTable(props: CompareTableProps) {
  const { candidates, units, baselineId, hasMoney, label = 'Candidates side by side' } = props;
  const tallestMm = Math.max(...candidates.map((candidate) => candidate.snapshot.section.depthMm));
  const shown = (row: ComparisonRow) => hasMoney || !MONEY_ROWS.includes(row.id);
  const costLines = costRows(candidates, baselineId, hasMoney);
  const sameTakeoff =
    new Set(candidates.map(({ takeoff }) => `${takeoff.spanMm}×${takeoff.count}`)).size === 1;
  const { spanMm, count } = candidates[0]!.takeoff;
  return (
    <TableFrame label={label} className={WIDTH_OF[candidates.length]}>
      <thead>
        <tr className="border-b-0!">
          <th scope="col" className="sticky left-0 z-10 w-40 min-w-32 bg-paper align-bottom">
            One scale, one ground line
          </th>
          {candidates.map((candidate) => (
            <th key={candidate.id} scope="col" className="min-w-44 pr-0!">
              <span className="flex items-center gap-2 text-ink">
                <CandidateFlag label={candidate.label} />
                <span className="font-semibold">{candidate.beam.mark}</span>
              </span>
              <span className="mt-3 block border-b border-ink">
                <SectionDrawing
                  variant="strip"
                  section={candidate.snapshot.section}
                  evaluation={candidate.snapshot.evaluation}
                  standard={candidate.snapshot.basis.barStandard}
                  units={units}
                  pxPerMm={DRAWING_PX / tallestMm}
                  heightPx={DRAWING_PX}
                />
              </span>
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        <TextRow
          label="State"
          candidates={candidates}
          of={(c) => <StateTag {...candidateStateLabel(c.state)} />}
        />
        <TextRow
          label="b × h"
          candidates={candidates}
          of={(c) => <span className="num font-medium">{sizeText(c.snapshot.section, units)}</span>}
        />
        <TextRow label="Bars" candidates={candidates} of={(c) => <Bars candidate={c} units={units} />} />
        <TextRow
          label="Concrete"
          candidates={candidates}
          of={(c) => <span className="num">{formatQuantity(c.snapshot.section.fcMPa, 'stress', units)}</span>}
        />
      </tbody>
      <FigureRows
        title="Per length of beam"
        rows={measureRows(candidates, baselineId).filter(shown)}
        candidates={candidates}
        units={units}
        baselineId={baselineId}
        hasMoney={hasMoney}
      />
      {costLines.length > 0 && (
        <FigureRows
          title="Cost and carbon by line, per length"
          rows={costLines}
          candidates={candidates}
          units={units}
          baselineId={baselineId}
          hasMoney={hasMoney}
        />
      )}
      <FigureRows
        title={
          sameTakeoff
            ? `For ${formatQuantity(spanMm, 'span', units)} × ${count}`
            : 'For each beam’s span × count'
        }
        rows={takeoffRows(candidates, baselineId).filter(shown)}
        candidates={candidates}
        units={units}
        baselineId={baselineId}
        hasMoney={hasMoney}
      />
    </TableFrame>
  );
}

function Bars({ candidate, units }: { readonly candidate: ShownCandidate; readonly units: UnitSystem }) {
  const { section, evaluation } = candidate.snapshot;
  const { reinforcement } = section;
  const lines =
    reinforcement.kind === 'bars'
      ? [
          `${barsText(reinforcement.tension)} ${faceWord('tension', section)}`,
          reinforcement.compression.length === 0
            ? `no ${faceWord('compression', section)} bars`
            : `${barsText(reinforcement.compression)} ${faceWord('compression', section)}`,
        ]
      : [steelText(section, units)];
  return (
    <span className="num text-steel">
      {[...lines, `stirrups ${stirrupText(evaluation.stirrups ?? section.stirrup, units)}`].map((line) => (
        <span key={line} className="block">
          {line}
        </span>
      ))}
    </span>
  );
}

interface TextRowProps {
  readonly label: string;
  readonly candidates: readonly ShownCandidate[];
  readonly of: (candidate: ShownCandidate) => React.ReactNode;
}

function TextRow({ label, candidates, of }: TextRowProps) {
  return (
    <tr>
      <RowHead>{label}</RowHead>
      {candidates.map((candidate) => (
        <td key={candidate.id}>{of(candidate)}</td>
      ))}
    </tr>
  );
}

const RowHead = ({ children }: { readonly children: React.ReactNode }) => (
  <th scope="row" className="sticky left-0 z-10 bg-paper font-normal text-muted!">
    {children}
  </th>
);

interface FigureRowsProps {
  readonly title: string;
  readonly rows: readonly ComparisonRow[];
  readonly candidates: readonly ShownCandidate[];
  readonly units: UnitSystem;
  readonly baselineId: string | null;
  readonly hasMoney: boolean;
}

function FigureRows({ title, rows, candidates, units, baselineId, hasMoney }: FigureRowsProps) {
  return (
    <tbody>
      <tr>
        <th scope="rowgroup" colSpan={candidates.length + 1} className="pt-5! font-semibold">
          <span className="sticky left-0">{title}</span>
        </th>
      </tr>
      {rows.map((row) => (
        <tr key={row.id}>
          <RowHead>
            {row.label} <span className="text-2xs">{unitLabel(row.kind, units).replace(/^\//, 'per ')}</span>
          </RowHead>
          {candidates.map((candidate, i) => (
            <td key={candidate.id} className="num">
              <Figure
                row={row}
                index={i}
                units={units}
                candidate={candidate}
                baselineId={baselineId}
                hasMoney={hasMoney}
              />
            </td>
          ))}
        </tr>
      ))}
    </tbody>
  );
}

interface FigureProps {
  readonly row: ComparisonRow;
  readonly index: number;
  readonly units: UnitSystem;
  readonly candidate: ShownCandidate;
  readonly baselineId: string | null;
  readonly hasMoney: boolean;
}

function Figure({ row, index, units, candidate, baselineId, hasMoney }: FigureProps) {
  const value = row.values[index]!;
  if (value === null) {
    const { basis, section } = candidate.snapshot;
    const missing = hasMoney ? missingFor(row.id, basis.rates, section.fcMPa) : [];
    return missing.length === 0 ? null : (
      <span className="font-sans text-xs text-muted">not known: {missing.join(', ')}</span>
    );
  }
  const currency =
    row.kind === 'money-per-length' ? candidate.snapshot.evaluation.quantities.cost?.currency : null;
  const total = row.id === 'cost-total' ? candidate.takeoff.currency : null;
  return (
    <span className="inline-grid grid-cols-[5.5rem_auto] items-baseline gap-x-3">
      <span className="text-right">
        {currency ?? total ?? ''} {formatQuantity(value, row.kind, units, { hideUnit: true })}
      </span>
      <span className="text-2xs font-semibold text-meets">{row.isBest[index] ? '◆ best' : ''}</span>
      {baselineId !== null && candidate.id !== baselineId && (
        <span className="text-right text-xs text-muted">{differenceText(row, index, units)}</span>
      )}
    </span>
  );
}

function differenceText(row: ComparisonRow, index: number, units: UnitSystem): string {
  const value = row.values[index] ?? null;
  const baseline = row.baseline;
  return value === null || baseline === null ? '' : formatDifferenceTo(value, baseline, row.kind, units);
}

function missingFor(rowId: string, rates: Rates | null, fcMPa: number): readonly string[] {
  if (rowId === 'costPerM') return missingRates(rates, fcMPa);
  return rowId === 'co2eKgPerM' ? missingFactors(rates, fcMPa) : [];
}
