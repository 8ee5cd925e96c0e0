import type { WorkingStep } from './evaluation.ts';
import { cotTheta, longitudinalShare, sizeFactor, vRdMaxN, vRdsN, type StrutShear } from './shear-strut.ts';
import { designShearN, stirrupSpacingLimitMm } from './shear.ts';
import type { ShearState } from './checks-detailing.ts';
import type { Clauses } from './rules/rule-set.ts';
import type { WorkingSource } from './working-source.ts';
import { step, type Input } from './working-step.ts';

/** VRd,c, then struts and stirrups at the slope that carries most (EN 1992-1-1 6.2.2, 6.2.3). */
export function strutShearSteps(
  { ruleSet }: WorkingSource,
  { dMm, asMm2, concreteN }: ShearState,
  k: StrutShear,
): WorkingStep[] {
  const { clauses } = ruleSet;
  const clause = clauses.shearConcrete;
  const b: Input = ['b', k.widthMm, 'length'];
  const d: Input = ['d', dMm, 'length'];
  const fck: Input = ['fck', k.fckMPa, 'stress'];
  const size: Input = ['k', sizeFactor(dMm), 'ratio'];
  const share: Input = ['ρl', longitudinalShare(asMm2, k.widthMm, dMm), 'ratio'];
  const alone: Input = ['VRd,c', concreteN, 'force'];
  const steps = [
    step('size-factor', 'limits', [size[0], 'min(2, 1 + √(200/d)); mm', size[1], 'ratio'], [d], clause),
    step(
      'rho-l',
      'limits',
      [share[0], 'min(As/(b d), 0.02)', share[1], 'ratio'],
      [['As', asMm2, 'area'], b, d],
      clause,
    ),
    step(
      'vc',
      'limits',
      [alone[0], 'max(C k (100 ρl fck)^⅓, v √(k³ fck)) b d; MPa', alone[1], 'force'],
      [['C', k.rules.concrete, 'ratio'], size, share, fck, ['v', k.rules.concreteFloor, 'ratio'], b, d],
      clause,
    ),
  ];
  return k.avMm2 === 0 ? steps : [...steps, ...trussSteps(k, dMm, alone, clauses)];
}

function trussSteps(k: StrutShear, dMm: number, alone: Input, clauses: Clauses): WorkingStep[] {
  const { rules } = k;
  const clause = clauses.shearStirrups;
  const cotValue = cotTheta(k, k.spacingMm);
  const z: Input = ['z', rules.leverArmShare * dMm, 'length'];
  const cot: Input = ['cot θ', cotValue, 'ratio'];
  const asw: Input = ['Asw', k.avMm2, 'area'];
  const fywd: Input = ['fywd', k.fywdMPa, 'stress'];
  const s: Input = ['s', k.spacingMm, 'length'];
  const b: Input = ['b', k.widthMm, 'length'];
  const strut: Input[] = [
    ['ν1', rules.strutReduction(k.fckMPa), 'ratio'],
    ['fcd', rules.strutStrengthMPa(k.fckMPa), 'stress'],
  ];
  const stirrups: Input = ['VRd,s', vRdsN(k, dMm, cotValue, k.spacingMm), 'force'];
  const struts: Input = ['VRd,max', vRdMaxN(k, dMm, cotValue), 'force'];
  return [
    step(
      'lever-arm-shear',
      'limits',
      [z[0], `${rules.leverArmShare} d`, z[1], 'length'],
      [['d', dMm, 'length']],
      clause,
    ),
    step(
      'cot-theta',
      'limits',
      [
        cot[0],
        `√(ν1 fcd b s/(Asw fywd) − 1), within ${rules.leastCot} and ${rules.mostCot}`,
        cot[1],
        'ratio',
      ],
      [...strut, b, s, asw, fywd],
      clause,
    ),
    step(
      'vs',
      'limits',
      [stirrups[0], 'Asw z fywd cot θ/s', stirrups[1], 'force'],
      [asw, z, fywd, cot, s],
      clause,
    ),
    step(
      'vs-max',
      'limits',
      [struts[0], 'b z ν1 fcd/(cot θ + tan θ)', struts[1], 'force'],
      [b, z, ...strut, cot],
      clauses.shearLimit,
    ),
    step(
      'phi-vn',
      'limits',
      ['VRd', 'max(VRd,c, min(VRd,s, VRd,max))', designShearN(k, dMm, alone[1]), 'force'],
      [alone, stirrups, struts],
      clauses.shear,
    ),
  ];
}

/** Least stirrups and the largest spacing along the beam (9.2.2). */
export function strutSpacingSteps(
  { ruleSet }: WorkingSource,
  { dMm, vuN, concreteN }: ShearState,
  k: StrutShear,
): WorkingStep[] {
  const limitMm = stirrupSpacingLimitMm(k, vuN, dMm, concreteN);
  if (!(limitMm > 0)) return [];
  const { rules } = k;
  const least: Input = ['Asw,min/s', k.leastAvPerMm, 'length'];
  const { clauses } = ruleSet;
  return [
    step(
      'least-stirrups',
      'limits',
      [least[0], `${rules.leastStirrupRoot} √fck b/fywk; MPa`, least[1], 'length'],
      [
        ['fck', k.fckMPa, 'stress'],
        ['b', k.widthMm, 'length'],
        ['fywk', k.fytMPa, 'stress'],
      ],
      clauses.leastStirrups,
    ),
    step(
      'stirrup-spacing',
      'limits',
      ['s,max', `min(${rules.longestSpacingShare} d, Asw/(Asw,min/s))`, limitMm, 'length'],
      [['d', dMm, 'length'], ['Asw', k.avMm2, 'area'], least],
      clauses.stirrupSpacing,
    ),
  ];
}
