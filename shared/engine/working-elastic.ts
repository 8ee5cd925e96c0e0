import type { WorkingStep } from './evaluation.ts';
import { layerInputs, STATICS, step, type Input, type WorkingSource } from './working-step.ts';

/** Uncracked and cracked elastic section. */
export function elasticSteps({ section, basis, layout, elastic, ruleSet }: WorkingSource): WorkingStep[] {
  const above = basis.displacedConcrete === 'ignore' ? 'n' : '(n − 1)';
  const n: Input = ['n', elastic.modularRatio, 'ratio'];
  const kd: Input = ['kd', elastic.crackedAxisMm, 'length'];
  const b: Input = ['b', section.widthMm, 'length'];
  const gross: readonly Input[] = [n, b, ['h', section.depthMm, 'length']];
  const ybar: Input = ['y', elastic.uncrackedAxisMm, 'length'];
  return [
    step(
      'uncracked-axis',
      'elastic',
      ['y', '(b h²/2 + Σ (n − 1) A d)/(b h + Σ (n − 1) A), uncracked', ybar[1], 'length'],
      [...gross, ...layerInputs(layout)],
      STATICS,
    ),
    step(
      'iut',
      'elastic',
      ['Iut', 'b h³/12 + b h (h/2 − y)² + Σ (n − 1) A (d − y)²', elastic.uncrackedInertiaMm4, 'inertia'],
      [...gross, ybar, ...layerInputs(layout)],
      STATICS,
    ),
    step(
      'fr',
      'elastic',
      ['fr', ruleSet.formulas.ruptureModulus, elastic.ruptureModulusMPa, 'stress'],
      [['f′c', section.fcMPa, 'stress']],
      ruleSet.clauses.ruptureModulus,
    ),
    step(
      'mcr',
      'elastic',
      ['Mcr', 'fr Iut/yt, yt = h − y', elastic.crackingMomentNmm, 'moment'],
      [
        ['fr', elastic.ruptureModulusMPa, 'stress'],
        ['Iut', elastic.uncrackedInertiaMm4, 'inertia'],
        ['yt', section.depthMm - elastic.uncrackedAxisMm, 'length'],
      ],
      STATICS,
    ),
    step(
      'kd',
      'elastic',
      ['kd', `b (kd)²/2 + Σ ${above} A (kd − d) = Σ n A (d − kd)`, elastic.crackedAxisMm, 'length'],
      [n, b, ...layerInputs(layout)],
      STATICS,
    ),
    step(
      'icr',
      'elastic',
      ['Icr', `b (kd)³/3 + Σ ${above} A (kd − d)² + Σ n A (d − kd)²`, elastic.crackedInertiaMm4, 'inertia'],
      [n, b, kd, ...layerInputs(layout)],
      STATICS,
    ),
  ];
}

/** Curvatures at yield and at ultimate, and their ratio. */
export function ductilitySteps({
  section,
  basis,
  layout,
  elastic,
  flexure,
  ductility,
}: WorkingSource): WorkingStep[] {
  const isCentroid = basis.yieldCurvatureAt === 'centroid';
  const depth: Input = isCentroid ? ['d', layout.dMm, 'length'] : ['dt', layout.dtMm, 'length'];
  const phiY: Input = ['φy', ductility.curvatureYieldPerMm, 'curvature'];
  const phiU: Input = ['φu', ductility.curvatureUltimatePerMm, 'curvature'];
  return [
    step(
      'phi-y',
      'ductility',
      ['φy', `εy/(${depth[0]} − kd)`, phiY[1], 'curvature'],
      [['εy', section.fyMPa / basis.esMPa, 'strain'], depth, ['kd', elastic.crackedAxisMm, 'length']],
      STATICS,
    ),
    step(
      'my',
      'ductility',
      ['My', 'Ec Icr φy', elastic.yieldMomentNmm, 'moment'],
      [['Ec', elastic.ecMPa, 'stress'], ['Icr', elastic.crackedInertiaMm4, 'inertia'], phiY],
      STATICS,
    ),
    step(
      'fc-yield',
      'ductility',
      ['fc/f′c at yield', 'Ec φy kd/f′c', elastic.concreteStressShareAtYield, 'ratio'],
      [
        ['Ec', elastic.ecMPa, 'stress'],
        phiY,
        ['kd', elastic.crackedAxisMm, 'length'],
        ['f′c', section.fcMPa, 'stress'],
      ],
      STATICS,
    ),
    step(
      'phi-u',
      'ductility',
      ['φu', 'εcu/c', phiU[1], 'curvature'],
      [
        ['εcu', flexure.epsilonCu, 'strain'],
        ['c', flexure.neutralAxisMm, 'length'],
      ],
      STATICS,
    ),
    step(
      'mu-phi',
      'ductility',
      ['μφ', 'φu/φy', ductility.curvatureDuctility, 'ratio'],
      [phiU, phiY],
      STATICS,
    ),
  ];
}
