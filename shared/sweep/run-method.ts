import { isCurveMeasure } from '../engine/curve-basis.ts';
import type { DesignBasis } from '../engine/section.ts';
import type { SpaceDefinition } from './problem.ts';
import { spaceSize } from './space.ts';

/** How a run finds its front: every section evaluated, or the space searched by bounds and most of it ruled out unseen. */
export const RUN_METHODS = ['every-section', 'bounds'] as const;
export type RunMethod = (typeof RUN_METHODS)[number];

/** Largest run in which every section is evaluated: about a minute on two threads. */
export const MAX_SECTIONS_PER_RUN = 200_000_000;
/** The same where μφ is read off the full curve, were every section to meet the other checks: a curve takes some 40 µs. */
const MAX_SECTIONS_WITH_CURVES = 4_000_000;
/** Largest space searched by bounds. */
export const MAX_SECTIONS_BY_BOUNDS = 200_000_000_000;

interface Asked {
  readonly space: SpaceDefinition;
  /** Undefined leaves it to the size. */
  readonly method?: RunMethod | undefined;
}

/**
 * How a sweep is run: as asked, and where nothing is, by bounds only where it is too large to evaluate every section. The
 * full curve has no bounds: a sweep by it is always evaluated.
 */
export function methodOf({ space, method }: Asked, basis: Pick<DesignBasis, 'ductilityMeasure'>): RunMethod {
  if (isCurveMeasure(basis)) return 'every-section';
  return method ?? (spaceSize(space) > MAX_SECTIONS_PER_RUN ? 'bounds' : 'every-section');
}

/** Sections one run may have, by the way it is run. */
export function mostSections(asked: Asked, basis: Pick<DesignBasis, 'ductilityMeasure'>): number {
  if (isCurveMeasure(basis)) return MAX_SECTIONS_WITH_CURVES;
  return methodOf(asked, basis) === 'bounds' ? MAX_SECTIONS_BY_BOUNDS : MAX_SECTIONS_PER_RUN;
}
