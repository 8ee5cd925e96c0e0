import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Issue } from '#shared/contract/errors.ts';
import { sweepInputSchema } from '#shared/contract/records.ts';
import type { z } from 'zod';
import { errorsByField, type FieldErrors } from '#client/src/lib/field-errors.ts';
import type { DisplayKind } from '#shared/print/units.ts';
import { parseGroups } from '#client/src/lib/parse-bar-groups.ts';
import { readStirrup } from '#client/src/section-fields/stirrup-values.ts';
import { typedFlange } from '#client/src/section-fields/flange-values.ts';
import {
  AXIS_NAMES,
  type AxisName,
  type AxisValues,
  type SteelValues,
  type SweepFormValues,
} from './sweep-form-values.ts';
import { parseCounts, parseValueList } from '#client/src/lib/value-list.ts';

export type SweepInput = z.infer<typeof sweepInputSchema>;

export type SweepFormReading =
  | { readonly kind: 'complete'; readonly input: SweepInput }
  | { readonly kind: 'incomplete'; readonly errors: FieldErrors };

/** Fields are named by their path below it. */
export const FORM_ROOT = 'definition';

export const AXIS_KIND: Readonly<Record<AxisName, DisplayKind>> = {
  width: 'length',
  depth: 'length',
  fc: 'stress',
  fy: 'stress',
  cover: 'length',
};

function readAxis(axis: AxisValues, name: AxisName, units: UnitSystem, problems: Issue[]) {
  if (axis.kind === 'range') return { kind: 'range', from: axis.from, to: axis.to, step: axis.step };
  const list = parseValueList(axis.listText, AXIS_KIND[name], units);
  if (list.kind === 'values') return { kind: 'list', values: list.values };
  problems.push({ path: ['definition', 'space', name, 'values'], message: list.problem });
  return { kind: 'list', values: [] };
}

function readSteel(steel: SteelValues, face: string, units: UnitSystem, problems: Issue[]) {
  const path = ['definition', 'space', face];
  if (steel.kind === 'areas') {
    const areas = parseValueList(steel.areasText, 'area', units);
    if (areas.kind === 'unreadable') problems.push({ path: [...path, 'areasMm2'], message: areas.problem });
    const place = steel.placedBy === 'offset' ? steel.offsetMm : steel.shareOfDepth;
    if (place === null || Number.isNaN(place))
      problems.push({ path: [...path, 'at'], message: 'Enter where the layer lies' });
    const at =
      steel.placedBy === 'offset' ? { offsetMm: steel.offsetMm } : { shareOfDepth: steel.shareOfDepth };
    return { kind: 'areas', areasMm2: areas.kind === 'values' ? areas.values : [], at };
  }
  const counts = parseCounts(steel.countsText);
  if (counts.kind === 'unreadable') problems.push({ path: [...path, 'counts'], message: counts.problem });
  const mixed = parseGroups(steel.mixedText);
  if (mixed.kind === 'unreadable') problems.push({ path: [...path, 'mixed'], message: mixed.problem });
  return {
    kind: 'bars',
    sizes: steel.sizes,
    counts: counts.kind === 'values' ? counts.values : [],
    none: steel.none,
    ...(mixed.kind === 'groups' && mixed.groups.length > 0 ? { mixed: mixed.groups } : {}),
  };
}

/**
 * Turns what is typed into the input of the contract, or into messages beside the fields. Text that cannot be read is
 * reported before the contract is asked: its message says more.
 */
export function readSweepForm(form: SweepFormValues, units: UnitSystem): SweepFormReading {
  const problems: Issue[] = [];
  const axes = Object.fromEntries(
    AXIS_NAMES.map((name) => [name, readAxis(form.axes[name], name, units, problems)]),
  );
  const input = sweepInputSchema.safeParse({
    name: form.name,
    definition: {
      space: {
        ...axes,
        flange: typedFlange(form.flange, form.demand),
        stirrups: form.stirrups.map(readStirrup),
        tension: readSteel(form.steel.tension, 'tension', units, problems),
        compression: readSteel(form.steel.compression, 'compression', units, problems),
      },
      demand: form.demand,
      rules: form.rules,
      view: form.view,
      method: form.method,
    },
  });
  if (input.success && problems.length === 0) return { kind: 'complete', input: input.data };
  const issues = [...problems, ...(input.error?.issues ?? [])];
  return { kind: 'incomplete', errors: errorsByField(issues, FORM_ROOT) };
}
