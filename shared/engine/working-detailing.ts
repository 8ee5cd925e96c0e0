import { barCoverMm, stirrupBarOf } from './checks-detailing.ts';
import type { WorkingStep } from './evaluation.ts';
import { shearSteps } from './working-shear.ts';
import { step, type WorkingSource } from './working-step.ts';

/** Limits of crack control and least depth, and shear, each where it is asked. */
export function detailingSteps(source: WorkingSource): WorkingStep[] {
  return [...crackStep(source), ...leastDepthStep(source), ...shearSteps(source)];
}

function crackStep(source: WorkingSource): WorkingStep[] {
  const { section, ruleSet, placed } = source;
  if (!placed.arrangement) return [];
  const coverMm = barCoverMm(section.coverMm, stirrupBarOf(source));
  const value = ruleSet.crackSpacingMm(section.fyMPa, coverMm);
  return [
    step(
      'crack-spacing',
      'limits',
      ['s,max', ruleSet.formulas.crackSpacing, value, 'length'],
      [
        ['fy', section.fyMPa, 'stress'],
        ['cc', coverMm, 'length'],
      ],
      ruleSet.clauses.crackControl,
    ),
  ];
}

function leastDepthStep({ section, demand, ruleSet }: WorkingSource): WorkingStep[] {
  const { spanMm, support } = demand;
  if (!spanMm || !support) return [];
  const value = ruleSet.leastDepthMm(spanMm, support, section.fyMPa);
  return [
    step(
      'least-depth',
      'limits',
      ['h,min', ruleSet.formulas.leastDepth(support), value, 'length'],
      [
        ['span', spanMm, 'length'],
        ['fy', section.fyMPa, 'stress'],
      ],
      ruleSet.clauses.leastDepth,
    ),
  ];
}
