/**
 * Where a call meets an expired session: it waits here while a person signs in over the page, then goes on. All calls
 * that fail meanwhile wait for the same sign-in.
 */
type Listener = () => void;

let waiting: { promise: Promise<boolean>; settle: (isSignedIn: boolean) => void } | null = null;
const listeners = new Set<Listener>();

const tell = () => listeners.forEach((listener) => listener());

/** Resolves to true after a sign-in, to false when it is given up or no page can ask for it. */
function wait(): Promise<boolean> {
  if (listeners.size === 0) return Promise.resolve(false);
  if (waiting !== null) return waiting.promise;
  let settleNow: (isSignedIn: boolean) => void = () => undefined;
  const promise = new Promise<boolean>((resolve) => (settleNow = resolve));
  waiting = { promise, settle: settleNow };
  tell();
  return promise;
}

function settle(isSignedIn: boolean): void {
  const settled = waiting;
  waiting = null;
  settled?.settle(isSignedIn);
  tell();
}

function subscribe(listener: Listener): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

const isWaiting = (): boolean => waiting !== null;

export const signInGate = { wait, settle, subscribe, isWaiting } as const;
