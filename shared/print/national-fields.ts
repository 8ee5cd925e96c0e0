import type { NationalValues } from '../engine/rules/national-values.ts';
import type { DisplayKind } from './units.ts';

type NumberName = Exclude<keyof NationalValues, 'isPlasticAnalysis' | 'crackWidthMm'>;

export interface NationalField {
  readonly name: NumberName;
  readonly label: string;
  readonly clause: string;
  readonly kind: DisplayKind;
}

const field = (
  name: NumberName,
  label: string,
  clause: string,
  kind: DisplayKind = 'ratio',
): NationalField => ({
  name,
  label,
  clause,
  kind,
});

/** What EN 1992-1-1 leaves to the country, in the order a designer meets it. */
export const NATIONAL_FIELDS: readonly {
  readonly title: string;
  readonly fields: readonly NationalField[];
}[] = [
  {
    title: 'Materials',
    fields: [
      field('gammaC', 'γc, concrete', '2.4.2.4'),
      field('gammaS', 'γs, steel', '2.4.2.4'),
      field('alphaCc', 'αcc in bending', '3.1.6'),
      field('alphaCcShear', 'αcc of the struts', '3.1.6'),
    ],
  },
  {
    title: 'Bending',
    fields: [
      field('redistribution', 'δ after redistribution', '5.5(4); 1 for none'),
      field('axisK1', 'k1, to C50', '5.5(4)'),
      field('axisK3', 'k3, above C50', '5.5(4)'),
      field('axisK2', 'k in k2 = k4', '5.5(4)'),
      field('leastSteel', 'As,min: × fctm/fyk', '9.2.1.1(1)'),
      field('leastSteelFloor', 'As,min at least', '9.2.1.1(1), of b d'),
      field('mostSteel', 'As,max', '9.2.1.1(3), of Ac'),
    ],
  },
  {
    title: 'Shear',
    fields: [
      field('shearConcrete', 'CRd,c × γc', '6.2.2'),
      field('shearFloor', 'vmin: × k^1.5 √fck', '6.2.2'),
      field('strutReduction', 'ν1: × (1 − fck/250)', '6.2.3'),
      field('leastCot', 'cot θ at least', '6.2.3(2)'),
      field('mostCot', 'cot θ at most', '6.2.3(2)'),
      field('leastStirrups', 'ρw,min: × √fck/fyk', '9.2.2(5)'),
      field('stirrupSpacingShare', 'Spacing along, over d', '9.2.2(6)'),
      field('legSpacingShare', 'Legs across, over d', '9.2.2(8)'),
      field('legSpacingMm', 'Legs across at most', '9.2.2(8)', 'length'),
    ],
  },
  {
    title: 'Placing and cracks',
    fields: [
      field('tieDiameters', 'Ties, in bar diameters', '9.2.1.2(3)'),
      field('gapDiameters', 'Gap, in bar diameters', '8.2(2)'),
      field('gapOverAggregateMm', 'Gap over the aggregate', '8.2(2)', 'length'),
      field('serviceStressShare', 'Stress in service over fyd', '7.3.3, the office’s assumption'),
    ],
  },
];
