import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { useNavigate, useParams, useSearchParams } from 'react-router-dom';
import type { Project, Run, Sweep } from '#shared/contract/records.ts';
import { MeasureChoice } from '#client/src/charts/measure-choice.tsx';
import type { ComparedRun } from '#client/src/features/run-difference/compared-run.ts';
import { RunDifference } from '#client/src/features/run-difference/run-difference.tsx';
import { RunPair, type ComparableRun } from '#client/src/features/run-difference/run-pair.tsx';
import { readableView } from '#client/src/features/run/readable-view.ts';
import { readRunAddress, withMeasure } from '#client/src/features/run/run-address.ts';
import { runQuery, useRunEvents, useView } from '#client/src/features/run/run-api.ts';
import { createSectionSource } from '#client/src/features/run/section-source.ts';
import { isUnderWay } from '#client/src/features/run/view-progress.ts';
import { sweepsQuery } from '#client/src/features/sweeps/api.ts';
import { unavailableReason } from '#client/src/lib/measure-availability.ts';
import { paths } from '#client/src/lib/paths.ts';
import { useProject } from '#client/src/lib/project-context.ts';
import { runStateLabel } from '#client/src/lib/state-labels.ts';
import { ButtonLink } from '#client/src/ui/button.tsx';
import { ErrorState } from '#client/src/ui/error-state.tsx';
import { PageBody } from '#client/src/ui/page-body.tsx';
import { PageCrumbs } from '#client/src/ui/page-crumbs.tsx';
import { PageHeader } from '#client/src/ui/page-header.tsx';
import { Skeleton } from '#client/src/ui/skeleton.tsx';
import type { View } from '#shared/sweep/problem.ts';
import { LoadFailure } from '../load-failure.tsx';
import { RoutePending } from '../route-pending.tsx';

/** One run set against another, in the measures of the address. */
export function DifferencePage() {
  const project = useProject();
  const { runId = '', baselineId = '' } = useParams();
  const other = useQuery(runQuery(runId));
  const baseline = useQuery(runQuery(baselineId));
  if (other.data !== undefined && baseline.data !== undefined)
    return (
      <Difference
        key={`${runId} ${baselineId}`}
        project={project}
        baseline={baseline.data}
        other={other.data}
      />
    );
  const failed = [other, baseline].find(({ isError }) => isError);
  if (failed === undefined) return <RoutePending />;
  return <LoadFailure error={failed.error} what="run" onRetry={() => void failed.refetch()} />;
}

interface DifferenceProps {
  readonly project: Project;
  readonly baseline: Run;
  readonly other: Run;
}

/** A run in the measures asked for; null while that is computed. */
function useCompared(run: Run, view: View) {
  const query = useView(run, view);
  const sections = useMemo(
    () => createSectionSource({ definition: run.definition, basis: run.basis }),
    [run.definition, run.basis],
  );
  const { data } = query;
  useRunEvents(run.id, isUnderWay(data?.state ?? run.state));
  const result = data?.result ?? null;
  const compared = useMemo<ComparedRun | null>(
    () => (result === null ? null : { run, result, sections }),
    [run, result, sections],
  );
  return { compared, state: data?.state ?? null, error: query.error, retry: () => void query.refetch() };
}

/** Said of a run whose numbers are not, or not yet, those of its whole space. */
function StateNote({
  run,
  state,
}: {
  readonly run: Run;
  readonly state: ReturnType<typeof useCompared>['state'];
}) {
  if (state === null || state === 'finished') return null;
  return (
    <p className="mb-3 border-l-2 border-near-mark py-1 pl-3 text-sm text-near" role="status">
      △ Run {run.number} is {runStateLabel(state).word.toLowerCase()}: what is compared is the part that is
      done.
    </p>
  );
}

function Difference({ project, baseline, other }: DifferenceProps) {
  const { units } = project.designBasis;
  const navigate = useNavigate();
  const [params, setParams] = useSearchParams();
  const asked = readRunAddress(params, other.definition.view).view;
  // In two measures that both can be read in.
  const wanted = readableView(baseline, readableView(other, { x: asked.x, y: asked.y }, units), units);
  const view = useMemo(() => ({ x: wanted.x, y: wanted.y }), [wanted.x, wanted.y]);
  const sides = [useCompared(baseline, view), useCompared(other, view)] as const;
  const sweeps = useQuery(sweepsQuery(project.id));
  const failed = sides.find(({ error }) => error !== null);
  const [before, after] = [sides[0].compared, sides[1].compared];
  const choose = (side: 'x' | 'y') => (measure: View['x']) => {
    const next = withMeasure(view, side, measure);
    setParams({ x: next.x, y: next.y }, { replace: true, preventScrollReset: true });
  };
  const reasonAgainst = (measure: View['x']) =>
    [baseline, other]
      .map(({ definition, basis }) => unavailableReason(measure, { ...definition, basis, units }))
      .find((reason) => reason !== null) ?? null;

  return (
    <PageBody>
      <PageCrumbs
        crumbs={[
          { label: project.name, to: paths.project(project.id) },
          { label: other.sweepName, to: paths.sweep(project.id, other.sweepId) },
          { label: `Run ${other.number} against run ${baseline.number}` },
        ]}
      />
      <PageHeader
        title={`Run ${other.number} against run ${baseline.number}`}
        lead={
          other.sweepId === baseline.sweepId
            ? `${other.sweepName}, beam ${other.beam.mark}`
            : `${other.sweepName} against ${baseline.sweepName}, beam ${other.beam.mark}`
        }
        actions={<ButtonLink to={paths.run(project.id, other.id)}>To run {other.number}</ButtonLink>}
      />
      <div className="grid gap-4 pb-6 print:hidden">
        {sweeps.data !== undefined && (
          <RunPair
            runs={comparableRuns(sweeps.data, [baseline, other])}
            baselineId={baseline.id}
            otherId={other.id}
            onChoose={(pair) =>
              void navigate({
                pathname: paths.difference(project.id, pair.otherId, pair.baselineId),
                search: params.toString(),
              })
            }
          />
        )}
        <div className="flex flex-wrap items-baseline gap-x-3 gap-y-2">
          <span className="text-sm text-muted">Best and front in</span>
          <MeasureChoice
            side="x"
            value={view.x}
            units={units}
            reasonAgainst={reasonAgainst}
            onChange={choose('x')}
          />
          <span className="text-sm text-muted">against</span>
          <MeasureChoice
            side="y"
            value={view.y}
            units={units}
            reasonAgainst={reasonAgainst}
            onChange={choose('y')}
          />
        </div>
      </div>
      <StateNote run={baseline} state={sides[0].state} />
      <StateNote run={other} state={sides[1].state} />
      {before !== null && after !== null ? (
        <RunDifference baseline={before} other={after} units={units} />
      ) : failed !== undefined ? (
        <ErrorState
          error={failed.error}
          title="One of the runs could not be read in these measures"
          onRetry={failed.retry}
        />
      ) : (
        <Skeleton lines={16} />
      )}
    </PageBody>
  );
}

/** The runs of the beam that have anything to show, with those compared. */
function comparableRuns(sweeps: readonly Sweep[], pair: readonly Run[]): readonly ComparableRun[] {
  const beamIds = pair.map(({ beam }) => beam.id);
  const told = sweeps
    .filter(({ beamId }) => beamIds.includes(beamId))
    .flatMap(({ name, runs }) => runs.map((run) => ({ ...run, sweepName: name })))
    .filter(({ evaluated }) => evaluated > 0);
  return [...told, ...pair.filter(({ id }) => told.every((run) => run.id !== id))];
}
