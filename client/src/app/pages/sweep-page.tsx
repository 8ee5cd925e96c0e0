import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import { useLocation, useNavigate, useParams } from 'react-router-dom';
import type { Beam, Sweep } from '#shared/contract/records.ts';
import type { SweepInput } from '#client/src/features/sweep-form/read-sweep-form.ts';
import { sweepDraft } from '#client/src/features/sweep-form/sweep-draft.ts';
import type { OfficePreset } from '#client/src/features/sweep-form/office-preset.ts';
import { firstSweepForm, sweepForm } from '#client/src/features/sweep-form/sweep-form-defaults.ts';
import { SweepForm } from '#client/src/features/sweep-form/sweep-form.tsx';
import { useSaveSweep } from '#client/src/features/sweep-form/sweep-api.ts';
import { ViewLinks } from '#client/src/features/saved-views/view-links.tsx';
import { RunningLoadNote } from '#client/src/features/running-load/running-load-note.tsx';
import { useStartRun } from '#client/src/features/sweeps/api.ts';
import { RunTable } from '#client/src/features/sweeps/run-table.tsx';
import { paths } from '#client/src/lib/paths.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';
import { useProject } from '#client/src/lib/project-context.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { Button, ButtonLink } from '#client/src/ui/button.tsx';
import { ErrorState } from '#client/src/ui/error-state.tsx';
import { PageBody } from '#client/src/ui/page-body.tsx';
import { PageCrumbs } from '#client/src/ui/page-crumbs.tsx';
import { PageHeader } from '#client/src/ui/page-header.tsx';
import { Skeleton } from '#client/src/ui/skeleton.tsx';
import { notify } from '#client/src/ui/toast.tsx';
import { useSweepSource, type CopySource } from '../use-sweep-source.ts';

interface EditorProps {
  readonly beam: Beam;
  /** The sweep being changed; null for a new one. */
  readonly sweep: Sweep | null;
  /** The sweep a new one is copied from. */
  readonly copyOf: CopySource | null;
  /** Null for who fills no form, and while the standards cannot be had. */
  readonly presets: readonly OfficePreset[] | null;
}

/** The form with its draft: what was typed and not saved is there again after a reload or a way back. */
function SweepEditor({ beam, sweep, copyOf, presets }: EditorProps) {
  const project = useProject();
  const mayRun = useMay('run-sweeps');
  const navigate = useNavigate();
  const runSearch = searchCarriedBy(useLocation().state);
  const client = useQueryClient();
  const { units } = project.designBasis;
  const draftId = sweep?.id ?? `${beam.id} ${copyOf?.id ?? ''}`;
  const stored = () => {
    if (sweep !== null) return sweepForm(sweep, units);
    if (copyOf === null) return firstSweepForm(project, beam, presets?.[0] ?? null);
    return { ...sweepForm(copyOf, units), name: copyOf.copyName.slice(0, LONGEST_NAME) };
  };
  const [start, setStart] = useState(() => {
    const draft = sweepDraft.read(draftId);
    return { form: draft ?? stored(), isDraft: draft !== null, edition: 0 };
  });
  const save = useSaveSweep(project.id);
  const run = useStartRun(project.id);

  const saved = async (input: SweepInput) => {
    const goal =
      sweep === null
        ? ({ kind: 'new', beamId: beam.id } as const)
        : ({ kind: 'change', sweepId: sweep.id } as const);
    const answer = await save.mutateAsync({ goal, input });
    sweepDraft.drop(draftId);
    return answer;
  };
  const onSave = (input: SweepInput) =>
    void saved(input).then((answer) => {
      notify.done(`${answer.name} is saved`);
      setStart((now) => ({ ...now, isDraft: false }));
      if (sweep === null) void navigate(paths.sweep(project.id, answer.id), { replace: true });
    }, ignoreHere);
  const onRun = (input: SweepInput) =>
    void saved(input)
      .then((answer) => run.mutateAsync(answer.id))
      .then((started) => {
        client.setQueryData(queryKeys.run(started.id), started);
        void client.invalidateQueries({ queryKey: queryKeys.sweep(started.sweepId) });
        return navigate(paths.run(project.id, started.id) + runSearch);
      })
      .catch(ignoreHere);

  return (
    <>
      {start.isDraft && (
        <p className="mb-5 flex flex-wrap items-baseline gap-3 border-l-2 border-near-mark py-1 pl-3 text-sm">
          Your unsaved changes of earlier are shown.
          <Button
            look="text"
            onClick={() => {
              sweepDraft.drop(draftId);
              setStart((now) => ({ form: stored(), isDraft: false, edition: now.edition + 1 }));
            }}
          >
            Discard them
          </Button>
        </p>
      )}
      <SweepForm
        key={start.edition}
        project={project}
        initial={start.form}
        runs={sweep?.runs ?? []}
        presets={presets}
        isBusy={save.isPending || run.isPending}
        refusal={save.error ?? run.error}
        mayRun={mayRun}
        onEdit={(form) => sweepDraft.write(draftId, form)}
        onSave={onSave}
        onRun={onRun}
        secondary={mayRun && <RunningLoadNote />}
      />
      {sweep !== null && sweep.runs.length > 0 && (
        <section className="mt-4 border-t border-ink pt-2">
          <h2 className="pb-2 text-sm font-semibold">Runs of this sweep</h2>
          <RunTable projectId={project.id} sweepName={sweep.name} runs={sweep.runs} />
          <ViewLinks projectId={project.id} sweepId={sweep.id} />
        </section>
      )}
    </>
  );
}

/** Ranges, columns and band of the run one came from, for the run that follows. */
function searchCarriedBy(state: unknown): string {
  const isCarried = typeof state === 'object' && state !== null && 'runSearch' in state;
  return isCarried && typeof state.runSearch === 'string' ? state.runSearch : '';
}

/** As the contract takes it. */
const LONGEST_NAME = 120;

/** The page a run opens on, fetched while its sweep is being typed. */
const preloadRunPage = (): void => void import('./run-page.tsx');

/** A refusal is shown by the form itself, from the mutation's state. */
const ignoreHere = (): void => undefined;

/** A new sweep on a beam, or a saved one. */
export function SweepPage() {
  const project = useProject();
  const mayRun = useMay('run-sweeps');
  useEffect(preloadRunPage, []);
  const { sweepId } = useParams();
  const { beam, sweep, copyOf, presets, isPending, error, retry } = useSweepSource();
  const name = sweepId === undefined ? 'New sweep' : (sweep?.name ?? 'Sweep');
  return (
    <PageBody>
      <PageCrumbs
        crumbs={[
          { label: project.name, to: paths.project(project.id) },
          { label: beam?.mark ?? 'Beam', to: paths.project(project.id, 'beams') },
          { label: name },
        ]}
      />
      <PageHeader
        title={name}
        lead={
          beam === undefined ? ' ' : `Beam ${beam.mark}${beam.location === '' ? '' : `, ${beam.location}`}`
        }
        actions={
          sweepId !== undefined && beam !== undefined && mayRun ? (
            <ButtonLink to={`${paths.newSweep(project.id, beam.id)}?from=${sweepId}`}>Duplicate</ButtonLink>
          ) : undefined
        }
      />
      {error !== null ? (
        <ErrorState error={error} title="The sweep could not be loaded" onRetry={retry} />
      ) : isPending ? (
        <Skeleton lines={12} />
      ) : beam === undefined ? (
        <ErrorState
          error={new Error('This beam is not in the project, or no longer.')}
          title="No such beam"
        />
      ) : (
        <SweepEditor
          key={`${beam.id} ${sweepId ?? copyOf?.id ?? ''}`}
          beam={beam}
          sweep={sweep}
          copyOf={copyOf}
          presets={presets}
        />
      )}
    </PageBody>
  );
}
