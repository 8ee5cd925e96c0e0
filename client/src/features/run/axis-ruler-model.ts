import type { AxisCount } from '#shared/sweep/result.ts';

/** One value of an axis on its ruler; all lengths in the ruler's own pixels. */
export interface RulerMark {
  readonly value: number;
  readonly xPx: number;
  /** Height of the feasible share standing on it. */
  readonly heightPx: number;
  /** Of the sections evaluated with this value, the part that meets every check. */
  readonly share: number;
  readonly feasible: number;
  readonly evaluated: number;
  readonly isLabelled: boolean;
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

/** Every how many values a label is written so that none touch; 1, 2, 5, 10 … as a ruler is divided. */
function labelEvery(count: number, frame: RulerFrame): number {
  const pitch = count > 1 ? (frame.widthPx - 2 * frame.insetPx) / (count - 1) : frame.widthPx;
  for (const every of [1, 2, 4, 5, 10, 20, 25, 50, 100, 200, 500]) {
    if (every * pitch >= frame.labelPitchPx) return every;
  }
  return 1000;
}

/** Lays the values of an axis on a ruler, each with its feasible share relative to the largest. */
export function rulerMarks(counts: readonly AxisCount[], frame: RulerFrame): RulerMark[] {
  const ordered = counts.toSorted((a, b) => a.value - b.value);
  const low = ordered[0]?.value ?? 0;
  const span = (ordered.at(-1)?.value ?? low) - low;
  const shares = ordered.map(({ feasible, evaluated }) => (evaluated === 0 ? 0 : feasible / evaluated));
  const largest = Math.max(...shares, 0);
  const every = labelEvery(ordered.length, frame);
  return ordered.map((count, k) => {
    const share = shares[k]!;
    const along = span === 0 ? 0.5 : (count.value - low) / span;
    return {
      ...count,
      share,
      xPx: frame.insetPx + along * (frame.widthPx - 2 * frame.insetPx),
      heightPx: share === 0 ? 0 : Math.max(LEAST_BAR_PX, (share / largest) * frame.barPx),
      isLabelled: k % every === 0,
    };
  });
}
