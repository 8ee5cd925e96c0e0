import type { PreparedSweep } from './prepared-sweep.ts';
import type { SearchBox } from './search-box.ts';

/** Two parts of a box, cut across the axis whose ends lie furthest apart for their size. */
export function splitBox(box: SearchBox, { space, concretes }: PreparedSweep): SearchBox[] {
  const { tension, compression, fcFrom, fcTo, depthFrom, depthTo } = box;
  const leastH = space.depthsMm[depthFrom]!;
  const mostH = space.depthsMm[depthTo - 1]!;
  const ofAll = tension.mostAreaMm2 + compression.mostAreaMm2;
  const tensionSpread = tension.left ? (tension.mostAreaMm2 - tension.leastAreaMm2) / ofAll + TINY : 0;
  const otherSpread = compression.left
    ? (OTHER_WEIGHT * (compression.mostAreaMm2 - compression.leastAreaMm2)) / ofAll + TINY
    : 0;
  const fcSpread =
    fcTo - fcFrom > 1 ? FC_WEIGHT * (1 - concretes[fcFrom]!.fcMPa / concretes[fcTo - 1]!.fcMPa) + TINY : 0;
  const depthSpread = depthTo - depthFrom > 1 ? 1 - leastH / mostH + TINY : 0;
  const widest = Math.max(tensionSpread, otherSpread, fcSpread, depthSpread);
  if (widest === tensionSpread)
    return [
      { ...box, tension: tension.left! },
      { ...box, tension: tension.right! },
    ];
  if (widest === otherSpread)
    return [
      { ...box, compression: compression.left! },
      { ...box, compression: compression.right! },
    ];
  if (widest === fcSpread) {
    const half = (fcFrom + fcTo) >>> 1;
    return [
      { ...box, fcTo: half },
      { ...box, fcFrom: half },
    ];
  }
  const half = (depthFrom + depthTo) >>> 1;
  return [
    { ...box, depthTo: half },
    { ...box, depthFrom: half },
  ];
}

/** Concrete's strength, and steel on the compression face, move bounds less than tension steel and depth do. */
const OTHER_WEIGHT = 0.25;
const FC_WEIGHT = 0.3;
/** An axis that can be cut is preferred to one that cannot, equal ends or not. */
const TINY = 1e-12;
