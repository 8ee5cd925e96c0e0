import { leastSteelOf } from './checks.ts';
import type { WorkingStep } from './evaluation.ts';
import { compressedWidth, widthInputs } from './working-flange.ts';
import { materialInputs, type WorkingSource } from './working-source.ts';
import { step, type Input } from './working-step.ts';

/** Steel that Mu requires times k, by the width of the block: web, flange, or the overhang's part and the web's. */
const WAIVER = {
  web: 'k σ b d/fy (1 − √(1 − 2 Mu/(φ σ b d²)))',
  flange: 'k σ bf d/fy (1 − √(1 − 2 Mu/(φ σ bf d²)))',
  both: 'k (σ (bf − b) hf/fy + σ b d/fy (1 − √(1 − 2 (Mu/φ − σ (bf − b) hf (d − hf/2))/(σ b d²))))',
} as const;

/** As,min, and the steel from which it is waived. */
export function leastSteelSteps(source: WorkingSource): WorkingStep[] {
  const { section, layout, ruleSet, demand } = source;
  const { leastMm2, waivedAtMm2, widthMm } = leastSteelOf({ section, demand, ruleSet }, layout);
  const clause = ruleSet.clauses.leastSteel;
  const { leastSteel } = ruleSet.formulas;
  const { symbols } = ruleSet;
  const fy: Input = [symbols.fy, section.fyMPa, 'stress'];
  const d: Input = ['d', layout.dMm, 'length'];
  const b: Input = ['b', section.widthMm, 'length'];
  const isOwnWidth = widthMm !== section.widthMm;
  const steps: WorkingStep[] = [];
  const { leastSteelWidth } = ruleSet.formulas;
  const letters = leastSteelWidth.split(/[^\p{L}]+/u);
  const sizes: readonly Input[] = [
    b,
    ...widthInputs(source, 'both').slice(1),
    ['h', section.depthMm, 'length'],
  ];
  if (isOwnWidth)
    steps.push(
      step(
        'as-min-width',
        'limits',
        ['bt', leastSteelWidth, widthMm, 'length'],
        sizes.filter(([symbol]) => letters.includes(symbol)),
        clause,
      ),
    );
  steps.push(
    step(
      'as-min',
      'limits',
      ['As,min', isOwnWidth ? leastSteel.replace(' b d', ' bt d') : leastSteel, leastMm2, 'area'],
      [...materialInputs(leastSteel, section, ruleSet), [isOwnWidth ? 'bt' : 'b', widthMm, 'length'], d],
      clause,
    ),
  );
  const { leastSteelWaiver: k } = ruleSet;
  if (waivedAtMm2 === null || k === null || demand.muNmm === null) return steps;
  const sigmaMPa = ruleSet.blockStressMPa(section.fcMPa);
  const width = compressedWidth(source, blockDepthMm(source, waivedAtMm2 / k));
  steps.push(
    step(
      'as-waive',
      'limits',
      ['As,waive', `${WAIVER[width]}, k times the steel Mu requires; σ = 0.85 f′c`, waivedAtMm2, 'area'],
      [
        ['Mu', demand.muNmm, 'moment'],
        ['k', k, 'ratio'],
        ['σ', sigmaMPa, 'stress'],
        ['φ', ruleSet.tensionControlledReduction, 'ratio'],
        fy,
        ...widthInputs(source, width),
        d,
      ],
      clause,
    ),
  );
  return steps;
}

/** Depth of the block were it all in the flange, mm: beyond the flange's thickness it is not. */
function blockDepthMm({ section, ruleSet }: WorkingSource, steelMm2: number): number {
  const flangeMm = widthInputs({ section, ruleSet }, 'flange')[0]![1];
  return (steelMm2 * section.fyMPa) / (ruleSet.blockStressMPa(section.fcMPa) * flangeMm);
}
