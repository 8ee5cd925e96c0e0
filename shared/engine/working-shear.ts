import { shearOf, type ShearState } from './checks-detailing.ts';
import type { WorkingStep } from './evaluation.ts';
import {
  hasLeastStirrups,
  largestStirrupShearN,
  stirrupShearN,
  type AdditiveShear,
} from './shear-additive.ts';
import { designShearN, isSpacingHalved, stirrupSpacingLimitMm } from './shear.ts';
import { strutShearSteps, strutSpacingSteps } from './working-shear-strut.ts';
import type { WorkingSource } from './working-source.ts';
import { step, type Input } from './working-step.ts';

/** Strength in shear and the spacing of stirrups, in the form the code has. */
export function shearSteps(source: WorkingSource): WorkingStep[] {
  const state = shearOf(source);
  if (!state) return [];
  const { constants: k } = state;
  // the design writes its own limits
  const isDesigned = source.stirrups.design !== null;
  return k.form === 'additive'
    ? [...additiveSteps(source, state, k), ...(isDesigned ? [] : additiveSpacingSteps(source, state, k))]
    : [...strutShearSteps(source, state, k), ...(isDesigned ? [] : strutSpacingSteps(source, state, k))];
}

function additiveSteps(
  { section, ruleSet }: WorkingSource,
  { dMm, asMm2, concreteN: vc }: ShearState,
  k: AdditiveShear,
): WorkingStep[] {
  const { clauses } = ruleSet;
  const isReduced = k.rules.concreteWithoutStirrups !== null && !hasLeastStirrups(k, k.spacingMm);
  const shared: Input[] = [
    ['f′c', section.fcMPa, 'stress'],
    ['b', section.widthMm, 'length'],
    ['d', dMm, 'length'],
  ];
  const { formulas } = k.rules;
  const formula = isReduced ? formulas.concreteWithoutStirrups : formulas.concrete;
  const steps = [
    step(
      'vc',
      'limits',
      ['Vc', formula, vc, 'force'],
      [...shared, ...(isReduced ? [['As', asMm2, 'area'] as const] : [])],
      clauses.shearConcrete,
    ),
  ];
  const vs: Input = ['Vs', stirrupShearN(k, dMm), 'force'];
  if (k.avMm2 > 0) {
    const most: Input = ['Vs,max', largestStirrupShearN(k, dMm), 'force'];
    steps.push(
      step(
        'vs-max',
        'limits',
        [most[0], formulas.stirrupLimit, most[1], 'force'],
        shared,
        clauses.shearLimit,
      ),
      step(
        'vs',
        'limits',
        [vs[0], 'min(Av fyt d/s, Vs,max)', vs[1], 'force'],
        [
          ['Av', k.avMm2, 'area'],
          ['fyt', Math.min(k.fytMPa, k.rules.fytCapMPa), 'stress'],
          ['d', dMm, 'length'],
          ['s', k.spacingMm, 'length'],
          most,
        ],
        clauses.shearStirrups,
      ),
    );
  }
  steps.push(
    step(
      'phi-vn',
      'limits',
      ['φVn', 'φ (Vc + Vs)', designShearN(k, dMm, vc), 'force'],
      [['φ', k.rules.reduction, 'ratio'], ['Vc', vc, 'force'], vs],
      clauses.shear,
    ),
  );
  return steps;
}

/** Spacing where Vu asks for stirrups: Av,min/s, then the least of the limits, written with the numbers that apply. */
function additiveSpacingSteps(
  { section, ruleSet }: WorkingSource,
  { dMm, vuN, concreteN }: ShearState,
  k: AdditiveShear,
): WorkingStep[] {
  const limitMm = stirrupSpacingLimitMm(k, vuN, dMm, concreteN);
  if (!(limitMm > 0 && limitMm < Infinity)) return [];
  const isHalved = isSpacingHalved(k, vuN, dMm, concreteN);
  const longest: Input = ['s,long', k.rules.longestSpacingMm / (isHalved ? 2 : 1), 'length'];
  const least: Input = ['Av,min/s', k.leastAvPerMm, 'length'];
  const { clauses } = ruleSet;
  return [
    step(
      'least-stirrups',
      'limits',
      [least[0], k.rules.formulas.leastStirrups, least[1], 'length'],
      [
        ['f′c', section.fcMPa, 'stress'],
        ['b', section.widthMm, 'length'],
        ['fyt', Math.min(k.fytMPa, k.rules.fytCapMPa), 'stress'],
      ],
      clauses.leastStirrups,
    ),
    step(
      'stirrup-spacing',
      'limits',
      ['s,max', `min(d/${isHalved ? 4 : 2}, s,long, Av/(Av,min/s))`, limitMm, 'length'],
      [['d', dMm, 'length'], longest, ['Av', k.avMm2, 'area'], least],
      clauses.stirrupSpacing,
    ),
  ];
}
