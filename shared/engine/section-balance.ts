import { rootOf, type Sought } from './bracketed-root.ts';
import type { CurveModel } from './curve-model.ts';

/**
 * Axial balance of a section at a curvature φ (1/mm) and a strain of the compression face, compression positive.
 *
 * Plane sections: ε(y) = εtop − φ y. A strip of width b between two strains carries b/φ (F(ε₁) − F(ε₂)) and has the moment
 * b/φ² (G(ε₁) − G(ε₂)) about the neutral axis, F and G being the law's running integrals; the core counts as its own law
 * less that of the cover over its width. Concrete displaced by bars in compression is taken off with the stress of its own
 * law at the bar. A slab's overhang is one more strip of its own depth, of the cover's law.
 */

/** Forces of a state, written by `balance`. */
export interface Balance {
  /** Compression less tension, N. */
  forceN: number;
  /** Concrete's compression alone, N. */
  concreteN: number;
}

export const emptyBalance = (): Balance => ({ forceN: 0, concreteN: 0 });

/** Fills `out` for one state of the cracked section. */
function balance(model: CurveModel, curvature: number, topStrain: number, out: Balance): void {
  const { cover, core, steel, depths, areas, isDisplacedDeducted } = model;
  let force = model.widthMm * cover.forceIntegral(topStrain);
  const atFarFace = topStrain - curvature * model.depthMm;
  if (atFarFace > 0) force -= model.widthMm * cover.forceIntegral(atFarFace);
  if (core) {
    const atTop = topStrain - curvature * model.coreTopMm;
    if (atTop > 0) {
      force += model.coreWidthMm * (core.forceIntegral(atTop) - cover.forceIntegral(atTop));
      const atBottom = topStrain - curvature * model.coreBottomMm;
      if (atBottom > 0)
        force -= model.coreWidthMm * (core.forceIntegral(atBottom) - cover.forceIntegral(atBottom));
    }
  }
  if (model.overhangMm !== 0) force += model.overhangMm * overhangForce(model, curvature, topStrain);
  force /= curvature;
  out.concreteN = force;
  for (let i = 0; i < depths.length; i++) {
    const strain = topStrain - curvature * depths[i]!;
    let stress = steel.stress(strain);
    if (strain > 0 && isDisplacedDeducted) stress -= concreteStressAt(model, depths[i]!, strain);
    force += areas[i]! * stress;
  }
  out.forceN = force;
}

/** Running force integral between the edges of a slab's overhang, MPa. */
function overhangForce(model: CurveModel, curvature: number, topStrain: number): number {
  const atTop = topStrain - curvature * model.overhangTopMm;
  if (atTop <= 0) return 0;
  const atBottom = topStrain - curvature * model.overhangBottomMm;
  const force = model.cover.forceIntegral(atTop);
  return atBottom > 0 ? force - model.cover.forceIntegral(atBottom) : force;
}

/** Running moment integral between the edges of a slab's overhang, MPa. */
function overhangMoment(model: CurveModel, curvature: number, topStrain: number): number {
  const atTop = topStrain - curvature * model.overhangTopMm;
  if (atTop <= 0) return 0;
  const atBottom = topStrain - curvature * model.overhangBottomMm;
  const moment = model.cover.momentIntegral(atTop);
  return atBottom > 0 ? moment - model.cover.momentIntegral(atBottom) : moment;
}

/** ∫ lever^power of a slab's overhang below the axis, mm^(power + 2), for its tension before cracking. */
function stretchedOverhang(model: CurveModel, axisMm: number, power: 1 | 2): number {
  if (model.overhangMm === 0) return 0;
  const far = Math.max(0, model.overhangBottomMm - axisMm);
  const near = Math.max(0, model.overhangTopMm - axisMm);
  return (model.overhangMm * (far ** (power + 1) - near ** (power + 1))) / (power + 1);
}

/** Step in a bar's strain, over it, by which the slope of the concrete it displaces is read. */
const SLOPE_STEP = 1e-5;

/** How the net force grows with the top strain, N, but for a core that reaches beyond the axis: for a first step. */
function stiffnessN(model: CurveModel, curvature: number, topStrain: number): number {
  const { cover, core, steel, depths, areas, isDisplacedDeducted } = model;
  let stiffness = model.widthMm * cover.nearStress(topStrain);
  if (core) {
    const atTop = topStrain - curvature * model.coreTopMm;
    stiffness += model.coreWidthMm * (core.nearStress(atTop) - cover.nearStress(atTop));
  }
  if (model.overhangMm !== 0 && model.overhangTopMm === 0) {
    const atBottom = topStrain - curvature * model.overhangBottomMm;
    stiffness +=
      model.overhangMm * (cover.nearStress(topStrain) - (atBottom > 0 ? cover.nearStress(atBottom) : 0));
  }
  stiffness /= curvature;
  for (let i = 0; i < depths.length; i++) {
    const depth = depths[i]!;
    const strain = topStrain - curvature * depth;
    let tangent = steel.tangent(strain);
    if (strain > 0 && isDisplacedDeducted) {
      const step = SLOPE_STEP * strain;
      const rise = concreteStressAt(model, depth, strain + step) - concreteStressAt(model, depth, strain);
      tangent -= rise / step;
    }
    stiffness += areas[i]! * tangent;
  }
  return stiffness;
}

/** Stress of the concrete at a bar, MPa. */
function concreteStressAt(model: CurveModel, depthMm: number, strain: number): number {
  const { core, cover } = model;
  if (core && depthMm >= model.coreTopMm && depthMm <= model.coreBottomMm) return core.nearStress(strain);
  return cover.nearStress(strain);
}

/** Force of the uncracked concrete in tension below the axis, N, and its moment about the axis, N·mm. */
function tensionForce(model: CurveModel, curvature: number, topStrain: number): number {
  const stretch = curvature * model.depthMm - topStrain;
  if (stretch <= 0) return 0;
  return (
    (model.widthMm * model.tension.ecMPa * stretch * stretch) / (2 * curvature) +
    model.tension.ecMPa * curvature * stretchedOverhang(model, topStrain / curvature, 1) -
    displacedTension(model, curvature, topStrain, 0)
  );
}

/** Tension of concrete that bars displace: force for power 0, moment about the axis for power 1. */
function displacedTension(model: CurveModel, curvature: number, topStrain: number, power: 0 | 1): number {
  if (!model.isDisplacedDeducted) return 0;
  const axis = topStrain / curvature;
  let sum = 0;
  for (let i = 0; i < model.depths.length; i++) {
    const lever = model.depths[i]! - axis;
    if (lever > 0) sum += model.areas[i]! * model.tension.ecMPa * curvature * lever * (power ? lever : 1);
  }
  return sum;
}

/** Whether the section is cracked; before that the concrete below the axis pulls. */
export type Stage = 'uncracked' | 'cracked';

/** Net force of a state, N, compression positive. */
export function netForceN(
  model: CurveModel,
  stage: Stage,
  state: { readonly curvature: number; readonly topStrain: number },
  out: Balance,
): number {
  balance(model, state.curvature, state.topStrain, out);
  return stage === 'cracked'
    ? out.forceN
    : out.forceN - tensionForce(model, state.curvature, state.topStrain);
}

/** Moment of a balanced state, N·mm, sagging positive (taken about its neutral axis). */
export function momentNmm(
  model: CurveModel,
  curvature: number,
  topStrain: number,
  stage: Stage = 'cracked',
): number {
  const { cover, core, steel, depths, areas, isDisplacedDeducted } = model;
  let moment =
    model.widthMm *
    (cover.momentIntegral(topStrain) - cover.momentIntegral(topStrain - curvature * model.depthMm));
  if (core) {
    const atTop = topStrain - curvature * model.coreTopMm;
    const atBottom = topStrain - curvature * model.coreBottomMm;
    moment +=
      model.coreWidthMm *
      (core.momentIntegral(atTop) -
        cover.momentIntegral(atTop) -
        core.momentIntegral(atBottom) +
        cover.momentIntegral(atBottom));
  }
  if (model.overhangMm !== 0) moment += model.overhangMm * overhangMoment(model, curvature, topStrain);
  moment /= curvature * curvature;
  for (let i = 0; i < depths.length; i++) {
    const strain = topStrain - curvature * depths[i]!;
    let stress = steel.stress(strain);
    if (strain > 0 && isDisplacedDeducted) stress -= concreteStressAt(model, depths[i]!, strain);
    moment += (areas[i]! * stress * strain) / curvature;
  }
  if (stage === 'cracked') return moment;
  const stretch = Math.max(0, curvature * model.depthMm - topStrain);
  return (
    moment +
    (model.widthMm * model.tension.ecMPa * stretch ** 3) / (3 * curvature * curvature) +
    model.tension.ecMPa * curvature * stretchedOverhang(model, topStrain / curvature, 2) -
    displacedTension(model, curvature, topStrain, 1)
  );
}

const MOST_STEPS = 80;
/** Unbalanced force, over the concrete's compression, that counts as none: where the top strain is sought, and a curvature. */
const BALANCED = 2e-10;
const HELD_BALANCED = 1e-13;
/** Unbalanced force, over the concrete's compression, above which no step is taken unseen, as a bar may yield within it. */
const NEARLY_BALANCED = 1e-6;
/** Length of the last step, over the strain, above which its end may have been near by luck. */
const CLOSE = 0.02;

/**
 * Top strain that balances the cracked section at a curvature: one step of Newton from a guess, then secants, inside a
 * bracket that shrinks with every step. At zero strain every bar pulls; with the axis at the deepest bar none does. A step
 * that leaves the bracket, or is not half the last, halves it instead. A secant lessens the force by as much as the last step
 * did, at least; where that ends within `BALANCED` the last step need not be looked at.
 */
export function balancedTopStrain(model: CurveModel, curvature: number, guess: number, out: Balance): number {
  let low = 0;
  let high = curvature * model.deepestMm;
  let strain = guess > low && guess < high ? guess : 0.5 * high;
  let slope = stiffnessN(model, curvature, strain);
  let lastStrain = strain;
  let lastForce = 0;
  let lastOff = 0;
  let lastStep = high;
  for (let count = 0; count < MOST_STEPS; count++) {
    balance(model, curvature, strain, out);
    if (out.forceN > 0) high = strain;
    else low = strain;
    const off = Math.abs(out.forceN) / out.concreteN;
    if (off <= BALANCED) break;
    if (count > 0) slope = (out.forceN - lastForce) / (strain - lastStrain);
    lastStrain = strain;
    lastForce = out.forceN;
    const step = -out.forceN / slope;
    const isGood = strain + step > low && strain + step < high && Math.abs(step) < 0.5 * lastStep;
    strain = isGood ? strain + step : 0.5 * (low + high);
    const isNear = off <= NEARLY_BALANCED && lastStep <= CLOSE * lastStrain;
    if (isGood && isNear && off * off <= BALANCED * lastOff) break;
    lastOff = off;
    lastStep = Math.abs(strain - lastStrain);
    if (high - low <= Number.EPSILON * high) break;
  }
  return strain;
}

/** A strain (compression positive) held at a depth while the curvature is sought. */
export interface HeldStrain {
  readonly depthMm: number;
  readonly strain: number;
}

/**
 * Net force with a strain held at a depth: by the radius of curvature where the section is cracked, in which the concrete's
 * part is straight, else by the curvature, in which all of it nearly is; so the root is soon found.
 */
class HeldForce implements Sought {
  private readonly model: CurveModel;
  private readonly held: HeldStrain;
  private readonly out: Balance;
  private readonly stage: Stage;

  constructor(model: CurveModel, held: HeldStrain, out: Balance, stage: Stage) {
    this.model = model;
    this.held = held;
    this.out = out;
    this.stage = stage;
  }

  valueAt(x: number): number {
    const { model, held, out, stage } = this;
    const curvature = stage === 'cracked' ? 1 / x : x;
    const topStrain = held.strain + curvature * held.depthMm;
    balance(model, curvature, topStrain, out);
    const force = stage === 'cracked' ? out.forceN : out.forceN - tensionForce(model, curvature, topStrain);
    return Math.abs(force) <= HELD_BALANCED * out.concreteN ? 0 : force;
  }
}

/**
 * Curvature between two bounds at which the section balances with a strain held at a depth; NaN where the bounds do not
 * bracket one.
 */
export function balancedCurvature(
  model: CurveModel,
  held: HeldStrain,
  { low, high }: { readonly low: number; readonly high: number },
  out: Balance,
  stage: Stage = 'cracked',
): number {
  const force = new HeldForce(model, held, out, stage);
  return stage === 'cracked' ? 1 / rootOf(force, 1 / high, 1 / low) : rootOf(force, low, high);
}
