import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import { DISPLACED_CONCRETE, RULE_SET_IDS, type Layer, type SectionInput } from '#shared/engine/section.ts';
import { RULE_SETS } from '#shared/engine/rules/rule-sets.ts';
import { METRIC_BASIS, NO_DEMAND, NO_RULES } from '#shared/verification/layered-section.ts';
import { PROPERTIES } from '#shared/verification/properties.ts';

/** Random sections of one to six layers at any depth, light to over-reinforced. */
const randomSection = fc
  .record({
    widthMm: fc.double({ min: 150, max: 1000, noNaN: true }),
    depthMm: fc.double({ min: 200, max: 1500, noNaN: true }),
    fcMPa: fc.double({ min: 17.2, max: 82.7, noNaN: true }),
    fyMPa: fc.double({ min: 250, max: 690, noNaN: true }),
    layers: fc.array(
      fc.tuple(
        fc.double({ min: 0.04, max: 0.96, noNaN: true }),
        fc.double({ min: 0.0005, max: 0.02, noNaN: true }),
      ),
      {
        minLength: 1,
        maxLength: 6,
      },
    ),
  })
  .map(({ layers, ...rest }): SectionInput => {
    const deepest = Math.max(...layers.map(([depth]) => depth));
    const steel = layers.map(([depth, ratio]): Layer => ({
      depthMm: depth * rest.depthMm,
      areaMm2: ratio * rest.widthMm * rest.depthMm,
      face: depth === deepest ? 'tension' : 'compression',
    }));
    return { ...rest, coverMm: 40, stirrup: null, reinforcement: { kind: 'layers', layers: steel } };
  });

/** Stress of the block, yield stress and crushing strain, written anew: ACI 318 22.2; EN 1992-1-1 3.1.7 and Table 3.1. */
function limitsOf(fcMPa: number, fyMPa: number, ruleSetId: keyof typeof RULE_SETS) {
  if (ruleSetId !== 'en1992') return { sigma: 0.85 * fcMPa, fy: fyMPa, crushing: 0.003 };
  const eta = fcMPa <= 50 ? 1 : 1 - (fcMPa - 50) / 200;
  const crushing = fcMPa <= 50 ? 0.0035 : (2.6 + 35 * ((90 - fcMPa) / 100) ** 4) / 1000;
  return { sigma: (eta * fcMPa) / 1.5, fy: fyMPa / 1.15, crushing };
}

/** Unbalanced force at a trial axis, written anew from the definition: compression minus tension, N. */
function unbalanced(
  section: SectionInput,
  c: number,
  displaced: string,
  ruleSetId: keyof typeof RULE_SETS,
): number {
  if (section.reinforcement.kind !== 'layers') throw new Error('layers only');
  const rules = RULE_SETS[ruleSetId];
  const { sigma, fy, crushing } = limitsOf(section.fcMPa, section.fyMPa, ruleSetId);
  const a = rules.blockDepthFactor(section.fcMPa) * c;
  return section.reinforcement.layers.reduce(
    (force, { depthMm, areaMm2 }) => {
      const stress = Math.max(-fy, Math.min(fy, 200000 * crushing * (1 - depthMm / c)));
      const isDeducted =
        displaced === 'deduct' ? depthMm < a : displaced === 'deduct-above-axis' ? depthMm < c : false;
      return force + areaMm2 * (stress - (isDeducted ? sigma : 0));
    },
    sigma * a * section.widthMm,
  );
}

describe('the neutral axis at ultimate', () => {
  it(PROPERTIES.equilibrium.statement, () => {
    fc.assert(
      fc.property(
        randomSection,
        fc.constantFrom(...DISPLACED_CONCRETE),
        fc.constantFrom(...RULE_SET_IDS),
        (section, displacedConcrete, ruleSet) => {
          const { flexure } = evaluateSection(section, {
            basis: { ...METRIC_BASIS, displacedConcrete, ruleSet },
            demand: NO_DEMAND,
            rules: NO_RULES,
          });
          if (!flexure) return;
          const c = flexure.neutralAxisMm;
          expect(Math.abs(flexure.equilibriumResidual)).toBeLessThan(1e-9);
          expect(
            Math.abs(unbalanced(section, c * (1 + 1e-13), displacedConcrete, ruleSet)) /
              flexure.concreteForceN,
          ).toBeLessThan(1e-6);
          let least = Infinity;
          for (let step = 1; step <= 100; step++) {
            const deeper = c * (1 + 1e-7) + (step / 100) * (2 * section.depthMm);
            least = Math.min(least, unbalanced(section, deeper, displacedConcrete, ruleSet));
          }
          expect(least).toBeGreaterThan(0);
        },
      ),
      { numRuns: PROPERTIES.equilibrium.runs, seed: PROPERTIES.equilibrium.seed },
    );
  });

  it(PROPERTIES.bisection.statement, () => {
    fc.assert(
      fc.property(randomSection, (section) => {
        const { flexure } = evaluateSection(section, {
          basis: { ...METRIC_BASIS, displacedConcrete: 'ignore' },
          demand: NO_DEMAND,
          rules: NO_RULES,
        });
        if (!flexure) return;
        let low = 1e-6;
        let high = 4 * section.depthMm;
        for (let i = 0; i < 200; i++) {
          const mid = (low + high) / 2;
          if (unbalanced(section, mid, 'ignore', 'aci318m-19') > 0) high = mid;
          else low = mid;
        }
        expect(flexure.neutralAxisMm / high).toBeCloseTo(1, 10);
      }),
      { numRuns: PROPERTIES.bisection.runs, seed: PROPERTIES.bisection.seed },
    );
  });
});
