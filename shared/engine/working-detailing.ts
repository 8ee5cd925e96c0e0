import { barCoverMm, shearOf, stirrupBarOf } from './checks-detailing.ts';
import type { WorkingStep } from './evaluation.ts';
import { designShearN, stirrupShearN, stirrupSpacingLimitMm } from './shear.ts';
import { step, type Input, type WorkingSource } from './working-step.ts';

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
      ['h,min', ruleSet.formulas.leastDepth, value, 'length'],
      [
        ['span', spanMm, 'length'],
        ['fy', section.fyMPa, 'stress'],
      ],
      ruleSet.clauses.leastDepth,
    ),
  ];
}

function shearSteps(source: WorkingSource): WorkingStep[] {
  const state = shearOf(source);
  if (!state) return [];
  const { section, basis, ruleSet } = source;
  const { constants: k, dMm, asMm2, vuN, concreteN: vc } = state;
  const clause = ruleSet.clauses.shear;
  const hasLeast = k.avMm2 >= k.leastAvPerMm * k.spacingMm;
  const isReduced = ruleSet.shear.concreteWithoutStirrups !== null && !hasLeast;
  const vs = stirrupShearN(k, dMm);
  const shared: Input[] = [
    ['f′c', section.fcMPa, 'stress'],
    ['b', section.widthMm, 'length'],
    ['d', dMm, 'length'],
  ];
  const formula = isReduced ? ruleSet.formulas.concreteShearWithoutStirrups : ruleSet.formulas.concreteShear;
  const steps = [
    step(
      'vc',
      'limits',
      ['Vc', formula, vc, 'force'],
      [...shared, ...(isReduced ? [['As', asMm2, 'area'] as const] : [])],
      clause,
    ),
  ];
  if (k.avMm2 > 0)
    steps.push(
      step(
        'vs',
        'limits',
        ['Vs', 'Av fyt d/s, within the section limit', vs, 'force'],
        [
          ['Av', k.avMm2, 'area'],
          ['fyt', Math.min(basis.fytMPa, ruleSet.shear.fytCapMPa), 'stress'],
          ['d', dMm, 'length'],
          ['s', k.spacingMm, 'length'],
        ],
        clause,
      ),
    );
  steps.push(
    step(
      'phi-vn',
      'limits',
      ['φVn', 'φ (Vc + Vs)', designShearN(k, dMm, vc), 'force'],
      [
        ['φ', ruleSet.shear.reduction, 'ratio'],
        ['Vc', vc, 'force'],
        ['Vs', vs, 'force'],
      ],
      clause,
    ),
  );
  const limitMm = stirrupSpacingLimitMm(k, vuN, dMm, vc);
  if (limitMm > 0 && limitMm < Infinity)
    steps.push(
      step(
        'stirrup-spacing',
        'limits',
        ['s,max', 'least of d/2 (d/4 where Vs is large) and Av over Av,min/s', limitMm, 'length'],
        [
          ['Vu', vuN, 'force'],
          ['d', dMm, 'length'],
          ['Av', k.avMm2, 'area'],
        ],
        ruleSet.clauses.stirrupSpacing,
      ),
    );
  return steps;
}
