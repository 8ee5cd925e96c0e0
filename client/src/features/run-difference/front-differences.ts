import type { CheckId, Evaluation } from '#shared/engine/evaluation.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import type { Space } from '#shared/sweep/problem.ts';
import type { FrontPoint } from '#shared/sweep/result.ts';
import { placeOfSection, sectionKey } from '#shared/sweep/section-index.ts';
import type { SpaceAxis } from '#shared/sweep/space.ts';

/** What is asked of a run's sections; the run's own source of sections is one. */
export interface JudgedSections {
  readonly space: Space;
  readonly sectionAt: (index: number) => SectionInput;
  readonly evaluatedAt: (index: number) => {
    readonly index: number;
    readonly section: SectionInput;
    readonly evaluation: Evaluation;
  };
}

export interface ComparedFront {
  readonly front: readonly FrontPoint[];
  readonly sections: JudgedSections;
}

export interface FrontDifferences {
  /** On both fronts: the same section, or one that ties with it. */
  readonly kept: readonly { readonly before: FrontPoint; readonly after: FrontPoint }[];
  /** Only on the other run's front. */
  readonly gained: readonly FrontPoint[];
  /** Only on the baseline's front. */
  readonly lost: readonly FrontPoint[];
}

const SAME_SHARE = 1e-9;
const isSame = (a: number, b: number) => Math.abs(a - b) <= SAME_SHARE * Math.max(Math.abs(a), Math.abs(b));

const keysOf = ({ ties }: FrontPoint, { sectionAt }: JudgedSections) =>
  ties.map((index) => sectionKey(sectionAt(index)));

/**
 * Which vertices of two fronts are the same. Indices of two spaces say nothing of each other: sections are told by what they
 * are, and as only some ties are known by name, two vertices with the same two measures are the same as well.
 */
export function frontDifferences(baseline: ComparedFront, other: ComparedFront): FrontDifferences {
  const left = new Set(other.front);
  const byKey = new Map<string, FrontPoint>();
  for (const point of other.front)
    for (const key of keysOf(point, other.sections)) if (!byKey.has(key)) byKey.set(key, point);
  const kept: { before: FrontPoint; after: FrontPoint }[] = [];
  const lost: FrontPoint[] = [];
  for (const before of baseline.front) {
    const known = keysOf(before, baseline.sections)
      .map((key) => byKey.get(key))
      .find((point) => point !== undefined);
    const after =
      known ?? other.front.find((point) => isSame(point.x, before.x) && isSame(point.y, before.y));
    if (after === undefined) lost.push(before);
    else {
      kept.push({ before, after });
      left.delete(after);
    }
  }
  return { kept, gained: other.front.filter((point) => left.has(point)), lost };
}

/** Why a section that is on one run's front is not on the other's. */
export type Absence =
  | { readonly kind: 'outside'; readonly axes: readonly SpaceAxis[] }
  | { readonly kind: 'fails'; readonly checks: readonly CheckId[] }
  | { readonly kind: 'beaten' };

export function absenceOf(section: SectionInput, there: JudgedSections): Absence {
  const place = placeOfSection(there.space, section);
  if (place.kind === 'outside') return place;
  const { checks } = there.evaluatedAt(place.index).evaluation;
  const failed = checks.filter(({ passes }) => !passes).map(({ id }) => id);
  return failed.length > 0 ? { kind: 'fails', checks: failed } : { kind: 'beaten' };
}
