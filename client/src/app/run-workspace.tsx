import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { useNavigate } from 'react-router-dom';
import type { Project, Run } from '#shared/contract/records.ts';
import { Inspector } from '#client/src/features/inspector/inspector.tsx';
import { PinPanel } from '#client/src/features/inspector/pin-panel.tsx';
import { bandWithin } from '#client/src/features/run/band-within.ts';
import { FellOut } from '#client/src/features/run/fell-out.tsx';
import { FrontPanel } from '#client/src/features/run/front-panel.tsx';
import { FrontStrip } from '#client/src/features/run/front-strip.tsx';
import { NothingFeasible } from '#client/src/features/run/nothing-feasible.tsx';
import { ProofLine } from '#client/src/features/run/proof-line.tsx';
import { RunHead } from '#client/src/features/run/run-head.tsx';
import { SectionTable } from '#client/src/features/run/section-table.tsx';
import { SpaceRail } from '#client/src/features/run/space-rail.tsx';
import { SteelAloneNote } from '#client/src/features/run/steel-alone-note.tsx';
import { WorkspaceFrame } from '#client/src/features/run/workspace-frame.tsx';
import { useRunView } from '#client/src/features/run/use-run-view.ts';
import { candidatesQuery } from '#client/src/features/shortlist/api.ts';
import { useStartRun } from '#client/src/features/sweeps/api.ts';
import { unavailableReason } from '#client/src/lib/measure-availability.ts';
import { unitLabel } from '#shared/print/units.ts';
import { paths } from '#client/src/lib/paths.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { Button, ButtonLink } from '#client/src/ui/button.tsx';
import { ErrorState } from '#client/src/ui/error-state.tsx';
import { PageCrumbs } from '#client/src/ui/page-crumbs.tsx';
import { Skeleton } from '#client/src/ui/skeleton.tsx';

interface RunWorkspaceProps {
  readonly run: Run;
  readonly project: Project;
}

/** Pins of this beam as flags: those of this very run by their index, others by their measures alone. */
function usePins(run: Run, view: { readonly x: string; readonly y: string }) {
  const candidates = useQuery(candidatesQuery(run.projectId));
  const own = useMemo(
    () =>
      (candidates.data ?? []).filter(
        (candidate) => candidate.runId === run.id && candidate.sectionIndex !== null,
      ),
    [candidates.data, run.id],
  );
  const flags = useMemo(
    () =>
      own.flatMap((candidate) => {
        const measures = candidate.snapshot.evaluation.measures as Readonly<Record<string, number | null>>;
        const [x, y] = [measures[view.x] ?? null, measures[view.y] ?? null];
        if (x === null || y === null || candidate.state === 'superseded') return [];
        return [{ label: candidate.label, index: candidate.sectionIndex ?? 0, x, y }];
      }),
    [own, view.x, view.y],
  );
  return { own, flags };
}

export function RunWorkspace({ run, project }: RunWorkspaceProps) {
  const { units } = project.designBasis;
  const mayRun = useMay('run-sweeps');
  const navigate = useNavigate();
  const state = useRunView(run, units);
  const { address, view, source, reader, progress, result, selected } = state;
  const pins = usePins(run, view);
  const again = useStartRun(project.id);
  const runAgain = () =>
    again.mutate(run.sweepId, { onSuccess: (started) => void navigate(paths.run(project.id, started.id)) });
  const isCostAvailable =
    unavailableReason('costPerM', { ...run.definition, basis: run.basis, units }) === null;
  const pinned = pins.own.find((candidate) => candidate.sectionIndex === selected?.index) ?? null;
  const band = useMemo(
    () => (result === null ? [] : bandWithin(result, address.bandShare)),
    [result, address.bandShare],
  );
  const isOver = progress !== null && !state.isLive;

  const actions = mayRun && (
    <>
      {isOver && progress.state !== 'finished' && (
        <Button onClick={runAgain} isBusy={again.isPending}>
          Run again
        </Button>
      )}
      <ButtonLink to={paths.sweep(project.id, run.sweepId)}>Change the sweep</ButtonLink>
    </>
  );

  return (
    <>
      <PageCrumbs
        crumbs={[
          { label: project.name, to: paths.project(project.id) },
          { label: run.beam.mark, to: paths.project(project.id, 'beams') },
          { label: run.sweepName, to: paths.sweep(project.id, run.sweepId) },
          { label: `Run ${run.number}` },
        ]}
      />
      <WorkspaceFrame
        head={
          <RunHead
            run={run}
            progress={state.latest}
            mayStop={mayRun}
            isStopping={state.cancel.isPending}
            onStop={() => state.cancel.mutate()}
            actions={actions}
          />
        }
        space={
          <div className="grid gap-4">
            <SpaceRail
              definition={run.definition}
              result={result}
              units={units}
              selected={selected?.section ?? null}
            />
            {result !== null && (
              <FellOut
                result={result}
                definition={run.definition}
                reader={reader}
                onSelect={address.select}
              />
            )}
          </div>
        }
        front={
          state.error !== null ? (
            <ErrorState
              error={state.error}
              title="This comparison could not be opened"
              onRetry={state.retry}
            />
          ) : (
            <div className="grid min-w-0 grid-cols-[minmax(0,1fr)] gap-4">
              <FrontPanel
                run={run}
                view={view}
                progress={progress}
                source={source}
                reader={reader}
                pins={pins.flags}
                bandShare={address.bandShare}
                selectedIndex={selected?.index ?? null}
                whenEmpty={
                  result !== null && (
                    <NothingFeasible
                      result={result}
                      definition={run.definition}
                      reader={reader}
                      onSelect={address.select}
                    />
                  )
                }
                onView={address.setView}
                onBandShare={address.setBandShare}
                onSelect={address.select}
              />
              {result !== null && (
                <SteelAloneNote
                  result={result}
                  source={source}
                  isCostAvailable={isCostAvailable}
                  onView={address.setView}
                />
              )}
              {result !== null && result.front.length > 0 && (
                <>
                  <section aria-label="Along the front" className="min-w-0 border-t border-rule pt-2">
                    <h2 className="pb-1 text-xs font-semibold text-muted">
                      Along the front, to one scale (b × h, {unitLabel('length', units)})
                    </h2>
                    <FrontStrip
                      front={result.front}
                      view={view}
                      source={source}
                      standard={run.basis.barStandard}
                      reader={reader}
                      selectedIndex={selected?.index ?? null}
                      onSelect={address.select}
                    />
                  </section>
                  <div className="border-t border-rule pt-3">
                    <SectionTable
                      front={result.front}
                      band={band}
                      isBandCut={result.isBandCut && band.length === result.band.length}
                      source={source}
                      reader={reader}
                      selectedIndex={selected?.index ?? null}
                      onSelect={address.select}
                    />
                  </div>
                </>
              )}
            </div>
          )
        }
        section={
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
                  <p className="text-sm">
                    <ButtonLink
                      look="text"
                      className="text-sm"
                      to={`${paths.section(project.id)}?run=${run.id}&i=${selected.index}`}
                    >
                      Change it by hand
                    </ButtonLink>
                  </p>
                </div>
              }
            />
          )
        }
        foot={<ProofLine run={run} progress={progress} />}
      />
    </>
  );
}
