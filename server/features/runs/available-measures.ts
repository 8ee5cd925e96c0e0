import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Issue } from '#shared/contract/errors.ts';
import type { MeasureId } from '#shared/engine/measures.ts';
import { MPA_PER_PSI } from '#shared/engine/units.ts';
import { measureGaps, type MeasureGap } from '#shared/sweep/measure-gaps.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';

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
  return (['x', 'y', 'z'] as const).flatMap((axis) => {
    const measure = view[axis];
    const missing = measure ? missingFor(measure, problem, units) : undefined;
    return missing === undefined ? [] : [{ path: [...path, axis], message: missing }];
  });
}

function missingFor(measure: MeasureId, problem: SweepProblem, units: UnitSystem): string | undefined {
  const gaps = measureGaps(measure, problem);
  if (gaps.length === 0) return undefined;
  if (measure === 'utilisation')
    return 'Utilisation needs a moment Mu: enter one in the demand, or choose another measure';
  if (measure === 'barCount') return 'Steel given as areas has no number of bars: choose another measure';
  const named = gaps.map((gap) => gapText(gap, units)).join(', ');
  return measure === 'costPerM'
    ? `Cost needs rates the price book does not have: ${named}`
    : `Carbon needs factors the price book does not have: ${named}`;
}

function gapText(gap: MeasureGap, units: UnitSystem): string {
  if (gap.kind === 'rate') return gap.of;
  return gap.kind === 'mix' ? `concrete f′c ${formatStrength(gap.fcMPa, units)}` : gap.kind;
}

function formatStrength(fcMPa: number, units: UnitSystem): string {
  return units === 'us'
    ? `${Number((fcMPa / MPA_PER_PSI).toPrecision(4))} psi`
    : `${Number(fcMPa.toPrecision(4))} MPa`;
}
