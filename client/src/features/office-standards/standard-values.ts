import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Issue } from '#shared/contract/errors.ts';
import {
  officeStandardInputSchema,
  type OfficeStandardInput,
  type UsualRanges,
} from '#shared/contract/office-standard.ts';
import type { BarStandard } from '#shared/engine/section.ts';
import { countsText } from '#client/src/lib/counts-text.ts';
import { errorsByField, type FieldErrors } from '#client/src/lib/field-errors.ts';
import { parseCounts, parseValueList, valueListText } from '#client/src/lib/value-list.ts';
import { readStirrup, stirrupValues, type StirrupValues } from '#client/src/section-fields/stirrup-values.ts';

/** Ranges of one kind of beam as typed; mm, null for an empty field. */
export interface RangesValues {
  readonly name: string;
  readonly leastWidthMm: number | null;
  readonly mostWidthMm: number | null;
  readonly leastDepthMm: number | null;
  readonly mostDepthMm: number | null;
  readonly tensionText: string;
  readonly compressionText: string;
}

/** A standard as typed. */
export interface StandardValues {
  readonly name: string;
  readonly units: UnitSystem;
  readonly barStandard: BarStandard;
  readonly tension: readonly string[];
  readonly compression: readonly string[];
  readonly stirrups: readonly StirrupValues[];
  readonly mixesText: string;
  readonly widthStepMm: number | null;
  readonly depthStepMm: number | null;
  readonly rules: {
    readonly minDepthToWidth: number | null;
    readonly maxDepthToWidth: number | null;
    readonly maxLayers: number | null;
    readonly minCompressionShare: number | null;
    readonly oneSizePerFace: boolean;
    readonly requireHangers: boolean;
  };
  readonly ranges: readonly RangesValues[];
}

export const EMPTY_RANGES: RangesValues = {
  name: '',
  leastWidthMm: null,
  mostWidthMm: null,
  leastDepthMm: null,
  mostDepthMm: null,
  tensionText: '',
  compressionText: '',
};

export const EMPTY_STANDARD: StandardValues = {
  name: '',
  units: 'us',
  barStandard: 'astm',
  tension: [],
  compression: [],
  stirrups: [{ bar: '#3', legs: 2, spacingMm: null, isDesigned: false }],
  mixesText: '',
  widthStepMm: null,
  depthStepMm: null,
  rules: {
    minDepthToWidth: null,
    maxDepthToWidth: null,
    maxLayers: 2,
    minCompressionShare: null,
    oneSizePerFace: true,
    requireHangers: true,
  },
  ranges: [EMPTY_RANGES],
};

const rangesValues = ({ tensionCounts, compressionCounts, ...ends }: UsualRanges): RangesValues => ({
  ...ends,
  tensionText: countsText(tensionCounts),
  compressionText: countsText(compressionCounts),
});

/** A stored standard as a form. */
export function standardValues(standard: OfficeStandardInput): StandardValues {
  const { name, units, barStandard, bars, mixesMPa, increments, rules, ranges } = standard;
  return {
    ...{ name, units, barStandard, rules, tension: bars.tension, compression: bars.compression },
    stirrups: bars.stirrups.map(stirrupValues),
    mixesText: valueListText(mixesMPa, 'stress', units),
    widthStepMm: increments.widthMm,
    depthStepMm: increments.depthMm,
    ranges: ranges.map(rangesValues),
  };
}

/** Other bars: what was chosen by name is not in their list. */
export const withBarStandard = (
  values: StandardValues,
  barStandard: BarStandard,
  stirrupBar: string,
): StandardValues => ({
  ...values,
  barStandard,
  tension: [],
  compression: [],
  stirrups: values.stirrups.map((stirrup) => ({ ...stirrup, bar: stirrupBar })),
});

/** Other units: lengths are stored, lists are text and are printed anew. */
export function withUnits(values: StandardValues, units: UnitSystem): StandardValues {
  const mixes = parseValueList(values.mixesText, 'stress', values.units);
  return {
    ...values,
    units,
    mixesText: mixes.kind === 'values' ? valueListText(mixes.values, 'stress', units) : values.mixesText,
  };
}

function readRanges({ tensionText, compressionText, ...ends }: RangesValues, i: number, problems: Issue[]) {
  const read = (text: string, key: string) => {
    const counts = parseCounts(text);
    if (counts.kind === 'values') return counts.values;
    problems.push({ path: ['ranges', i, key], message: counts.problem });
    return [];
  };
  return {
    ...ends,
    tensionCounts: read(tensionText, 'tensionCounts'),
    compressionCounts: read(compressionText, 'compressionCounts'),
  };
}

export type StandardReading =
  | { readonly kind: 'complete'; readonly input: OfficeStandardInput }
  | { readonly kind: 'incomplete'; readonly errors: FieldErrors };

/** What is typed as the input of the contract, or messages by field. */
export function readStandard(values: StandardValues): StandardReading {
  const problems: Issue[] = [];
  const mixes = parseValueList(values.mixesText, 'stress', values.units);
  if (mixes.kind === 'unreadable') problems.push({ path: ['mixesMPa'], message: mixes.problem });
  const input = officeStandardInputSchema.safeParse({
    name: values.name,
    units: values.units,
    barStandard: values.barStandard,
    bars: {
      tension: values.tension,
      compression: values.compression,
      stirrups: values.stirrups.map(readStirrup),
    },
    mixesMPa: mixes.kind === 'values' ? mixes.values : [],
    increments: { widthMm: values.widthStepMm, depthMm: values.depthStepMm },
    rules: values.rules,
    ranges: values.ranges.map((ranges, i) => readRanges(ranges, i, problems)),
  });
  if (input.success && problems.length === 0) return { kind: 'complete', input: input.data };
  return { kind: 'incomplete', errors: errorsByField([...problems, ...(input.error?.issues ?? [])]) };
}
