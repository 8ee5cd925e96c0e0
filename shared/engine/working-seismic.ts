import { faceSteelOf } from './checks-seismic.ts';
import type { WorkingStep } from './evaluation.ts';
import { reversedStrength } from './reversal.ts';
import { FACES } from './section.ts';
import { leastWebMm } from './seismic.ts';
import { materialInputs, type WorkingSource } from './working-source.ts';
import { STATICS, step, type Input } from './working-step.ts';

/** What the moment frame asks, with numbers. Hoops are with the stirrups. */
export function seismicSteps(source: WorkingSource): WorkingStep[] {
  if (!source.seismic) return [];
  return [...widthStep(source), ...spanStep(source), ...steelSteps(source), ...reversalSteps(source)];
}

function widthStep({ section, seismic }: WorkingSource): WorkingStep[] {
  if (!seismic?.leastWidth) return [];
  const value = leastWebMm(seismic.leastWidth, section.depthMm);
  return [
    step(
      'seismic-width',
      'limits',
      ['b,min', seismic.formulas.width, value, 'length'],
      [['h', section.depthMm, 'length']],
      seismic.clauses.width,
    ),
  ];
}

function spanStep({ demand, layout, seismic }: WorkingSource): WorkingStep[] {
  const least = seismic?.leastSpanToDepth ?? null;
  if (least === null || !demand.spanMm) return [];
  const { dMm } = layout;
  return [
    step(
      'seismic-span',
      'limits',
      ['ln,min', `${least} d`, least * dMm, 'length'],
      [['d', dMm, 'length']],
      seismic!.clauses.span,
    ),
  ];
}

function steelSteps(source: WorkingSource): WorkingStep[] {
  const { section, ruleSet, seismic } = source;
  return FACES.flatMap((face) => {
    const of = faceSteelOf(source, face);
    if (!of) return [];
    const inputs: Input[] = [
      ['b', section.widthMm, 'length'],
      ['d', of.dMm, 'length'],
      [ruleSet.symbols.fc, section.fcMPa, 'stress'],
      [ruleSet.symbols.fy, section.fyMPa, 'stress'],
      ['As of the other face', of.otherMm2, 'area'],
    ];
    const { clauses, formulas } = seismic!;
    const steps = [
      step(
        `seismic-least-${face}`,
        'limits',
        [`As,min ${face}`, formulas.leastSteel, of.leastMm2, 'area'],
        [...inputs, ...designInputs(source, formulas.leastSteel)],
        clauses.steel,
      ),
    ];
    if (of.mostMm2 < Infinity)
      steps.push(
        step(
          `seismic-most-${face}`,
          'limits',
          [`As,max ${face}`, formulas.mostSteel, of.mostMm2, 'area'],
          [...inputs, ...designInputs(source, formulas.mostSteel)],
          clauses.steel,
        ),
      );
    return steps;
  });
}

/** Design values a limit names besides the strengths, and the curvature ductility it is to allow. */
function designInputs({ section, basis, demand, ruleSet }: WorkingSource, formula: string): Input[] {
  const { fc, fy, epsilonY } = ruleSet.symbols;
  const named = materialInputs(formula, section, ruleSet).filter(
    ([symbol]) => symbol !== fc && symbol !== fy,
  );
  const { ductilityTarget } = demand;
  if (ductilityTarget === null || !formula.includes('μφ')) return named;
  return [
    ...named,
    [epsilonY, ruleSet.designYieldMPa(section.fyMPa) / basis.esMPa, 'strain'],
    ['μφ', ductilityTarget, 'ratio'],
  ];
}

function reversalSteps({ section, layout, basis, ruleSet, seismic, flexure }: WorkingSource): WorkingStep[] {
  const share = seismic?.reversalShare ?? null;
  if (share === null) return [];
  const { momentNmm, neutralAxisMm } = reversedStrength(section, layout, basis, ruleSet);
  const { symbols } = ruleSet;
  const n = layout.depths.length;
  const layers = Array.from({ length: n }, (_, i): Input[] => [
    [`d${i + 1}`, section.depthMm - layout.depths[n - 1 - i]!, 'length'],
    [`A${i + 1}`, layout.areas[n - 1 - i]!, 'area'],
  ]).flat();
  const axis: Input = [symbols.axis, neutralAxisMm, 'length'];
  const least: Input = [`${symbols.nominalMoment},min`, share * flexure.nominalMomentNmm, 'moment'];
  const strength = step(
    'reversed-strength',
    'limits',
    [
      `${symbols.nominalMoment} reversed`,
      'as above with the faces changed over, depths from the other face',
      momentNmm,
      'moment',
    ],
    [...(neutralAxisMm > 0 ? [axis] : []), ...layers],
    STATICS,
  );
  return [
    strength,
    step(
      'reversed-least',
      'limits',
      [least[0], `share × ${symbols.nominalMoment}`, least[1], 'moment'],
      [
        ['share', share, 'ratio'],
        [symbols.nominalMoment, flexure.nominalMomentNmm, 'moment'],
      ],
      seismic!.clauses.reversal,
    ),
  ];
}
