import { deserialize, serialize } from 'node:v8';
import { noNearMisses, type NearMisses } from '#shared/sweep/near-misses.ts';

/** Tells our blocks from anything else, and this layout from later ones. */
const HEADER = Buffer.from('FWN1');

/** Nearest misses as one block for the database; most places are empty and left out. */
export function nearMissesToBytes({ indices, rows }: NearMisses): Buffer {
  const width = rows.length / indices.length;
  const places = [...indices.keys()].filter((place) => indices[place] !== -1);
  const filled = {
    places: Uint16Array.from(places),
    indices: Float64Array.from(places, (place) => indices[place]!),
    rows: Float64Array.from(
      places.flatMap((place) => [...rows.subarray(place * width, (place + 1) * width)]),
    ),
  };
  return Buffer.concat([HEADER, serialize(filled)]);
}

/** @throws RangeError for a block of another layout. */
export function nearMissesFromBytes(bytes: Buffer): NearMisses {
  if (!bytes.subarray(0, HEADER.length).equals(HEADER))
    throw new RangeError('These bytes are no near misses of a layout this version knows');
  const filled = deserialize(bytes.subarray(HEADER.length)) as {
    readonly places: Uint16Array;
    readonly indices: Float64Array;
    readonly rows: Float64Array;
  };
  const misses = noNearMisses();
  const width = misses.rows.length / misses.indices.length;
  filled.places.forEach((place, i) => {
    misses.indices[place] = filled.indices[i]!;
    misses.rows.set(filled.rows.subarray(i * width, (i + 1) * width), place * width);
  });
  return misses;
}
