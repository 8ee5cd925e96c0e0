import { getBar } from './bars.ts';
import { barCoverMm, stirrupBarOf } from './checks-detailing.ts';
import type { WorkingStep } from './evaluation.ts';
import { concreteShearN, isSpacingHalved, longestAlongMm, type ShearConstants } from './shear.ts';
import { innermostTensionMm } from './skin-steel.ts';
import { SPACING_LIMITS, type SpacingLimit } from './spacing-limits.ts';
import { hoopLimitMm, tieLimitMm } from './stirrup-design.ts';
import type { WorkingSource } from './working-source.ts';
import { step, type Input } from './working-step.ts';

/** Largest spacings by ties and hoops, and where the spacing is designed, every other limit and the spacing chosen. */
export function stirrupSteps(source: WorkingSource): WorkingStep[] {
  const { stirrups } = source;
  if (!stirrups.rules) return [];
  return [...tieStep(source), ...hoopStep(source), ...designSteps(source)];
}

const diametersOf = ({ section, basis }: WorkingSource, faces: readonly ('tension' | 'compression')[]) => {
  const { reinforcement } = section;
  if (reinforcement.kind === 'layers') return [];
  return faces.flatMap((face) =>
    reinforcement[face].map(({ bar }) => getBar(basis.barStandard, bar).diameterMm),
  );
};

function tieStep(source: WorkingSource): WorkingStep[] {
  const { section, ruleSet, stirrups } = source;
  const tied = diametersOf(source, ['compression']);
  const rules = stirrups.rules!;
  if (tied.length === 0) return [];
  const value = tieLimitMm(rules, section.depthMm);
  const sides: Input[] =
    rules.leastSideMm === Infinity
      ? []
      : [
          ['b', section.widthMm, 'length'],
          ['h', section.depthMm, 'length'],
        ];
  return [
    step(
      'tie-spacing',
      'limits',
      ['s,ties', ruleSet.formulas.tieSpacing, value, 'length'],
      [['db', Math.min(...tied), 'length'], ['ds', stirrupBarOf(source)!.diameterMm, 'length'], ...sides],
      ruleSet.clauses.compressionTies,
    ),
  ];
}

function hoopStep(source: WorkingSource): WorkingStep[] {
  const { section, layout, seismic, skin, stirrups } = source;
  if (!seismic?.hoops) return [];
  const hasSkin = skin !== null && skin.perSide > 0;
  const value = hoopLimitMm(stirrups.rules!, layout.dMm, section.depthMm, hasSkin);
  const bars = diametersOf(source, ['tension', 'compression']);
  const least = Math.min(...bars, ...(hasSkin && seismic.hoops.countsSkinBars ? skinMm(source) : []));
  return [
    step(
      'hoop-limit',
      'limits',
      ['s,hoops', seismic.formulas.hoops, value, 'length'],
      [
        ['d', layout.dMm, 'length'],
        ['h', section.depthMm, 'length'],
        ...(least < Infinity ? [['db', least, 'length'] as const] : []),
        ['ds', stirrupBarOf(source)!.diameterMm, 'length'],
      ],
      seismic.clauses.hoops,
    ),
  ];
}

const skinMm = ({ basis }: WorkingSource) =>
  basis.skinBar ? [getBar(basis.barStandard, basis.skinBar, ['basis', 'skinBar']).diameterMm] : [];

function designSteps(source: WorkingSource): WorkingStep[] {
  const { design, rules, built } = source.stirrups;
  if (!design || !built) return [];
  const { limits } = design.state;
  const limitOf = (id: SpacingLimit) => limits[SPACING_LIMITS.indexOf(id)]!;
  const given: Input = ['s,widest', rules!.widestMm, 'length'];
  const found = [
    ...strengthStep(source, limitOf('shear-strength')),
    ...spacingSteps(source, limitOf('along'), limitOf('least-area')),
  ];
  const ties = Math.min(limitOf('ties'), limitOf('least-side'));
  const hoops = Math.min(limitOf('hoops-depth'), limitOf('hoops-bars'));
  const bounds: Input[] = [
    given,
    ...found
      .filter(({ id }) => id !== 'least-stirrups')
      .map(({ symbol, value }): Input => [symbol, value, 'length']),
    ...(ties < Infinity ? [['s,ties', ties, 'length'] as const] : []),
    ...(hoops < Infinity ? [['s,hoops', hoops, 'length'] as const] : []),
  ];
  const isClosest = !(built.neededMm! + 1e-6 >= rules!.leastMm);
  return [
    ...found,
    step(
      'spacing-needed',
      'limits',
      ['s,max', `the least of these: ${built.reason}`, built.neededMm!, 'length'],
      bounds,
      source.ruleSet.clauses.stirrupSpacing,
    ),
    step(
      'designed-spacing',
      'limits',
      [
        's',
        isClosest ? 'the closest that is built' : 's,max rounded down to a multiple of the step',
        built.spacingMm,
        'length',
      ],
      isClosest
        ? [['s,least', rules!.leastMm, 'length']]
        : [
            ['s,max', built.neededMm!, 'length'],
            ['step', rules!.stepMm, 'length'],
          ],
      'practical steps, project',
    ),
  ];
}

/** Spacing at which the design strength reaches what is asked; none where the concrete alone carries it. */
function strengthStep(source: WorkingSource, limitMm: number): WorkingStep[] {
  const { ruleSet, layout, stirrups } = source;
  const { state, constants: k } = stirrups.design!;
  const { vuN, dMm } = state;
  if (!(limitMm < Infinity)) return [];
  const { symbols } = ruleSet;
  const area: Input = [symbols.stirrupArea, k.avMm2, 'area'];
  const asked: Input = [symbols.shear, vuN, 'force'];
  const [formula, inputs] = ((): [string, Input[]] => {
    if (k.form === 'additive')
      return [
        `${symbols.stirrupArea} fyt d/(${symbols.shear}/φ − Vc)`,
        [
          area,
          ['fyt', Math.min(k.fytMPa, k.rules.fytCapMPa), 'stress'],
          ['d', dMm, 'length'],
          asked,
          ['φ', k.rules.reduction, 'ratio'],
          ['Vc', concreteShearN(k, dMm, layout.asMm2, 0), 'force'],
        ],
      ];
    const leverMm = k.rules.leverArmShare * dMm;
    const cot = (limitMm * vuN) / (k.avMm2 * k.fywdMPa * leverMm);
    return [
      `${symbols.stirrupArea} z fywd cot θ/${symbols.shear}, cot θ the flattest at which the struts carry it`,
      [area, ['z', leverMm, 'length'], ['fywd', k.fywdMPa, 'stress'], ['cot θ', cot, 'ratio'], asked],
    ];
  })();
  return [
    step(
      'spacing-strength',
      'limits',
      [
        's,shear',
        limitMm > 0 ? formula : 'no stirrups are enough: the section is too small',
        limitMm,
        'length',
      ],
      inputs,
      ruleSet.clauses.shearStirrups,
    ),
  ];
}

function spacingSteps(source: WorkingSource, alongMm: number, areaMm: number): WorkingStep[] {
  const { ruleSet, section } = source;
  const { state, constants: k } = source.stirrups.design!;
  const { symbols } = ruleSet;
  const clause = ruleSet.clauses.leastStirrups;
  const least: Input = [`${symbols.stirrupArea},min/s`, k.leastAvPerMm, 'length'];
  const leastFormula =
    k.form === 'additive' ? k.rules.formulas.leastStirrups : `${k.rules.leastStirrupRoot} √fck b/fywk; MPa`;
  const fyt = k.form === 'additive' ? Math.min(k.fytMPa, k.rules.fytCapMPa) : k.fytMPa;
  return [
    alongStep(source, state.vuN, alongMm, k),
    step(
      'least-stirrups',
      'limits',
      [least[0], leastFormula, least[1], 'length'],
      [
        [symbols.fc, section.fcMPa, 'stress'],
        ['b', section.widthMm, 'length'],
        [symbols.fyt, fyt, 'stress'],
      ],
      clause,
    ),
    step(
      'spacing-area',
      'limits',
      ['s,area', `${symbols.stirrupArea}/(${least[0]})`, areaMm, 'length'],
      [[symbols.stirrupArea, k.avMm2, 'area'], least],
      clause,
    ),
  ];
}

function alongStep(source: WorkingSource, vuN: number, alongMm: number, k: ShearConstants): WorkingStep {
  const { layout, ruleSet } = source;
  const { dMm } = layout;
  const d: Input = ['d', dMm, 'length'];
  const clause = ruleSet.clauses.spacingAlong;
  if (k.form !== 'additive')
    return step(
      'spacing-along',
      'limits',
      ['s,along', `${k.rules.longestSpacingShare} d`, alongMm, 'length'],
      [d],
      clause,
    );
  const concreteN = concreteShearN(k, dMm, layout.asMm2, 0);
  const isHalved = vuN === vuN && isSpacingHalved(k, vuN, dMm, concreteN);
  const longest: Input = ['s,long', longestAlongMm(k, Infinity, isHalved), 'length'];
  return step(
    'spacing-along',
    'limits',
    ['s,along', `min(d/${isHalved ? 4 : 2}, s,long)`, alongMm, 'length'],
    [d, longest],
    clause,
  );
}

/** Spacing and number of the side bars of a deep section. */
export function skinSteps(source: WorkingSource): WorkingStep[] {
  const { section, layout, ruleSet, skin } = source;
  if (!skin) return [];
  const clause = ruleSet.clauses.skinSteel;
  const allowed: Input = ['s,skin', skin.allowedMm, 'length'];
  return [
    step(
      'skin-spacing',
      'limits',
      [allowed[0], ruleSet.formulas.skinSpacing, allowed[1], 'length'],
      [
        [ruleSet.symbols.fy, section.fyMPa, 'stress'],
        ['cc', barCoverMm(section.coverMm, stirrupBarOf(source)), 'length'],
      ],
      clause,
    ),
    step(
      'skin-bars',
      'limits',
      [
        'bars a side',
        '(y − h/2)/s,skin rounded up; y the depth of the tension bars nearest mid-depth',
        skin.perSide,
        'count',
      ],
      [['y', innermostTensionMm(layout), 'length'], ['h', section.depthMm, 'length'], allowed],
      clause,
    ),
  ];
}
