import { getBar, type Bar } from './bars.ts';
import type { Arrangement, FaceArrangement, PlacedBar } from './evaluation.ts';
import { splitIntoLayers, type LayerBars, type SizedCount } from './layer-split.ts';
import { isWithinLength } from './limits.ts';
import type { RuleSet } from './rules/rule-set.ts';
import type { BarGroup, BarStandard, BendAllowance, Face } from './section.ts';

/** What the place of a bar depends on besides the group itself. Lengths mm. */
export interface ArrangementContext {
  readonly rules: RuleSet;
  readonly barStandard: BarStandard;
  readonly widthMm: number;
  readonly coverMm: number;
  /** Null without stirrups: the cover is then to the bars. */
  readonly stirrupBar: Bar | null;
  readonly maxAggregateMm: number;
  readonly bendAllowance: BendAllowance;
  readonly maxLayers: number;
  /** Outside of a bar over its nominal diameter, for widths, gaps and reach; depths and areas stay nominal. 1 unless set. */
  readonly barOversize?: number | undefined;
}

/** One face's group in layers; offsets are measured from its own face to the layer's centroid, nearest layer first. */
export interface FaceLayers {
  readonly report: FaceArrangement;
  readonly layers: readonly {
    readonly offsetMm: number;
    readonly areaMm2: number;
    readonly bars: readonly { readonly bar: Bar; readonly xMm: number; readonly offsetMm: number }[];
  }[];
  /** Centroid of the group from its face; 0 for an empty group. */
  readonly centroidOffsetMm: number;
  readonly areaMm2: number;
  /** From the face to the inner edge of the innermost layer; to the inside of the stirrup for an empty group. */
  readonly reachMm: number;
  /** Clear gap this group asks of the layer next to it. */
  readonly layerGapMm: number;
}

/**
 * Places one group: in layers from its face inwards, corner bars against the stirrup's legs or in its bends.
 * Clear gaps by the rule set (ACI 318 25.2.1, 25.2.2); the corner-bar convention is that of the classic minimum-width
 * tables (common practice).
 * @throws InvalidSectionError for an unknown bar.
 */
export function arrangeFace(face: Face, group: BarGroup, context: ArrangementContext): FaceLayers {
  const sized = group
    .map(({ bar, count }, i) => ({
      bar: getBar(context.barStandard, bar, ['reinforcement', face, i, 'bar']),
      count,
    }))
    .sort((a, b) => b.bar.diameterMm - a.bar.diameterMm);
  const total = sized.reduce((sum, { count }) => sum + count, 0);
  if (total === 0) return emptyFace(face, legInnerMm(context, oversizeOf(context)));
  const largest = sized[0]!.bar.diameterMm;
  const gapMm = context.rules.barGapMm(largest, context.maxAggregateMm);
  const needed = (layer: LayerBars) => widthNeeded(layer, gapMm, context);
  const layers = splitIntoLayers(sized, context.maxLayers, (layer) =>
    isWithinLength(needed(layer), context.widthMm),
  );
  if (!layers)
    return rejectedFace(face, {
      sized,
      total,
      gapMm,
      needed,
      maxLayers: context.maxLayers,
      leastMm: leastForStirrupMm(context.coverMm, context.stirrupBar, context.rules),
    });
  return placedFace(face, layers, gapMm, context);
}

/** Inside face of the stirrup leg to the concrete surface, with ribs where `oversize` is above 1. */
function legInnerMm({ coverMm, stirrupBar }: ArrangementContext, oversize: number): number {
  return coverMm + (stirrupBar ? oversize * stirrupBar.diameterMm : 0);
}

const oversizeOf = ({ barOversize = 1 }: ArrangementContext) => barOversize;

/** Corner-bar centre from the concrete's side. */
function cornerMm(diameterMm: number, context: ArrangementContext): number {
  const radius =
    context.stirrupBar && context.bendAllowance === 'corner-in-bend'
      ? context.rules.bendRadiusMm(context.stirrupBar.diameterMm)
      : 0;
  const oversize = oversizeOf(context);
  return legInnerMm(context, oversize) + Math.max(radius, (oversize * diameterMm) / 2);
}

/** Outsides of a layer's bars between the centres of its corner bars, mm. */
const insideMm = (layer: LayerBars, context: ArrangementContext) =>
  oversizeOf(context) * (layer.reduce((sum, bar) => sum + bar.diameterMm, 0) - layer[0]!.diameterMm);

function widthNeeded(layer: LayerBars, gapMm: number, context: ArrangementContext): number {
  return 2 * cornerMm(layer[0]!.diameterMm, context) + insideMm(layer, context) + (layer.length - 1) * gapMm;
}

function emptyFace(face: Face, reachMm: number): FaceLayers {
  const report = {
    face,
    fits: true,
    layerCounts: [],
    clearGapMm: null,
    largestSpacingMm: null,
    requiredGapMm: 0,
    widthNeededMm: 0,
    reason: 'no bars',
  };
  return { report, layers: [], centroidOffsetMm: 0, areaMm2: 0, reachMm, layerGapMm: 0 };
}

interface Rejection {
  readonly sized: readonly SizedCount[];
  readonly total: number;
  readonly gapMm: number;
  readonly needed: (layer: LayerBars) => number;
  readonly maxLayers: number;
  /** Width the stirrup itself needs. */
  readonly leastMm: number;
}

function rejectedFace(
  face: Face,
  { sized, total, gapMm, needed, maxLayers, leastMm }: Rejection,
): FaceLayers {
  // The least width is that of the split whose longest layer is shortest.
  let widthNeededMm = Infinity;
  for (
    let longest = Math.ceil(total / maxLayers);
    longest <= total && widthNeededMm === Infinity;
    longest++
  ) {
    const split = splitIntoLayers(sized, maxLayers, (layer) => layer.length <= longest);
    if (split) widthNeededMm = Math.max(...split.map(needed));
  }
  const isPlaceable = widthNeededMm < Infinity;
  const reason = isPlaceable
    ? `${total} bars at the ${face} face need more width for at most ${layerWord(maxLayers)}, symmetrical and in line`
    : `${total} ${total === 1 ? 'bar' : 'bars'} at the ${face} face cannot stand in symmetrical layers of two or more`;
  const report = {
    face,
    fits: false,
    layerCounts: [],
    clearGapMm: null,
    largestSpacingMm: null,
    requiredGapMm: gapMm,
    widthNeededMm: isPlaceable ? Math.max(widthNeededMm, leastMm) : 0,
    reason,
  };
  return { report, layers: [], centroidOffsetMm: 0, areaMm2: 0, reachMm: 0, layerGapMm: 0 };
}

const layerWord = (count: number) => (count === 1 ? 'one layer' : `${count} layers`);

function placedFace(
  face: Face,
  layers: readonly LayerBars[],
  gapMm: number,
  context: ArrangementContext,
): FaceLayers {
  const columns = columnsOf(layers[0]!, context);
  let clearGapMm = Infinity;
  const layerGapMm = context.rules.layerGapMm(layers[0]![0]!.diameterMm, context.maxAggregateMm);
  const oversize = oversizeOf(context);
  let inner = legInnerMm(context, 1);
  let reachMm = legInnerMm(context, oversize);
  const placed = layers.map((layer, i) => {
    if (i > 0) {
      inner += layerGapMm;
      reachMm += layerGapMm;
    }
    const deepest = Math.max(...layer.map((bar) => bar.diameterMm));
    const xs = inLine(columns, layer.length);
    for (let j = 1; j < layer.length; j++)
      clearGapMm = Math.min(
        clearGapMm,
        xs[j]! - xs[j - 1]! - (oversize * (layer[j]!.diameterMm + layer[j - 1]!.diameterMm)) / 2,
      );
    const bars = layer.map((bar, j) => ({ bar, xMm: xs[j]!, offsetMm: inner + bar.diameterMm / 2 }));
    inner += deepest;
    reachMm += oversize * deepest;
    return { ...centroidOf(bars), bars };
  });
  const { offsetMm: centroidOffsetMm, areaMm2 } =
    placed.length === 1 ? placed[0]! : centroidOf(placed.flatMap((layer) => layer.bars));
  const report = {
    face,
    fits: true,
    layerCounts: layers.map((layer) => layer.length),
    clearGapMm,
    largestSpacingMm: Math.max(...columns.slice(1).map((x, i) => x - columns[i]!)),
    requiredGapMm: gapMm,
    widthNeededMm: widthNeeded(layers[0]!, gapMm, context),
    reason: `${layers.map((layer) => layer.length).join(' + ')} in ${layerWord(layers.length)}`,
  };
  return { report, layers: placed, centroidOffsetMm, areaMm2, reachMm, layerGapMm };
}

/** Centres of the layer nearest the face: corners first, equal clear gaps between. */
function columnsOf(layer: LayerBars, context: ArrangementContext): readonly number[] {
  const oversize = oversizeOf(context);
  const corner = cornerMm(layer[0]!.diameterMm, context);
  const gap = (context.widthMm - 2 * corner - insideMm(layer, context)) / (layer.length - 1);
  const columns = [corner];
  for (let i = 1; i < layer.length; i++)
    columns.push(columns[i - 1]! + gap + (oversize * (layer[i]!.diameterMm + layer[i - 1]!.diameterMm)) / 2);
  return columns;
}

/** The outermost pairs of columns, and the middle one for an odd count. */
function inLine(columns: readonly number[], count: number): readonly number[] {
  const half = Math.floor(count / 2);
  const left = columns.slice(0, half);
  const middle = count % 2 === 1 ? [columns[(columns.length - 1) / 2]!] : [];
  return [...left, ...middle, ...columns.slice(columns.length - half)];
}

function centroidOf(bars: readonly { readonly bar: Bar; readonly offsetMm: number }[]): {
  offsetMm: number;
  areaMm2: number;
} {
  let areaMm2 = 0;
  let moment = 0;
  for (const { bar, offsetMm } of bars) {
    areaMm2 += bar.areaMm2;
    moment += bar.areaMm2 * offsetMm;
  }
  const first = bars[0]!.offsetMm;
  const isLevel = bars.every((bar) => bar.offsetMm === first);
  return { offsetMm: isLevel ? first : moment / areaMm2, areaMm2 };
}

/** Least overall depth at which two groups keep a layer's clear gap between them, and a single one its far cover, mm. */
export function depthNeededMm(
  tension: Pick<FaceLayers, 'reachMm' | 'areaMm2' | 'layerGapMm'>,
  compression: Pick<FaceLayers, 'reachMm' | 'areaMm2' | 'layerGapMm'>,
): number {
  const hasBoth = tension.areaMm2 > 0 && compression.areaMm2 > 0;
  return (
    tension.reachMm +
    (hasBoth ? Math.max(tension.layerGapMm, compression.layerGapMm) : 0) +
    compression.reachMm
  );
}

/** Both faces with coordinates from the left side and the compression face. */
export function arrangementReport(
  depthMm: number,
  tension: FaceLayers,
  compression: FaceLayers,
  context: ArrangementContext,
): Arrangement {
  const needed = depthNeededMm(tension, compression);
  const isDeepEnough = isWithinLength(needed, depthMm);
  const fits = tension.report.fits && compression.report.fits && isDeepEnough;
  const bars: PlacedBar[] = [tension, compression].flatMap((group) =>
    group.layers.flatMap((layer, index) =>
      layer.bars.map(({ bar, xMm, offsetMm }) => ({
        bar: bar.designation,
        xMm,
        yMm: group === tension ? depthMm - offsetMm : offsetMm,
        diameterMm: bar.diameterMm,
        areaMm2: bar.areaMm2,
        face: group.report.face,
        layer: index,
      })),
    ),
  );
  const reasons = [tension.report, compression.report].filter((r) => !r.fits).map((r) => r.reason);
  if (reasons.length === 0 && !isDeepEnough)
    reasons.push('the two groups of bars meet: more depth is needed');
  return {
    bendAllowance: context.bendAllowance,
    fits,
    bars: fits ? bars : [],
    faces: [tension.report, compression.report],
    depthNeededMm: needed,
    bendRadiusMm: context.stirrupBar ? context.rules.bendRadiusMm(context.stirrupBar.diameterMm) : 0,
    reason: fits ? 'every bar has its place' : reasons.join('; '),
  };
}

/** Least width and depth in which a stirrup can be bent inside its cover, mm; 0 without stirrup. */
export function leastForStirrupMm(coverMm: number, stirrupBar: Bar | null, rules: RuleSet): number {
  if (!stirrupBar) return 0;
  return 2 * (coverMm + stirrupBar.diameterMm + rules.bendRadiusMm(stirrupBar.diameterMm));
}
