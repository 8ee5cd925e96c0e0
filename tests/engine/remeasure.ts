import { getBar } from '#shared/engine/bars.ts';
import type { Arrangement, PlacedBar } from '#shared/engine/evaluation.ts';
import type { DesignBasis, SectionInput } from '#shared/engine/section.ts';

const SLACK = 1e-6;

/**
 * Measures an arrangement anew from its coordinates alone, as one would with a rule on the drawing, against ACI 318 25.2.1
 * (gap in a layer), 25.2.2 (25 mm or 1 in between layers, bars in line) and the cover. Returns what is wrong.
 */
export function remeasure(section: SectionInput, basis: DesignBasis, { bars }: Arrangement): string[] {
  const wrong: string[] = [];
  const least = basis.ruleSet.includes('318m') ? 25 : 25.4;
  const clear =
    section.coverMm + (section.stirrup ? getBar(basis.barStandard, section.stirrup.bar).diameterMm : 0);
  for (const bar of bars) {
    const r = bar.diameterMm / 2;
    const side = Math.min(bar.xMm, section.widthMm - bar.xMm) - r;
    const face = Math.min(bar.yMm, section.depthMm - bar.yMm) - r;
    if (side < clear - SLACK) wrong.push(`${bar.bar} is ${side} from the side`);
    if (face < clear - SLACK) wrong.push(`${bar.bar} is ${face} from the face`);
  }
  for (let i = 0; i < bars.length; i++)
    for (let j = i + 1; j < bars.length; j++) wrong.push(...pair(bars[i]!, bars[j]!, { least, basis }));
  for (const bar of bars) {
    const mirror = bars.some(
      (other) =>
        Math.abs(other.xMm + bar.xMm - section.widthMm) < SLACK &&
        Math.abs(other.yMm - bar.yMm) < SLACK &&
        other.bar === bar.bar,
    );
    if (!mirror) wrong.push(`${bar.bar} at ${bar.xMm} has no mirror image`);
    const below =
      bar.layer === 0 ||
      bars.some((o) => o.face === bar.face && o.layer === bar.layer - 1 && Math.abs(o.xMm - bar.xMm) < SLACK);
    if (!below) wrong.push(`${bar.bar} at ${bar.xMm} is not in line`);
  }
  return wrong;
}

function pair(a: PlacedBar, b: PlacedBar, { least, basis }: { least: number; basis: DesignBasis }): string[] {
  const sideways = Math.abs(a.xMm - b.xMm) - (a.diameterMm + b.diameterMm) / 2;
  const upwards = Math.abs(a.yMm - b.yMm) - (a.diameterMm + b.diameterMm) / 2;
  if (a.face === b.face && a.layer === b.layer) {
    const required = Math.max(least, a.diameterMm, b.diameterMm, (4 / 3) * basis.maxAggregateMm);
    return sideways < required - SLACK ? [`gap ${sideways} in a layer, ${required} required`] : [];
  }
  return upwards < least - SLACK ? [`gap ${upwards} between layers, ${least} required`] : [];
}
