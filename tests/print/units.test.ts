import { describe, expect, it } from 'vitest';
import { UNIT_SYSTEMS } from '#shared/contract/design-basis.ts';
import { toDisplay, toStored, type DisplayKind } from '#shared/print/units.ts';

/**
 * Factors of NIST Special Publication 811 (2008), appendix B.8, from memory to the digits given here; the short ton, the
 * cubic yard and the square foot follow from the pound and the foot exactly.
 */
const NIST: readonly (readonly [kind: DisplayKind, storedPerUsUnit: number])[] = [
  ['length', 25.4],
  ['span', 304.8],
  ['stress', 6.894757],
  ['force', 4448.222],
  ['moment', 1.355818e6],
  ['mass-per-length', 1.488164],
  ['mass', 0.4535924],
  ['tonnes', 0.9071847],
  ['volume', 0.7645549],
  ['surface', 0.09290304],
  ['inertia', 416231.4],
];

describe('units of a US project', () => {
  it.each(NIST)('%s: one unit is %s stored', (kind, stored) => {
    expect(toStored(1, kind, 'us') / stored).toBeCloseTo(1, 6);
  });

  it('prices per pound, yard and foot come from the same factors', () => {
    expect(toDisplay(1, 'money-per-mass', 'us')).toBeCloseTo(0.4535924, 6);
    expect(toDisplay(1, 'money-per-volume', 'us')).toBeCloseTo(0.7645549, 6);
    expect(toDisplay(1, 'money-per-surface', 'us')).toBeCloseTo(0.09290304, 8);
    expect(toDisplay(1, 'money-per-length', 'us')).toBeCloseTo(0.3048, 12);
  });

  it('a beam costs the same reckoned per foot or per metre', () => {
    const perM = 327.5;
    const spanMm = 8534.4;
    const feet = toDisplay(spanMm, 'span', 'us');
    expect(toDisplay(perM, 'money-per-length', 'us') * feet).toBeCloseTo((perM * spanMm) / 1000, 9);
  });
});

describe('every unit', () => {
  it.each(UNIT_SYSTEMS)('goes to storage and back in %s', (units) => {
    for (const [kind] of NIST)
      expect(toDisplay(toStored(12.34, kind, units), kind, units)).toBeCloseTo(12.34, 10);
  });
});
