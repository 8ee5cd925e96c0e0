import type { Candidate, CandidateState } from '../contract/records.ts';
import type { Signature } from './sheet.ts';

/**
 * Who stands behind the sheet. A check or an approval is on it as long as the candidate has not been returned since;
 * where nobody signed yet there is a line to sign on.
 */
export function signaturesOf({ author, createdAt, transitions, state }: Candidate): Signature[] {
  const standing = (to: CandidateState, states: readonly CandidateState[]) => {
    const last = states.includes(state)
      ? transitions.findLast((transition) => transition.to === to)
      : undefined;
    return { name: last?.by.name ?? '', date: last?.createdAt.slice(0, 10) ?? '' };
  };
  return [
    { role: 'Prepared', name: author.name, date: createdAt.slice(0, 10) },
    { role: 'Checked', ...standing('checked', ['checked', 'approved']) },
    { role: 'Approved', ...standing('approved', ['approved']) },
    { role: 'Licensed engineer', name: '', date: '' },
  ];
}
