/** How a check is read at a glance. */
export type Verdict = 'meets' | 'near' | 'fails';

/** From here up to its limit a check that passes is worth a second look. */
const NEAR_FROM = 0.95;

export const judge = (ratio: number | null, passes: boolean): Verdict =>
  !passes ? 'fails' : ratio !== null && ratio >= NEAR_FROM ? 'near' : 'meets';
