import { MessageChannel, type MessagePort } from 'node:worker_threads';
import { bestOf } from '#shared/sweep/band.ts';
import type { SearchState } from '#shared/sweep/bounded-search.ts';
import type { ChunkResult } from '#shared/sweep/chunk.ts';
import { FrontBuilder } from '#shared/sweep/front.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import type { BoundsDesk } from './bounds-desk.ts';
import type { Beater, BoundsReply, BoundsReport } from './bounds-protocol.ts';

interface SharedSearch {
  readonly desk: BoundsDesk;
  readonly problem: SweepProblem;
  readonly view: View;
  /** Found by an earlier search that was stopped, oriented. */
  readonly known: readonly Beater[];
  /** Shared with the threads: set its cell to stop them after their slice. */
  readonly cancelFlag: Int32Array;
  readonly onProgress: (report: BoundsReport) => void;
}

/**
 * Searches a space on all threads of the desk, each with a share of the placements; what one finds spares the others
 * boxes. The front does not depend on how they are shared, how much had to be evaluated does a little.
 */
export async function searchByBounds(search: SharedSearch): Promise<BoundsReply> {
  const { desk, problem, view, known, cancelFlag, onProgress } = search;
  const joined = new JoinedReports(desk.threads);
  const ports: MessagePort[] = [];
  const shares = Array.from({ length: desk.threads }, async (_, part) => {
    const { port1, port2 } = new MessageChannel();
    ports.push(port1);
    port1.on('message', (report: BoundsReport) => {
      const news = joined.take(part, report);
      if (news.length > 0) ports.forEach((port, other) => other !== part && port.postMessage(news));
      onProgress(joined.report());
    });
    const task = { problem, view, known, cancelFlag, port: port2, share: { part, of: desk.threads } };
    const reply = await desk.search(task);
    joined.take(part, reply);
    return reply;
  });
  try {
    const replies = await Promise.all(shares);
    return {
      ...joined.report(),
      near: bestOf(replies.flatMap(({ near }) => near)),
      isDone: replies.every(({ isDone }) => isDone),
    };
  } catch (error) {
    Atomics.store(cancelFlag, 0, 1);
    await Promise.allSettled(shares);
    throw error;
  } finally {
    for (const port of ports) port.close();
  }
}

/** The latest word of each share, and the front of all. */
class JoinedReports {
  readonly #reports: (BoundsReport | undefined)[];
  readonly #told: FrontBuilder[];

  constructor(shares: number) {
    this.#reports = new Array<undefined>(shares).fill(undefined);
    this.#told = Array.from({ length: shares }, () => new FrontBuilder());
  }

  /** Answers what this share found that it had not told before. */
  take(part: number, report: BoundsReport): Beater[] {
    this.#reports[part] = report;
    const told = this.#told[part]!;
    const news = report.found.filter(({ x, y }) => !hasPoint(told, x, y)).map(({ x, y }) => ({ x, y }));
    for (const { x, y } of news) told.add(x, y, 0);
    return news;
  }

  report(): BoundsReport {
    const front = new FrontBuilder();
    const state = { evaluated: 0, provenUnnecessary: 0, boxesOpen: 0, boxesClosed: 0 };
    for (const report of this.#reports) {
      if (report === undefined) continue;
      for (const { x, y, ties, tieCount } of report.found) front.addAll(x, y, ties, tieCount);
      for (const key of STATE_KEYS) state[key] += report.state[key];
    }
    return { state, found: pointsOf(front) };
  }
}

const STATE_KEYS = [
  'evaluated',
  'provenUnnecessary',
  'boxesOpen',
  'boxesClosed',
] as const satisfies readonly (keyof SearchState)[];

function hasPoint({ xs, ys }: FrontBuilder, x: number, y: number): boolean {
  const at = xs.indexOf(x);
  return at !== -1 && ys[at] === y;
}

export const pointsOf = (front: FrontBuilder): ChunkResult['front'] =>
  front.xs.map((x, i) => ({ x, y: front.ys[i]!, ties: front.ties[i]!, tieCount: front.tieCounts[i]! }));
