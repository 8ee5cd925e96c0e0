import type { UnitSystem } from '../contract/design-basis.ts';
import type { QuantityKind } from '../engine/evaluation.ts';
import {
  KG_PER_LB,
  KG_PER_M_PER_LB_PER_FT,
  MM2_PER_IN2,
  MM_PER_FT,
  MM_PER_IN,
  MPA_PER_KSI,
  NMM_PER_KIPFT,
  NMM_PER_KNM,
  N_PER_KIP,
} from '../engine/units.ts';

/**
 * Everything a person reads or types: the engine's kinds, and those of estimating. Stored units: mm, mm², MPa, N, N·mm,
 * 1/mm, mm⁴, N·mm², kg/m, kg, t, m³, m², shares of 1, and money per metre, kg, m³ or m².
 */
export type DisplayKind =
  | QuantityKind
  | 'span'
  | 'mass'
  | 'tonnes'
  | 'volume'
  | 'surface'
  | 'volume-per-length'
  | 'surface-per-length'
  | 'length-per-length'
  | 'money'
  | 'money-per-length'
  | 'money-per-mass'
  | 'money-per-volume'
  | 'money-per-surface'
  | 'co2e'
  | 'co2e-per-length'
  | 'co2e-per-mass'
  | 'co2e-per-volume'
  | 'percent';

export interface DisplayUnit {
  /** Printed beside the number; empty for a plain number. */
  readonly label: string;
  /** Stored value of one displayed unit: stored = displayed × perUnit. */
  readonly perUnit: number;
}

const M_PER_FT = MM_PER_FT / 1000;
const M2_PER_FT2 = M_PER_FT ** 2;
/** Concrete is bought by the cubic yard. */
const M3_PER_YD3 = (3 * M_PER_FT) ** 3;
/** Short ton of 2000 lb, in tonnes. */
const T_PER_SHORT_TON = (2000 * KG_PER_LB) / 1000;

const PLAIN: DisplayUnit = { label: '', perUnit: 1 };
const PERCENT: DisplayUnit = { label: '%', perUnit: 0.01 };

const SI: Readonly<Record<DisplayKind, DisplayUnit>> = {
  length: { label: 'mm', perUnit: 1 },
  span: { label: 'm', perUnit: 1000 },
  area: { label: 'mm²', perUnit: 1 },
  stress: { label: 'MPa', perUnit: 1 },
  force: { label: 'kN', perUnit: 1000 },
  moment: { label: 'kN·m', perUnit: NMM_PER_KNM },
  curvature: { label: '×10⁻⁶/mm', perUnit: 1e-6 },
  strain: PLAIN,
  inertia: { label: '×10⁶ mm⁴', perUnit: 1e6 },
  stiffness: { label: 'kN·m²', perUnit: 1e9 },
  count: PLAIN,
  ratio: PLAIN,
  'mass-per-length': { label: 'kg/m', perUnit: 1 },
  mass: { label: 'kg', perUnit: 1 },
  tonnes: { label: 't', perUnit: 1 },
  volume: { label: 'm³', perUnit: 1 },
  surface: { label: 'm²', perUnit: 1 },
  'volume-per-length': { label: 'm³/m', perUnit: 1 },
  'surface-per-length': { label: 'm²/m', perUnit: 1 },
  'length-per-length': { label: 'm/m', perUnit: 1 },
  money: PLAIN,
  'money-per-length': { label: '/m', perUnit: 1 },
  'money-per-mass': { label: '/kg', perUnit: 1 },
  'money-per-volume': { label: '/m³', perUnit: 1 },
  'money-per-surface': { label: '/m²', perUnit: 1 },
  co2e: { label: 'kg CO₂e', perUnit: 1 },
  'co2e-per-length': { label: 'kg CO₂e/m', perUnit: 1 },
  'co2e-per-mass': { label: 'kg CO₂e/kg', perUnit: 1 },
  'co2e-per-volume': { label: 'kg CO₂e/m³', perUnit: 1 },
  percent: PERCENT,
};

const US: Readonly<Record<DisplayKind, DisplayUnit>> = {
  length: { label: 'in', perUnit: MM_PER_IN },
  span: { label: 'ft', perUnit: MM_PER_FT },
  area: { label: 'in²', perUnit: MM2_PER_IN2 },
  stress: { label: 'ksi', perUnit: MPA_PER_KSI },
  force: { label: 'kip', perUnit: N_PER_KIP },
  moment: { label: 'kip·ft', perUnit: NMM_PER_KIPFT },
  curvature: { label: '×10⁻⁶/in', perUnit: 1e-6 / MM_PER_IN },
  strain: PLAIN,
  inertia: { label: 'in⁴', perUnit: MM_PER_IN ** 4 },
  stiffness: { label: 'kip·ft²', perUnit: N_PER_KIP * MM_PER_FT ** 2 },
  count: PLAIN,
  ratio: PLAIN,
  'mass-per-length': { label: 'lb/ft', perUnit: KG_PER_M_PER_LB_PER_FT },
  mass: { label: 'lb', perUnit: KG_PER_LB },
  tonnes: { label: 'ton', perUnit: T_PER_SHORT_TON },
  volume: { label: 'yd³', perUnit: M3_PER_YD3 },
  surface: { label: 'ft²', perUnit: M2_PER_FT2 },
  'volume-per-length': { label: 'yd³/ft', perUnit: M3_PER_YD3 / M_PER_FT },
  'surface-per-length': { label: 'ft²/ft', perUnit: M_PER_FT },
  'length-per-length': { label: 'ft/ft', perUnit: 1 },
  money: PLAIN,
  'money-per-length': { label: '/ft', perUnit: 1 / M_PER_FT },
  'money-per-mass': { label: '/lb', perUnit: 1 / KG_PER_LB },
  'money-per-volume': { label: '/yd³', perUnit: 1 / M3_PER_YD3 },
  'money-per-surface': { label: '/ft²', perUnit: 1 / M2_PER_FT2 },
  co2e: { label: 'kg CO₂e', perUnit: 1 },
  'co2e-per-length': { label: 'kg CO₂e/ft', perUnit: 1 / M_PER_FT },
  'co2e-per-mass': { label: 'kg CO₂e/lb', perUnit: 1 / KG_PER_LB },
  'co2e-per-volume': { label: 'kg CO₂e/yd³', perUnit: 1 / M3_PER_YD3 },
  percent: PERCENT,
};

export const displayUnit = (kind: DisplayKind, units: UnitSystem): DisplayUnit =>
  (units === 'us' ? US : SI)[kind];

export const unitLabel = (kind: DisplayKind, units: UnitSystem): string => displayUnit(kind, units).label;

export const toDisplay = (stored: number, kind: DisplayKind, units: UnitSystem): number =>
  stored / displayUnit(kind, units).perUnit;

export const toStored = (displayed: number, kind: DisplayKind, units: UnitSystem): number =>
  displayed * displayUnit(kind, units).perUnit;
