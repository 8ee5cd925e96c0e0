import type { FaceEntry } from './face-table.ts';

/** Ends of what the steel sets of a run have: areas mm², offsets from their own face mm, masses kg/m. */
export interface SetNode {
  /** Set numbers, sorted by area. */
  readonly sets: readonly number[];
  readonly left: SetNode | null;
  readonly right: SetNode | null;
  readonly leastAreaMm2: number;
  readonly mostAreaMm2: number;
  readonly leastKgPerM: number;
  /** Least mass over area, kg/m per mm²; 0 without steel. */
  readonly leastKgPerMm2: number;
  /** NaN for plain areas. */
  readonly fewestBars: number;
  /** Of the layer nearest the face, of the centroid and of the innermost layer: least and largest. */
  readonly nearestMm: number;
  readonly leastCentroidMm: number;
  readonly mostCentroidMm: number;
  readonly furthestMm: number;
  /** Largest distance between layers of one set. */
  readonly mostSpreadMm: number;
  /** Offsets of plain areas given as a share of h. */
  readonly leastShare: number;
  readonly mostShare: number;
  readonly leastReachMm: number;
}

/**
 * A binary tree over the sets of one face that `isKept` lets through, in order of area, so that a run of neighbours has
 * steel of much the same amount. Null where none is kept.
 */
export function setTree(
  entries: readonly FaceEntry[],
  isKept: (entry: FaceEntry) => boolean,
): SetNode | null {
  const kept = entries.flatMap((entry, i) => (entry.fits && isKept(entry) ? [i] : []));
  if (kept.length === 0) return null;
  kept.sort(
    (a, b) => entries[a]!.areaMm2 - entries[b]!.areaMm2 || entries[a]!.kgPerM - entries[b]!.kgPerM || a - b,
  );
  return nodeOf(kept, entries);
}

function nodeOf(sets: readonly number[], entries: readonly FaceEntry[]): SetNode {
  if (sets.length === 1) return leafOf(sets, entries[sets[0]!]!);
  const half = sets.length >>> 1;
  const left = nodeOf(sets.slice(0, half), entries);
  const right = nodeOf(sets.slice(half), entries);
  return {
    sets,
    left,
    right,
    leastAreaMm2: Math.min(left.leastAreaMm2, right.leastAreaMm2),
    mostAreaMm2: Math.max(left.mostAreaMm2, right.mostAreaMm2),
    leastKgPerM: Math.min(left.leastKgPerM, right.leastKgPerM),
    leastKgPerMm2: Math.min(left.leastKgPerMm2, right.leastKgPerMm2),
    fewestBars: Math.min(left.fewestBars, right.fewestBars),
    nearestMm: Math.min(left.nearestMm, right.nearestMm),
    leastCentroidMm: Math.min(left.leastCentroidMm, right.leastCentroidMm),
    mostCentroidMm: Math.max(left.mostCentroidMm, right.mostCentroidMm),
    furthestMm: Math.max(left.furthestMm, right.furthestMm),
    mostSpreadMm: Math.max(left.mostSpreadMm, right.mostSpreadMm),
    leastShare: Math.min(left.leastShare, right.leastShare),
    mostShare: Math.max(left.mostShare, right.mostShare),
    leastReachMm: Math.min(left.leastReachMm, right.leastReachMm),
  };
}

function leafOf(sets: readonly number[], entry: FaceEntry): SetNode {
  const { layerCount, offsets } = entry;
  // An empty face has no layer: beside others it widens no range, and alone it bounds nothing, its area being zero.
  const hasSteel = layerCount > 0;
  const nearestMm = hasSteel ? offsets[0]! : Infinity;
  const furthestMm = hasSteel ? offsets[layerCount - 1]! : 0;
  return {
    sets,
    left: null,
    right: null,
    leastAreaMm2: entry.areaMm2,
    mostAreaMm2: entry.areaMm2,
    leastKgPerM: entry.kgPerM,
    leastKgPerMm2: entry.areaMm2 > 0 ? entry.kgPerM / entry.areaMm2 : 0,
    fewestBars: entry.barCount,
    nearestMm,
    leastCentroidMm: hasSteel ? entry.centroidOffsetMm : Infinity,
    mostCentroidMm: hasSteel ? entry.centroidOffsetMm : 0,
    furthestMm,
    mostSpreadMm: hasSteel ? furthestMm - nearestMm : 0,
    leastShare: entry.shareOfDepth,
    mostShare: entry.shareOfDepth,
    leastReachMm: entry.reachMm,
  };
}
