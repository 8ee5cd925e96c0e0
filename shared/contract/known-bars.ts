import { findBar } from '../engine/bars.ts';
import type { BarStandard } from '../engine/section.ts';
import type { SteelSetsDefinition } from '../sweep/problem.ts';
import type { Issue } from './errors.ts';
import type { SweepDefinition } from './sweep-definition.ts';

const STANDARD_NAMES: Readonly<Record<BarStandard, string>> = {
  astm: 'ASTM A615/A706',
  csa: 'CSA G30.18',
  iso: 'EN 10080 / ISO 6935',
};

interface NamedBar {
  readonly bar: string;
  readonly path: Issue['path'];
}

function barsOf(sets: SteelSetsDefinition): NamedBar[] {
  if (sets.kind !== 'bars') return [];
  const mixed = sets.mixed ?? [];
  return [
    ...sets.sizes.map((bar, i) => ({ bar, path: ['sizes', i] })),
    ...mixed.flatMap((group, i) => group.map(({ bar }, j) => ({ bar, path: ['mixed', i, j, 'bar'] }))),
  ];
}

/** Every bar of a sweep that the bar standard of its project does not list, with its path in the definition. */
export function findUnknownBars({ space, rules }: SweepDefinition, standard: BarStandard): Issue[] {
  const faces = ['tension', 'compression'] as const;
  const named: NamedBar[] = [
    ...faces.flatMap((face) =>
      barsOf(space[face]).map(({ bar, path }) => ({ bar, path: ['space', face, ...path] })),
    ),
    ...space.stirrups.flatMap((stirrup, i) =>
      stirrup === null ? [] : [{ bar: stirrup.bar, path: ['space', 'stirrups', i, 'bar'] }],
    ),
    ...rules.excludedBars.map((bar, i) => ({ bar, path: ['rules', 'excludedBars', i] })),
  ];
  return named
    .filter(({ bar }) => findBar(standard, bar) === undefined)
    .map(({ bar, path }) => ({ path, message: `${STANDARD_NAMES[standard]} lists no bar ${bar}` }));
}
