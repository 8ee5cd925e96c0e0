import { useState } from 'react';
import type { Candidate, CandidateState } from '#shared/contract/records.ts';
import { ApiError, messageOf } from '#client/src/lib/api-error.ts';
import { formatDate } from '#shared/print/format-quantity.ts';
import { candidateStateLabel, roleLabel } from '#client/src/lib/state-labels.ts';
import { Button } from '#client/src/ui/button.tsx';
import { Dialog } from '#client/src/ui/dialog.tsx';
import { FormError } from '#client/src/ui/form-error.tsx';
import { StateTag } from '#client/src/ui/state-tag.tsx';
import { TextAreaField } from '#client/src/ui/text-field.tsx';
import { useMoveCandidate } from './api.ts';
import { transitionWords } from './transition-words.ts';

/** Where a candidate stands, how it came there, and where the reader may move it. */
export function StatePanel({ candidate }: { readonly candidate: Candidate }) {
  const [goal, setGoal] = useState<CandidateState | null>(null);
  return (
    <section aria-label="State">
      <h2 className="mb-2 font-semibold">State</h2>
      <p className="text-lg">
        <StateTag {...candidateStateLabel(candidate.state)} />
      </p>
      {candidate.allowedTransitions.length > 0 && (
        <div className="mt-3 flex flex-wrap gap-2">
          {candidate.allowedTransitions.map((to) => (
            <Button
              key={to}
              look={to === 'approved' || to === 'checked' ? 'solid' : 'line'}
              onClick={() => setGoal(to)}
            >
              {transitionWords(to).action}
            </Button>
          ))}
        </div>
      )}
      <ol className="mt-4 grid gap-2">
        {candidate.transitions.map((transition) => (
          <li key={transition.id} className="border-t border-rule pt-2 text-sm">
            <span className="flex flex-wrap items-baseline justify-between gap-x-3">
              <StateTag {...candidateStateLabel(transition.to)} />
              <time dateTime={transition.createdAt} className="text-xs text-muted">
                {formatDate(transition.createdAt, true)}
              </time>
            </span>
            <span className="text-muted">
              {transition.by.name}, {roleLabel(transition.by.role).toLowerCase()}
            </span>
            {hasOwnNote(transition, candidate) && (
              <p className="mt-1 whitespace-pre-wrap">{transition.note}</p>
            )}
          </li>
        ))}
      </ol>
      {goal !== null && <MoveDialog candidate={candidate} to={goal} onClose={() => setGoal(null)} />}
    </section>
  );
}

/** The note of the pin stands at the head of the page already. */
const hasOwnNote = ({ note, from }: Candidate['transitions'][number], candidate: Candidate): boolean =>
  note !== '' && (from !== null || note !== candidate.note);

interface MoveDialogProps {
  readonly candidate: Candidate;
  readonly to: CandidateState;
  readonly onClose: () => void;
}

function MoveDialog({ candidate, to, onClose }: MoveDialogProps) {
  const move = useMoveCandidate(candidate.id);
  const words = transitionWords(to);
  const [note, setNote] = useState('');
  const [isNoteMissing, setNoteMissing] = useState(false);
  const noteIssue =
    move.error instanceof ApiError ? move.error.issues.find((issue) => issue.path[0] === 'note') : undefined;
  const submit = () => {
    const isMissing = words.isNoteNeeded && note.trim() === '';
    setNoteMissing(isMissing);
    if (!isMissing) move.mutate({ to, note }, { onSuccess: onClose });
  };
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title={`${words.action}: candidate ${candidate.label}`}
      description={words.meaning}
      isSticky={note !== ''}
    >
      <form
        noValidate
        className="grid gap-4"
        onSubmit={(event) => {
          event.preventDefault();
          submit();
        }}
      >
        <TextAreaField
          label={words.isNoteNeeded ? 'Reason' : 'Note, if any'}
          value={note}
          autoFocus
          onChange={(event) => setNote(event.target.value)}
          error={isNoteMissing ? 'Say what has to change' : noteIssue?.message}
        />
        <FormError message={move.isError && noteIssue === undefined ? messageOf(move.error) : null} />
        <div className="flex flex-wrap gap-3">
          <Button look="solid" type="submit" isBusy={move.isPending}>
            {words.action}
          </Button>
          <Button onClick={onClose}>Cancel</Button>
        </div>
      </form>
    </Dialog>
  );
}
