import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { BARS } from '#shared/engine/bars.ts';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import { BAR_STANDARDS, BEND_ALLOWANCES } from '#shared/engine/section.ts';
import { METRIC_BASIS, NO_DEMAND, NO_RULES } from '#shared/verification/layered-section.ts';
import { PROPERTIES } from '#shared/verification/properties.ts';
import { remeasure } from './remeasure.ts';

const randomBars = fc
  .record({ standard: fc.constantFrom(...BAR_STANDARDS), bend: fc.constantFrom(...BEND_ALLOWANCES) })
  .chain(({ standard, bend }) => {
    const sizes = BARS[standard].map((bar) => bar.designation);
    const count = fc.integer({ min: 1, max: 9 });
    const group = fc.oneof(
      fc.record({ bar: fc.constantFrom(...sizes), count }).map((one) => [one]),
      fc.uniqueArray(fc.constantFrom(...sizes), { minLength: 2, maxLength: 2 }).chain(([a, b]) =>
        fc.tuple(count, count).map(([m, n]) => [
          { bar: a!, count: m },
          { bar: b!, count: n },
        ]),
      ),
    );
    return fc.record({
      basis: fc.constant({ ...METRIC_BASIS, barStandard: standard, bendAllowance: bend }),
      maxLayers: fc.integer({ min: 1, max: 4 }),
      section: fc.record({
        widthMm: fc.integer({ min: 150, max: 800 }),
        depthMm: fc.integer({ min: 200, max: 1200 }),
        fcMPa: fc.constant(30),
        fyMPa: fc.constant(420),
        coverMm: fc.integer({ min: 20, max: 75 }),
        stirrup: fc.option(
          fc.record({
            bar: fc.constantFrom(...sizes.slice(0, 4)),
            legs: fc.constant(2),
            spacingMm: fc.constant(150),
          }),
          { nil: null },
        ),
        reinforcement: fc.record({ kind: fc.constant('bars' as const), tension: group, compression: group }),
      }),
    });
  });

describe('arranged bars', () => {
  it(PROPERTIES['bars-remeasured'].statement, () => {
    let placed = 0;
    fc.assert(
      fc.property(randomBars, ({ basis, maxLayers, section }) => {
        const { arrangement } = evaluateSection(section, {
          basis,
          demand: NO_DEMAND,
          rules: { ...NO_RULES, maxLayers },
        });
        if (!arrangement!.fits) return;
        placed++;
        expect(remeasure(section, basis, arrangement!)).toEqual([]);
        const total = [...section.reinforcement.tension, ...section.reinforcement.compression].reduce(
          (n, g) => n + g.count,
          0,
        );
        expect(arrangement!.bars).toHaveLength(total);
        for (const face of arrangement!.faces) expect(face.layerCounts.length).toBeLessThanOrEqual(maxLayers);
      }),
      { numRuns: PROPERTIES['bars-remeasured'].runs, seed: PROPERTIES['bars-remeasured'].seed },
    );
    expect(placed).toBeGreaterThanOrEqual(PROPERTIES['bars-remeasured'].atLeast.count);
  });

  it(PROPERTIES['width-needed'].statement, () => {
    fc.assert(
      fc.property(randomBars, ({ basis, maxLayers, section }) => {
        const rules = { ...NO_RULES, maxLayers };
        const only = {
          ...section,
          depthMm: 3000,
          reinforcement: { ...section.reinforcement, compression: [] },
        };
        const fitsAt = (widthMm: number) =>
          evaluateSection({ ...only, widthMm }, { basis, demand: NO_DEMAND, rules }).arrangement!.fits;
        const tension = evaluateSection({ ...only, widthMm: 100 }, { basis, demand: NO_DEMAND, rules })
          .arrangement!.faces[0]!;
        if (tension.fits || tension.widthNeededMm === 0) return;
        expect(fitsAt(tension.widthNeededMm)).toBe(true);
        expect(fitsAt(tension.widthNeededMm - 0.1)).toBe(false);
      }),
      { numRuns: PROPERTIES['width-needed'].runs, seed: PROPERTIES['width-needed'].seed },
    );
  });
});
