import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { arrangeFace, leastForStirrupMm, type ArrangementContext } from '#shared/engine/arrangement.ts';
import { findBar, type Bar } from '#shared/engine/bars.ts';
import { isWithinLength } from '#shared/engine/limits.ts';
import { ruleSetOf } from '#shared/engine/rules/rule-set-of.ts';
import type { BarGroup, DesignBasis } from '#shared/engine/section.ts';
import { parseGroups } from '#client/src/lib/parse-bar-groups.ts';
import { axisEnds } from './space-estimate.ts';
import type { SteelFace, SteelValues, SweepFormValues } from './sweep-form-values.ts';
import { parseCounts } from '#client/src/lib/value-list.ts';

/** Where one group of bars stands, from the left side and from its own face, mm. */
export interface PlacedGroup {
  readonly group: BarGroup;
  readonly bars: readonly { readonly xMm: number; readonly offsetMm: number; readonly diameterMm: number }[];
}

/** What of one size, or of one group of two, stands in one width. */
export interface WidthFit {
  readonly widthMm: number;
  /** Numbers of bars by the layers they need: the first list stands in one layer. */
  readonly byLayers: readonly (readonly number[])[];
  /** Numbers of bars asked for that cannot be placed. */
  readonly tooMany: readonly number[];
  /** The most that stand; null for none. */
  readonly most: PlacedGroup | null;
}

export interface FitRow {
  /** `#8`, or `2-#8 + 2-#6`. */
  readonly name: string;
  readonly isExcluded: boolean;
  /** At the narrowest width, and at the widest where that is another. */
  readonly at: readonly WidthFit[];
}

export interface FitPreview {
  readonly rows: readonly FitRow[];
  /** Groups of two sizes beyond those shown. */
  readonly moreGroups: number;
  readonly coverMm: number;
  readonly stirrupBar: Bar | null;
  readonly bendRadiusMm: number;
}

export type FitBasis = Pick<
  DesignBasis,
  'ruleSet' | 'nationalValues' | 'barStandard' | 'maxAggregateMm' | 'bendAllowance' | 'barOversize'
>;

const MOST_GROUPS_SHOWN = 6;

interface Setting {
  readonly face: SteelFace;
  readonly contexts: readonly ArrangementContext[];
  readonly excluded: readonly string[];
}

function fitAt(groups: readonly BarGroup[], { face }: Setting, context: ArrangementContext): WidthFit {
  const byLayers: number[][] = Array.from({ length: context.maxLayers }, () => []);
  const tooMany: number[] = [];
  let most: PlacedGroup | null = null;
  const isStirrupBent = isWithinLength(
    leastForStirrupMm(context.coverMm, context.stirrupBar, context.rules),
    context.widthMm,
  );
  for (const group of groups) {
    const count = group.reduce((sum, one) => sum + one.count, 0);
    const { report, layers } = arrangeFace(face, group, context);
    if (!report.fits || !isStirrupBent) {
      tooMany.push(count);
      continue;
    }
    byLayers[layers.length - 1]!.push(count);
    const bars = layers.flatMap((layer) =>
      layer.bars.map(({ bar, xMm, offsetMm }) => ({ xMm, offsetMm, diameterMm: bar.diameterMm })),
    );
    if (most === null || bars.length > most.bars.length) most = { group, bars };
  }
  return { widthMm: context.widthMm, byLayers, tooMany, most };
}

const rowOf = (name: string, groups: readonly BarGroup[], setting: Setting): FitRow => ({
  name,
  isExcluded: groups.some((group) => group.some(({ bar }) => setting.excluded.includes(bar))),
  at: setting.contexts.map((context) => fitAt(groups, setting, context)),
});

/** Widths, cover, stirrup and layers the bars are placed by; null while any of them cannot be read. */
function contextsOf(
  form: SweepFormValues,
  basis: FitBasis,
  units: UnitSystem,
): readonly ArrangementContext[] | null {
  const widths = [...new Set(axisEnds(form.axes.width, 'width', units))];
  // Of several covers and stirrups the ones that leave the bars least room.
  const coverMm = Math.max(...axisEnds(form.axes.cover, 'cover', units));
  const { maxLayers } = form.rules;
  const isRead =
    widths.length > 0 &&
    Number.isFinite(coverMm) &&
    widths.every((width) => width > 2 * coverMm) &&
    maxLayers !== null &&
    Number.isInteger(maxLayers) &&
    maxLayers >= 1 &&
    maxLayers <= 4;
  if (!isRead) return null;
  const stirrups = form.stirrups.flatMap(({ bar }) => findBar(basis.barStandard, bar) ?? []);
  const stirrupBar = stirrups.toSorted((a, b) => b.diameterMm - a.diameterMm)[0] ?? null;
  const rules = ruleSetOf(basis);
  const { barStandard, maxAggregateMm, bendAllowance, barOversize } = basis;
  return widths.map((widthMm) => ({
    ...{
      rules,
      barStandard,
      widthMm,
      coverMm,
      stirrupBar,
      maxAggregateMm,
      bendAllowance,
      maxLayers,
      barOversize,
    },
  }));
}

function groupsOf(steel: SteelValues, basis: FitBasis) {
  const counts = parseCounts(steel.countsText);
  const mixed = parseGroups(steel.mixedText);
  const isKnown = (group: BarGroup) =>
    group.every(({ bar }) => findBar(basis.barStandard, bar) !== undefined);
  return {
    sizes: steel.sizes.filter((bar) => findBar(basis.barStandard, bar) !== undefined),
    counts: counts.kind === 'values' ? counts.values.filter((count) => count >= 1) : [],
    mixed: mixed.kind === 'groups' ? mixed.groups.filter(isKnown) : [],
  };
}

/**
 * Which of the bars asked for stand in one layer, in two, or not at all, at the narrowest width and at the widest. Null
 * where there is nothing to show: plain areas, no bars, or a width, cover or number of layers that cannot be read.
 */
export function fitPreview(
  form: SweepFormValues,
  face: SteelFace,
  basis: FitBasis,
  units: UnitSystem,
): FitPreview | null {
  const steel = form.steel[face];
  const contexts = steel.kind === 'bars' ? contextsOf(form, basis, units) : null;
  if (contexts === null) return null;
  const { sizes, counts, mixed } = groupsOf(steel, basis);
  const setting = { face, contexts, excluded: form.rules.excludedBars };
  const ofSizes =
    counts.length === 0
      ? []
      : sizes.map((bar) =>
          rowOf(
            bar,
            counts.map((count) => [{ bar, count }]),
            setting,
          ),
        );
  const ofGroups = mixed
    .slice(0, MOST_GROUPS_SHOWN)
    .map((group) => rowOf(group.map(({ bar, count }) => `${count}-${bar}`).join(' + '), [group], setting));
  const rows = [...ofSizes, ...ofGroups];
  if (rows.length === 0) return null;
  const { coverMm, stirrupBar, rules } = contexts[0]!;
  return {
    rows,
    moreGroups: Math.max(0, mixed.length - MOST_GROUPS_SHOWN),
    coverMm,
    stirrupBar,
    bendRadiusMm: stirrupBar === null ? 0 : rules.bendRadiusMm(stirrupBar.diameterMm),
  };
}
