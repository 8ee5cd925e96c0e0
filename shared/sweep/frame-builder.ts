import { encodeFrame, type CodedColumn } from './feasible-frame.ts';
import { DESIGN_STRENGTH, MU_PHI } from './kernel-places.ts';

/** Values a column of codes tells apart; beyond them sections are not kept. */
const MOST_VALUES = 65_536;
const FIRST_CAPACITY = 1024;

/** What of a section's steel follows from its depth: its stirrups' spacing as built, and skin steel, kg/m. */
export interface BuiltSteel {
  spacingMm: number;
  skinKg: number;
}

const grown = <T extends Uint8Array | Uint16Array | Float64Array>(old: T, make: (length: number) => T): T => {
  const larger = make(2 * old.length);
  larger.set(old);
  return larger;
};

/** Columns of frames that are finished, for the next: making them anew had the collector run all the time. */
const SPARE: Float64Array<ArrayBuffer>[] = [];
const MOST_SPARE = 4;

const spareColumn = (): Float64Array<ArrayBuffer> => SPARE.pop() ?? new Float64Array(FIRST_CAPACITY);

function giveBack(column: Float64Array<ArrayBuffer>): void {
  if (SPARE.length < MOST_SPARE) SPARE.push(column);
}

/** Gathers the sections of one frame, by ascending index; finished once. */
export class FrameBuilder {
  count = 0;
  readonly #hasNumbers: boolean;
  readonly #spacings = new CodeBuilder();
  readonly #skins = new CodeBuilder();
  #muPhi: Float64Array<ArrayBuffer>;
  #design: Float64Array<ArrayBuffer>;
  #runs = new Uint8Array(FIRST_CAPACITY);
  #runBytes = 0;
  /** The first index. */
  #from = 0;
  /** Behind the last run that is written. */
  #written = 0;
  #runFirst = 0;
  #runEnd = 0;

  constructor(hasNumbers: boolean) {
    this.#hasNumbers = hasNumbers;
    this.#muPhi = hasNumbers ? spareColumn() : new Float64Array(0);
    this.#design = hasNumbers ? spareColumn() : new Float64Array(0);
  }

  /** `measures`: a row in the order of MEASURE_IDS. */
  add(index: number, steel: Readonly<BuiltSteel>, measures: Float64Array): void {
    const at = this.count++;
    if (at === 0) this.#from = this.#written = this.#runFirst = this.#runEnd = index;
    this.#spacings.add(at, steel.spacingMm);
    this.#skins.add(at, steel.skinKg);
    if (this.#hasNumbers) {
      if (at === this.#muPhi.length) this.#muPhi = grown(this.#muPhi, (length) => new Float64Array(length));
      if (at === this.#design.length)
        this.#design = grown(this.#design, (length) => new Float64Array(length));
      this.#muPhi[at] = measures[MU_PHI]!;
      this.#design[at] = measures[DESIGN_STRENGTH]!;
    }
    if (index === this.#runEnd) {
      this.#runEnd++;
      return;
    }
    this.#closeRun();
    this.#runFirst = index;
    this.#runEnd = index + 1;
  }

  #closeRun(): void {
    if (this.#runEnd === this.#runFirst) return;
    this.#writeNumber(this.#runFirst - this.#written);
    this.#writeNumber(this.#runEnd - this.#runFirst);
    this.#written = this.#runEnd;
  }

  #writeNumber(value: number): void {
    // Eight bytes hold any index.
    if (this.#runBytes + 8 > this.#runs.length)
      this.#runs = grown(this.#runs, (length) => new Uint8Array(length));
    let rest = value;
    for (; rest >= 128; rest = Math.floor(rest / 128)) this.#runs[this.#runBytes++] = 128 + (rest % 128);
    this.#runs[this.#runBytes++] = rest;
  }

  /** The frame's bytes; null where a column has more values than codes tell apart. */
  finish(): Uint8Array<ArrayBuffer> | null {
    const { count } = this;
    const spacingsMm = this.#spacings.finish(count);
    const skinsKg = this.#skins.finish(count);
    if (spacingsMm === null || skinsKg === null) return null;
    this.#closeRun();
    this.#runFirst = this.#runEnd;
    const numbers = this.#hasNumbers
      ? { muPhi: this.#muPhi.subarray(0, count), design: this.#design.subarray(0, count) }
      : null;
    const runs = this.#runs.subarray(0, this.#runBytes);
    const bytes = encodeFrame({ from: this.#from, count, numbers, spacingsMm, skinsKg, runs });
    if (numbers !== null) {
      giveBack(this.#muPhi);
      giveBack(this.#design);
    }
    return bytes;
  }
}

/** A column of few values. The value before is tried first: neighbours are mostly alike. */
class CodeBuilder {
  readonly #codeOf = new Map<number, number>();
  #codes = new Uint16Array(0);
  #last = NaN;
  #lastCode = 0;

  add(at: number, value: number): void {
    if (value !== this.#last) {
      this.#lastCode = this.#codeOf.get(value) ?? this.#codeOf.size;
      this.#codeOf.set(value, this.#lastCode);
      this.#last = value;
    }
    if (this.#lastCode === 0 && this.#codes.length === 0) return;
    if (this.#codes.length <= at) {
      const larger = new Uint16Array(Math.max(FIRST_CAPACITY, 2 * at));
      larger.set(this.#codes);
      this.#codes = larger;
    }
    this.#codes[at] = this.#lastCode;
  }

  finish(count: number): CodedColumn | null {
    const values = Float64Array.from(this.#codeOf.keys());
    if (values.length > MOST_VALUES) return null;
    if (values.length <= 1) return { values, codes: null };
    const codes = this.#codes.subarray(0, count);
    return { values, codes: values.length <= 256 ? Uint8Array.from(codes) : codes };
  }
}
