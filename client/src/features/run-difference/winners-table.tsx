import type { Evaluation } from '#shared/engine/evaluation.ts';
import { MEASURE_IDS, type MeasureId } from '#shared/engine/measures.ts';
import { formatDifferenceTo, formatMoney, formatQuantity } from '#shared/print/format-quantity.ts';
import { measureLabel } from '#shared/print/measure-labels.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import { sizeText, steelText, stirrupText } from '#shared/print/section-text.ts';
import { SectionDrawing } from '#client/src/drawing/section-drawing.tsx';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import type { ComparedRun, ComparedRuns } from './compared-run.ts';
import { verdictOf } from './result-differences.ts';
import { VerdictText } from './verdict-text.tsx';

/** Measure, the two runs, difference, direction: one grid for the tables of the page. */
const SHARES = [28, 24, 24, 12, 12];

/** Height of the taller section, px. */
const DRAWING_PX = 200;

interface WinnersTableProps extends ComparedRuns {
  readonly reader: MeasureReader;
}

const winnerOf = ({ result, sections }: ComparedRun) => {
  const best = result.front[0];
  return best === undefined ? null : sections.evaluatedAt(best.index);
};
type Winner = NonNullable<ReturnType<typeof winnerOf>>;

function valueText(measure: MeasureId, value: number | null, reader: MeasureReader): string {
  const { kind } = measureLabel(measure, reader.units);
  if (value === null) return 'not known';
  return kind === 'money-per-length'
    ? formatMoney(value, reader.currency, kind, reader.units)
    : formatQuantity(value, kind, reader.units);
}

function MeasureRow({
  id,
  values,
  reader,
}: {
  readonly id: MeasureId;
  readonly values: readonly [Evaluation | null, Evaluation | null];
  readonly reader: MeasureReader;
}) {
  const label = measureLabel(id, reader.units, reader.code);
  const [before, after] = values.map((one) => one?.measures[id] ?? null) as [number | null, number | null];
  if (before === null && after === null) return null;
  const isKnown = before !== null && after !== null;
  return (
    <tr>
      <th scope="row" className="font-normal">
        {label.name} <span className="text-xs text-muted">{label.betterText}</span>
      </th>
      <td className="figure">{valueText(id, before, reader)}</td>
      <td className="figure">{valueText(id, after, reader)}</td>
      <td className="figure">{isKnown ? formatDifferenceTo(after, before, label.kind, reader.units) : ''}</td>
      <td>{isKnown && <VerdictText verdict={verdictOf(id, before, after)} />}</td>
    </tr>
  );
}

function Drawn({
  winner,
  run,
  pxPerMm,
  reader,
}: {
  readonly winner: Winner | null;
  readonly run: ComparedRun['run'];
  readonly pxPerMm: number;
  readonly reader: MeasureReader;
}) {
  if (winner === null)
    return <span className="block text-sm font-normal text-muted">no section meets every check</span>;
  return (
    <span className="block">
      <span className="block border-b border-ink">
        <SectionDrawing
          variant="strip"
          section={winner.section}
          evaluation={winner.evaluation}
          standard={run.basis.barStandard}
          units={reader.units}
          pxPerMm={pxPerMm}
          heightPx={DRAWING_PX}
        />
      </span>
      <span className="num mt-1 block text-sm font-semibold">{sizeText(winner.section, reader.units)}</span>
      <span className="num block text-sm font-normal text-steel">
        {steelText(winner.section, reader.units)}
      </span>
      <span className="num block text-xs font-normal text-muted">
        {formatQuantity(winner.section.fcMPa, 'stress', reader.units)}, stirrups{' '}
        {stirrupText(winner.evaluation.stirrups ?? winner.section.stirrup, reader.units)}
      </span>
    </span>
  );
}

/** The best section of each run in the leading measure, at one scale on one ground line, and measure against measure. */
export function WinnersTable({ baseline, other, reader }: WinnersTableProps) {
  const winners = [winnerOf(baseline), winnerOf(other)] as const;
  const tallestMm = Math.max(1, ...winners.map((winner) => winner?.section.depthMm ?? 0));
  const pxPerMm = DRAWING_PX / tallestMm;
  const lead = measureLabel(baseline.result.view.x, reader.units, reader.code);
  return (
    <TableFrame label="The best of each run, side by side" minWidth="44rem" columnShares={SHARES}>
      <thead>
        <tr>
          <th scope="col" className="align-bottom">
            Best in {lead.name.toLowerCase()}
          </th>
          {([baseline, other] as const).map(({ run }, k) => (
            <th key={run.id} scope="col" className="align-bottom">
              <span className="block pb-2">
                Run {run.number}
                {k === 0 && <span className="font-normal text-muted">, baseline</span>}
              </span>
              <Drawn winner={winners[k]!} run={run} pxPerMm={pxPerMm} reader={reader} />
            </th>
          ))}
          <th scope="col" className="figure align-bottom">
            Difference
          </th>
          <th scope="col" className="align-bottom">
            <span className="sr-only">Direction</span>
          </th>
        </tr>
      </thead>
      <tbody>
        {MEASURE_IDS.map((id) => (
          <MeasureRow
            key={id}
            id={id}
            reader={reader}
            values={[winners[0]?.evaluation ?? null, winners[1]?.evaluation ?? null]}
          />
        ))}
      </tbody>
    </TableFrame>
  );
}
