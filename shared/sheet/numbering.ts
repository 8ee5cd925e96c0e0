/** Numbers the lines of a sheet in the order they are written, from 1. */
export class Numbering {
  #last = 0;
  next = (): number => ++this.#last;
}
