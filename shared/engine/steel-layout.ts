import { arrangeFace, arrangementReport, type ArrangementContext, type FaceLayers } from './arrangement.ts';
import { getBar } from './bars.ts';
import type { Arrangement } from './evaluation.ts';
import { RULE_SETS } from './rules/rule-sets.ts';
import type { DesignBasis, Face, Layer, SectionInput } from './section.ts';

/** All layers of a section sorted by depth from the compression face, with the depths the checks refer to (mm, mm²). */
export interface SteelLayout {
  readonly faces: readonly Face[];
  readonly depths: Float64Array;
  readonly areas: Float64Array;
  /** Centroid of the tension group. */
  readonly dMm: number;
  /** Outermost tension layer. */
  readonly dtMm: number;
  /** Centroid of the compression group; null without one. */
  readonly dPrimeMm: number | null;
  readonly asMm2: number;
  readonly asPrimeMm2: number;
}

/** The steel of a section where it can be placed, and how it was placed. */
export interface PlacedSteel {
  /** Null for plain layers. */
  readonly arrangement: Arrangement | null;
  /** Null when it cannot be placed or there is no tension steel. */
  readonly layout: SteelLayout | null;
  readonly fits: boolean;
  readonly reason: string;
}

/**
 * Turns bars, or layers as given, into layers sorted by depth.
 * @throws InvalidSectionError for an unknown bar.
 */
export function placeSteel(section: SectionInput, basis: DesignBasis, maxLayers: number): PlacedSteel {
  const { reinforcement } = section;
  if (reinforcement.kind === 'layers') return placePlainLayers(reinforcement.layers);
  const context: ArrangementContext = {
    rules: RULE_SETS[basis.ruleSet],
    barStandard: basis.barStandard,
    widthMm: section.widthMm,
    coverMm: section.coverMm,
    stirrupBar: section.stirrup && getBar(basis.barStandard, section.stirrup.bar, ['stirrup', 'bar']),
    maxAggregateMm: basis.maxAggregateMm,
    bendAllowance: basis.bendAllowance,
    maxLayers,
  };
  const tension = arrangeFace('tension', reinforcement.tension, context);
  const compression = arrangeFace('compression', reinforcement.compression, context);
  const arrangement = arrangementReport(section.depthMm, tension, compression, context);
  return {
    arrangement,
    layout:
      arrangement.fits && tension.areaMm2 > 0 ? layoutOfBars(section.depthMm, tension, compression) : null,
    fits: arrangement.fits,
    reason: arrangement.reason,
  };
}

function layoutOfBars(depthMm: number, tension: FaceLayers, compression: FaceLayers): SteelLayout {
  const layers = [
    ...compression.layers.map(({ offsetMm, areaMm2 }) => ({
      depthMm: offsetMm,
      areaMm2,
      face: 'compression' as const,
    })),
    ...tension.layers
      .map(({ offsetMm, areaMm2 }) => ({ depthMm: depthMm - offsetMm, areaMm2, face: 'tension' as const }))
      .toReversed(),
  ];
  return {
    ...columns(layers),
    dMm: depthMm - tension.centroidOffsetMm,
    dtMm: depthMm - tension.layers[0]!.offsetMm,
    dPrimeMm: compression.areaMm2 > 0 ? compression.centroidOffsetMm : null,
    asMm2: tension.areaMm2,
    asPrimeMm2: compression.areaMm2,
  };
}

function placePlainLayers(given: readonly Layer[]): PlacedSteel {
  const layers = given.filter((layer) => layer.areaMm2 > 0).sort((a, b) => a.depthMm - b.depthMm);
  const tension = layers.filter((layer) => layer.face === 'tension');
  const compression = layers.filter((layer) => layer.face === 'compression');
  const placed = { arrangement: null, layout: null };
  if (tension.length === 0) return { ...placed, fits: true, reason: 'no steel at the tension face' };
  const t = centroid(tension);
  const c = compression.length > 0 ? centroid(compression) : null;
  if (c && c.depthMm >= t.depthMm)
    return { ...placed, fits: false, reason: 'the compression steel lies below the tension steel' };
  const layout = {
    ...columns(layers),
    dMm: t.depthMm,
    dtMm: tension[tension.length - 1]!.depthMm,
    dPrimeMm: c && c.depthMm,
    asMm2: t.areaMm2,
    asPrimeMm2: c ? c.areaMm2 : 0,
  };
  return { arrangement: null, layout, fits: true, reason: 'layers as given' };
}

function columns(layers: readonly Layer[]): Pick<SteelLayout, 'faces' | 'depths' | 'areas'> {
  return {
    faces: layers.map((layer) => layer.face),
    depths: Float64Array.from(layers, (layer) => layer.depthMm),
    areas: Float64Array.from(layers, (layer) => layer.areaMm2),
  };
}

function centroid(layers: readonly Layer[]): { depthMm: number; areaMm2: number } {
  if (layers.length === 1) return layers[0]!;
  let areaMm2 = 0;
  let moment = 0;
  for (const layer of layers) {
    areaMm2 += layer.areaMm2;
    moment += layer.areaMm2 * layer.depthMm;
  }
  return { depthMm: moment / areaMm2, areaMm2 };
}
