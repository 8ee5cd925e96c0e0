import { type ReactNode } from 'react';
import { messageOf } from '#client/src/lib/api-error.ts';
import { Button } from './button.tsx';
import { Dialog } from './dialog.tsx';
import { FormError } from './form-error.tsx';

interface ConfirmDialogProps {
  readonly isOpen: boolean;
  readonly onClose: () => void;
  readonly onConfirm: () => void;
  readonly title: string;
  readonly description: ReactNode;
  readonly confirmLabel: string;
  readonly isBusy: boolean;
  readonly error: unknown;
}

/** A second look before something is gone. */
export function ConfirmDialog(props: ConfirmDialogProps) {
  return (
    <Dialog isOpen={props.isOpen} onClose={props.onClose} title={props.title} description={props.description}>
      {props.error != null && <FormError message={messageOf(props.error)} />}
      <div className="mt-4 flex flex-wrap gap-3">
        <Button look="danger" isBusy={props.isBusy} onClick={props.onConfirm}>
          {props.confirmLabel}
        </Button>
        <Button onClick={props.onClose}>Keep it</Button>
      </div>
    </Dialog>
  );
}
