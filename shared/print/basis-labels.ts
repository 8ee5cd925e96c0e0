import type { UnitSystem } from '../contract/design-basis.ts';
import type {
  BarStandard,
  BendAllowance,
  DisplacedConcrete,
  RuleSetId,
  YieldCurvatureAt,
} from '../engine/section.ts';

const RULE_SET: Readonly<Record<RuleSetId, string>> = {
  'aci318-19': 'ACI 318-19',
  'aci318m-19': 'ACI 318M-19',
  'aci318-14': 'ACI 318-14',
  'aci318m-14': 'ACI 318M-14',
  en1992: 'EN 1992-1-1:2004',
};

const BAR_STANDARD: Readonly<Record<BarStandard, string>> = {
  astm: 'ASTM A615/A706 (#3–#18)',
  csa: 'CSA G30.18 (10M–55M)',
  iso: 'EN 10080 / ISO 6935 (mm)',
};

const DISPLACED: Readonly<Record<DisplacedConcrete, string>> = {
  deduct: 'Taken off bars inside the stress block',
  'deduct-above-axis': 'Taken off bars above the neutral axis',
  ignore: 'Not taken off',
};

const YIELD_AT: Readonly<Record<YieldCurvatureAt, string>> = {
  'outermost-layer': 'First yield of the outermost layer',
  centroid: 'Yield at the centroid of the tension bars',
};

const BEND: Readonly<Record<BendAllowance, string>> = {
  'corner-in-bend': 'Corner bar sits in the bend',
  none: 'Corner bar against both legs',
};

const UNITS: Readonly<Record<UnitSystem, string>> = {
  us: 'US (in, ksi, kip·ft, lb)',
  si: 'SI (mm, MPa, kN·m, kg)',
};

export const ruleSetLabel = (id: RuleSetId): string => RULE_SET[id];
export const barStandardLabel = (id: BarStandard): string => BAR_STANDARD[id];
export const displacedConcreteLabel = (id: DisplacedConcrete): string => DISPLACED[id];
export const yieldCurvatureLabel = (id: YieldCurvatureAt): string => YIELD_AT[id];
export const bendAllowanceLabel = (id: BendAllowance): string => BEND[id];
export const unitSystemLabel = (id: UnitSystem): string => UNITS[id];

export const optionsOf = <V extends string>(values: readonly V[], label: (value: V) => string) =>
  values.map((value) => ({ value, label: label(value) }));
