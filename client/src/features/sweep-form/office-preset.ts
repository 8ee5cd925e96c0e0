import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { OfficeStandard, UsualRanges } from '#shared/contract/office-standard.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { givenStirrupText } from '#shared/print/section-text.ts';
import { countsText } from '#client/src/lib/counts-text.ts';
import { stirrupValues } from '#client/src/section-fields/stirrup-values.ts';
import { axisValues } from './axis-values.ts';
import type { AxisValues, SweepFormValues } from './sweep-form-values.ts';
import { valueListText } from '#client/src/lib/value-list.ts';

/** One kind of beam of one standard of the office: what a sweep's form can be filled from. */
export interface OfficePreset {
  readonly id: string;
  readonly standard: OfficeStandard;
  readonly ranges: UsualRanges;
}

export const presetName = ({ standard, ranges }: OfficePreset): string => `${standard.name}: ${ranges.name}`;

/** The presets of standards that speak of the project's bars in its units. */
export function presetsFor(
  standards: readonly OfficeStandard[],
  basis: Pick<OfficeStandard, 'units' | 'barStandard'>,
): readonly OfficePreset[] {
  return standards
    .filter(({ units, barStandard }) => units === basis.units && barStandard === basis.barStandard)
    .flatMap((standard) =>
      standard.ranges.map((ranges) => ({ id: `${standard.id} ${ranges.name}`, standard, ranges })),
    );
}

const range = (from: number, to: number, step: number): AxisValues => ({
  ...{ kind: 'range', from, to, step, listText: '' },
});

/** The form with everything a standard says; the demand, the slab, cover, fy and the view are not the office's to say. */
export function withPreset(form: SweepFormValues, preset: OfficePreset, units: UnitSystem): SweepFormValues {
  const { standard, ranges } = preset;
  const { bars, increments, mixesMPa } = standard;
  const { tension, compression } = form.steel;
  return {
    ...form,
    axes: {
      ...form.axes,
      width: range(ranges.leastWidthMm, ranges.mostWidthMm, increments.widthMm),
      depth: range(ranges.leastDepthMm, ranges.mostDepthMm, increments.depthMm),
      fc: {
        kind: 'list',
        from: Math.min(...mixesMPa),
        to: Math.max(...mixesMPa),
        step: null,
        listText: valueListText(
          mixesMPa.toSorted((a, b) => a - b),
          'stress',
          units,
        ),
      },
    },
    stirrups: bars.stirrups.map(stirrupValues),
    steel: {
      tension: {
        ...tension,
        ...{ kind: 'bars', sizes: bars.tension, countsText: countsText(ranges.tensionCounts) },
        ...{ none: false, mixedText: '' },
      },
      compression: {
        ...compression,
        ...{ kind: 'bars', sizes: bars.compression, countsText: countsText(ranges.compressionCounts) },
        ...{ none: true, mixedText: '' },
      },
    },
    rules: { ...form.rules, ...standard.rules, excludedBars: [] },
    filledFrom: presetName(preset),
  };
}

const SLACK = 1e-6;
const isIn = (value: number, list: readonly number[]) =>
  list.some((one) => Math.abs(one - value) <= SLACK * Math.max(1, one));

function sizeDepartures(form: SweepFormValues, standard: OfficeStandard, units: UnitSystem): string[] {
  const length = (mm: number) => formatQuantity(mm, 'length', units);
  const axes = [
    ['width', 'b', standard.increments.widthMm],
    ['depth', 'h', standard.increments.depthMm],
  ] as const;
  return axes.flatMap(([name, symbol, stepMm]) => {
    const odd = axisValues(form.axes[name], name, units).find((value) => {
      const steps = value / stepMm;
      return Math.abs(steps - Math.round(steps)) > SLACK * Math.max(1, steps);
    });
    return odd === undefined
      ? []
      : [`${symbol} = ${length(odd)} is no multiple of the office’s ${length(stepMm)}`];
  });
}

function barDepartures({ steel, stirrups }: SweepFormValues, { bars }: OfficeStandard, units: UnitSystem) {
  const listed = [...bars.tension, ...bars.compression];
  const used = [steel.tension, steel.compression].flatMap((face) => (face.kind === 'bars' ? face.sizes : []));
  const odd = [...new Set(used)].filter((bar) => !listed.includes(bar));
  const known = bars.stirrups.map(({ bar }) => bar);
  const oddStirrups = stirrups.flatMap(({ bar, legs, spacingMm, isDesigned }) =>
    bar === '' || known.includes(bar) || legs === null || spacingMm === null
      ? []
      : [givenStirrupText({ bar, legs, spacingMm, isDesigned }, units)],
  );
  return [
    ...(odd.length > 0
      ? [`${odd.join(', ')} ${odd.length === 1 ? 'is' : 'are'} not on the office’s bar list`]
      : []),
    ...(oddStirrups.length > 0
      ? [`stirrups ${oddStirrups.join('; ')} are of a size the office does not bend`]
      : []),
  ];
}

/** Where a form asks for what the office does not build, a sentence each. It is said, never forbidden. */
export function departuresFrom(
  form: SweepFormValues,
  standard: OfficeStandard,
  units: UnitSystem,
): readonly string[] {
  const mixes = axisValues(form.axes.fc, 'fc', units).filter((value) => !isIn(value, standard.mixesMPa));
  const words = mixes.map((value) => formatQuantity(value, 'stress', units)).join(', ');
  return [
    ...sizeDepartures(form, standard, units),
    ...(mixes.length > 0
      ? [`${words} ${mixes.length === 1 ? 'is no mix' : 'are no mixes'} of the office`]
      : []),
    ...barDepartures(form, standard, units),
  ];
}
