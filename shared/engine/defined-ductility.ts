/** A curvature ductility never goes without the sentence that says what it is. */
export interface DefinedDuctility {
  /** Null where no bar yields. */
  readonly value: number | null;
  readonly definition: string;
}
