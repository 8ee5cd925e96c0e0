/** Sections [from, to). */
export interface SectionRange {
  readonly from: number;
  readonly to: number;
}

/**
 * Up to here a run is one shard: some 0.3 s on two threads. Handing a shard over, storing it and merging it costs about
 * 20 ms, which a run has no gain from until it takes longer than that by far. Measured: at 2²⁰ runs of two to four million
 * took 1.5 to 1.7 times as long; at 2²⁴ ten million gained no more than two alike differ by, could not be shared with another
 * machine, and would hold a place among the small runs for a second.
 */
const LARGEST_SINGLE_SHARD = 2 ** 22;
/** The first shards of a large run are small, so that its front shows after a tenth of a second. */
const FIRST_SHARD = 2 ** 19;
/** Some 0.6 s on two threads: a few per cent of it are the handing over, and no more than that is lost with a worker. */
const LARGEST_SHARD = 2 ** 23;

/** Cuts a range into shards; each twice as large as the one before, up to the largest. */
export function planShards({ from, to }: SectionRange): SectionRange[] {
  if (to - from <= LARGEST_SINGLE_SHARD) return [{ from, to }];
  const shards: SectionRange[] = [];
  for (let start = from, size = FIRST_SHARD; start < to; size = Math.min(2 * size, LARGEST_SHARD)) {
    const end = Math.min(start + size, to);
    shards.push({ from: start, to: end });
    start = end;
  }
  return shards;
}
