/** Stress–strain law of reinforcing steel, the same in tension and compression (bars that buckle are not checked). */
export interface SteelLaw {
  readonly name: string;
  readonly formula: string;
  readonly source: string;
  readonly fyMPa: number;
  readonly esMPa: number;
  readonly yieldStrain: number;
  /** Strain at which a bar breaks; the law holds its stress beyond, where no curve goes. */
  readonly ruptureStrain: number;
  /** Strains where the law changes its formula. */
  readonly kinkStrains: readonly number[];
  /** MPa, with the sign of the strain. */
  stress(strain: number): number;
  /** dσ/dε, MPa. */
  tangent(strain: number): number;
}

/** Strain at which a bar of ordinary grade breaks, unless set (Priestley, Seible and Calvi, 1996, for Grade 60; memory). */
const RUPTURE_STRAIN = 0.12;
const RUPTURE_SOURCE = 'rupture at 0.12 by Priestley, Seible and Calvi (1996)';

export interface SteelGrade {
  readonly fyMPa: number;
  readonly esMPa: number;
  readonly ruptureStrain?: number | undefined;
  /** How the code names the yield stress, and where it gives the law; fy unless set. */
  readonly yieldName?: string | undefined;
  readonly clause?: string | undefined;
}

const shown = (value: number) => Number(value.toPrecision(5));

class ElasticPlasticLaw implements SteelLaw {
  readonly name = 'elastic–plastic';
  readonly source: string;
  readonly fyMPa: number;
  readonly esMPa: number;
  readonly yieldStrain: number;
  readonly ruptureStrain: number;

  private readonly yieldName: string;

  constructor({ fyMPa, esMPa, ruptureStrain, yieldName = 'fy', clause = 'common practice' }: SteelGrade) {
    this.fyMPa = fyMPa;
    this.esMPa = esMPa;
    this.yieldStrain = fyMPa / esMPa;
    this.ruptureStrain = ruptureStrain ?? RUPTURE_STRAIN;
    this.yieldName = yieldName;
    this.source = `${clause}${ruptureStrain === undefined ? `; ${RUPTURE_SOURCE}` : ''}; from memory`;
  }

  get formula(): string {
    return `σ = Es ε, at most ${this.yieldName} = ${shown(this.fyMPa)} MPa; breaks at ${this.ruptureStrain}`;
  }

  get kinkStrains(): readonly number[] {
    return [this.yieldStrain];
  }

  stress(strain: number): number {
    if (strain > this.yieldStrain) return this.fyMPa;
    return strain < -this.yieldStrain ? -this.fyMPa : this.esMPa * strain;
  }

  tangent(strain: number): number {
    return strain > this.yieldStrain || strain < -this.yieldStrain ? 0 : this.esMPa;
  }
}

/** σ = Es ε within ±fy (ACI 318 20.2.2.1; EN 1992-1-1 3.2.7(2)b; memory). */
export function elasticPlastic(grade: SteelGrade): SteelLaw {
  return new ElasticPlasticLaw(grade);
}

export interface Hardening extends SteelGrade {
  /** fu over fy. */
  readonly strengthRatio?: number | undefined;
  /** Strain at which hardening begins. */
  readonly hardeningStrain?: number | undefined;
  /** Exponent of the branch; 2 is a parabola with its crown at rupture. */
  readonly exponent?: number | undefined;
}

class HardeningLaw implements SteelLaw {
  readonly name = 'strain-hardening';
  readonly source = 'Mander (1984); Priestley, Seible and Calvi (1996), from memory';
  readonly fyMPa: number;
  readonly esMPa: number;
  readonly yieldStrain: number;
  readonly ruptureStrain: number;
  private readonly fuMPa: number;
  private readonly start: number;
  private readonly exponent: number;
  private readonly yieldName: string;

  constructor({
    fyMPa,
    esMPa,
    yieldName = 'fy',
    ruptureStrain = RUPTURE_STRAIN,
    strengthRatio = 1.25,
    hardeningStrain = 0.008,
    exponent = 2,
  }: Hardening) {
    this.fyMPa = fyMPa;
    this.esMPa = esMPa;
    this.yieldStrain = fyMPa / esMPa;
    this.ruptureStrain = ruptureStrain;
    this.fuMPa = strengthRatio * fyMPa;
    // steel so strong that it would yield after hardening began has no flat
    this.start = Math.max(hardeningStrain, this.yieldStrain);
    this.exponent = exponent;
    this.yieldName = yieldName;
  }

  get formula(): string {
    const { yieldName, start, exponent, ruptureStrain } = this;
    return `σ = Es ε to ${yieldName} = ${shown(this.fyMPa)} MPa, flat to εsh = ${shown(start)}, then fu − (fu − ${yieldName}) ((εsu − ε)/(εsu − εsh))^${exponent}; fu = ${shown(this.fuMPa)} MPa, breaks at εsu = ${ruptureStrain}`;
  }

  get kinkStrains(): readonly number[] {
    return [this.yieldStrain, this.start];
  }

  stress(strain: number): number {
    return strain < 0 ? -this.magnitude(-strain) : this.magnitude(strain);
  }

  tangent(strain: number): number {
    const size = Math.abs(strain);
    if (size <= this.yieldStrain) return this.esMPa;
    if (size <= this.start || size >= this.ruptureStrain) return 0;
    const perLength = 1 / (this.ruptureStrain - this.start);
    const left = (this.ruptureStrain - size) * perLength;
    const power = this.exponent === 2 ? left : left ** (this.exponent - 1);
    return (this.fuMPa - this.fyMPa) * this.exponent * perLength * power;
  }

  private magnitude(strain: number): number {
    if (strain <= this.yieldStrain) return this.esMPa * strain;
    if (strain <= this.start) return this.fyMPa;
    if (strain >= this.ruptureStrain) return this.fuMPa;
    const left = (this.ruptureStrain - strain) / (this.ruptureStrain - this.start);
    return (
      this.fuMPa - (this.fuMPa - this.fyMPa) * (this.exponent === 2 ? left * left : left ** this.exponent)
    );
  }
}

/**
 * Elastic to fy, flat to εsh, then fs = fu − (fu − fy) ((εsu − ε)/(εsu − εsh))^P to rupture at εsu (Mander's branch, University
 * of Canterbury, 1984; with P = 2 the parabola of Priestley, Seible and Calvi, 1996; memory). Unless set: εsh 0.008,
 * εsu 0.12 (the same book, Grade 60), and fu = 1.25 fy, the least ratio ACI 318-19 20.2.2.5 asks of seismic bars.
 */
export function strainHardening(grade: Hardening): SteelLaw {
  return new HardeningLaw(grade);
}
