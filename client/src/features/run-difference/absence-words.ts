import type { SpaceAxis } from '#shared/sweep/space.ts';
import { checkLabel } from '#shared/print/check-labels.ts';
import type { Absence } from './front-differences.ts';

const AXIS_WORDS: Readonly<Record<SpaceAxis, string>> = {
  width: 'width',
  cover: 'cover',
  stirrups: 'stirrups',
  tension: 'tension bars',
  compression: 'compression bars',
  fy: 'steel grade',
  fc: 'concrete',
  depth: 'depth',
};

/** Why a section is not on the front of a run: `not in its ranges: depth`, `fails curvature ductility`, `beaten`. */
export function absenceWords(absence: Absence): string {
  if (absence.kind === 'beaten') return 'meets every check there, and is beaten';
  if (absence.kind === 'fails')
    return `fails ${absence.checks.map((check) => checkLabel(check).name.toLowerCase()).join(', ')}`;
  return absence.axes.length === 0
    ? 'not in its ranges: slab'
    : `not in its ranges: ${absence.axes.map((axis) => AXIS_WORDS[axis]).join(', ')}`;
}
