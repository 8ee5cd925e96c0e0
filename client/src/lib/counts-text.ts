/** Counts with runs of three and more written as ranges: `2–8, 10`. */
export function countsText(counts: readonly number[]): string {
  const ordered = [...new Set(counts)].sort((a, b) => a - b);
  const runs: number[][] = [];
  for (const count of ordered) {
    const run = runs.at(-1);
    if (run !== undefined && run.at(-1) === count - 1) run.push(count);
    else runs.push([count]);
  }
  return runs.map((run) => (run.length > 2 ? `${run[0]}–${run.at(-1)}` : run.join(', '))).join(', ');
}
