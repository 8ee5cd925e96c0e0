export interface CurveStroke {
  readonly className: string;
  readonly dash: string | undefined;
}

/** How curves drawn over each other differ: by dash first, so that it also holds in print, then by colour. */
export const CURVE_STROKES: readonly CurveStroke[] = [
  { className: 'stroke-ink', dash: undefined },
  { className: 'stroke-steel', dash: '8 3' },
  { className: 'stroke-meets', dash: '2 2.5' },
  { className: 'stroke-fails', dash: '9 3 2 3' },
  { className: 'stroke-near-mark', dash: '5 2' },
  { className: 'stroke-muted', dash: '12 2 2 2 2 2' },
];
