import { barTotal, checksOf } from './checks.ts';
import { curveDuctilityOf, measuredDuctility } from './curve-ductility.ts';
import { ductilityOf, elasticSection } from './elastic.ts';
import type { Evaluation, FlexureResult, Quantities } from './evaluation.ts';
import { assertFlange, flangeOf } from './flange.ts';
import { flexureAtUltimate } from './flexure.ts';
import { onGrid, type Measures } from './measures.ts';
import { notCheckedFor } from './not-checked.ts';
import { assertNotNegative, assertPositive, InvalidSectionError } from './preconditions.ts';
import { quantitiesOf } from './quantities.ts';
import { resolveStirrups } from './resolved-stirrups.ts';
import { ruleSetOf } from './rules/rule-set-of.ts';
import type { DesignBasis, Demand, Reinforcement, SectionInput, UserRules } from './section.ts';
import { seismicRulesOf } from './seismic.ts';
import { skinSteelOf } from './skin-steel.ts';
import { placeSteel, type PlacedSteel, type SteelLayout } from './steel-layout.ts';
import { ENGINE_VERSION } from './version.ts';
import { workingOf } from './working.ts';

/** What a section is judged by. */
export interface EvaluationContext {
  readonly basis: DesignBasis;
  readonly demand: Demand;
  readonly rules: UserRules;
}

/**
 * One section in, every quantity with its working out: bars placed, strength at ultimate, cracked elastic section,
 * curvature ductility, checks, measures, quantities. A section that fails a check, or cannot be built, is data.
 * @throws InvalidSectionError on a broken precondition (negative width, NaN, unknown bar), naming the value.
 */
export function evaluateSection(section: SectionInput, context: EvaluationContext): Evaluation {
  assertSection(section);
  return evaluatePlaced(section, context, placeSteel(section, context.basis, context.rules.maxLayers));
}

/** The same for steel that is placed already, as where a cage was set higher or lower than drawn. */
export function evaluatePlaced(
  given: SectionInput,
  context: EvaluationContext,
  placed: PlacedSteel,
): Evaluation {
  const { basis, demand, rules } = context;
  const ruleSet = ruleSetOf(basis);
  const flange = flangeOf(given, ruleSet);
  const { layout } = placed;
  const seismic = seismicRulesOf(ruleSet, basis);
  const skin = skinSteelOf(given, layout, basis, ruleSet);
  const stirrups = resolveStirrups({ section: given, basis, demand, ruleSet, seismic, placed, skin });
  const { section } = stirrups;
  const quantities = quantitiesOf(section, basis, skin);
  const flexure = layout && flexureAtUltimate(section, layout, basis, ruleSet);
  const elastic = layout && elasticSection(section, layout, basis, ruleSet);
  const ductility =
    layout && flexure && elastic && ductilityOf(section, layout, basis, { flexure, elastic, rules: ruleSet });
  const curveDuctility =
    layout && curveDuctilityOf(section, { layout, arrangement: placed.arrangement }, basis);
  const measured = measuredDuctility(basis, ductility, curveDuctility);
  const detailing = { seismic, stirrups, skin };
  const checks = checksOf({
    section,
    basis,
    demand,
    rules,
    ruleSet,
    placed,
    flexure,
    measured,
    ...detailing,
  });
  const measures = measuresOf(section, demand, quantities, {
    flexure,
    curvatureDuctility: measured?.value ?? null,
  });
  return {
    engineVersion: ENGINE_VERSION,
    ruleSet: { id: ruleSet.id, title: ruleSet.title },
    conventions: {
      displacedConcrete: basis.displacedConcrete,
      yieldCurvatureAt: basis.yieldCurvatureAt,
      bendAllowance: basis.bendAllowance,
    },
    geometry: layout && geometryOf(section, layout),
    flange,
    arrangement: placed.arrangement,
    stirrups: stirrups.built,
    skin,
    flexure,
    elastic,
    ductility,
    curveDuctility,
    checks,
    meetsListedChecks: flexure !== null && checks.every((check) => check.passes),
    measures,
    quantities,
    working:
      layout && flexure && elastic && ductility
        ? workingOf({
            section,
            basis,
            demand,
            ruleSet,
            layout,
            flexure,
            elastic,
            ductility,
            quantities,
            placed,
            ...detailing,
          })
        : [],
    notChecked: notCheckedFor(basis, demand, flange),
  };
}

function geometryOf({ widthMm }: SectionInput, layout: SteelLayout): Evaluation['geometry'] {
  const { dMm, dtMm, dPrimeMm, asMm2, asPrimeMm2 } = layout;
  const area = widthMm * dMm;
  return { dMm, dtMm, dPrimeMm, asMm2, asPrimeMm2, rho: asMm2 / area, rhoPrime: asPrimeMm2 / area };
}

function measuresOf(
  section: SectionInput,
  demand: Demand,
  quantities: Quantities,
  results: { readonly flexure: FlexureResult | null; readonly curvatureDuctility: number | null },
): Measures {
  const strength = results.flexure?.designMomentNmm ?? null;
  return {
    steelKgPerM: onGrid(quantities.netSteelKgPerM),
    costPerM: gridOrNull(quantities.cost?.total),
    co2eKgPerM: gridOrNull(quantities.co2eKgPerM),
    depthMm: section.depthMm,
    widthMm: section.widthMm,
    concreteM3PerM: onGrid(quantities.concreteM3PerM),
    formworkM2PerM: onGrid(quantities.formworkM2PerM),
    curvatureDuctility: results.curvatureDuctility,
    designStrengthNmm: strength,
    utilisation: demand.muNmm === null || strength === null ? null : demand.muNmm / strength,
    barCount: barCountOf(section.reinforcement),
  };
}

const gridOrNull = (amount: number | null | undefined) =>
  typeof amount === 'number' ? onGrid(amount) : null;

function barCountOf(reinforcement: Reinforcement): number | null {
  if (reinforcement.kind === 'layers') return null;
  return barTotal(reinforcement.tension) + barTotal(reinforcement.compression);
}

function assertSection(section: SectionInput): void {
  assertPositive(section.widthMm, 'Width b', ['widthMm']);
  assertPositive(section.depthMm, 'Depth h', ['depthMm']);
  assertPositive(section.fcMPa, 'Concrete strength f′c', ['fcMPa']);
  assertPositive(section.fyMPa, 'Yield strength fy', ['fyMPa']);
  assertNotNegative(section.coverMm, 'Clear cover', ['coverMm']);
  if (section.stirrup) {
    assertPositive(section.stirrup.spacingMm, 'Stirrup spacing', ['stirrup', 'spacingMm']);
    if (!Number.isInteger(section.stirrup.legs) || section.stirrup.legs < 2)
      throw new InvalidSectionError(
        `Stirrup legs must be a whole number of two or more, not ${section.stirrup.legs}`,
        ['stirrup', 'legs'],
      );
  }
  if (section.flange)
    assertFlange(section.flange, { widestWebMm: section.widthMm, leastDepthMm: section.depthMm });
  assertReinforcement(section);
}

function assertReinforcement({ reinforcement, widthMm, depthMm }: SectionInput): void {
  if (reinforcement.kind === 'layers') {
    const steelMm2 = reinforcement.layers.reduce((total, layer) => total + layer.areaMm2, 0);
    if (steelMm2 >= widthMm * depthMm)
      throw new InvalidSectionError(`Steel of ${steelMm2} mm² is more than the section itself`, [
        'reinforcement',
        'layers',
      ]);
    reinforcement.layers.forEach((layer, i) => {
      const path = ['reinforcement', 'layers', i];
      assertPositive(layer.depthMm, 'Layer depth', [...path, 'depthMm']);
      assertNotNegative(layer.areaMm2, 'Layer area', [...path, 'areaMm2']);
      if (layer.depthMm >= depthMm)
        throw new InvalidSectionError(`Layer depth ${layer.depthMm} mm is not inside h = ${depthMm} mm`, [
          ...path,
          'depthMm',
        ]);
    });
    return;
  }
  for (const face of ['tension', 'compression'] as const)
    reinforcement[face].forEach(({ count }, i) => {
      if (!Number.isInteger(count) || count < 1)
        throw new InvalidSectionError(`Number of bars must be a whole number above zero, not ${count}`, [
          'reinforcement',
          face,
          i,
          'count',
        ]);
    });
}
