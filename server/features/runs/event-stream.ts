import { once } from 'node:events';
import type { Response } from 'express';
import type { Person } from '#shared/contract/records.ts';
import type { Database } from '../../db/client.ts';
import type { RunEvents } from '../../jobs/run-events.ts';
import type { Log } from '../../log.ts';
import { presentViewProgress } from './present.ts';
import { listViewsChangedAfter, type RunRecord } from './queries.ts';

/** Under the idle limit of the proxies an office may have in between. Also how long a stream outlives the right to it. */
const HEARTBEAT_MS = 15_000;
/** What a client waits before it connects again. */
const RETRY_MS = 1000;

interface RunStream {
  readonly db: Database;
  readonly log: Log;
  readonly runEvents: RunEvents;
  readonly res: Response;
  /** Who reads it by now; undefined where the session has ended or the project is theirs no more. */
  readonly findReader: () => Promise<Person | undefined>;
  readonly record: RunRecord;
  /** The last event the client has, from its Last-Event-ID. */
  readonly lastEventId: number | undefined;
}

/** Answers the stream: the state of each view of the run, then each change, until either side ends it. */
export function streamRun(stream: RunStream): void {
  const { runEvents, res, record } = stream;
  // `no-transform`: no proxy may hold events back to compress them.
  res.set({ 'content-type': 'text/event-stream', 'cache-control': 'no-store, no-transform' });
  res.flushHeaders();
  res.write(`retry: ${RETRY_MS}\n\n`);
  const sender = new ChangeSender(stream);
  const send = () => void sender.send();
  const heartbeat = setInterval(() => {
    res.write(': still here\n\n');
    send();
  }, HEARTBEAT_MS);
  const unfollow = runEvents.follow(record.run.id, {
    onViewChanged: send,
    onGap: send,
    onClosed: () => res.end(),
  });
  res.once('close', () => {
    clearInterval(heartbeat);
    unfollow();
    sender.close();
  });
  send();
}

/**
 * An event's id is the run's sequence number. Commits of one run follow its sequence, so "all views changed after the
 * last id" never misses one, however slow the client or whatever notifications were lost; states in between that
 * nobody read in time are skipped.
 */
class ChangeSender {
  readonly #stream: RunStream;
  #sent: number;
  #isDirty = false;
  #isSending = false;
  #isClosed = false;

  constructor(stream: RunStream) {
    this.#stream = stream;
    const { lastEventId, record } = stream;
    // Sequence numbers begin at 0; an id from the future is not one of ours.
    this.#sent = lastEventId !== undefined && lastEventId <= record.run.eventSequence ? lastEventId : -1;
  }

  async send(): Promise<void> {
    this.#isDirty = true;
    if (this.#isSending) return;
    this.#isSending = true;
    const { log } = this.#stream;
    try {
      while (this.#isDirty && !this.#isClosed) {
        this.#isDirty = false;
        await this.#sendChanges();
      }
    } catch (error) {
      // The client connects again and is told what it missed.
      if (!this.#isClosed) log.warn({ err: error }, 'A stream of run events broke off');
      this.#end();
    } finally {
      this.#isSending = false;
    }
  }

  close(): void {
    this.#isClosed = true;
    // Whoever waits for it to drain is let go.
    this.#stream.res.emit('drain');
  }

  #end(): void {
    this.close();
    this.#stream.res.end();
  }

  async #sendChanges(): Promise<void> {
    const { db, res, findReader, record } = this.#stream;
    const { id, sectionCount } = record.run;
    const reader = await findReader();
    if (reader === undefined) {
      // The client connects again and is told why not.
      this.#end();
      return;
    }
    for (const view of await listViewsChangedAfter(db, id, this.#sent)) {
      if (this.#isClosed) return;
      this.#sent = view.sequence;
      const data = JSON.stringify(presentViewProgress(view, sectionCount, reader));
      if (!res.write(`event: progress\nid: ${view.sequence}\ndata: ${data}\n\n`)) await once(res, 'drain');
    }
  }
}
