import type { UnitSystem } from '../contract/design-basis.ts';
import type { Snapshot } from '../contract/records.ts';
import type { CodeSymbols } from '../engine/rules/code-symbols.ts';
import type { SectionInput, YieldCurvatureAt } from '../engine/section.ts';
import { codeSymbols } from '../print/code-symbols.ts';
import { isHogging } from '../print/face-word.ts';
import { formatNumber } from '../print/format-quantity.ts';

const DISPLACED = {
  deduct:
    'Concrete displaced by bars inside the stress block is deducted from their force; where two equilibria lie side by side the deeper axis is taken.',
  'deduct-above-axis':
    'Concrete displaced by bars above the neutral axis is deducted from their force, inside the block or not.',
  ignore: 'Concrete displaced by bars is not deducted.',
} as const;

const YIELD_AT = {
  'outermost-layer': { what: 'outermost tension layer first', depth: 'dt' },
  centroid: { what: 'centroid of the tension steel', depth: 'd' },
} as const;

function yieldConvention(at: YieldCurvatureAt, { fyDesign }: CodeSymbols): string {
  const { what, depth } = YIELD_AT[at];
  return `φy is the curvature at which the ${what} reaches εy = ${fyDesign}/Es on the cracked elastic section: φy = εy/(${depth} − kd).`;
}

/** Said where a code works with design strengths: its curvatures do so too. */
const designValues = ({ fy, fyDesign, blockStress }: CodeSymbols): string[] =>
  fy === fyDesign
    ? []
    : [
        `Strength and both curvatures are worked with design values, ${blockStress} in the block and ${fyDesign} in the steel; there is no further reduction.`,
      ];

const BEND = {
  'corner-in-bend':
    'Corner bars sit in the bend of the stirrup: their centre is at the greater of the bend’s inside radius and half the bar from the leg.',
  none: 'Corner bars touch both legs of the stirrup; no allowance is made for its bend.',
} as const;

/** A slab in tension lies at the top, so that the section hogs; all that is printed is of that bending, without a sign. */
const bendingOf = (section: SectionInput): string =>
  isHogging(section)
    ? 'The section hogs: tension at the top, in the slab. Its moments are printed without a sign; depths are measured from the compression face, the bottom.'
    : 'Sagging moments are positive; depths are measured from the compression face, the top.';

/** How the numbers are to be read: signs, units, and each choice on which they depend. */
export function conventionsOf({ evaluation, section }: Snapshot, units: UnitSystem): string[] {
  const { conventions, flexure, elastic } = evaluation;
  const symbols = codeSymbols(evaluation.ruleSet.id);
  const crushing = flexure ? `${symbols.epsilonCu} = ${formatNumber(flexure.epsilonCu, 4, true)}, ` : '';
  const share = elastic === null ? '' : formatNumber(elastic.concreteStressShareAtYield, 2);
  return [
    `${bendingOf(section)} In steel, tension is positive in strain, stress and force; C is the compression in the concrete. Moments are taken about the compression face.`,
    `Ultimate: plane sections, no tension in concrete, rectangular block, ${crushing}steel elastic and then perfectly plastic, each layer at its own strain; no layer is assumed to yield.`,
    ...(section.flange
      ? ['In the formulas b is the width of the web, bw; bf and hf are of the flange.']
      : []),
    DISPLACED[conventions.displacedConcrete],
    ...designValues(symbols),
    yieldConvention(conventions.yieldCurvatureAt, symbols),
    `φu = ${symbols.epsilonCu}/${symbols.axis} at the ultimate state above; μφ = φu/φy. Other definitions give other numbers.`,
    ...(elastic?.isElasticPictureDoubtful
      ? [
          `At first yield the concrete carries ${share} ${symbols.fc} by the elastic section, more than 0.7 ${symbols.fc}: it has left its straight line there, and φy and My are approximate.`,
        ]
      : []),
    ...(evaluation.arrangement === null ? [] : [BEND[conventions.bendAllowance]]),
    units === 'us'
      ? 'Lengths in inches, forces in kips: 12 kip·in = 1 kip·ft, 1 ksi = 1000 psi. Formulas with √f′c take f′c in psi and give psi.'
      : 'Lengths in mm, forces in kN, stresses in MPa = N/mm²: 1 kN·m = 1000 kN·mm.',
    'Worked in full precision from the unrounded numbers; printed to four figures, forces and moments to five.',
  ];
}
