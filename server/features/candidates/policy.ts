import type { CandidateState, Person, Role } from '#shared/contract/records.ts';

export const PIN: readonly Role[] = ['admin', 'engineer'];
export const COMMENT: readonly Role[] = ['admin', 'engineer', 'checker', 'estimator'];

/** What the policy looks at. */
interface Moved {
  readonly state: CandidateState;
  readonly authorId: string;
}
type Mover = Pick<Person, 'id' | 'role'>;

const PREDECESSORS: Readonly<Record<CandidateState, readonly CandidateState[]>> = {
  proposed: ['returned'],
  checked: ['proposed'],
  approved: ['checked'],
  returned: ['proposed', 'checked'],
  superseded: ['proposed', 'checked', 'approved', 'returned'],
};

export const canFollow = (from: CandidateState, to: CandidateState): boolean =>
  PREDECESSORS[to].includes(from);

/** Why the person may never move this candidate to that state, whatever state it is in now. */
export function findRefusal({ authorId }: Moved, to: CandidateState, mover: Mover): string | undefined {
  const isAuthor = authorId === mover.id;
  const isAdmin = mover.role === 'admin';
  if (to === 'proposed')
    return isAuthor && PIN.includes(mover.role)
      ? undefined
      : 'Only the engineer who pinned it may propose it again';
  if (to === 'superseded')
    return isAdmin || (isAuthor && PIN.includes(mover.role))
      ? undefined
      : 'Only the engineer who pinned it, or an admin, may withdraw it';
  if (isAuthor) return 'You pinned this candidate: someone else has to check and approve it';
  return isAdmin || mover.role === 'checker'
    ? undefined
    : `Your role (${mover.role}) may not check, approve or return candidates`;
}

export function allowedTransitions(candidate: Moved, mover: Mover): CandidateState[] {
  return (Object.keys(PREDECESSORS) as CandidateState[]).filter(
    (to) => canFollow(candidate.state, to) && findRefusal(candidate, to, mover) === undefined,
  );
}

/** While a sheet can still be checked its checker writes own values on it; what was approved stays as it was. */
const OPEN_FOR_CHECKING: readonly CandidateState[] = ['proposed', 'checked'];

export const isOpenForChecking = (state: CandidateState): boolean => OPEN_FOR_CHECKING.includes(state);

/** Why the person may never write own values on this candidate's sheet, whatever state it is in. */
export function findSheetRefusal({ authorId }: Pick<Moved, 'authorId'>, writer: Mover): string | undefined {
  if (authorId === writer.id) return 'You pinned this candidate: someone else has to check it';
  return writer.role === 'checker'
    ? undefined
    : `Your role (${writer.role}) may not write own values on a calculation sheet`;
}
