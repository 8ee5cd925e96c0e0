import { createHash } from 'node:crypto';
import type { Snapshot } from '#shared/contract/records.ts';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import type { Studies } from '#shared/engine/studies.ts';
import type { DesignBasis, Demand, SectionInput, UserRules } from '#shared/engine/section.ts';

interface SnapshotInputs {
  readonly section: SectionInput;
  readonly demand: Demand;
  readonly rules: UserRules;
  readonly basis: DesignBasis;
}

/**
 * Everything that travels with a pin: the inputs, and what today's engine makes of them.
 * @throws InvalidSectionError where the section is none.
 */
export function takeSnapshot({ section, demand, rules, basis }: SnapshotInputs): Snapshot {
  const evaluation = evaluateSection(section, { basis, demand, rules });
  const { engineVersion } = evaluation;
  // Through JSON, so that what is hashed is what is stored and sent.
  return JSON.parse(JSON.stringify({ section, demand, rules, basis, engineVersion, evaluation })) as Snapshot;
}

/** With what is looked at beyond the checks, frozen too. */
export const withStudies = (snapshot: Snapshot, studies: Studies): Snapshot => ({
  ...snapshot,
  studies: JSON.parse(JSON.stringify(studies)) as Studies,
});

/** SHA-256 over the canonical JSON: no blanks, keys sorted, as anyone can repeat it from the snapshot they are sent. */
export function hashSnapshot(snapshot: Snapshot): string {
  return createHash('sha256').update(canonicalJson(snapshot)).digest('hex');
}

function canonicalJson(value: unknown): string {
  return JSON.stringify(value, (_key, entry: unknown) => sortKeys(entry));
}

const sortKeys = (entry: unknown): unknown =>
  typeof entry === 'object' && entry !== null && !Array.isArray(entry)
    ? Object.fromEntries(Object.entries(entry).sort(([a], [b]) => (a < b ? -1 : 1)))
    : entry;

/**
 * Whether today's engine gives the frozen numbers, to the last digit. Wording and version may differ, and so may the
 * working: it repeats, line by line, numbers that stand elsewhere in the evaluation.
 */
export function isReproduced(snapshot: Snapshot): boolean {
  try {
    const today = takeSnapshot(snapshot).evaluation;
    return numbersOf({ ...today, working: [] }) === numbersOf({ ...snapshot.evaluation, working: [] });
  } catch {
    return false;
  }
}

const numbersOf = (value: unknown): string =>
  JSON.stringify(value, (_key, entry: unknown) => (typeof entry === 'string' ? '' : sortKeys(entry)));
