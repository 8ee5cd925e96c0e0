import type { ConcreteLaw, LawSettings } from './concrete-law.ts';
import type { HoopConfinement } from './confinement.ts';
import { IntegralTable } from './integral-table.ts';
import { twoPressureGain } from './mander-strength.ts';
import { Popovics } from './popovics.ts';

/** Strain at the peak of unconfined concrete, εco. */
const PEAK_STRAIN = 0.002;
/** Cover concrete has spalled: no stress from here on (common practice, no source). */
const SPALLED_STRAIN = 0.005;
/** The formula of the curve needs Ec above the secant Esec; above f′c = 81 MPa the peak strain is raised to keep it so. */
const LARGEST_SECANT_SHARE = 0.9;
/** Steps of the table to twice the peak strain, and beyond it. */
const STEPS_TO_TWICE_PEAK = 48;
const STEPS_BEYOND = 32;
/** ln x at the steps to twice the peak strain, the same for every curve; −∞ at zero, where x^r is zero. */
const LOGS_TO_TWICE_PEAK = Array.from({ length: STEPS_TO_TWICE_PEAK + 1 }, (_, i) =>
  Math.log((2 * i) / STEPS_TO_TWICE_PEAK),
);

/** Ec = 5000 √f′c, MPa: the modulus that belongs to this law. */
const manderModulusMPa = (fcMPa: number) => 5000 * Math.sqrt(fcMPa);
const shown = (value: number) => Number(value.toPrecision(5));

function unconfinedPeakStrain(fcMPa: number, given = PEAK_STRAIN): number {
  return Math.max(given, fcMPa / (LARGEST_SECANT_SHARE * manderModulusMPa(fcMPa)));
}

interface ManderParts {
  readonly isConfined: boolean;
  readonly peakStressMPa: number;
  readonly peakStrain: number;
  readonly crushingStrain: number;
  readonly ecMPa: number;
  /** Where the law ends: with no stress for unconfined concrete, holding its last for a core that is crushed by then. */
  readonly endStrain: number;
}

/** The curve of Popovics to twice its peak; then the same curve (core), or a straight line to zero (cover). */
class ManderLaw implements ConcreteLaw {
  readonly name: string;
  readonly source: string;
  readonly peakStressMPa: number;
  readonly peakStrain: number;
  readonly crushingStrain: number;
  private readonly curve: Popovics;
  private readonly bend: number;
  private readonly end: number;
  private readonly near: IntegralTable;
  private readonly far: IntegralTable | null;
  /** Fall of the line beyond the bend over its length, and stress at the bend and beyond the end. */
  private readonly perFall: number;
  private readonly stressAtBend: number;
  private readonly stressAtEnd: number;
  private readonly forceAtBend: number;
  private readonly momentAtBend: number;
  private readonly forceAtEnd: number;
  private readonly momentAtEnd: number;

  constructor(parts: ManderParts) {
    const { isConfined, peakStressMPa, peakStrain, endStrain } = parts;
    this.name = isConfined ? 'Mander, confined' : 'Mander, unconfined';
    this.source = isConfined ? CONFINED_SOURCE : UNCONFINED_SOURCE;
    this.peakStressMPa = peakStressMPa;
    this.peakStrain = peakStrain;
    this.crushingStrain = parts.crushingStrain;
    this.curve = new Popovics(peakStressMPa, peakStrain, parts.ecMPa);
    this.bend = 2 * peakStrain;
    this.end = endStrain;
    const nearStretch = { from: 0, to: this.bend, steps: STEPS_TO_TWICE_PEAK };
    this.near = new IntegralTable(this.curve, nearStretch, { force: 0, moment: 0 }, LOGS_TO_TWICE_PEAK);
    this.stressAtBend = this.near.stress(this.bend);
    this.forceAtBend = this.near.force(this.bend);
    this.momentAtBend = this.near.moment(this.bend);
    this.perFall = 1 / (endStrain - this.bend);
    const start = { force: this.forceAtBend, moment: this.momentAtBend };
    const farStretch = { from: this.bend, to: endStrain, steps: STEPS_BEYOND };
    this.far = isConfined ? new IntegralTable(this.curve, farStretch, start) : null;
    this.stressAtEnd = this.far ? this.far.stress(endStrain) : 0;
    this.forceAtEnd = this.forceBeyond(endStrain);
    this.momentAtEnd = this.momentBeyond(endStrain);
  }

  get formula(): string {
    const [peak, strain, r] = [this.peakStressMPa, this.peakStrain, this.curve.shape].map(shown);
    return this.far
      ? `f = f′cc x r/(r − 1 + x^r), x = ε/εcc; f′cc = ${peak} MPa, εcc = εco (1 + 5 (f′cc/f′co − 1)) = ${strain}, r = Ec/(Ec − f′cc/εcc) = ${r}, Ec = 5000 √f′c; crushed at 0.004 + 1.4 ρs fyh εsu/f′cc`
      : `f = f′co x r/(r − 1 + x^r), x = ε/εco; f′co = ${peak} MPa, εco = ${strain}, r = Ec/(Ec − f′co/εco) = ${r}, Ec = 5000 √f′c; straight from 2 εco to zero at ${shown(this.end)}`;
  }

  get kinkStrains(): readonly number[] {
    return [this.bend, this.end];
  }

  stress(strain: number): number {
    if (strain <= 0) return 0;
    if (strain >= this.end) return this.stressAtEnd;
    return strain <= this.bend || this.far ? this.curve.stress(strain) : this.lineStress(strain);
  }

  nearStress(strain: number): number {
    if (strain <= 0) return 0;
    if (strain <= this.bend) return this.near.stress(strain);
    if (strain >= this.end) return this.stressAtEnd;
    return this.far ? this.far.stress(strain) : this.lineStress(strain);
  }

  forceIntegral(strain: number): number {
    if (strain <= 0) return 0;
    if (strain <= this.bend) return this.near.force(strain);
    if (strain <= this.end) return this.forceBeyond(strain);
    return this.forceAtEnd + this.stressAtEnd * (strain - this.end);
  }

  momentIntegral(strain: number): number {
    if (strain <= 0) return 0;
    if (strain <= this.bend) return this.near.moment(strain);
    if (strain <= this.end) return this.momentBeyond(strain);
    return this.momentAtEnd + 0.5 * this.stressAtEnd * (strain * strain - this.end * this.end);
  }

  private lineStress(strain: number): number {
    return this.stressAtBend * (1 - (strain - this.bend) * this.perFall);
  }

  private forceBeyond(strain: number): number {
    if (this.far) return this.far.force(strain);
    const past = strain - this.bend;
    return this.forceAtBend + this.stressAtBend * past * (1 - 0.5 * past * this.perFall);
  }

  private momentBeyond(strain: number): number {
    if (this.far) return this.far.moment(strain);
    const { bend, perFall } = this;
    const past = strain - bend;
    const inner = bend + past * (0.5 * (1 - bend * perFall) - (past * perFall) / 3);
    return this.momentAtBend + this.stressAtBend * past * inner;
  }
}

const UNCONFINED_SOURCE =
  'Mander, Priestley and Park (1988), from memory; strains of crushing and spalling common practice, no source';
const CONFINED_SOURCE =
  'Mander, Priestley and Park (1988); two pressures by Chang and Mander (1994); crushing by Priestley, Seible and Calvi (1996); from memory';

/**
 * Mander, unconfined: the curve of Popovics with Ec = 5000 √f′c to twice εco, then straight to zero at the spalling strain
 * (Mander, Priestley and Park, ASCE J. Struct. Eng. 114-8, 1988; memory). εco = 0.002; crushed at 2 εco and spalled at
 * 0.005 (common practice, no source) unless set.
 */
export function manderUnconfined(
  fcMPa: number,
  { peakShare = 1, peakStrain, crushingStrain }: LawSettings = {},
): ConcreteLaw {
  const fco = peakShare * fcMPa;
  const eco = unconfinedPeakStrain(fco, peakStrain);
  return new ManderLaw({
    isConfined: false,
    peakStressMPa: fco,
    peakStrain: eco,
    crushingStrain: crushingStrain ?? 2 * eco,
    ecMPa: manderModulusMPa(fco),
    endStrain: Math.max(SPALLED_STRAIN, 2.5 * eco),
  });
}

/**
 * Mander, confined by the section's own hoops: f′cc from the two effective lateral pressures,
 * εcc = εco (1 + 5 (f′cc/f′co − 1)), the curve of Popovics (Mander, Priestley and Park, 1988; memory). Crushed at
 * 0.004 + 1.4 ρs fyh εsu/f′cc, when the first hoop breaks (Priestley, Seible and Calvi, 1996; memory).
 */
export function manderConfined(
  fcMPa: number,
  hoops: HoopConfinement,
  { peakShare = 1, peakStrain, crushingStrain }: LawSettings = {},
): ConcreteLaw {
  const fco = peakShare * fcMPa;
  const gain = twoPressureGain(hoops.pressureAcrossMPa / fco, hoops.pressureDeepMPa / fco);
  const fcc = gain * fco;
  const ecc = unconfinedPeakStrain(fco, peakStrain) * (1 + 5 * (gain - 1));
  const hoopWork = hoops.volumetricRatio * hoops.hoopYieldMPa * hoops.hoopRuptureStrain;
  const crushedAt = crushingStrain ?? 0.004 + (1.4 * hoopWork) / fcc;
  return new ManderLaw({
    isConfined: true,
    peakStressMPa: fcc,
    peakStrain: ecc,
    crushingStrain: crushedAt,
    ecMPa: manderModulusMPa(fco),
    endStrain: Math.max(1.05 * crushedAt, 2.2 * ecc),
  });
}
