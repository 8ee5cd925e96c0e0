import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { projects } from '#server/db/schema/projects.ts';
import type { Candidate, Run, ViewProgress } from '#shared/contract/records.ts';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import type { Evaluation } from '#shared/engine/evaluation.ts';
import { MM_PER_IN } from '#shared/engine/units.ts';
import { expandSpace, sectionAt } from '#shared/sweep/space.ts';
import {
  addProject,
  DESIGN_BASIS,
  PRICE_BOOK,
  SMALL_SWEEP,
  type OfficeProject,
} from '../support/office-project.ts';
import type { Account, TestOffice } from '../support/office.ts';
import { parseCsv, readTable } from '../support/read-table.ts';
import { recalculate } from '../support/recalculate.ts';
import { followRun, hasEnded } from '../support/run-stream.ts';
import { openTestOffice } from '../support/test-office.ts';
import { readWorkbook, rowsOf } from '../support/workbook-text.ts';

const ROLES = ['admin', 'engineer', 'checker', 'estimator', 'viewer'] as const;
/** A name that a spreadsheet would run and a header would break on. */
const WICKED = '=HYPERLINK("http://x","b"),\r\n@";filename=evil.exe';

let office: TestOffice;
let project: OfficeProject;
let run: Run;
let view: ViewProgress;
let pins: Candidate[];

beforeAll(async () => {
  office = await openTestOffice();
  project = await addProject(office);
  const engineer = await office.as('engineer');
  const { body } = await engineer.post(`/sweeps/${await project.addSweep(SMALL_SWEEP)}/runs`).expect(200);
  const stream = await followRun(office, engineer, { runId: body.id });
  view = (await stream.until(hasEnded)).progress;
  stream.close();
  run = (await engineer.get(`/runs/${body.id}`).expect(200)).body;
  pins = [];
  for (const { index } of view.result!.front.slice(0, 2)) {
    const pin = { beamId: project.beamId, source: { kind: 'run', runId: run.id, index }, note: '' };
    pins.push((await engineer.post(`/projects/${project.projectId}/candidates`, pin).expect(200)).body);
  }
});
afterAll(() => office.close());

/** The bytes as they come, whatever their kind. */
async function fetchFile(account: Account, path: string) {
  const answer = await fetch(`${office.origin}/api${path}`, {
    headers: { cookie: (await office.as(account)).cookie },
  });
  return {
    status: answer.status,
    headers: answer.headers,
    bytes: new Uint8Array(await answer.arrayBuffer()),
  };
}

const sectionsOf = (query: string, format = 'csv') => `/runs/${run.id}/sections.${format}?${query}`;
const takeoffOf = (query = '', format = 'xlsx') =>
  `/projects/${project.projectId}/takeoff.${format}?${query}`;

async function csvOf(account: Account, path: string) {
  const { status, bytes } = await fetchFile(account, path);
  expect(status, Buffer.from(bytes).toString()).toBe(200);
  return readTable(parseCsv(bytes));
}

async function evaluationOf(index: number): Promise<Evaluation> {
  return (await (await office.as('engineer')).get(`/runs/${run.id}/sections/${index}`).expect(200)).body
    .evaluation;
}

describe('sections of a run', () => {
  test('are the front as the run has it, with the numbers the service gives for each section', async () => {
    const { head, rows } = await csvOf('engineer', sectionsOf('list=front'));
    const { front } = view.result!;
    expect(rows.map((row) => Number(row['Section']))).toEqual(front.map(({ index }) => index));
    expect(rows.map((row) => Number(row['Sections that tie']))).toEqual(
      front.map(({ tieCount }) => tieCount),
    );
    const { measures, checks } = await evaluationOf(front[0]!.index);
    expect(Number(rows[0]!['Steel, kg/m'])).toBeCloseTo(measures.steelKgPerM!, 7);
    expect(Number(rows[0]!['Cost, XTS/m'])).toBeCloseTo(measures.costPerM!, 5);
    expect(Number(rows[0]!['Design strength φMn, kN·m'])).toBeCloseTo(measures.designStrengthNmm! / 1e6, 5);
    expect(Number(rows[0]!['Its ratio'])).toBeCloseTo(Math.max(...checks.map(({ ratio }) => ratio ?? 0)), 7);
    expect(head).toMatchObject({
      Beam: 'B1 Level 2, grid C',
      Sweep: 'A sweep',
      Run: '1',
      'Hash of the result': run.hash,
      'Design code': 'ACI 318M-19',
      'Engine of the run': run.engineVersion,
      Started: run.createdAt,
      Ranges: 'none',
      Rows: String(front.length),
    });
    expect(head['Caution']).toContain('licensed engineer');
    expect(head['What it says']).toContain('meets the listed checks');
  });

  test('are all that meet the checks and lie within the ranges, in both formats alike', async () => {
    const ranges = 'f=depthMm:500~700;fc:28~28;tensionSteel:~2000';
    const csv = await csvOf('engineer', sectionsOf(`list=all&${ranges}`));
    const xlsx = await fetchFile('engineer', sectionsOf(`list=all&${ranges}`, 'xlsx'));
    const sheet = readTable(rowsOf(readWorkbook(xlsx.bytes).get('Sections')!));
    expect(sheet).toEqual(csv);
    expect(csv.head['Ranges']).toBe('h 500–700 mm; f′c 28–28 MPa; As ≤ 2,000 mm²');

    const { space: definition, ...context } = SMALL_SWEEP;
    const space = expandSpace(definition, 'iso');
    const expected = Array.from({ length: space.size }, (_, index) => index).filter((index) => {
      const section = sectionAt(space, index);
      if (section.depthMm < 500 || section.depthMm > 700 || section.fcMPa !== 28) return false;
      const { meetsListedChecks, geometry } = evaluateSection(section, { ...context, basis: run.basis });
      return meetsListedChecks && geometry!.asMm2 <= 2000;
    });
    expect(expected.length).toBeGreaterThan(20);
    expect(csv.rows.map((row) => Number(row['Section'])).toSorted((a, b) => a - b)).toEqual(expected);
    const steel = csv.rows.map((row) => Number(row['Steel, kg/m']));
    expect(steel).toEqual(steel.toSorted((a, b) => a - b));
  });

  test('of the band are within its share of the best, also where ranges have to be looked into', async () => {
    const { rows } = await csvOf('engineer', sectionsOf('list=band&band=8'));
    const { x: best } = view.result!.front[0]!;
    const within = view.result!.band.filter(({ x }) => x <= best * 1.08);
    expect(rows.map((row) => Number(row['Section']))).toEqual(within.map(({ index }) => index));
    const ranged = await csvOf('engineer', sectionsOf('list=band&band=8&f=widthMm:300~350'));
    const least = Math.min(...ranged.rows.map((row) => Number(row['Steel, kg/m'])));
    expect(ranged.rows.every((row) => Number(row['Steel, kg/m']) <= least * 1.08 + 1e-6)).toBe(true);
    expect(ranged.rows.every((row) => Number(row['Width b, mm']) <= 350)).toBe(true);
  });

  test('the front within ranges is the front of what lies within them, and none at all is a table without rows', async () => {
    const { rows } = await csvOf('engineer', sectionsOf('list=front&f=depthMm:~600'));
    const [steel, depth] = ['Steel, kg/m', 'Depth h, mm'].map((head) => rows.map((row) => Number(row[head])));
    expect(depth!.every((value) => value <= 600)).toBe(true);
    expect(steel).toEqual(steel!.toSorted((a, b) => a - b));
    expect(depth).toEqual(depth!.toSorted((a, b) => b - a));
    expect((await csvOf('engineer', sectionsOf('list=all&f=depthMm:9000~'))).head['Rows']).toBe('0');
  });

  test('are in the units of the project', async () => {
    const { db } = office.deps;
    await db
      .update(projects)
      .set({ designBasis: { ...DESIGN_BASIS, units: 'us' } })
      .where(eq(projects.id, project.projectId));
    const { head, rows } = await csvOf('engineer', sectionsOf('list=front'));
    await db.update(projects).set({ designBasis: DESIGN_BASIS }).where(eq(projects.id, project.projectId));
    const { measures } = await evaluationOf(view.result!.front[0]!.index);
    expect(head['Units']).toContain('US');
    expect(Number(rows[0]!['Depth h, in'])).toBeCloseTo(measures.depthMm! / MM_PER_IN, 6);
  });

  test('are refused in plain words where they cannot be had', async () => {
    const refused = async (query: string) => {
      const { status, bytes } = await fetchFile('engineer', sectionsOf(query));
      return [status, JSON.parse(Buffer.from(bytes).toString()).error.message];
    };
    expect(await refused('x=widthMm&y=depthMm')).toEqual([
      409,
      expect.stringContaining('open it on the run’s page'),
    ]);
    expect(await refused('x=widthMm')).toEqual([400, expect.any(String)]);
    expect((await refused('f=depth:1~2'))[0]).toBe(400);
    expect((await refused('f=depthMm:700~500'))[0]).toBe(400);
    expect((await refused('list=everything'))[0]).toBe(400);
    expect((await fetchFile('engineer', sectionsOf('', 'ods'))).status).toBe(404);
  });
});

describe('takeoff', () => {
  const cellAfter = (rows: (string | number | null)[][], words: string, column = 1) => {
    const at = rows.findIndex(([first]) => first === words);
    return { name: `${String.fromCharCode(65 + column)}${at + 1}`, value: rows[at]?.[column] };
  };

  test('recalculates to the service’s own numbers, and a rate typed anew changes every total', async () => {
    const { bytes, headers } = await fetchFile(
      'estimator',
      takeoffOf(`pins=${pins.map(({ id }) => id).join()}`),
    );
    expect(headers.get('content-disposition')).toMatch(/^attachment; filename=P-1-takeoff-A-B\.xlsx$/);
    const workbook = readWorkbook(bytes);
    expect([...workbook.keys()]).toEqual(['Options', 'A', 'B']);
    for (const { label, takeoff } of pins) {
      const rows = rowsOf(workbook.get(label)!);
      const read = recalculate(workbook);
      expect(read(label, cellAfter(rows, 'Steel in all', 6).name)).toBeCloseTo(takeoff.totalTonnes, 9);
      expect(read(label, cellAfter(rows, 'In all', 8).name)).toBeCloseTo(takeoff.cost!, 4);
      expect(read(label, cellAfter(rows, 'In all', 10).name)).toBeCloseTo(takeoff.co2eKg!, 3);
    }
    // What is shown where nothing recalculates is what the formulas come to.
    const read = recalculate(workbook);
    for (const [sheet, cells] of workbook)
      for (const [name, { formula, value }] of cells) {
        if (formula === null) continue;
        const anew = read(sheet, name);
        if (typeof anew === 'number') expect(value, `${sheet}!${name}`).toBeCloseTo(anew, 6);
        else expect([`${sheet}!${name}`, value ?? '']).toEqual([`${sheet}!${name}`, anew]);
      }

    const rate = cellAfter(rowsOf(workbook.get('A')!), 'Rate of longitudinal bars, XTS/kg');
    const dearer = new Map(workbook).set(
      'A',
      new Map(workbook.get('A')).set(rate.name, { value: Number(rate.value) * 2, formula: null }),
    );
    const options = rowsOf(workbook.get('Options')!);
    const total = cellAfter(options, 'Cost in all', 2).name;
    const [before, after] = [workbook, dearer].map((book) => recalculate(book)('Options', total) as number);
    const { quantities } = pins[0]!.snapshot.evaluation;
    const metres = (pins[0]!.takeoff.spanMm / 1000) * pins[0]!.takeoff.count;
    expect(after! - before!).toBeCloseTo(quantities.cost!.steel! * metres, 3);
  });

  test('leaves what lacks a rate blank, and the totals with it, never zero', async () => {
    const other = await addProject(office, { ...PRICE_BOOK, formworkPerM2: null });
    const engineer = await office.as('engineer');
    const pin = {
      beamId: other.beamId,
      source: { kind: 'section', section: pins[0]!.snapshot.section },
      note: '',
    };
    await engineer.post(`/projects/${other.projectId}/candidates`, pin).expect(200);
    const { bytes } = await fetchFile('engineer', `/projects/${other.projectId}/takeoff.xlsx`);
    const workbook = readWorkbook(bytes);
    const rows = rowsOf(workbook.get('A')!);
    const read = recalculate(workbook);
    for (const name of [cellAfter(rows, 'Formwork', 8).name, cellAfter(rows, 'In all', 8).name]) {
      expect([name, workbook.get('A')!.get(name)!.value, read('A', name)]).toEqual([name, null, '']);
    }
    expect(read('A', cellAfter(rows, 'In all', 10).name)).toBeGreaterThan(0);
    const csv = await csvOf('engineer', `/projects/${other.projectId}/takeoff.csv`);
    expect(csv.rows.find((row) => row['Item'] === 'Formwork')).toMatchObject({ Rate: '', Cost: '' });
  });

  test('as CSV adds up to the same cost, line by line', async () => {
    const { rows } = await csvOf('checker', takeoffOf('', 'csv'));
    for (const { label, takeoff } of pins) {
      const own = rows.filter((row) => row['Candidate'] === label);
      const sum = (head: string) => own.reduce((all, row) => all + Number(row[head]), 0);
      expect(sum('Cost')).toBeCloseTo(takeoff.cost!, 4);
      expect(sum('Mass, t')).toBeCloseTo(takeoff.totalTonnes, 7);
    }
  });
});

describe('what nobody should meet in a file', () => {
  test('a name that a spreadsheet would run is neutralised, and the file’s own name is plain', async () => {
    const { db } = office.deps;
    const hostile = await addProject(office);
    await db
      .update(projects)
      .set({ name: WICKED, number: `${WICKED}é` })
      .where(eq(projects.id, hostile.projectId));
    const engineer = await office.as('engineer');
    const pin = {
      beamId: hostile.beamId,
      source: { kind: 'section', section: pins[0]!.snapshot.section },
      note: '',
    };
    await engineer.post(`/projects/${hostile.projectId}/candidates`, pin).expect(200);
    for (const format of ['csv', 'xlsx']) {
      const { headers, bytes } = await fetchFile(
        'engineer',
        `/projects/${hostile.projectId}/takeoff.${format}`,
      );
      expect(headers.get('content-disposition')).toBe(
        `attachment; filename=HYPERLINK-http-x-b-filename-evil.exee-takeoff-shortlist.${format}`,
      );
      const cells =
        format === 'csv'
          ? parseCsv(bytes).flat()
          : [...readWorkbook(bytes).values()].flatMap((s) => [...s.values()].map(({ value }) => value));
      const words = cells.filter((cell) => typeof cell === 'string' && Number.isNaN(Number(cell)));
      expect(words.filter((word) => /^[=+\-@\t\r]/.test(String(word)))).toEqual([]);
      expect(words.some((word) => String(word).startsWith("'=HYPERLINK"))).toBe(true);
    }
  });

  test('a viewer gets the same sections and quantities with no rate, cost or currency in them', async () => {
    const secrets = [
      PRICE_BOOK.currency,
      ...[PRICE_BOOK.steelPerKg, PRICE_BOOK.formworkPerM2, PRICE_BOOK.steelCo2ePerKg].map(String),
      ...pins.map(({ takeoff }) => String(Number(takeoff.cost!.toPrecision(9)))),
      'Cost',
      'Rate',
    ];
    const paths = [sectionsOf('list=all'), sectionsOf('list=all', 'xlsx'), takeoffOf('', 'csv'), takeoffOf()];
    for (const path of paths) {
      const [viewer, engineer] = [await fetchFile('viewer', path), await fetchFile('engineer', path)];
      const textOf = ({ bytes }: typeof viewer) =>
        path.includes('.csv')
          ? Buffer.from(bytes).toString()
          : JSON.stringify([...readWorkbook(bytes)].map(([, cells]) => [...cells.values()]));
      expect([path, viewer.status, secrets.filter((secret) => textOf(viewer).includes(secret))]).toEqual([
        path,
        200,
        [],
      ]);
      expect(textOf(engineer)).toContain(PRICE_BOOK.currency);
    }
    const carbon = (await csvOf('viewer', sectionsOf('list=front'))).rows[0]!['Carbon CO₂e, kg CO₂e/m'];
    expect(Number(carbon)).toBeGreaterThan(0);
  });

  test('a range on the cost, or a front by it, does not tell a viewer what things cost', async () => {
    for (const query of [
      'list=all&f=costPerM:~90',
      'list=front&x=costPerM&y=depthMm',
      'list=front&x=depthMm&y=costPerM',
    ]) {
      expect([query, (await fetchFile('viewer', sectionsOf(query))).status]).toEqual([query, 403]);
    }
  });

  test.each([
    ['sections', () => sectionsOf('list=front')],
    ['takeoff', () => takeoffOf()],
  ])('%s are for every member, for nobody else, and not for a share link', async (_what, pathOf) => {
    for (const role of ROLES) expect([role, (await fetchFile(role, pathOf())).status]).toEqual([role, 200]);
    expect((await fetchFile('outsider', pathOf())).status).toBe(404);
    expect((await fetch(`${office.origin}/api${pathOf()}`)).status).toBe(401);
    const link = await (
      await office.as('engineer')
    )
      .post(`/projects/${project.projectId}/share-links`)
      .expect(200);
    for (const file of ['takeoff.xlsx', 'takeoff.csv', 'sections.csv'])
      expect((await fetch(`${office.origin}/api/shared/${link.body.token}/${file}`)).status).toBe(404);
  });
});
