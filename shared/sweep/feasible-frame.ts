/**
 * Sections that meet every check as compact columns: one frame for each piece that was swept, one behind the other.
 *
 * Sections lie in runs along the depth, so indices are kept as gap and length of each run in bytes of seven bits: about
 * half a byte a section. What weights depend on besides the index, the stirrups' spacing as built and the skin steel, has
 * few values: a list, and a byte a section where there are two or more. Amounts, cost and carbon are then worked out anew
 * at any rates. μφ and the design strength take an equilibrium each (a curve even), so they are kept as they are, 16 bytes,
 * where the run is not too large.
 *
 * Header of 40 bytes, then doubles, then codes, then runs; padded to whole doubles, so that frames can be read where they
 * lie. In the byte order of the machines this runs on (little-endian); the mark at the start tells of any other.
 */
export interface FeasibleFrame {
  /** The first index. */
  readonly from: number;
  readonly count: number;
  /** μφ and design strength, N mm; null where they are to be worked out again. */
  readonly numbers: { readonly muPhi: Float64Array; readonly design: Float64Array } | null;
  readonly spacingsMm: CodedColumn;
  readonly skinsKg: CodedColumn;
  /** Gap and length of each run, in bytes of seven bits. */
  readonly runs: Uint8Array;
}

/** A column of few values: the list of them and a place in it for each section; null where all have the first. */
export interface CodedColumn {
  readonly values: Float64Array;
  readonly codes: Uint8Array | Uint16Array | null;
}

/** Tells our frames from anything else, and this layout from later ones: "FWF1". */
const MARK = 0x31465746;
const HEADER_BYTES = 40;

const padded = (bytes: number) => Math.ceil(bytes / 8) * 8;
const codeBytes = ({ codes }: CodedColumn) => (codes === null ? 0 : codes.BYTES_PER_ELEMENT);

/** One frame as bytes. */
export function encodeFrame(frame: FeasibleFrame): Uint8Array<ArrayBuffer> {
  const { count, numbers, spacingsMm, skinsKg, runs } = frame;
  const doubles = spacingsMm.values.length + skinsKg.values.length + (numbers === null ? 0 : 2 * count);
  const size = padded(
    HEADER_BYTES +
      8 * doubles +
      padded(count * codeBytes(spacingsMm)) +
      padded(count * codeBytes(skinsKg)) +
      runs.length,
  );
  const bytes = new Uint8Array(size);
  const head = new DataView(bytes.buffer);
  head.setUint32(0, MARK, true);
  head.setUint32(4, size, true);
  head.setFloat64(8, frame.from, true);
  head.setUint32(16, count, true);
  head.setUint32(20, runs.length, true);
  head.setUint32(24, spacingsMm.values.length, true);
  head.setUint32(28, skinsKg.values.length, true);
  head.setUint8(32, numbers === null ? 0 : 1);
  head.setUint8(33, codeBytes(spacingsMm));
  head.setUint8(34, codeBytes(skinsKg));
  let at = HEADER_BYTES;
  const put = (column: Float64Array | Uint8Array | Uint16Array | null) => {
    if (column === null) return;
    bytes.set(new Uint8Array(column.buffer, column.byteOffset, column.byteLength), at);
    at += padded(column.byteLength);
  };
  for (const column of [spacingsMm.values, skinsKg.values, numbers?.muPhi, numbers?.design])
    put(column ?? null);
  for (const column of [spacingsMm.codes, skinsKg.codes, runs]) put(column);
  return bytes;
}

/** Where a frame of a block begins and ends, and how many sections it holds. */
export interface FramePlace {
  readonly from: number;
  readonly to: number;
  readonly count: number;
}

/** @throws RangeError for bytes of another layout. */
export function framePlaces(block: Uint8Array): FramePlace[] {
  const places: FramePlace[] = [];
  for (let from = 0; from < block.length;) {
    const head = new DataView(
      block.buffer,
      block.byteOffset + from,
      Math.min(HEADER_BYTES, block.length - from),
    );
    if (head.byteLength < HEADER_BYTES || head.getUint32(0, true) !== MARK)
      throw new RangeError('These bytes are no columns of a layout this version knows');
    const to = from + head.getUint32(4, true);
    places.push({ from, to, count: head.getUint32(16, true) });
    from = to;
  }
  return places;
}

/**
 * The frames of a block, read where they lie. The block begins at a whole double of its buffer.
 * @throws RangeError for bytes of another layout.
 */
export function decodeFrames(block: Uint8Array): FeasibleFrame[] {
  return framePlaces(block).map(({ from, to }) => decodeFrame(block.subarray(from, to)));
}

function decodeFrame({ buffer, byteOffset }: Uint8Array): FeasibleFrame {
  const head = new DataView(buffer, byteOffset, HEADER_BYTES);
  const count = head.getUint32(16, true);
  let at = byteOffset + HEADER_BYTES;
  const doubles = (length: number) => {
    const column = new Float64Array(buffer, at, length);
    at += 8 * length;
    return column;
  };
  const codes = (width: number) => {
    if (width === 0) return null;
    const column = width === 1 ? new Uint8Array(buffer, at, count) : new Uint16Array(buffer, at, count);
    at += padded(count * width);
    return column;
  };
  const spacings = doubles(head.getUint32(24, true));
  const skins = doubles(head.getUint32(28, true));
  const numbers = head.getUint8(32) === 0 ? null : { muPhi: doubles(count), design: doubles(count) };
  const spacingsMm = { values: spacings, codes: codes(head.getUint8(33)) };
  const skinsKg = { values: skins, codes: codes(head.getUint8(34)) };
  const runs = new Uint8Array(buffer, at, head.getUint32(20, true));
  return { from: head.getFloat64(8, true), count, numbers, spacingsMm, skinsKg, runs };
}

/** Walks the runs of a frame: first index, length, and the place of the first in the columns. */
export function forEachRun(
  { from, runs }: FeasibleFrame,
  visit: (first: number, length: number, at: number) => void,
): void {
  let byte = 0;
  const next = () => {
    let value = 0;
    for (let scale = 1; ; scale *= 128) {
      const one = runs[byte++]!;
      value += (one & 127) * scale;
      if (one < 128) return value;
    }
  };
  let at = 0;
  for (let end = from; byte < runs.length;) {
    const first = end + next();
    const length = next();
    visit(first, length, at);
    end = first + length;
    at += length;
  }
}
