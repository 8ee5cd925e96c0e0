import { InvalidSectionError } from './preconditions.ts';
import type { BarStandard } from './section.ts';
import { KG_PER_M_PER_LB_PER_FT, MM2_PER_IN2, MM_PER_IN } from './units.ts';

/** A reinforcing bar as its standard prints it: nominal diameter mm, nominal area mm², nominal mass kg/m. */
export interface Bar {
  readonly designation: string;
  readonly diameterMm: number;
  readonly areaMm2: number;
  readonly massKgPerM: number;
}

/** ASTM A615/A706 Table 1, nominal: number, diameter in, area in², mass lb/ft. */
const ASTM: readonly (readonly [number, number, number, number])[] = [
  [3, 0.375, 0.11, 0.376],
  [4, 0.5, 0.2, 0.668],
  [5, 0.625, 0.31, 1.043],
  [6, 0.75, 0.44, 1.502],
  [7, 0.875, 0.6, 2.044],
  [8, 1.0, 0.79, 2.67],
  [9, 1.128, 1.0, 3.4],
  [10, 1.27, 1.27, 4.303],
  [11, 1.41, 1.56, 5.313],
  [14, 1.693, 2.25, 7.65],
  [18, 2.257, 4.0, 13.6],
];

/** CSA G30.18: designation, diameter mm, area mm², mass kg/m (area × 7850 kg/m³). */
const CSA: readonly (readonly [string, number, number, number])[] = [
  ['10M', 11.3, 100, 0.785],
  ['15M', 16.0, 200, 1.57],
  ['20M', 19.5, 300, 2.355],
  ['25M', 25.2, 500, 3.925],
  ['30M', 29.9, 700, 5.495],
  ['35M', 35.7, 1000, 7.85],
  ['45M', 43.7, 1500, 11.775],
  ['55M', 56.4, 2500, 19.625],
];

/**
 * EN 10080 / ISO 6935-2: diameter mm, mass kg/m. The nominal area is that of the circle, π d²/4: the standard's table
 * prints the same number rounded.
 */
const ISO: readonly (readonly [number, number])[] = [
  [6, 0.222],
  [8, 0.395],
  [10, 0.617],
  [12, 0.888],
  [14, 1.208],
  [16, 1.578],
  [18, 1.998],
  [20, 2.466],
  [25, 3.853],
  [28, 4.834],
  [32, 6.313],
  [40, 9.865],
];

export const BARS: Readonly<Record<BarStandard, readonly Bar[]>> = {
  astm: ASTM.map(([number, diameterIn, areaIn2, massLbPerFt]) => ({
    designation: `#${number}`,
    diameterMm: diameterIn * MM_PER_IN,
    areaMm2: areaIn2 * MM2_PER_IN2,
    massKgPerM: massLbPerFt * KG_PER_M_PER_LB_PER_FT,
  })),
  csa: CSA.map(([designation, diameterMm, areaMm2, massKgPerM]) => ({
    designation,
    diameterMm,
    areaMm2,
    massKgPerM,
  })),
  iso: ISO.map(([diameterMm, massKgPerM]) => ({
    designation: String(diameterMm),
    diameterMm,
    areaMm2: (Math.PI * diameterMm * diameterMm) / 4,
    massKgPerM,
  })),
};

/** The bar of that designation, or undefined. */
export function findBar(standard: BarStandard, designation: string): Bar | undefined {
  return BARS[standard].find((bar) => bar.designation === designation);
}

/** @throws InvalidSectionError for a designation its standard does not have. */
export function getBar(
  standard: BarStandard,
  designation: string,
  path: readonly (string | number)[] = [],
): Bar {
  const bar = findBar(standard, designation);
  if (!bar) {
    const known = BARS[standard].map((b) => b.designation).join(', ');
    throw new InvalidSectionError(
      `Bar ${designation} is not in the bar list of this project (${known})`,
      path,
    );
  }
  return bar;
}
