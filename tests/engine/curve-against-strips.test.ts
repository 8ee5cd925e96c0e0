import { describe, expect, it } from 'vitest';
import { fibreBlockState } from '#shared/engine/fibre.ts';
import { flexureAtUltimate } from '#shared/engine/flexure.ts';
import { momentCurvature } from '#shared/engine/moment-curvature.ts';
import { ruleSetOf } from '#shared/engine/rules/rule-set-of.ts';
import { agreeingStrips } from '#shared/engine/second-opinion.ts';
import { PROPERTIES } from '#shared/verification/properties.ts';
import { randomCurves } from './random-curve.ts';

const STRENGTH = 0.005;
const CURVATURE = 0.02;
const USUAL_STRIPS = 100;

const off = (a: number, b: number) => Math.abs(a / b - 1);

describe('the curve against the summation of strips', () => {
  const property = PROPERTIES['curve-strips'];
  it(property.statement, () => {
    const counts = { compared: 0, close: 0, withFinerStrips: 0, explained: 0 };
    const worst: Record<string, number> = {};
    const causes: Record<string, number> = {};
    const reasons: Record<string, number> = {};
    const unexplained: unknown[] = [];
    for (const input of randomCurves(property)) {
      const curve = momentCurvature(input);
      const { strips, lines, reason } = agreeingStrips(curve);
      counts.compared++;
      causes[curve.cause] = (causes[curve.cause] ?? 0) + 1;
      const apart = lines.filter((line) => !line.agrees);
      if (apart.length === 0 && strips === USUAL_STRIPS) {
        counts.close++;
        for (const { id, difference } of lines)
          worst[id] = Math.max(worst[id] ?? 0, Math.abs(difference ?? 0));
      } else if (apart.length === 0) counts.withFinerStrips++;
      else if (reason !== null) {
        counts.explained++;
        reasons[reason] = (reasons[reason] ?? 0) + 1;
      } else unexplained.push([input.choices.concreteLaw, curve.cause, apart]);
    }
    console.log(`  ${JSON.stringify({ ...counts, ...worst, causes, reasons })}`);
    expect(unexplained).toEqual([]);
    expect(counts.compared).toBeGreaterThanOrEqual(property.atLeast.count);
    expect(counts.withFinerStrips + counts.explained).toBeLessThan(0.003 * counts.compared);
    expect(worst['peak']).toBeLessThanOrEqual(STRENGTH);
    expect(Math.max(worst['first-yield']!, worst['ultimate']!)).toBeLessThanOrEqual(CURVATURE);
    for (const cause of ['concrete-crushing', 'core-crushing', 'bar-rupture', 'moment-drop'])
      expect(causes[cause]).toBeGreaterThan(20);
  });

  const block = PROPERTIES['block-strips'];
  it(block.statement, () => {
    let compared = 0;
    const worst = { strength: 0, curvature: 0 };
    for (const { section, layout, basis } of randomCurves(block)) {
      const rules = ruleSetOf(basis);
      const closed = flexureAtUltimate(section, layout, basis, rules);
      const strips = fibreBlockState({ section, layout, rules, ...basis });
      const curvature = closed.epsilonCu / closed.neutralAxisMm;
      worst.strength = Math.max(worst.strength, off(strips.momentNmm, closed.nominalMomentNmm));
      worst.curvature = Math.max(worst.curvature, off(strips.curvaturePerMm, curvature));
      compared++;
    }
    console.log(`  block: ${JSON.stringify({ compared, ...worst })}`);
    expect(compared).toBeGreaterThanOrEqual(block.atLeast.count);
    expect(worst.strength).toBeLessThan(STRENGTH);
    expect(worst.curvature).toBeLessThan(CURVATURE);
  });
});
