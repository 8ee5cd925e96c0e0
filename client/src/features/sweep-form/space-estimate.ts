import { MAX_AXIS_VALUES, type SweepDefinition } from '#shared/contract/sweep-definition.ts';
import type { Project, RunSummary } from '#shared/contract/records.ts';
import type { SweepProblem } from '#shared/sweep/problem.ts';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { parseGroups } from '#client/src/lib/parse-bar-groups.ts';
import { AXIS_KIND } from './read-sweep-form.ts';
import type { AxisName, AxisValues, SteelValues } from './sweep-form-values.ts';
import { parseCounts, parseValueList } from '#client/src/lib/value-list.ts';

/** Two threads of an ordinary machine; corrected by this sweep's own last run where there is one. */
const USUAL_SECTIONS_PER_SECOND = 8_000_000;
/** The same where μφ is read off the full curve: it is drawn for about one section in five. */
const USUAL_WITH_CURVES_PER_SECOND = 200_000;
/** Handing a run over and back takes about this long however small it is. */
const HANDOVER_MS = 150;
/** A run shorter than this says nothing about speed. */
const TELLING_SECTIONS = 200_000;

/** A range counts its last value when it is within this share of a step, as the sweep does. */
const STEP_TOLERANCE = 1e-6;

/** How many values an axis makes, or null while it cannot be read. */
export function axisCount(axis: AxisValues, name: AxisName, units: UnitSystem): number | null {
  if (axis.kind === 'list') {
    const list = parseValueList(axis.listText, AXIS_KIND[name], units);
    return list.kind === 'values' && list.values.length > 0 ? list.values.length : null;
  }
  const { from, to, step } = axis;
  if (from === null || to === null || step === null) return null;
  const count = Math.floor((to - from) / step + STEP_TOLERANCE) + 1;
  return step > 0 && count >= 1 && count <= MAX_AXIS_VALUES ? count : null;
}

/** Least and largest value of an axis, or none while it cannot be read. */
export function axisEnds(axis: AxisValues, name: AxisName, units: UnitSystem): readonly number[] {
  const isRead = axisCount(axis, name, units) !== null;
  if (!isRead) return [];
  if (axis.kind === 'range') return [axis.from!, axis.to!];
  const list = parseValueList(axis.listText, AXIS_KIND[name], units);
  return list.kind === 'values' ? [list.values[0]!, list.values.at(-1)!] : [];
}

/** How many sets of steel a face makes, or null while it cannot be read. */
export function steelCount(steel: SteelValues, units: UnitSystem): number | null {
  if (steel.kind === 'areas') {
    const areas = parseValueList(steel.areasText, 'area', units);
    return areas.kind === 'values' && areas.values.length > 0 ? areas.values.length : null;
  }
  const counts = parseCounts(steel.countsText);
  const mixed = parseGroups(steel.mixedText);
  if (counts.kind === 'unreadable' || mixed.kind === 'unreadable') return null;
  const sets = counts.values.length * steel.sizes.length + mixed.groups.length + (steel.none ? 1 : 0);
  return sets > 0 ? sets : null;
}

/** A run by the closed path says nothing of one that draws curves: for those only the usual rate is taken. */
export function estimatedMs(sections: number, runs: readonly RunSummary[], isOffCurve = false): number {
  if (isOffCurve) return HANDOVER_MS + (1000 * sections) / USUAL_WITH_CURVES_PER_SECOND;
  const telling = runs.find(
    (run) =>
      run.method === 'every-section' &&
      run.state === 'finished' &&
      run.elapsedMs !== null &&
      run.evaluated >= TELLING_SECTIONS,
  );
  const perMs =
    telling?.elapsedMs == null ? USUAL_SECTIONS_PER_SECOND / 1000 : telling.evaluated / telling.elapsedMs;
  return HANDOVER_MS + sections / perMs;
}

/** What the engine is asked while typing: the definition on the project's basis as it stands now. */
export function problemOf(project: Project, definition: SweepDefinition): SweepProblem {
  const { units: _units, fyMPa: _fy, coverMm: _cover, ...basis } = project.designBasis;
  const { space, demand, rules } = definition;
  return { space, demand, rules, basis: { ...basis, rates: project.priceBook } };
}
