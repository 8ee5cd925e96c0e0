import type { Router } from 'express';
import type { EvaluateInput } from '#shared/contract/records.ts';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import type { Evaluation } from '#shared/engine/evaluation.ts';
import { InvalidSectionError } from '#shared/engine/preconditions.ts';
import type { DesignBasis } from '#shared/engine/section.ts';
import type { Deps } from '../../deps.ts';
import { invalidInput } from '../../errors.ts';
import { bind } from '../../http/bind.ts';
import { frozenBasis } from '../../http/frozen-basis.ts';
import { hideCosts } from '../../http/hide-costs.ts';
import { canSeeRates, requireReadableProject } from '../../http/project-access.ts';

/** A typed section judged on the project's basis; nothing is stored. */
export function registerEvaluationRoutes(router: Router, deps: Deps): void {
  bind(router, deps, 'evaluate', async ({ person, params, body, deps: { db } }) => {
    const project = await requireReadableProject(db, person, { projectId: params.id, what: 'Project' });
    const evaluation = evaluate(body, { ...frozenBasis(project), ...withoutUndefined(body.basis) });
    return { section: body.section, evaluation: canSeeRates(person) ? evaluation : hideCosts(evaluation) };
  });
}

function evaluate({ section, demand, rules }: EvaluateInput, basis: DesignBasis): Evaluation {
  try {
    return evaluateSection(section, { basis, demand, rules });
  } catch (error) {
    if (error instanceof InvalidSectionError)
      throw invalidInput([{ path: ['section', ...error.path], message: error.message }]);
    throw error;
  }
}

/** A key without a value does not override the project's. */
function withoutUndefined<T extends object>(values: T): { [K in keyof T]?: NonNullable<T[K]> } {
  const entries = Object.entries(values).filter(([, value]) => value !== undefined);
  return Object.fromEntries(entries) as { [K in keyof T]?: NonNullable<T[K]> };
}
