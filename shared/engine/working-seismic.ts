import { faceSteelOf } from './checks-seismic.ts';
import type { WorkingStep } from './evaluation.ts';
import { flangeOf } from './flange.ts';
import { reversedStrength } from './reversal.ts';
import { FACES } from './section.ts';
import { leastWebMm } from './seismic.ts';
import { materialInputs, type WorkingSource } from './working-source.ts';
import { STATICS, step, type Input } from './working-step.ts';

const OTHER_FACE = 'As of the other face';

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
  return FACES.flatMap((face) => {
    const of = faceSteelOf(source, face);
    if (!of) return [];
    const { clauses, formulas } = source.seismic!;
    const stepOf = (which: 'least' | 'most', formula: string, value: number, clause: string) =>
      step(
        `seismic-${which}-${face}`,
        'limits',
        [`As,${which === 'least' ? 'min' : 'max'} ${face}`, formula, value, 'area'],
        steelInputs(source, of, formula),
        clause,
      );
    const least = stepOf('least', formulas.leastSteel(face), of.leastMm2, clauses.leastSteel(face));
    if (of.mostMm2 === Infinity) return [least];
    return [least, stepOf('most', formulas.mostSteel, of.mostMm2, clauses.mostSteel)];
  });
}

/** Sizes, strengths and design values a limit names; all of its strengths for one told in words. */
function steelInputs(
  { section, basis, demand, ruleSet }: WorkingSource,
  of: { readonly dMm: number; readonly otherMm2: number },
  formula: string,
): Input[] {
  const { fc, fy, epsilonY } = ruleSet.symbols;
  const isOfOther = formula.includes(OTHER_FACE);
  const isOfOwn = !isOfOther || formula.includes('b d');
  const named = materialInputs(formula, section, ruleSet);
  const strengths: Input[] = [
    [fc, section.fcMPa, 'stress'],
    [fy, section.fyMPa, 'stress'],
  ];
  const { ductilityTarget } = demand;
  return [
    ...(isOfOwn
      ? ([
          ['b', section.widthMm, 'length'],
          ['d', of.dMm, 'length'],
        ] as const)
      : []),
    ...(isOfOther ? ([[OTHER_FACE, of.otherMm2, 'area']] as const) : []),
    ...(named.length > 0 || !isOfOwn ? named : strengths),
    ...(ductilityTarget !== null && formula.includes('μφ')
      ? ([
          [epsilonY, ruleSet.designYieldMPa(section.fyMPa) / basis.esMPa, 'strain'],
          ['μφ', ductilityTarget, 'ratio'],
        ] as const)
      : []),
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
  const flange = flangeOf(section, ruleSet);
  const widths: Input[] = [
    ['b', section.widthMm, 'length'],
    // the slab at the tension face is at the compression face now
    ...(flange?.face === 'tension'
      ? ([
          ['bf', flange.widthMm, 'length'],
          ['hf', flange.thicknessMm, 'length'],
        ] as const)
      : []),
  ];
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
    [...(neutralAxisMm > 0 ? [axis] : []), ...widths, ...layers],
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
