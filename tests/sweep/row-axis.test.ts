import fc from 'fast-check';
import { expect, it } from 'vitest';
import { neutralAxisDepth } from '#shared/engine/neutral-axis.ts';
import { DISPLACED_CONCRETE } from '#shared/engine/section.ts';
import { RowAxis } from '#shared/sweep/row-axis.ts';

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true, noDefaultInfinity: true });

const face = (most: number) =>
  fc
    .array(
      fc.record({ gapMm: between(30, 80), areaMm2: fc.oneof(between(50, 4000), between(4000, 30_000)) }),
      {
        minLength: 1,
        maxLength: most,
      },
    )
    .map((layers) => ({
      layerCount: layers.length,
      offsets: Float64Array.from(layers, (_, i) =>
        layers.slice(0, i + 1).reduce((sum, { gapMm }) => sum + gapMm, 0),
      ),
      areas: Float64Array.from(layers, ({ areaMm2 }) => areaMm2),
      shareOfDepth: 0,
    }));

const constants = fc
  .record({
    widthMm: between(150, 900),
    overhangMm: fc.oneof(fc.constant(0), between(100, 2000)),
    thicknessMm: between(50, 200),
    blockStressMPa: between(10, 60),
    blockDepthFactor: between(0.65, 0.85),
    fyMPa: between(250, 600),
    epsilonCu: between(0.0026, 0.0035),
    displacedConcrete: fc.constantFrom(...DISPLACED_CONCRETE),
  })
  .map(({ widthMm, overhangMm, thicknessMm, ...k }) => {
    const blockForcePerMm = k.blockStressMPa * widthMm * k.blockDepthFactor;
    return {
      ...k,
      esMPa: 200_000,
      blockForcePerMm,
      flangeForcePerMm: blockForcePerMm + k.blockStressMPa * overhangMm * k.blockDepthFactor,
      overhangForceN: k.blockStressMPa * overhangMm * thicknessMm,
      flangeReachMm: thicknessMm / k.blockDepthFactor,
    };
  });

it('the axis a row shares is, to the bit, that of every section it is said to hold for', () => {
  let shared = 0;
  let tried = 0;
  const row = new RowAxis(16);
  fc.assert(
    fc.property(face(3), face(3), constants, (compressed, pulled, k) => {
      row.find(compressed, pulled, 1500, k);
      const innermostMm = pulled.offsets[pulled.layerCount - 1]!;
      const n = compressed.layerCount + pulled.layerCount;
      const areas = Float64Array.from([...compressed.areas, ...pulled.areas.toReversed()]);
      const leastMm = Math.max(row.fromMm + innermostMm, compressed.offsets.at(-1)! + innermostMm + 1);
      const close = [1, 1 + 1e-15, 1 + 1e-12, 1 + 1e-9, 1.001].map((by) => leastMm * by);
      for (const h of [...close, ...Array.from({ length: 20 }, (_, i) => 200 + 65 * i)]) {
        if (!(h < Infinity) || h <= compressed.offsets.at(-1)! + innermostMm) continue;
        tried++;
        if (!(h - innermostMm >= row.fromMm) || h > 1500) continue;
        shared++;
        const pulledDepths = [...pulled.offsets.toReversed()].map((offset) => h - offset);
        const depths = Float64Array.from([...compressed.offsets, ...pulledDepths]);
        expect(neutralAxisDepth(depths, areas, n, k)).toBe(row.axisMm);
      }
    }),
    { numRuns: 4_000, seed: 20261201 },
  );
  expect(shared).toBeGreaterThan(tried / 3);
});
