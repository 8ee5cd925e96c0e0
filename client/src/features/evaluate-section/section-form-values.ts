import type { ProjectDesignBasis } from '#shared/contract/design-basis.ts';
import type {
  BendAllowance,
  Demand,
  DisplacedConcrete,
  Face,
  SectionInput,
  Support,
  YieldCurvatureAt,
} from '#shared/engine/section.ts';
import { barsText } from '#shared/print/section-text.ts';
import { flangeValues, NO_FLANGE, type FlangeValues } from '#client/src/section-fields/flange-values.ts';

export interface LayerValues {
  readonly depthMm: number | null;
  readonly areaMm2: number | null;
  readonly face: Face;
}

/** One section as typed. Numbers are SI; null is an empty field, NaN text that is not a number. */
export interface SectionFormValues {
  readonly widthMm: number | null;
  readonly depthMm: number | null;
  readonly fcMPa: number | null;
  readonly fyMPa: number | null;
  readonly coverMm: number | null;
  readonly flange: FlangeValues;
  /** Designation; empty for none. */
  readonly stirrupBar: string;
  readonly legs: number | null;
  readonly spacingMm: number | null;
  /** The spacing is found by the engine, and what is typed is the widest. */
  readonly isSpacingDesigned: boolean;
  /** Both ways of giving the steel are kept, so that switching loses nothing. */
  readonly steel: 'bars' | 'layers';
  readonly tensionText: string;
  readonly compressionText: string;
  readonly layers: readonly LayerValues[];
  readonly maxLayers: number | null;
  readonly muNmm: number | null;
  readonly ductilityTarget: number | null;
  readonly depthCapMm: number | null;
  readonly vuN: number | null;
  readonly spanMm: number | null;
  readonly support: Support | null;
  readonly displacedConcrete: DisplacedConcrete;
  readonly yieldCurvatureAt: YieldCurvatureAt;
  readonly bendAllowance: BendAllowance;
}

const EMPTY_LAYERS: readonly LayerValues[] = [
  { depthMm: null, areaMm2: null, face: 'tension' },
  { depthMm: null, areaMm2: null, face: 'compression' },
];

/** An empty section on the project's basis: only what the office has settled is filled in. */
export function firstSectionForm(basis: ProjectDesignBasis): SectionFormValues {
  return {
    widthMm: null,
    depthMm: null,
    fcMPa: null,
    fyMPa: basis.fyMPa,
    coverMm: basis.coverMm,
    flange: NO_FLANGE,
    stirrupBar: '',
    legs: 2,
    spacingMm: null,
    isSpacingDesigned: false,
    steel: 'bars',
    tensionText: '',
    compressionText: '',
    layers: EMPTY_LAYERS,
    maxLayers: 2,
    muNmm: null,
    ductilityTarget: null,
    depthCapMm: null,
    vuN: null,
    spanMm: null,
    support: null,
    displacedConcrete: basis.displacedConcrete,
    yieldCurvatureAt: basis.yieldCurvatureAt,
    bendAllowance: basis.bendAllowance,
  };
}

interface GivenSection {
  readonly section: SectionInput;
  readonly demand: Demand;
  readonly maxLayers: number;
}

/** A section found elsewhere, to be changed by hand. */
export function sectionForm(
  { section, demand, maxLayers }: GivenSection,
  basis: ProjectDesignBasis,
): SectionFormValues {
  const { reinforcement, stirrup } = section;
  const isBars = reinforcement.kind === 'bars';
  return {
    ...firstSectionForm(basis),
    ...demand,
    vuN: demand.vuN ?? null,
    spanMm: demand.spanMm ?? null,
    support: demand.support ?? null,
    maxLayers,
    widthMm: section.widthMm,
    depthMm: section.depthMm,
    fcMPa: section.fcMPa,
    fyMPa: section.fyMPa,
    coverMm: section.coverMm,
    stirrupBar: stirrup?.bar ?? '',
    legs: stirrup?.legs ?? 2,
    spacingMm: stirrup?.spacingMm ?? null,
    isSpacingDesigned: stirrup?.isDesigned === true,
    flange: flangeValues(section.flange, demand),
    steel: reinforcement.kind,
    tensionText: isBars ? barsText(reinforcement.tension) : '',
    compressionText:
      isBars && reinforcement.compression.length > 0 ? barsText(reinforcement.compression) : '',
    layers: isBars ? EMPTY_LAYERS : reinforcement.layers,
  };
}
