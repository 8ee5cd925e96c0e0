import type { ComputedCase } from '#shared/verification/book.ts';
import type { Comparison } from '#shared/verification/comparison.ts';
import { inputTexts, provenanceText, unitsText } from '#shared/verification/case-text.ts';
import { differenceSizeText } from '#shared/verification/number-text.ts';
import type { PublishedCase } from '#shared/verification/published-case.ts';
import { findWorst } from '#shared/verification/summary.ts';
import { VerdictMark } from '#client/src/ui/verdict-mark.tsx';
import { ProvenanceTag } from './provenance-tag.tsx';
import { ValueTable } from './value-table.tsx';

/** Longer lists, bar tables mostly, are folded: their worst value stands in the fold's line. */
const FOLDED_FROM = 17;

/** One case: what it is and where it comes from on the left, its values on the right. */
export function CaseEntry({ entry }: { readonly entry: ComputedCase }) {
  const { published, comparisons, isReproduced } = entry;
  const within = comparisons.filter(({ isWithin }) => isWithin).length;
  return (
    <article
      aria-labelledby={`case-${published.id}`}
      className="grid grid-cols-[minmax(0,1fr)] gap-x-10 gap-y-3 border-t border-concrete-edge py-4 xl:grid-cols-[minmax(0,23rem)_minmax(0,1fr)] print:break-inside-auto"
    >
      <div className="grid content-start gap-2">
        <h3 id={`case-${published.id}`} className="flex flex-wrap items-baseline gap-x-3">
          <span className="num text-lg font-semibold">{published.id}</span>
          <span className="font-medium">{published.topic}</span>
        </h3>
        <VerdictMark
          verdict={isReproduced ? 'meets' : 'fails'}
          word={`${isReproduced ? 'reproduced' : 'not reproduced'}, ${within} of ${comparisons.length} values within`}
        />
        <p className="text-sm">{published.source}</p>
        <Provenance published={published} />
        <Inputs published={published} />
        <Notes published={published} comparisons={comparisons} />
      </div>
      {comparisons.length < FOLDED_FROM ? (
        <ValueTable caseId={published.id} comparisons={comparisons} />
      ) : (
        <details open={!isReproduced} className="min-w-0">
          <summary className="border-b border-ink py-1 text-sm">{foldLine(entry)}</summary>
          <ValueTable caseId={published.id} comparisons={comparisons} />
        </details>
      )}
    </article>
  );
}

function foldLine(entry: ComputedCase): string {
  const worst = findWorst([entry]);
  const count = `All ${entry.comparisons.length} values`;
  return worst === null
    ? count
    : `${count}, worst relative difference ${differenceSizeText(worst.comparison)}`;
}

function Provenance({ published }: { readonly published: PublishedCase }) {
  const [, more = ''] = provenanceText(published).split(/: (.*)/);
  return (
    <div className="grid gap-0.5">
      <ProvenanceTag provenance={published.provenance} />
      <p className="text-xs text-muted">{[published.kind, more].filter(Boolean).join('; ')}</p>
    </div>
  );
}

function Inputs({ published }: { readonly published: PublishedCase }) {
  const units = unitsText(published);
  return (
    <div className="text-sm">
      <h4 className="text-xs text-muted">Inputs{units !== null && `: ${units}`}</h4>
      <dl className="flex flex-wrap gap-x-4">
        {inputTexts(published).map(({ name, text }) => (
          <div key={name} className="flex min-w-0 gap-1.5">
            <dt className="shrink-0 text-muted">{name}</dt>
            <dd className="num min-w-0 break-words">{text}</dd>
          </div>
        ))}
      </dl>
    </div>
  );
}

function Notes({
  published,
  comparisons,
}: {
  readonly published: PublishedCase;
  readonly comparisons: readonly Comparison[];
}) {
  const reasons = comparisons.flatMap(({ allowed }) =>
    allowed.kind === 'below' ? [`Below the printed value where it must be: ${allowed.because}.`] : [],
  );
  const notes = [published.assumptions, ...new Set(reasons), ...(published.flags ?? [])];
  return (
    <ul className="grid gap-1 text-xs text-muted">
      {notes.map((note) => (
        <li key={note} className="break-words">
          {note}
        </li>
      ))}
    </ul>
  );
}
