import type { Popovics } from './popovics.ts';

/** Where a table begins, ends, and in how many steps. */
export interface Stretch {
  readonly from: number;
  readonly to: number;
  readonly steps: number;
}

/**
 * Running integrals of a curve without closed form, over a stretch of equal steps.
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
  /** Per node: f, f′ h, F, G. */
  private readonly nodes: Float64Array;

  constructor(curve: Popovics, { from, to, steps }: Stretch, start: { force: number; moment: number }) {
    this.from = from;
    this.to = to;
    this.step = (to - from) / steps;
    this.perStep = 1 / this.step;
    this.last = steps - 1;
    const nodes = new Float64Array(4 * (steps + 1));
    this.nodes = nodes;
    nodes[2] = start.force;
    nodes[3] = start.moment;
    for (let i = 0; i <= steps; i++) {
      const strain = from + i * this.step;
      const stress = curve.stress(strain);
      nodes[4 * i] = stress;
      nodes[4 * i + 1] = curve.slopeFrom(strain, stress) * this.step;
      if (i === 0) continue;
      nodes[4 * i + 2] = this.forceWithin(i - 1, 1);
      nodes[4 * i + 3] = this.momentWithin(i - 1, 1);
    }
  }

  /** f as tabulated, at a strain from `from` to `to`. */
  stress(strain: number): number {
    const at = (strain - this.from) * this.perStep;
    const i = Math.min(this.last, at | 0);
    const t = at - i;
    const { nodes } = this;
    const f = nodes[4 * i]!;
    const slope = nodes[4 * i + 1]!;
    const rise = nodes[4 * i + 4]! - f;
    const nextSlope = nodes[4 * i + 5]!;
    return f + t * (slope + t * (3 * rise - 2 * slope - nextSlope + t * (slope + nextSlope - 2 * rise)));
  }

  /** F at a strain from `from` to `to`. */
  force(strain: number): number {
    const at = (strain - this.from) * this.perStep;
    const i = Math.min(this.last, at | 0);
    return this.forceWithin(i, at - i);
  }

  /** G at a strain from `from` to `to`. */
  moment(strain: number): number {
    const at = (strain - this.from) * this.perStep;
    const i = Math.min(this.last, at | 0);
    return this.momentWithin(i, at - i);
  }

  private forceWithin(i: number, t: number): number {
    const k = 4 * i;
    const { nodes } = this;
    const f = nodes[k]!;
    const slope = nodes[k + 1]!;
    const rise = nodes[k + 4]! - f;
    const nextSlope = nodes[k + 5]!;
    const c2 = 3 * rise - 2 * slope - nextSlope;
    const c3 = slope + nextSlope - 2 * rise;
    return nodes[k + 2]! + this.step * t * (f + t * (slope / 2 + t * (c2 / 3 + (t * c3) / 4)));
  }

  private momentWithin(i: number, t: number): number {
    const k = 4 * i;
    const { nodes, step } = this;
    const f = nodes[k]!;
    const slope = nodes[k + 1]!;
    const rise = nodes[k + 4]! - f;
    const nextSlope = nodes[k + 5]!;
    const c2 = 3 * rise - 2 * slope - nextSlope;
    const c3 = slope + nextSlope - 2 * rise;
    const force = step * t * (f + t * (slope / 2 + t * (c2 / 3 + (t * c3) / 4)));
    const arm = step * step * t * t * (f / 2 + t * (slope / 3 + t * (c2 / 4 + (t * c3) / 5)));
    return nodes[k + 3]! + (this.from + i * step) * force + arm;
  }
}
