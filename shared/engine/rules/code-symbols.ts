/** The letters a code prints for the quantities that every rule set has, for the working and for screens. */
export interface CodeSymbols {
  /** Strengths as they are named: of concrete, of bars, of stirrups. */
  readonly fc: string;
  readonly fy: string;
  readonly fyt: string;
  /** Yield stress that strength counts on, and its strain. */
  readonly fyDesign: string;
  readonly epsilonY: string;
  readonly epsilonCu: string;
  /** Stress of the block, as a formula, and its depth over the axis depth. */
  readonly blockStress: string;
  readonly blockDepthFactor: string;
  /** Depth of the neutral axis at ultimate. */
  readonly axis: string;
  readonly concreteModulus: string;
  readonly ruptureModulus: string;
  /** Concrete's stress where it is not its strength. */
  readonly concreteStress: string;
  /** Depth that the span is held against. */
  readonly spanDepth: string;
  /** Moment and shear asked of the section, and what it can carry. */
  readonly moment: string;
  readonly shear: string;
  /** Moment of the internal forces before strength reduction. */
  readonly nominalMoment: string;
  readonly designMoment: string;
  readonly designShear: string;
  /** Area of a set of stirrups. */
  readonly stirrupArea: string;
  readonly compressionSteel: string;
  readonly compressionDepth: string;
}

export const ACI_SYMBOLS: CodeSymbols = {
  fc: 'f′c',
  fy: 'fy',
  fyt: 'fyt',
  fyDesign: 'fy',
  epsilonY: 'εty',
  epsilonCu: 'εcu',
  blockStress: '0.85 f′c',
  blockDepthFactor: 'β1',
  axis: 'c',
  concreteModulus: 'Ec',
  ruptureModulus: 'fr',
  concreteStress: 'fc',
  spanDepth: 'h',
  moment: 'Mu',
  shear: 'Vu',
  nominalMoment: 'Mn',
  designMoment: 'φMn',
  designShear: 'φVn',
  stirrupArea: 'Av',
  compressionSteel: 'A′s',
  compressionDepth: 'd′',
};

export const EN_SYMBOLS: CodeSymbols = {
  fc: 'fck',
  fy: 'fyk',
  fyt: 'fywk',
  fyDesign: 'fyd',
  epsilonY: 'εyd',
  epsilonCu: 'εcu3',
  blockStress: 'η fcd',
  blockDepthFactor: 'λ',
  axis: 'x',
  concreteModulus: 'Ecm',
  ruptureModulus: 'fct,eff',
  concreteStress: 'σc',
  spanDepth: 'd',
  moment: 'MEd',
  shear: 'VEd',
  nominalMoment: 'MRd',
  designMoment: 'MRd',
  designShear: 'VRd',
  stirrupArea: 'Asw',
  compressionSteel: 'As2',
  compressionDepth: 'd′',
};
