import type { UnitSystem } from '../contract/design-basis.ts';
import type { Snapshot } from '../contract/records.ts';
import { unformedSides } from '../engine/pricing.ts';
import type { Rates } from '../engine/section.ts';
import { formatQuantity } from '../print/format-quantity.ts';
import { unitLabel, type DisplayKind } from '../print/units.ts';
import type { Numbering } from './numbering.ts';
import type { QuantityItem } from './quantity-item.ts';
import type { SheetPart, SheetRow } from './sheet.ts';
import { steelItems } from './steel-items.ts';
import { figureColumn, wordColumn } from './table-column.ts';

/** Lines in money begin so: they are kept from readers without rates. */
const MONEY = 'cost-';

export const isMoneyLine = (lineId: string): boolean => lineId.startsWith(MONEY);

/** The factors are the office's as the rates are: without a price book only the rule is said. */
function carbonText({ basis, section, evaluation }: Snapshot, units: UnitSystem): string {
  const { rates } = basis;
  const mix = rates && mixOf(rates, section.fcMPa);
  if (rates?.steelCo2ePerKg == null || mix?.co2eKgPerM3 == null)
    return 'steel in all and concrete, each times its factor';
  const print = (value: number, kind: DisplayKind) => formatQuantity(value, kind, units, { digits: 4 });
  const { totalSteelKgPerM, concreteM3PerM } = evaluation.quantities;
  return `${print(totalSteelKgPerM, 'mass-per-length')} × ${print(rates.steelCo2ePerKg, 'co2e-per-mass')} + ${print(concreteM3PerM, 'volume-per-length')} × ${print(mix.co2eKgPerM3, 'co2e-per-volume')}`;
}

/** Two strengths within this are the same mix, MPa; as the engine matches them. */
const SAME_MIX_MPA = 0.01;
const mixOf = (rates: Rates, fcMPa: number) =>
  rates.concrete.find((rate) => Math.abs(rate.fcMPa - fcMPa) <= SAME_MIX_MPA);

/** Steel by size and position, laps and waste in the open, concrete, formwork, and cost where rates are shown. */
export function quantityTable(snapshot: Snapshot, units: UnitSystem, numbering: Numbering): SheetPart {
  const items = [
    ...steelItems(snapshot, units),
    ...volumeItems(snapshot, units),
    ...costItems(snapshot, units),
    {
      id: 'co2e',
      item: 'Carbon, A1–A3',
      how: carbonText(snapshot, units),
      value: snapshot.evaluation.quantities.co2eKgPerM,
      kind: 'co2e-per-length',
    } satisfies QuantityItem,
  ];
  const { cost } = snapshot.evaluation.quantities;
  const rowOf = ({ id, item, how, value, kind }: QuantityItem): SheetRow => ({
    id,
    number: numbering.next(),
    value,
    kind,
    cells: [
      item,
      how,
      value === null
        ? 'rate missing'
        : kind === 'money-per-length'
          ? `${cost?.currency ?? ''} ${formatQuantity(value, kind, units, { digits: 4 })}`.trim()
          : formatQuantity(value, kind, units, { digits: 4 }),
    ],
  });
  return {
    id: 'quantities',
    title: 'Quantities per length of beam',
    kind: 'table',
    table: {
      columns: [wordColumn('Item'), wordColumn('From'), figureColumn('Amount')],
      rows: items.map(rowOf),
      remarks: [
        'Net steel is bars and stirrups; laps and waste are allowances, shares of the price book, and not part of it. Concrete is gross. A missing rate leaves the amount blank.',
      ],
      comparedColumn: 'Amount',
    },
  };
}

function volumeItems({ section, basis, evaluation }: Snapshot, units: UnitSystem): QuantityItem[] {
  const { concreteM3PerM, formworkM2PerM } = evaluation.quantities;
  const length = (mm: number) => formatQuantity(mm, 'length', units);
  const { slabMm, hasEdge } = unformedSides(evaluation.flange ?? null, basis.slabMm);
  const h = length(section.depthMm);
  const side = slabMm === 0 ? h : `(${h} − ${length(slabMm)})`;
  return [
    {
      id: 'concrete',
      item: 'Concrete',
      how: `b h = ${length(section.widthMm)} × ${h}${evaluation.flange ? ', web through the slab' : ''}`,
      value: concreteM3PerM,
      kind: 'volume-per-length',
    },
    {
      id: 'formwork',
      item: 'Formwork, soffit and two sides',
      how: `${length(section.widthMm)} + ${hasEdge ? `${h} + ${side}` : `2 × ${side}`}`,
      value: formworkM2PerM,
      kind: 'surface-per-length',
    },
  ];
}

function costItems({ evaluation, basis, section }: Snapshot, units: UnitSystem): QuantityItem[] {
  const { cost } = evaluation.quantities;
  const { rates } = basis;
  if (cost === null || rates === null) return [];
  const mix = mixOf(rates, section.fcMPa);
  const share = (value: number) => `(1 + ${formatQuantity(value, 'percent', units)})`;
  const [laps, waste] = [share(rates.lapShare), share(rates.wasteShare)];
  const at = (rate: number | null | undefined, kind: DisplayKind) =>
    rate === null || rate === undefined
      ? 'no rate'
      : `at ${formatQuantity(rate, kind, units, { digits: 6 })}`;
  const line = (id: string, item: string, how: string, value: number | null): QuantityItem => ({
    id: `${MONEY}${id}`,
    item,
    how,
    value,
    kind: 'money-per-length',
  });
  return [
    line(
      'steel',
      'Cost of longitudinal bars',
      `bars × ${laps} × ${waste}, ${at(rates.steelPerKg, 'money-per-mass')}`,
      cost.steel,
    ),
    line(
      'stirrups',
      'Cost of stirrups',
      `stirrups × ${waste}, ${at(rates.stirrupPerKg, 'money-per-mass')}`,
      cost.stirrups,
    ),
    line('concrete', 'Cost of concrete', at(mix?.costPerM3, 'money-per-volume'), cost.concrete),
    line('formwork', 'Cost of formwork', at(rates.formworkPerM2, 'money-per-surface'), cost.formwork),
    line(
      'total',
      'Cost in all',
      `sum, ${cost.currency} per ${unitLabel('money-per-length', units).replace('/', '')}`,
      cost.total,
    ),
  ];
}
