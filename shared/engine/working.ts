import type { WorkingStep } from './evaluation.ts';
import type { CodeSymbols } from './rules/code-symbols.ts';
import { leastSteelSteps } from './working-least-steel.ts';
import { detailingSteps } from './working-detailing.ts';
import { ductilitySteps, elasticSteps } from './working-elastic.ts';
import { compressedWidth, flangeSteps, widthInputs } from './working-flange.ts';
import { ductilityLimitSteps } from './working-limits.ts';
import { quantitySteps } from './working-quantities.ts';
import { layerInputs, materialInputs, type WorkingSource } from './working-source.ts';
import { STATICS, step, type Input } from './working-step.ts';

/** Every step from materials to ductility in the order a checker works: formula, numbers put in, result, clause. */
export function workingOf(source: WorkingSource): readonly WorkingStep[] {
  return [
    ...materials(source),
    ...ultimate(source),
    ...strength(source),
    ...ductilityLimitSteps(source),
    ...leastSteelSteps(source),
    ...detailingSteps(source),
    ...elasticSteps(source),
    ...ductilitySteps(source),
    ...quantitySteps(source),
  ];
}

function materials({ section, basis, ruleSet, flexure, elastic }: WorkingSource): WorkingStep[] {
  const { clauses, symbols } = ruleSet;
  const fc: Input = [symbols.fc, section.fcMPa, 'stress'];
  const yieldMPa = ruleSet.designYieldMPa(section.fyMPa);
  return [
    ...ruleSet.designSteps(section.fcMPa, section.fyMPa),
    step(
      'beta1',
      'materials',
      [symbols.blockDepthFactor, ruleSet.formulas.blockDepthFactor, flexure.beta1, 'ratio'],
      [fc],
      clauses.block,
    ),
    step(
      'ec',
      'materials',
      [symbols.concreteModulus, ruleSet.formulas.concreteModulus, elastic.ecMPa, 'stress'],
      [fc],
      clauses.concreteModulus,
    ),
    step(
      'n',
      'materials',
      ['n', `Es/${symbols.concreteModulus}`, elastic.modularRatio, 'ratio'],
      [
        ['Es', basis.esMPa, 'stress'],
        [symbols.concreteModulus, elastic.ecMPa, 'stress'],
      ],
      STATICS,
    ),
    step(
      'epsilonTy',
      'materials',
      [symbols.epsilonY, `${symbols.fyDesign}/Es`, yieldMPa / basis.esMPa, 'strain'],
      [
        [symbols.fyDesign, yieldMPa, 'stress'],
        ['Es', basis.esMPa, 'stress'],
      ],
      clauses.strengthReduction,
    ),
  ];
}

/** Compressed concrete of the block under its stress σ, by the width it has: its depth from the axis, and its force. */
const BLOCK = {
  web: { axis: 'σ b β c', force: 'σ b a' },
  flange: { axis: 'σ bf β c', force: 'σ bf a' },
  both: { axis: 'σ (b β c + (bf − b) hf)', force: 'σ (b a + (bf − b) hf)' },
} as const;

/** A formula of the block in the letters of the code. */
const inLetters = (formula: string, { blockStress, blockDepthFactor, axis }: CodeSymbols) =>
  formula.replace('σ', blockStress).replace('β c', `${blockDepthFactor} ${axis}`);

function ultimate(source: WorkingSource): WorkingStep[] {
  const { section, layout, flexure, ruleSet } = source;
  const width = compressedWidth(source, flexure.blockDepthMm);
  const { symbols } = ruleSet;
  const c: Input = [symbols.axis, flexure.neutralAxisMm, 'length'];
  const fc = materialInputs(symbols.blockStress, section, ruleSet);
  const beta: Input = [symbols.blockDepthFactor, flexure.beta1, 'ratio'];
  const block = ruleSet.clauses.block;
  const layers = flexure.layers.flatMap((layer, i) => {
    const name = `${i + 1}`;
    const d: Input = [`d${name}`, layer.depthMm, 'length'];
    const strain: Input = [`ε${name}`, layer.strain, 'strain'];
    const stress: Input = [`fs${name}`, layer.stressMPa, 'stress'];
    const forceFormula = layer.displacedConcreteDeducted
      ? `A${name} (fs${name} + ${symbols.blockStress})`
      : `A${name} fs${name}`;
    return [
      step(
        `strain-${name}`,
        'ultimate',
        [strain[0], `${symbols.epsilonCu} (d${name} − ${c[0]})/${c[0]}`, strain[1], 'strain'],
        [d, c],
        block,
      ),
      step(
        `stress-${name}`,
        'ultimate',
        [stress[0], `Es ε${name}, within ±${symbols.fyDesign}`, stress[1], 'stress'],
        [strain],
        block,
      ),
      step(
        `force-${name}`,
        'ultimate',
        [`T${name}`, forceFormula, layer.forceN, 'force'],
        [[`A${name}`, layer.areaMm2, 'area'], stress, ...(layer.displacedConcreteDeducted ? fc : [])],
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
      [
        c[0],
        `${inLetters(BLOCK[width].axis, symbols)} = ΣT, each T from its own strain; solved for ${c[0]}`,
        c[1],
        'length',
      ],
      [...fc, ...widthInputs(source, width), beta, ...layerInputs(layout)],
      STATICS,
    ),
    step('a', 'ultimate', ['a', `${beta[0]} ${c[0]}`, flexure.blockDepthMm, 'length'], [beta, c], block),
    step(
      'concrete-force',
      'ultimate',
      ['C', inLetters(BLOCK[width].force, symbols), flexure.concreteForceN, 'force'],
      [...fc, ...widthInputs(source, width), ['a', flexure.blockDepthMm, 'length']],
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

/** Moment of the internal forces, and its reduction where the code has one beside partial factors. */
function strength(source: WorkingSource): WorkingStep[] {
  const { flexure, section, basis, ruleSet } = source;
  const { clauses, symbols } = ruleSet;
  const width = compressedWidth(source, flexure.blockDepthMm);
  const ofBlock: readonly Input[] =
    width === 'both'
      ? [...materialInputs(symbols.blockStress, section, ruleSet), ...widthInputs(source, width)]
      : [['C', flexure.concreteForceN, 'force']];
  const mn = width === 'both' ? `Σ T d − ${symbols.blockStress} (b a²/2 + (bf − b) hf²/2)` : 'Σ T d − C a/2';
  const nominal = step(
    'mn',
    'strength',
    [symbols.nominalMoment, mn, flexure.nominalMomentNmm, 'moment'],
    [
      ...flexure.layers.flatMap(({ forceN, depthMm }, i): Input[] => [
        [`T${i + 1}`, forceN, 'force'],
        [`d${i + 1}`, depthMm, 'length'],
      ]),
      ...ofBlock,
      ['a', flexure.blockDepthMm, 'length'],
    ],
    clauses.strength,
  );
  if (symbols.nominalMoment === symbols.designMoment) return [nominal];
  return [
    nominal,
    step(
      'phi',
      'strength',
      ['φ', ruleSet.formulas.strengthReduction, flexure.strengthReduction, 'ratio'],
      [
        ['εt', flexure.tensionStrain, 'strain'],
        [symbols.epsilonY, ruleSet.designYieldMPa(section.fyMPa) / basis.esMPa, 'strain'],
      ],
      clauses.strengthReduction,
    ),
    step(
      'phi-mn',
      'strength',
      [symbols.designMoment, `φ ${symbols.nominalMoment}`, flexure.designMomentNmm, 'moment'],
      [
        ['φ', flexure.strengthReduction, 'ratio'],
        [symbols.nominalMoment, flexure.nominalMomentNmm, 'moment'],
      ],
      clauses.strength,
    ),
  ];
}
