import { arrangeFace, arrangementReport, type FaceLayers } from '../engine/arrangement.ts';
import { curveChoicesOf, ductilityMeasureOf } from '../engine/curve-basis.ts';
import type { CurveChoices } from '../engine/curve-choices.ts';
import { curveEnds, curveMuPhi } from '../engine/curve-ductility.ts';
import {
  curveMaterials,
  curveModelOf,
  isConfinedLaw,
  type CurveInput,
  type CurveMaterials,
} from '../engine/curve-model.ts';
import type { Arrangement } from '../engine/evaluation.ts';
import type { DuctilityMeasure, SectionInput } from '../engine/section.ts';
import type { Combination } from './combination.ts';
import type { PreparedSweep } from './prepared-sweep.ts';
import { sectionAt } from './space.ts';

/** Layers of the section in hand; only the first n count. */
interface Layers {
  readonly depths: Float64Array;
  readonly areas: Float64Array;
  readonly n: number;
}

/**
 * μφ off the full curve, for the few sections of a sweep that are asked for it. A curve costs some hundred times the rest of
 * a section, so it is drawn last: for a section that meets every other check, and for one that fails a single other check
 * and would be the best without it. Of any other section μφ is not known (NaN), nor whether it would meet the target.
 */
export class KernelCurve {
  private readonly prepared: PreparedSweep;
  private readonly measure: DuctilityMeasure;
  private readonly choices: CurveChoices;
  private readonly isConfined: boolean;
  /** By the combination's own strengths, f′c then fy. */
  private readonly materials = new Map<number, Map<number, CurveMaterials>>();
  private combination: Combination | null = null;
  /** The combination's bars, arranged when a confined law first asks for them. */
  private faces: { readonly tension: FaceLayers; readonly compression: FaceLayers } | null = null;

  constructor(prepared: PreparedSweep) {
    const { basis } = prepared.problem;
    this.prepared = prepared;
    this.measure = ductilityMeasureOf(basis);
    this.choices = curveChoicesOf(basis);
    this.isConfined = isConfinedLaw(this.choices.concreteLaw);
  }

  begin(combination: Combination): void {
    this.combination = combination;
    this.faces = null;
  }

  /**
   * μφ of the section with this index, of the combination begun, its layers as placed; NaN where the curve gives none.
   * `dMm`: centroid of its tension steel; `spacingMm`: of its stirrups as built.
   */
  muPhi(index: number, layers: Layers, dMm: number, { spacingMm }: { readonly spacingMm: number }): number {
    const { space, problem } = this.prepared;
    const drawn = sectionAt(space, index);
    const section = drawn.stirrup ? { ...drawn, stirrup: { ...drawn.stirrup, spacingMm } } : drawn;
    const input = { section, ...this.steelOf(section, layers, dMm), basis: problem.basis };
    const model = curveModelOf({ ...input, choices: this.choices }, this.materialsOf(section));
    return curveMuPhi(curveEnds(model), this.measure);
  }

  /** A confined law asks where the bars stand. */
  private steelOf(
    section: SectionInput,
    { depths, areas, n }: Layers,
    dMm: number,
  ): Pick<CurveInput, 'layout' | 'arrangement'> {
    const { tension, compression } = this.combination!;
    const layout = {
      depths: depths.slice(0, n),
      areas: areas.slice(0, n),
      dMm,
      dtMm: depths[n - 1]!,
      asMm2: tension.areaMm2,
      asPrimeMm2: compression.areaMm2,
    };
    if (!this.isConfined) return { layout, arrangement: null };
    return { layout, arrangement: this.arrangementOf(section) };
  }

  private arrangementOf({ reinforcement, depthMm }: SectionInput): Arrangement | null {
    if (reinforcement.kind === 'layers') return null;
    const { context } = this.combination!.placement;
    this.faces ??= {
      tension: arrangeFace('tension', reinforcement.tension, context),
      compression: arrangeFace('compression', reinforcement.compression, context),
    };
    return arrangementReport(depthMm, this.faces.tension, this.faces.compression, context);
  }

  private materialsOf(section: SectionInput): CurveMaterials {
    const { fcMPa, fyMPa } = section;
    const ofConcrete = this.materials.get(fcMPa) ?? new Map<number, CurveMaterials>();
    this.materials.set(fcMPa, ofConcrete);
    const known = ofConcrete.get(fyMPa);
    if (known) return known;
    const made = curveMaterials(section, this.prepared.problem.basis, this.choices);
    ofConcrete.set(fyMPa, made);
    return made;
  }
}
