import { useCallback, useEffect, useRef, type ReactNode } from 'react';
import { useBlocker } from 'react-router-dom';
import { Button } from './button.tsx';
import { Dialog } from './dialog.tsx';

export interface UnsavedGuard {
  /** Call after saving, before going elsewhere. */
  readonly release: () => void;
  /** To be rendered with the form. */
  readonly element: ReactNode;
}

/** Asks before an edited form is left, by link, by the back button or by closing the window. */
export function useUnsavedGuard(isDirty: boolean): UnsavedGuard {
  const isReleased = useRef(false);
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) =>
      isDirty && !isReleased.current && currentLocation.pathname !== nextLocation.pathname,
  );
  useEffect(() => {
    if (!isDirty) return;
    isReleased.current = false;
    const ask = (event: BeforeUnloadEvent) => {
      if (!isReleased.current) event.preventDefault();
    };
    window.addEventListener('beforeunload', ask);
    return () => window.removeEventListener('beforeunload', ask);
  }, [isDirty]);

  const release = useCallback(() => {
    isReleased.current = true;
  }, []);
  return {
    release,
    element: (
      <Dialog
        isOpen={blocker.state === 'blocked'}
        onClose={() => blocker.reset?.()}
        title="Leave without saving?"
        description="What you changed on this page has not been saved."
      >
        <div className="flex flex-wrap gap-3">
          <Button look="solid" onClick={() => blocker.reset?.()}>
            Stay
          </Button>
          <Button look="danger" onClick={() => blocker.proceed?.()}>
            Leave and lose the changes
          </Button>
        </div>
      </Dialog>
    ),
  };
}
