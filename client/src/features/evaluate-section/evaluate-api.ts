import { useMutation } from '@tanstack/react-query';
import type { EvaluateInput } from '#shared/contract/records.ts';
import { call } from '#client/src/lib/api.ts';
import { sessionDraft } from '#client/src/lib/session-draft.ts';
import type { SectionFormValues } from './section-form-values.ts';

export const useEvaluate = (projectId: string) =>
  useMutation({
    mutationFn: (body: EvaluateInput) => call('evaluate', { params: { id: projectId }, body }),
  });

export const sectionDraft = sessionDraft<SectionFormValues>('section 2');
