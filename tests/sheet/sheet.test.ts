import { describe, expect, it } from 'vitest';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Candidate } from '#shared/contract/records.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { buildSheet } from '#shared/sheet/build-sheet.ts';
import { comparableValues } from '#shared/sheet/sheet-parts.ts';
import { formulaTex, splitRemark } from '#shared/sheet/formula-tex.ts';
import { compareOwnValue } from '#shared/sheet/own-value.ts';
import type { NumberedLine, Sheet, SheetRow, WorkingLine } from '#shared/sheet/sheet.ts';
import { textRuns } from '#shared/sheet/text-runs.ts';
import { candidateOf, US_BASIS, US_DEMAND, US_SECTION } from './hand-candidate.ts';

const project = { name: 'Footbridge', number: 'P-1' };
const sheetOf = (candidate: Candidate, units: UnitSystem = 'si') => buildSheet({ project, units, candidate });
const linesOf = (sheet: Sheet): readonly WorkingLine[] =>
  sheet.parts.flatMap((part) => (part.kind === 'working' ? part.lines : []));
const rowsOf = (sheet: Sheet, id: string): readonly SheetRow[] =>
  sheet.parts.flatMap((part) => (part.kind === 'table' && part.id === id ? part.table.rows : []));
const usCandidate = () => candidateOf({ section: US_SECTION, basis: US_BASIS, demand: US_DEMAND });

describe('a calculation sheet', () => {
  it('prints the hand-worked example to its printed digits', () => {
    const sheet = sheetOf(candidateOf());
    const result = (id: string) => linesOf(sheet).find((line) => line.id === id)!.result;
    // HAND-01: β1 0.8357, c 86.05, a 71.91, Mn 246.85, φMn 222.2, kd 144.2, φy 7.161e-6, μφ 4.87.
    expect(result('beta1')).toBe('0.8357');
    expect(result('c')).toBe('86.05 mm');
    expect(result('a')).toBe('71.91 mm');
    expect(result('mn')).toBe('246.85 kN·m');
    expect(result('phi-mn')).toMatch(/^222\.[12]\d kN·m$/);
    expect(result('kd')).toBe('144.2 mm');
    expect(result('phi-y')).toBe('7.161 ×10⁻⁶/mm');
    expect(result('mu-phi')).toMatch(/^4\.8[67]\d$/);
    expect(rowsOf(sheet, 'layers')[0]!.cells[5]).toBe('−195.6');
  });

  it.each(['si', 'us'] as const)(
    'carries every number of the working and of the checks, in %s units',
    (units) => {
      for (const candidate of [candidateOf(), usCandidate()]) {
        const { working, checks, flexure } = candidate.snapshot.evaluation;
        const sheet = sheetOf(candidate, units);
        const values = comparableValues(candidate.snapshot);
        const print = (value: number, kind: WorkingLine['kind']) =>
          formatQuantity(value, kind, units, { digits: kind === 'force' || kind === 'moment' ? 5 : 4 });
        for (const step of working.filter(({ id }) => id !== 'residual' && !/^(strain|stress)-/.test(id)))
          expect([step.id, values.get(step.id)]).toEqual([step.id, step.value]);
        for (const line of linesOf(sheet).filter(({ id }) => id !== 'residual' && !id.startsWith('hinge-'))) {
          const step = working.find(({ id }) => id === line.id)!;
          expect(line.result).toBe(print(step.value, step.kind));
          expect(line.inputs.map(({ text }) => text)).toEqual(step.inputs.map((i) => print(i.value, i.kind)));
          expect(line.clause).toBe(step.clause);
        }
        expect(rowsOf(sheet, 'checks').map(({ value, passes }) => [value, passes])).toEqual(
          checks.map(({ ratio, passes }) => [ratio, passes]),
        );
        expect(rowsOf(sheet, 'layers').map(({ value }) => value)).toEqual(
          flexure!.layers.map(({ forceN }) => forceN),
        );
      }
    },
  );

  it('ties up by hand: forces balance, moments add up, steel adds up', () => {
    const { snapshot } = candidateOf();
    const values = comparableValues(snapshot);
    const layers = snapshot.evaluation.flexure!.layers;
    const forces = layers.map((_, i) => values.get(`force-${i + 1}`)!);
    const [c, a] = [values.get('concrete-force')!, values.get('a')!];
    expect(forces.reduce((sum, t) => sum + t, 0)).toBeCloseTo(c, 6);
    const moments = forces.map((t, i) => t * layers[i]!.depthMm).reduce((sum, m) => sum + m, 0);
    expect((moments - (c * a) / 2) / values.get('mn')!).toBeCloseTo(1, 12);
    const [net, laps, waste] = [values.get('steel')!, values.get('laps')!, values.get('waste')!];
    expect(net + laps + waste).toBeCloseTo(values.get('steel-total')!, 12);
    const bars = ['steel-tension-25', 'steel-compression-16', 'steel-stirrups-10'].map((id) =>
      values.get(id)!,
    );
    expect(bars.reduce((sum, kg) => sum + kg, 0)).toBeCloseTo(net, 12);
  });

  it('numbers its lines without a gap, and each has an id of its own', () => {
    const sheet = sheetOf(usCandidate(), 'us');
    const lines = sheet.parts.flatMap((part): readonly NumberedLine[] =>
      part.kind === 'working' ? part.lines : part.table.rows,
    );
    expect(lines.map(({ number }) => number)).toEqual(lines.map((_, i) => i + 1));
    expect(new Set(lines.map(({ id }) => id)).size).toBe(lines.length);
  });

  it('has no money on it for a reader without rates', () => {
    const candidate = candidateOf();
    const { snapshot } = candidate;
    const { evaluation, basis } = snapshot;
    const quantities = { ...evaluation.quantities, cost: null };
    const shown = {
      ...snapshot,
      basis: { ...basis, rates: null },
      evaluation: { ...evaluation, quantities },
    };
    const text = JSON.stringify(sheetOf({ ...candidate, snapshot: shown }));
    expect(text).not.toContain('XTS');
    expect(text).not.toMatch(/cost-/);
    expect(text).toContain('Carbon');
    expect(JSON.stringify(sheetOf(candidate))).toContain('XTS');
  });

  it('says what is not checked, defers to a licensed engineer, and never says safe', () => {
    const candidate = candidateOf();
    const sheet = sheetOf(candidate);
    expect(sheet.notChecked).toEqual(candidate.snapshot.evaluation.notChecked);
    expect(sheet.caution.join(' ')).toContain('licensed engineer');
    expect(JSON.stringify(sheet)).not.toMatch(/\bsafe\b/i);
  });

  it('is signed by whoever checked it, until it is returned', () => {
    const candidate = candidateOf();
    const by = { id: '9', name: 'C. Checker', role: 'checker' } as const;
    const checked = {
      id: '5',
      from: 'proposed',
      to: 'checked',
      by,
      note: '',
      sheetValues: [],
      createdAt: '2026-05-15T08:00:00.000Z',
    } as const;
    const transitions = [...candidate.transitions, { ...checked, sheetValues: [] }];
    const roles = (state: Candidate['state']) =>
      sheetOf({ ...candidate, transitions, state }).signatures.map(({ name, date }) =>
        `${name} ${date}`.trim(),
      );
    expect(roles('checked')).toEqual(['A. Engineer 2026-05-14', 'C. Checker 2026-05-15', '', '']);
    expect(roles('returned')).toEqual(['A. Engineer 2026-05-14', '', '', '']);
  });
});

describe('an own value', () => {
  it('meets the sheet within one per cent either way, and not beyond', () => {
    expect(compareOwnValue(101, 100)).toEqual({ meets: true, difference: '+1.00\u00a0%' });
    expect(compareOwnValue(98.99, 100)).toEqual({ meets: false, difference: '−1.01\u00a0%' });
    expect(compareOwnValue(-68, -68)).toEqual({ meets: true, difference: '±0.00\u00a0%' });
    expect(compareOwnValue(68, -68).meets).toBe(false);
    expect(compareOwnValue(0, 0).meets).toBe(true);
    expect(compareOwnValue(1e-9, 0)).toEqual({ meets: false, difference: '' });
  });
});

describe('a formula', () => {
  it('is set as fractions, roots and subscripts', () => {
    expect(formulaTex('εcu (d1 − c)/c')).toBe(
      '\\dfrac{\\varepsilon _{\\mathrm{cu}}\\,\\left(d_{\\mathrm{1}}-c\\right)}{c}',
    );
    expect(formulaTex('57000 √f′c')).toBe("57000\\,\\sqrt{f'_{\\mathrm{c}}}");
    expect(formulaTex('(ΣT − C)/C')).toBe('\\dfrac{\\textstyle\\sum \\,T-C}{C}');
  });

  it('is kept apart from the words after it, and a number’s comma is none of them', () => {
    expect(splitRemark('max(3 √f′c, 200) b d/fy; psi, fy at most 80,000 psi')).toEqual({
      expression: 'max(3 √f′c, 200) b d/fy',
      remark: 'psi, fy at most 80,000 psi',
    });
  });

  it('loses no letter when it is written in runs', () => {
    for (const text of [
      'φMn ≥ Mu at A′s,max',
      'ACI 318M-19 22.2.2.4',
      'In steel, fs = Es ε; kN·m',
      'Σ (n − 1) A d²',
    ])
      expect(
        textRuns(text, { isProse: true })
          .map((run) => run.text)
          .join(''),
      ).toBe(text);
  });

  it('takes no unit, book or word of a sentence for a symbol', () => {
    for (const text of [
      'ACI 318M-19',
      '147.5 kip·ft, 19.69 ft',
      '200 kN·m',
      '30 in',
      'In all',
      'At a face',
      'A1–A3',
      'A615, C50, 0.0756 yd³/ft',
      'the section’s own',
      'fc945d57a1',
    ])
      expect([text, textRuns(text, { isProse: true }).filter(({ isSymbol }) => isSymbol)]).toEqual([
        text,
        [],
      ]);
  });
});
