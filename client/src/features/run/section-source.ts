import type { Run } from '#shared/contract/records.ts';
import { evaluateSection, type EvaluationContext } from '#shared/engine/evaluate.ts';
import type { Evaluation } from '#shared/engine/evaluation.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import type { Space } from '#shared/sweep/problem.ts';
import { expandSpace, sectionAt } from '#shared/sweep/space.ts';

export interface EvaluatedSection {
  readonly index: number;
  readonly section: SectionInput;
  readonly evaluation: Evaluation;
}

/** Sections of a run by their index, computed here from what the run froze, by the same code as on the server. */
export interface SectionSource {
  readonly size: number;
  readonly space: Space;
  /** What the run judges by. */
  readonly context: EvaluationContext;
  readonly sectionAt: (index: number) => SectionInput;
  readonly evaluatedAt: (index: number) => EvaluatedSection;
}

/** A front and its band are well within it; it keeps a long session from filling memory. */
const MOST_KEPT = 4000;

export function createSectionSource(run: Pick<Run, 'definition' | 'basis'>): SectionSource {
  const space = expandSpace(run.definition.space, run.basis.barStandard);
  const context = { basis: run.basis, demand: run.definition.demand, rules: run.definition.rules };
  const kept = new Map<number, EvaluatedSection>();
  return {
    size: space.size,
    space,
    context,
    sectionAt: (index) => sectionAt(space, index),
    evaluatedAt: (index) => {
      const known = kept.get(index);
      if (known !== undefined) return known;
      const section = sectionAt(space, index);
      const evaluated = { index, section, evaluation: evaluateSection(section, context) };
      if (kept.size >= MOST_KEPT) kept.clear();
      kept.set(index, evaluated);
      return evaluated;
    },
  };
}
