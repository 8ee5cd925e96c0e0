import { useQuery } from '@tanstack/react-query';
import { useParams, useSearchParams } from 'react-router-dom';
import type { Sweep } from '#shared/contract/records.ts';
import { officeStandardsQuery } from '#client/src/features/office-standards/api.ts';
import { beamsQuery } from '#client/src/features/beams/api.ts';
import { runQuery } from '#client/src/features/run/run-api.ts';
import { presetsFor } from '#client/src/features/sweep-form/office-preset.ts';
import { sweepQuery } from '#client/src/features/sweep-form/sweep-api.ts';
import { useProject } from '#client/src/lib/project-context.ts';
import { useMay } from '#client/src/lib/reader-context.ts';

/** What a new sweep is copied from: a saved one, or what a run froze. */
export interface CopySource extends Pick<Sweep, 'id' | 'name' | 'definition'> {
  /** Name the copy begins with. */
  readonly copyName: string;
}

function useCopySource(): {
  source: CopySource | null;
  isPending: boolean;
  error: Error | null;
  retry: () => void;
} {
  const [params] = useSearchParams();
  const [fromId, runId] = [params.get('from'), params.get('run')];
  const from = useQuery({ ...sweepQuery(fromId ?? ''), enabled: fromId !== null });
  const run = useQuery({ ...runQuery(runId ?? ''), enabled: fromId === null && runId !== null });
  const asked = fromId !== null ? from : runId !== null ? run : null;
  const source =
    fromId !== null && from.data !== undefined
      ? { ...from.data, copyName: `${from.data.name}, copy` }
      : fromId === null && run.data !== undefined
        ? {
            id: run.data.id,
            name: run.data.sweepName,
            definition: run.data.definition,
            copyName: `${run.data.sweepName}, from run ${run.data.number}`,
          }
        : null;
  return {
    source,
    isPending: asked?.isPending ?? false,
    error: asked?.error ?? null,
    retry: () => void asked?.refetch(),
  };
}

/** Everything the form of a sweep opens with: the sweep or what it is copied from, its beam, the office's presets. */
export function useSweepSource() {
  const project = useProject();
  const mayRun = useMay('run-sweeps');
  const { beamId, sweepId } = useParams();
  const beams = useQuery(beamsQuery(project.id));
  const sweep = useQuery({ ...sweepQuery(sweepId ?? ''), enabled: sweepId !== undefined });
  const copy = useCopySource();
  const standards = useQuery({ ...officeStandardsQuery(), enabled: mayRun });
  const isNew = sweepId === undefined;
  return {
    beam: beams.data?.find((one) => one.id === (beamId ?? sweep.data?.beamId)),
    sweep: isNew ? null : (sweep.data ?? null),
    copyOf: isNew ? copy.source : null,
    // A form is worth having without presets: their failure is not the page's.
    presets: standards.data === undefined ? null : presetsFor(standards.data, project.designBasis),
    isPending:
      beams.isPending || (isNew ? copy.isPending : sweep.isPending) || (mayRun && standards.isPending),
    error: beams.error ?? (isNew ? copy.error : sweep.error),
    retry: () => {
      void beams.refetch();
      if (isNew) copy.retry();
      else void sweep.refetch();
    },
  };
}
