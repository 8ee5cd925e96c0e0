import type { Snapshot } from '../contract/records.ts';
import { studiesOf, type Studies } from '../engine/studies.ts';

/** What is shown of curve, second algorithm, twin and scatter, and whether it was frozen with the pin. */
export interface SheetStudies {
  readonly made: Studies | null;
  readonly isFrozen: boolean;
}

export const frozenStudies = ({ studies }: Snapshot): SheetStudies => ({
  made: studies ?? null,
  isFrozen: true,
});

/** Pins from before studies were frozen have theirs worked out now, from the frozen inputs, and the sheet says so. */
export function studiesForSheet(snapshot: Snapshot): SheetStudies {
  if (snapshot.studies !== undefined) return frozenStudies(snapshot);
  const { section, basis, demand, rules } = snapshot;
  return { made: studiesOf(section, { basis, demand, rules }), isFrozen: false };
}
