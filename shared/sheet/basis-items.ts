import type { Snapshot } from '../contract/records.ts';
import type { NationalValues } from '../engine/rules/national-values.ts';
import type { DesignBasis } from '../engine/section.ts';
import { barStandardLabel } from '../print/basis-labels.ts';
import { ductilityMeasureLabel, seismicSystemLabel } from '../print/ductility-labels.ts';
import { formatNumber } from '../print/format-quantity.ts';
import { NATIONAL_FIELDS } from '../print/national-fields.ts';
import type { DisplayKind } from '../print/units.ts';
import type { KeyText } from './sheet.ts';

/** A value in the reader's units. */
export type Print = (value: number | null | undefined, kind: DisplayKind) => string;

/** The rules the section is held to. What a basis of an earlier day does not say is left out. */
export function basisItems({ basis, rules, evaluation }: Snapshot, print: Print): KeyText[] {
  return [
    { label: 'Code', value: evaluation.ruleSet.title },
    { label: 'Bars', value: barStandardLabel(basis.barStandard) },
    { label: 'Es', value: print(basis.esMPa, 'stress') },
    { label: 'Largest aggregate', value: print(basis.maxAggregateMm, 'length') },
    { label: 'Slab, sides not formed', value: basis.slabMm === 0 ? 'none' : print(basis.slabMm, 'length') },
    { label: 'Layers at a face, at most', value: `${rules.maxLayers}` },
    ...detailingItems(basis, print),
  ];
}

function detailingItems(basis: DesignBasis, print: Print): KeyText[] {
  const { seismicSystem, skinBar, stirrupStepMm, leastStirrupSpacingMm, barOversize, ductilityMeasure } =
    basis;
  return [
    ...(seismicSystem === undefined
      ? []
      : [{ label: 'Seismic system', value: seismicSystemLabel(seismicSystem) }]),
    ...(ductilityMeasure === undefined
      ? []
      : [
          {
            label: 'μφ held to its target',
            value: ductilityMeasureLabel(ductilityMeasure).label,
          },
        ]),
    ...(skinBar === undefined ? [] : [{ label: 'Side bars', value: skinBar ?? 'none' }]),
    ...(stirrupStepMm === undefined
      ? []
      : [{ label: 'Stirrup spacings, steps of', value: print(stirrupStepMm, 'length') }]),
    ...(leastStirrupSpacingMm === undefined
      ? []
      : [{ label: 'Stirrups, no closer than', value: print(leastStirrupSpacingMm, 'length') }]),
    ...(barOversize === undefined || barOversize === 1
      ? []
      : [{ label: 'Bars fitted by their outside', value: `${formatNumber(barOversize, 3)} × nominal` }]),
  ];
}

/** Those that are set; where the code leaves values to the country and none is set, that the recommended ones hold. */
export function nationalItems({ basis }: Snapshot, print: Print): KeyText[] {
  if (basis.ruleSet !== 'en1992') return [];
  const values: NationalValues = basis.nationalValues ?? {};
  const set = NATIONAL_FIELDS.flatMap(({ fields }) => fields).flatMap(({ name, label, clause, kind }) => {
    const value = values[name];
    return value === undefined ? [] : [{ label: `${label} (${clause})`, value: print(value, kind) }];
  });
  const { isPlasticAnalysis, crackWidthMm } = values;
  const items = [
    ...set,
    ...(isPlasticAnalysis === true
      ? [{ label: 'Plastic analysis (5.6.2(2))', value: 'x/d as it asks' }]
      : []),
    ...(crackWidthMm === undefined
      ? []
      : [{ label: 'Crack width wk (7.3.1)', value: print(crackWidthMm, 'length') }]),
  ];
  return items.length === 0 ? [{ label: 'All values', value: 'as EN recommends' }] : items;
}
