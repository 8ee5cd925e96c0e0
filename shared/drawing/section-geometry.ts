import { findBar } from '../engine/bars.ts';
import type { Evaluation, PlacedBar } from '../engine/evaluation.ts';
import type { BarStandard, Face, SectionInput } from '../engine/section.ts';
import { codeSymbols } from '../print/code-symbols.ts';
import { isHogging } from '../print/face-word.ts';
import { concreteOutline, drawnFlange, type DrawnFlange, type OutlinePoint } from './concrete-outline.ts';

/**
 * Everything in mm: x from the left side of the web, y downwards from the top as the beam lies. The engine's depths run
 * from the compression face, which is at the bottom in hogging.
 */
export interface SectionGeometry {
  /** Width of the web. */
  readonly widthMm: number;
  readonly depthMm: number;
  readonly isHogging: boolean;
  readonly flange: DrawnFlange | null;
  readonly outline: readonly OutlinePoint[];
  /** Ends of what is drawn: the slab's, or the web's own. */
  readonly leftMm: number;
  readonly rightMm: number;
  readonly fits: boolean;
  /** Why the bars cannot be placed; empty when they can. */
  readonly reason: string;
  readonly stirrup: StirrupOutline | null;
  readonly bars: readonly BarCircle[];
  /** Side bars of a deep beam; drawn, and not counted in strength. */
  readonly skinBars: readonly (BarCircle & { readonly bar: string })[];
  readonly bands: readonly LayerBand[];
  readonly rows: readonly BarRow[];
  /** Depth of the axis from the compression face, and the letter the code gives it: c, or x. */
  readonly neutralAxisMm: number | null;
  readonly axisSymbol: string;
  /** Depth d from the compression face. */
  readonly effectiveDepthMm: number | null;
  readonly coverMm: number;
}

/** Centre line of the closed stirrup. */
export interface StirrupOutline {
  readonly xMm: number;
  readonly yMm: number;
  readonly widthMm: number;
  readonly heightMm: number;
  readonly cornerRadiusMm: number;
  readonly legThicknessMm: number;
  /** Along the beam: as given, or as it was designed for this section. */
  readonly spacingMm: number;
  /** Centre lines of the legs between the outer two. */
  readonly innerLegsMm: readonly number[];
}

export interface BarCircle {
  readonly xMm: number;
  readonly yMm: number;
  readonly radiusMm: number;
}

/** A plain layer of steel, drawn as a band of its own area at its own depth: it has no bars to draw. */
export interface LayerBand {
  readonly xMm: number;
  readonly yMm: number;
  readonly widthMm: number;
  readonly heightMm: number;
  readonly areaMm2: number;
  readonly face: Face;
}

/** One layer of bars, from left to right. */
export interface BarRow {
  readonly face: Face;
  readonly layer: number;
  readonly yMm: number;
  readonly leftMm: number;
  readonly rightMm: number;
  /** Concrete between neighbouring bars, from left to right. */
  readonly clearGaps: readonly { readonly fromMm: number; readonly toMm: number }[];
  readonly groups: readonly { readonly bar: string; readonly count: number }[];
}

/** Without a stirrup or with a size nobody rolls there is no leg to draw. */
function stirrupOutline(
  section: SectionInput,
  bendRadiusMm: number,
  standard: BarStandard,
): StirrupOutline | null {
  if (section.stirrup === null) return null;
  const bar = findBar(standard, section.stirrup.bar);
  if (bar === undefined) return null;
  const ds = bar.diameterMm;
  const inset = section.coverMm + ds / 2;
  const widthMm = section.widthMm - 2 * inset;
  const heightMm = section.depthMm - 2 * inset;
  if (widthMm <= ds || heightMm <= ds) return null;
  const inner = Math.max(0, section.stirrup.legs - 2);
  return {
    xMm: inset,
    yMm: inset,
    widthMm,
    heightMm,
    cornerRadiusMm: Math.min(bendRadiusMm + ds / 2, widthMm / 2, heightMm / 2),
    legThicknessMm: ds,
    spacingMm: section.stirrup.spacingMm,
    innerLegsMm: Array.from({ length: inner }, (_, k) => inset + (widthMm * (k + 1)) / (inner + 1)),
  };
}

function barRows(evaluation: Evaluation, drawnY: DrawnY): BarRow[] {
  const byRow = new Map<string, PlacedBar[]>();
  for (const bar of evaluation.arrangement?.bars ?? []) {
    const key = `${bar.face} ${bar.layer}`;
    byRow.set(key, [...(byRow.get(key) ?? []), bar]);
  }
  return [...byRow.values()].map((row) => {
    const bars = row.toSorted((a, b) => a.xMm - b.xMm);
    const first = bars[0]!;
    const last = bars.at(-1)!;
    const counts = new Map<string, number>();
    for (const { bar } of bars) counts.set(bar, (counts.get(bar) ?? 0) + 1);
    return {
      face: first.face,
      layer: first.layer,
      yMm: drawnY(bars.reduce((sum, bar) => sum + bar.yMm, 0) / bars.length),
      leftMm: first.xMm - first.diameterMm / 2,
      rightMm: last.xMm + last.diameterMm / 2,
      clearGaps: bars.slice(1).map((bar, k) => ({
        fromMm: bars[k]!.xMm + bars[k]!.diameterMm / 2,
        toMm: bar.xMm - bar.diameterMm / 2,
      })),
      groups: [...counts].map(([bar, count]) => ({ bar, count })),
    };
  });
}

function layerBands(section: SectionInput, drawnY: DrawnY): LayerBand[] {
  if (section.reinforcement.kind !== 'layers') return [];
  const xMm = Math.min(section.coverMm, section.widthMm / 4);
  const widthMm = section.widthMm - 2 * xMm;
  return section.reinforcement.layers
    .filter((layer) => layer.areaMm2 > 0)
    .map((layer) => {
      const heightMm = layer.areaMm2 / widthMm;
      return {
        xMm,
        yMm: drawnY(layer.depthMm) - heightMm / 2,
        widthMm,
        heightMm,
        areaMm2: layer.areaMm2,
        face: layer.face,
      };
    });
}

/** Place as drawn of a depth from the compression face. */
type DrawnY = (depthMm: number) => number;

/** What there is to draw of one evaluated section. */
export function sectionGeometry(
  section: SectionInput,
  evaluation: Evaluation,
  standard: BarStandard,
): SectionGeometry {
  const { widthMm, depthMm } = section;
  const arrangement = evaluation.arrangement;
  const fits = arrangement?.fits ?? true;
  const hogs = isHogging(section);
  const drawnY: DrawnY = (depth) => (hogs ? depthMm - depth : depth);
  const resolved = evaluation.flange ?? null;
  const flange = resolved === null ? null : drawnFlange(resolved, widthMm, resolved.widthMm);
  const stirrup = evaluation.stirrups ?? section.stirrup;
  return {
    widthMm,
    depthMm,
    isHogging: hogs,
    flange,
    outline: concreteOutline(widthMm, depthMm, flange),
    leftMm: flange?.leftMm ?? 0,
    rightMm: flange?.rightMm ?? widthMm,
    fits,
    reason: fits ? '' : (arrangement?.reason ?? ''),
    stirrup:
      arrangement === null
        ? null
        : stirrupOutline({ ...section, stirrup }, arrangement.bendRadiusMm, standard),
    bars: fits
      ? (arrangement?.bars ?? []).map((bar) => ({
          xMm: bar.xMm,
          yMm: drawnY(bar.yMm),
          radiusMm: bar.diameterMm / 2,
        }))
      : [],
    skinBars: fits
      ? (evaluation.skin?.bars ?? []).map((bar) => ({
          xMm: bar.xMm,
          yMm: drawnY(bar.yMm),
          radiusMm: bar.diameterMm / 2,
          bar: bar.bar,
        }))
      : [],
    bands: layerBands(section, drawnY),
    rows: fits ? barRows(evaluation, drawnY) : [],
    neutralAxisMm: evaluation.flexure?.neutralAxisMm ?? null,
    axisSymbol: codeSymbols(evaluation.ruleSet.id).axis,
    effectiveDepthMm: evaluation.geometry?.dMm ?? null,
    coverMm: section.coverMm,
  };
}

/** Place of a depth from the compression face in the drawing, which has the top of the beam on top. */
export const drawnDepth = ({ isHogging, depthMm }: SectionGeometry, depth: number): number =>
  isHogging ? depthMm - depth : depth;
