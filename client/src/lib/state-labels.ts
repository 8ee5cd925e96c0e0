import type { CandidateState, Role, RunState } from '#shared/contract/records.ts';

/** Marks are drawn as reinforcing bars in section: a ring fills as work advances. */
export type StateMark = 'ring' | 'half' | 'full' | 'struck' | 'dashed' | 'cross';
export type StateTone = 'ink' | 'muted' | 'meets' | 'near' | 'fails' | 'steel';

export interface StateLabel {
  readonly word: string;
  readonly mark: StateMark;
  readonly tone: StateTone;
}

const CANDIDATE: Readonly<Record<CandidateState, StateLabel>> = {
  proposed: { word: 'Proposed', mark: 'ring', tone: 'ink' },
  checked: { word: 'Checked', mark: 'half', tone: 'near' },
  approved: { word: 'Approved', mark: 'full', tone: 'meets' },
  returned: { word: 'Returned', mark: 'struck', tone: 'fails' },
  superseded: { word: 'Superseded', mark: 'dashed', tone: 'muted' },
};

const RUN: Readonly<Record<RunState, StateLabel>> = {
  queued: { word: 'Queued', mark: 'ring', tone: 'muted' },
  running: { word: 'Running', mark: 'half', tone: 'near' },
  finished: { word: 'Finished', mark: 'full', tone: 'meets' },
  cancelled: { word: 'Cancelled', mark: 'struck', tone: 'muted' },
  failed: { word: 'Failed', mark: 'cross', tone: 'fails' },
};

export const candidateStateLabel = (state: CandidateState): StateLabel => CANDIDATE[state];
export const runStateLabel = (state: RunState): StateLabel => RUN[state];

const ROLE: Readonly<Record<Role, string>> = {
  admin: 'Admin',
  engineer: 'Engineer',
  checker: 'Checker',
  estimator: 'Estimator',
  viewer: 'Viewer',
};
export const roleLabel = (role: Role): string => ROLE[role];
