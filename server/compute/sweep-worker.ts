import { prepareSweep, type PreparedSweep } from '#shared/sweep/prepared-sweep.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import { openSweep } from '#shared/sweep/sweep-range.ts';
import { AddedSections, type Widening } from '#shared/sweep/widening.ts';
import type { SweepReply, SweepTask } from './protocol.ts';

/** Sections between two looks at the cancel flag: some 3 ms at 10 million sections a second. */
const BATCH_SECTIONS = 2 ** 15;
/** As many runs as are computed side by side (see the queue's concurrency), so that taking turns prepares nothing twice. */
const MAX_PREPARED = 8;

interface Ready {
  readonly prepared: PreparedSweep;
  readonly added: AddedSections | null;
}

const ready = new Map<string, Ready>();

/** Entry point of a thread of the pool. */
export default function sweepTask(task: SweepTask): SweepReply {
  const { prepared: sweep, added } = getPrepared(task);
  const steps = openSweep(sweep, { keeping: task.keeping, added });
  let doneTo = task.from;
  while (doneTo < task.to && Atomics.load(task.cancelFlag, 0) === 0) {
    const batchTo = Math.min(doneTo + BATCH_SECTIONS, task.to);
    steps.advance(doneTo, batchTo);
    doneTo = batchTo;
  }
  return { chunk: steps.finish(), doneTo, kept: steps.kept() };
}

function getPrepared({ key, problem, view, widening }: SweepTask): Ready {
  const known = ready.get(key);
  // Deleted and set again: a Map iterates in order of insertion, so its first key is the longest unused.
  ready.delete(key);
  const sweep = known ?? makeReady(problem, view, widening);
  ready.set(key, sweep);
  if (ready.size > MAX_PREPARED) ready.delete(ready.keys().next().value!);
  return sweep;
}

function makeReady(problem: SweepProblem, view: View, widening: Widening | null): Ready {
  const prepared = prepareSweep(problem, view);
  return { prepared, added: widening && new AddedSections(widening, prepared.space) };
}
