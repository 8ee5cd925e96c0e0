import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import { expandAxis } from '#shared/sweep/axis.ts';
import type { AxisDefinition } from '#shared/sweep/problem.ts';
import type { EdgeAxis, ViewResult } from '#shared/sweep/result.ts';
import { EDGE_AXES } from '#shared/sweep/result.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import type { SectionSource } from './section-source.ts';

/** A range that stops where the best still improves. */
export interface EdgeFinding {
  readonly axis: EdgeAxis;
  readonly end: 'low' | 'high';
  /** The end itself, mm or MPa. */
  readonly value: number;
  readonly isBestThere: boolean;
  /** Part of the front that lies there. */
  readonly share: number;
  /** The sweep with the range carried on past that end; null where a demand or a rule draws the line. */
  readonly extended: { readonly definition: SweepDefinition; readonly to: number } | null;
}

/** From this part of the front on the end holds the front, not one section of it. */
const PINNED_SHARE = 0.5;
/** A range is carried on by so many of its steps at most, and by no more than this share of its end (but one step). */
const MOST_STEPS_ON = 4;
const SHARE_ON = 0.26;
/** No beam is formed narrower or shallower, mm, and no code's concrete is outside these strengths, MPa. Common practice, no source. */
const BOUNDS: Readonly<Record<EdgeAxis, { readonly low: number; readonly high: number }>> = {
  width: { low: 100, high: 3000 },
  depth: { low: 100, high: 4000 },
  fc: { low: 17, high: 100 },
};
const SLACK = 1e-6;

const VALUE_ON: Readonly<Record<EdgeAxis, (section: SectionInput) => number>> = {
  width: (section) => section.widthMm,
  depth: (section) => section.depthMm,
  fc: (section) => section.fcMPa,
};

/** The axis with up to four more values past one end; null where none is left within the bounds. */
export function carriedOn(
  axis: AxisDefinition,
  end: 'low' | 'high',
  bounds: { readonly low: number; readonly high: number },
): { readonly axis: AxisDefinition; readonly to: number } | null {
  const values = expandAxis(axis);
  const edge = end === 'low' ? values[0] : values.at(-1);
  const next = end === 'low' ? values[1] : values.at(-2);
  if (edge === undefined || next === undefined) return null;
  const step = axis.kind === 'range' ? axis.step * (end === 'low' ? -1 : 1) : edge - next;
  const steps = Math.min(MOST_STEPS_ON, Math.max(1, Math.floor((edge * SHARE_ON) / Math.abs(step))));
  const added = Array.from({ length: steps }, (_, k) => edge + (k + 1) * step).filter(
    (value) => value >= bounds.low && value <= bounds.high,
  );
  const to = added.at(-1);
  if (to === undefined) return null;
  if (axis.kind === 'list')
    return { axis: { kind: 'list', values: [...values, ...added].sort((a, b) => a - b) }, to };
  return { axis: end === 'low' ? { ...axis, from: to } : { ...axis, to }, to };
}

/** Whether a demand or a rule, and not the range, holds this end. */
function isHeld(definition: SweepDefinition, axis: EdgeAxis, end: 'low' | 'high', value: number): boolean {
  const { depthCapMm } = definition.demand;
  if (axis === 'width') return definition.rules.columnWidthMm !== null;
  return axis === 'depth' && end === 'high' && depthCapMm !== null && value >= depthCapMm * (1 - SLACK);
}

/** Ends of ranges at which the best lies, or half of the front; those that hold most of the front first. */
export function edgeFindings(
  result: ViewResult,
  definition: SweepDefinition,
  source: SectionSource,
): readonly EdgeFinding[] {
  const best = result.front[0];
  if (best === undefined) return [];
  const places = best.ties.map((index) => source.sectionAt(index));
  const found = EDGE_AXES.flatMap((axis) => {
    const values = expandAxis(definition.space[axis]);
    if (values.length < 2) return [];
    return (['low', 'high'] as const).flatMap((end): EdgeFinding[] => {
      const value = end === 'low' ? values[0]! : values.at(-1)!;
      const share = result.edges.find((edge) => edge.axis === axis && edge.end === end)?.share ?? 0;
      const isBestThere =
        best.tieCount === best.ties.length &&
        places.every((section) => Math.abs(VALUE_ON[axis](section) - value) <= SLACK * value);
      if ((!isBestThere && share < PINNED_SHARE) || isHeld(definition, axis, end, value)) return [];
      const further = carriedOn(definition.space[axis], end, BOUNDS[axis]);
      const space = further === null ? null : { ...definition.space, [axis]: further.axis };
      const extended =
        further === null || space === null ? null : { definition: { ...definition, space }, to: further.to };
      return [{ axis, end, value, isBestThere, share, extended }];
    });
  });
  return found.toSorted((a, b) => Number(b.isBestThere) - Number(a.isBestThere) || b.share - a.share);
}
