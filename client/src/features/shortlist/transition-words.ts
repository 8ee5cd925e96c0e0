import type { CandidateState } from '#shared/contract/records.ts';

interface TransitionWords {
  readonly action: string;
  /** What it means, one line. */
  readonly meaning: string;
  readonly isNoteNeeded: boolean;
}

const TO: Readonly<Record<CandidateState, TransitionWords>> = {
  proposed: {
    action: 'Propose again',
    meaning: 'It goes back to the checker.',
    isNoteNeeded: false,
  },
  checked: {
    action: 'Mark as checked',
    meaning: 'You went through its calculation line by line.',
    isNoteNeeded: false,
  },
  approved: {
    action: 'Approve',
    meaning: 'The office stands behind this section for this beam.',
    isNoteNeeded: false,
  },
  returned: {
    action: 'Return',
    meaning: 'It goes back to its author with your reason.',
    isNoteNeeded: true,
  },
  superseded: {
    action: 'Withdraw',
    meaning: 'It stays on record as superseded and cannot come back.',
    isNoteNeeded: false,
  },
};

export const transitionWords = (to: CandidateState): TransitionWords => TO[to];
