import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { toDisplay, unitLabel, type DisplayKind } from '#shared/print/units.ts';
import { product, shareOfSum, sum } from './formulas.ts';
import {
  RATE_KIND,
  RATE_NAMES,
  shown,
  takeoffLines,
  type RateName,
  type SteelItem,
  type TakeoffCandidate,
  type TakeoffLines,
} from './takeoff-lines.ts';
import type { HeadLine } from './table-file.ts';
import { WorkbookSheet, type NamedCell } from './workbook-sheet.ts';

/** Cells of one option's sheet that the comparison names. */
export interface OptionCells {
  readonly name: string;
  readonly candidate: TakeoffCandidate;
  readonly currency: string | null;
  readonly length: NamedCell;
  /** Mass by `position|bar`, in tonnes or tons. */
  readonly masses: ReadonlyMap<string, { readonly item: SteelItem; readonly cell: NamedCell }>;
  readonly totals: Readonly<Partial<Record<TotalName, NamedCell>>>;
}

export const TOTAL_NAMES = [
  'laps',
  'waste',
  'steel',
  'concrete',
  'formwork',
  'steelCost',
  'concreteCost',
  'formworkCost',
  'cost',
  'carbon',
] as const;
export type TotalName = (typeof TOTAL_NAMES)[number];

export interface OptionSheetInput {
  readonly candidate: TakeoffCandidate;
  readonly units: UnitSystem;
  readonly isMoneyShown: boolean;
  readonly head: readonly HeadLine[];
}

const WIDTHS = [38, 12, 10, 14, 14, 8, 12, 12, 14, 14, 14];
const COLUMN = {
  item: 0,
  bar: 1,
  count: 2,
  perLength: 3,
  quantity: 4,
  unit: 5,
  mass: 6,
  rate: 7,
  cost: 8,
  factor: 9,
  carbon: 10,
} as const;

const AMOUNT = '#,##0.00';
const RATE = '#,##0.00##';
const PER_LENGTH = '0.000#';
const SHARE = '0.0#%';

const RATE_WORDS: Readonly<Record<RateName, string>> = {
  bars: 'Rate of longitudinal bars',
  stirrups: 'Rate of stirrups',
  concrete: 'Rate of concrete of this strength',
  formwork: 'Rate of formwork',
  steelCarbon: 'Carbon factor of steel',
  concreteCarbon: 'Carbon factor of concrete',
};

/** Writes one option: what it is priced by, its lines with quantity × rate, its totals; all in formulas but the inputs. */
class OptionSheet {
  readonly sheet: WorkbookSheet;
  private readonly input: OptionSheetInput;
  private readonly lines: TakeoffLines;
  private readonly rates = new Map<RateName, NamedCell>();
  private readonly masses = new Map<string, { item: SteelItem; cell: NamedCell }>();
  private length!: NamedCell;
  private laps!: NamedCell;
  private waste!: NamedCell;

  constructor(input: OptionSheetInput) {
    this.input = input;
    this.lines = takeoffLines(input.candidate);
    this.sheet = new WorkbookSheet(input.candidate.label, WIDTHS);
  }

  write(): OptionCells {
    const { candidate, head } = this.input;
    this.sheet.line([`Candidate ${candidate.label}`], { look: 'title' });
    for (const line of head) this.sheet.line(line);
    this.sheet.row++;
    this.writeInputs();
    this.sheet.row++;
    this.writeTableHead();
    const totals = this.writeLines();
    return {
      name: this.sheet.name,
      candidate,
      currency: this.lines.currency,
      length: this.length,
      masses: this.masses,
      totals,
    };
  }

  private inputLine(words: string, value: number | null, numberFormat: string): NamedCell {
    this.sheet.put(0, words);
    const cell = this.sheet.put(1, value, { look: 'input', numberFormat });
    if (value === null) this.sheet.put(2, 'not in the price book', { look: 'note' });
    this.sheet.row++;
    return cell;
  }

  private writeInputs(): void {
    const { candidate, units, isMoneyShown } = this.input;
    const { lines, sheet } = this;
    const spanUnit = unitLabel('span', units);
    const span = this.inputLine(`Span, ${spanUnit}`, shown(candidate.beam.spanMm, 'span', units), '0.###');
    const count = this.inputLine('Beams', candidate.beam.count, '0');
    sheet.put(0, `Length in all, ${spanUnit}`);
    this.length = sheet.put(1, product([span, count]), { numberFormat: '#,##0.##' });
    sheet.row++;
    this.laps = this.inputLine(
      'Laps, share of longitudinal bars',
      shown(lines.lapShare, 'ratio', units),
      SHARE,
    );
    this.waste = this.inputLine(
      'Waste, share of bars and laps',
      shown(lines.wasteShare, 'ratio', units),
      SHARE,
    );
    if (!isMoneyShown) return;
    for (const name of RATE_NAMES) {
      if (name === 'stirrups' && lines.stirrups.length === 0) continue;
      const kind = RATE_KIND[name];
      const unit = `${kind.startsWith('money') ? (lines.currency ?? '') : ''}${unitLabel(kind, units)}`;
      this.rates.set(
        name,
        this.inputLine(`${RATE_WORDS[name]}, ${unit}`, shown(lines.rates[name], kind, units), RATE),
      );
    }
  }

  private writeTableHead(): void {
    const { units, isMoneyShown } = this.input;
    const money = this.lines.currency ?? 'price book’s currency';
    const heads = [
      'Item',
      'Bar',
      'Number',
      `Per ${unitLabel('span', units)} of beam`,
      'Quantity',
      'Unit',
      `Mass, ${unitLabel('tonnes', units)}`,
      ...(isMoneyShown
        ? ['Rate', `Cost, ${money}`, 'Carbon factor', `Carbon, ${unitLabel('co2e', units)}`]
        : []),
    ];
    this.sheet.line(heads, { look: 'head' });
  }

  /** A line's words and amount per length; its quantity and, of steel, its mass follow. */
  private openLine(
    words: string,
    perLength: Parameters<WorkbookSheet['put']>[1],
    kind: DisplayKind,
    item?: SteelItem,
  ) {
    const { sheet } = this;
    const { units } = this.input;
    sheet.put(COLUMN.item, words);
    if (item !== undefined) {
      sheet.put(COLUMN.bar, item.bar);
      sheet.put(COLUMN.count, item.count, { numberFormat: '0' });
    }
    const per = sheet.put(COLUMN.perLength, perLength, { numberFormat: PER_LENGTH });
    const quantity = sheet.put(COLUMN.quantity, product([per, this.length]), { numberFormat: AMOUNT });
    sheet.put(COLUMN.unit, unitLabel(kind, units));
    return { per, quantity };
  }

  private massCell(quantity: NamedCell): NamedCell {
    const perTonne = toDisplay(1000, 'mass', this.input.units) / toDisplay(1, 'tonnes', this.input.units);
    const { at, value } = quantity;
    return this.sheet.put(
      COLUMN.mass,
      {
        formula: `${at}/${Math.round(perTonne)}`,
        result: value === null ? null : value / Math.round(perTonne),
      },
      { numberFormat: '0.000' },
    );
  }

  private costCell(quantity: NamedCell, name: RateName): NamedCell | undefined {
    const rate = this.rates.get(name);
    if (rate === undefined) return undefined;
    const own = this.sheet.put(COLUMN.rate, sum([rate]), { numberFormat: RATE });
    return this.sheet.put(COLUMN.cost, product([quantity, own]), { numberFormat: AMOUNT });
  }

  private carbonCell(quantity: NamedCell, name: RateName): NamedCell | undefined {
    const factor = this.rates.get(name);
    if (factor === undefined) return undefined;
    const own = this.sheet.put(COLUMN.factor, sum([factor]), { numberFormat: RATE });
    return this.sheet.put(COLUMN.carbon, product([quantity, own]), { numberFormat: '#,##0' });
  }

  private steelLine(
    words: string,
    perLength: Parameters<WorkbookSheet['put']>[1],
    rate: RateName,
    item?: SteelItem,
  ) {
    const cells = this.openLine(words, perLength, 'mass', item);
    const mass = this.massCell(cells.quantity);
    const cost = this.costCell(cells.quantity, rate);
    this.sheet.row++;
    if (item !== undefined) this.masses.set(`${item.position}|${item.bar}`, { item, cell: mass });
    return { ...cells, mass, cost };
  }

  /** The bars of one rate with their allowances. */
  private steelLines(items: readonly SteelItem[], rate: 'bars' | 'stirrups') {
    const { units } = this.input;
    const bars = items.map((item) => {
      const words = rate === 'bars' ? `Bars, ${item.position}` : `Stirrups, ${item.count} legs`;
      return this.steelLine(words, shown(item.kgPerM, 'mass-per-length', units), rate, item);
    });
    if (bars.length === 0) return { bars, laps: undefined, waste: undefined };
    const laps =
      rate === 'bars'
        ? this.steelLine(
            'Laps',
            shareOfSum(
              bars.map(({ per }) => per),
              this.laps,
            ),
            rate,
          )
        : undefined;
    const wasted = [...bars, ...(laps === undefined ? [] : [laps])].map(({ per }) => per);
    const words = rate === 'bars' ? 'Waste of bars and laps' : 'Waste of stirrups';
    return { bars, laps, waste: this.steelLine(words, shareOfSum(wasted, this.waste), rate) };
  }

  private writeLines(): OptionCells['totals'] {
    const { sheet, lines } = this;
    const { units, isMoneyShown, candidate } = this.input;
    const parts = [this.steelLines(lines.longitudinal, 'bars'), this.steelLines(lines.stirrups, 'stirrups')];
    const all = parts.flatMap(({ bars, laps, waste }) =>
      [...bars, laps, waste].filter((line) => line !== undefined),
    );
    const wastes = parts.flatMap(({ waste }) => (waste === undefined ? [] : [waste.mass]));
    sheet.put(COLUMN.item, 'Steel in all', { look: 'total' });
    sheet.put(COLUMN.perLength, sum(all.map(({ per }) => per)), { look: 'total', numberFormat: PER_LENGTH });
    const steelQuantity = sheet.put(COLUMN.quantity, sum(all.map(({ quantity }) => quantity)), {
      look: 'total',
      numberFormat: AMOUNT,
    });
    sheet.put(COLUMN.unit, unitLabel('mass', units), { look: 'total' });
    const steel = sheet.put(COLUMN.mass, sum(all.map(({ mass }) => mass)), {
      look: 'total',
      numberFormat: '0.000',
    });
    const costs = all.map(({ cost }) => cost).filter((cost) => cost !== undefined);
    const steelCost = isMoneyShown
      ? sheet.put(COLUMN.cost, sum(costs), { look: 'total', numberFormat: AMOUNT })
      : undefined;
    const steelCarbon = this.carbonCell(steelQuantity, 'steelCarbon');
    sheet.row++;

    const placed = (
      words: string,
      perM: number,
      kind: 'volume' | 'surface',
      rate: 'concrete' | 'formwork',
    ) => {
      const cells = this.openLine(words, shown(perM, `${kind}-per-length`, units), kind);
      const cost = this.costCell(cells.quantity, rate);
      const carbon = rate === 'concrete' ? this.carbonCell(cells.quantity, 'concreteCarbon') : undefined;
      sheet.row++;
      return { ...cells, cost, carbon };
    };
    const concrete = placed('Concrete', lines.concreteM3PerM, 'volume', 'concrete');
    const formwork = placed('Formwork', lines.formworkM2PerM, 'surface', 'formwork');
    const [laps] = parts.map((part) => part.laps?.mass);

    sheet.put(COLUMN.item, 'In all', { look: 'total' });
    const total = { look: 'total', numberFormat: AMOUNT } as const;
    const cost = isMoneyShown
      ? sheet.put(COLUMN.cost, sum([steelCost!, concrete.cost!, formwork.cost!]), total)
      : undefined;
    const carbon = isMoneyShown
      ? sheet.put(COLUMN.carbon, sum([steelCarbon!, concrete.carbon!]), { ...total, numberFormat: '#,##0' })
      : undefined;
    sheet.row++;
    return {
      ...(laps === undefined ? {} : { laps }),
      ...(wastes.length === 0 ? {} : { waste: this.sumOf('Waste in all', wastes) }),
      steel,
      concrete: concrete.quantity,
      formwork: formwork.quantity,
      ...(isMoneyShown
        ? {
            steelCost: steelCost!,
            concreteCost: concrete.cost!,
            formworkCost: formwork.cost!,
            cost: cost!,
            carbon: carbon!,
          }
        : { carbon: this.plainCarbon(candidate.takeoff.co2eKg) }),
    };
  }

  private sumOf(words: string, cells: readonly NamedCell[]): NamedCell {
    this.sheet.put(COLUMN.item, words, { look: 'note' });
    const cell = this.sheet.put(COLUMN.mass, sum(cells), { look: 'note', numberFormat: '0.000' });
    this.sheet.row++;
    return cell;
  }

  /** Factors are the office's own, as rates are: whoever may not see them is told what they come to. */
  private plainCarbon(co2eKg: number | null): NamedCell {
    const { units } = this.input;
    this.sheet.put(COLUMN.item, `Carbon, A1–A3, ${unitLabel('co2e', units)}`);
    const cell = this.sheet.put(COLUMN.quantity, shown(co2eKg, 'co2e', units), { numberFormat: '#,##0' });
    this.sheet.row++;
    return cell;
  }
}

export function optionSheet(input: OptionSheetInput): { sheet: WorkbookSheet; cells: OptionCells } {
  const option = new OptionSheet(input);
  const cells = option.write();
  return { sheet: option.sheet, cells };
}
