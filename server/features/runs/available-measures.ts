import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Issue } from '#shared/contract/errors.ts';
import type { MeasureId } from '#shared/engine/measures.ts';
import type { ConcreteRate, Rates } from '#shared/engine/section.ts';
import { MPA_PER_PSI } from '#shared/engine/units.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import { expandAxis } from '#shared/sweep/axis.ts';

/** Two strengths within this are one mix, MPa; as the engine matches them. */
const SAME_MIX_MPA = 0.01;

interface MeasureContext {
  readonly problem: SweepProblem;
  readonly units: UnitSystem;
  /** Where the view stands in the input. */
  readonly path: Issue['path'];
}

/**
 * What keeps a view's measures from having a value. A front by cost in which some mixes have no rate would leave those
 * sections out in silence, so each mix of the space needs one.
 */
export function findMissingInputs(view: View, { problem, units, path }: MeasureContext): Issue[] {
  return (['x', 'y'] as const).flatMap((axis) => {
    const missing = missingFor(view[axis], problem, units);
    return missing === undefined ? [] : [{ path: [...path, axis], message: missing }];
  });
}

function missingFor(measure: MeasureId, problem: SweepProblem, units: UnitSystem): string | undefined {
  if (measure === 'utilisation' && problem.demand.muNmm === null)
    return 'Utilisation needs a moment Mu: enter one in the demand, or choose another measure';
  const { tension, compression } = problem.space;
  if (measure === 'barCount' && (tension.kind === 'areas' || compression.kind === 'areas'))
    return 'Steel given as areas has no number of bars: choose another measure';
  if (measure === 'costPerM') {
    const gaps = [...missingCostRates(problem), ...missingMixes(problem, units, (mix) => mix.costPerM3)];
    return gaps.length === 0
      ? undefined
      : `Cost needs rates the price book does not have: ${gaps.join(', ')}`;
  }
  if (measure === 'co2eKgPerM') {
    const steel = (problem.basis.rates?.steelCo2ePerKg ?? null) === null ? ['steel'] : [];
    const gaps = [...steel, ...missingMixes(problem, units, (mix) => mix.co2eKgPerM3)];
    return gaps.length === 0
      ? undefined
      : `Carbon needs factors the price book does not have: ${gaps.join(', ')}`;
  }
  return undefined;
}

function missingCostRates({ basis, space }: SweepProblem): string[] {
  const needed: readonly (readonly [keyof Rates, string])[] = [
    ['steelPerKg', 'steel'],
    ...(space.stirrups.some((stirrup) => stirrup !== null) ? [['stirrupPerKg', 'stirrups'] as const] : []),
    ['formworkPerM2', 'formwork'],
  ];
  return needed.filter(([rate]) => (basis.rates?.[rate] ?? null) === null).map(([, name]) => name);
}

function missingMixes(
  { basis, space }: SweepProblem,
  units: UnitSystem,
  rateOf: (mix: ConcreteRate) => number | null,
): string[] {
  const mixes = basis.rates?.concrete ?? [];
  return expandAxis(space.fc)
    .filter((fcMPa) => {
      const mix = mixes.find((candidate) => Math.abs(candidate.fcMPa - fcMPa) <= SAME_MIX_MPA);
      return mix === undefined || rateOf(mix) === null;
    })
    .map((fcMPa) => `concrete f′c ${formatStrength(fcMPa, units)}`);
}

function formatStrength(fcMPa: number, units: UnitSystem): string {
  return units === 'us'
    ? `${Number((fcMPa / MPA_PER_PSI).toPrecision(4))} psi`
    : `${Number(fcMPa.toPrecision(4))} MPa`;
}
