import type { Demand } from '../engine/section.ts';
import type { BeamInput } from './records.ts';

/** What a beam asks of its section. How its span is held is not the beam's yet, so least depth is asked by a sweep only. */
export function beamDemand(beam: Omit<BeamInput, 'mark' | 'location' | 'count'>): Demand {
  const { muNmm, vuN, ductilityTarget, depthCapMm, spanMm } = beam;
  return { muNmm, vuN, ductilityTarget, depthCapMm, spanMm, support: null };
}
