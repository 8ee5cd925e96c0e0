import { receiveMessageOnPort } from 'node:worker_threads';
import { BoundedSearch } from '#shared/sweep/bounded-search.ts';
import type { Beater, BoundsReply, BoundsTask } from './bounds-protocol.ts';

/** Boxes between two looks at the cancel flag and at what the others found: some milliseconds. */
const SLICE_BOXES = 1024;
const REPORT_MS = 100;

/** Entry point of a thread that searches by bounds. */
export default function boundsTask(task: BoundsTask): BoundsReply {
  const { problem, view, share, known, cancelFlag, port } = task;
  const search = new BoundedSearch(problem, view, share);
  for (const { x, y } of known) search.noteElsewhere(x, y);
  let isDone = false;
  let nextReportAt = performance.now();
  while (!isDone && Atomics.load(cancelFlag, 0) === 0) {
    isDone = search.advance(SLICE_BOXES);
    for (let heard = receiveMessageOnPort(port); heard; heard = receiveMessageOnPort(port))
      for (const { x, y } of heard.message as Beater[]) search.noteElsewhere(x, y);
    if (performance.now() < nextReportAt) continue;
    nextReportAt = performance.now() + REPORT_MS;
    port.postMessage({ state: search.state, found: search.found });
  }
  port.close();
  return { state: search.state, found: search.found, near: search.near, isDone };
}
