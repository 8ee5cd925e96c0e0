/**
 * Cost of one unit of work in ns over some rounds, after one warm-up; `work` returns how many units it did. Processor time,
 * not the clock's: what else the machine does then changes little, and the best round less than the median.
 */
export function costs(
  rounds: number,
  work: () => number,
): { readonly best: number; readonly median: number } {
  work();
  const sorted = Array.from({ length: rounds }, () => {
    const start = process.cpuUsage();
    const units = work();
    const { user, system } = process.cpuUsage(start);
    return ((user + system) * 1000) / units;
  }).sort((a, b) => a - b);
  return { best: sorted[0]!, median: sorted[Math.floor(rounds / 2)]! };
}

/** µs of `work` on each of some things, each in the best of some rounds by the clock: the median of them, and where the slowest tenth begins. */
export function bestOfEach<T>(
  rounds: number,
  things: readonly T[],
  work: (thing: T) => unknown,
): { readonly median: number; readonly slowTenth: number } {
  const best = things.map(() => Infinity);
  for (let round = 0; round < rounds; round++)
    things.forEach((thing, i) => {
      const start = performance.now();
      work(thing);
      best[i] = Math.min(best[i]!, (performance.now() - start) * 1000);
    });
  best.sort((a, b) => a - b);
  return { median: best[Math.floor(best.length / 2)]!, slowTenth: best[Math.floor(0.9 * best.length)]! };
}

export const median = (repeats: number, work: () => number): { readonly nsEach: number } => ({
  nsEach: costs(repeats, work).median,
});

/** One line: name, then figures to four digits. */
export function report(name: string, figures: Readonly<Record<string, number>>): void {
  const shown = Object.entries(figures).map(([label, value]) => `${Number(value.toPrecision(4))} ${label}`);
  console.log(`  ${name.padEnd(34)} ${shown.join(', ')}`);
}
