import type { Popovics } from './popovics.ts';

/** Where a table begins, ends, and in how many steps. */
export interface Stretch {
  readonly from: number;
  readonly to: number;
  readonly steps: number;
}

const MOST_STEPS = 48;
/** Numbers of a step: F and G where it begins, then f, a, b and c of F = F₀ + h t (f + t (a + t (b + t c))). */
const PER_STEP = 6;
/** Copied for the steps: a list of doubles is had at a fraction of what a typed array of this size costs. */
const NO_STEPS: readonly number[] = Array.from({ length: PER_STEP * MOST_STEPS }, () => 0.5);
const THIRD = 1 / 3;

/**
 * Running integrals of a curve without closed form, over a stretch of at most 48 equal steps.
 *
 * Between nodes f is the cubic that has the curve's value and slope at both ends (Hermite); F = ∫f and G = ∫f ε are its
 * exact integrals, so that F′ = f̃ and G′ = f̃ ε hold to rounding, and no force jumps at a node. The error of F over a step
 * is h⁵ f⁗/720.
 */
export class IntegralTable {
  readonly from: number;
  readonly to: number;
  private readonly step: number;
  private readonly perStep: number;
  private readonly last: number;
  private readonly steps: number[];

  /** `logs`: ln x at the nodes, for who knows it. */
  constructor(
    curve: Popovics,
    { from, to, steps }: Stretch,
    start: { force: number; moment: number },
    logs?: readonly number[],
  ) {
    this.from = from;
    this.to = to;
    this.step = (to - from) / steps;
    this.perStep = 1 / this.step;
    this.last = steps - 1;
    this.steps = NO_STEPS.slice(0, PER_STEP * steps);
    this.fill(curve, start, logs);
  }

  /**
   * Over a step, s the slope times h: f = f₀ + t (s₀ + t (c₂ + t c₃)), c₂ = 3 Δf − 2 s₀ − s₁, c₃ = s₀ + s₁ − 2 Δf; so a = s₀/2,
   * b = c₂/3, c = c₃/4, ∫f = h (f₀ + a + b + c), ∫f t = h² (f₀/2 + 2 a/3 + 3 b/4 + 4 c/5).
   */
  private fill(curve: Popovics, start: { force: number; moment: number }, logs?: readonly number[]): void {
    const { steps, step, from, last } = this;
    const { shape, scale, peakStrain } = curve;
    const slopeScale = ((step * scale) / peakStrain) * (shape - 1);
    let { force, moment } = start;
    let f = 0;
    let slope = 0;
    for (let i = 0; i <= last + 1; i++) {
      const x = (from + i * step) / peakStrain;
      const power = Math.exp(shape * (logs ? logs[i]! : Math.log(x)));
      const perBelow = 1 / (shape - 1 + power);
      const nextF = scale * x * perBelow;
      const nextSlope = slopeScale * (1 - power) * perBelow * perBelow;
      if (i > 0) {
        const rise = nextF - f;
        const k = PER_STEP * (i - 1);
        steps[k] = force;
        steps[k + 1] = moment;
        steps[k + 2] = f;
        const a = (steps[k + 3] = 0.5 * slope);
        const b = (steps[k + 4] = rise - (2 * slope + nextSlope) * THIRD);
        const c = (steps[k + 5] = 0.25 * (slope + nextSlope) - 0.5 * rise);
        const added = step * (f + a + b + c);
        moment += (from + (i - 1) * step) * added + step * step * armOf(f, a, b, c);
        force += added;
      }
      f = nextF;
      slope = nextSlope;
    }
  }

  /** f as tabulated, at a strain from `from` to `to`. */
  stress(strain: number): number {
    const { steps } = this;
    const at = (strain - this.from) * this.perStep;
    const i = Math.min(this.last, at | 0);
    const t = at - i;
    const k = PER_STEP * i;
    return steps[k + 2]! + t * (2 * steps[k + 3]! + t * (3 * steps[k + 4]! + 4 * t * steps[k + 5]!));
  }

  /** F at a strain from `from` to `to`. */
  force(strain: number): number {
    const { steps } = this;
    const at = (strain - this.from) * this.perStep;
    const i = Math.min(this.last, at | 0);
    const t = at - i;
    const k = PER_STEP * i;
    const mean = steps[k + 2]! + t * (steps[k + 3]! + t * (steps[k + 4]! + t * steps[k + 5]!));
    return steps[k]! + this.step * t * mean;
  }

  /** G at a strain from `from` to `to`. */
  moment(strain: number): number {
    const { steps, step } = this;
    const at = (strain - this.from) * this.perStep;
    const i = Math.min(this.last, at | 0);
    const t = at - i;
    const k = PER_STEP * i;
    const f = steps[k + 2]!;
    const a = t * steps[k + 3]!;
    const b = t * t * steps[k + 4]!;
    const c = t * t * t * steps[k + 5]!;
    const length = step * t;
    return steps[k + 1]! + length * ((this.from + i * step) * (f + a + b + c) + length * armOf(f, a, b, c));
  }
}

/** ∫f t over a length of one. */
const armOf = (f: number, a: number, b: number, c: number): number =>
  0.5 * f + 2 * THIRD * a + 0.75 * b + 0.8 * c;
