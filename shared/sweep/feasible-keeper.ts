import { FrameBuilder, type BuiltSteel } from './frame-builder.ts';
import { NearMissBuilder, type NearMisses } from './near-misses.ts';
import type { SectionKeeper } from './section-keeper.ts';

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
  readonly #nearMisses = new NearMissBuilder();
  readonly #steel: Readonly<BuiltSteel>;

  /** `steel` is the section's that the hot loop looks at. */
  constructor(hasNumbers: boolean, steel: Readonly<BuiltSteel>) {
    this.#frame = new FrameBuilder(hasNumbers);
    this.#steel = steel;
  }

  addFeasible(index: number, measures: Float64Array): void {
    this.#frame.add(index, this.#steel, measures);
  }

  addFailingOnly(bit: number, index: number, measures: Float64Array): void {
    this.#nearMisses.offer(bit, index, measures);
  }

  /** Once, when all have come. */
  finish(): KeptPiece {
    const { count } = this.#frame;
    return {
      feasible: count,
      frame: count === 0 ? new Uint8Array(0) : this.#frame.finish(),
      nearMisses: this.#nearMisses.found,
    };
  }
}
