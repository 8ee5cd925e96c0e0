/**
 * Median cost of one unit of work over some repeats, after one warm-up; `work` returns how many units it did. Processor
 * time, not the clock's: what else the machine does then changes little.
 */
export function median(repeats: number, work: () => number): { readonly nsEach: number } {
  work();
  const costs = Array.from({ length: repeats }, () => {
    const start = process.cpuUsage();
    const units = work();
    const { user, system } = process.cpuUsage(start);
    return ((user + system) * 1000) / units;
  }).sort((a, b) => a - b);
  return { nsEach: costs[Math.floor(repeats / 2)]! };
}

/** One line: name, then figures to four digits. */
export function report(name: string, figures: Readonly<Record<string, number>>): void {
  const shown = Object.entries(figures).map(([label, value]) => `${Number(value.toPrecision(4))} ${label}`);
  console.log(`  ${name.padEnd(34)} ${shown.join(', ')}`);
}
