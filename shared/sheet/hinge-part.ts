import type { CurveReport, HingeReport } from '../engine/curve-report.ts';
import { formatQuantity } from '../print/format-quantity.ts';
import type { DisplayKind } from '../print/units.ts';
import type { StudyWriting } from './curve-part.ts';
import type { SheetPart, WorkingLine } from './sheet.ts';

/** Hinge length, plastic rotation and displacement ductility that follow from the full curve. */
export function hingePart(curve: CurveReport | null, writing: StudyWriting): SheetPart | null {
  if (!curve?.hinge) return null;
  return {
    id: 'hinge',
    title: 'Plastic hinge, from the full curve',
    kind: 'working',
    lines: stepsOf(curve, curve.hinge).flatMap((step) => lineOf(step, writing)),
  };
}

type Put = readonly [symbol: string, value: number, kind: DisplayKind];

interface HingeStep {
  readonly id: string;
  readonly symbol: string;
  readonly expression: string;
  readonly remark: string;
  /** Null where no bar yields. */
  readonly value: number | null;
  readonly kind: DisplayKind;
  readonly inputs: readonly Put[];
  readonly clause: string;
}

function stepsOf({ bilinear, marks, ductility }: CurveReport, hinge: HingeReport): HingeStep[] {
  const length: Put = ['Lp', hinge.hingeLengthMm, 'length'];
  const member: Put = ['L', hinge.lengthMm, 'length'];
  const ultimate = marks.find(({ id }) => id === 'ultimate')?.curvaturePerMm ?? 0;
  return [
    {
      id: 'lp',
      symbol: 'Lp',
      expression: '0.08 L + 0.022 fye db',
      remark: `MPa, mm; L is ${hinge.lengthIs}`,
      value: hinge.hingeLengthMm,
      kind: 'length',
      inputs: [member, ['fye', hinge.expectedYieldMPa, 'stress'], ['db', hinge.barDiameterMm, 'length']],
      clause: 'Paulay and Priestley 1992',
    },
    {
      id: 'theta-p',
      symbol: 'θp',
      expression: '(φu − φy) Lp',
      remark: 'rad; φy of the two lines',
      value: hinge.plasticRotation,
      kind: 'strain',
      inputs: [
        ['φu', ultimate, 'curvature'],
        ['φy', bilinear?.yieldCurvaturePerMm ?? 0, 'curvature'],
        length,
      ],
      clause: 'definition',
    },
    {
      id: 'mu-delta',
      symbol: 'μΔ',
      expression: '1 + 3 (μφ − 1) (Lp/L) (1 − 0.5 Lp/L)',
      remark: 'a cantilever as long, loaded at its tip',
      value: hinge.displacementDuctility,
      kind: 'ratio',
      inputs: [
        ['μφ', ductility.find(({ id }) => id === 'curve-bilinear')?.value ?? 0, 'ratio'],
        length,
        member,
      ],
      clause: 'Park and Paulay 1975',
    },
  ];
}

function lineOf({ value, inputs, ...step }: HingeStep, writing: StudyWriting): WorkingLine[] {
  if (value === null) return [];
  const print = (amount: number, kind: DisplayKind) =>
    formatQuantity(amount, kind, writing.units, { digits: 4 });
  return [
    {
      ...step,
      id: `hinge-${step.id}`,
      number: writing.numbering.next(),
      value: writing.isFrozen ? value : null,
      relation: '=',
      inputs: inputs.map(([symbol, amount, kind]) => ({ symbol, text: print(amount, kind) })),
      result: print(value, step.kind),
    },
  ];
}
