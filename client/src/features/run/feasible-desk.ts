import type { Cut, CutQuery, PickQuery } from './cut.ts';
import type { FeasibleAnswer, FeasibleRequest } from './feasible-worker.ts';

/** As much of a Worker as is used; a test brings its own. */
export interface FeasibleThread {
  postMessage: (request: FeasibleRequest) => void;
  terminate: () => void;
  listen: (take: (answer: FeasibleAnswer) => void) => void;
}

interface DeskEvents {
  readonly onOpened: (count: number) => void;
  readonly onTooMany: () => void;
  readonly onCut: (cut: Cut, query: CutQuery) => void;
}

/**
 * Asks the thread that holds the feasible sections. One question is with it at a time and the newest waits: while a hand
 * drags a handle, what it asked a moment ago is of no use any more.
 */
export class FeasibleDesk {
  private readonly thread: FeasibleThread;
  private readonly events: DeskEvents;
  private isOpen = false;
  private asked: CutQuery | null = null;
  private waiting: CutQuery | null = null;
  private nextId = 1;
  private readonly picks = new Map<number, (index: number | null) => void>();

  constructor(thread: FeasibleThread, events: DeskEvents) {
    this.thread = thread;
    this.events = events;
    thread.listen((answer) => this.take(answer));
  }

  open(request: FeasibleRequest & { readonly kind: 'open' }): void {
    this.thread.postMessage(request);
  }

  cut(query: CutQuery): void {
    this.waiting = query;
    this.askNext();
  }

  /** Null where there is no section near, or none can be asked. */
  pick(query: PickQuery): Promise<number | null> {
    if (!this.isOpen) return Promise.resolve(null);
    const id = this.nextId++;
    this.thread.postMessage({ kind: 'pick', id, query });
    return new Promise((resolve) => this.picks.set(id, resolve));
  }

  close(): void {
    this.thread.terminate();
    for (const resolve of this.picks.values()) resolve(null);
    this.picks.clear();
  }

  private askNext(): void {
    if (!this.isOpen || this.asked !== null || this.waiting === null) return;
    this.asked = this.waiting;
    this.waiting = null;
    this.thread.postMessage({ kind: 'cut', id: this.nextId++, query: this.asked });
  }

  private take(answer: FeasibleAnswer): void {
    if (answer.kind === 'too-many') return this.events.onTooMany();
    if (answer.kind === 'pick') {
      this.picks.get(answer.id)?.(answer.index);
      this.picks.delete(answer.id);
      return;
    }
    if (answer.kind === 'opened') {
      this.isOpen = true;
      this.events.onOpened(answer.count);
    } else {
      const query = this.asked!;
      this.asked = null;
      this.events.onCut(answer.cut, query);
    }
    this.askNext();
  }
}
