import {
  arrangeFace,
  arrangementReport,
  leastForStirrupMm,
  type ArrangementContext,
  type FaceLayers,
} from './arrangement.ts';
import { getBar } from './bars.ts';
import type { Arrangement } from './evaluation.ts';
import { isWithinLength } from './limits.ts';
import { ruleSetOf } from './rules/rule-set-of.ts';
import type { DesignBasis, Face, Layer, Reinforcement, SectionInput } from './section.ts';

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

/** What a section lacks for its bars: the length needed and the length there is, mm. */
export interface Shortfall {
  readonly neededMm: number;
  readonly availableMm: number;
}

/** The steel of a section where it can be placed, and how it was placed. */
export interface PlacedSteel {
  /** Null for plain layers. */
  readonly arrangement: Arrangement | null;
  /** Null when it cannot be placed. */
  readonly layout: SteelLayout | null;
  readonly fits: boolean;
  readonly shortfall: Shortfall | null;
  readonly reason: string;
}

const NO_TENSION_STEEL = 'no steel at the tension face';

/**
 * Turns bars, or layers as given, into layers sorted by depth.
 * @throws InvalidSectionError for an unknown bar.
 */
export function placeSteel(section: SectionInput, basis: DesignBasis, maxLayers: number): PlacedSteel {
  const { reinforcement, stirrup, coverMm } = section;
  const rules = ruleSetOf(basis);
  const stirrupBar = stirrup && getBar(basis.barStandard, stirrup.bar, ['stirrup', 'bar']);
  const placed =
    reinforcement.kind === 'layers'
      ? placePlainLayers(reinforcement.layers)
      : placeBars(section, reinforcement, {
          rules,
          barStandard: basis.barStandard,
          widthMm: section.widthMm,
          coverMm,
          stirrupBar,
          maxAggregateMm: basis.maxAggregateMm,
          bendAllowance: basis.bendAllowance,
          maxLayers,
          barOversize: basis.barOversize,
        });
  const neededMm = leastForStirrupMm(coverMm, stirrupBar, rules);
  const availableMm = Math.min(section.widthMm, section.depthMm);
  if (isWithinLength(neededMm, availableMm)) return placed;
  const reason = 'the stirrup cannot be bent inside its cover';
  const arrangement = placed.arrangement && { ...placed.arrangement, fits: false, bars: [], reason };
  return { arrangement, layout: null, fits: false, shortfall: { neededMm, availableMm }, reason };
}

function placeBars(
  { widthMm, depthMm }: SectionInput,
  groups: Extract<Reinforcement, { kind: 'bars' }>,
  context: ArrangementContext,
): PlacedSteel {
  const tension = arrangeFace('tension', groups.tension, context);
  const compression = arrangeFace('compression', groups.compression, context);
  const arrangement = arrangementReport(depthMm, tension, compression, context);
  const { fits, reason, depthNeededMm } = arrangement;
  if (fits && tension.areaMm2 === 0)
    return { arrangement, layout: null, fits: false, shortfall: null, reason: NO_TENSION_STEEL };
  if (fits)
    return {
      arrangement,
      layout: layoutOfBars(depthMm, tension, compression),
      fits,
      shortfall: null,
      reason,
    };
  const tooNarrow = [tension, compression].find((face) => !face.report.fits)?.report;
  const shortfall = tooNarrow
    ? { neededMm: tooNarrow.widthNeededMm, availableMm: widthMm }
    : { neededMm: depthNeededMm, availableMm: depthMm };
  // A group that no width would hold (one bar) has no length to ask for.
  return { arrangement, layout: null, fits, shortfall: shortfall.neededMm > 0 ? shortfall : null, reason };
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
  const unplaced = { arrangement: null, layout: null, fits: false, shortfall: null };
  if (tension.length === 0) return { ...unplaced, reason: NO_TENSION_STEEL };
  const t = centroid(tension);
  const c = compression.length > 0 ? centroid(compression) : null;
  if (c && c.depthMm >= t.depthMm)
    return { ...unplaced, reason: 'the compression steel lies below the tension steel' };
  const layout = {
    ...columns(layers),
    dMm: t.depthMm,
    dtMm: tension[tension.length - 1]!.depthMm,
    dPrimeMm: c && c.depthMm,
    asMm2: t.areaMm2,
    asPrimeMm2: c ? c.areaMm2 : 0,
  };
  return { arrangement: null, layout, fits: true, shortfall: null, reason: 'layers as given' };
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
