import type { Stirrup } from '#shared/engine/section.ts';

/** One choice of stirrups as typed. */
export interface StirrupValues {
  /** Designation; empty for a section without stirrups. */
  readonly bar: string;
  readonly legs: number | null;
  readonly spacingMm: number | null;
  /** The spacing is found for each section, and what is typed is the widest. */
  readonly isDesigned: boolean;
}

/** A stored choice as a form's fields. */
export const stirrupValues = (stirrup: Stirrup | null): StirrupValues =>
  stirrup === null
    ? { bar: '', legs: 2, spacingMm: null, isDesigned: false }
    : { ...stirrup, isDesigned: stirrup.isDesigned === true };

/** What was typed, for the contract to judge; null for none. */
export function readStirrup({ bar, legs, spacingMm, isDesigned }: StirrupValues) {
  return bar === '' ? null : { bar, legs, spacingMm, ...(isDesigned ? { isDesigned } : {}) };
}
