import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Run } from '#shared/contract/records.ts';
import type { DesignBasis, Flange } from '#shared/engine/section.ts';
import type { AxisDefinition, SteelSetsDefinition } from '#shared/sweep/problem.ts';
import {
  barStandardLabel,
  bendAllowanceLabel,
  displacedConcreteLabel,
  ruleSetLabel,
  yieldCurvatureLabel,
} from '#shared/print/basis-labels.ts';
import { codeSymbols } from '#shared/print/code-symbols.ts';
import {
  concreteLawLabel,
  ductilityMeasureLabel,
  seismicSystemLabel,
  steelLawLabel,
} from '#shared/print/ductility-labels.ts';
import { fieldText, formatQuantity } from '#shared/print/format-quantity.ts';
import { NATIONAL_FIELDS } from '#shared/print/national-fields.ts';
import { givenStirrupText } from '#shared/print/section-text.ts';
import { unitLabel, type DisplayKind } from '#shared/print/units.ts';
import { countsText } from '#client/src/lib/counts-text.ts';
import { groupsText } from '#client/src/lib/parse-bar-groups.ts';
import { SUPPORT_OPTIONS } from '#client/src/lib/support-options.ts';
import { valueListText } from '#client/src/lib/value-list.ts';
import { rateInputs } from './rate-inputs.ts';
import type { RunInput } from './run-input.ts';

type InputRun = Pick<Run, 'definition' | 'basis' | 'engineVersion'>;
type Print = (value: number | null | undefined, kind: DisplayKind) => string;

const asked = (text: string) => (text === '' ? 'not asked' : text);
const yesNo = (is: boolean) => (is ? 'yes' : 'no');

function axisText(axis: AxisDefinition, kind: DisplayKind, units: UnitSystem): string {
  const unit = unitLabel(kind, units);
  const text = (value: number) => fieldText(value, kind, units);
  return axis.kind === 'list'
    ? `${valueListText(axis.values, kind, units)} ${unit}`
    : `${text(axis.from)} to ${text(axis.to)} by ${text(axis.step)} ${unit}`;
}

function steelText(sets: SteelSetsDefinition, units: UnitSystem): string {
  if (sets.kind === 'areas')
    return `${valueListText(sets.areasMm2, 'area', units)} ${unitLabel('area', units)}, ${
      'offsetMm' in sets.at
        ? `${formatQuantity(sets.at.offsetMm, 'length', units)} from the face`
        : `${formatQuantity(sets.at.shareOfDepth, 'percent', units)} of h from the face`
    }`;
  const plain =
    sets.sizes.length > 0 && sets.counts.length > 0
      ? [`${countsText(sets.counts)} of ${sets.sizes.join(', ')}`]
      : [];
  const mixed = sets.mixed === undefined || sets.mixed.length === 0 ? [] : [groupsText(sets.mixed)];
  return [...plain, ...mixed, ...(sets.none ? ['none'] : [])].join('; ');
}

function slabText(flange: Flange | null | undefined, print: Print): string {
  if (!flange) return 'none';
  const { shape, thicknessMm, face, width } = flange;
  const wide =
    width.kind === 'given'
      ? `${print(width.widthMm, 'length')} wide`
      : `effective width, next web ${print(width.clearToNextWebMm, 'length')} away, span ${print(width.spanMm, 'span')}`;
  return `${shape.toUpperCase()}, ${print(thicknessMm, 'length')} thick, in ${face}, ${wide}`;
}

function rangeInputs({ definition, basis }: InputRun, units: UnitSystem, print: Print): RunInput[] {
  const { space } = definition;
  const symbols = codeSymbols(basis.ruleSet);
  const axes = [
    ['width', 'Width b', 'length'],
    ['depth', 'Depth h', 'length'],
    ['fc', `Concrete ${symbols.fc}`, 'stress'],
    ['fy', `Steel ${symbols.fy}`, 'stress'],
    ['cover', 'Clear cover', 'length'],
  ] as const;
  const input = (label: string, stored: unknown, text: string): RunInput => ({
    ...{ group: 'Ranges', label, stored, text },
  });
  return [
    ...axes.map(([name, label, kind]) => input(label, space[name], axisText(space[name], kind, units))),
    input('Bars at the tension face', space.tension, steelText(space.tension, units)),
    input('Bars at the compression face', space.compression, steelText(space.compression, units)),
    input('Stirrups', space.stirrups, space.stirrups.map((one) => givenStirrupText(one, units)).join('; ')),
    input('Slab', space.flange ?? null, slabText(space.flange, print)),
  ];
}

function demandInputs({ definition, basis }: InputRun, print: Print): RunInput[] {
  const { muNmm, vuN, ductilityTarget, depthCapMm, spanMm, support } = definition.demand;
  const symbols = codeSymbols(basis.ruleSet);
  const input = (label: string, stored: unknown, text: string): RunInput => ({
    ...{ group: 'Demand', label, stored: stored ?? null, text: asked(text) },
  });
  return [
    input(`Moment ${symbols.moment}`, muNmm, print(muNmm, 'moment')),
    input(`Shear ${symbols.shear}`, vuN, print(vuN, 'force')),
    input('Ductility μφ at least', ductilityTarget, print(ductilityTarget, 'count')),
    input('Depth h at most', depthCapMm, print(depthCapMm, 'length')),
    input('Span', spanMm, print(spanMm, 'span')),
    input('Span is held', support, SUPPORT_OPTIONS.find(({ value }) => value === support)?.label ?? ''),
  ];
}

function ruleInputs({ definition }: InputRun, print: Print): RunInput[] {
  const { rules } = definition;
  const input = (label: string, stored: unknown, text: string): RunInput => ({
    ...{ group: 'Rules', label, stored, text },
  });
  return [
    input('Layers at most', rules.maxLayers, String(rules.maxLayers)),
    input('h/b at least', rules.minDepthToWidth, asked(print(rules.minDepthToWidth, 'ratio'))),
    input('h/b at most', rules.maxDepthToWidth, asked(print(rules.maxDepthToWidth, 'ratio'))),
    input('As wide as a column of', rules.columnWidthMm, asked(print(rules.columnWidthMm, 'length'))),
    input('A′s/As at least', rules.minCompressionShare, asked(print(rules.minCompressionShare, 'percent'))),
    input('One bar size on each face', rules.oneSizePerFace, yesNo(rules.oneSizePerFace)),
    input('A bar for every stirrup leg', rules.requireHangers, yesNo(rules.requireHangers)),
    input('Sizes never used', rules.excludedBars, rules.excludedBars.join(', ') || 'none'),
  ];
}

function curveInputs(basis: DesignBasis): readonly (readonly [string, unknown, string])[] {
  const { curve } = basis;
  const rest: Readonly<Record<string, unknown>> =
    curve === undefined ? {} : { ...curve, concreteLaw: null, steelLaw: null };
  return [
    [
      'Concrete law of the curve',
      curve?.concreteLaw ?? null,
      curve === undefined ? 'as for the code' : concreteLawLabel(curve.concreteLaw).label,
    ],
    [
      'Steel law of the curve',
      curve?.steelLaw ?? null,
      curve === undefined ? 'as for the code' : steelLawLabel(curve.steelLaw).label,
    ],
    [
      'Values of the laws',
      rest,
      Object.entries(rest)
        .flatMap(([key, value]) => (value === null ? [] : [`${key} ${JSON.stringify(value)}`]))
        .join(', ') || 'their own',
    ],
  ];
}

function nationalInputs({ nationalValues }: DesignBasis, print: Print) {
  return NATIONAL_FIELDS.flatMap(({ fields }) => fields).map(({ name, label, clause, kind }) => {
    const value = nationalValues?.[name];
    return [
      `${label} (${clause})`,
      value ?? null,
      value === undefined ? 'recommended' : print(value, kind),
    ] as const;
  });
}

function basisInputs({ basis }: InputRun, print: Print): RunInput[] {
  const { skinBar } = basis;
  const rows: readonly (readonly [string, unknown, string])[] = [
    ['Code', basis.ruleSet, ruleSetLabel(basis.ruleSet)],
    ['Bars', basis.barStandard, barStandardLabel(basis.barStandard)],
    ['Es', basis.esMPa, print(basis.esMPa, 'stress')],
    ['Strength of stirrups fyt', basis.fytMPa, print(basis.fytMPa, 'stress')],
    ['Largest aggregate', basis.maxAggregateMm, print(basis.maxAggregateMm, 'length')],
    ['Slab, sides not formed', basis.slabMm, print(basis.slabMm, 'length')],
    ['Displaced concrete', basis.displacedConcrete, displacedConcreteLabel(basis.displacedConcrete)],
    ['Yield curvature', basis.yieldCurvatureAt, yieldCurvatureLabel(basis.yieldCurvatureAt)],
    ['Bend', basis.bendAllowance, bendAllowanceLabel(basis.bendAllowance)],
    ['Seismic system', basis.seismicSystem ?? 'none', seismicSystemLabel(basis.seismicSystem ?? 'none')],
    ['Side bars', skinBar ?? null, skinBar === undefined ? 'not checked' : (skinBar ?? 'none')],
    [
      'Stirrup spacings, steps of',
      basis.stirrupStepMm ?? null,
      print(basis.stirrupStepMm, 'length') || 'usual',
    ],
    [
      'Stirrups, no closer than',
      basis.leastStirrupSpacingMm ?? null,
      print(basis.leastStirrupSpacingMm, 'length') || 'usual',
    ],
    ['Outside of a bar over its name', basis.barOversize ?? 1, print(basis.barOversize ?? 1, 'ratio')],
    [
      'μφ held to its target',
      basis.ductilityMeasure ?? 'closed',
      ductilityMeasureLabel(basis.ductilityMeasure ?? 'closed').label,
    ],
    ...curveInputs(basis),
    ...(basis.ruleSet === 'en1992' ? nationalInputs(basis, print) : []),
    [
      'Plastic analysis (EN 5.6.2(2))',
      basis.nationalValues?.isPlasticAnalysis ?? false,
      yesNo(basis.nationalValues?.isPlasticAnalysis === true),
    ],
    [
      'Crack width wk',
      basis.nationalValues?.crackWidthMm ?? null,
      asked(print(basis.nationalValues?.crackWidthMm, 'length')),
    ],
  ];
  return rows.map(([label, stored, text]) => ({ ...{ group: 'Design basis', label, stored, text } }));
}

/** Everything that went into a run, in the order it is read. Rates are left out where the reader may not see them. */
export function runInputs(run: InputRun, units: UnitSystem): readonly RunInput[] {
  const print: Print = (value, kind) => formatQuantity(value, kind, units);
  const { method } = run.definition;
  return [
    ...rangeInputs(run, units, print),
    ...demandInputs(run, print),
    ...ruleInputs(run, print),
    ...basisInputs(run, print),
    ...rateInputs(run.basis.rates, print).map((one) => ({ group: 'Rates' as const, ...one })),
    { group: 'How it ran', label: 'Engine', stored: run.engineVersion, text: run.engineVersion },
    {
      group: 'How it ran',
      label: 'Method asked for',
      stored: method ?? null,
      text: method === 'bounds' ? 'by bounds' : method === undefined ? 'by size' : 'every section',
    },
  ];
}
