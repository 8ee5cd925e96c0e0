/**
 * The sections of one row of depths as columns by the depth's place in the space, which the passes of the hot loop fill one
 * after the other. A pass is a small loop over plain numbers: the compiler keeps them in registers and calls nothing, where
 * one loop over whole sections was too large for it to take its calls in, and each made numbers on the heap.
 */
export interface RowColumns {
  /** Overall depth, mm; the space's own. */
  readonly h: Float64Array;
  /** Depth of the tension steel's centroid and of its outermost layer, mm. */
  readonly d: Float64Array;
  readonly dt: Float64Array;
  /** Neutral axis at ultimate and of the cracked section, mm. */
  readonly c: Float64Array;
  readonly kd: Float64Array;
  /** Mn and φMn, N·mm. */
  readonly nominal: Float64Array;
  readonly design: Float64Array;
  readonly muPhi: Float64Array;
  /** Spacing of the stirrups as built, mm, and skin steel, kg/m. */
  readonly spacingMm: Float64Array;
  readonly skinKg: Float64Array;
  /** Checks that the size alone fails, of one width, cover, stirrup and fy. */
  readonly sizeMasks: Int32Array;
  /** Checks failed so far. */
  readonly masks: Int32Array;
}

export function rowColumns(depthsMm: readonly number[]): RowColumns {
  const { length } = depthsMm;
  const column = () => new Float64Array(length);
  return {
    h: Float64Array.from(depthsMm),
    d: column(),
    dt: column(),
    c: column(),
    kd: column(),
    nominal: column(),
    design: column(),
    muPhi: column(),
    spacingMm: column(),
    skinKg: column(),
    sizeMasks: new Int32Array(length),
    masks: new Int32Array(length),
  };
}
