import { beamDemand } from '#shared/contract/beam-demand.ts';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Beam, Project, Sweep } from '#shared/contract/records.ts';
import type { BarStandard } from '#shared/engine/section.ts';
import { MPA_PER_PSI, MM_PER_IN } from '#shared/engine/units.ts';
import type { AxisDefinition, SteelSetsDefinition } from '#shared/sweep/problem.ts';
import { countsText } from '#client/src/lib/counts-text.ts';
import type { DisplayKind } from '#shared/print/units.ts';
import { groupsText } from '#client/src/lib/parse-bar-groups.ts';
import { withPreset, type OfficePreset } from './office-preset.ts';
import { AXIS_KIND } from './read-sweep-form.ts';
import {
  AXIS_NAMES,
  type AxisName,
  type AxisValues,
  type SteelValues,
  type SweepFormValues,
} from './sweep-form-values.ts';
import { stirrupValues } from '#client/src/section-fields/stirrup-values.ts';
import { flangeValues, NO_FLANGE } from '#client/src/section-fields/flange-values.ts';
import { valueListText } from '#client/src/lib/value-list.ts';

/** Ranges a first sweep starts from: common practice for beams of buildings, no source. */
const FIRST_RANGES: Readonly<Record<UnitSystem, Readonly<Record<'width' | 'depth' | 'fc', AxisValues>>>> = {
  us: {
    width: range(12 * MM_PER_IN, 20 * MM_PER_IN, 2 * MM_PER_IN),
    depth: range(18 * MM_PER_IN, 36 * MM_PER_IN, MM_PER_IN),
    fc: range(4000 * MPA_PER_PSI, 6000 * MPA_PER_PSI, 1000 * MPA_PER_PSI),
  },
  si: {
    width: range(300, 500, 50),
    depth: range(400, 900, 25),
    fc: range(25, 40, 5),
  },
};

interface FirstBars {
  readonly tension: readonly string[];
  readonly compression: readonly string[];
  readonly stirrup: string;
}

const FIRST_BARS: Readonly<Record<BarStandard, FirstBars>> = {
  astm: { tension: ['#6', '#7', '#8', '#9'], compression: ['#5', '#6', '#7', '#8'], stirrup: '#3' },
  csa: { tension: ['20M', '25M', '30M'], compression: ['15M', '20M', '25M'], stirrup: '10M' },
  iso: { tension: ['16', '20', '25', '32'], compression: ['12', '16', '20', '25'], stirrup: '10' },
};

const FIRST_SPACING_MM: Readonly<Record<UnitSystem, number>> = { us: 6 * MM_PER_IN, si: 150 };
/** Distance of a plain layer from its face until one is typed. */
const FIRST_OFFSET_MM: Readonly<Record<UnitSystem, number>> = { us: 2.5 * MM_PER_IN, si: 65 };

function range(from: number, to: number, step: number): AxisValues {
  return { kind: 'range', from, to, step, listText: '' };
}

const single = (value: number, kind: DisplayKind, units: UnitSystem): AxisValues => ({
  kind: 'list',
  from: value,
  to: value,
  step: null,
  listText: valueListText([value], kind, units),
});

const bars = (sizes: readonly string[], counts: string, none: boolean, units: UnitSystem): SteelValues => ({
  kind: 'bars',
  sizes,
  countsText: counts,
  none,
  mixedText: '',
  areasText: '',
  placedBy: 'offset',
  offsetMm: FIRST_OFFSET_MM[units],
  shareOfDepth: null,
});

/** A new sweep on a beam: the design basis, the beam's demand, and the office's ranges, or those any office would start from. */
export function firstSweepForm(
  project: Project,
  beam: Beam,
  preset: OfficePreset | null = null,
): SweepFormValues {
  const form = plainFirstForm(project, beam);
  return preset === null ? form : withPreset(form, preset, project.designBasis.units);
}

function plainFirstForm(project: Project, beam: Beam): SweepFormValues {
  const basis = project.designBasis;
  const { units } = basis;
  const first = FIRST_BARS[basis.barStandard];
  return {
    name: `${beam.mark} sweep`,
    axes: {
      ...FIRST_RANGES[units],
      fy: single(basis.fyMPa, 'stress', units),
      cover: single(basis.coverMm, 'length', units),
    },
    flange: NO_FLANGE,
    stirrups: [{ bar: first.stirrup, legs: 2, spacingMm: FIRST_SPACING_MM[units], isDesigned: false }],
    steel: {
      tension: bars(first.tension, '2–8', false, units),
      compression: bars(first.compression, '2–4', true, units),
    },
    demand: beamDemand(beam),
    rules: {
      minDepthToWidth: null,
      maxDepthToWidth: null,
      maxLayers: 2,
      oneSizePerFace: true,
      excludedBars: [],
      columnWidthMm: null,
      minCompressionShare: null,
      requireHangers: true,
    },
    view: { x: 'steelKgPerM', y: 'curvatureDuctility' },
    filledFrom: null,
  };
}

function axisValues(axis: AxisDefinition, name: AxisName, units: UnitSystem): AxisValues {
  if (axis.kind === 'range') return { ...axis, listText: '' };
  const [low, high] = [Math.min(...axis.values), Math.max(...axis.values)];
  return {
    kind: 'list',
    from: low,
    to: high,
    step: null,
    listText: valueListText(axis.values, AXIS_KIND[name], units),
  };
}

function steelValues(sets: SteelSetsDefinition, units: UnitSystem): SteelValues {
  if (sets.kind === 'bars')
    return {
      ...bars(sets.sizes, countsText(sets.counts), sets.none, units),
      mixedText: groupsText(sets.mixed ?? []),
    };
  const isOffset = 'offsetMm' in sets.at;
  return {
    ...bars([], '', false, units),
    kind: 'areas',
    areasText: valueListText(sets.areasMm2, 'area', units),
    placedBy: isOffset ? 'offset' : 'share',
    offsetMm: 'offsetMm' in sets.at ? sets.at.offsetMm : FIRST_OFFSET_MM[units],
    shareOfDepth: 'shareOfDepth' in sets.at ? sets.at.shareOfDepth : null,
  };
}

/** A stored sweep as a form, to change or to copy. */
export function sweepForm(sweep: Pick<Sweep, 'name' | 'definition'>, units: UnitSystem): SweepFormValues {
  const { space, demand, rules, view, method } = sweep.definition;
  const axes = Object.fromEntries(AXIS_NAMES.map((name) => [name, axisValues(space[name], name, units)]));
  return {
    name: sweep.name,
    axes: axes as SweepFormValues['axes'],
    flange: flangeValues(space.flange, demand),
    stirrups: space.stirrups.map(stirrupValues),
    steel: {
      tension: steelValues(space.tension, units),
      compression: steelValues(space.compression, units),
    },
    demand,
    rules,
    view,
    method,
    filledFrom: null,
  };
}
