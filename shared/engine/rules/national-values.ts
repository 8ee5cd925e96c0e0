import { InvalidSectionError } from '../preconditions.ts';

/**
 * Values that EN 1992-1-1:2004 leaves to national annexes; what is left out is the recommended value. Numbers are
 * dimensionless unless their name has a unit.
 */
export interface NationalValues {
  /** γc of concrete, γs of steel (2.4.2.4). */
  readonly gammaC?: number | undefined;
  readonly gammaS?: number | undefined;
  /** αcc of fcd = αcc fck/γc in bending (3.1.6), and of the struts in shear. */
  readonly alphaCc?: number | undefined;
  readonly alphaCcShear?: number | undefined;
  /** δ of 5.5(4): moment after over moment before redistribution, 0.7 to 1. */
  readonly redistribution?: number | undefined;
  /** k1 and k3 of 5.5(4), to C50 and above. */
  readonly axisK1?: number | undefined;
  readonly axisK3?: number | undefined;
  /** k of k2 = k4 = k (0.6 + 0.0014/εcu2). */
  readonly axisK2?: number | undefined;
  /** Plastic analysis without checking rotations: x/d of 5.6.2(2) instead. */
  readonly isPlasticAnalysis?: boolean | undefined;
  /** CRd,c = this/γc (6.2.2). */
  readonly shearConcrete?: number | undefined;
  /** vmin = this k^1.5 √fck (6.2.2). */
  readonly shearFloor?: number | undefined;
  /** ν1 = this (1 − fck/250) (6.2.3). */
  readonly strutReduction?: number | undefined;
  /** Range of cot θ (6.2.3(2)). */
  readonly leastCot?: number | undefined;
  readonly mostCot?: number | undefined;
  /** ρw,min = this √fck/fyk (9.2.2(5)). */
  readonly leastStirrups?: number | undefined;
  /** sl,max and st,max over d, and st,max (9.2.2(6), (8)). */
  readonly stirrupSpacingShare?: number | undefined;
  readonly legSpacingShare?: number | undefined;
  readonly legSpacingMm?: number | undefined;
  /** As,min = max(this fctm/fyk, floor) bt d (9.2.1.1(1)). */
  readonly leastSteel?: number | undefined;
  readonly leastSteelFloor?: number | undefined;
  /** As,max over Ac (9.2.1.1(3)). */
  readonly mostSteel?: number | undefined;
  /** Links within this many bar diameters of compression bars (9.2.1.2(3)). */
  readonly tieDiameters?: number | undefined;
  /** Clear gap: this many bar diameters, and aggregate plus so much (8.2(2)). */
  readonly gapDiameters?: number | undefined;
  readonly gapOverAggregateMm?: number | undefined;
  /** wk of Table 7.3N: 0.2, 0.3 or 0.4 mm. */
  readonly crackWidthMm?: number | undefined;
  /** Steel stress under quasi-permanent loads over fyd, for crack control: an assumption of the office. */
  readonly serviceStressShare?: number | undefined;
}

/** Every value, none left out. */
export type FullNationalValues = { readonly [K in keyof NationalValues]-?: NonNullable<NationalValues[K]> };

/** The values EN 1992-1-1:2004 recommends (memory), and an office's assumption of the stress in service. */
export const RECOMMENDED_VALUES: FullNationalValues = {
  gammaC: 1.5,
  gammaS: 1.15,
  alphaCc: 1,
  alphaCcShear: 1,
  redistribution: 1,
  axisK1: 0.44,
  axisK3: 0.54,
  axisK2: 1.25,
  isPlasticAnalysis: false,
  shearConcrete: 0.18,
  shearFloor: 0.035,
  strutReduction: 0.6,
  leastCot: 1,
  mostCot: 2.5,
  leastStirrups: 0.08,
  stirrupSpacingShare: 0.75,
  legSpacingShare: 0.75,
  legSpacingMm: 600,
  leastSteel: 0.26,
  leastSteelFloor: 0.0013,
  mostSteel: 0.04,
  tieDiameters: 15,
  gapDiameters: 1,
  gapOverAggregateMm: 5,
  crackWidthMm: 0.3,
  serviceStressShare: 0.6,
};

/** Widths that Table 7.3N is printed for, mm. */
export const TABLED_CRACK_WIDTHS_MM = [0.4, 0.3, 0.2] as const;

/**
 * What is left out filled with the recommended values.
 * @throws InvalidSectionError for a value that is no number above zero, a crack width without a table, or a range of cot θ
 * that is none.
 */
export function fullNationalValues(given: NationalValues | null | undefined): FullNationalValues {
  const named = Object.entries(given ?? {}).filter(([, value]) => value !== undefined);
  const values: FullNationalValues = { ...RECOMMENDED_VALUES, ...Object.fromEntries(named) };
  for (const [name, value] of Object.entries(values))
    if (typeof value === 'number' && !(value > 0 && value < Infinity)) refuse(name, `${value}`);
  const { crackWidthMm, leastCot, mostCot } = values;
  if (!TABLED_CRACK_WIDTHS_MM.some((tabled) => tabled === crackWidthMm))
    refuse('crackWidthMm', `${crackWidthMm}: Table 7.3N has 0.2, 0.3 and 0.4 mm`);
  if (!(leastCot >= 1 && mostCot >= leastCot)) refuse('mostCot', `cot θ from ${leastCot} to ${mostCot}`);
  return values;
}

function refuse(name: string, value: string): never {
  throw new InvalidSectionError(`National value ${name} cannot be ${value}`, [
    'basis',
    'nationalValues',
    name,
  ]);
}
