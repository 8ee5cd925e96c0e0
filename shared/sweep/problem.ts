import type { MeasureId } from '../engine/measures.ts';
import type { BarGroup, DesignBasis, Demand, Flange, Stirrup, UserRules } from '../engine/section.ts';

/** A range typed by a person: from, from + step, … up to and including `to` (within 1e-6 of a step). */
export interface StepRange {
  readonly kind: 'range';
  readonly from: number;
  readonly to: number;
  readonly step: number;
}
/** Explicit values. */
export interface ValueList {
  readonly kind: 'list';
  readonly values: readonly number[];
}
export type AxisDefinition = StepRange | ValueList;

/** Counts × sizes of bars for one face; `none` adds the empty group as one more set. */
export interface BarSetsDefinition {
  readonly kind: 'bars';
  readonly sizes: readonly string[];
  readonly counts: readonly number[];
  readonly none: boolean;
  /** Further groups as listed, for two sizes at one face. */
  readonly mixed?: readonly BarGroup[] | undefined;
}
/** Steel given as plain areas in one layer, as published problems state it. */
export interface AreaSetsDefinition {
  readonly kind: 'areas';
  readonly areasMm2: readonly number[];
  /** Distance of the layer from its own face: mm, or a share of h. */
  readonly at: { readonly offsetMm: number } | { readonly shareOfDepth: number };
}
export type SteelSetsDefinition = BarSetsDefinition | AreaSetsDefinition;

/** The design space as the user defines it and as it is stored. Lengths mm, stresses MPa. */
export interface SpaceDefinition {
  readonly width: AxisDefinition;
  readonly depth: AxisDefinition;
  readonly fc: AxisDefinition;
  readonly fy: AxisDefinition;
  readonly cover: AxisDefinition;
  readonly stirrups: readonly (Stirrup | null)[];
  readonly tension: SteelSetsDefinition;
  readonly compression: SteelSetsDefinition;
  /** One slab for the whole space. */
  readonly flange?: Flange | null | undefined;
}

/** One choice of steel on one face, expanded. */
export type SteelSet =
  | { readonly kind: 'bars'; readonly bars: BarGroup }
  | {
      readonly kind: 'area';
      readonly areaMm2: number;
      readonly at: { readonly offsetMm: number } | { readonly shareOfDepth: number };
    };

/**
 * The expanded space: a product of axes. Index → section in mixed radix, outermost first:
 * width, cover, stirrup, tension set, compression set, fy, f′c, depth (innermost).
 */
export interface Space {
  readonly widthsMm: readonly number[];
  readonly coversMm: readonly number[];
  readonly stirrups: readonly (Stirrup | null)[];
  readonly tension: readonly SteelSet[];
  readonly compression: readonly SteelSet[];
  readonly fyMPa: readonly number[];
  readonly fcMPa: readonly number[];
  readonly depthsMm: readonly number[];
  readonly flange: Flange | null;
  /** Product of the axis lengths. */
  readonly size: number;
}

/** What the chart and the front compare: x is the leading measure. With z there is a front in three measures as well. */
export interface View {
  readonly x: MeasureId;
  readonly y: MeasureId;
  readonly z?: MeasureId | null | undefined;
}

/** The view alone, as results name it: without a third measure there is no z at all, also in what is hashed. */
export const viewOf = ({ x, y, z }: View): View => (z === undefined || z === null ? { x, y } : { x, y, z });

export const isSameView = (a: View, b: View): boolean =>
  a.x === b.x && a.y === b.y && (a.z ?? null) === (b.z ?? null);

/** Everything a run freezes: with it and an index, any section can be recomputed anywhere. */
export interface SweepProblem {
  readonly space: SpaceDefinition;
  readonly basis: DesignBasis;
  readonly demand: Demand;
  readonly rules: UserRules;
}
