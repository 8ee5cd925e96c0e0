import { lazy, Suspense, useSyncExternalStore } from 'react';
import { useReader } from '#client/src/lib/reader-context.ts';
import { signInGate } from '#client/src/lib/sign-in-gate.ts';
import { Button } from '#client/src/ui/button.tsx';
import { Dialog } from '#client/src/ui/dialog.tsx';
import { Skeleton } from '#client/src/ui/skeleton.tsx';

/** Fetched when a session ends, which most visits never see. */
const SignInForm = lazy(async () => ({ default: (await import('./sign-in-form.tsx')).SignInForm }));

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
      <Suspense fallback={<Skeleton lines={4} />}>
        <SignInForm initialEmail={reader.email} onSignedIn={() => signInGate.settle(true)} />
      </Suspense>
      <p className="mt-3 text-sm">
        <Button look="text" onClick={() => signInGate.settle(false)}>
          Not now
        </Button>
      </p>
    </Dialog>
  );
}
