import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { candidateTransitions } from '#server/db/schema/candidate-transitions.ts';
import { sheetValues } from '#server/db/schema/sheet-values.ts';
import { calculationSheetPdf } from '#server/files/calculation-sheet-pdf.ts';
import type { Candidate, CandidateState, SheetValue } from '#shared/contract/records.ts';
import { largePlan } from '#shared/drawing/large-plan.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { MM_PER_IN } from '#shared/engine/units.ts';
import { buildSheet } from '#shared/sheet/build-sheet.ts';
import { candidateOf, HAND_SECTION, US_BASIS, US_DEMAND, US_SECTION } from '../sheet/hand-candidate.ts';
import { addProject, PRICE_BOOK, type OfficeProject } from '../support/office-project.ts';
import type { Account, TestOffice } from '../support/office.ts';
import { pdfPageCount, pdfPageSize, pdfText } from '../support/pdf-text.ts';
import { openTestOffice } from '../support/test-office.ts';

/** Plain layers every 90 mm. */
const LAYERED: SectionInput = {
  ...HAND_SECTION,
  depthMm: 800,
  reinforcement: {
    kind: 'layers',
    layers: Array.from({ length: 8 }, (_, i) => ({
      depthMm: 60 + 90 * i,
      areaMm2: 500,
      face: i < 2 ? ('compression' as const) : ('tension' as const),
    })),
  },
};

/** Every check and every step there is, in US units. */
const SPECIAL = {
  section: {
    ...US_SECTION,
    widthMm: 16 * MM_PER_IN,
    depthMm: 40 * MM_PER_IN,
    stirrup: { bar: '#4', legs: 4, spacingMm: 12 * MM_PER_IN, isDesigned: true },
    flange: {
      shape: 't',
      thicknessMm: 127,
      face: 'compression',
      width: { kind: 'effective', clearToNextWebMm: 2400, spanMm: 9000 },
    },
    reinforcement: {
      kind: 'bars',
      tension: [{ bar: '#9', count: 8 }],
      compression: [{ bar: '#8', count: 6 }],
    },
  },
  basis: { ...US_BASIS, seismicSystem: 'special', skinBar: '#4', ductilityMeasure: 'curve-bilinear' },
  demand: { ...US_DEMAND, vuN: 400e3, spanMm: 9000, support: 'both-ends-continuous' },
} as const;

let office: TestOffice;
let project: OfficeProject;
beforeAll(async () => {
  office = await openTestOffice();
  project = await addProject(office);
});
afterAll(() => office.close());

let depthMm = HAND_SECTION.depthMm;
/** A candidate no other test has; the first is HAND-01 itself. */
async function pinNew(account: Account = 'engineer'): Promise<Candidate> {
  const source = { kind: 'section', section: { ...HAND_SECTION, fcMPa: 28, depthMm } };
  depthMm += 5;
  const input = { beamId: project.beamId, source, note: '' };
  return (
    await (await office.as(account)).post(`/projects/${project.projectId}/candidates`, input).expect(200)
  ).body;
}

const put = async (account: Account, id: string, body: object) =>
  (await office.as(account)).put(`/candidates/${id}/sheet-values`, body);
const read = async (account: Account, id: string) =>
  (await (await office.as(account)).get(`/candidates/${id}/sheet-values`).expect(200)).body;
const move = async (account: Account, id: string, to: CandidateState) =>
  (await office.as(account)).post(`/candidates/${id}/transitions`, { to, note: 'As agreed' });

describe('own values', () => {
  test('are kept per line, changed and taken away, and everyone on the project sees them', async () => {
    const { id, snapshot } = await pinNew();
    const { nominalMomentNmm, neutralAxisMm } = snapshot.evaluation.flexure!;
    expect((await put('checker', id, { line: 'mn', value: 250e6 })).status).toBe(200);
    await put('checker', id, { line: 'c', value: 86 });
    const changed = await put('checker', id, { line: 'mn', value: 246e6 });
    const expected = [
      { line: 'c', value: 86, onSheet: neutralAxisMm },
      { line: 'mn', value: 246e6, onSheet: nominalMomentNmm },
    ];
    expect(changed.body.values).toMatchObject(expected);
    expect(changed.body.values[0].by).toEqual({ id: office.idOf('checker'), name: 'The checker' });
    expect((await read('viewer', id)).values).toEqual(changed.body.values);
    await put('checker', id, { line: 'c', value: null });
    expect((await read('engineer', id)).values).toMatchObject([expected[1]!]);
  });

  test('are written by a checker only, never by the author, and the reader is told so', async () => {
    const { id } = await pinNew();
    for (const account of ['engineer', 'admin', 'estimator', 'viewer'] as const) {
      const refused = await put(account, id, { line: 'mn', value: 1 });
      expect([account, refused.status, refused.body.error.code]).toEqual([account, 403, 'forbidden']);
      expect((await read(account, id)).mayWrite).toBe(false);
    }
    expect((await put('outsider', id, { line: 'mn', value: 1 })).status).toBe(404);
    await (await office.as('outsider')).get(`/candidates/${id}/sheet-values`).expect(404);
    expect(await read('checker', id)).toEqual({ values: [], mayWrite: true });
  });

  test('that are no number, or for a line there is not, are refused at the field', async () => {
    const { id } = await pinNew();
    for (const value of ['12', Number.NaN, 1e30, undefined, true]) {
      const refused = await put('checker', id, { line: 'mn', value });
      // JSON has no NaN: it arrives as null, which takes a value away.
      if (Number.isNaN(value)) expect(refused.body.values).toEqual([]);
      else expect([refused.status, refused.body.error.issues[0].path]).toEqual([400, ['value']]);
    }
    for (const line of ['', 'nothing', 'residual']) {
      const refused = await put('checker', id, { line, value: 1 });
      expect([line, refused.status, refused.body.error.issues[0].path]).toEqual([line, 400, ['line']]);
    }
  });

  test('are recorded by the check and by the approval as they were, and closed after it', async () => {
    const { id } = await pinNew();
    await put('checker', id, { line: 'mn', value: 240e6 });
    await move('checker', id, 'checked');
    await put('checker', id, { line: 'mn', value: 241e6 });
    const approved: Candidate = (await move('checker', id, 'approved')).body;
    const recorded = approved.transitions.map(({ to, sheetValues: values }) => [
      to,
      values?.map(({ value }) => value),
    ]);
    expect(recorded).toEqual([
      ['proposed', undefined],
      ['checked', [240e6]],
      ['approved', [241e6]],
    ]);
    const late = await put('checker', id, { line: 'mn', value: 1 });
    expect([late.status, late.body.error.message]).toEqual([
      409,
      `Candidate ${approved.label} is approved now, and its calculation sheet is closed`,
    ]);
    const { db } = office.deps;
    const rewrite = db
      .update(candidateTransitions)
      .set({ sheetValues: [] })
      .where(eq(candidateTransitions.candidateId, id));
    await expect(rewrite).rejects.toMatchObject({ cause: { message: /only ever added/ } });
  });

  test('written while the candidate is approved are in the record or refused, never lost', async () => {
    for (let i = 0; i < 4; i++) {
      const { id } = await pinNew();
      await move('checker', id, 'checked');
      const [written, approved] = await Promise.all([
        put('checker', id, { line: 'mn', value: 5e6 }),
        move('checker', id, 'approved'),
      ]);
      const recorded: SheetValue[] = approved.body.transitions.at(-1).sheetValues;
      expect(recorded.length).toBe(written.status === 200 ? 1 : 0);
    }
  });

  test('in money are kept from readers without rates, also in the record', async () => {
    const { id } = await pinNew();
    expect((await put('checker', id, { line: 'cost-total', value: 91.5 })).status).toBe(200);
    await put('checker', id, { line: 'mn', value: 240e6 });
    await move('checker', id, 'checked');
    expect((await read('viewer', id)).values.map(({ line }: SheetValue) => line)).toEqual(['mn']);
    const { text } = await (await office.as('viewer')).get(`/candidates/${id}`).expect(200);
    expect(text).not.toContain('cost-total');
    expect((await (await office.as('estimator')).get(`/candidates/${id}`)).text).toContain('cost-total');
  });

  test('are held to their constraints by the database itself', async () => {
    const { id } = await pinNew();
    const { db } = office.deps;
    const insert = (values: object) =>
      db
        .insert(sheetValues)
        .values({ candidateId: id, line: 'mn', personId: office.idOf('checker'), value: 1, ...values });
    const refused = (constraint: string) => ({ cause: { constraint } });
    await expect(insert({ value: Number.NaN })).rejects.toMatchObject(refused('sheet_values_value_check'));
    await expect(insert({ line: '' })).rejects.toMatchObject(refused('sheet_values_line_check'));
    await insert({});
    await expect(insert({ value: 2 })).rejects.toMatchObject(refused('sheet_values_pk'));
  });
});

describe('the sheet as a file', () => {
  const pdfOf = async (account: Account, id: string, query = '') =>
    (await office.as(account)).get(`/candidates/${id}/sheet.pdf${query}`).buffer(true);

  test('is a PDF to download, byte for byte the same when asked again', async () => {
    const { id, label } = await pinNew();
    const first = await pdfOf('engineer', id);
    expect(first.status).toBe(200);
    expect(first.headers['content-type']).toBe('application/pdf');
    expect(first.headers['content-disposition']).toBe(`attachment; filename=sheet-B1-${label}.pdf`);
    expect(first.body.subarray(0, 5).toString()).toBe('%PDF-');
    const again = await pdfOf('engineer', id);
    expect(again.body.equals(first.body)).toBe(true);
    const letter = await pdfOf('engineer', id, '?paper=letter');
    expect(letter.body.equals(first.body)).toBe(false);
  });

  test('is read by whoever may read the candidate, on paper there is', async () => {
    const { id } = await pinNew();
    expect((await pdfOf('viewer', id)).status).toBe(200);
    expect((await pdfOf('outsider', id)).status).toBe(404);
    expect((await pdfOf('admin', 'nothing')).status).toBe(404);
    expect((await fetch(`${office.origin}/api/candidates/${id}/sheet.pdf`)).status).toBe(401);
    const refused = await (await office.as('engineer')).get(`/candidates/${id}/sheet.pdf?paper=a0`);
    expect([refused.status, refused.body.error.issues[0]]).toEqual([
      400,
      { path: ['paper'], message: 'Paper must be a4 or letter' },
    ]);
  });

  const fileOf = (
    candidate: Candidate,
    paper: 'a4' | 'letter',
    units: 'si' | 'us' = 'si',
    ownValues: SheetValue[] = [],
  ) =>
    calculationSheetPdf({
      sheet: buildSheet({ project: { name: 'Footbridge', number: 'P-1' }, units, candidate }),
      ownValues,
      paper,
      writtenAt: new Date(candidate.createdAt),
      footer: 'P-1',
      isCompressed: false,
    });

  test.each([
    ['a4', '595.28 841.89'],
    ['letter', '612 792'],
  ] as const)('on %s is two to four pages of that size, in both unit systems', async (paper, size) => {
    const usCandidate = candidateOf({ section: US_SECTION, basis: US_BASIS, demand: US_DEMAND });
    for (const file of [await fileOf(candidateOf(), paper), await fileOf(usCandidate, paper, 'us')]) {
      expect(pdfPageCount(file)).toBeGreaterThanOrEqual(2);
      expect(pdfPageCount(file)).toBeLessThanOrEqual(4);
      expect(pdfPageSize(file)).toBe(size);
    }
  });

  test.each([
    ['with eight layers of steel', 'si', candidateOf({ section: LAYERED })],
    ['of a T in a special frame, with side bars and designed stirrups', 'us', candidateOf(SPECIAL)],
  ] as const)('%s stays within four pages, on either paper', async (_, units, candidate) => {
    for (const paper of ['a4', 'letter'] as const)
      expect(pdfPageCount(await fileOf(candidate, paper, units))).toBeLessThanOrEqual(4);
  });

  test('made on the thread is what it is without one', async () => {
    const candidate = candidateOf();
    const source = { project: { name: 'Footbridge', number: 'P-1' }, units: 'si', candidate } as const;
    const writtenAt = new Date(candidate.createdAt);
    const rest = { ownValues: [], paper: 'letter', writtenAt, footer: 'P-1' } as const;
    const [apart, again, here] = await Promise.all([
      office.deps.sheetDesk.pdf({ source, ...rest }),
      office.deps.sheetDesk.pdf({ source, ...rest }),
      calculationSheetPdf({ sheet: buildSheet(source), ...rest }),
    ]);
    expect(apart.equals(here)).toBe(true);
    expect(again.equals(here)).toBe(true);
  });

  test('prints every word and digit of the sheet, the hand-worked ones among them', async () => {
    const candidate = candidateOf();
    const by = { id: '9', name: 'C. Checker' };
    const own = {
      line: 'c',
      value: 70.3,
      onSheet: candidate.snapshot.evaluation.flexure!.neutralAxisMm,
      by,
      updatedAt: '',
    };
    const text = pdfText(await fileOf(candidate, 'a4', 'si', [own])).replace(/\s+/g, '');
    const has = (wanted: string) =>
      expect([wanted, text.includes(wanted.replace(/\s+/g, ''))]).toEqual([wanted, true]);
    for (const digits of [
      '0.8357',
      '86.05 mm',
      '71.91 mm',
      '246.85 kN·m',
      '222.16 kN·m',
      '144.2 mm',
      '7.161 ×10⁻⁶/mm',
    ])
      has(digits);
    has('70.3 ≠ differs −18.30 %');
    const sheet = buildSheet({ project: { name: 'Footbridge', number: 'P-1' }, units: 'si', candidate });
    for (const part of sheet.parts) {
      has(part.title);
      if (part.kind === 'working')
        for (const { result, clause, inputs } of part.lines)
          for (const printed of [result, clause, ...inputs.map((input) => input.text)]) has(printed);
      else for (const { cells } of part.table.rows) for (const cell of cells) has(cell);
    }
    for (const words of [...sheet.conventions, ...sheet.notChecked, ...sheet.caution, candidate.hash])
      has(words);
  });

  test('draws every bar as a circle at the place the engine gave it, to one scale', async () => {
    const candidate = candidateOf();
    const { drawing } = buildSheet({ project: { name: 'F', number: 'P' }, units: 'si', candidate });
    const { at } = largePlan(drawing.section, drawing.geometry, 'si');
    const source = (await fileOf(candidate, 'a4')).toString('latin1');
    const { bars } = candidate.snapshot.evaluation.arrangement!;
    expect(bars).toHaveLength(5);
    const printed = (value: number) => String(Math.round(value * 1e6) / 1e6);
    for (const { xMm, yMm, diameterMm } of bars) {
      const left = printed(at.xPx + xMm * at.pxPerMm - (diameterMm / 2) * at.pxPerMm);
      expect(source).toContain(`\n${left} ${printed(at.yPx + yMm * at.pxPerMm)} m\n`);
    }
    expect(source).not.toContain('/Subtype /Image');
  });

  test('shows a viewer no rate and no cost', async () => {
    const priced = candidateOf();
    const { id } = await pinNew();
    const viewers: Candidate = (await (await office.as('viewer')).get(`/candidates/${id}`).expect(200)).body;
    const text = pdfText(await fileOf(viewers, 'a4'));
    expect(text).not.toContain(PRICE_BOOK.currency);
    expect(text).not.toContain('Cost');
    expect(pdfText(await fileOf(priced, 'a4'))).toContain('Cost');
  });
});
