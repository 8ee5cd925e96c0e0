import type { UnitSystem } from '../contract/design-basis.ts';
import type { SectionInput } from '../engine/section.ts';
import { formatQuantity } from '../print/format-quantity.ts';
import { barsText } from '../print/section-text.ts';
import { drawnDepth, type SectionGeometry } from './section-geometry.ts';

/** A word beside the section with a line to what it names; mm in the section's own coordinates. */
export interface Callout {
  readonly text: string;
  readonly tone: 'steel' | 'ink';
  readonly xMm: number;
  readonly yMm: number;
}

/** Words for every layer of steel, the stirrup and the neutral axis, from the top down. */
export function calloutsOf(section: SectionInput, geometry: SectionGeometry, units: UnitSystem): Callout[] {
  const rows = geometry.rows.map((row): Callout => ({
    text: barsText(row.groups),
    tone: 'steel',
    xMm: row.rightMm,
    yMm: row.yMm,
  }));
  const bands = geometry.bands.map((band): Callout => ({
    text: formatQuantity(band.areaMm2, 'area', units, { digits: 4 }),
    tone: 'steel',
    xMm: band.xMm + band.widthMm,
    yMm: band.yMm + band.heightMm / 2,
  }));
  const { stirrup } = geometry;
  const ties: Callout[] =
    stirrup === null || section.stirrup === null || !geometry.fits
      ? []
      : [
          {
            text: `${section.stirrup.bar} @ ${formatQuantity(stirrup.spacingMm, 'length', units)}`,
            tone: 'steel',
            xMm: stirrup.xMm + stirrup.widthMm,
            yMm: geometry.depthMm * 0.56,
          },
        ];
  const axis: Callout[] =
    geometry.neutralAxisMm === null
      ? []
      : [
          {
            text: `${geometry.axisSymbol} ${formatQuantity(geometry.neutralAxisMm, 'length', units, { hideUnit: true, digits: 3 })}`,
            tone: 'ink',
            xMm: geometry.widthMm,
            yMm: drawnDepth(geometry, geometry.neutralAxisMm),
          },
        ];
  return [...rows, ...bands, ...ties, ...skinCallout(geometry), ...axis].toSorted((a, b) => a.yMm - b.yMm);
}

/** Side bars of both sides in one word, at the right-hand one nearest mid-depth. */
function skinCallout({ skinBars, depthMm }: SectionGeometry): Callout[] {
  const rightMm = Math.max(...skinBars.map((bar) => bar.xMm));
  const [nearest] = skinBars
    .filter((bar) => bar.xMm === rightMm)
    .toSorted((a, b) => Math.abs(a.yMm - depthMm / 2) - Math.abs(b.yMm - depthMm / 2));
  if (nearest === undefined) return [];
  const text = `${skinBars.length}-${nearest.bar} skin`;
  return [{ text, tone: 'steel', xMm: nearest.xMm + nearest.radiusMm, yMm: nearest.yMm }];
}
