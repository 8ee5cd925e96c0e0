import type { AxisCount } from '#shared/sweep/result.ts';

/** One value of an axis on its ruler; all lengths in the ruler's own pixels. */
export interface RulerMark {
  readonly value: number;
  readonly xPx: number;
  /** Height of the feasible share standing on it. */
  readonly heightPx: number;
  /** Height of the part of it that lies within the ranges set. */
  readonly withinPx: number;
  /** Of the sections evaluated with this value, the part that meets every check. */
  readonly share: number;
  readonly feasible: number;
  readonly evaluated: number;
  readonly isLabelled: boolean;
  /** Ticks closer than a few pixels would fill the line black. */
  readonly hasTick: boolean;
}

export interface RulerFrame {
  readonly widthPx: number;
  readonly insetPx: number;
  readonly barPx: number;
  /** Labels closer than this would touch. */
  readonly labelPitchPx: number;
}

/** A bar that stands for at least one section never vanishes. */
const LEAST_BAR_PX = 1.5;

/** Widest bar, and the share of the pitch a bar takes where values lie close. */
const WIDEST_BAR_PX = 5.5;
const BAR_OF_PITCH = 0.8;
const LEAST_TICK_PITCH_PX = 3;

const pitchOf = (count: number, frame: RulerFrame): number =>
  count > 1 ? (frame.widthPx - 2 * frame.insetPx) / (count - 1) : frame.widthPx;

/** Width of the bars standing on a ruler of so many values. */
export const rulerBarPx = (count: number, frame: RulerFrame): number =>
  Math.min(WIDEST_BAR_PX, pitchOf(count, frame) * BAR_OF_PITCH);

/** Every how many values a label is written so that none touch; 1, 2, 5, 10 … as a ruler is divided. */
function labelEvery(count: number, frame: RulerFrame): number {
  const pitch = pitchOf(count, frame);
  for (const every of [1, 2, 4, 5, 10, 20, 25, 50, 100, 200, 500]) {
    if (every * pitch >= frame.labelPitchPx) return every;
  }
  return 1000;
}

/** Lays the values of an axis on a ruler, each with its feasible share relative to the largest. */
export function rulerMarks(
  counts: readonly AxisCount[],
  frame: RulerFrame,
  within: readonly number[] | null = null,
): RulerMark[] {
  const ordered = counts.toSorted((a, b) => a.value - b.value);
  const low = ordered[0]?.value ?? 0;
  const span = (ordered.at(-1)?.value ?? low) - low;
  const shares = ordered.map(({ feasible, evaluated }) => (evaluated === 0 ? 0 : feasible / evaluated));
  const largest = Math.max(...shares, 0);
  const every = labelEvery(ordered.length, frame);
  return ordered.map((count, k) => {
    const share = shares[k]!;
    const heightPx = share === 0 ? 0 : Math.max(LEAST_BAR_PX, (share / largest) * frame.barPx);
    const kept = within === null || count.feasible === 0 ? 1 : within[k]! / count.feasible;
    const along = span === 0 ? 0.5 : (count.value - low) / span;
    return {
      ...count,
      share,
      xPx: frame.insetPx + along * (frame.widthPx - 2 * frame.insetPx),
      heightPx,
      withinPx: kept === 0 ? 0 : Math.max(Math.min(heightPx, LEAST_BAR_PX), heightPx * kept),
      isLabelled: k % every === 0,
      hasTick: k % every === 0 || pitchOf(ordered.length, frame) >= LEAST_TICK_PITCH_PX,
    };
  });
}
