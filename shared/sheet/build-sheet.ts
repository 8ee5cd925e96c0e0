import type { UnitSystem } from '../contract/design-basis.ts';
import type { Candidate } from '../contract/records.ts';
import { sectionGeometry } from '../drawing/section-geometry.ts';
import { conventionsOf } from './conventions.ts';
import { differencesTable, engineToday, type EngineToday } from './engine-today.ts';
import { inputGroups } from './inputs.ts';
import { Numbering } from './numbering.ts';
import type { KeyText, Sheet } from './sheet.ts';
import { sheetParts } from './sheet-parts.ts';
import { studiesForSheet, type SheetStudies } from './sheet-studies.ts';
import { signaturesOf } from './signatures.ts';

/** Plain data, so that a thread can be handed it. */
export interface SheetSource {
  readonly project: { readonly name: string; readonly number: string };
  readonly units: UnitSystem;
  readonly candidate: Candidate;
}

const CAUTION = [
  'This sheet says that the section meets, or does not meet, the checks listed on it; it says nothing of what is not listed.',
  'A licensed engineer verifies the design under the codes in force at the site before it is used.',
];

/**
 * The sheet of one candidate for whoever the candidate was presented to: without rates there is no money on it. For a pin
 * of an earlier engine the inputs are worked out again, some tens of milliseconds.
 */
export function buildSheet({ project, units, candidate }: SheetSource): Sheet {
  const { snapshot, beam, label } = candidate;
  const { evaluation, section, basis } = snapshot;
  const today = engineToday(candidate);
  const studies = studiesForSheet(snapshot);
  const numbering = new Numbering();
  const parts = sheetParts(snapshot, { units, numbering, studies });
  const differences = differencesTable(today, { units, numbering });
  return {
    title: `Calculation sheet: beam ${beam.mark}, candidate ${label}`,
    subtitle: [project.name, project.number, beam.location].filter((part) => part !== '').join(' · '),
    units,
    verdict: {
      meets: evaluation.meetsListedChecks,
      text: `${evaluation.meetsListedChecks ? 'Meets the listed checks' : 'Does not meet every listed check'} of ${evaluation.ruleSet.title}`,
    },
    inputs: inputGroups(snapshot, beam, units),
    drawing: { section, geometry: sectionGeometry(section, evaluation, basis.barStandard) },
    conventions: conventionsOf(snapshot, units),
    parts: differences === null ? parts : [...parts, differences],
    caution: CAUTION,
    notChecked: evaluation.notChecked,
    frozen: frozenTexts(candidate, today, studies),
    signatures: signaturesOf(candidate),
  };
}

function frozenTexts(
  { snapshot, createdAt, hash }: Candidate,
  today: EngineToday | null,
  { isFrozen }: SheetStudies,
): KeyText[] {
  const { ruleSet } = snapshot.evaluation;
  return [
    { label: 'Pinned', value: createdAt.slice(0, 10) },
    { label: 'Engine', value: snapshot.engineVersion },
    ...(today === null ? [] : [{ label: 'Engine today', value: todayText(today) }]),
    ...(isFrozen
      ? []
      : [
          {
            label: 'Not frozen',
            value: 'curve, second algorithm, twin and scatter, worked out today from the frozen inputs',
          },
        ]),
    { label: 'Rules', value: `${ruleSet.title} (${ruleSet.id})` },
    { label: 'SHA-256', value: hash },
  ];
}

function todayText({ version, differences }: EngineToday): string {
  if (differences.length === 0) return `${version}, the same numbers`;
  return `${version}, ${differences.length === 1 ? 'one line differs' : `${differences.length} lines differ`}, listed above`;
}
