import { writeXlsx } from 'hucre/xlsx';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { sizeText, steelText, stirrupText } from '#shared/print/section-text.ts';
import { unitLabel } from '#shared/print/units.ts';
import { cellOf, difference, quotient } from './formulas.ts';
import type { HeadLine } from './table-file.ts';
import type { SteelItem, TakeoffCandidate } from './takeoff-lines.ts';
import { optionSheet, TOTAL_NAMES, type OptionCells, type TotalName } from './takeoff-option-sheet.ts';
import { WorkbookSheet, type Formula, type NamedCell } from './workbook-sheet.ts';

export interface TakeoffWorkbookInput {
  readonly candidates: readonly TakeoffCandidate[];
  readonly units: UnitSystem;
  readonly isMoneyShown: boolean;
  /** Above everything; a candidate's own lines follow on its sheet. */
  readonly head: readonly HeadLine[];
  readonly candidateHead: (candidate: TakeoffCandidate) => readonly HeadLine[];
}

const FIRST_OPTION = 2;

/** The order of the rows, as a beam is read. */
const POSITIONS = ['bottom', 'top', 'skin', 'stirrups'];

const TOTAL_WORDS: Readonly<Record<TotalName, string>> = {
  laps: 'Laps',
  waste: 'Waste',
  steel: 'Steel in all',
  concrete: 'Concrete',
  formwork: 'Formwork',
  steelCost: 'Cost of steel',
  concreteCost: 'Cost of concrete',
  formworkCost: 'Cost of formwork',
  cost: 'Cost in all',
  carbon: 'Carbon, A1–A3',
};
const MONEY: readonly TotalName[] = ['steelCost', 'concreteCost', 'formworkCost', 'cost'];
const STRONG: readonly TotalName[] = ['steel', 'cost', 'carbon'];
/** What options are compared by. */
const COMPARED: readonly TotalName[] = ['steel', 'concrete', 'formwork', 'cost', 'carbon'];

/** One currency, or none where the options are priced in several: then their costs are not compared. */
function commonCurrency(options: readonly OptionCells[]): string | null {
  const all = new Set(options.map(({ currency }) => currency));
  return all.size === 1 ? [...all][0]! : null;
}

const unitOf = (name: TotalName, units: UnitSystem, currency: string | null): string => {
  if (MONEY.includes(name)) return currency ?? '';
  if (name === 'concrete') return unitLabel('volume', units);
  if (name === 'formwork') return unitLabel('surface', units);
  return unitLabel(name === 'carbon' ? 'co2e' : 'tonnes', units);
};

const formatOf = (name: TotalName): string =>
  name === 'carbon'
    ? '#,##0'
    : MONEY.includes(name) || name === 'concrete' || name === 'formwork'
      ? '#,##0.00'
      : '0.000';

/** The options side by side; every number is the option's own cell, so a rate changed there is told here. */
class OptionsSheet {
  readonly sheet: WorkbookSheet;
  private readonly input: TakeoffWorkbookInput;
  private readonly options: readonly OptionCells[];
  private readonly currency: string | null;
  private readonly cells = new Map<TotalName, readonly (NamedCell | null)[]>();

  constructor(input: TakeoffWorkbookInput, options: readonly OptionCells[]) {
    this.input = input;
    this.options = options;
    this.currency = commonCurrency(options);
    this.sheet = new WorkbookSheet('Options', [30, 14, ...options.map(() => 18)]);
  }

  write(): void {
    this.sheet.line(['Takeoff, option against option'], { look: 'title' });
    for (const line of this.input.head) this.sheet.line(line);
    this.sheet.row++;
    this.words('', ({ label }) => `Candidate ${label}`, 'head');
    this.writeWhatEachIs();
    this.writeMasses();
    for (const name of TOTAL_NAMES) this.writeTotal(name);
    this.writePerLength();
    if (this.options.length > 1) this.writeDifferences();
  }

  private words(item: string, of: (candidate: TakeoffCandidate) => string | number, look?: 'head'): void {
    const dress = look === undefined ? {} : { look };
    this.sheet.put(0, item, dress);
    this.sheet.put(1, look === undefined ? '' : 'Unit', dress);
    this.options.forEach(({ candidate }, i) => this.sheet.put(FIRST_OPTION + i, of(candidate), dress));
    this.sheet.row++;
  }

  private writeWhatEachIs(): void {
    const { units } = this.input;
    this.words('Beam', ({ beam }) => `${beam.mark} ${beam.location}`.trim());
    this.words('State', ({ state }) => state);
    this.words('Section', ({ snapshot: { section } }) => sizeText(section, units));
    this.words('Bars', ({ snapshot: { section } }) => steelText(section, units));
    this.words('Stirrups', ({ snapshot: { section, evaluation } }) =>
      stirrupText(evaluation.stirrups ?? section.stirrup, units),
    );
    this.words('Span', ({ beam }) => formatQuantity(beam.spanMm, 'span', units));
    this.words('Beams', ({ beam }) => beam.count);
  }

  /** One number for each option, and what it is. */
  private values(
    item: string,
    unit: string,
    { numberFormat, isTotal = false }: { readonly numberFormat: string; readonly isTotal?: boolean },
    of: (i: number) => Formula | null,
  ) {
    const dress = isTotal ? ({ look: 'total' } as const) : {};
    this.sheet.put(0, item, dress);
    this.sheet.put(1, unit, dress);
    const cells = this.options.map((_, i) => {
      const value = of(i);
      return value === null ? null : this.sheet.put(FIRST_OPTION + i, value, { ...dress, numberFormat });
    });
    this.sheet.row++;
    return cells;
  }

  /** Every bar size and position that any option has. */
  private writeMasses(): void {
    const items = new Map<string, SteelItem>();
    for (const { masses } of this.options) for (const [key, { item }] of masses) items.set(key, item);
    const unit = unitLabel('tonnes', this.input.units);
    const placeOf = ([, { position }]: [string, SteelItem]) => POSITIONS.indexOf(position);
    const sorted = [...items].toSorted((a, b) => placeOf(a) - placeOf(b));
    for (const [key, { position, bar }] of sorted) {
      const words =
        position === 'stirrups' ? `Stirrups ${bar}` : `Bars ${bar}, ${position}`.replace('  ', ' ');
      this.values(words, unit, { numberFormat: '0.000' }, (i) => {
        const option = this.options[i]!;
        const mass = option.masses.get(key);
        return mass === undefined ? null : cellOf(option.name, mass.cell);
      });
    }
  }

  private writeTotal(name: TotalName): void {
    if (this.options.every(({ totals }) => totals[name] === undefined)) return;
    const cells = this.values(
      TOTAL_WORDS[name],
      unitOf(name, this.input.units, this.currency),
      { numberFormat: formatOf(name), isTotal: STRONG.includes(name) },
      (i) => {
        const option = this.options[i]!;
        const cell = option.totals[name];
        return cell === undefined ? null : cellOf(option.name, cell);
      },
    );
    this.cells.set(name, cells);
  }

  private writePerLength(): void {
    const costs = this.cells.get('cost');
    if (costs === undefined) return;
    const unit = `${this.currency ?? ''}${unitLabel('money-per-length', this.input.units)}`;
    this.values('Cost per length of beam', unit, { numberFormat: '#,##0.00' }, (i) => {
      const { name, length } = this.options[i]!;
      const cost = costs[i];
      return cost ? quotient(cost, { at: `'${name}'!${length.at}`, value: length.value }) : null;
    });
  }

  private writeDifferences(): void {
    const [first] = this.options;
    this.sheet.row++;
    this.words(`Difference to ${first!.candidate.label}`, ({ label }) => `Candidate ${label}`, 'head');
    const isPriced = this.options.every(({ currency }) => currency === first!.currency);
    for (const name of COMPARED) {
      const cells = this.cells.get(name);
      if (cells === undefined || (MONEY.includes(name) && !isPriced)) continue;
      const [base] = cells;
      const numberFormat = `+${formatOf(name)};-${formatOf(name)};0`;
      this.values(TOTAL_WORDS[name], unitOf(name, this.input.units, this.currency), { numberFormat }, (i) =>
        base && cells[i] ? difference(cells[i], base) : null,
      );
    }
    if (!isPriced) this.sheet.line(['Costs are in several currencies and not compared.'], { look: 'note' });
  }
}

/** The takeoff as a workbook that recalculates: a sheet that compares, and one for each option with its rates in cells. */
export async function takeoffWorkbook(input: TakeoffWorkbookInput): Promise<Uint8Array> {
  const { candidates, units, isMoneyShown, head } = input;
  const options = candidates.map((candidate) =>
    optionSheet({ candidate, units, isMoneyShown, head: [...head, ...input.candidateHead(candidate)] }),
  );
  const comparison = new OptionsSheet(
    input,
    options.map(({ cells }) => cells),
  );
  comparison.write();
  return writeXlsx({ sheets: [comparison.sheet.finish(), ...options.map(({ sheet }) => sheet.finish())] });
}
