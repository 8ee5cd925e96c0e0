import { describe, expect, it } from 'vitest';
import type { ShownCandidate } from '#client/src/features/shortlist/comparison.ts';
import { priceFlips } from '#client/src/features/shortlist/price-flips.ts';

interface Parts {
  readonly steel: number;
  readonly concrete: number;
  readonly formwork: number | null;
}

const candidate = (label: string, { steel, concrete, formwork }: Parts, more = {}): ShownCandidate =>
  ({
    label,
    beam: { id: 'beam' },
    snapshot: {
      evaluation: {
        quantities: { cost: { currency: 'EUR', steel, stirrups: 0, concrete, formwork } },
      },
    },
    ...more,
  }) as unknown as ShownCandidate;

describe('what would change the cheapest', () => {
  const steely = candidate('A', { steel: 40, concrete: 20, formwork: 30 });
  const bulky = candidate('B', { steel: 30, concrete: 32, formwork: 36 });

  it('is the rate at which both cost the same', () => {
    const steel = priceFlips([steely, bulky]).find((flip) => flip.material === 'steel')!;
    expect(steel).toMatchObject({ cheapest: 'A', challenger: 'B' });
    expect(40 * steel.factor + 50).toBeCloseTo(30 * steel.factor + 68, 9);
    expect(steel.factor).toBeGreaterThan(1);
  });

  it('comes down for a material the challenger has more of', () => {
    const concrete = priceFlips([bulky, steely]).find((flip) => flip.material === 'concrete')!;
    expect(concrete.factor).toBeCloseTo(1 - 8 / 12, 9);
  });

  it('names the nearest change first, and none that no market makes', () => {
    const flips = priceFlips([steely, bulky]);
    const distances = flips.map(({ factor }) => Math.abs(Math.log(factor)));
    expect(distances).toEqual(distances.toSorted((a, b) => a - b));
    const far = candidate('C', { steel: 39, concrete: 60, formwork: 30 });
    expect(priceFlips([steely, far]).filter((flip) => flip.material === 'steel')).toEqual([]);
  });

  it('says nothing of one that costs more in everything, of ties, and of what is not known', () => {
    const dearer = candidate('C', { steel: 41, concrete: 21, formwork: 31 });
    expect(priceFlips([steely, dearer]).every((flip) => flip.factor > 0 && flip.factor < 1)).toBe(true);
    expect(priceFlips([steely, candidate('C', { steel: 40, concrete: 20, formwork: 30 })])).toEqual([]);
    expect(priceFlips([steely, candidate('C', { steel: 40, concrete: 20, formwork: null })])).toEqual([]);
    expect(priceFlips([steely, candidate('C', bulkyParts, { beam: { id: 'other' } })])).toEqual([]);
    expect(priceFlips([steely])).toEqual([]);
  });
});

const bulkyParts: Parts = { steel: 30, concrete: 32, formwork: 36 };
