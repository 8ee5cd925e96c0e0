import type { SectionInput } from '#shared/engine/section.ts';
import { faceWord } from '#shared/print/face-word.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { barsText } from '#shared/print/section-text.ts';
import { toDisplay } from '#shared/print/units.ts';
import { columnDecimals } from './column-decimals.ts';
import { exploreValue, INPUT_KEYS, type ExploreKey } from '#shared/sweep/explore-axis.ts';
import { exploreLabel, exploreTitle } from '#shared/print/explore-label.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import type { RowKey, SectionRow } from './section-rows.ts';

export interface Column {
  readonly key: RowKey;
  readonly head: string;
  /** In full, for the list of columns to choose from. */
  readonly title: string;
  readonly unit: string;
  readonly isText: boolean;
}

function faceText(row: SectionRow, face: 'tension' | 'compression', reader: MeasureReader): string {
  const { reinforcement } = row.section;
  if (reinforcement.kind === 'bars') return barsText(reinforcement[face]);
  const geometry = row.evaluation.geometry;
  return formatQuantity(face === 'tension' ? geometry?.asMm2 : geometry?.asPrimeMm2, 'area', reader.units);
}

/** The usual ones; the rest can be chosen. */
const USUAL: readonly RowKey[] = [
  'widthMm',
  'depthMm',
  'fc',
  'tension',
  'compression',
  'steelKgPerM',
  'costPerM',
  'curvatureDuctility',
  'designStrengthNmm',
  'utilisation',
  'ties',
];

/** Bars by where they lie in the beam as it is built: with the slab at its tension face the tension bars are on top. */
function barColumn(face: 'tension' | 'compression', section: SectionInput): Column {
  const head = faceWord(face, section) === 'top' ? 'Top' : 'Bottom';
  return { key: face, head, title: `${head} bars`, unit: '', isText: true };
}

/**
 * Every column there can be, in the order they stand. Size and f′c are told even where all rows have the same. `section` is
 * any of the run: where its faces lie, those of all do.
 */
export function allColumns(
  keys: readonly ExploreKey[],
  reader: MeasureReader,
  section: SectionInput,
): readonly Column[] {
  const valueColumn = (key: ExploreKey): Column => {
    const label = exploreLabel(key, reader);
    return { key, head: label.symbol, title: exploreTitle(label), unit: label.unit, isText: false };
  };
  const always: readonly ExploreKey[] = ['widthMm', 'depthMm', 'fc'];
  const inputs = keys.filter((key) => INPUT_KEYS.some((one) => one === key) && !always.includes(key));
  const measures = keys.filter((key) => !INPUT_KEYS.some((one) => one === key) && !always.includes(key));
  return [
    ...always.map(valueColumn),
    barColumn('tension', section),
    barColumn('compression', section),
    ...inputs.map(valueColumn),
    ...measures.map(valueColumn),
    { key: 'ties', head: 'Ties', title: 'Sections that tie', unit: '', isText: false },
  ];
}

export function shownColumns(all: readonly Column[], chosen: readonly string[] | null): readonly Column[] {
  const wanted: readonly string[] = chosen ?? USUAL;
  const shown = all.filter(({ key }) => wanted.includes(key));
  return shown.length > 0 ? shown : all.filter(({ key }) => USUAL.includes(key));
}

/** Prints one column of these rows: numbers with one number of decimals, so that they stand on their point. */
export function cellPrinter(
  { key }: Column,
  rows: readonly SectionRow[],
  reader: MeasureReader,
): (row: SectionRow) => string {
  if (key === 'tension' || key === 'compression') return (row) => faceText(row, key, reader);
  if (key === 'ties') return (row) => (row.tieCount > 1 ? row.tieCount.toLocaleString('en-US') : '');
  const { kind } = exploreLabel(key, reader);
  if (kind === 'length' || kind === 'stress' || kind === 'count')
    return (row) => formatQuantity(exploreValue(row, key), kind, reader.units, { hideUnit: true });
  const shown = (row: SectionRow) => {
    const value = exploreValue(row, key);
    return value === null ? null : toDisplay(value, kind, reader.units);
  };
  const decimals = columnDecimals(rows.map(shown));
  const style = { minimumFractionDigits: decimals, maximumFractionDigits: decimals };
  return (row) => shown(row)?.toLocaleString('en-US', style) ?? '';
}
