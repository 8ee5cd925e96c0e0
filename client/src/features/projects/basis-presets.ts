import type { ProjectDesignBasis } from '#shared/contract/design-basis.ts';
import { MM_PER_IN, MPA_PER_KSI } from '#shared/engine/units.ts';

const SHARED = {
  bendAllowance: 'corner-in-bend',
  displacedConcrete: 'deduct',
  yieldCurvatureAt: 'outermost-layer',
  slabMm: 0,
} as const;

/**
 * What a new project starts from. Es 29,000 ksi and 200,000 MPa: ACI 318-19 and 318M-19, 20.2.2.2. Cover 1.5 in and
 * 40 mm for beams not exposed to weather: 20.5.1.3.1. Grade 60 / 420 and 3/4 in (20 mm) aggregate: common practice,
 * no source. Side bars #4 and 12: common practice, no source.
 */
export const BASIS_PRESETS: Readonly<Record<'us' | 'si', ProjectDesignBasis>> = {
  us: {
    ...SHARED,
    units: 'us',
    ruleSet: 'aci318-19',
    barStandard: 'astm',
    esMPa: 29_000 * MPA_PER_KSI,
    maxAggregateMm: 0.75 * MM_PER_IN,
    fyMPa: 60 * MPA_PER_KSI,
    fytMPa: 60 * MPA_PER_KSI,
    coverMm: 1.5 * MM_PER_IN,
    skinBar: '#4',
  },
  si: {
    ...SHARED,
    units: 'si',
    ruleSet: 'aci318m-19',
    barStandard: 'iso',
    esMPa: 200_000,
    maxAggregateMm: 20,
    fyMPa: 420,
    fytMPa: 420,
    coverMm: 40,
    skinBar: '12',
  },
};
