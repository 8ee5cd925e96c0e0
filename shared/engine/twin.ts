import { asBuilt } from './as-built.ts';
import { ductilityMeasureOf } from './curve-basis.ts';
import { curveDuctilityOf, measuredDuctility } from './curve-ductility.ts';
import { ductilityOf, elasticSection } from './elastic.ts';
import type { EvaluationContext } from './evaluate.ts';
import { flexureAtUltimate } from './flexure.ts';
import { ruleSetOf } from './rules/rule-set-of.ts';
import type { DuctilityMeasure, Reinforcement, SectionInput } from './section.ts';
import { placeSteel } from './steel-layout.ts';

/** Strength and closed curvatures of one of the two; N·mm, mm, 1/mm. */
export interface TwinValues {
  readonly asMm2: number;
  readonly asPrimeMm2: number;
  readonly neutralAxisMm: number;
  readonly tensionStrain: number;
  readonly nominalMomentNmm: number;
  readonly strengthReduction: number;
  readonly designMomentNmm: number;
  readonly curvatureYieldPerMm: number;
  readonly curvatureUltimatePerMm: number;
  /** μφ of the closed path. */
  readonly curvatureDuctility: number;
  /** μφ by the basis's own measure where that is read off the full curve; null where it is not, or no bar yields. */
  readonly curveDuctility: number | null;
}

export interface TwinComparison {
  readonly section: TwinValues;
  readonly twin: TwinValues;
  readonly measure: DuctilityMeasure;
  /** The convention of the closed curvatures, the same for both. */
  readonly definition: string;
  readonly twinIs: string;
}

const TWIN_IS =
  'the same section without its compression steel; hanger bars, ties and the other checks are not asked of it';

/**
 * A section beside its singly reinforced twin: the same concrete, stirrups and tension steel, no steel at the compression
 * face. Shows what the compression steel does to strength (little) and to ductility.
 * @returns null where the section has no compression steel or its bars cannot be placed.
 * @throws InvalidSectionError for an unknown bar.
 */
export function twinOf(given: SectionInput, context: EvaluationContext): TwinComparison | null {
  const section = asBuilt(given, context, placeSteel(given, context.basis, context.rules.maxLayers));
  const own = valuesOf(section, context);
  if (!own || own.values.asPrimeMm2 === 0) return null;
  const twin = valuesOf({ ...section, reinforcement: withoutCompression(section.reinforcement) }, context);
  if (!twin) return null;
  return {
    section: own.values,
    twin: twin.values,
    measure: ductilityMeasureOf(context.basis),
    definition: own.definition,
    twinIs: TWIN_IS,
  };
}

function withoutCompression(reinforcement: Reinforcement): Reinforcement {
  if (reinforcement.kind === 'bars') return { ...reinforcement, compression: [] };
  return { kind: 'layers', layers: reinforcement.layers.filter(({ face }) => face === 'tension') };
}

function valuesOf(section: SectionInput, { basis, rules }: EvaluationContext) {
  const { layout, arrangement } = placeSteel(section, basis, rules.maxLayers);
  if (!layout) return null;
  const ruleSet = ruleSetOf(basis);
  const flexure = flexureAtUltimate(section, layout, basis, ruleSet);
  const elastic = elasticSection(section, layout, basis, ruleSet);
  const closed = ductilityOf(section, layout, basis, { flexure, elastic, rules: ruleSet });
  const curve = curveDuctilityOf(section, { layout, arrangement }, basis);
  const values: TwinValues = {
    asMm2: layout.asMm2,
    asPrimeMm2: layout.asPrimeMm2,
    neutralAxisMm: flexure.neutralAxisMm,
    tensionStrain: flexure.tensionStrain,
    nominalMomentNmm: flexure.nominalMomentNmm,
    strengthReduction: flexure.strengthReduction,
    designMomentNmm: flexure.designMomentNmm,
    curvatureYieldPerMm: closed.curvatureYieldPerMm,
    curvatureUltimatePerMm: closed.curvatureUltimatePerMm,
    curvatureDuctility: closed.curvatureDuctility,
    curveDuctility: curve && (measuredDuctility(basis, closed, curve)?.value ?? null),
  };
  return { values, definition: closed.definition };
}
