import type { ReactNode } from 'react';
import type { QueuePosition, Run, SearchProgress, ViewProgress } from '#shared/contract/records.ts';
import { ENGINE_VERSION } from '#shared/engine/version.ts';
import { formatDuration, formatNumber, formatWhole } from '#shared/print/format-quantity.ts';
import { runStateLabel } from '#client/src/lib/state-labels.ts';
import { Button } from '#client/src/ui/button.tsx';
import { StateTag } from '#client/src/ui/state-tag.tsx';
import { takenClaim } from './proof-words.ts';
import { useLiveView, useResumeRun, type LiveView } from './run-api.ts';
import { isUnderWay, paceOf } from './view-progress.ts';

interface RunHeadProps {
  readonly run: Run;
  readonly progress: ViewProgress | null;
  readonly mayStop: boolean;
  readonly isStopping: boolean;
  readonly onStop: () => void;
  readonly actions: ReactNode;
}

function queueWords(position: QueuePosition | null): string {
  if (position === null) return 'Waiting for a free worker';
  if (position.workers === 0) return 'Waiting: no worker is running';
  if (position.ahead === 0) return 'Waiting for a free worker, next in the queue';
  return `Waiting, ${formatWhole(position.ahead)} ahead in the queue`;
}

/** A search by bounds: of the whole space, what is settled, and what is still to be looked into. */
function searchWords({ evaluated, sectionCount }: ViewProgress, search: SearchProgress): string {
  const settled = (evaluated + search.provenUnnecessary) / sectionCount;
  // Down: not 100 % while groups are open.
  const percent = Math.floor(settled * 10_000) / 100;
  return (
    `${formatWhole(evaluated)} evaluated, ${formatNumber(percent, 4)} % of ` +
    `${formatWhole(sectionCount)} settled, ${formatWhole(search.boxesOpen)} groups open`
  );
}

function progressWords(progress: ViewProgress, live: LiveView): string {
  const { perSecond, leftMs } = paceOf(progress, live.perSecond);
  if (progress.search !== null)
    return progress.state === 'running'
      ? searchWords(progress, progress.search)
      : `The search begins again with the front it had. ${queueWords(live.position)}`;
  const done = `${formatWhole(progress.evaluated)} of ${formatWhole(progress.sectionCount)}`;
  if (progress.state === 'queued')
    return progress.evaluated === 0
      ? queueWords(live.position)
      : `${done} evaluated. ${queueWords(live.position)}`;
  if (perSecond === null || leftMs === null) return `${done} evaluated`;
  return `${done} evaluated, ${formatNumber(perSecond / 1e6, 2)} million a second, ${formatDuration(leftMs)} left`;
}

function stateWords(progress: ViewProgress): string | null {
  if (progress.state === 'cancelled')
    return progress.search === null
      ? `cancelled: ${formatWhole(progress.evaluated)} of ${formatWhole(progress.sectionCount)} evaluated`
      : `cancelled: ${formatWhole(progress.evaluated)} evaluated, the front is not proven`;
  if (progress.state === 'failed') return progress.message ?? 'The run broke off.';
  return null;
}

/** Stopped half-way by the engine that is still in use: what it has done is kept, and the rest can follow. */
const isResumable = ({ state, engineVersion }: Run): boolean =>
  (state === 'cancelled' || state === 'failed') && engineVersion === ENGINE_VERSION;

/** What is run, how far it is, and the ways to stop it and to take it up again. The rule below fills with the share that is done. */
export function RunHead({ run, progress, mayStop, isStopping, onStop, actions }: RunHeadProps) {
  const live = useLiveView(run.id, progress?.viewId ?? '');
  const resume = useResumeRun(run.id);
  const state = progress?.state ?? run.state;
  const isLive = isUnderWay(state);
  const share = progress === null || !isLive ? 0 : paceOf(progress).share;
  const words = progress === null ? null : isLive ? progressWords(progress, live) : stateWords(progress);
  return (
    <header className="relative border-b border-rule">
      <div className="flex min-h-13 flex-wrap items-center gap-x-5 gap-y-1 px-4 py-2 sm:px-5">
        <h1 className="text-lg font-semibold">
          {run.beam.mark}
          {run.beam.location !== '' && <span className="font-normal text-muted"> {run.beam.location}</span>}
        </h1>
        <p className="min-w-0 truncate text-muted">
          {run.sweepName}, run {run.number}
          {run.taken !== null && `, ${takenClaim(run)}`}
        </p>
        <StateTag {...runStateLabel(state)} />
        <p className="num min-w-0 text-sm text-muted" role="status">
          {words}
        </p>
        <div className="ml-auto flex flex-wrap items-center justify-end gap-3">
          {isLive && mayStop && (
            <Button onClick={onStop} isBusy={isStopping}>
              Cancel
            </Button>
          )}
          {isResumable(run) && mayStop && (
            <Button onClick={() => resume.mutate()} isBusy={resume.isPending}>
              Resume
            </Button>
          )}
          {actions}
        </div>
      </div>
      {isLive && (
        <div
          role="progressbar"
          aria-label="Sections evaluated"
          aria-valuemin={0}
          aria-valuemax={100}
          aria-valuenow={Math.round(share * 100)}
          className="absolute inset-x-0 -bottom-px h-[3px]"
        >
          <div className="h-full bg-steel-solid" style={{ width: `${share * 100}%` }} />
        </div>
      )}
    </header>
  );
}
