import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Issue } from '#shared/contract/errors.ts';
import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import { InvalidSectionError } from '#shared/engine/preconditions.ts';
import type { DesignBasis } from '#shared/engine/section.ts';
import { sizeRefusal } from '#shared/sweep/size-limit.ts';
import { expandSpace } from '#shared/sweep/space.ts';
import { invalidInput, tooManySections } from '../../errors.ts';
import { findMissingInputs } from './available-measures.ts';

/** Refuses a definition that cannot be run as it is, naming the fields of the sweep's form. */
export function requireRunnable(definition: SweepDefinition, basis: DesignBasis, units: UnitSystem): void {
  const { space, demand, rules, view } = definition;
  const refusal = sizeRefusal(definition, basis);
  if (refusal !== null)
    throw tooManySections(
      refusal.message,
      refusal.issues.map(({ path, message }) => ({ path: ['definition', ...path], message })),
    );
  const problem = { space, demand, rules, basis };
  const issues = [
    ...findBrokenSpace(definition, basis),
    ...findMissingInputs(view, { problem, units, path: ['definition', 'view'] }),
  ];
  if (issues.length > 0) throw invalidInput(issues);
}

/** An empty axis, or a bar of another standard than the basis has now. */
function findBrokenSpace({ space }: SweepDefinition, basis: DesignBasis): Issue[] {
  try {
    expandSpace(space, basis.barStandard);
    return [];
  } catch (error) {
    if (!(error instanceof InvalidSectionError)) throw error;
    return [{ path: ['definition', 'space', ...error.path], message: error.message }];
  }
}
