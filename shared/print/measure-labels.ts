import type { UnitSystem } from '../contract/design-basis.ts';
import { MEASURE_DIRECTION, type Direction, type MeasureId } from '../engine/measures.ts';
import type { RuleSetId } from '../engine/section.ts';
import { codeSymbols } from './code-symbols.ts';
import { unitLabel, type DisplayKind } from './units.ts';

interface MeasureName {
  readonly name: string;
  readonly symbol: string;
  readonly kind: DisplayKind;
}

const MEASURES: Readonly<Record<MeasureId, MeasureName>> = {
  steelKgPerM: { name: 'Steel', symbol: 'Steel', kind: 'mass-per-length' },
  costPerM: { name: 'Cost', symbol: 'Cost', kind: 'money-per-length' },
  co2eKgPerM: { name: 'Carbon', symbol: 'CO₂e', kind: 'co2e-per-length' },
  depthMm: { name: 'Depth', symbol: 'h', kind: 'length' },
  widthMm: { name: 'Width', symbol: 'b', kind: 'length' },
  concreteM3PerM: { name: 'Concrete', symbol: 'Concrete', kind: 'volume-per-length' },
  formworkM2PerM: { name: 'Formwork', symbol: 'Formwork', kind: 'surface-per-length' },
  curvatureDuctility: { name: 'Curvature ductility', symbol: 'μφ', kind: 'ratio' },
  designStrengthNmm: { name: 'Design strength', symbol: 'φMn', kind: 'moment' },
  utilisation: { name: 'Utilisation', symbol: 'Mu/φMn', kind: 'ratio' },
  barCount: { name: 'Bars', symbol: 'Bars', kind: 'count' },
};

function inLettersOf(code: RuleSetId, id: MeasureId): Partial<MeasureName> {
  const { moment, designMoment } = codeSymbols(code);
  if (id === 'designStrengthNmm') return { symbol: designMoment };
  return id === 'utilisation' ? { symbol: `${moment}/${designMoment}` } : {};
}

export interface MeasureLabel extends MeasureName {
  readonly id: MeasureId;
  /** In the project's units; for money the part after the currency, `/ft`. Empty for a plain number. */
  readonly unit: string;
  readonly better: Direction;
  /** `less is better` or `more is better`. */
  readonly betterText: string;
}

/** `code` puts symbols in its own letters; without it they are those of ACI 318. */
export function measureLabel(id: MeasureId, units: UnitSystem, code?: RuleSetId): MeasureLabel {
  const measure = { ...MEASURES[id], ...(code === undefined ? {} : inLettersOf(code, id)) };
  const better = MEASURE_DIRECTION[id];
  return { ...measure, id, unit: unitLabel(measure.kind, units), better, betterText: `${better} is better` };
}
