import type { ConcreteLaw } from './concrete-laws/concrete-law.ts';
import type { CurveModel } from './curve-model.ts';
import type { UltimateCause } from './ultimate-cause.ts';
import { compressedOverhang, flangeOf } from './flange.ts';
import type { DisplacedConcrete, SectionInput } from './section.ts';
import type { SteelLayout } from './steel-layout.ts';
import { elasticPlastic, type SteelLaw } from './steel-laws.ts';
import type { RuleSet } from './rules/rule-set.ts';

/**
 * Second opinion on `momentCurvature` and on the closed strength, by another way on purpose: the section cut into strips,
 * each with the stress at its middle (no integrals), led by the strain of the compression face instead
 * of the curvature, and the axis found by halving alone. Slower by a hundred times and plain enough to be read in one go.
 */

/** What a strip's concrete does: any law, or the rectangular block. */
type StressLaw = Pick<ConcreteLaw, 'stress'>;

/** A section cut up. Depths mm from the compression face, areas mm². */
export interface FibreSection {
  readonly stripDepths: Float64Array;
  readonly coverAreas: Float64Array;
  readonly coreAreas: Float64Array;
  readonly cover: StressLaw;
  readonly core: StressLaw;
  readonly barDepths: Float64Array;
  readonly barAreas: Float64Array;
  readonly steel: Pick<SteelLaw, 'stress'>;
  /** Concrete stress to take off at a bar of some depth and strain (compression positive), MPa. */
  readonly displacedMPa: (depthMm: number, strain: number) => number;
  readonly deepestMm: number;
}

/** A balanced state: strain of the compression face (shortening positive), axis mm, curvature 1/mm, moment N·mm. */
export interface FibreState {
  readonly topStrain: number;
  readonly axisMm: number;
  readonly curvaturePerMm: number;
  readonly momentNmm: number;
}

export interface FibreCurve {
  readonly firstYield: FibreState | null;
  readonly peak: FibreState;
  readonly ultimate: FibreState;
  readonly cause: UltimateCause;
}

const DEFAULT_STRIPS = 240;
/** The axis is halved to this share of itself; the strain of an event, between two steps, so many times. */
const AXIS_SHARE = 1e-6;
const EVENT_HALVINGS = 13;
const KEPT_SHARE = 0.8;
const NEAR_DROP = 0.82;
/** Step of the compression face's strain, and its growth where a confined section goes far. */
const STRAIN_STEP = 0.00025;
const STEP_GROWTH = 0.05;
const LARGEST_STRAIN = 1;
const CROWN_CUTS = 8;
const BLOCK_STRIPS = 2000;
const BLOCK_STEPS = 100;

/** Edges h (i/n)²: fine near the compression face, where a lightly reinforced section has its axis. */
const stripEdges = (depthMm: number, strips: number) =>
  Float64Array.from({ length: strips + 1 }, (_, i) => depthMm * (i / strips) ** 2);

/** Cuts a model into strips; a strip that the core's edge or the slab's soffit crosses has a share of both. */
function fibreSection(model: CurveModel, strips = DEFAULT_STRIPS): FibreSection {
  const edges = stripEdges(model.depthMm, strips);
  const stripDepths = new Float64Array(strips);
  const coverAreas = new Float64Array(strips);
  const coreAreas = new Float64Array(strips);
  for (let i = 0; i < strips; i++) {
    const [top, bottom] = [edges[i]!, edges[i + 1]!];
    const inCore = Math.max(0, Math.min(bottom, model.coreBottomMm) - Math.max(top, model.coreTopMm));
    stripDepths[i] = (top + bottom) / 2;
    coreAreas[i] = model.core ? inCore * model.coreWidthMm : 0;
    const inSlab = Math.min(bottom, model.overhangBottomMm) - Math.max(top, model.overhangTopMm);
    coverAreas[i] = (bottom - top) * model.widthMm - coreAreas[i]! + Math.max(0, inSlab) * model.overhangMm;
  }
  const core = model.core ?? model.cover;
  return {
    stripDepths,
    coverAreas,
    coreAreas,
    cover: model.cover,
    core,
    barDepths: model.depths,
    barAreas: model.areas,
    steel: model.steel,
    displacedMPa: (depth, strain) => {
      if (!model.isDisplacedDeducted) return 0;
      const isInCore = depth >= model.coreTopMm && depth <= model.coreBottomMm;
      return (isInCore ? core : model.cover).stress(strain);
    },
    deepestMm: model.deepestMm,
  };
}

/** Net force, N, compression positive, of a state. */
function netForce(section: FibreSection, topStrain: number, axisMm: number): number {
  const { stripDepths, coverAreas, coreAreas, barDepths, barAreas, cover, core, steel } = section;
  let force = 0;
  for (let i = 0; i < stripDepths.length; i++) {
    const strain = topStrain * (1 - stripDepths[i]! / axisMm);
    if (strain <= 0) break;
    force += coverAreas[i]! * cover.stress(strain);
    if (coreAreas[i]! > 0) force += coreAreas[i]! * core.stress(strain);
  }
  for (let i = 0; i < barDepths.length; i++) {
    const strain = topStrain * (1 - barDepths[i]! / axisMm);
    const displaced = strain > 0 ? section.displacedMPa(barDepths[i]!, strain) : 0;
    force += barAreas[i]! * (steel.stress(strain) - displaced);
  }
  return force;
}

/** Moment about the compression face, N·mm, sagging positive. */
function momentOf(section: FibreSection, topStrain: number, axisMm: number): number {
  let moment = 0;
  for (let i = 0; i < section.stripDepths.length; i++) {
    const depth = section.stripDepths[i]!;
    const strain = topStrain * (1 - depth / axisMm);
    if (strain <= 0) break;
    moment -= depth * section.coverAreas[i]! * section.cover.stress(strain);
    if (section.coreAreas[i]! > 0) moment -= depth * section.coreAreas[i]! * section.core.stress(strain);
  }
  for (let i = 0; i < section.barDepths.length; i++) {
    const depth = section.barDepths[i]!;
    const strain = topStrain * (1 - depth / axisMm);
    const displaced = strain > 0 ? section.displacedMPa(depth, strain) : 0;
    moment -= depth * section.barAreas[i]! * (section.steel.stress(strain) - displaced);
  }
  return moment;
}

/** Axis between one so high that tension wins and one so low that compression does. */
function halvedAxis(section: FibreSection, topStrain: number, from: number, to: number): number {
  let low = from;
  let high = to;
  while (high - low > AXIS_SHARE * high) {
    const middle = (low + high) / 2;
    if (netForce(section, topStrain, middle) > 0) high = middle;
    else low = middle;
  }
  return (low + high) / 2;
}

/** The balanced state at a strain of the compression face: no bar is above the face, none below the deepest. */
function fibreState(section: FibreSection, topStrain: number): FibreState {
  const axisMm = halvedAxis(section, topStrain, 0, section.deepestMm);
  return {
    topStrain,
    axisMm,
    curvaturePerMm: topStrain / axisMm,
    momentNmm: momentOf(section, topStrain, axisMm),
  };
}

/** The state between two top strains at which a measure of it turns positive, by halving. */
function turning(
  section: FibreSection,
  [from, to]: readonly [number, number],
  measure: (state: FibreState) => number,
): FibreState {
  let low = from;
  let high = to;
  for (let i = 0; i < EVENT_HALVINGS; i++) {
    const middle = (low + high) / 2;
    if (measure(fibreState(section, middle)) > 0) high = middle;
    else low = middle;
  }
  return fibreState(section, high);
}

/** Walks the compression face's strain upwards to the first end, with the same marks as the curve. */
export function fibreCurve(model: CurveModel, strips = DEFAULT_STRIPS): FibreCurve {
  const section = fibreSection(model, strips);
  const strainAt = (state: FibreState, depth: number) => state.topStrain - state.curvaturePerMm * depth;
  const pastYield = (s: FibreState) => -strainAt(s, model.yieldDepthMm) - model.steel.yieldStrain;
  const pastCrushing = (s: FibreState) => strainAt(s, model.crushingDepthMm) - model.crushingStrain;
  const pastRupture = (s: FibreState) => -strainAt(s, model.deepestMm) - model.steel.ruptureStrain;
  const states: FibreState[] = [];
  let firstYield: FibreState | null = null;
  let furthest = 0;
  for (let topStrain = STRAIN_STEP; topStrain < LARGEST_STRAIN; topStrain += stepFrom(topStrain)) {
    const within = [states[states.length - 1]?.topStrain ?? 0, topStrain] as const;
    let state = fibreState(section, topStrain);
    if (!firstYield && pastYield(state) > 0) firstYield = turning(section, within, pastYield);
    let cause: UltimateCause | undefined;
    if (pastCrushing(state) >= 0) {
      state = turning(section, within, pastCrushing);
      cause = model.core ? 'core-crushing' : 'concrete-crushing';
    }
    if (pastRupture(state) >= 0) {
      state = turning(section, within, pastRupture);
      cause = 'bar-rupture';
    }
    // a curvature that falls back as concrete is lost is not passed by a beam bent further and further
    if (state.curvaturePerMm > furthest) states.push(state);
    furthest = Math.max(furthest, state.curvaturePerMm);
    if (cause) return cutAtDrop(section, states, { firstYield, cause });
  }
  throw new Error('a curve without an end');
}

/** Equal steps to the strain at which plain concrete is crushed, longer and longer ones beyond. */
const stepFrom = (topStrain: number) => Math.max(STRAIN_STEP, STEP_GROWTH * topStrain);

/** Ends a walk where it first loses 20 % of the highest moment before, if it does. */
function cutAtDrop(
  section: FibreSection,
  states: readonly FibreState[],
  { firstYield, cause }: { readonly firstYield: FibreState | null; readonly cause: UltimateCause },
): FibreCurve {
  const upTo = (last: FibreState) =>
    firstYield && firstYield.topStrain <= last.topStrain ? firstYield : null;
  let best = 0;
  for (let i = 1; i < states.length; i++) {
    const state = states[i]!;
    if (state.momentNmm > states[best]!.momentNmm) best = i;
    if (state.momentNmm > NEAR_DROP * states[best]!.momentNmm) continue;
    const peak = crown(section, states, best);
    const kept = KEPT_SHARE * peak.momentNmm;
    if (state.momentNmm >= kept) continue;
    const from = Math.max(states[i - 1]!.topStrain, peak.topStrain);
    const dropped = turning(section, [from, state.topStrain], ({ momentNmm }) => kept - momentNmm);
    const ultimate = notFallenBack(section, states[i - 1]!, dropped);
    return { firstYield: upTo(ultimate), peak, ultimate, cause: 'moment-drop' };
  }
  const ultimate = states[states.length - 1]!;
  return { firstYield: upTo(ultimate), peak: crown(section, states, best), ultimate, cause };
}

/** An end whose curvature has fallen back is reached in a leap, from the state of most curvature before it. */
function notFallenBack(section: FibreSection, before: FibreState, end: FibreState): FibreState {
  if (end.curvaturePerMm >= before.curvaturePerMm) return end;
  const most = highestBetween(section, [before.topStrain, end.topStrain], (s) => s.curvaturePerMm);
  return most.curvaturePerMm > before.curvaturePerMm ? most : before;
}

/** The highest state between the neighbours of one. */
function crown(section: FibreSection, states: readonly FibreState[], best: number): FibreState {
  const highest = states[best]!;
  const right = states[best + 1];
  if (!right) return highest;
  const bounds = [states[best - 1]?.topStrain ?? 0, right.topStrain] as const;
  const found = highestBetween(section, bounds, ({ momentNmm }) => momentNmm);
  return found.momentNmm > highest.momentNmm ? found : highest;
}

/** The state between two top strains with the most of a measure, by cutting off the lower third. */
function highestBetween(
  section: FibreSection,
  [from, to]: readonly [number, number],
  measure: (state: FibreState) => number,
): FibreState {
  let low = from;
  let high = to;
  for (let i = 0; i < CROWN_CUTS; i++) {
    const third = (high - low) / 3;
    const a = fibreState(section, low + third);
    const b = fibreState(section, high - third);
    if (measure(a) < measure(b)) low += third;
    else high -= third;
  }
  return fibreState(section, (low + high) / 2);
}

/** What the rectangular block needs: the section, its layers, and the rules that give the block. */
export interface BlockSection {
  readonly section: SectionInput;
  readonly layout: SteelLayout;
  readonly rules: RuleSet;
  readonly esMPa: number;
  readonly displacedConcrete: DisplacedConcrete;
}

/** Axes from the deepest bar upwards in even steps, and either side of those at which the block reaches a bar, mm. */
function trialAxes({ depths, dtMm }: SteelLayout, reach: number): number[] {
  const even = Array.from({ length: BLOCK_STEPS + 1 }, (_, i) => (dtMm * i) / BLOCK_STEPS);
  const atBars = Array.from(depths, (depth) => [0.9999, 1.0001].map((share) => (share * depth) / reach));
  return [...even, ...atBars.flat().filter((axis) => axis < dtMm)].sort((a, b) => b - a);
}

/**
 * The closed path's ultimate state by strips: the block's stress wherever the strain is above (1 − β1) εcu, that is, to the
 * depth β1 c. Of two equilibria the deeper axis, as in `neutralAxisDepth`: axes are tried
 * from the deepest bar upwards until tension wins, then halved.
 */
export function fibreBlockState(of: BlockSection, strips = BLOCK_STRIPS): FibreState {
  const { section, layout, rules } = of;
  const epsilonCu = rules.crushingStrain(section.fcMPa);
  const blockMPa = rules.blockStressMPa(section.fcMPa);
  const edgeStrain = (1 - rules.blockDepthFactor(section.fcMPa)) * epsilonCu;
  const block: StressLaw = { stress: (strain) => (strain > edgeStrain ? blockMPa : 0) };
  const edges = stripEdges(section.depthMm, strips);
  const slab = compressedOverhang(section.widthMm, flangeOf(section, rules));
  const cut: FibreSection = {
    stripDepths: edges.slice(1).map((bottom, i) => (edges[i]! + bottom) / 2),
    coverAreas: edges.slice(1).map((bottom, i) => {
      const top = edges[i]!;
      const inSlab = Math.max(0, Math.min(bottom, slab.overhangDepthMm) - top);
      return (bottom - top) * section.widthMm + inSlab * slab.overhangMm;
    }),
    coreAreas: new Float64Array(strips),
    cover: block,
    core: block,
    barDepths: layout.depths,
    barAreas: layout.areas,
    steel: elasticPlastic({ fyMPa: rules.designYieldMPa(section.fyMPa), esMPa: of.esMPa }),
    displacedMPa: (_, strain) => {
      if (of.displacedConcrete === 'ignore') return 0;
      return of.displacedConcrete === 'deduct' ? block.stress(strain) : blockMPa;
    },
    deepestMm: layout.dtMm,
  };
  const reach = of.displacedConcrete === 'deduct' ? rules.blockDepthFactor(section.fcMPa) : 1;
  const trials = trialAxes(layout, reach);
  const under = trials.findIndex((axis) => netForce(cut, epsilonCu, axis) <= 0);
  const axisMm = halvedAxis(cut, epsilonCu, trials[under]!, trials[under - 1]!);
  return {
    topStrain: epsilonCu,
    axisMm,
    curvaturePerMm: epsilonCu / axisMm,
    momentNmm: momentOf(cut, epsilonCu, axisMm),
  };
}
