/** Is told, beside the tally, of the sections other views and other rates are ranked from. */
export interface SectionKeeper {
  /** A section that meets every check, with all its measures; the row is reused by whoever calls. */
  addFeasible(index: number, measures: Float64Array): void;
  /** A section that fails exactly the check of this bit and has numbers. */
  addFailingOnly(bit: number, index: number, measures: Float64Array): void;
}
