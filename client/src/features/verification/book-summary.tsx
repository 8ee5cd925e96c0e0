import { Link } from 'react-router-dom';
import type { TopicResult } from '#shared/verification/book.ts';
import { quantityText } from '#shared/verification/case-text.ts';
import { differenceSizeText } from '#shared/verification/number-text.ts';
import { summarise, type Summary } from '#shared/verification/summary.ts';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { VerdictMark } from '#client/src/ui/verdict-mark.tsx';
import { ToleranceStrip } from './tolerance-strip.tsx';

/** The head of the book: what is computed in each topic, what is not, and the worst difference. */
export function BookSummary({ results }: { readonly results: readonly TopicResult[] }) {
  return (
    <TableFrame label="The book by topic" minWidth="46rem">
      <thead>
        <tr>
          <th scope="col">Topic</th>
          <th scope="col">Cases reproduced</th>
          <th scope="col" className="figure">
            Values within
          </th>
          <th scope="col" className="figure">
            Worst relative difference
          </th>
          <th scope="col" className="hidden w-[24%] lg:table-cell">
            Differences, from none to the limit
          </th>
          <th scope="col" className="figure">
            Not computed
          </th>
        </tr>
      </thead>
      <tbody>
        {results.map((result) => (
          <TopicRow key={result.topic.id} result={result} />
        ))}
      </tbody>
      <tfoot>
        <tr className="middle">
          <th scope="row">All</th>
          <SummaryCells summary={summarise(results)} />
          <td className="hidden lg:table-cell" />
          <NotComputed summary={summarise(results)} />
        </tr>
      </tfoot>
    </TableFrame>
  );
}

/** Its link shows the topic whole, whatever the filter hides. */
function TopicRow({ result }: { readonly result: TopicResult }) {
  const { topic, computed } = result;
  const summary = summarise([result]);
  return (
    <tr className="middle">
      <th scope="row">
        {summary.cases === 0 ? (
          topic.title
        ) : (
          <Link
            to={{ search: '', hash: topic.id }}
            className="underline decoration-concrete-edge hover:decoration-current"
          >
            {topic.title}
          </Link>
        )}
      </th>
      <SummaryCells summary={summary} />
      <td className="hidden lg:table-cell">
        <ToleranceStrip comparisons={computed.flatMap(({ comparisons }) => comparisons)} />
      </td>
      <NotComputed summary={summary} />
    </tr>
  );
}

function SummaryCells({ summary }: { readonly summary: Summary }) {
  const { cases, reproduced, values, valuesWithin, worst } = summary;
  if (cases === 0)
    return (
      <td colSpan={3} className="text-muted">
        none yet
      </td>
    );
  return (
    <>
      <td>
        <span className="flex items-center gap-3 whitespace-nowrap">
          <span className="num">
            {reproduced} of {cases}
          </span>
          <VerdictMark
            verdict={reproduced === cases ? 'meets' : 'fails'}
            word={reproduced === cases ? 'all' : `${cases - reproduced} not`}
          />
        </span>
      </td>
      <td className="figure">
        {valuesWithin} of {values}
      </td>
      <td className="figure">
        {worst !== null && (
          <>
            {differenceSizeText(worst.comparison)}
            <span className="ml-2 text-muted">
              {worst.caseId} {quantityText(worst.comparison)}
            </span>
          </>
        )}
      </td>
    </>
  );
}

function NotComputed({ summary }: { readonly summary: Summary }) {
  return <td className="figure">{summary.outOfScope === 0 ? '' : summary.outOfScope}</td>;
}
