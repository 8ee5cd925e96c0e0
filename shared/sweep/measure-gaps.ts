import type { MeasureId } from '../engine/measures.ts';
import type { ConcreteRate, DesignBasis, Demand, Rates } from '../engine/section.ts';
import { expandAxis } from './axis.ts';
import type { SpaceDefinition } from './problem.ts';

/** What a measure lacks: a moment to compare with, bars to count, or a rate or factor of a price book. */
export type MeasureGap =
  | { readonly kind: 'moment' }
  | { readonly kind: 'bars' }
  | { readonly kind: 'rate'; readonly of: 'steel' | 'stirrups' | 'formwork' }
  | { readonly kind: 'mix'; readonly fcMPa: number };

/** What decides whether a measure has a value in every section of a space. */
export interface MeasureSetting {
  readonly space: SpaceDefinition;
  readonly basis: Pick<DesignBasis, 'rates'>;
  readonly demand: Demand;
}

/** Two strengths within this are one mix, MPa; as the engine matches them. */
const SAME_MIX_MPA = 0.01;

/**
 * What keeps a measure from having a value in a space; none where it has one everywhere. Skin bars are bought as bars, and
 * designed stirrups as stirrups, so neither wants a rate of its own.
 */
export function measureGaps(measure: MeasureId, setting: MeasureSetting): readonly MeasureGap[] {
  const { space, basis, demand } = setting;
  switch (measure) {
    case 'utilisation':
      return demand.muNmm === null ? [{ kind: 'moment' }] : [];
    case 'barCount':
      return space.tension.kind === 'areas' || space.compression.kind === 'areas' ? [{ kind: 'bars' }] : [];
    case 'costPerM':
      return [...costRateGaps(setting), ...mixGaps(setting, (mix) => mix.costPerM3)];
    case 'co2eKgPerM': {
      const hasSteel = (basis.rates?.steelCo2ePerKg ?? null) !== null;
      const steel: MeasureGap[] = hasSteel ? [] : [{ kind: 'rate', of: 'steel' }];
      return [...steel, ...mixGaps(setting, (mix) => mix.co2eKgPerM3)];
    }
    default:
      return [];
  }
}

function costRateGaps({ space, basis: { rates } }: MeasureSetting): MeasureGap[] {
  const hasStirrups = space.stirrups.some((stirrup) => stirrup !== null);
  const needed: readonly (readonly [keyof Rates, 'steel' | 'stirrups' | 'formwork'])[] = [
    ['steelPerKg', 'steel'],
    ...(hasStirrups ? [['stirrupPerKg', 'stirrups'] as const] : []),
    ['formworkPerM2', 'formwork'],
  ];
  return needed.filter(([rate]) => (rates?.[rate] ?? null) === null).map(([, of]) => ({ kind: 'rate', of }));
}

function mixGaps(
  { space, basis }: MeasureSetting,
  rateOf: (mix: ConcreteRate) => number | null,
): MeasureGap[] {
  const mixes = basis.rates?.concrete ?? [];
  return expandAxis(space.fc)
    .filter((fcMPa) => {
      const mix = mixes.find((candidate) => Math.abs(candidate.fcMPa - fcMPa) <= SAME_MIX_MPA);
      return mix === undefined || rateOf(mix) === null;
    })
    .map((fcMPa) => ({ kind: 'mix', fcMPa }));
}
