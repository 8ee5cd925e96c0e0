import type { WorkingStep } from './evaluation.ts';
import { compressedWidth, grossFlangeTerms, grossInputs, widthInputs } from './working-flange.ts';
import { layerInputs, materialInputs, type WorkingSource } from './working-source.ts';
import { STATICS, step, type Input } from './working-step.ts';

/** Compressed concrete of the cracked section about its axis, by the width it has. */
const COMPRESSED = {
  web: { moment: 'b (kd)²/2', inertia: 'b (kd)³/3' },
  flange: { moment: 'bf (kd)²/2', inertia: 'bf (kd)³/3' },
  both: {
    moment: 'b (kd)²/2 + (bf − b) hf (kd − hf/2)',
    inertia: 'b (kd)³/3 + (bf − b) ((kd)³ − (kd − hf)³)/3',
  },
} as const;

/** Uncracked and cracked elastic section. */
export function elasticSteps(source: WorkingSource): WorkingStep[] {
  const { section, basis, layout, elastic, ruleSet } = source;
  const above = basis.displacedConcrete === 'ignore' ? 'n' : '(n − 1)';
  const n: Input = ['n', elastic.modularRatio, 'ratio'];
  const { symbols } = ruleSet;
  const kd: Input = ['kd', elastic.crackedAxisMm, 'length'];
  const added = grossFlangeTerms(source);
  const width = compressedWidth(source, elastic.crackedAxisMm);
  const compressed = COMPRESSED[width];
  const widths = widthInputs(source, width);
  const gross: readonly Input[] = [n, ...grossInputs(source), ['h', section.depthMm, 'length']];
  const ybar: Input = ['y', elastic.uncrackedAxisMm, 'length'];
  return [
    step(
      'uncracked-axis',
      'elastic',
      [
        'y',
        `(b h²/2${added.moment} + Σ (n − 1) A d)/(b h${added.area} + Σ (n − 1) A), uncracked`,
        ybar[1],
        'length',
      ],
      [...gross, ...layerInputs(layout)],
      STATICS,
    ),
    step(
      'iut',
      'elastic',
      [
        'Iut',
        `b h³/12 + b h (h/2 − y)²${added.inertia} + Σ (n − 1) A (d − y)²`,
        elastic.uncrackedInertiaMm4,
        'inertia',
      ],
      [...gross, ybar, ...layerInputs(layout)],
      STATICS,
    ),
    step(
      'fr',
      'elastic',
      [symbols.ruptureModulus, ruleSet.formulas.ruptureModulus, elastic.ruptureModulusMPa, 'stress'],
      materialInputs(ruleSet.formulas.ruptureModulus, section, ruleSet),
      ruleSet.clauses.ruptureModulus,
    ),
    step(
      'mcr',
      'elastic',
      ['Mcr', `${symbols.ruptureModulus} Iut/yt, yt = h − y`, elastic.crackingMomentNmm, 'moment'],
      [
        [symbols.ruptureModulus, elastic.ruptureModulusMPa, 'stress'],
        ['Iut', elastic.uncrackedInertiaMm4, 'inertia'],
        ['yt', section.depthMm - elastic.uncrackedAxisMm, 'length'],
      ],
      STATICS,
    ),
    step(
      'kd',
      'elastic',
      [
        'kd',
        `${compressed.moment} + Σ ${above} A (kd − d) = Σ n A (d − kd)`,
        elastic.crackedAxisMm,
        'length',
      ],
      [n, ...widths, ...layerInputs(layout)],
      STATICS,
    ),
    step(
      'icr',
      'elastic',
      [
        'Icr',
        `${compressed.inertia} + Σ ${above} A (kd − d)² + Σ n A (d − kd)²`,
        elastic.crackedInertiaMm4,
        'inertia',
      ],
      [n, ...widths, kd, ...layerInputs(layout)],
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
  ruleSet,
}: WorkingSource): WorkingStep[] {
  const { symbols } = ruleSet;
  const ec: Input = [symbols.concreteModulus, elastic.ecMPa, 'stress'];
  const isCentroid = basis.yieldCurvatureAt === 'centroid';
  const depth: Input = isCentroid ? ['d', layout.dMm, 'length'] : ['dt', layout.dtMm, 'length'];
  const phiY: Input = ['φy', ductility.curvatureYieldPerMm, 'curvature'];
  const phiU: Input = ['φu', ductility.curvatureUltimatePerMm, 'curvature'];
  return [
    step(
      'phi-y',
      'ductility',
      ['φy', `εy/(${depth[0]} − kd)`, phiY[1], 'curvature'],
      [
        ['εy', ruleSet.designYieldMPa(section.fyMPa) / basis.esMPa, 'strain'],
        depth,
        ['kd', elastic.crackedAxisMm, 'length'],
      ],
      STATICS,
    ),
    step(
      'my',
      'ductility',
      ['My', `${ec[0]} Icr φy`, elastic.yieldMomentNmm, 'moment'],
      [ec, ['Icr', elastic.crackedInertiaMm4, 'inertia'], phiY],
      STATICS,
    ),
    step(
      'fc-yield',
      'ductility',
      [
        `${symbols.concreteStress}/${symbols.fc} at yield`,
        `${ec[0]} φy kd/${symbols.fc}`,
        elastic.concreteStressShareAtYield,
        'ratio',
      ],
      [ec, phiY, ['kd', elastic.crackedAxisMm, 'length'], [symbols.fc, section.fcMPa, 'stress']],
      STATICS,
    ),
    step(
      'phi-u',
      'ductility',
      ['φu', `${symbols.epsilonCu}/${symbols.axis}`, phiU[1], 'curvature'],
      [
        [symbols.epsilonCu, flexure.epsilonCu, 'strain'],
        [symbols.axis, flexure.neutralAxisMm, 'length'],
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
