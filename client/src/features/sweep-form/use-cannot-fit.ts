import { useEffect, useState } from 'react';
import { countCannotFit } from '#shared/sweep/cannot-fit.ts';
import type { SweepProblem } from '#shared/sweep/problem.ts';
import { whenIdle } from '#client/src/lib/when-idle.ts';

/** Long enough that a number being typed is not counted digit by digit. */
const PAUSE_MS = 250;
/** Counting is not put off for longer, however busy the page is. */
const LONGEST_WAIT_MS = 500;

/** How many sections cannot be placed, counted in idle time after a pause in typing; null until then. */
export function useCannotFit(problem: SweepProblem | null): number | null {
  const [counted, setCounted] = useState<{ readonly problem: SweepProblem; readonly count: number } | null>(
    null,
  );
  useEffect(() => {
    if (problem === null) return;
    let stopIdle = () => {};
    const pause = setTimeout(() => {
      stopIdle = whenIdle(() => setCounted({ problem, count: countCannotFit(problem) }), LONGEST_WAIT_MS);
    }, PAUSE_MS);
    return () => {
      clearTimeout(pause);
      stopIdle();
    };
  }, [problem]);
  return problem !== null && counted?.problem === problem ? counted.count : null;
}
