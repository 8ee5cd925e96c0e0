import type { UnitSystem } from '../contract/design-basis.ts';
import type { Candidate } from '../contract/records.ts';
import { sectionGeometry } from '../drawing/section-geometry.ts';
import { checkTable } from './check-table.ts';
import { conventionsOf } from './conventions.ts';
import { inputGroups } from './inputs.ts';
import { layerTable } from './layer-table.ts';
import { Numbering } from './numbering.ts';
import { quantityTable } from './quantity-table.ts';
import type { NumberedLine, Sheet, SheetPart } from './sheet.ts';
import { signaturesOf } from './signatures.ts';
import { workingPart } from './working-parts.ts';

export interface SheetSource {
  readonly project: { readonly name: string; readonly number: string };
  readonly units: UnitSystem;
  readonly candidate: Candidate;
}

const CAUTION = [
  'This sheet says that the section meets, or does not meet, the checks listed on it; it says nothing of what is not listed.',
  'A licensed engineer verifies the design under the codes in force at the site before it is used.',
];

/** The sheet of one candidate for whoever the candidate was presented to: without rates there is no money on it. */
export function buildSheet({ project, units, candidate }: SheetSource): Sheet {
  const { snapshot, beam, label } = candidate;
  const { evaluation, section, basis } = snapshot;
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
    parts: partsOf(snapshot, units),
    caution: CAUTION,
    notChecked: evaluation.notChecked,
    frozen: [
      { label: 'Pinned', value: candidate.createdAt.slice(0, 10) },
      { label: 'Engine', value: snapshot.engineVersion },
      { label: 'Rules', value: `${evaluation.ruleSet.title} (${evaluation.ruleSet.id})` },
      { label: 'SHA-256', value: candidate.hash },
    ],
    signatures: signaturesOf(candidate),
  };
}

function partsOf(snapshot: Candidate['snapshot'], units: UnitSystem): SheetPart[] {
  const numbering = new Numbering();
  const { working } = snapshot.evaluation;
  const steps = (topics: Parameters<typeof workingPart>[1]) =>
    workingPart(working, topics, { units, numbering });
  const parts: (SheetPart | null)[] = [
    { id: 'materials', title: 'Materials', kind: 'working', lines: steps(['materials']) },
    {
      id: 'ultimate',
      title: 'Section at ultimate: axis and block',
      kind: 'working',
      lines: steps(['ultimate']),
    },
    layerTable(snapshot, units, numbering),
    {
      id: 'residual',
      title: 'Equilibrium and strength',
      kind: 'working',
      lines: steps(['residual', 'strength']),
    },
    { id: 'limits', title: 'Limits, spacing and shear', kind: 'working', lines: steps(['limits']) },
    { id: 'elastic', title: 'Elastic section', kind: 'working', lines: steps(['elastic']) },
    { id: 'ductility', title: 'Curvatures and ductility', kind: 'working', lines: steps(['ductility']) },
    { id: 'more', title: 'Further working', kind: 'working', lines: steps('rest') },
    checkTable(snapshot, units, numbering),
    quantityTable(snapshot, units, numbering),
  ];
  return parts.filter(
    (part) => part !== null && (part.kind === 'table' || part.lines.length > 0),
  ) as SheetPart[];
}

/** The sheet's numbers by line, in stored units: what an own value can be given for. The units of reading do not matter. */
export function comparableValues(snapshot: Candidate['snapshot']): ReadonlyMap<string, number> {
  const lines = partsOf(snapshot, 'si').flatMap((part): readonly NumberedLine[] =>
    part.kind === 'working' ? part.lines : part.table.rows,
  );
  return new Map(lines.flatMap(({ id, value }) => (value === null ? [] : [[id, value] as const])));
}
