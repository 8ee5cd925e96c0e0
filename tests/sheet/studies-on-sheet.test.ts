import { describe, expect, it } from 'vitest';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Candidate } from '#shared/contract/records.ts';
import { buildSheet } from '#shared/sheet/build-sheet.ts';
import type { Sheet, SheetPart, SheetRow } from '#shared/sheet/sheet.ts';
import { comparableValues } from '#shared/sheet/sheet-parts.ts';
import { candidateOf, HAND_SECTION, US_BASIS, US_DEMAND, US_SECTION } from './hand-candidate.ts';

const project = { name: 'Footbridge', number: 'P-1' };
const sheetOf = (candidate: Candidate, units: UnitSystem = 'si') => buildSheet({ project, units, candidate });
const partOf = (sheet: Sheet, id: string): SheetPart => sheet.parts.find((part) => part.id === id)!;
const rowsOf = (sheet: Sheet, id: string): readonly SheetRow[] => {
  const part = partOf(sheet, id);
  return part.kind === 'working' ? [] : part.table.rows;
};
const usCandidate = () => candidateOf({ section: US_SECTION, basis: US_BASIS, demand: US_DEMAND });

/** As it was pinned before curve, strips, twin and scatter were frozen with it. */
function withoutStudies(candidate: Candidate): Candidate {
  const { studies: _, ...snapshot } = candidate.snapshot;
  return { ...candidate, snapshot };
}

describe('the studies on a sheet', () => {
  it('give each marked point, convention, second opinion, twin and scatter a line of its own', () => {
    const candidate = candidateOf();
    const { curve, secondOpinion, twin, scatter } = candidate.snapshot.studies!;
    const values = comparableValues(candidate.snapshot);
    for (const mark of curve!.marks) expect(values.get(`curve-${mark.id}`)).toBe(mark.curvaturePerMm);
    for (const by of curve!.ductility) expect(values.get(`ductility-${by.id}`)).toBe(by.value);
    for (const line of secondOpinion!.lines) expect(values.get(`opinion-${line.id}`)).toBe(line.strips);
    expect(values.get('twin-mn')).toBe(twin!.twin.nominalMomentNmm);
    expect(values.get('scatter-cover-more')).toBe(
      scatter.variants.find(({ id }) => id === 'cover-more')!.outcome!.governing!.ratio,
    );
  });

  it('never show a ductility without what it means', () => {
    const sheet = sheetOf(candidateOf());
    const rows = rowsOf(sheet, 'ductility-by-convention');
    expect(rows.filter(({ isStrong }) => isStrong).map(({ id }) => id)).toEqual([
      'ductility-closed-outermost-layer-deduct',
    ]);
    for (const { id, cells, note } of rows)
      expect([id, id.includes('curve-') ? note! : cells[0]!]).toEqual([
        id,
        expect.stringMatching(/yield|φy/),
      ]);
    const points = partOf(sheet, 'curve');
    expect(JSON.stringify(points)).toContain('two lines of the same area');
  });

  it('say of the second algorithm how far it is off, and whether that agrees', () => {
    const row = rowsOf(sheetOf(candidateOf()), 'second-opinion').find(({ id }) => id.endsWith('strength'))!;
    expect(row.cells[3]).toMatch(/^[+−±]\d\.\d{3} %$/);
    expect([row.cells.at(-1), row.passes]).toEqual(['agrees', true]);
  });

  it('carry through each hinge line by hand', () => {
    const values = comparableValues(candidateOf().snapshot);
    // 0.08 × 3000 mm + 0.022 × 420 MPa × 25 mm.
    expect(values.get('hinge-lp')).toBeCloseTo(471, 9);
    const mu = values.get('ductility-curve-bilinear')!;
    const share = 471 / 3000;
    expect(values.get('hinge-mu-delta')).toBeCloseTo(1 + 3 * (mu - 1) * share * (1 - 0.5 * share), 9);
  });

  it('leave the twin out of a singly reinforced section', () => {
    const reinforcement = { kind: 'bars', tension: [{ bar: '25', count: 3 }], compression: [] } as const;
    expect(
      partOf(sheetOf(candidateOf({ section: { ...HAND_SECTION, reinforcement } })), 'twin'),
    ).toBeUndefined();
  });

  it('are worked out for an old pin too, said to be not frozen, and not compared with', () => {
    const old = withoutStudies(usCandidate());
    const [before, now] = [sheetOf(old, 'us'), sheetOf(usCandidate(), 'us')];
    expect(rowsOf(before, 'scatter').map(({ cells }) => cells)).toEqual(
      rowsOf(now, 'scatter').map(({ cells }) => cells),
    );
    expect(before.frozen.find(({ label }) => label === 'Not frozen')).toBeDefined();
    expect(now.frozen.find(({ label }) => label === 'Not frozen')).toBeUndefined();
    for (const id of ['curve', 'second-opinion', 'scatter'])
      for (const row of rowsOf(before, id)) expect(row.value).toBeNull();
    expect([...comparableValues(old.snapshot).keys()].filter((id) => id.startsWith('curve-'))).toEqual([]);
  });
});

describe('a pin of an earlier engine', () => {
  const aged = (candidate: Candidate, change: object = {}): Candidate => ({
    ...candidate,
    snapshot: {
      ...candidate.snapshot,
      engineVersion: '0.9.0',
      evaluation: { ...candidate.snapshot.evaluation, ...change },
    },
  });

  it('says that today’s gives the same numbers, where it does', () => {
    const sheet = sheetOf(aged(candidateOf()));
    expect(sheet.frozen.find(({ label }) => label === 'Engine')!.value).toBe('0.9.0');
    expect(sheet.frozen.find(({ label }) => label === 'Engine today')!.value).toMatch(/the same numbers$/);
    expect(partOf(sheet, 'today')).toBeUndefined();
  });

  it('keeps its own numbers and shows those of today beside them', () => {
    const candidate = candidateOf();
    const { flexure } = candidate.snapshot.evaluation;
    const nominalMomentNmm = 0.99 * flexure!.nominalMomentNmm;
    const working = candidate.snapshot.evaluation.working.map((step) =>
      step.id === 'mn' ? { ...step, value: nominalMomentNmm } : step,
    );
    const sheet = sheetOf(aged(candidate, { working }));
    expect(rowsOf(sheet, 'today').map(({ cells }) => cells)).toEqual([
      ['Mn', '244.38 kN·m', '246.85 kN·m', '1.01%'],
    ]);
    const residual = partOf(sheet, 'residual');
    const line = residual.kind === 'working' ? residual.lines.find(({ id }) => id === 'mn') : undefined;
    expect(line!.result).toBe('244.38 kN·m');
    expect(comparableValues(aged(candidate, { working }).snapshot).get('mn')).toBe(nominalMomentNmm);
  });

  it('that knew fewer checks tells which it had not', () => {
    const candidate = candidateOf();
    const checks = candidate.snapshot.evaluation.checks.filter(({ id }) => id !== 'crack-control');
    const rows = rowsOf(sheetOf(aged(candidate, { checks })), 'today');
    expect(rows.map(({ cells }) => cells.slice(0, 2))).toEqual([['Checks: Crack control s', '–']]);
  });

  it('is not told apart by money for a reader without rates', () => {
    const { snapshot, ...rest } = aged(candidateOf());
    const hidden = {
      ...snapshot,
      basis: { ...snapshot.basis, rates: null },
      evaluation: { ...snapshot.evaluation, quantities: { ...snapshot.evaluation.quantities, cost: null } },
    };
    expect(partOf(sheetOf({ ...rest, snapshot: hidden }), 'today')).toBeUndefined();
  });
});
