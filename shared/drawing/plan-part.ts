/** A line of the drawing as an SVG path, which paper draws too. */
export interface Stroke {
  readonly path: string;
  readonly tone: 'muted' | 'ink';
  readonly widthPx: number;
  readonly isAxis?: boolean;
}

/** A word or number of the drawing. `y` is the middle of its height where it is centred, its base line otherwise. */
export interface Label {
  readonly text: string;
  readonly xPx: number;
  readonly yPx: number;
  readonly anchor: 'start' | 'middle';
  readonly tone: 'steel' | 'ink';
  readonly isCentred: boolean;
  /** Turned to be read from the right, as on a drawing. */
  readonly isUpright: boolean;
}

export interface Part {
  readonly strokes: readonly Stroke[];
  readonly labels: readonly Label[];
}
