import { lazy, Suspense, useCallback, useMemo, useRef } from 'react';
import { useLocation, useNavigate } from 'react-router-dom';
import type { Project, Run } from '#shared/contract/records.ts';
import type { FrontPicture } from '#client/src/charts/front-chart-input.ts';
import { drawingExports } from '#client/src/drawing/drawing-exports.ts';
import { Inspector } from '#client/src/features/inspector/inspector.tsx';
import { PinPanel } from '#client/src/features/inspector/pin-panel.tsx';
import { FellOut } from '#client/src/features/run/fell-out.tsx';
import { FrontPanel } from '#client/src/features/run/front-panel.tsx';
import { NothingFeasible } from '#client/src/features/run/nothing-feasible.tsx';
import { ProofLine } from '#client/src/features/run/proof-line.tsx';
import { RatesBar } from '#client/src/features/run/rates-bar.tsx';
import { RangeChips } from '#client/src/features/run/range-chips.tsx';
import { hasFilters } from '#shared/sweep/range-filters.ts';
import { RunHead } from '#client/src/features/run/run-head.tsx';
import { SpaceRail } from '#client/src/features/run/space-rail.tsx';
import { WorkspaceFrame } from '#client/src/features/run/workspace-frame.tsx';
import { useRunView } from '#client/src/features/run/use-run-view.ts';
import { useStartRun } from '#client/src/features/sweeps/api.ts';
import { carriedSearch } from '#client/src/lib/carried-search.ts';
import { paths } from '#client/src/lib/paths.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { Button, ButtonLink } from '#client/src/ui/button.tsx';
import { ErrorState } from '#client/src/ui/error-state.tsx';
import { ExportMenu } from '#client/src/ui/export-menu.tsx';
import { PageCrumbs } from '#client/src/ui/page-crumbs.tsx';
import { Skeleton } from '#client/src/ui/skeleton.tsx';
import { RunBelowChart } from './run-below-chart.tsx';
import { useRunPins } from './use-run-pins.ts';
import { useRunShortcuts } from './use-run-shortcuts.ts';

/** Their floating parts are not needed for the first look. */
const RunViews = lazy(async () => ({ default: (await import('./run-views.tsx')).RunViews }));
const RunExports = lazy(async () => ({ default: (await import('./run-exports.tsx')).RunExports }));
const RunMenu = lazy(async () => ({ default: (await import('./run-menu.tsx')).RunMenu }));

interface RunWorkspaceProps {
  readonly run: Run;
  readonly project: Project;
}

/** The actions of the page's head: what can be done about the run as a whole. */
function HeadActions({ run, isUnfinished }: { readonly run: Run; readonly isUnfinished: boolean }) {
  const mayRun = useMay('run-sweeps');
  const navigate = useNavigate();
  const { search } = useLocation();
  const again = useStartRun(run.projectId);
  if (!mayRun) return null;
  const runAgain = () =>
    again.mutate(run.sweepId, {
      onSuccess: (started) => void navigate(paths.run(run.projectId, started.id) + carriedSearch(search)),
    });
  return (
    <>
      {isUnfinished && (
        <Button onClick={runAgain} isBusy={again.isPending}>
          Run again
        </Button>
      )}
      <ButtonLink
        to={paths.sweep(run.projectId, run.sweepId)}
        state={{ runSearch: carriedSearch(search, ['x', 'y']) }}
      >
        Change the sweep
      </ButtonLink>
    </>
  );
}

export function RunWorkspace({ run, project }: RunWorkspaceProps) {
  const { units } = project.designBasis;
  const mayRun = useMay('run-sweeps');
  const state = useRunView(run, units);
  const { address, view, source, reader, progress, result, selected, explore } = state;
  const pins = useRunPins(run, view, source);
  const selectedIndex = selected?.index ?? null;
  const picture = useRef<FrontPicture | null>(null);
  const keepPicture = useCallback((drawn: FrontPicture) => {
    picture.current = drawn;
  }, []);
  useRunShortcuts({ front: explore.shown.listed, selectedIndex, onSelect: address.select, onPin: pins.pin });
  const pinned = pins.own.find((candidate) => candidate.sectionIndex === selectedIndex) ?? null;
  const isOver = progress !== null && !state.isLive;

  const crumbs = useMemo(
    () => [
      { label: project.name, to: paths.project(project.id) },
      { label: run.beam.mark, to: paths.project(project.id, 'beams') },
      { label: run.sweepName, to: paths.sweep(project.id, run.sweepId) },
      { label: `Run ${run.number}` },
    ],
    [project.name, project.id, run],
  );

  const space = (
    <div className="grid gap-4">
      <SpaceRail
        definition={run.definition}
        result={result}
        within={hasFilters(explore.filters) ? explore.axisCounts : null}
        units={units}
        code={run.basis.ruleSet}
        selected={selected?.section ?? null}
      />
      {state.recorded !== null && (
        <FellOut
          isByCurve={(run.basis.ductilityMeasure ?? 'closed') !== 'closed'}
          result={state.recorded}
          definition={run.definition}
          reader={reader}
          onSelect={address.select}
          onMore={() => address.write({ show: 'why' })}
        />
      )}
      {state.ranked.asked !== null && (
        <p className="text-xs text-muted">What each check costs is told at the run’s own rates.</p>
      )}
    </div>
  );

  const front =
    state.error !== null ? (
      <ErrorState error={state.error} title="This comparison could not be opened" onRetry={state.retry} />
    ) : (
      <div className="grid min-w-0 grid-cols-[minmax(0,1fr)] gap-4">
        {result !== null && (
          <RangeChips
            explore={explore}
            feasible={result.feasible}
            frontCount={result.front.length}
            reader={reader}
          />
        )}
        <div className={address.rates === null ? 'print:hidden' : undefined}>
          <RatesBar ranked={state.ranked} address={address} reader={reader} />
        </div>
        <FrontPanel
          run={state.ranked.run}
          view={view}
          progress={progress}
          source={source}
          reader={reader}
          explore={explore}
          address={address}
          keys={state.keys}
          pins={pins.flags}
          selected={state.place}
          onDrawn={keepPicture}
          whenEmpty={
            result !== null && (
              <NothingFeasible
                result={result}
                definition={run.definition}
                source={source}
                reader={reader}
                onSelect={address.select}
              />
            )
          }
        />
        <RunBelowChart
          run={run}
          state={state}
          pinLabels={pins.labels}
          onPin={pins.pin}
          isFinished={progress?.state === 'finished'}
        />
      </div>
    );

  const { select } = address;
  // Kept as it is while a hand drags a range or a band: only another section makes it anew.
  const section = useMemo(
    () =>
      selected === null ? (
        isOver || state.error !== null ? (
          <p className="text-muted">Choose a section to look at it.</p>
        ) : (
          <Skeleton lines={12} />
        )
      ) : (
        <Inspector
          section={selected.section}
          evaluation={selected.evaluation}
          standard={run.basis.barStandard}
          units={units}
          context={source.context}
          space={source.space}
          onSelect={select}
          actions={
            <div className="grid gap-3">
              <PinPanel
                key={selected.index}
                projectId={project.id}
                beamId={run.beam.id}
                beamMark={run.beam.mark}
                source={{ kind: 'run', runId: run.id, index: selected.index }}
                pinned={pinned}
              />
              <p className="flex flex-wrap gap-x-4 text-sm">
                <ButtonLink
                  look="text"
                  className="text-sm"
                  to={`${paths.section(project.id)}?run=${run.id}&i=${selected.index}`}
                >
                  Change it by hand
                </ButtonLink>
                <ExportMenu
                  look="text"
                  words="Drawing as a file"
                  groups={[
                    drawingExports({
                      section: selected.section,
                      evaluation: selected.evaluation,
                      standard: run.basis.barStandard,
                      units,
                      source: [project.number, run.beam.mark, 'run', run.number, 'section', selected.index],
                    }),
                  ]}
                />
              </p>
            </div>
          }
        />
      ),
    [selected, isOver, state.error, run, project.id, project.number, units, pinned, source, select],
  );

  return (
    <>
      <PageCrumbs crumbs={crumbs} />
      <WorkspaceFrame
        head={
          <RunHead
            run={run}
            progress={state.latest}
            mayStop={mayRun}
            isStopping={state.cancel.isPending}
            onStop={() => state.cancel.mutate()}
            actions={
              <>
                <Suspense>
                  <RunViews run={run} state={state} />
                  <RunExports run={run} project={project} state={state} picture={picture} />
                  <RunMenu run={run} />
                </Suspense>
                <HeadActions run={run} isUnfinished={isOver && progress.state !== 'finished'} />
              </>
            }
          />
        }
        space={space}
        front={front}
        section={section}
        foot={<ProofLine run={run} progress={progress} ranking={state.ranked.ranking} />}
      />
    </>
  );
}
