import type { UnitSystem } from '../contract/design-basis.ts';
import type { BarGroup, SectionInput } from '../engine/section.ts';
import { formatQuantity } from './format-quantity.ts';

/** Bars as the trade writes them: `3-#8`, `2-25M + 2-20M`; `none` for an empty face. */
export const barsText = (bars: BarGroup): string =>
  bars.length === 0 ? 'none' : bars.map(({ bar, count }) => `${count}-${bar}`).join(' + ');

/** `12 × 27 in`. */
export const sizeText = (section: Pick<SectionInput, 'widthMm' | 'depthMm'>, units: UnitSystem): string =>
  `${formatQuantity(section.widthMm, 'length', units, { hideUnit: true })} × ${formatQuantity(section.depthMm, 'length', units)}`;

/** `8-#6 bottom, 2-#5 top`, or the layers with their areas. */
export function steelText(section: SectionInput, units: UnitSystem): string {
  const { reinforcement } = section;
  if (reinforcement.kind === 'bars') {
    const top = reinforcement.compression.length === 0 ? '' : `, ${barsText(reinforcement.compression)} top`;
    return `${barsText(reinforcement.tension)} bottom${top}`;
  }
  return reinforcement.layers
    .map((layer) => {
      const area = formatQuantity(layer.areaMm2, 'area', units);
      return `${area} at ${formatQuantity(layer.depthMm, 'length', units)}`;
    })
    .join(', ');
}

/** `#3 @ 6 in, 2 legs`, or `none`. */
export function stirrupText(stirrup: SectionInput['stirrup'], units: UnitSystem): string {
  if (stirrup === null) return 'none';
  return `${stirrup.bar} @ ${formatQuantity(stirrup.spacingMm, 'length', units)}, ${stirrup.legs} legs`;
}
