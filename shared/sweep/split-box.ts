import type { PreparedSweep } from './prepared-sweep.ts';
import type { SearchBox } from './search-box.ts';

/** Two parts of a box, cut across the axis whose ends lie furthest apart for their size. */
export function splitBox(box: SearchBox, { space, concretes }: PreparedSweep): SearchBox[] {
  const { tension, compression, fcFrom, fcTo, depthFrom, depthTo } = box;
  const leastH = space.depthsMm[depthFrom]!;
  const mostH = space.depthsMm[depthTo - 1]!;
  const ofAll = tension.mostAreaMm2 + compression.mostAreaMm2;
  const spreads = [
    tension.left ? (tension.mostAreaMm2 - tension.leastAreaMm2) / ofAll + TINY : 0,
    compression.left ? (compression.mostAreaMm2 - compression.leastAreaMm2) / ofAll + TINY : 0,
    fcTo - fcFrom > 1 ? FC_WEIGHT * (1 - concretes[fcFrom]!.fcMPa / concretes[fcTo - 1]!.fcMPa) + TINY : 0,
    depthTo - depthFrom > 1 ? 1 - leastH / mostH + TINY : 0,
  ];
  switch (spreads.indexOf(Math.max(...spreads))) {
    case 0:
      return [tension.left!, tension.right!].map((part) => ({ ...box, tension: part }));
    case 1:
      return [compression.left!, compression.right!].map((part) => ({ ...box, compression: part }));
    case 2: {
      const half = (fcFrom + fcTo) >>> 1;
      return [
        { ...box, fcTo: half },
        { ...box, fcFrom: half },
      ];
    }
    default: {
      const half = (depthFrom + depthTo) >>> 1;
      return [
        { ...box, depthTo: half },
        { ...box, depthFrom: half },
      ];
    }
  }
}

/** Strength moves bounds less than steel and depth do. */
const FC_WEIGHT = 0.3;
/** An axis that can be cut is preferred to one that cannot, equal ends or not. */
const TINY = 1e-12;
