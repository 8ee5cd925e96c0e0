import { arrangeFace, type ArrangementContext } from '../engine/arrangement.ts';
import { getBar } from '../engine/bars.ts';
import { barRuleBreach, barTotal } from '../engine/checks.ts';
import { throughBars } from '../engine/checks-seismic.ts';
import { STEEL_KG_PER_M_PER_MM2 } from '../engine/quantities.ts';
import type { BarStandard, Face, UserRules } from '../engine/section.ts';
import type { SteelSet } from './problem.ts';

/** One steel set of one face in one width, cover and stirrup: what the hot loop needs of it, flat. mm, mm², kg/m. */
export interface FaceEntry {
  readonly fits: boolean;
  readonly layerCount: number;
  /** Offset of each layer's centroid from its own face, nearest first; unused where `shareOfDepth` is not zero. */
  readonly offsets: Float64Array;
  readonly areas: Float64Array;
  readonly centroidOffsetMm: number;
  /** Area of the placed layers. */
  readonly areaMm2: number;
  /** Area of the bars, placed or not. */
  readonly givenAreaMm2: number;
  readonly reachMm: number;
  readonly layerGapMm: number;
  /** Offset as a share of h, for plain areas stated so; else 0. */
  readonly shareOfDepth: number;
  readonly kgPerM: number;
  /** Bars; NaN for plain areas. */
  readonly barCount: number;
  readonly breaksBarRules: boolean;
  /** Largest centre spacing nearest the face; NaN for plain areas and unplaced bars. */
  readonly largestSpacingMm: number;
  /** Smallest and largest bar; NaN without bars. */
  readonly leastBarMm: number;
  readonly largestBarMm: number;
  /** Bars of the diameter that has to run through the beam; NaN for plain areas. */
  readonly throughBars: number;
}

/** What the bars of a set are judged by besides their place. */
interface FaceRules {
  readonly rules: UserRules;
  /** Least diameter of bars that run through, mm. */
  readonly throughMm: number;
}

/** Weight and bars of a set, wherever it is placed. */
export function amountsOfSet(set: SteelSet, standard: BarStandard): Pick<FaceEntry, 'kgPerM' | 'barCount'> {
  if (set.kind === 'area') return amountsOfArea(set.areaMm2);
  const kgPerM = set.bars.reduce((sum, { bar, count }) => sum + count * getBar(standard, bar).massKgPerM, 0);
  return { kgPerM, barCount: barTotal(set.bars) };
}

const amountsOfArea = (areaMm2: number) => ({
  kgPerM: areaMm2 > 0 ? areaMm2 * STEEL_KG_PER_M_PER_MM2 : 0,
  barCount: NaN,
});

/** The entry of every set of one face. */
export function faceTable(
  face: Face,
  sets: readonly SteelSet[],
  context: ArrangementContext,
  judged: FaceRules,
): readonly FaceEntry[] {
  return sets.map((set) =>
    set.kind === 'area' ? areaEntry(set) : barEntry(face, set.bars, context, judged),
  );
}

function barEntry(
  face: Face,
  bars: Extract<SteelSet, { kind: 'bars' }>['bars'],
  context: ArrangementContext,
  { rules, throughMm }: FaceRules,
): FaceEntry {
  const placed = arrangeFace(face, bars, context);
  const sum = (of: (designation: string, count: number) => number) =>
    bars.reduce((total, { bar, count }) => total + of(bar, count), 0);
  const diameters = bars.map(({ bar }) => getBar(context.barStandard, bar).diameterMm);
  return {
    fits: placed.report.fits,
    layerCount: placed.layers.length,
    offsets: Float64Array.from(placed.layers, (layer) => layer.offsetMm),
    areas: Float64Array.from(placed.layers, (layer) => layer.areaMm2),
    centroidOffsetMm: placed.centroidOffsetMm,
    areaMm2: placed.areaMm2,
    givenAreaMm2: sum((bar, count) => count * getBar(context.barStandard, bar).areaMm2),
    reachMm: placed.reachMm,
    layerGapMm: placed.layerGapMm,
    shareOfDepth: 0,
    ...amountsOfSet({ kind: 'bars', bars }, context.barStandard),
    breaksBarRules: barRuleBreach(bars, rules) !== null,
    largestSpacingMm: placed.report.largestSpacingMm ?? NaN,
    leastBarMm: bars.length > 0 ? Math.min(...diameters) : NaN,
    largestBarMm: bars.length > 0 ? Math.max(...diameters) : NaN,
    throughBars: throughBars(bars, context.barStandard, throughMm),
  };
}

function areaEntry({ areaMm2, at }: Extract<SteelSet, { kind: 'area' }>): FaceEntry {
  const isShare = 'shareOfDepth' in at;
  const hasSteel = areaMm2 > 0;
  const offsetMm = isShare ? 0 : at.offsetMm;
  return {
    fits: true,
    layerCount: hasSteel ? 1 : 0,
    offsets: Float64Array.of(offsetMm),
    areas: Float64Array.of(areaMm2),
    centroidOffsetMm: offsetMm,
    areaMm2,
    givenAreaMm2: areaMm2,
    reachMm: 0,
    layerGapMm: 0,
    shareOfDepth: isShare ? at.shareOfDepth : 0,
    ...amountsOfArea(areaMm2),
    breaksBarRules: false,
    largestSpacingMm: NaN,
    leastBarMm: NaN,
    largestBarMm: NaN,
    throughBars: NaN,
  };
}
