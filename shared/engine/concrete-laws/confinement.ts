import { getBar } from '../bars.ts';
import type { Arrangement, PlacedBar } from '../evaluation.ts';
import type { DesignBasis, Face, SectionInput, Stirrup } from '../section.ts';
import type { SteelLayout } from '../steel-layout.ts';

/** How far the section's own hoops confine the concrete inside them. Lengths mm, stresses MPa, ratios dimensionless. */
export interface HoopConfinement {
  /** Core between the centre lines of the outer hoop: width, depth, and depth of its upper edge below the face. */
  readonly coreWidthMm: number;
  readonly coreDepthMm: number;
  readonly coreTopMm: number;
  /** Core width to the outside of the hoops. */
  readonly outsideWidthMm: number;
  readonly spacingMm: number;
  readonly hoopYieldMPa: number;
  readonly hoopRuptureStrain: number;
  /** Legs that hold the core across its width (two, top and bottom) and over its depth. */
  readonly ratioAcross: number;
  readonly ratioDeep: number;
  /** Hoop steel over core volume, to centre lines and to the outside of the hoops. */
  readonly volumetricRatio: number;
  readonly volumetricRatioOutside: number;
  /** Clear distances w′ between held points round the core. */
  readonly clearDistancesMm: readonly number[];
  /** Share of the core held between bars: 1 − Σw′²/(6 bc dc). */
  readonly heldBetweenBars: number;
  /** Share held between hoops: (1 − s′/2bc)(1 − s′/2dc). */
  readonly heldBetweenHoops: number;
  /** ke. */
  readonly effectiveness: number;
  /** Effective lateral pressures f′l = ke ρ fyh, across the width and over the depth. */
  readonly pressureAcrossMPa: number;
  readonly pressureDeepMPa: number;
}

export interface HoopSteel {
  readonly yieldMPa: number;
  /** Strain at which a hoop breaks. */
  readonly ruptureStrain: number;
}

/** The placed bars are wanted for w′; without them (plain layers) the hoop's corners and legs alone are held points. */
export interface HoopedSection {
  readonly section: SectionInput;
  readonly layout: Pick<SteelLayout, 'asMm2' | 'asPrimeMm2'>;
  readonly arrangement: Arrangement | null;
  readonly basis: DesignBasis;
}

/**
 * Confinement of a rectangular core by closed hoops and cross-ties, ke = (1 − Σw′²/(6 bc dc)) (1 − s′/2bc)(1 − s′/2dc)/(1 − ρcc)
 * (Mander, Priestley and Park, 1988; memory). Held points are the bars in the hoop's corners and, of the layer nearest a
 * face, as many as there are legs; a corner without a bar is a point of no width (engine rule). Bars along the sides lean
 * on a straight leg and count as not held. Each bracket stops at zero: a deep, narrow hoop confines nothing.
 * @returns undefined without stirrups, or where they leave no core.
 */
export function findConfinement(hooped: HoopedSection, steel: HoopSteel): HoopConfinement | undefined {
  const { section, layout, basis } = hooped;
  const { stirrup } = section;
  if (!stirrup) return undefined;
  const hoop = getBar(basis.barStandard, stirrup.bar, ['stirrup', 'bar']);
  const ds = hoop.diameterMm;
  const coreTopMm = section.coverMm + ds / 2;
  const bc = section.widthMm - 2 * coreTopMm;
  const dc = section.depthMm - 2 * coreTopMm;
  const s = stirrup.spacingMm;
  const longitudinalShare = (layout.asMm2 + layout.asPrimeMm2) / (bc * dc);
  if (!(bc > ds && dc > ds && longitudinalShare < 1)) return undefined;
  const clearDistancesMm = clearDistances(hooped, stirrup, { bc, dc, coreTopMm, ds });
  const squares = clearDistancesMm.reduce((sum, w) => sum + w * w, 0);
  const heldBetweenBars = Math.max(0, 1 - squares / (6 * bc * dc));
  const clearSpacing = Math.max(0, s - ds);
  const heldBetweenHoops =
    Math.max(0, 1 - clearSpacing / (2 * bc)) * Math.max(0, 1 - clearSpacing / (2 * dc));
  const effectiveness = Math.min(1, (heldBetweenBars * heldBetweenHoops) / (1 - longitudinalShare));
  const ratioAcross = (2 * hoop.areaMm2) / (s * dc);
  const ratioDeep = (stirrup.legs * hoop.areaMm2) / (s * bc);
  const length = 2 * bc + stirrup.legs * dc;
  return {
    coreWidthMm: bc,
    coreDepthMm: dc,
    coreTopMm,
    outsideWidthMm: bc + ds,
    spacingMm: s,
    hoopYieldMPa: steel.yieldMPa,
    hoopRuptureStrain: steel.ruptureStrain,
    ratioAcross,
    ratioDeep,
    volumetricRatio: ratioAcross + ratioDeep,
    volumetricRatioOutside: (length * hoop.areaMm2) / (s * (bc + ds) * (dc + ds)),
    clearDistancesMm,
    heldBetweenBars,
    heldBetweenHoops,
    effectiveness,
    pressureAcrossMPa: effectiveness * ratioAcross * steel.yieldMPa,
    pressureDeepMPa: effectiveness * ratioDeep * steel.yieldMPa,
  };
}

interface Core {
  readonly bc: number;
  readonly dc: number;
  readonly coreTopMm: number;
  readonly ds: number;
}

/** w′ along the two faces, then the two sides. */
function clearDistances({ section, arrangement }: HoopedSection, { legs }: Stirrup, core: Core): number[] {
  const nearest = (face: Face) =>
    (arrangement?.bars ?? [])
      .filter((bar) => bar.face === face && bar.layer === 0)
      .sort((a, b) => a.xMm - b.xMm);
  const top = nearest('compression');
  const bottom = nearest('tension');
  const inside = core.coreTopMm + core.ds / 2;
  const upper = top[0] ? top[0].yMm + top[0].diameterMm / 2 : inside;
  const lower = bottom[0] ? bottom[0].yMm - bottom[0].diameterMm / 2 : section.depthMm - inside;
  const side = Math.max(0, lower - upper);
  return [...alongFace(top, legs, core), ...alongFace(bottom, legs, core), side, side];
}

function alongFace(bars: readonly PlacedBar[], legs: number, { bc, ds }: Core): number[] {
  if (bars.length < 2) return Array.from({ length: legs - 1 }, () => (bc - ds) / (legs - 1));
  if (legs >= bars.length)
    return bars.slice(1).map((bar, i) => bar.xMm - bars[i]!.xMm - (bar.diameterMm + bars[i]!.diameterMm) / 2);
  const first = bars[0]!;
  const span = bars[bars.length - 1]!.xMm - first.xMm;
  const clear = span / (legs - 1) - first.diameterMm;
  return Array.from({ length: legs - 1 }, () => Math.max(0, clear));
}
