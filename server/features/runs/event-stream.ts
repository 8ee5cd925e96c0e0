import { once } from 'node:events';
import type { Response } from 'express';
import type { Person } from '#shared/contract/records.ts';
import type { Database } from '../../db/client.ts';
import type { RunEvents } from '../../jobs/run-events.ts';
import type { Log } from '../../log.ts';
import { presentViewProgress } from './present.ts';
import { listViewsChangedAfter, type RunRecord } from './queries.ts';

/** Under the idle limit of the proxies an office may have in between. */
const HEARTBEAT_MS = 15_000;
/** What a client waits before it connects again. */
const RETRY_MS = 1000;

interface RunStream {
  readonly db: Database;
  readonly log: Log;
  readonly runEvents: RunEvents;
  readonly res: Response;
  readonly person: Person;
  readonly record: RunRecord;
  /** The last event the client has, from its Last-Event-ID. */
  readonly lastEventId: number | undefined;
}

/**
 * Sends the state of each view of the run, then each change. An event's id is the run's sequence number. Commits of one
 * run follow its sequence, so "all views changed after the last id" never misses one, however slow the client or
 * whatever notifications were lost; states in between that nobody read in time are skipped.
 */
export function streamRun({ db, log, runEvents, res, person, record, lastEventId }: RunStream): void {
  const { run } = record;
  // Sequence numbers begin at 0; an id from the future is not one of ours.
  let sent = lastEventId !== undefined && lastEventId <= run.eventSequence ? lastEventId : -1;
  let isDirty = true;
  let isSending = false;
  let isClosed = false;

  async function sendChanges(): Promise<void> {
    if (isSending) return;
    isSending = true;
    try {
      while (isDirty && !isClosed) {
        isDirty = false;
        for (const view of await listViewsChangedAfter(db, run.id, sent)) {
          sent = view.sequence;
          const data = JSON.stringify(presentViewProgress(view, run.sectionCount, person));
          if (!res.write(`event: progress\nid: ${sent}\ndata: ${data}\n\n`)) await once(res, 'drain');
        }
      }
    } catch (error) {
      // The client connects again and is told what it missed.
      if (!isClosed) log.warn({ err: error }, 'A stream of run events broke off');
      res.end();
    } finally {
      isSending = false;
    }
  }
  const refresh = () => {
    isDirty = true;
    void sendChanges();
  };

  // `no-transform`: no proxy may hold events back to compress them.
  res.set({ 'content-type': 'text/event-stream', 'cache-control': 'no-store, no-transform' });
  res.flushHeaders();
  res.write(`retry: ${RETRY_MS}\n\n`);
  const heartbeat = setInterval(() => res.write(': still here\n\n'), HEARTBEAT_MS);
  const unfollow = runEvents.follow(run.id, {
    onViewChanged: refresh,
    onGap: refresh,
    onClosed: () => res.end(),
  });
  res.once('close', () => {
    isClosed = true;
    clearInterval(heartbeat);
    unfollow();
    // Whoever waits for it to drain is let go.
    res.emit('drain');
  });
  refresh();
}
