import { useCallback, useEffect, useRef, useState } from 'react';
import type { Run } from '#shared/contract/records.ts';
import { ENGINE_VERSION } from '#shared/engine/version.ts';
import { whenIdle } from '#client/src/lib/when-idle.ts';
import type { Cut, CutQuery, PickQuery } from './cut.ts';
import type { FeasibleAnswer } from './feasible-worker.ts';
import { FeasibleDesk, type FeasibleThread } from './feasible-desk.ts';

/** Judged anew in a second or two by one thread; larger runs are explored by what they stored. */
const MOST_SECTIONS = 6_000_000;
/** Some 140 MB of columns. */
const MOST_FEASIBLE = 1_500_000;
const LONGEST_WAIT_MS = 1500;

export type FeasibleState =
  /** Not asked for yet, or being judged. */
  | 'coming'
  /** Every question is answered from every section. */
  | 'here'
  /** Too large for a browser, not finished, or of another edition of the engine: only what the run stored is at hand. */
  | 'stored-only';

export interface Feasible {
  readonly state: FeasibleState;
  readonly cut: { readonly of: CutQuery; readonly cut: Cut } | null;
  readonly pick: (query: PickQuery) => Promise<number | null>;
}

function startThread(onBroken: () => void): FeasibleThread {
  const worker = new Worker(new URL('./feasible-worker.ts', import.meta.url), { type: 'module' });
  worker.addEventListener('error', onBroken);
  return {
    postMessage: (request) => worker.postMessage(request),
    terminate: () => worker.terminate(),
    listen: (take) =>
      worker.addEventListener('message', ({ data }: MessageEvent<FeasibleAnswer>) => take(data)),
  };
}

/** What decides whether the browser judges a run's sections anew. */
interface Wanted {
  readonly isFinished: boolean;
  /** Sections the run found to meet every check. */
  readonly feasible: number | null;
}

function isWanted(run: Run, { isFinished, feasible }: Wanted): boolean {
  if (!isFinished || feasible === null || feasible === 0 || feasible > MOST_FEASIBLE) return false;
  return run.sectionCount <= MOST_SECTIONS && run.engineVersion === ENGINE_VERSION;
}

/**
 * The run's feasible sections in a thread of the browser, and the newest answer to the newest question. Where they do not
 * come out as many as the run counted they are not used: nothing but the run's own result is shown then.
 */
export function useFeasible(run: Run, wanted: Wanted, query: CutQuery): Feasible {
  const isCalledFor = isWanted(run, wanted);
  const [state, setState] = useState<FeasibleState>('coming');
  const [cut, setCut] = useState<Feasible['cut']>(null);
  const desk = useRef<FeasibleDesk | null>(null);
  const newest = useRef(query);
  const { feasible } = wanted;

  useEffect(() => {
    if (!isCalledFor) return;
    const giveUp = () => setState('stored-only');
    const begin = () => {
      const opened = new FeasibleDesk(startThread(giveUp), {
        onOpened: (count) => setState(count === feasible ? 'here' : 'stored-only'),
        onTooMany: giveUp,
        onCut: (answer, of) => setCut({ of, cut: answer }),
      });
      const { space, demand, rules, view } = run.definition;
      const problem = { space, demand, rules, basis: run.basis };
      opened.open({
        kind: 'open',
        problem,
        view,
        standard: run.basis.barStandard,
        mostFeasible: MOST_FEASIBLE,
      });
      opened.cut(newest.current);
      desk.current = opened;
    };
    const callOff = whenIdle(begin, LONGEST_WAIT_MS);
    return () => {
      callOff();
      desk.current?.close();
      desk.current = null;
    };
  }, [run.id, run.definition, run.basis, isCalledFor, feasible]);

  useEffect(() => {
    newest.current = query;
    desk.current?.cut(query);
  }, [query]);

  const pick = useCallback((asked: PickQuery) => desk.current?.pick(asked) ?? Promise.resolve(null), []);
  const shown = isCalledFor ? state : wanted.isFinished ? 'stored-only' : 'coming';
  return { state: shown, cut: shown === 'here' ? cut : null, pick };
}
