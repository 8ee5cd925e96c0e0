import { useEffect, useState } from 'react';
import { countCannotFit } from '#shared/sweep/cannot-fit.ts';
import type { SweepProblem } from '#shared/sweep/problem.ts';

/** Long enough that a number being typed is not counted digit by digit. */
const PAUSE_MS = 250;
/** Safari has no idle callback; the next turn of the event loop does instead. */
const whenIdle = (work: () => void): (() => void) => {
  if (typeof requestIdleCallback === 'function') {
    const handle = requestIdleCallback(work, { timeout: 500 });
    return () => cancelIdleCallback(handle);
  }
  const handle = setTimeout(work);
  return () => clearTimeout(handle);
};

/** How many sections cannot be placed, counted in idle time after a pause in typing; null until then. */
export function useCannotFit(problem: SweepProblem | null): number | null {
  const [counted, setCounted] = useState<{ readonly problem: SweepProblem; readonly count: number } | null>(
    null,
  );
  useEffect(() => {
    if (problem === null) return;
    let stopIdle = () => {};
    const pause = setTimeout(() => {
      stopIdle = whenIdle(() => setCounted({ problem, count: countCannotFit(problem) }));
    }, PAUSE_MS);
    return () => {
      clearTimeout(pause);
      stopIdle();
    };
  }, [problem]);
  return problem !== null && counted?.problem === problem ? counted.count : null;
}
