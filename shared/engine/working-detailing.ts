import { barCoverMm, shearOf, stirrupBarOf } from './checks-detailing.ts';
import type { WorkingStep } from './evaluation.ts';
import {
  designShearN,
  isCloselySpaced,
  largestStirrupShearN,
  stirrupShearN,
  stirrupSpacingLimitMm,
} from './shear.ts';
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
      ['h,min', ruleSet.formulas.leastDepth(support), value, 'length'],
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
  const { constants: k, dMm, asMm2, concreteN: vc } = state;
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
  if (k.avMm2 > 0) {
    const most: Input = ['Vs,max', largestStirrupShearN(k, dMm), 'force'];
    steps.push(
      step('vs-max', 'limits', [most[0], ruleSet.formulas.stirrupLimit, most[1], 'force'], shared, clause),
      step(
        'vs',
        'limits',
        ['Vs', 'min(Av fyt d/s, Vs,max)', vs, 'force'],
        [
          ['Av', k.avMm2, 'area'],
          ['fyt', Math.min(basis.fytMPa, ruleSet.shear.fytCapMPa), 'stress'],
          ['d', dMm, 'length'],
          ['s', k.spacingMm, 'length'],
          most,
        ],
        clause,
      ),
    );
  }
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
  return [...steps, ...spacingSteps(source, state)];
}

/** Spacing where Vu asks for stirrups: Av,min/s, then the least of the limits, written with the numbers that apply. */
function spacingSteps(
  { section, basis, ruleSet }: WorkingSource,
  { constants: k, dMm, vuN, concreteN }: NonNullable<ReturnType<typeof shearOf>>,
): WorkingStep[] {
  const limitMm = stirrupSpacingLimitMm(k, vuN, dMm, concreteN);
  if (!(limitMm > 0 && limitMm < Infinity)) return [];
  const isClose = isCloselySpaced(k, vuN, dMm, concreteN);
  const longest: Input = ['s,long', ruleSet.shear.longestSpacingMm / (isClose ? 2 : 1), 'length'];
  const least: Input = ['Av,min/s', k.leastAvPerMm, 'length'];
  const clause = ruleSet.clauses.stirrupSpacing;
  return [
    step(
      'least-stirrups',
      'limits',
      [least[0], ruleSet.formulas.leastStirrups, least[1], 'length'],
      [
        ['f′c', section.fcMPa, 'stress'],
        ['b', section.widthMm, 'length'],
        ['fyt', Math.min(basis.fytMPa, ruleSet.shear.fytCapMPa), 'stress'],
      ],
      clause,
    ),
    step(
      'stirrup-spacing',
      'limits',
      ['s,max', `min(d/${isClose ? 4 : 2}, s,long, Av/(Av,min/s))`, limitMm, 'length'],
      [['d', dMm, 'length'], longest, ['Av', k.avMm2, 'area'], least],
      clause,
    ),
  ];
}
