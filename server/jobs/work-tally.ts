/** What a process has done for the queue since it began: shown to the operator and counted in the metrics. */
export class WorkTally {
  sections = 0;
  shards = 0;
  failures = 0;
  readonly #listeners = new Set<(tookMs: number) => void>();

  /** Sections that came out of the threads, also of a shard that is not done yet. */
  addSections(count: number): void {
    this.sections += count;
  }

  addShard(tookMs: number): void {
    this.shards++;
    for (const listener of this.#listeners) listener(tookMs);
  }

  addFailure(): void {
    this.failures++;
  }

  /** Called with the time each further shard took, ms. */
  onShard(listener: (tookMs: number) => void): void {
    this.#listeners.add(listener);
  }
}
