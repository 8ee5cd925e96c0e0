import type { ConcreteLawId, SteelLawId } from '../engine/curve-choices.ts';
import type { DuctilityMeasure, SeismicSystem } from '../engine/section.ts';

/** A choice with the words that tell what it does to the numbers. */
export interface ExplainedLabel {
  readonly label: string;
  readonly meaning: string;
}

const MEASURE: Readonly<Record<DuctilityMeasure, ExplainedLabel>> = {
  closed: {
    label: 'Closed form',
    meaning:
      'φu = εcu/c over φy of the cracked elastic section. By hand in a few lines, and swept at full speed.',
  },
  'curve-first-yield': {
    label: 'Full curve, first yield',
    meaning:
      'End of the full moment–curvature over the curvature at which the steel first yields on it. Follows the laws below; every section that meets all else is drawn, which takes a sweep longer.',
  },
  'curve-bilinear': {
    label: 'Full curve, bilinear yield',
    meaning:
      'End of the full moment–curvature over the corner of two straight lines of the same area. Usually the lower of the two; the same time as by first yield.',
  },
};

const CONCRETE: Readonly<Record<ConcreteLawId, ExplainedLabel>> = {
  hognestad: {
    label: 'Hognestad',
    meaning: 'A parabola to the peak, then a straight fall. Plain concrete: hoops change nothing.',
  },
  todeschini: {
    label: 'Todeschini',
    meaning: 'One smooth curve over the peak. Plain concrete: hoops change nothing.',
  },
  'kent-park': {
    label: 'Kent–Park, not confined',
    meaning: 'A parabola, then a straight fall that is steeper for stronger concrete.',
  },
  'kent-park-confined': {
    label: 'Kent–Park, core confined (modified)',
    meaning:
      'Cover as unconfined; the core within the hoops is stronger and falls more slowly, by the section’s own hoops.',
  },
  mander: {
    label: 'Mander, not confined',
    meaning: 'A curve through the peak that falls off, then spalls.',
  },
  'mander-confined': {
    label: 'Mander, core confined',
    meaning:
      'The core within the hoops by their effective pressure; it ends where a hoop would break. The most ductile of these.',
  },
  'parabola-rectangle': {
    label: 'Parabola–rectangle',
    meaning: 'A parabola, then level to crushing, as the Eurocode designs with.',
  },
};

const STEEL: Readonly<Record<SteelLawId, ExplainedLabel>> = {
  'elastic-plastic': {
    label: 'Elastic–plastic',
    meaning: 'Straight to fy, then level to rupture.',
  },
  'strain-hardening': {
    label: 'Strain hardening',
    meaning: 'Level after fy, then rising to fu before rupture: more moment at the end.',
  },
};

const SYSTEM: Readonly<Record<SeismicSystem, string>> = {
  none: 'None',
  ordinary: 'Ordinary moment frame',
  intermediate: 'Intermediate moment frame',
  special: 'Special moment frame',
  dcm: 'Ductility class medium, DCM',
  dch: 'Ductility class high, DCH',
};

export const ductilityMeasureLabel = (id: DuctilityMeasure): ExplainedLabel => MEASURE[id];
export const concreteLawLabel = (id: ConcreteLawId): ExplainedLabel => CONCRETE[id];
export const steelLawLabel = (id: SteelLawId): ExplainedLabel => STEEL[id];
export const seismicSystemLabel = (id: SeismicSystem): string => SYSTEM[id];
