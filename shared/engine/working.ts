import { leastSteelOf } from './checks.ts';
import type {
  DuctilityResult,
  ElasticResult,
  FlexureResult,
  Quantities,
  QuantityKind,
  WorkingStep,
} from './evaluation.ts';
import type { RuleSet } from './rules/rule-set.ts';
import type { DesignBasis, Demand, SectionInput } from './section.ts';
import type { SteelLayout } from './steel-layout.ts';

/** Results whose working is written out. */
export interface WorkingSource {
  readonly section: SectionInput;
  readonly basis: DesignBasis;
  readonly demand: Demand;
  readonly ruleSet: RuleSet;
  readonly layout: SteelLayout;
  readonly flexure: FlexureResult;
  readonly elastic: ElasticResult;
  readonly ductility: DuctilityResult;
  readonly quantities: Quantities;
}

type Input = readonly [symbol: string, value: number, kind: QuantityKind];

const step = (
  id: string,
  topic: WorkingStep['topic'],
  [symbol, formula, value, kind]: readonly [string, string, number, QuantityKind],
  inputs: readonly Input[],
  clause: string,
): WorkingStep => ({
  id,
  topic,
  symbol,
  formula,
  inputs: inputs.map(([s, v, k]) => ({ symbol: s, value: v, kind: k })),
  value,
  kind,
  clause,
});

/** Every step from materials to ductility in the order a checker works: formula, numbers put in, result, clause. */
export function workingOf(source: WorkingSource): readonly WorkingStep[] {
  return [
    ...materials(source),
    ...ultimate(source),
    ...strength(source),
    ...limits(source),
    ...elasticSteps(source),
    ...ductilitySteps(source),
    ...quantitySteps(source),
  ];
}

const STATICS = 'statics';

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
      ['εty', 'fy/Es', section.fyMPa / basis.esMPa, 'strain'],
      [
        ['fy', section.fyMPa, 'stress'],
        ['Es', basis.esMPa, 'stress'],
      ],
      clauses.strengthReduction,
    ),
  ];
}

function ultimate({ section, layout, flexure, ruleSet }: WorkingSource): WorkingStep[] {
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
    step(
      'd',
      'ultimate',
      ['d', 'centroid of the tension steel', layout.dMm, 'length'],
      [['h', section.depthMm, 'length']],
      STATICS,
    ),
    step(
      'c',
      'ultimate',
      ['c', 'depth at which C and all layer forces balance', flexure.neutralAxisMm, 'length'],
      [
        ['b', section.widthMm, 'length'],
        ['As', layout.asMm2, 'area'],
        ['A′s', layout.asPrimeMm2, 'area'],
      ],
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
      ['C', '0.85 f′c b a', flexure.concreteForceN, 'force'],
      [
        ['f′c', section.fcMPa, 'stress'],
        ['b', section.widthMm, 'length'],
        ['a', flexure.blockDepthMm, 'length'],
      ],
      block,
    ),
    ...layers,
    step(
      'residual',
      'ultimate',
      ['ΣT − C over C', '(ΣT − C)/C', flexure.equilibriumResidual, 'ratio'],
      [['C', flexure.concreteForceN, 'force']],
      STATICS,
    ),
  ];
}

function strength({ flexure, section, basis, ruleSet }: WorkingSource): WorkingStep[] {
  const { clauses } = ruleSet;
  return [
    step(
      'mn',
      'strength',
      ['Mn', 'Σ T d − C a/2', flexure.nominalMomentNmm, 'moment'],
      [
        ...flexure.layers.flatMap(({ forceN, depthMm }, i): Input[] => [
          [`T${i + 1}`, forceN, 'force'],
          [`d${i + 1}`, depthMm, 'length'],
        ]),
        ['C', flexure.concreteForceN, 'force'],
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
        ['εty', section.fyMPa / basis.esMPa, 'strain'],
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

function limits(source: WorkingSource): WorkingStep[] {
  const { section, layout, ruleSet, demand } = source;
  const { leastMm2, waivedAtMm2 } = leastSteelOf({ section, demand, ruleSet }, layout);
  const clause = ruleSet.clauses.leastSteel;
  const inputs: Input[] = [
    ['f′c', section.fcMPa, 'stress'],
    ['fy', section.fyMPa, 'stress'],
    ['b', section.widthMm, 'length'],
    ['d', layout.dMm, 'length'],
  ];
  const least = step(
    'as-min',
    'limits',
    ['As,min', ruleSet.formulas.leastSteel, leastMm2, 'area'],
    inputs,
    clause,
  );
  if (waivedAtMm2 === null || demand.muNmm === null) return [least];
  const waiver: readonly [string, string, number, QuantityKind] = [
    'As,waive',
    '4/3 of the steel Mu requires',
    waivedAtMm2,
    'area',
  ];
  return [least, step('as-waive', 'limits', waiver, [['Mu', demand.muNmm, 'moment'], ...inputs], clause)];
}

/** Depth and area of every layer, for the sums over layers. */
const layerInputs = (layout: SteelLayout): Input[] =>
  [...layout.depths].flatMap((depth, i): Input[] => [
    [`d${i + 1}`, depth, 'length'],
    [`A${i + 1}`, layout.areas[i]!, 'area'],
  ]);

function elasticSteps({ section, basis, layout, elastic, ruleSet }: WorkingSource): WorkingStep[] {
  const above = basis.displacedConcrete === 'ignore' ? 'n' : '(n − 1)';
  const n: Input = ['n', elastic.modularRatio, 'ratio'];
  const kd: Input = ['kd', elastic.crackedAxisMm, 'length'];
  return [
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
      ['Mcr', 'fr Iut/yt, transformed section', elastic.crackingMomentNmm, 'moment'],
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
      ['kd', `b kd²/2 + Σ ${above} A (kd − d) = Σ n A (d − kd)`, elastic.crackedAxisMm, 'length'],
      [n, ['b', section.widthMm, 'length'], ...layerInputs(layout)],
      STATICS,
    ),
    step(
      'icr',
      'elastic',
      ['Icr', `b kd³/3 + Σ ${above} A (kd − d)² + Σ n A (d − kd)²`, elastic.crackedInertiaMm4, 'inertia'],
      [n, ['b', section.widthMm, 'length'], kd, ...layerInputs(layout)],
      STATICS,
    ),
    step(
      'fc-yield',
      'elastic',
      ['fc/f′c at yield', 'Ec φy kd/f′c', elastic.concreteStressShareAtYield, 'ratio'],
      [['Ec', elastic.ecMPa, 'stress'], kd],
      STATICS,
    ),
  ];
}

function ductilitySteps({
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

function quantitySteps({ quantities }: WorkingSource): WorkingStep[] {
  const inputs = quantities.steel.map((line): Input => [
    `${line.bar} ${line.position}`,
    line.kgPerM,
    'mass-per-length',
  ]);
  const total = quantities.netSteelKgPerM;
  return [
    step('steel', 'quantities', ['g', 'Σ bars, net', total, 'mass-per-length'], inputs, 'bar standard'),
  ];
}
