import { ENGINE_VERSION } from '#shared/engine/version.ts';
import type { CaseOutOfScope, ComputedCase, TopicResult } from '#shared/verification/book.ts';
import {
  inputTexts,
  placeText,
  provenanceText,
  quantityText,
  unitsText,
} from '#shared/verification/case-text.ts';
import {
  allowedText,
  computedText,
  differenceSizeText,
  differenceText,
  printedText,
} from '#shared/verification/number-text.ts';
import {
  COMPARISONS_INTRODUCTION,
  PROPERTIES_INTRODUCTION,
  TESTED_PROPERTIES,
  type TestedProperty,
} from '#shared/verification/properties.ts';
import { summarise, type Summary } from '#shared/verification/summary.ts';

const cell = (text: string) => text.replaceAll('|', '\\|').replaceAll('\n', ' ');
const row = (cells: readonly string[]) => `| ${cells.map(cell).join(' | ')} |`;

function table(heads: readonly string[], rows: readonly (readonly string[])[]): string {
  return [row(heads), row(heads.map(() => '---')), ...rows.map(row)].join('\n');
}

/** Underscores and stars of a source's own notation are letters here, not emphasis. */
const plain = (text: string) => text.replaceAll(/([*_<>[\]])/g, '\\$1');

const worstText = ({ worst }: Summary) =>
  worst === null ? '' : `${differenceSizeText(worst.comparison)} (${worst.caseId})`;

const summaryRow = (title: string, summary: Summary) => [
  title,
  `${summary.reproduced} of ${summary.cases}`,
  `${summary.valuesWithin} of ${summary.values}`,
  worstText(summary),
  String(summary.outOfScope),
];

function summaryTable(results: readonly TopicResult[]): string {
  return table(
    ['topic', 'cases reproduced', 'values within', 'worst relative difference', 'not computed'],
    [
      ...results.map((result) => summaryRow(result.topic.title, summarise([result]))),
      summaryRow('all', summarise(results)),
    ],
  );
}

function caseText({ published, comparisons, isReproduced }: ComputedCase): string {
  const units = unitsText(published);
  const reasons = new Set(
    comparisons.flatMap(({ allowed }) => (allowed.kind === 'below' ? [allowed.because] : [])),
  );
  const facts = [
    `Source: ${published.source}`,
    `Provenance: ${provenanceText(published)}; ${published.kind}`,
    `Inputs: ${inputTexts(published)
      .map(({ name, text }) => `${name} = ${text}`)
      .join('; ')}`,
    ...(units === null ? [] : [`Units: ${units}`]),
    `Assumptions: ${published.assumptions}`,
    ...(published.flags ?? []).map((flag) => `Note: ${flag}`),
    ...[...reasons].map((because) => `Below the printed value where it must be: ${because}`),
    `Result: ${isReproduced ? 'reproduced' : 'NOT REPRODUCED'}`,
  ];
  const values = comparisons.map((comparison) => [
    plain([quantityText(comparison), placeText(comparison)].filter((text) => text !== '').join(', ')),
    printedText(comparison.printed),
    computedText(comparison),
    plain(differenceText(comparison)),
    allowedText(comparison.allowed),
    comparison.isWithin ? 'within' : 'OUTSIDE',
  ]);
  return [
    `### ${published.id}: ${published.topic}`,
    facts.map((fact) => `- ${plain(fact)}`).join('\n'),
    table(['value', 'printed', 'computed', 'difference', 'allowed', 'result'], values),
  ].join('\n\n');
}

const outOfScopeRow = ({ published, reason }: CaseOutOfScope) => [
  published.id,
  plain(published.topic),
  plain(published.source),
  plain(provenanceText(published)),
  plain(reason),
];

const propertyRow = ({ statement, of, runs, atLeast }: TestedProperty) => [
  statement,
  `${runs.toLocaleString('en-US')} ${of}${atLeast ? `, at least ${atLeast.count.toLocaleString('en-US')} ${atLeast.what}` : ''}`,
];

const propertiesOf = (kind: TestedProperty['kind']) =>
  table(['statement', 'drawn at random'], TESTED_PROPERTIES.filter((p) => p.kind === kind).map(propertyRow));

/** The book as a page of the repository's documents: the same text for the same engine, on any machine. */
export function verificationBookText(results: readonly TopicResult[]): string {
  const chapters = results
    .filter(({ computed }) => computed.length > 0)
    .map(({ topic, computed }) => [`## ${topic.title}`, ...computed.map(caseText)].join('\n\n'));
  const outOfScope = results.flatMap((result) => result.outOfScope);
  return `${[
    '# Verification book',
    `Every published case the engine is held to, each printed value beside the computed one. Engine ${ENGINE_VERSION}.`,
    'Written by `npm run verification` from `shared/verification`, the code that the tests run and that the page /verification runs in the browser; a test fails when this file is not up to date. Values remembered rather than read say so. A case reproduced says that the method was followed, not that a design is fit: a licensed engineer verifies the design under the code in force locally.',
    summaryTable(results),
    ...chapters,
    '## Not computed',
    table(['case', 'topic', 'source', 'provenance', 'reason'], outOfScope.map(outOfScopeRow)),
    '## Properties tested',
    PROPERTIES_INTRODUCTION,
    propertiesOf('property'),
    '## Independent comparisons',
    COMPARISONS_INTRODUCTION,
    propertiesOf('comparison'),
  ].join('\n\n')}\n`;
}
