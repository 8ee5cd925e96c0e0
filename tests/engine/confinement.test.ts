import { describe, expect, it } from 'vitest';
import { confinementOf, HOOPED } from './hooped-section.ts';
import { nonNull } from './non-null.ts';

const hooped = (changes: Partial<typeof HOOPED>) => confinementOf({ ...HOOPED, ...changes });
const stirrup = { bar: '10', legs: 2, spacingMm: 100 };

describe('confinement by the section’s own hoops', () => {
  it('300 × 500, 3-25 and 2-16, two legs of 10 at 100: every factor by hand', () => {
    const hoops = nonNull(confinementOf(HOOPED));
    // to hoop centre lines: 300 − 2 × 45, 500 − 2 × 45
    expect([hoops.coreWidthMm, hoops.coreDepthMm, hoops.coreTopMm]).toEqual([210, 410, 45]);
    // top: 300 − 2 × 58 − 16; bottom with two legs: 300 − 2 × 62.5 − 25; sides: 437.5 − 12.5 − 66
    expect(hoops.clearDistancesMm).toEqual([168, 150, 359, 359]);
    // 1 − (168² + 150² + 2 × 359²)/(6 × 210 × 410) = 1 − 308486/516600
    expect(hoops.heldBetweenBars).toBeCloseTo(0.40285, 5);
    // s′ = 90: (1 − 90/420)(1 − 90/820)
    expect(hoops.heldBetweenHoops).toBeCloseTo(0.69948, 5);
    // over 1 − 1874.75/86100
    expect(hoops.effectiveness).toBeCloseTo((0.40285 * 0.69948) / 0.978226, 5);
    // 78.54 mm²: 2 legs over 100 × 410 across, 2 legs over 100 × 210 over the depth
    expect(hoops.ratioAcross).toBeCloseTo(0.0038312, 7);
    expect(hoops.ratioDeep).toBeCloseTo(0.00748, 5);
    expect(hoops.pressureDeepMPa).toBeCloseTo(0.28806 * 0.00748 * 420, 4);
    expect(hoops.volumetricRatioOutside).toBeCloseTo((78.54 * 2 * (210 + 410)) / (100 * 220 * 420), 6);
  });

  it('grows with legs, which hold inner bars too, and shrinks with spacing', () => {
    const two = nonNull(hooped({}));
    const three = nonNull(hooped({ stirrup: { ...stirrup, legs: 3 } }));
    // all three bottom bars held: gaps of 87.5 − 25
    expect(three.clearDistancesMm).toEqual([168, 62.5, 62.5, 359, 359]);
    expect(three.effectiveness).toBeGreaterThan(two.effectiveness);
    expect(three.pressureDeepMPa).toBeGreaterThan(1.5 * two.pressureDeepMPa);
    expect(three.pressureAcrossMPa / three.effectiveness).toBeCloseTo(
      two.pressureAcrossMPa / two.effectiveness,
      9,
    );
    expect(nonNull(hooped({ stirrup: { ...stirrup, spacingMm: 200 } })).effectiveness).toBeLessThan(
      two.effectiveness,
    );
  });

  it('holds at the hoop’s corners where no bar stands: no top bars, and plain layers', () => {
    const tension = [{ bar: '25', count: 3 }];
    const bare = nonNull(hooped({ reinforcement: { kind: 'bars', tension, compression: [] } }));
    expect(bare.clearDistancesMm[0]).toBe(200);
    const layers = [{ depthMm: 437.5, areaMm2: 1472.6, face: 'tension' as const }];
    const plain = nonNull(hooped({ reinforcement: { kind: 'layers', layers } }));
    expect(plain.clearDistancesMm).toEqual([200, 200, 400, 400]);
    expect(plain.effectiveness).toBeLessThan(bare.effectiveness);
  });

  it('is nothing for hoops farther apart than twice the core, or a core too deep for its width', () => {
    expect(nonNull(hooped({ stirrup: { ...stirrup, spacingMm: 500 } })).effectiveness).toBe(0);
    const deep = nonNull(hooped({ depthMm: 1400 }));
    expect(deep.heldBetweenBars).toBe(0);
    expect(deep.effectiveness).toBe(0);
  });

  it('does not exist without hoops', () => {
    expect(hooped({ stirrup: null })).toBeUndefined();
  });
});
