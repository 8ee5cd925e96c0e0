import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { MeasureId } from '#shared/engine/measures.ts';
import type { ConcreteRate, DesignBasis, Demand, Rates } from '#shared/engine/section.ts';
import { expandAxis } from '#shared/sweep/axis.ts';
import type { SpaceDefinition } from '#shared/sweep/problem.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';

/** Two strengths within this are one mix, MPa; as the engine matches them. */
const SAME_MIX_MPA = 0.01;

interface MeasureSetting {
  readonly space: SpaceDefinition;
  readonly basis: Pick<DesignBasis, 'rates'>;
  readonly demand: Demand;
  readonly units: UnitSystem;
}

function missingMixes(setting: MeasureSetting, rateOf: (mix: ConcreteRate) => number | null): string[] {
  const mixes = setting.basis.rates?.concrete ?? [];
  return expandAxis(setting.space.fc)
    .filter((fcMPa) => {
      const mix = mixes.find((candidate) => Math.abs(candidate.fcMPa - fcMPa) <= SAME_MIX_MPA);
      return mix === undefined || rateOf(mix) === null;
    })
    .map((fcMPa) => `concrete ${formatQuantity(fcMPa, 'stress', setting.units)}`);
}

function missingRates(setting: MeasureSetting): string[] {
  const needed: readonly (readonly [keyof Rates, string])[] = [
    ['steelPerKg', 'steel'],
    ...(setting.space.stirrups.some((stirrup) => stirrup !== null)
      ? [['stirrupPerKg', 'stirrups'] as const]
      : []),
    ['formworkPerM2', 'formwork'],
  ];
  const { rates } = setting.basis;
  const simple = needed.filter(([rate]) => (rates?.[rate] ?? null) === null).map(([, name]) => name);
  return [...simple, ...missingMixes(setting, (mix) => mix.costPerM3)];
}

const MOST_NAMED = 3;
const named = (gaps: readonly string[]): string =>
  gaps.length > MOST_NAMED ? `${gaps.slice(0, MOST_NAMED).join(', ')} …` : gaps.join(', ');

/** Why a measure cannot be compared by in this space; null where it can. */
export function unavailableReason(measure: MeasureId, setting: MeasureSetting): string | null {
  const { space, basis, demand } = setting;
  if (measure === 'utilisation') return demand.muNmm === null ? 'needs a moment' : null;
  if (measure === 'barCount')
    return space.tension.kind === 'areas' || space.compression.kind === 'areas'
      ? 'plain areas have no bars'
      : null;
  if (measure !== 'costPerM' && measure !== 'co2eKgPerM') return null;
  if (basis.rates === null) return 'no rates to be seen';
  if (measure === 'costPerM') {
    const gaps = missingRates(setting);
    return gaps.length === 0 ? null : `no rate for ${named(gaps)}`;
  }
  const steel = basis.rates.steelCo2ePerKg === null ? ['steel'] : [];
  const gaps = [...steel, ...missingMixes(setting, (mix) => mix.co2eKgPerM3)];
  return gaps.length === 0 ? null : `no factor for ${named(gaps)}`;
}
