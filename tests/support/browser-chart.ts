import type { Locator } from 'playwright-core';

/** A place on an element, CSS pixels from its left top corner. */
export interface Spot {
  readonly x: number;
  readonly y: number;
}

/**
 * Where a chart has drawn its selected mark, read off the canvas itself: the middle of all that is painted in the
 * colour of steel, the only one on it whose red exceeds its green by so much (ochre's does by 62). Waits until there is some.
 */
export async function markCentre(canvas: Locator): Promise<Spot> {
  return canvas.evaluate(async (element) => {
    const RED_OVER_GREEN = 80;
    const HALF_OPAQUE = 128;
    const PATIENCE_MS = 10_000;
    const drawn = element as HTMLCanvasElement;
    const nextFrame = () => new Promise(requestAnimationFrame);
    const read = (): { x: number; y: number } | null => {
      const { data, width, height } = drawn.getContext('2d')!.getImageData(0, 0, drawn.width, drawn.height);
      let [x, y, count] = [0, 0, 0];
      for (let at = 0; at < data.length; at += 4) {
        if (data[at]! - data[at + 1]! < RED_OVER_GREEN || data[at + 3]! < HALF_OPAQUE) continue;
        x += (at / 4) % width;
        y += Math.floor(at / 4 / width);
        count += 1;
      }
      const box = drawn.getBoundingClientRect();
      return count === 0
        ? null
        : { x: ((x / count) * box.width) / width, y: ((y / count) * box.height) / height };
    };
    // The picture follows the state by one frame.
    await nextFrame();
    await nextFrame();
    const deadline = performance.now() + PATIENCE_MS;
    while (performance.now() < deadline) {
      const spot = read();
      if (spot !== null) return spot;
      await nextFrame();
    }
    throw new Error('The chart has drawn no selected mark');
  });
}
