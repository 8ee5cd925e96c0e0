import { barCoverMm, spanToDepthOf, stirrupBarOf } from './checks-detailing.ts';
import type { WorkingStep } from './evaluation.ts';
import { seismicSteps } from './working-seismic.ts';
import { shearSteps } from './working-shear.ts';
import { skinSteps, stirrupSteps } from './working-stirrups.ts';
import { materialInputs, type WorkingSource } from './working-source.ts';
import { step, type Input } from './working-step.ts';

/** Limits of crack control and least depth, and shear, each where it is asked. */
export function detailingSteps(source: WorkingSource): WorkingStep[] {
  return [
    ...crackStep(source),
    ...leastDepthStep(source),
    ...skinSteps(source),
    ...seismicSteps(source),
    ...stirrupSteps(source),
    ...shearSteps(source),
  ];
}

function crackStep(source: WorkingSource): WorkingStep[] {
  const { section, ruleSet, placed } = source;
  if (!placed.arrangement) return [];
  const coverMm = barCoverMm(section.coverMm, stirrupBarOf(source));
  const value = ruleSet.crackSpacingMm(section.fyMPa, coverMm);
  const formula = ruleSet.formulas.crackSpacing;
  return [
    step(
      'crack-spacing',
      'limits',
      ['s,max', formula, value, 'length'],
      [
        ...materialInputs(formula, section, ruleSet),
        ...(formula.includes('cc') ? [['cc', coverMm, 'length'] as const] : []),
      ],
      ruleSet.clauses.crackControl,
    ),
  ];
}

function leastDepthStep(source: WorkingSource): WorkingStep[] {
  const { section, demand, ruleSet } = source;
  const { spanMm, support } = demand;
  if (!spanMm || !support) return [];
  const span: Input = ['span', spanMm, 'length'];
  const clause = ruleSet.clauses.leastDepth;
  const toDepth = spanToDepthOf(source);
  if (toDepth === null) {
    const value = ruleSet.leastDepthMm(spanMm, support, section.fyMPa);
    const formula = ruleSet.formulas.leastDepth(support);
    return [
      step(
        'least-depth',
        'limits',
        ['h,min', formula, value, 'length'],
        [span, [ruleSet.symbols.fy, section.fyMPa, 'stress']],
        clause,
      ),
    ];
  }
  const { at } = toDepth;
  const ratio: Input = ['l/d', spanMm / toDepth.leastMm, 'ratio'];
  return [
    step(
      'span-to-depth',
      'limits',
      [ratio[0], ruleSet.formulas.spanToDepth(at), ratio[1], 'ratio'],
      [
        ['ρ', at.rho, 'ratio'],
        ['ρ′', at.rhoPrime, 'ratio'],
        [ruleSet.symbols.fc, section.fcMPa, 'stress'],
        [ruleSet.symbols.fy, section.fyMPa, 'stress'],
        span,
      ],
      clause,
    ),
    step(
      'least-depth',
      'limits',
      ['d,min', ruleSet.formulas.leastDepth(support), toDepth.leastMm, 'length'],
      [span, ratio],
      clause,
    ),
  ];
}
