import type { RunState, ViewProgress } from '#shared/contract/records.ts';

export const isUnderWay = (state: RunState): boolean => state === 'queued' || state === 'running';

/** States a view can no longer leave, except a view that was stopped and is computed again. */
const rank = ({ state }: ViewProgress): number => (state === 'queued' ? 0 : state === 'running' ? 1 : 2);

/**
 * Answers and events may overtake each other. Of two states of one view the one that got further counts; between two
 * equally far, the later arrival.
 */
export function newerProgress(known: ViewProgress | undefined, arrived: ViewProgress): ViewProgress {
  if (known === undefined || known.viewId !== arrived.viewId) return arrived;
  if (rank(arrived) !== rank(known)) return rank(arrived) > rank(known) ? arrived : known;
  return arrived.evaluated >= known.evaluated ? arrived : known;
}

export interface Pace {
  readonly share: number;
  /** Sections a second; null before the first part is done. */
  readonly perSecond: number | null;
  readonly leftMs: number | null;
}

/** How far a view is and how long the rest will take at the pace so far. */
export function paceOf(progress: ViewProgress): Pace {
  const { evaluated, sectionCount, elapsedMs } = progress;
  const share = sectionCount === 0 ? 0 : evaluated / sectionCount;
  if (evaluated === 0 || elapsedMs <= 0) return { share, perSecond: null, leftMs: null };
  const perMs = evaluated / elapsedMs;
  return { share, perSecond: perMs * 1000, leftMs: (sectionCount - evaluated) / perMs };
}
