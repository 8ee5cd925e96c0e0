import type { ShownCandidate } from './comparison.ts';

/** Candidates of each beam together, in the order their beams first occur. */
export function groupByBeam<C extends ShownCandidate>(candidates: readonly C[]): readonly (readonly C[])[] {
  const groups = new Map<string, C[]>();
  for (const candidate of candidates) {
    const group = groups.get(candidate.beam.id);
    if (group === undefined) groups.set(candidate.beam.id, [candidate]);
    else group.push(candidate);
  }
  return [...groups.values()];
}
