import type { WorkingStep } from '../evaluation.ts';
import { step } from '../working-step.ts';
import { blockStressShare, crushingStrainOf, isHighStrength, meanTensionMPa } from './en1992-concrete.ts';
import type { FullNationalValues } from './national-values.ts';

const TABLE_31 = 'EN 1992-1-1 Table 3.1';

/** Design values of the materials, which everything after them counts on. */
export const designStepsOf =
  (v: FullNationalValues) =>
  (fckMPa: number, fykMPa: number): readonly WorkingStep[] => {
    const fyd = fykMPa / v.gammaS;
    const serviceStress = v.serviceStressShare * fyd;
    const fck = ['fck', fckMPa, 'stress'] as const;
    return [
      step(
        'fcd',
        'materials',
        ['fcd', 'αcc fck/γc', (v.alphaCc * fckMPa) / v.gammaC, 'stress'],
        [['αcc', v.alphaCc, 'ratio'], fck, ['γc', v.gammaC, 'ratio']],
        'EN 1992-1-1 3.1.6(1)',
      ),
      step(
        'eta',
        'materials',
        ['η', '1 − (fck − 50)/200, fck within 50 and 90 MPa', blockStressShare(fckMPa), 'ratio'],
        [fck],
        'EN 1992-1-1 3.1.7(3)',
      ),
      step(
        'epsilon-cu',
        'materials',
        [
          'εcu3',
          isHighStrength(fckMPa) ? '(2.6 + 35 ((90 − fck)/100)^4)/1000' : '0.0035, to C50',
          crushingStrainOf(fckMPa),
          'strain',
        ],
        [fck],
        TABLE_31,
      ),
      step(
        'fyd',
        'materials',
        ['fyd', 'fyk/γs', fyd, 'stress'],
        [
          ['fyk', fykMPa, 'stress'],
          ['γs', v.gammaS, 'ratio'],
        ],
        'EN 1992-1-1 3.2.7',
      ),
      step(
        'fctm',
        'materials',
        [
          'fctm',
          isHighStrength(fckMPa) ? '2.12 ln(1 + (fck + 8)/10); MPa' : '0.3 fck^⅔; MPa',
          meanTensionMPa(fckMPa),
          'stress',
        ],
        [fck],
        TABLE_31,
      ),
      step(
        'sigma-s',
        'materials',
        ['σs', `${v.serviceStressShare} fyd, taken for the stress in service`, serviceStress, 'stress'],
        [['fyd', fyd, 'stress']],
        'office assumption',
      ),
    ];
  };
