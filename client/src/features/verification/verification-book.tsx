import { useCallback, useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { TopicResult } from '#shared/verification/book.ts';
import {
  COMPARISONS_INTRODUCTION,
  PROPERTIES_INTRODUCTION,
  TESTED_PROPERTIES,
} from '#shared/verification/properties.ts';
import { TOPICS } from '#shared/verification/topics.ts';
import { useSearchValue } from '#client/src/lib/use-search-value.ts';
import { EmptyState } from '#client/src/ui/empty-state.tsx';
import { BookFilters } from './book-filters.tsx';
import { BookSummary } from './book-summary.tsx';
import { CaseEntry } from './case-entry.tsx';
import { filterBook, findProvenance, type BookFilter } from './filter-book.ts';
import { OutOfScopeTable } from './out-of-scope-table.tsx';
import { PropertyTable } from './property-table.tsx';

const readText = (text: string | null) => text ?? '';
const readTopic = (text: string | null) => TOPICS.find(({ id }) => id === text)?.id ?? null;

function useBookFilter() {
  const [find, setFind] = useSearchValue('find', readText);
  const [topicId, setTopic] = useSearchValue('topic', readTopic);
  const [provenance, setProvenance] = useSearchValue('provenance', findProvenance);
  const change = useCallback(
    (key: 'find' | 'topic' | 'provenance', text: string | null) =>
      ({ find: setFind, topic: setTopic, provenance: setProvenance })[key](text === '' ? null : text),
    [setFind, setTopic, setProvenance],
  );
  const [, setParams] = useSearchParams();
  // In one step: each of three would start from the address as it was and put the other two back.
  const clear = () => setParams({}, { replace: true, preventScrollReset: true, flushSync: true });
  return { filter: { find, topicId, provenance } satisfies BookFilter, change, clear };
}

const countOf = (results: readonly TopicResult[]) =>
  results.reduce((sum, { computed, outOfScope }) => sum + computed.length + outOfScope.length, 0);

/** The whole book: counts, cases by topic, what is not computed, properties and comparisons. */
export function VerificationBook({ results }: { readonly results: readonly TopicResult[] }) {
  const { filter, change, clear } = useBookFilter();
  const { find, topicId, provenance } = filter;
  const shown = useMemo(
    () => filterBook(results, { find, topicId, provenance }),
    [results, find, topicId, provenance],
  );
  const [count, all] = [countOf(shown), countOf(results)];
  const outOfScope = shown.flatMap((result) => result.outOfScope);
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-10">
      <BookSummary results={results} />
      <div className="border-t-2 border-ink pt-4">
        <BookFilters
          filter={filter}
          onChange={change}
          onClear={clear}
          countText={count === all ? `All ${all} cases` : `${count} of ${all} cases`}
        />
      </div>
      {count === 0 && (
        <EmptyState title="No case matches">
          Take a word away, or choose all topics and any provenance.
        </EmptyState>
      )}
      {shown
        .filter(({ computed }) => computed.length > 0)
        .map((result) => (
          <TopicCases key={result.topic.id} result={result} />
        ))}
      {outOfScope.length > 0 && (
        <BookSection
          id="not-computed"
          title="Not computed"
          lead="Kept with their reasons until the engine covers them."
        >
          <OutOfScopeTable cases={outOfScope} />
        </BookSection>
      )}
      <BookSection id="properties" title="Properties tested" lead={PROPERTIES_INTRODUCTION}>
        <PropertyTable
          label="Properties and what was drawn"
          properties={TESTED_PROPERTIES.filter(({ kind }) => kind === 'property')}
        />
      </BookSection>
      <BookSection id="comparisons" title="Independent comparisons" lead={COMPARISONS_INTRODUCTION}>
        <PropertyTable
          label="Comparisons and what was drawn"
          properties={TESTED_PROPERTIES.filter(({ kind }) => kind === 'comparison')}
        />
      </BookSection>
    </div>
  );
}

function TopicCases({ result: { topic, computed } }: { readonly result: TopicResult }) {
  return (
    <section aria-labelledby={topic.id} className="min-w-0">
      <h2 id={topic.id} className="scroll-mt-4 border-b-2 border-ink pb-1 text-xl font-semibold">
        {topic.title}
        <span className="num ml-3 text-base font-normal text-muted">
          {computed.length} {computed.length === 1 ? 'case' : 'cases'}
        </span>
      </h2>
      <div className="[&>article:first-child]:border-t-0">
        {computed.map((entry) => (
          <CaseEntry key={entry.published.id} entry={entry} />
        ))}
      </div>
    </section>
  );
}

interface BookSectionProps {
  readonly id: string;
  readonly title: string;
  readonly lead: string;
  readonly children: React.ReactNode;
}

function BookSection({ id, title, lead, children }: BookSectionProps) {
  return (
    <section aria-labelledby={id} className="grid min-w-0 grid-cols-[minmax(0,1fr)] gap-2">
      <h2 id={id} className="scroll-mt-4 border-b-2 border-ink pb-1 text-xl font-semibold">
        {title}
      </h2>
      <p className="max-w-prose text-sm text-muted">{lead}</p>
      {children}
    </section>
  );
}
