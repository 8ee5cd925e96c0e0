import { ductilityMeasureOf } from './curve-basis.ts';
import { ductilityOf, elasticSection } from './elastic.ts';
import { flexureAtUltimate } from './flexure.ts';
import type { MomentCurvature } from './moment-curvature.ts';
import { ruleSetOf } from './rules/rule-set-of.ts';
import {
  YIELD_CURVATURE_AT,
  type DesignBasis,
  type DisplacedConcrete,
  type SectionInput,
  type YieldCurvatureAt,
} from './section.ts';
import type { SteelLayout } from './steel-layout.ts';

/** One section's μφ by one convention, with the sentence that says which. */
export interface DuctilityByConvention {
  readonly id: string;
  readonly label: string;
  /** Null where no bar yields. */
  readonly value: number | null;
  readonly curvatureYieldPerMm: number | null;
  readonly curvatureUltimatePerMm: number;
  readonly definition: string;
  /** The one held against the target. */
  readonly isMeasure: boolean;
}

const AT: Readonly<Record<YieldCurvatureAt, string>> = {
  'outermost-layer': 'yield at the outermost layer',
  centroid: 'yield at the centroid',
};
const DISPLACED: Readonly<Record<DisplacedConcrete, string>> = {
  deduct: 'displaced concrete deducted',
  'deduct-above-axis': 'displaced concrete deducted above the axis',
  ignore: 'displaced concrete ignored',
};

/** The closed path with yield at either place, displaced concrete deducted, ignored and as the basis has it; then the curve by both yields. */
export function ductilityConventions(
  section: SectionInput,
  layout: SteelLayout,
  basis: DesignBasis,
  curve: MomentCurvature,
): readonly DuctilityByConvention[] {
  const measure = ductilityMeasureOf(basis);
  const displaced = [...new Set<DisplacedConcrete>([basis.displacedConcrete, 'deduct', 'ignore'])];
  const closed = displaced.flatMap((displacedConcrete) =>
    YIELD_CURVATURE_AT.map((yieldCurvatureAt) => ({
      ...closedBy(section, layout, { ...basis, displacedConcrete, yieldCurvatureAt }),
      isMeasure:
        measure === 'closed' &&
        displacedConcrete === basis.displacedConcrete &&
        yieldCurvatureAt === basis.yieldCurvatureAt,
    })),
  );
  const { firstYield, bilinear, ultimate, ductility } = curve;
  return [
    ...closed,
    {
      id: 'curve-first-yield',
      label: 'full curve, first yield',
      ...ductility.byFirstYield,
      curvatureYieldPerMm: firstYield?.curvaturePerMm ?? null,
      curvatureUltimatePerMm: ultimate.curvaturePerMm,
      isMeasure: measure === 'curve-first-yield',
    },
    {
      id: 'curve-bilinear',
      label: 'full curve, bilinear yield',
      ...ductility.byBilinearYield,
      curvatureYieldPerMm: bilinear?.yieldCurvaturePerMm ?? null,
      curvatureUltimatePerMm: ultimate.curvaturePerMm,
      isMeasure: measure === 'curve-bilinear',
    },
  ];
}

function closedBy(section: SectionInput, layout: SteelLayout, basis: DesignBasis) {
  const rules = ruleSetOf(basis);
  const flexure = flexureAtUltimate(section, layout, basis, rules);
  const elastic = elasticSection(section, layout, basis, rules);
  const { curvatureDuctility, ...rest } = ductilityOf(section, layout, basis, { flexure, elastic, rules });
  return {
    id: `closed-${basis.yieldCurvatureAt}-${basis.displacedConcrete}`,
    label: `closed form, ${AT[basis.yieldCurvatureAt]}, ${DISPLACED[basis.displacedConcrete]}`,
    value: curvatureDuctility,
    ...rest,
  };
}
