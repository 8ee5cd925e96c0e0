import type { MeasureId } from '#shared/engine/measures.ts';
import { MEASURE_IDS } from '#shared/engine/measures.ts';
import type { CheckResult } from '#shared/engine/evaluation.ts';
import type { BarGroup, Face, SectionInput } from '#shared/engine/section.ts';
import { checkLabel } from '#shared/print/check-labels.ts';
import { exploreLabel, exploreTitle } from '#shared/print/explore-label.ts';
import { faceWord } from '#shared/print/face-word.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import { stirrupText } from '#shared/print/section-text.ts';
import { toDisplay, type DisplayKind } from '#shared/print/units.ts';
import { exploreValue, INPUT_KEYS, type ExploreKey, type JudgedSection } from '#shared/sweep/explore-axis.ts';
import { plainNumber, type PlainCell } from './plain-cell.ts';
import type { TableColumn } from './table-file.ts';

export interface SectionRow extends JudgedSection {
  readonly index: number;
  readonly tieCount: number;
}

type Column = TableColumn<SectionRow>;

/** How many figures a spreadsheet shows by itself; what is not named here shows three decimals. */
const NUMBER_FORMAT: Partial<Record<DisplayKind, string>> = {
  length: '0.###',
  stress: '0.##',
  area: '0.00',
  count: '0',
  moment: '0.0',
  'mass-per-length': '0.00',
  'money-per-length': '0.00',
  'co2e-per-length': '0.0',
};
const OTHER_FORMAT = '0.000';

/** `As, in²`; the unit stands in the head so that the cells are numbers. */
function valueColumn(key: ExploreKey, reader: MeasureReader): Column {
  const label = exploreLabel(key, reader);
  const title = exploreTitle(label);
  return {
    head: label.unit === '' ? title : `${title}, ${label.unit}`,
    width: 14,
    numberFormat: NUMBER_FORMAT[label.kind] ?? OTHER_FORMAT,
    cell: (row) => {
      const value = exploreValue(row, key);
      return value === null ? null : plainNumber(toDisplay(value, label.kind, reader.units));
    },
  };
}

const one = (texts: readonly (string | number)[]): PlainCell =>
  texts.length === 0 ? null : texts.length === 1 ? texts[0]! : texts.join(' + ');

/** Numbers of bars and their sizes apart: `3-25` in one cell is the 25th of March to a spreadsheet that opens a CSV. */
function barColumns(face: Face, section: SectionInput): Column[] {
  const word = faceWord(face, section) === 'top' ? 'Top bars' : 'Bottom bars';
  const groupOf = ({ section: { reinforcement } }: SectionRow): BarGroup =>
    reinforcement.kind === 'bars' ? reinforcement[face] : [];
  return [
    { head: `${word}, number`, width: 12, cell: (row) => one(groupOf(row).map(({ count }) => count)) },
    { head: `${word}, size`, width: 12, cell: (row) => one(groupOf(row).map(({ bar }) => bar)) },
  ];
}

function governing(row: SectionRow): CheckResult | undefined {
  const known = row.evaluation.checks.filter(({ ratio }) => ratio !== null);
  return known.toSorted((a, b) => b.ratio! - a.ratio!)[0];
}

interface ColumnChoice {
  readonly reader: MeasureReader;
  /** Any of the sections: where its faces lie, those of all do. */
  readonly section: SectionInput;
  readonly isMoneyShown: boolean;
  readonly hasTies: boolean;
}

/** What a section's row tells, in the project's units: its size, bars and strengths, every measure, what governs. */
export function sectionColumns({ reader, section, isMoneyShown, hasTies }: ColumnChoice): Column[] {
  const value = (key: ExploreKey) => valueColumn(key, reader);
  const isShown = (measure: MeasureId) => isMoneyShown || measure !== 'costPerM';
  const size: readonly ExploreKey[] = ['widthMm', 'depthMm'];
  const measures = MEASURE_IDS.filter((measure) => isShown(measure) && !size.includes(measure));
  return [
    { head: 'Section', width: 10, numberFormat: '0', cell: ({ index }) => index },
    ...size.map(value),
    ...barColumns('tension', section),
    ...barColumns('compression', section),
    {
      head: 'Stirrups',
      width: 22,
      cell: ({ section: { stirrup }, evaluation: { stirrups } }) =>
        stirrupText(stirrups ?? stirrup, reader.units),
    },
    ...INPUT_KEYS.map(value),
    ...measures.map(value),
    {
      head: 'Governing check',
      width: 22,
      cell: (row) => {
        const found = governing(row);
        return found === undefined ? null : checkLabel(found.id, reader.code).name;
      },
    },
    {
      head: 'Its ratio',
      width: 10,
      numberFormat: '0.000',
      cell: (row) => plainNumber(governing(row)?.ratio),
    },
    ...(hasTies
      ? [{ head: 'Sections that tie', width: 12, cell: ({ tieCount }: SectionRow) => tieCount }]
      : []),
  ];
}
