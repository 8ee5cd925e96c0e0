import { beamDemand } from '#shared/contract/beam-demand.ts';
import { sweepDefinitionSchema, type SweepDefinition } from '#shared/contract/sweep-definition.ts';
import type { DesignBasis } from '#shared/engine/section.ts';
import type { ComputePool } from '../compute/pool.ts';
import { frozenBasis } from '../http/frozen-basis.ts';
import { computeViews, type ComputedView } from './computed-run.ts';
import { DEMO_PROJECTS } from './projects.ts';
import { DEMO_SWEEPS, type DemoSweep } from './sweeps.ts';

/** A demo sweep with its definition made whole and its run computed. */
export interface DemoRun {
  readonly sweep: DemoSweep;
  readonly definition: SweepDefinition;
  readonly basis: DesignBasis;
  readonly views: readonly ComputedView[];
}

/** The runs of the demo are real: computed here, on the same threads as everybody's. */
export async function computeDemoRuns(pool: ComputePool): Promise<DemoRun[]> {
  const runs: DemoRun[] = [];
  for (const sweep of DEMO_SWEEPS) {
    const project = DEMO_PROJECTS.find(({ key }) => key === sweep.project)!;
    const beam = project.beams.find(({ mark }) => mark === sweep.beam)!;
    const { space, rules, view } = sweep;
    const demand = beamDemand(beam);
    // Through the door that everybody's sweeps come in by.
    const definition = sweepDefinitionSchema.parse({ space, rules, view, demand });
    const basis = frozenBasis(project);
    const views = await computeViews(pool, { definition, basis }, [view, ...sweep.moreViews]);
    runs.push({ sweep, definition, basis, views });
  }
  return runs;
}
