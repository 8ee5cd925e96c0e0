import type { WorkingStep } from './evaluation.ts';
import type { WorkingSource } from './working-source.ts';
import { step } from './working-step.ts';

/** Largest depth of the neutral axis and most steel, where the code limits these. */
export function ductilityLimitSteps({ section, layout, ruleSet }: WorkingSource): WorkingStep[] {
  const { clauses, formulas, symbols } = ruleSet;
  const axisShare = ruleSet.largestAxisShare(section.fcMPa);
  const steelShare = ruleSet.largestFaceSteelShare;
  return [
    ...(axisShare === null
      ? []
      : [
          step(
            'axis-limit',
            'limits',
            [`${symbols.axis},max`, formulas.axisShare(section.fcMPa), axisShare * layout.dMm, 'length'],
            [
              ['d', layout.dMm, 'length'],
              [symbols.epsilonCu, ruleSet.crushingStrain(section.fcMPa), 'strain'],
            ],
            clauses.axisDepth,
          ),
        ]),
    ...(steelShare === null
      ? []
      : [
          step(
            'as-max',
            'limits',
            [
              'As,max',
              `${steelShare} b h, at either face`,
              steelShare * section.widthMm * section.depthMm,
              'area',
            ],
            [
              ['b', section.widthMm, 'length'],
              ['h', section.depthMm, 'length'],
            ],
            clauses.mostSteel,
          ),
        ]),
  ];
}
