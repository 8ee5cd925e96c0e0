import { useQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { EvaluateInput, Run } from '#shared/contract/records.ts';
import type { EvaluationContext } from '#shared/engine/evaluate.ts';
import { expandSpace, sectionAt } from '#shared/sweep/space.ts';
import { drawingExports } from '#client/src/drawing/drawing-exports.ts';
import { beamsQuery } from '#client/src/features/beams/api.ts';
import { sectionDraft, useEvaluate } from '#client/src/features/evaluate-section/evaluate-api.ts';
import { SectionForm } from '#client/src/features/evaluate-section/section-form.tsx';
import {
  firstSectionForm,
  sectionForm,
  type SectionFormValues,
} from '#client/src/features/evaluate-section/section-form-values.ts';
import { Inspector } from '#client/src/features/inspector/inspector.tsx';
import { PinPanel } from '#client/src/features/inspector/pin-panel.tsx';
import { runQuery } from '#client/src/features/run/run-api.ts';
import { paths } from '#client/src/lib/paths.ts';
import { useProject } from '#client/src/lib/project-context.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { EmptyState } from '#client/src/ui/empty-state.tsx';
import { ExportMenu } from '#client/src/ui/export-menu.tsx';
import { PageBody } from '#client/src/ui/page-body.tsx';
import { PageCrumbs } from '#client/src/ui/page-crumbs.tsx';
import { PageHeader } from '#client/src/ui/page-header.tsx';
import { SelectField } from '#client/src/ui/select-field.tsx';
import { Skeleton } from '#client/src/ui/skeleton.tsx';
import { LoadFailure } from '../load-failure.tsx';

/** Choosing the beam a typed section is for, then pinning it there. */
function PinToBeam({
  projectId,
  section,
}: {
  readonly projectId: string;
  readonly section: EvaluateInput['section'];
}) {
  const mayPin = useMay('pin');
  const beams = useQuery(beamsQuery(projectId));
  const [chosen, setChosen] = useState('');
  if (!mayPin || beams.data === undefined || beams.data.length === 0) return null;
  const beam = beams.data.find((one) => one.id === chosen) ?? beams.data[0]!;
  return (
    <div className="grid gap-3">
      <SelectField
        className="max-w-60"
        label="Beam"
        hint="A pin is judged anew on the project’s basis and the beam’s own demand."
        options={beams.data.map((one) => ({ value: one.id, label: `${one.mark} ${one.location}`.trim() }))}
        value={beam.id}
        onChange={(event) => setChosen(event.target.value)}
      />
      <PinPanel
        projectId={projectId}
        beamId={beam.id}
        beamMark={beam.mark}
        source={{ kind: 'section', section }}
        pinned={null}
      />
    </div>
  );
}

/** What the service judged the section by: the project's basis and rates, with what the form overrides. */
function contextOf(
  { designBasis, priceBook }: ReturnType<typeof useProject>,
  { basis, demand, rules }: EvaluateInput,
): EvaluationContext {
  return { basis: { ...designBasis, ...basis, rates: priceBook }, demand, rules };
}

function SectionEditor({
  initial,
  draftId,
}: {
  readonly initial: SectionFormValues;
  readonly draftId: string;
}) {
  const project = useProject();
  const { units, barStandard } = project.designBasis;
  const evaluate = useEvaluate(project.id);
  const [start] = useState(() => sectionDraft.read(draftId) ?? initial);
  const answer = evaluate.data;
  const asked = evaluate.variables;
  const context = useMemo(
    () => (asked === undefined ? undefined : contextOf(project, asked)),
    [project, asked],
  );
  return (
    <div className="grid items-start gap-x-12 gap-y-8 xl:grid-cols-[27rem_minmax(0,1fr)]">
      <SectionForm
        project={project}
        initial={start}
        isBusy={evaluate.isPending}
        refusal={evaluate.error}
        onEdit={(form) => sectionDraft.write(draftId, form)}
        onEvaluate={(input) => evaluate.mutate(input)}
      />
      <div className="border-t border-ink pt-4" aria-live="polite">
        {answer === undefined ? (
          <EmptyState title="No section evaluated yet">
            Type a section and press Enter: its drawing, checks and working appear here. Plain layers take
            areas and depths as printed in a worked example.
          </EmptyState>
        ) : (
          <Inspector
            section={answer.section}
            evaluation={answer.evaluation}
            standard={barStandard}
            units={units}
            context={context}
            areWorkingLinesOpen
            actions={
              <div className="grid gap-3">
                <PinToBeam projectId={project.id} section={answer.section} />
                <p className="text-sm">
                  <ExportMenu
                    look="text"
                    words="Drawing as a file"
                    groups={[
                      drawingExports({
                        section: answer.section,
                        evaluation: answer.evaluation,
                        standard: barStandard,
                        units,
                        source: [project.number, 'section by hand'],
                      }),
                    ]}
                  />
                </p>
              </div>
            }
          />
        )}
      </div>
    </div>
  );
}

/** The chosen section of a run as a form, or null where the number is not one of its sections. */
function formOf(run: Run, index: number, project: ReturnType<typeof useProject>): SectionFormValues | null {
  const { space, demand, rules } = run.definition;
  const expanded = expandSpace(space, run.basis.barStandard);
  if (!Number.isInteger(index) || index < 0 || index >= expanded.size) return null;
  const section = sectionAt(expanded, index);
  return sectionForm({ section, demand, maxLayers: rules.maxLayers }, project.designBasis);
}

/** One section typed by hand, from nothing or from a run, through the same engine. */
export function SectionPage() {
  const project = useProject();
  const [params] = useSearchParams();
  const runId = params.get('run');
  const index = Number(params.get('i') ?? Number.NaN);
  const run = useQuery({ ...runQuery(runId ?? ''), enabled: runId !== null });
  if (run.isError) return <LoadFailure error={run.error} what="run" onRetry={() => void run.refetch()} />;
  const source = run.data;
  const given = source === undefined ? null : formOf(source, index, project);
  return (
    <PageBody>
      <PageCrumbs
        crumbs={[
          { label: project.name, to: paths.project(project.id) },
          ...(source === undefined
            ? []
            : [
                {
                  label: `${source.beam.mark} run ${source.number}`,
                  to: `${paths.run(project.id, source.id)}?i=${index}`,
                },
              ]),
          { label: 'Section by hand' },
        ]}
      />
      <PageHeader
        title="Section by hand"
        lead="One section, judged on the project’s design basis with the same engine."
      />
      {runId !== null && source === undefined ? (
        <Skeleton lines={10} />
      ) : (
        <SectionEditor
          key={`${runId ?? ''} ${index}`}
          initial={given ?? firstSectionForm(project.designBasis)}
          draftId={`${project.id} ${runId ?? ''} ${index}`}
        />
      )}
    </PageBody>
  );
}
