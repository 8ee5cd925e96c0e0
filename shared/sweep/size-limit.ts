import { isCurveMeasure } from '../engine/curve-basis.ts';
import type { DesignBasis } from '../engine/section.ts';
import type { AxisDefinition, SpaceDefinition } from './problem.ts';
import { methodOf, mostSections, type RunMethod } from './run-method.ts';
import { axisLengths, spaceSize } from './space.ts';

const NUMERIC_AXES = ['width', 'depth', 'fc', 'fy', 'cover'] as const;
const AXIS_NAMES = {
  width: 'width b',
  depth: 'depth h',
  fc: 'concrete strength f′c',
  fy: 'yield strength fy',
  cover: 'clear cover',
  tension: 'tension bars',
  compression: 'compression bars',
} as const;
type NamedAxis = keyof typeof AXIS_NAMES;

export interface SizeRefusal {
  readonly message: string;
  /** Paths begin at the sweep's definition: `['space', 'depth', 'step']`. */
  readonly issues: readonly { readonly path: (string | number)[]; readonly message: string }[];
}

const WITH_CURVES = ' where ductility is read off the full curve, which has no bounds to search by';
const OF_EVERY_SECTION = ' with every section evaluated';

const print = (count: number) => count.toLocaleString('en-US');

function longest(axes: readonly NamedAxis[], lengths: Readonly<Record<NamedAxis, number>>): NamedAxis {
  return axes.reduce((best, axis) => (lengths[axis] > lengths[best] ? axis : best));
}

function fieldOf(space: SpaceDefinition, axis: NamedAxis): string {
  if (axis === 'tension' || axis === 'compression') {
    return space[axis].kind === 'bars' ? 'counts' : 'areasMm2';
  }
  const definition: AxisDefinition = space[axis];
  return definition.kind === 'range' ? 'step' : 'values';
}

function wayWords(
  definition: { readonly space: SpaceDefinition; readonly method?: RunMethod | undefined },
  basis: Pick<DesignBasis, 'ductilityMeasure'>,
): string {
  if (isCurveMeasure(basis)) return WITH_CURVES;
  return methodOf(definition, basis) === 'bounds' ? '' : OF_EVERY_SECTION;
}

/** Why a space is too large to run on a basis and which of its axes to coarsen; null where it is not. */
export function sizeRefusal(
  definition: { readonly space: SpaceDefinition; readonly method?: RunMethod | undefined },
  basis: Pick<DesignBasis, 'ductilityMeasure'>,
): SizeRefusal | null {
  const { space } = definition;
  const count = spaceSize(space);
  const most = mostSections(definition, basis);
  if (!(count > most)) return null;
  const lengths = axisLengths(space);
  const numeric = longest(NUMERIC_AXES, lengths);
  // With a single value on every numeric axis there is nothing to coarsen but the steel.
  const axis = lengths[numeric] > 1 ? numeric : longest(['tension', 'compression'], lengths);
  const field = fieldOf(space, axis);
  const remedy = field === 'step' ? 'Use a larger step' : 'Leave some out';
  return {
    message: `${print(count)} sections are more than the ${print(most)} that one run takes${wayWords(definition, basis)}`,
    issues: [
      {
        path: ['space', axis, field],
        message: `${print(count)} sections: the ${AXIS_NAMES[axis]} has ${print(lengths[axis])} values. ${remedy}.`,
      },
    ],
  };
}
