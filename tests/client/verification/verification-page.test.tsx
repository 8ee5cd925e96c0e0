import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { ENGINE_VERSION } from '#shared/engine/version.ts';
import { computeBook } from '#shared/verification/book.ts';
import { TESTED_PROPERTIES } from '#shared/verification/properties.ts';
import { summarise } from '#shared/verification/summary.ts';
import { VerificationPage } from '#client/src/app/pages/verification-page.tsx';

const book = computeBook();
const all = summarise(book);
const count = all.cases + all.outOfScope;

// The whole book is some ten thousand elements, which this document builds slowly.
vi.setConfig({ testTimeout: 60_000 });
afterEach(cleanup);

async function open(address = '/verification') {
  const router = createMemoryRouter([{ path: '/verification', Component: VerificationPage }], {
    initialEntries: [address],
  });
  render(
    <QueryClientProvider client={new QueryClient()}>
      <RouterProvider router={router} />
    </QueryClientProvider>,
  );
  await screen.findByText(/^(All|\d+ of) \d+ cases$/, {}, { timeout: 30_000 });
}

/** Rows as their texts. Queries by role read the style of each of some thousand elements, so the rest asks the document. */
const rowsOf = (table: string) =>
  [...document.querySelector<HTMLTableElement>(`table[aria-label="${table}"]`)!.rows].map((row) =>
    [...row.cells].map((cell) => cell.textContent),
  );
const topicRows = () => rowsOf('The book by topic').map((cells) => cells.join(' '));
const shownCases = () =>
  [...document.querySelectorAll('article h3')].map((heading) => heading.firstChild!.textContent);
const countText = () => document.querySelector('[role=status]')!.textContent;

describe('the verification book on the page', () => {
  it('says which engine computed it and counts what it holds, by topic and in all', async () => {
    await open();
    expect(screen.getByText(ENGINE_VERSION)).toBeTruthy();
    const rows = topicRows();
    expect(rows.at(-1)).toContain(`${all.reproduced} of ${all.cases}`);
    expect(rows.at(-1)).toContain(`${all.valuesWithin} of ${all.values}`);
    expect(rows.at(-1)).toContain(all.worst!.caseId);
    for (const result of book) {
      const { cases, reproduced } = summarise([result]);
      const row = rows.find((text) => text.startsWith(result.topic.title))!;
      expect(row).toContain(cases === 0 ? 'none yet' : `${reproduced} of ${cases}`);
    }
    expect(shownCases()).toEqual(
      book.flatMap(({ computed }) => computed.map(({ published }) => published.id)),
    );
    expect(countText()).toBe(`All ${count} cases`);
  });

  it('shows a case with its source, provenance, inputs, and each printed value beside ours with a word for the result', async () => {
    await open('/verification?find=ACI-S01');
    const entry = screen.getByRole('article', { name: /ACI-S01/ });
    expect(entry.textContent).toContain('Wight & MacGregor');
    expect(entry.textContent).toContain('Read in the source');
    expect(entry.textContent).toContain('3 No. 9');
    expect(rowsOf('ACI-S01, printed and computed values').at(-1)).toEqual([
      'φMn',
      '256',
      '256.22',
      '+0.085 %',
      '± 0.3 %',
      'within',
    ]);
  });

  it('lists what is not computed with the reason, and every property with its numbers', async () => {
    await open('/verification?topic=optima');
    const outOfScope = book.find(({ topic }) => topic.id === 'optima')!.outOfScope;
    const rows = rowsOf('Cases not computed').slice(1);
    expect(rows).toHaveLength(outOfScope.length);
    outOfScope.forEach(({ published, reason }, i) => {
      expect(rows[i]![0]).toContain(published.id);
      expect(rows[i]![3]).toBe(reason);
    });
    const properties = [
      ...rowsOf('Properties and what was drawn'),
      ...rowsOf('Comparisons and what was drawn'),
    ];
    for (const { statement, runs } of TESTED_PROPERTIES)
      expect(properties.find(([text]) => text === statement)![1]).toContain(runs.toLocaleString('en-US'));
  });
});

describe('finding a case', () => {
  const choose = (label: string, value: string) =>
    fireEvent.change(screen.getByLabelText(label), { target: { value } });

  it('narrows by words, provenance and topic, keeps the counts of the whole book, and goes back to all', async () => {
    await open('/verification?topic=optima');
    expect(shownCases()).toEqual(['OPT-01', 'OPT-04']);
    choose('Provenance', 'derived');
    expect(shownCases()).toEqual(['OPT-04']);
    expect(countText()).toBe(`1 of ${count} cases`);
    expect(topicRows().at(-1)).toContain(`${all.reproduced} of ${all.cases}`);
    choose('Topic', '');
    expect(shownCases()).toEqual(['EN-07', 'HAND-01', 'HAND-02', 'HAND-03', 'OPT-04']);
    choose('Find', 'navfac blast');
    choose('Provenance', '');
    expect(shownCases()).toEqual(['ACI-S07']);
    choose('Find', 'no such book');
    expect(screen.getByText('No case matches')).toBeTruthy();
    expect(shownCases()).toEqual([]);
    fireEvent.click(screen.getByText('Show all'));
    expect(countText()).toBe(`All ${count} cases`);
  });
});
