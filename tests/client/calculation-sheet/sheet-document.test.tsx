import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { SheetValue, SheetValueInput } from '#shared/contract/records.ts';
import { NMM_PER_KIPFT } from '#shared/engine/units.ts';
import { buildSheet } from '#shared/sheet/build-sheet.ts';
import { sheetValuesQuery } from '#client/src/features/calculation-sheet/api.ts';
import { SheetDocument } from '#client/src/features/calculation-sheet/sheet-document.tsx';
import { candidateOf, US_BASIS, US_DEMAND, US_SECTION } from '../../sheet/hand-candidate.ts';

const BY = { id: 'c', name: 'C. Checker' };
const candidate = candidateOf();
const computed = candidate.snapshot.evaluation.flexure!;

let sent: SheetValueInput[] = [];
beforeEach(() => {
  sent = [];
  vi.stubGlobal('fetch', (url: string, init: RequestInit) => {
    if (url === '/api/session') return Promise.resolve(Response.json({ person: null, csrfToken: 'token' }));
    sent.push(JSON.parse(init.body as string) as SheetValueInput);
    return Promise.resolve(Response.json({ values: [], mayWrite: true }));
  });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

interface Shown {
  readonly values?: readonly SheetValue[];
  readonly mayWrite?: boolean;
  readonly isUs?: boolean;
}

function show({ values = [], mayWrite = false, isUs = false }: Shown = {}) {
  const shown = isUs ? candidateOf({ section: US_SECTION, basis: US_BASIS, demand: US_DEMAND }) : candidate;
  const units = isUs ? 'us' : 'si';
  const sheet = buildSheet({ project: { name: 'Footbridge', number: 'P-1' }, units, candidate: shown });
  const { evaluation, basis } = shown.snapshot;
  const client = new QueryClient();
  render(
    <QueryClientProvider client={client}>
      <SheetDocument
        sheet={sheet}
        evaluation={evaluation}
        standard={basis.barStandard}
        reading={{ candidateId: 'x', units, readerId: BY.id, values, mayWrite }}
      />
    </QueryClientProvider>,
  );
  return { sheet, client, user: userEvent.setup() };
}

const row = (text: string) => screen.getAllByText(text)[0]!.closest('tr')!;

/** The setter is loaded after the sheet, on a busy machine seconds later. */
const PATIENT = { timeout: 20_000 };

describe('a calculation sheet on screen', () => {
  it('prints every line of the sheet with its number, result and clause', () => {
    const { sheet } = show();
    for (const part of sheet.parts) {
      const table = screen.getByRole('table', { name: part.title });
      const rows = within(table).getAllByRole<HTMLTableRowElement>('row').slice(1);
      const lines = part.kind === 'working' ? part.lines : part.table.rows;
      expect(rows).toHaveLength(lines.length);
      lines.forEach((line, i) => {
        expect(rows[i]!.cells[0]!.textContent).toBe(String(line.number));
        const printed = 'cells' in line ? line.cells : [line.result, line.clause];
        for (const text of printed) expect(rows[i]!.textContent).toContain(text);
      });
    }
    expect(row('86.05 mm').textContent).toContain('f′c\u00a030\u00a0MPa');
    for (const words of [...sheet.conventions, ...sheet.caution])
      expect(document.body.textContent).toContain(words);
  });

  it('sets its formulas, with a fraction for a quotient', async () => {
    show();
    await waitFor(() => expect(document.querySelectorAll('.katex').length).toBeGreaterThan(20), PATIENT);
    expect(row('7.161 ×10⁻⁶/mm').querySelector('.mfrac')).not.toBeNull();
    expect(document.querySelector('.katex-error')).toBeNull();
  });

  it('shows what a checker got by word and sign, in per cent of the sheet', () => {
    const value = (line: string, own: number, onSheet: number) => ({
      line,
      value: own,
      onSheet,
      by: BY,
      updatedAt: '',
    });
    show({
      values: [value('c', 70.3, computed.neutralAxisMm), value('mn', 247e6, computed.nominalMomentNmm)],
    });
    expect(row('86.05 mm').textContent).toContain('70.3≠ differs −18.30\u00a0%');
    expect(row('246.85 kN·m').textContent).toContain('247✓ meets +0.06\u00a0%');
    expect(screen.queryByRole('textbox')).toBeNull();
  });

  it('sends what a checker types in the project’s units as stored units, once', async () => {
    const { user, sheet, client } = show({ mayWrite: true, isUs: true });
    const line = sheet.parts
      .flatMap((part) => (part.kind === 'working' ? part.lines : []))
      .find(({ id }) => id === 'mn')!;
    const field = screen.getByRole('textbox', { name: `Own value for line ${line.number}` });
    await user.type(field, '395.5{Enter}');
    await waitFor(() => expect(sent).toHaveLength(1));
    await user.tab();
    expect(sent).toHaveLength(1);
    expect(sent[0]).toEqual({ line: 'mn', value: 395.5 * NMM_PER_KIPFT });
    await waitFor(() =>
      expect(client.getQueryData(sheetValuesQuery('x').queryKey)).toEqual({ values: [], mayWrite: true }),
    );
  });

  it('keeps what is no number in its field, says so, and sends nothing', async () => {
    const { user } = show({ mayWrite: true });
    const field = screen.getByRole<HTMLInputElement>('textbox', { name: 'Own value for line 1' });
    await user.type(field, 'about 1{Enter}');
    expect(field.value).toBe('about 1');
    expect(document.body.textContent).toContain('“about 1” is not a number');
    expect(sent).toEqual([]);
  });
});
