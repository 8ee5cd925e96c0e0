import { queueOptionsSymbol, type TaskQueue } from 'piscina';

type Waiting = Parameters<TaskQueue['push']>[0];

/** Put on a task under piscina's symbol: how many sections the whole has that the task is a chunk of. */
export interface TaskSize {
  readonly sections: number;
}

const sizeOf = (task: Waiting): number => (task[queueOptionsSymbol] as TaskSize | null)?.sections ?? 0;

/**
 * Tasks of the smaller piece of work go first, those of equal ones in the order they came: a small run waits for the
 * chunks in work and for no more. A handful wait at any time, so a sorted list is enough.
 */
export class SmallestFirst implements TaskQueue {
  readonly #waiting: Waiting[] = [];

  get size(): number {
    return this.#waiting.length;
  }

  shift(): Waiting | null {
    return this.#waiting.shift() ?? null;
  }

  push(task: Waiting): void {
    const behind = this.#waiting.findIndex((other) => sizeOf(other) > sizeOf(task));
    this.#waiting.splice(behind === -1 ? this.#waiting.length : behind, 0, task);
  }

  remove(task: Waiting): void {
    const at = this.#waiting.indexOf(task);
    if (at !== -1) this.#waiting.splice(at, 1);
  }
}
