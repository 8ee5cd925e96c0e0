import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Person, SheetValue, Snapshot } from '#shared/contract/records.ts';
import { comparableValues } from '#shared/sheet/sheet-parts.ts';
import { handCheck } from './hand-check.ts';

/** Own values as a check records them: in the order of the sheet's lines, each beside the sheet's. */
export function ownValuesOf(
  snapshot: Snapshot,
  units: UnitSystem,
  { by, at }: { readonly by: Pick<Person, 'id' | 'name'>; readonly at: Date },
): SheetValue[] {
  const own = handCheck(snapshot, units);
  return [...comparableValues(snapshot)].flatMap(([line, onSheet]) => {
    const value = own.get(line);
    return value === undefined ? [] : [{ line, value, onSheet, by, updatedAt: at.toISOString() }];
  });
}
