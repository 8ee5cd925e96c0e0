import { describe, expect, it } from 'vitest';
import type { CurveInput, CurveModel } from '#shared/engine/curve-model.ts';
import { momentCurvature } from '#shared/engine/moment-curvature.ts';
import type { Flange, Layer, SectionInput } from '#shared/engine/section.ts';
import { placeSteel } from '#shared/engine/steel-layout.ts';
import { PROPERTIES } from '#shared/verification/properties.ts';
import { randomCurves } from './random-curve.ts';

/** Net force and moment about the compression face of a state, by the definition, integrals as differences. */
function resultants(model: CurveModel, curvature: number, topStrain: number) {
  const strainAt = (y: number) => topStrain - curvature * y;
  /** Force and moment about the face of a strip of width b between two depths, by the law's running integrals. */
  const strip = (law: CurveModel['cover'], b: number, [from, to]: readonly [number, number]) => {
    const [e1, e2] = [strainAt(from), strainAt(to)];
    const force = (b / curvature) * (law.forceIntegral(e1) - law.forceIntegral(e2));
    const aboutAxis = (b / curvature ** 2) * (law.momentIntegral(e1) - law.momentIntegral(e2));
    return { force, moment: aboutAxis - force * (topStrain / curvature) };
  };
  const { core, cover, coreTopMm: y1, coreBottomMm: y2 } = model;
  const strips = [strip(cover, model.widthMm, [0, model.depthMm])];
  strips.push(strip(cover, model.overhangMm, [model.overhangTopMm, model.overhangBottomMm]));
  if (core) strips.push(strip(core, model.coreWidthMm, [y1, y2]), strip(cover, -model.coreWidthMm, [y1, y2]));
  const concrete = strips.reduce((sum, { force }) => sum + force, 0);
  let force = concrete;
  let moment = strips.reduce((sum, part) => sum + part.moment, 0);
  model.depths.forEach((depth, i) => {
    const strain = strainAt(depth);
    const isInCore = core && depth >= y1 && depth <= y2;
    const displaced =
      strain > 0 && model.isDisplacedDeducted ? (isInCore ? core : cover).nearStress(strain) : 0;
    const steel = model.areas[i]! * (model.steel.stress(strain) - displaced);
    force += steel;
    moment -= steel * depth;
  });
  return { concrete, force, moment };
}

const withSection = (input: CurveInput, section: SectionInput): CurveInput => {
  const { layout, arrangement } = placeSteel(section, input.basis, 2);
  return { ...input, section, layout: layout!, arrangement };
};

const twice = ({ width, ...flange }: Flange): Flange => {
  if (width.kind !== 'given') throw new Error('widths as given only');
  return { ...flange, thicknessMm: 2 * flange.thicknessMm, width: { ...width, widthMm: 2 * width.widthMm } };
};

const withLayers = (section: SectionInput, change: (layer: Layer) => Layer): SectionInput => {
  if (section.reinforcement.kind !== 'layers') throw new Error('layers only');
  return { ...section, reinforcement: { kind: 'layers', layers: section.reinforcement.layers.map(change) } };
};

describe('moment–curvature curves', () => {
  const equilibrium = PROPERTIES['curve-equilibrium'];
  it(equilibrium.statement, () => {
    let points = 0;
    let worst = 0;
    let worstMoment = 0;
    for (const input of randomCurves(equilibrium)) {
      const curve = momentCurvature(input);
      for (const point of curve.points) {
        const found = resultants(curve.model, point.curvaturePerMm, point.topStrain);
        const residual = Math.abs(found.force) / found.concrete;
        worst = Math.max(worst, residual);
        points++;
        worstMoment = Math.max(worstMoment, Math.abs(found.moment / point.momentNmm - 1));
      }
      expect(curve.equilibriumResidual).toBeLessThan(1e-9);
    }
    console.log(`  ${points} points, worst residual ${worst.toExponential(1)}`);
    expect(worst).toBeLessThan(1e-9);
    expect(worstMoment).toBeLessThan(1e-8);
  });

  it('goes up in curvature and in top strain, marks in their order, the peak the highest of all points', () => {
    let bilinears = 0;
    for (const input of randomCurves({ runs: 1500, seed: 58 })) {
      const { points, firstYield, peak, ultimate, bilinear, ductility } = momentCurvature(input);
      const goesUp = points.every((point, i) => {
        const before = points[i - 1];
        if (!before) return true;
        const isFurther = point.curvaturePerMm > before.curvaturePerMm;
        return isFurther && point.topStrain > before.topStrain * (1 - 1e-9);
      });
      expect(goesUp).toBe(true);
      expect(points[points.length - 1]).toBe(ultimate);
      expect(Math.max(...points.map((point) => point.momentNmm))).toBe(peak.momentNmm);
      expect(points.includes(peak)).toBe(true);
      if (!firstYield) {
        expect([bilinear, ductility.byFirstYield.value, ductility.byBilinearYield.value]).toEqual([
          null,
          null,
          null,
        ]);
        continue;
      }
      expect(points.includes(firstYield)).toBe(true);
      expect(ductility.byFirstYield.value).toBeGreaterThanOrEqual(1);
      if (!bilinear) continue;
      bilinears++;
      expect(bilinear.momentNmm).toBeGreaterThan(0.8 * peak.momentNmm);
      expect(ductility.byBilinearYield.value).toBeGreaterThanOrEqual(1);
    }
    expect(bilinears).toBeGreaterThan(1000);
  });

  const scaled = PROPERTIES['curve-scaled'];
  it(scaled.statement, () => {
    for (const input of randomCurves(scaled, {
      concreteLaw: 'parabola-rectangle',
      steelLaw: 'strain-hardening',
    })) {
      const { section } = input;
      const doubled = withLayers(
        {
          ...section,
          widthMm: 2 * section.widthMm,
          depthMm: 2 * section.depthMm,
          flange: section.flange && twice(section.flange),
        },
        (layer) => ({ ...layer, depthMm: 2 * layer.depthMm, areaMm2: 4 * layer.areaMm2 }),
      );
      const one = momentCurvature(input);
      const two = momentCurvature(withSection(input, doubled));
      expect(two.peak.momentNmm / one.peak.momentNmm).toBeCloseTo(8, 6);
      expect(two.ultimate.curvaturePerMm / one.ultimate.curvaturePerMm).toBeCloseTo(0.5, 8);
      expect(two.cause).toBe(one.cause);
      if (one.bilinear)
        expect(two.ductility.byBilinearYield.value! / one.ductility.byBilinearYield.value!).toBeCloseTo(1, 6);
    }
  });

  const steel = PROPERTIES['curve-tension-steel'];
  it(steel.statement, () => {
    let compared = 0;
    for (const input of randomCurves(steel, { concreteLaw: 'hognestad', steelLaw: 'elastic-plastic' })) {
      const more = withLayers(input.section, (layer) =>
        layer.face === 'tension' ? { ...layer, areaMm2: 1.1 * layer.areaMm2 } : layer,
      );
      const before = momentCurvature(input);
      const after = momentCurvature(withSection(input, more));
      expect(after.peak.momentNmm).toBeGreaterThan(before.peak.momentNmm);
      if (before.cause !== 'concrete-crushing' || after.cause !== 'concrete-crushing' || !after.firstYield)
        continue;
      compared++;
      expect(after.ductility.byFirstYield.value!).toBeLessThan(before.ductility.byFirstYield.value!);
    }
    expect(compared).toBeGreaterThanOrEqual(steel.atLeast.count);
  });

  const concrete = PROPERTIES['curve-concrete'];
  it(concrete.statement, () => {
    const choices = {
      concreteLaw: 'parabola-rectangle',
      steelLaw: 'elastic-plastic',
      crushingStrain: 0.0035,
      ruptureStrain: 10,
    } as const;
    for (const input of randomCurves(concrete, choices)) {
      // to C50 the law's strains are the same whatever the strength
      const low = { ...input.section, fcMPa: Math.min(input.section.fcMPa, 45) };
      const before = momentCurvature(withSection(input, low));
      const after = momentCurvature(withSection(input, { ...low, fcMPa: 1.1 * low.fcMPa }));
      expect(after.peak.momentNmm).toBeGreaterThan(before.peak.momentNmm);
      if (before.firstYield)
        expect(after.ductility.byFirstYield.value!).toBeGreaterThan(before.ductility.byFirstYield.value!);
    }
  });
});
