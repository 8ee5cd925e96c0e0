import type { SearchBox } from './search-box.ts';

const isBefore = (a: SearchBox, b: SearchBox) => a.x < b.x || (a.x === b.x && a.y < b.y);

/** Boxes by their bound: the one that may hold the best x first, then the best y. */
export class BoxHeap {
  private readonly boxes: SearchBox[] = [];

  get size(): number {
    return this.boxes.length;
  }

  push(box: SearchBox): void {
    const { boxes } = this;
    let at = boxes.length;
    boxes.push(box);
    while (at > 0) {
      const parent = (at - 1) >>> 1;
      if (!isBefore(box, boxes[parent]!)) break;
      boxes[at] = boxes[parent]!;
      at = parent;
    }
    boxes[at] = box;
  }

  pop(): SearchBox | undefined {
    const { boxes } = this;
    const first = boxes[0];
    const last = boxes.pop();
    if (!last || boxes.length === 0) return first;
    let at = 0;
    for (;;) {
      let child = 2 * at + 1;
      if (child >= boxes.length) break;
      if (child + 1 < boxes.length && isBefore(boxes[child + 1]!, boxes[child]!)) child++;
      if (!isBefore(boxes[child]!, last)) break;
      boxes[at] = boxes[child]!;
      at = child;
    }
    boxes[at] = last;
    return first;
  }

  /** Any box but, as a rule, one of the better ones: where they are too many to keep. */
  popLast(): SearchBox | undefined {
    return this.boxes.pop();
  }
}
