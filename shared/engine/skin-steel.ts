import { getBar } from './bars.ts';
import type { SkinSteel } from './evaluation.ts';
import type { RuleSet } from './rules/rule-set.ts';
import type { DesignBasis, SectionInput } from './section.ts';
import type { SteelLayout } from './steel-layout.ts';

/**
 * Side bars at each side of a deep beam (ACI 318 9.7.2.3): from the tension layer nearest mid-depth to mid-depth, the last
 * one there, no further apart than the spacing allowed. 0 where that layer lies above mid-depth; NaN where no spacing is
 * allowed. mm.
 */
export function skinBarsPerSide(depthMm: number, innermostTensionMm: number, allowedMm: number): number {
  if (!(allowedMm > 0)) return NaN;
  const zoneMm = innermostTensionMm - depthMm / 2;
  return zoneMm > 0 ? Math.ceil(zoneMm / allowedMm - 1e-9) : 0;
}

/** Skin bars of both sides, kg per metre of beam; none where no spacing is allowed. */
export const skinKgPerM = (perSide: number, massKgPerM: number) =>
  perSide > 0 ? 2 * perSide * massKgPerM : 0;

/** Clear cover from the side to the skin bars, which stand inside the stirrups, mm. */
const sideCoverMm = ({ coverMm, stirrup }: SectionInput, basis: DesignBasis) =>
  coverMm + (stirrup ? getBar(basis.barStandard, stirrup.bar, ['stirrup', 'bar']).diameterMm : 0);

/** Largest spacing of the skin bars, mm. */
export function allowedSkinSpacingMm(section: SectionInput, basis: DesignBasis, rules: RuleSet): number {
  return rules.skinSpacingMm(section.fyMPa, sideCoverMm(section, basis));
}

/**
 * The skin steel of a deep section whose bars are placed; null where the code asks for none, the basis names no bar, or no
 * spacing is allowed. It is not counted in strength.
 * @throws InvalidSectionError for an unknown bar.
 */
export function skinSteelOf(
  section: SectionInput,
  layout: SteelLayout | null,
  basis: DesignBasis,
  rules: RuleSet,
): SkinSteel | null {
  const { depthMm, widthMm } = section;
  if (!layout || !basis.skinBar || !rules.isSkinSteelAsked(depthMm)) return null;
  const bar = getBar(basis.barStandard, basis.skinBar, ['basis', 'skinBar']);
  const innermostMm = innermostTensionMm(layout);
  const allowedMm = allowedSkinSpacingMm(section, basis, rules);
  const perSide = skinBarsPerSide(depthMm, innermostMm, allowedMm);
  if (Number.isNaN(perSide)) return null;
  const zoneMm = innermostMm - depthMm / 2;
  const spacingMm = perSide > 0 ? zoneMm / perSide : null;
  const xMm = sideCoverMm(section, basis) + bar.diameterMm / 2;
  const places = Array.from({ length: perSide }, (_, i) => innermostMm - (zoneMm * (i + 1)) / perSide);
  return {
    bar: bar.designation,
    perSide,
    spacingMm,
    allowedMm,
    bars: [xMm, widthMm - xMm].flatMap((x) =>
      places.map((yMm) => ({ bar: bar.designation, xMm: x, yMm, diameterMm: bar.diameterMm })),
    ),
  };
}

/** Depth of the tension layer nearest mid-depth, mm. */
export function innermostTensionMm({ depths, faces }: Pick<SteelLayout, 'depths' | 'faces'>): number {
  return depths[faces.indexOf('tension')]!;
}
