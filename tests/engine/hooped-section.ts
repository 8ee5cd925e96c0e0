import { findConfinement, type HoopConfinement } from '#shared/engine/concrete-laws/confinement.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { placeSteel } from '#shared/engine/steel-layout.ts';
import { METRIC_BASIS } from '#shared/verification/layered-section.ts';
import { nonNull } from './non-null.ts';

/** HAND-01 with hoops at 100 mm: 300 × 500, 3-25 below, 2-16 above, cover 40, hoops 10. */
export const HOOPED: SectionInput = {
  widthMm: 300,
  depthMm: 500,
  fcMPa: 30,
  fyMPa: 420,
  coverMm: 40,
  stirrup: { bar: '10', legs: 2, spacingMm: 100 },
  reinforcement: {
    kind: 'bars',
    tension: [{ bar: '25', count: 3 }],
    compression: [{ bar: '16', count: 2 }],
  },
};

const HOOP_STEEL = { yieldMPa: 420, ruptureStrain: 0.12 };

export function confinementOf(section: SectionInput): HoopConfinement | undefined {
  const { layout, arrangement } = placeSteel(section, METRIC_BASIS, 2);
  return findConfinement({ section, layout: nonNull(layout), arrangement, basis: METRIC_BASIS }, HOOP_STEEL);
}
