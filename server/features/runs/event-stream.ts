import { once } from 'node:events';
import type { Response } from 'express';
import type { Person } from '#shared/contract/records.ts';
import type { Database } from '../../db/client.ts';
import { listQueuePositions } from '../../jobs/queue-position.ts';
import type { RunEvents } from '../../jobs/run-events.ts';
import type { Log } from '../../log.ts';
import { presentViewEvent } from './present.ts';
import { listViewsChangedAfter, type RunRecord } from './queries.ts';

/** Under the idle limit of the proxies an office may have in between. Also how long a stream outlives the right to it. */
const HEARTBEAT_MS = 15_000;
/** Between two looks at the queue, while something of the run waits in it. */
const POSITION_MS = 1000;
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
  const positions = setInterval(() => void sender.sendPositions(), POSITION_MS);
  const unfollow = runEvents.follow(record.run.id, {
    onViewChanged: send,
    onGap: send,
    onClosed: () => res.end(),
  });
  res.once('close', () => {
    clearInterval(heartbeat);
    clearInterval(positions);
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
  /** Whether a view of the run may be waiting in the queue. */
  #mayWait = true;
  #toldPositions = '';

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

  /** Tells where the run's views stand in the queue, where that has changed. No event of the run: it has no id. */
  async sendPositions(): Promise<void> {
    if (!this.#mayWait || this.#isClosed) return;
    const { db, res, record, log } = this.#stream;
    try {
      const positions = await listQueuePositions(db, record.run.id);
      this.#mayWait = positions.length > 0;
      const told = JSON.stringify(positions);
      if (this.#isClosed || told === this.#toldPositions) return;
      this.#toldPositions = told;
      for (const position of positions) res.write(`event: queue\ndata: ${JSON.stringify(position)}\n\n`);
    } catch (error) {
      log.warn({ err: error }, 'The position in the queue could not be read');
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
    for (const changed of await listViewsChangedAfter(db, id, this.#sent)) {
      if (this.#isClosed) return;
      const { sequence } = changed.view;
      this.#sent = sequence;
      this.#mayWait ||= changed.view.state === 'queued';
      const data = JSON.stringify(presentViewEvent(changed, sectionCount, reader));
      if (!res.write(`event: progress\nid: ${sequence}\ndata: ${data}\n\n`)) await once(res, 'drain');
    }
  }
}
