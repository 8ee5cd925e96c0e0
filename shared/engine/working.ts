import type { WorkingStep } from './evaluation.ts';
import { leastSteelSteps } from './working-least-steel.ts';
import { detailingSteps } from './working-detailing.ts';
import { ductilitySteps, elasticSteps } from './working-elastic.ts';
import { compressedWidth, flangeSteps, widthInputs } from './working-flange.ts';
import { quantitySteps } from './working-quantities.ts';
import { layerInputs, STATICS, step, type Input, type WorkingSource } from './working-step.ts';

/** Every step from materials to ductility in the order a checker works: formula, numbers put in, result, clause. */
export function workingOf(source: WorkingSource): readonly WorkingStep[] {
  return [
    ...materials(source),
    ...ultimate(source),
    ...strength(source),
    ...leastSteelSteps(source),
    ...detailingSteps(source),
    ...elasticSteps(source),
    ...ductilitySteps(source),
    ...quantitySteps(source),
  ];
}

function materials({ section, basis, ruleSet, flexure, elastic }: WorkingSource): WorkingStep[] {
  const fc: Input = ['f′c', section.fcMPa, 'stress'];
  const { clauses } = ruleSet;
  return [
    step(
      'beta1',
      'materials',
      ['β1', ruleSet.formulas.blockDepthFactor, flexure.beta1, 'ratio'],
      [fc],
      clauses.block,
    ),
    step(
      'ec',
      'materials',
      ['Ec', ruleSet.formulas.concreteModulus, elastic.ecMPa, 'stress'],
      [fc],
      clauses.concreteModulus,
    ),
    step(
      'n',
      'materials',
      ['n', 'Es/Ec', elastic.modularRatio, 'ratio'],
      [
        ['Es', basis.esMPa, 'stress'],
        ['Ec', elastic.ecMPa, 'stress'],
      ],
      STATICS,
    ),
    step(
      'epsilonTy',
      'materials',
      ['εty', 'fy/Es', ruleSet.designYieldMPa(section.fyMPa) / basis.esMPa, 'strain'],
      [
        ['fy', ruleSet.designYieldMPa(section.fyMPa), 'stress'],
        ['Es', basis.esMPa, 'stress'],
      ],
      clauses.strengthReduction,
    ),
  ];
}

/** Compressed concrete of the block, by the width it has. */
const BLOCK = {
  web: { axis: '0.85 f′c b β1 c', force: '0.85 f′c b a' },
  flange: { axis: '0.85 f′c bf β1 c', force: '0.85 f′c bf a' },
  both: { axis: '0.85 f′c (b β1 c + (bf − b) hf)', force: '0.85 f′c (b a + (bf − b) hf)' },
} as const;

function ultimate(source: WorkingSource): WorkingStep[] {
  const { section, layout, flexure, ruleSet } = source;
  const width = compressedWidth(source, flexure.blockDepthMm);
  const c: Input = ['c', flexure.neutralAxisMm, 'length'];
  const fc: Input = ['f′c', section.fcMPa, 'stress'];
  const block = ruleSet.clauses.block;
  const layers = flexure.layers.flatMap((layer, i) => {
    const name = `${i + 1}`;
    const d: Input = [`d${name}`, layer.depthMm, 'length'];
    const strain: Input = [`ε${name}`, layer.strain, 'strain'];
    const stress: Input = [`fs${name}`, layer.stressMPa, 'stress'];
    const forceFormula = layer.displacedConcreteDeducted
      ? `A${name} (fs${name} + 0.85 f′c)`
      : `A${name} fs${name}`;
    return [
      step(
        `strain-${name}`,
        'ultimate',
        [strain[0], `εcu (d${name} − c)/c`, strain[1], 'strain'],
        [d, c],
        block,
      ),
      step(
        `stress-${name}`,
        'ultimate',
        [stress[0], `Es ε${name}, within ±fy`, stress[1], 'stress'],
        [strain],
        block,
      ),
      step(
        `force-${name}`,
        'ultimate',
        [`T${name}`, forceFormula, layer.forceN, 'force'],
        [[`A${name}`, layer.areaMm2, 'area'], stress, ...(layer.displacedConcreteDeducted ? [fc] : [])],
        STATICS,
      ),
    ];
  });
  return [
    ...flangeSteps(source),
    step(
      'd',
      'ultimate',
      ['d', 'Σ A d/Σ A, tension steel', layout.dMm, 'length'],
      layerInputs(layout, 'tension'),
      STATICS,
    ),
    step(
      'c',
      'ultimate',
      ['c', `${BLOCK[width].axis} = ΣT, each T from its own strain; solved for c`, c[1], 'length'],
      [fc, ...widthInputs(source, width), ['β1', flexure.beta1, 'ratio'], ...layerInputs(layout)],
      STATICS,
    ),
    step(
      'a',
      'ultimate',
      ['a', 'β1 c', flexure.blockDepthMm, 'length'],
      [['β1', flexure.beta1, 'ratio'], c],
      block,
    ),
    step(
      'concrete-force',
      'ultimate',
      ['C', BLOCK[width].force, flexure.concreteForceN, 'force'],
      [
        ['f′c', section.fcMPa, 'stress'],
        ...widthInputs(source, width),
        ['a', flexure.blockDepthMm, 'length'],
      ],
      block,
    ),
    ...layers,
    step(
      'residual',
      'ultimate',
      ['Residual', '(ΣT − C)/C', flexure.equilibriumResidual, 'ratio'],
      [
        ['ΣT', flexure.layers.reduce((sum, { forceN }) => sum + forceN, 0), 'force'],
        ['C', flexure.concreteForceN, 'force'],
      ],
      STATICS,
    ),
  ];
}

function strength(source: WorkingSource): WorkingStep[] {
  const { flexure, section, basis, ruleSet } = source;
  const { clauses } = ruleSet;
  const width = compressedWidth(source, flexure.blockDepthMm);
  const ofBlock: readonly Input[] =
    width === 'both'
      ? [['f′c', section.fcMPa, 'stress'], ...widthInputs(source, width)]
      : [['C', flexure.concreteForceN, 'force']];
  const mn = width === 'both' ? 'Σ T d − 0.85 f′c (b a²/2 + (bf − b) hf²/2)' : 'Σ T d − C a/2';
  return [
    step(
      'mn',
      'strength',
      ['Mn', mn, flexure.nominalMomentNmm, 'moment'],
      [
        ...flexure.layers.flatMap(({ forceN, depthMm }, i): Input[] => [
          [`T${i + 1}`, forceN, 'force'],
          [`d${i + 1}`, depthMm, 'length'],
        ]),
        ...ofBlock,
        ['a', flexure.blockDepthMm, 'length'],
      ],
      clauses.strength,
    ),
    step(
      'phi',
      'strength',
      ['φ', ruleSet.formulas.strengthReduction, flexure.strengthReduction, 'ratio'],
      [
        ['εt', flexure.tensionStrain, 'strain'],
        ['εty', ruleSet.designYieldMPa(section.fyMPa) / basis.esMPa, 'strain'],
      ],
      clauses.strengthReduction,
    ),
    step(
      'phi-mn',
      'strength',
      ['φMn', 'φ Mn', flexure.designMomentNmm, 'moment'],
      [
        ['φ', flexure.strengthReduction, 'ratio'],
        ['Mn', flexure.nominalMomentNmm, 'moment'],
      ],
      clauses.strength,
    ),
  ];
}
