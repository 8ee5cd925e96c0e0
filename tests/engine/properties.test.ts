import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import { METRIC_BASIS, metricSection, NO_DEMAND, NO_RULES } from '#shared/verification/layered-section.ts';
import { PROPERTIES, type TestedProperty } from '#shared/verification/properties.ts';
import { nonNull } from './non-null.ts';

/** Ordinary beams: tension steel of 0.4 to 2.5 %, compression steel to its half. */
const beam = fc.record({
  b: fc.double({ min: 200, max: 600, noNaN: true }),
  d: fc.double({ min: 300, max: 900, noNaN: true }),
  ratio: fc.double({ min: 0.004, max: 0.025, noNaN: true }),
  topShare: fc.double({ min: 0.05, max: 0.5, noNaN: true }),
  fc: fc.double({ min: 20, max: 80, noNaN: true }),
  fy: fc.double({ min: 300, max: 550, noNaN: true }),
});
type Beam = typeof beam extends fc.Arbitrary<infer T> ? T : never;

interface Printed {
  readonly b: number;
  readonly h: number;
  readonly d: number;
  readonly As: number;
  readonly d2: number;
  readonly As2: number;
  readonly fc: number;
  readonly fy: number;
}
const printedOf = ({ b, d, ratio, topShare, fc: f, fy }: Beam): Printed => {
  const As = ratio * b * d;
  return { b, h: d + 60, d, As, d2: 60, As2: topShare * As, fc: f, fy };
};

function results(printed: Printed, displacedConcrete: 'deduct' | 'ignore' = 'ignore') {
  const { flexure, ductility } = evaluateSection(metricSection(printed), {
    basis: { ...METRIC_BASIS, displacedConcrete },
    demand: NO_DEMAND,
    rules: NO_RULES,
  });
  return {
    c: nonNull(flexure).neutralAxisMm,
    mn: nonNull(flexure).nominalMomentNmm,
    muPhi: nonNull(ductility).curvatureDuctility,
  };
}

const drawn = ({ runs, seed }: TestedProperty) => ({ numRuns: runs, seed });

const holds = (
  property: TestedProperty,
  more: (p: Printed, by: number) => Printed,
  compare: (after: number, before: number) => void,
  of: 'mn' | 'muPhi',
) =>
  it(property.statement, () => {
    fc.assert(
      fc.property(beam, fc.double({ min: 1.01, max: 1.5, noNaN: true }), (random, by) => {
        const printed = printedOf(random);
        compare(results(more(printed, by))[of], results(printed)[of]);
      }),
      drawn(property),
    );
  });

const rises = (after: number, before: number) => expect(after).toBeGreaterThan(before * (1 - 1e-12));
const falls = (after: number, before: number) => expect(after).toBeLessThan(before * (1 + 1e-12));

describe('curvature ductility', () => {
  holds(PROPERTIES['ductility-tension-steel'], (p, by) => ({ ...p, As: p.As * by }), falls, 'muPhi');

  it(PROPERTIES['ductility-compression-steel'].statement, () => {
    fc.assert(
      fc.property(beam, fc.double({ min: 1.01, max: 1.5, noNaN: true }), (random, by) => {
        const printed = printedOf(random);
        const more = results({ ...printed, As2: printed.As2 * by });
        // below the axis it is tension steel, and more of that costs ductility
        fc.pre(more.c > printed.d2);
        rises(more.muPhi, results(printed).muPhi);
      }),
      drawn(PROPERTIES['ductility-compression-steel']),
    );
  });

  it(PROPERTIES['ductility-concrete'].statement, () => {
    fc.assert(
      fc.property(beam, fc.double({ min: 1.01, max: 1.5, noNaN: true }), (random, by) => {
        const printed = printedOf(random);
        const stronger = printed.fc * by;
        fc.pre(stronger < 55 || printed.fc >= 55);
        rises(results({ ...printed, fc: stronger }).muPhi, results(printed).muPhi);
      }),
      drawn(PROPERTIES['ductility-concrete']),
    );
  });
});

describe('nominal strength', () => {
  holds(PROPERTIES['strength-width'], (p, by) => ({ ...p, b: p.b * by }), rises, 'mn');
  holds(
    PROPERTIES['strength-depth'],
    (p, by) => ({ ...p, h: p.h * by, d: p.d + p.h * (by - 1) }),
    rises,
    'mn',
  );
  holds(PROPERTIES['strength-concrete'], (p, by) => ({ ...p, fc: p.fc * by }), rises, 'mn');
  holds(PROPERTIES['strength-tension-steel'], (p, by) => ({ ...p, As: p.As * by }), rises, 'mn');
});

describe('a section', () => {
  it(PROPERTIES['split-layer'].statement, () => {
    fc.assert(
      fc.property(beam, (random) => {
        const printed = printedOf(random);
        const section = metricSection(printed);
        if (section.reinforcement.kind !== 'layers') throw new Error('layers only');
        const halves = section.reinforcement.layers.flatMap((layer) => [
          { ...layer, areaMm2: layer.areaMm2 / 2 },
          { ...layer, areaMm2: layer.areaMm2 / 2 },
        ]);
        const context = { basis: METRIC_BASIS, demand: NO_DEMAND, rules: NO_RULES };
        const split = evaluateSection(
          { ...section, reinforcement: { kind: 'layers', layers: halves } },
          context,
        );
        const whole = evaluateSection(section, context);
        expect(nonNull(split.flexure).nominalMomentNmm / nonNull(whole.flexure).nominalMomentNmm).toBeCloseTo(
          1,
          12,
        );
        expect(
          nonNull(split.ductility).curvatureDuctility / nonNull(whole.ductility).curvatureDuctility,
        ).toBeCloseTo(1, 12);
      }),
      drawn(PROPERTIES['split-layer']),
    );
  });

  it(PROPERTIES['scaled-section'].statement, () => {
    fc.assert(
      fc.property(beam, (random) => {
        const p = printedOf(random);
        const twice = {
          ...p,
          b: 2 * p.b,
          h: 2 * p.h,
          d: 2 * p.d,
          d2: 2 * p.d2,
          As: 4 * p.As,
          As2: 4 * p.As2,
        };
        const [one, two] = [results(p, 'deduct'), results(twice, 'deduct')];
        expect(two.mn / one.mn).toBeCloseTo(8, 9);
        expect(two.muPhi / one.muPhi).toBeCloseTo(1, 9);
      }),
      drawn(PROPERTIES['scaled-section']),
    );
  });
});
