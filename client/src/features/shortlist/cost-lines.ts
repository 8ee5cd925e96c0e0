import type { DisplayKind } from '#shared/print/units.ts';
import { rowsOf, type ComparisonRow, type ShownCandidate } from './comparison.ts';

const line = (id: string, label: string, kind: DisplayKind, of: (c: ShownCandidate) => number | null) => ({
  id,
  label,
  kind,
  better: null,
  of,
});

const quantities = (candidate: ShownCandidate) => candidate.snapshot.evaluation.quantities;
const ratesOf = (candidate: ShownCandidate) => candidate.snapshot.basis.rates;

/** Steel with laps and waste times its factor; null where the factor is not known. */
function steelCo2e(candidate: ShownCandidate): number | null {
  const factor = ratesOf(candidate)?.steelCo2ePerKg ?? null;
  return factor === null ? null : quantities(candidate).totalSteelKgPerM * factor;
}

/** What is left of the whole is concrete: the engine knows no third source. */
function concreteCo2e(candidate: ShownCandidate): number | null {
  const steel = steelCo2e(candidate);
  const { co2eKgPerM } = quantities(candidate);
  return steel === null || co2eKgPerM === null ? null : co2eKgPerM - steel;
}

const COST_LINES = [
  line('cost-bars', 'Longitudinal bars', 'money-per-length', (c) => quantities(c).cost?.steel ?? null),
  line('cost-stirrups', 'Stirrups', 'money-per-length', (c) => quantities(c).cost?.stirrups ?? null),
  line('cost-concrete', 'Concrete', 'money-per-length', (c) => quantities(c).cost?.concrete ?? null),
  line('cost-formwork', 'Formwork', 'money-per-length', (c) => quantities(c).cost?.formwork ?? null),
];
const CARBON_LINES = [
  line('carbon-steel', 'Carbon of the steel', 'co2e-per-length', steelCo2e),
  line('carbon-concrete', 'Carbon of the concrete', 'co2e-per-length', concreteCo2e),
];

/** Cost and carbon by line, per length; lines that no candidate knows are left out. */
export function costRows(
  candidates: readonly ShownCandidate[],
  baselineId: string | null,
  hasMoney: boolean,
): ComparisonRow[] {
  const sources = hasMoney ? [...COST_LINES, ...CARBON_LINES] : [];
  return rowsOf(sources, candidates, baselineId).filter((row) => row.values.some((value) => value !== null));
}
