import { interruptPrograms } from './run-program.mjs';

const PARENT_CHECK_MS = 500;

/**
 * A person or the system asking this process to stop: Ctrl-C, TERM, a closed terminal, or the death of the npm that
 * started it (a TERM to npm alone does not always reach us). The first request counts; later ones change nothing.
 */
export function createStopRequest() {
  let isMade = false;
  /** @type {Array<() => void>} */
  const listeners = [];
  const make = () => {
    if (isMade) return;
    isMade = true;
    interruptPrograms();
    for (const listener of listeners) listener();
  };
  for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) process.on(signal, make);
  if (process.env.npm_lifecycle_event !== undefined) {
    const parent = process.ppid;
    setInterval(() => process.ppid !== parent && make(), PARENT_CHECK_MS).unref();
  }
  return {
    isMade: () => isMade,
    throwIfMade: () => {
      if (isMade) throw new Error('Stopped on request');
    },
    /** @param {() => void} listener */
    onMade: (listener) => {
      if (isMade) listener();
      else listeners.push(listener);
    },
  };
}
