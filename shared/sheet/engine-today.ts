import type { Candidate } from '../contract/records.ts';
import { evaluateSection } from '../engine/evaluate.ts';
import { studiesOf } from '../engine/studies.ts';
import { ENGINE_VERSION } from '../engine/version.ts';
import { formatQuantity } from '../print/format-quantity.ts';
import type { DisplayKind } from '../print/units.ts';
import type { StudyWriting } from './curve-part.ts';
import { figuresOf } from './figures.ts';
import { isMoneyLine } from './quantity-table.ts';
import type { SheetPart, SheetRow } from './sheet.ts';
import { namedLines, type NamedLine } from './sheet-parts.ts';
import { figureColumn, wordColumn } from './table-column.ts';

/** What the engine that runs now makes of the frozen inputs, beside what was frozen. */
export interface EngineToday {
  readonly version: string;
  readonly differences: readonly LineDifference[];
}

/** One line that is not the same any more; null where only one of the two has it. */
interface LineDifference {
  readonly id: string;
  readonly name: string;
  readonly kind: DisplayKind;
  readonly frozen: number | null;
  readonly today: number | null;
}

/** Numbers that differ in this share or less are the same: other compilers may round the last bit otherwise. */
const SAME = 1e-12;

/** Lines that follow from rates: whoever is not shown the rates cannot have them worked out again. */
const NEEDS_RATES = ['laps', 'waste', 'steel-total', 'co2e'];

/**
 * Null where the pin's engine is the one that runs and gives the frozen numbers: there is nothing to tell. Checks that the
 * pin's engine did not know are differences; further lines of working are not.
 */
export function engineToday({
  snapshot,
  isReproducedByCurrentEngine,
}: Pick<Candidate, 'snapshot' | 'isReproducedByCurrentEngine'>): EngineToday | null {
  if (snapshot.engineVersion === ENGINE_VERSION && isReproducedByCurrentEngine) return null;
  const { section, basis, demand, rules } = snapshot;
  const context = { basis, demand, rules };
  const evaluation = evaluateSection(section, context);
  const studies = snapshot.studies && studiesOf(section, context);
  const today = new Map(namedLines({ ...snapshot, evaluation, studies }).map((line) => [line.id, line]));
  const frozen = new Map(namedLines(snapshot).map((line) => [line.id, line]));
  const isCompared = ({ id }: NamedLine) =>
    basis.rates !== null || !(isMoneyLine(id) || NEEDS_RATES.includes(id));
  const lines = [...frozen.values(), ...[...today.values()].filter(isNewCheck(frozen))].filter(isCompared);
  return {
    version: evaluation.engineVersion,
    differences: lines.flatMap(({ id, name, kind }) => {
      const [then, now] = [frozen.get(id)?.value ?? null, today.get(id)?.value ?? null];
      return isSame(then, now) ? [] : [{ id, name, kind, frozen: then, today: now }];
    }),
  };
}

const isNewCheck = (frozen: ReadonlyMap<string, NamedLine>) => (line: NamedLine) =>
  line.id.startsWith('check-') && !frozen.has(line.id);

function isSame(a: number | null, b: number | null): boolean {
  if (a === null || b === null) return a === b;
  return Math.abs(a - b) <= SAME * Math.max(Math.abs(a), Math.abs(b));
}

/** The differences as a part of the sheet; null where there are none. */
export function differencesTable(
  today: EngineToday | null,
  { units, numbering }: Pick<StudyWriting, 'units' | 'numbering'>,
): SheetPart | null {
  if (today === null || today.differences.length === 0) return null;
  const rowOf = ({ id, name, kind, frozen, today: now }: LineDifference): SheetRow => {
    const print = (value: number | null) =>
      value === null ? '–' : formatQuantity(value, kind, units, { digits: figuresOf(kind) });
    const share = frozen === null || now === null || frozen === 0 ? null : now / frozen - 1;
    return {
      id: `today-${id}`,
      number: numbering.next(),
      value: null,
      kind,
      cells: [name, print(frozen), print(now), share === null ? '' : formatQuantity(share, 'percent', units)],
    };
  };
  return {
    id: 'today',
    title: `Where engine ${today.version} differs`,
    kind: 'table',
    table: {
      columns: [
        wordColumn('Line'),
        figureColumn('Frozen'),
        figureColumn('Today'),
        figureColumn('Difference'),
      ],
      rows: today.differences.map(rowOf),
      remarks: [
        'The sheet shows the frozen numbers. A dash: the one engine has the line and the other has not.',
      ],
      comparedColumn: null,
    },
  };
}
