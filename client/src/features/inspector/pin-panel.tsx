import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { PinInput } from '#shared/contract/records.ts';
import { messageOf } from '#client/src/lib/api-error.ts';
import { paths } from '#client/src/lib/paths.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { Button } from '#client/src/ui/button.tsx';
import { FormError } from '#client/src/ui/form-error.tsx';
import { TextAreaField } from '#client/src/ui/text-field.tsx';
import { notify } from '#client/src/ui/toast.tsx';
import { usePinCandidate } from './pin-api.ts';

interface PinPanelProps {
  readonly projectId: string;
  readonly beamId: string;
  readonly beamMark: string;
  readonly source: PinInput['source'];
  /** The candidate this section already is. */
  readonly pinned: { readonly id: string; readonly label: string } | null;
}

/** Puts the section on the beam's shortlist, with a word why. */
export function PinPanel({ projectId, beamId, beamMark, source, pinned }: PinPanelProps) {
  const mayPin = useMay('pin');
  const pin = usePinCandidate(projectId);
  const [note, setNote] = useState('');
  const [isOpen, setOpen] = useState(false);

  if (pinned !== null)
    return (
      <p className="border-l-2 border-steel pl-3">
        On the shortlist as{' '}
        <Link to={paths.candidate(projectId, pinned.id)} className="font-semibold underline">
          candidate {pinned.label}
        </Link>
      </p>
    );
  if (!mayPin) return null;

  const send = () =>
    pin.mutate(
      { beamId, source, note },
      {
        onSuccess: (candidate) => {
          setOpen(false);
          setNote('');
          notify.done(`Pinned to ${beamMark} as candidate ${candidate.label}`);
        },
      },
    );
  if (!isOpen)
    return (
      <div>
        <Button look="solid" onClick={() => setOpen(true)}>
          Pin to shortlist
        </Button>
      </div>
    );
  return (
    <form
      className="grid gap-3 border-l-2 border-steel pl-3"
      onSubmit={(event) => {
        event.preventDefault();
        send();
      }}
    >
      <TextAreaField
        label={`Why this one, for ${beamMark}`}
        hint="Goes with the pin; may stay empty."
        rows={2}
        maxLength={2000}
        value={note}
        onChange={(event) => setNote(event.target.value)}
        // The button that opened the form is gone; typing goes on where it stood.
        autoFocus
      />
      <FormError message={pin.error === null ? null : messageOf(pin.error)} />
      <div className="flex gap-3">
        <Button look="solid" type="submit" isBusy={pin.isPending}>
          Pin
        </Button>
        <Button onClick={() => setOpen(false)}>Cancel</Button>
      </div>
    </form>
  );
}
