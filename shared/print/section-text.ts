import type { UnitSystem } from '../contract/design-basis.ts';
import type { BarGroup, SectionInput, Stirrup } from '../engine/section.ts';
import { faceWord } from './face-word.ts';
import { formatQuantity } from './format-quantity.ts';

/** Bars as the trade writes them: `3-#8`, `2-25M + 2-20M`; `none` for an empty face. */
export const barsText = (bars: BarGroup): string =>
  bars.length === 0 ? 'none' : bars.map(({ bar, count }) => `${count}-${bar}`).join(' + ');

/** `12 × 27 in`; the web of a T or L as `T 12 × 27 in`. */
export function sizeText(
  { widthMm, depthMm, flange }: Pick<SectionInput, 'widthMm' | 'depthMm' | 'flange'>,
  units: UnitSystem,
): string {
  const shape = flange ? `${flange.shape.toUpperCase()} ` : '';
  return `${shape}${formatQuantity(widthMm, 'length', units, { hideUnit: true })} × ${formatQuantity(depthMm, 'length', units)}`;
}

/** `8-#6 bottom, 2-#5 top`, the tension bars first: `8-#6 top, 2-#5 bottom` in hogging. Or the layers with their areas. */
export function steelText(section: SectionInput, units: UnitSystem): string {
  const { reinforcement } = section;
  if (reinforcement.kind === 'bars') {
    const { tension, compression } = reinforcement;
    const others =
      compression.length === 0 ? '' : `, ${barsText(compression)} ${faceWord('compression', section)}`;
    return `${barsText(tension)} ${faceWord('tension', section)}${others}`;
  }
  return reinforcement.layers
    .map((layer) => {
      const area = formatQuantity(layer.areaMm2, 'area', units);
      return `${area} at ${formatQuantity(layer.depthMm, 'length', units)}`;
    })
    .join(', ');
}

/** `#3 designed, 12 in at most, 2 legs`: what was asked for, where the spacing is found for each section. */
export function givenStirrupText(stirrup: SectionInput['stirrup'], units: UnitSystem): string {
  if (!stirrup?.isDesigned) return stirrupText(stirrup, units);
  const widest = formatQuantity(stirrup.spacingMm, 'length', units);
  return `${stirrup.bar} designed, ${widest} at most, ${stirrup.legs} legs`;
}

/** `#3 @ 6 in, 2 legs`, or `none`. */
export function stirrupText(
  stirrup: Pick<Stirrup, 'bar' | 'legs' | 'spacingMm'> | null,
  units: UnitSystem,
): string {
  if (stirrup === null) return 'none';
  return `${stirrup.bar} @ ${formatQuantity(stirrup.spacingMm, 'length', units)}, ${stirrup.legs} legs`;
}
