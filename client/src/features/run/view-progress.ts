import type { RunState, ViewEvent, ViewProgress } from '#shared/contract/records.ts';

export const isUnderWay = (state: RunState): boolean => state === 'queued' || state === 'running';

/**
 * Answers and events may overtake each other: of two states of one view the one with the higher sequence is the later. An
 * event comes without the result where that has not changed. Undefined where it would be needed and is not known.
 */
export function newerProgress(known: ViewProgress | undefined, arrived: ViewEvent): ViewProgress | undefined {
  const isOfOther = known?.viewId !== arrived.viewId;
  if (!isOfOther && known.sequence > arrived.sequence) return known;
  const result = arrived.result === undefined && !isOfOther ? known.result : arrived.result;
  return result === undefined ? undefined : { ...arrived, result };
}

/** The pace of the last few seconds of work, from what is told of a view. */
export class PaceWindow {
  readonly #told: Pick<ViewEvent, 'evaluated' | 'elapsedMs'>[] = [];

  /** Answers sections a second; null before there is a stretch to tell it by. */
  add({ evaluated, elapsedMs }: Pick<ViewEvent, 'evaluated' | 'elapsedMs'>): number | null {
    const last = this.#told.at(-1);
    // Less than before: a worker was lost with what it had not handed over yet.
    if (last !== undefined && evaluated < last.evaluated) this.#told.length = 0;
    this.#told.push({ evaluated, elapsedMs });
    while (elapsedMs - (this.#told[1]?.elapsedMs ?? elapsedMs) > WINDOW_MS) this.#told.shift();
    const first = this.#told[0]!;
    const spanMs = elapsedMs - first.elapsedMs;
    return spanMs < LEAST_SPAN_MS ? null : ((evaluated - first.evaluated) / spanMs) * 1000;
  }
}

const WINDOW_MS = 5000;
const LEAST_SPAN_MS = 1000;

export interface Pace {
  readonly share: number;
  /** Sections a second; null before the first part is done. */
  readonly perSecond: number | null;
  readonly leftMs: number | null;
}

/** How far a view is and how long the rest will take at the given pace, or at that of the whole way so far. */
export function paceOf(progress: ViewProgress, recentPerSecond: number | null = null): Pace {
  const { sectionCount, elapsedMs, search } = progress;
  const evaluated = progress.evaluated + (search?.provenUnnecessary ?? 0);
  const share = sectionCount === 0 ? 0 : evaluated / sectionCount;
  // The last boxes hold few sections and take longest: the share of a search says nothing of the time left.
  if (search !== null) return { share, perSecond: null, leftMs: null };
  if (evaluated === 0 || elapsedMs <= 0) return { share, perSecond: null, leftMs: null };
  const perSecond = recentPerSecond ?? (evaluated / elapsedMs) * 1000;
  const leftMs = perSecond > 0 ? ((sectionCount - evaluated) / perSecond) * 1000 : null;
  return { share, perSecond, leftMs };
}
