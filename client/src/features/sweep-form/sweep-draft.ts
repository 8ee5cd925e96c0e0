import { sessionDraft } from '#client/src/lib/session-draft.ts';
import type { SweepFormValues } from './sweep-form-values.ts';

export const sweepDraft = sessionDraft<SweepFormValues>('sweep 3');
