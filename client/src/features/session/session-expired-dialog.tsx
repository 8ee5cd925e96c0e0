import { useSyncExternalStore } from 'react';
import { useReader } from '#client/src/lib/reader-context.ts';
import { signInGate } from '#client/src/lib/sign-in-gate.ts';
import { Button } from '#client/src/ui/button.tsx';
import { Dialog } from '#client/src/ui/dialog.tsx';
import { SignInForm } from './sign-in-form.tsx';

/** Lies over whatever page a call found its session expired on; the page below keeps everything typed into it. */
export function SessionExpiredDialog() {
  const reader = useReader();
  const isWaiting = useSyncExternalStore(signInGate.subscribe, signInGate.isWaiting);
  return (
    <Dialog
      isOpen={isWaiting}
      onClose={() => signInGate.settle(false)}
      title="Your session has ended"
      description="Sign in to go on where you were. What you typed on this page is kept."
      isSticky
    >
      <SignInForm initialEmail={reader.email} onSignedIn={() => signInGate.settle(true)} />
      <p className="mt-3 text-sm">
        <Button look="text" onClick={() => signInGate.settle(false)}>
          Not now
        </Button>
      </p>
    </Dialog>
  );
}
