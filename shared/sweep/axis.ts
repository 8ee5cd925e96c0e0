import { InvalidSectionError } from '../engine/preconditions.ts';
import type { AxisDefinition } from './problem.ts';

/** The end of a range counts as reached within this share of a step. */
const STEP_SLACK = 1e-6;
/** Values are rounded to this many per unit, so that 304.8 + 3 × 50.8 is the number a person would type. */
const VALUES_PER_UNIT = 1e9;

/** Number of values of an axis, without making them. NaN for a broken range. */
export function axisLength(axis: AxisDefinition): number {
  if (axis.kind === 'list') return new Set(axis.values).size;
  return Math.floor((axis.to - axis.from) / axis.step + STEP_SLACK) + 1;
}

/**
 * The values of an axis, in its own unit, ascending, each once.
 * @throws InvalidSectionError for an empty list, a step that is not above zero, or an end below the start.
 */
export function expandAxis(axis: AxisDefinition): number[] {
  if (axis.kind === 'list') {
    if (axis.values.length === 0)
      throw new InvalidSectionError('An axis needs at least one value', ['values']);
    return [...new Set(axis.values)].sort((a, b) => a - b);
  }
  if (!(axis.step > 0))
    throw new InvalidSectionError(`The step must be above zero, not ${axis.step}`, ['step']);
  const length = axisLength(axis);
  if (!(length >= 1)) throw new InvalidSectionError('The end of a range is below its start', ['to']);
  return Array.from(
    { length },
    (_, i) => Math.round((axis.from + i * axis.step) * VALUES_PER_UNIT) / VALUES_PER_UNIT,
  );
}
