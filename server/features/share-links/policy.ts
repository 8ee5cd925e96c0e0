import type { CandidateState, Role } from '#shared/contract/records.ts';

/** Whoever may share may also see and end the links: they open the shortlist to anybody. */
export const SHARE: readonly Role[] = ['admin', 'engineer'];

/** What the office stands by. A returned or superseded candidate is no business of those outside. */
export const isShared = (state: CandidateState): boolean => state !== 'returned' && state !== 'superseded';
