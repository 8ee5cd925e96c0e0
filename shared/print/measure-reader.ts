import type { UnitSystem } from '../contract/design-basis.ts';
import type { RuleSetId } from '../engine/section.ts';

/** How a reader meets measures: in which units, with which currency, in whose letters. */
export interface MeasureReader {
  readonly units: UnitSystem;
  readonly currency: string | null;
  /** Puts symbols in the code's own letters. */
  readonly code?: RuleSetId;
}
