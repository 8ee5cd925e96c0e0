import type { Evaluation } from '#shared/engine/evaluation.ts';
import type { BarStandard } from '#shared/engine/section.ts';
import type { Sheet, SheetPart } from '#shared/sheet/sheet.ts';
import { OWN_VALUE_TOLERANCE } from '#shared/sheet/own-value.ts';
import { textRuns } from '#shared/sheet/text-runs.ts';
import { CurvePlot } from '#client/src/drawing/curve-plot.tsx';
import { SectionDrawing } from '#client/src/drawing/section-drawing.tsx';
import { KeyValue } from '#client/src/ui/key-value.tsx';
import type { SheetReading } from './own-value-cell.tsx';
import { Remarks, RowsTable } from './rows-table.tsx';
import { SymbolText } from './symbol-text.tsx';
import { WorkingLinesTable } from './working-lines-table.tsx';

interface SheetDocumentProps {
  readonly sheet: Sheet;
  readonly evaluation: Evaluation;
  readonly standard: BarStandard;
  readonly reading: SheetReading;
}

const prose = (text: string) => <SymbolText runs={textRuns(text, { isProse: true })} />;

/** A calculation sheet from head to signatures: what is on paper, in the same order. */
export function SheetDocument({ sheet, evaluation, standard, reading }: SheetDocumentProps) {
  const { verdict, drawing, inputs, units } = sheet;
  return (
    <div className="dense-print grid min-w-0 grid-cols-[minmax(0,1fr)] gap-7">
      <p className={`font-semibold ${verdict.meets ? 'text-meets' : 'text-fails'}`}>
        <span aria-hidden="true">{verdict.meets ? '✓' : '✕'}</span> {verdict.text}
      </p>
      <div className="grid grid-cols-[minmax(0,1fr)] items-start gap-8 lg:grid-cols-[22rem_minmax(0,1fr)] print:grid-cols-[17rem_minmax(0,1fr)]">
        <figure className="keep-together">
          <SectionDrawing
            variant="large"
            section={drawing.section}
            evaluation={evaluation}
            standard={standard}
            units={units}
          />
        </figure>
        <div className="gap-x-10 md:columns-2 print:columns-2">
          {inputs.map(({ title, items }) => (
            <section key={title} className="break-inside-avoid pb-5 print:pb-2">
              <h2 className="pb-1 font-semibold">{title}</h2>
              <KeyValue items={items.map(({ label, value }) => ({ label: prose(label), value }))} />
            </section>
          ))}
        </div>
      </div>
      {sheet.parts.map((part) => (
        <Part key={part.id} part={part} reading={reading} />
      ))}
      <Words title="Conventions" paragraphs={sheet.conventions} />
      <Words title="Not checked" paragraphs={[`${sheet.notChecked.join('; ')}.`]} />
      <Words title="Caution" paragraphs={sheet.caution} isStrong />
      <Foot sheet={sheet} />
    </div>
  );
}

function Heading({ children }: { readonly children: React.ReactNode }) {
  return <h2 className="mb-2 break-after-avoid border-t border-ink pt-2 font-semibold">{children}</h2>;
}

interface PartProps {
  readonly part: SheetPart;
  readonly reading: SheetReading;
}

function Part({ part, reading }: PartProps) {
  return (
    <section className="min-w-0" aria-label={part.title}>
      <Heading>{part.title}</Heading>
      {part.kind === 'working' ? (
        <WorkingLinesTable title={part.title} lines={part.lines} reading={reading} />
      ) : (
        <>
          <Remarks remarks={part.table.remarks} />
          {part.kind === 'curve' ? (
            <CurvePart part={part} reading={reading} />
          ) : (
            <RowsTable title={part.title} table={part.table} reading={reading} />
          )}
        </>
      )}
    </section>
  );
}

/** The plot and the numbers of its marked points. */
function CurvePart({ part, reading }: PartProps & { readonly part: { readonly kind: 'curve' } }) {
  return (
    <div className="grid min-w-0 grid-cols-[minmax(0,1fr)] items-start gap-x-8 gap-y-3 xl:grid-cols-[26rem_minmax(0,1fr)] print:grid-cols-[18rem_minmax(0,1fr)]">
      <figure>
        <CurvePlot
          title="Moment over curvature; its marked points are in the table beside it"
          {...part.plot}
        />
      </figure>
      <RowsTable title={part.title} table={part.table} reading={reading} minWidth="40rem" />
    </div>
  );
}

interface WordsProps {
  readonly title: string;
  readonly paragraphs: readonly string[];
  readonly isStrong?: boolean;
}

function Words({ title, paragraphs, isStrong = false }: WordsProps) {
  return (
    <section className="keep-together">
      <Heading>{title}</Heading>
      <div
        className={`grid max-w-[52rem] gap-1 text-sm print:max-w-none print:gap-0.5 ${isStrong ? 'font-semibold' : ''}`}
      >
        {paragraphs.map((text) => (
          <p key={text}>{prose(text)}</p>
        ))}
      </div>
    </section>
  );
}

function Foot({ sheet }: { readonly sheet: Sheet }) {
  return (
    <section className="keep-together" aria-label="Frozen with the pin, and signatures">
      <Heading>Frozen with the pin</Heading>
      <p className="num flex flex-wrap gap-x-6 gap-y-1 text-xs">
        {sheet.frozen.map(({ label, value }) => (
          <span key={label} className="break-all">
            {label} {value}
          </span>
        ))}
      </p>
      <p className="mt-1 text-xs text-muted">
        An own value meets the sheet within {100 * OWN_VALUE_TOLERANCE} % of it; the difference is (own −
        sheet)/sheet.
      </p>
      <div className="mt-8 grid grid-cols-2 gap-x-8 gap-y-6 md:grid-cols-4 print:grid-cols-4">
        {sheet.signatures.map(({ role, name, date }) => (
          <div key={role}>
            <p className="min-h-6 border-b border-ink">
              {name} <span className="num text-xs text-muted">{date}</span>
            </p>
            <p className="text-2xs text-muted">{role}: name, signature, date</p>
          </div>
        ))}
      </div>
    </section>
  );
}
