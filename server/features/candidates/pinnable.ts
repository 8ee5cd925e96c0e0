import { beamDemand } from '#shared/contract/beam-demand.ts';
import { eq } from 'drizzle-orm';
import type { PinInput, Snapshot } from '#shared/contract/records.ts';
import { InvalidSectionError } from '#shared/engine/preconditions.ts';
import type { SectionInput, UserRules } from '#shared/engine/section.ts';
import { expandSpace, sectionAt } from '#shared/sweep/space.ts';
import type { Database } from '../../db/client.ts';
import { runs } from '../../db/schema/runs.ts';
import { sweeps } from '../../db/schema/sweeps.ts';
import { invalidInput, notFound } from '../../errors.ts';
import type { BeamRow } from '../../http/beam-access.ts';
import { frozenBasis } from '../../http/frozen-basis.ts';
import type { ProjectRow } from '../../http/project-access.ts';
import { takeSnapshot } from './snapshot.ts';

interface Pin {
  readonly project: ProjectRow;
  readonly beam: BeamRow;
  readonly source: PinInput['source'];
}

/**
 * The snapshot of a section that can be pinned. One that fails checks can: the snapshot says which. One whose bars
 * cannot be placed is no section yet.
 */
export async function requirePinnable(db: Database, { project, beam, source }: Pin): Promise<Snapshot> {
  const snapshot =
    source.kind === 'run'
      ? await snapshotFromRun(db, beam, source)
      : snapshotOfTyped(project, beam, source.section);
  const { flexure, arrangement } = snapshot.evaluation;
  if (flexure === null)
    throw invalidInput([
      {
        path: source.kind === 'run' ? ['source', 'index'] : ['source', 'section', 'reinforcement'],
        message: `This section cannot be pinned: ${
          arrangement?.fits === false ? arrangement.reason : 'it has no tension steel'
        }`,
      },
    ]);
  return snapshot;
}

/** From the run's frozen inputs: what the project says today does not matter. */
async function snapshotFromRun(
  db: Database,
  beam: BeamRow,
  { runId, index }: { runId: string; index: number },
): Promise<Snapshot> {
  const [found] = await db
    .select({ run: runs, beamId: sweeps.beamId })
    .from(runs)
    .innerJoin(sweeps, eq(sweeps.id, runs.sweepId))
    .where(eq(runs.id, runId));
  if (found?.beamId !== beam.id) throw notFound(`A run of beam ${beam.mark} with this id`);
  const { definition, basis } = found.run;
  const space = expandSpace(definition.space, basis.barStandard);
  if (index >= space.size)
    throw invalidInput([{ path: ['source', 'index'], message: `The run has ${space.size} sections only` }]);
  const { demand, rules } = definition;
  return takeSnapshot({ section: sectionAt(space, index), demand, rules, basis });
}

/** On the project's basis of today, for the beam's demands. */
function snapshotOfTyped(project: ProjectRow, beam: BeamRow, section: SectionInput): Snapshot {
  try {
    return takeSnapshot({
      section,
      demand: beamDemand(beam),
      rules: rulesOfTyped(section),
      basis: frozenBasis(project),
    });
  } catch (error) {
    if (error instanceof InvalidSectionError)
      throw invalidInput([{ path: ['source', 'section', ...error.path], message: error.message }]);
    throw error;
  }
}

/** A typed section was chosen by hand: of the office's rules only what stirrups need to hang on is asked of it. */
const rulesOfTyped = ({ stirrup }: SectionInput): UserRules => ({
  minDepthToWidth: null,
  maxDepthToWidth: null,
  maxLayers: 2,
  oneSizePerFace: false,
  excludedBars: [],
  columnWidthMm: null,
  minCompressionShare: null,
  requireHangers: stirrup !== null,
});
