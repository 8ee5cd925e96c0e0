import { FrameBuilder, type KeptSection } from './frame-builder.ts';
import { DESIGN_STRENGTH, MU_PHI } from './kernel-places.ts';
import { noNearMisses, offerNearMiss, type NearMisses } from './near-misses.ts';
import type { SectionKeeper } from './section-keeper.ts';

/** What of a section's steel the hot loop works out for each depth. */
interface BuiltSteel {
  readonly spacingMm: number;
  readonly skinKg: number;
}

/** What one piece of a sweep leaves for other views and other rates; plain data that crosses threads. */
export interface KeptPiece {
  /** Sections in the frame. */
  readonly feasible: number;
  /** One frame (see feasible-frame.ts); empty without sections, null where they could not be kept. */
  readonly frame: Uint8Array<ArrayBuffer> | null;
  readonly nearMisses: NearMisses;
}

/** Keeps the sections of one piece of a sweep that meet every check, and the nearest misses, as the hot loop finds them. */
export class FeasibleKeeper implements SectionKeeper {
  readonly #frame: FrameBuilder;
  readonly #nearMisses = noNearMisses();
  readonly #steel: BuiltSteel;
  readonly #section: KeptSection = { spacingMm: 0, skinKg: 0, muPhi: 0, designNmm: 0 };

  /** `steel` is the section's that the hot loop looks at. */
  constructor(hasNumbers: boolean, steel: BuiltSteel) {
    this.#frame = new FrameBuilder(hasNumbers);
    this.#steel = steel;
  }

  addFeasible(index: number, measures: Float64Array): void {
    const section = this.#section;
    section.spacingMm = this.#steel.spacingMm;
    section.skinKg = this.#steel.skinKg;
    section.muPhi = measures[MU_PHI]!;
    section.designNmm = measures[DESIGN_STRENGTH]!;
    this.#frame.add(index, section);
  }

  addFailingOnly(bit: number, index: number, measures: Float64Array): void {
    offerNearMiss(this.#nearMisses, bit, index, measures);
  }

  finish(): KeptPiece {
    const { count } = this.#frame;
    return {
      feasible: count,
      frame: count === 0 ? new Uint8Array(0) : this.#frame.finish(),
      nearMisses: this.#nearMisses,
    };
  }
}
