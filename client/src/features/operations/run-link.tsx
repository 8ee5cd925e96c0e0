import { Link } from 'react-router-dom';
import type { ViewUnderWay } from '#shared/contract/operations.ts';
import { paths } from '#client/src/lib/paths.ts';

type RunOfProject = Pick<ViewUnderWay, 'runId' | 'projectId' | 'beamMark' | 'sweepName' | 'runNumber'>;

/** The run by its beam, sweep and number, and the way to it. */
export function RunLink({ runId, projectId, beamMark, sweepName, runNumber }: RunOfProject) {
  return (
    <Link to={paths.run(projectId, runId)} className="underline decoration-concrete-edge">
      {beamMark}, {sweepName}, run {runNumber}
    </Link>
  );
}
