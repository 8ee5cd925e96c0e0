import { describe, expect, it } from 'vitest';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import type { CheckId } from '#shared/engine/evaluation.ts';
import { InvalidSectionError } from '#shared/engine/preconditions.ts';
import { RULE_SETS } from '#shared/engine/rules/rule-sets.ts';
import type { BarGroup, DesignBasis, Demand, SectionInput, SeismicSystem } from '#shared/engine/section.ts';
import { seismicSystemsOf } from '#shared/engine/seismic.ts';
import { METRIC_BASIS, NO_DEMAND, NO_RULES } from '#shared/verification/layered-section.ts';

/** Beam 300 × 500, 3-25 in tension, 2-25 opposite, hoops 10 at 100, f′c 30, fy 420, cover 40: d 437.5; by hand. */
interface Change {
  readonly system?: SeismicSystem;
  readonly section?: Partial<SectionInput>;
  readonly tension?: BarGroup;
  readonly compression?: BarGroup;
  readonly spacingMm?: number;
  readonly demand?: Partial<Demand>;
  readonly basis?: Partial<DesignBasis>;
}

function evaluate(change: Change = {}) {
  const section: SectionInput = {
    widthMm: 300,
    depthMm: 500,
    fcMPa: 30,
    fyMPa: 420,
    coverMm: 40,
    stirrup: { bar: '10', legs: 2, spacingMm: change.spacingMm ?? 100 },
    reinforcement: {
      kind: 'bars',
      tension: change.tension ?? [{ bar: '25', count: 3 }],
      compression: change.compression ?? [{ bar: '25', count: 2 }],
    },
    ...change.section,
  };
  const basis = { ...METRIC_BASIS, seismicSystem: change.system ?? 'special', ...change.basis };
  return evaluateSection(section, {
    basis,
    demand: { ...NO_DEMAND, ...change.demand },
    rules: NO_RULES,
  });
}

const checkOf = (id: CheckId, change?: Change) => evaluate(change).checks.find((check) => check.id === id);
const listed = (change: Change) =>
  evaluate(change)
    .checks.map(({ id }) => id)
    .filter((id) => id.startsWith('seismic') || id === 'hoop-spacing');

describe('a moment frame', () => {
  it('asks nothing where there is none, and by its class what its clauses ask', () => {
    expect(listed({ system: 'none' })).toEqual([]);
    expect(listed({ system: 'ordinary' })).toEqual(['seismic-bars']);
    expect(listed({ system: 'intermediate' })).toEqual(['seismic-bars', 'seismic-reversal', 'hoop-spacing']);
    expect(listed({ demand: { spanMm: 6000 } })).toEqual([
      'seismic-width',
      'seismic-span',
      'seismic-steel',
      'seismic-bars',
      'seismic-reversal',
      'hoop-spacing',
    ]);
    expect(evaluate({ demand: { spanMm: 6000 } }).checks.every((check) => check.passes)).toBe(true);
  });

  it('of another code is refused by name', () => {
    expect(() => evaluate({ system: 'dcm' })).toThrow(InvalidSectionError);
    expect(() => evaluate({ system: 'special', basis: { ruleSet: 'en1992' } })).toThrow('dcm, dch');
    expect(seismicSystemsOf(RULE_SETS['aci318-14'])).toEqual(['none', 'ordinary', 'intermediate', 'special']);
  });

  it('special: is at least min(0.3 h, 250) wide, and spans 4 d', () => {
    const narrow = { section: { widthMm: 220, depthMm: 800 } };
    expect(checkOf('seismic-width', narrow)).toMatchObject({ passes: false, demand: 240 });
    expect(checkOf('seismic-width', { section: { widthMm: 250, depthMm: 1200 } })).toMatchObject({
      passes: true,
      demand: 250,
    });
    expect(checkOf('seismic-span', { demand: { spanMm: 1750 } })).toMatchObject({
      passes: true,
      demand: 1750,
    });
    expect(checkOf('seismic-span', { demand: { spanMm: 1749 } })!.passes).toBe(false);
  });

  it('special: keeps the steel of both faces between As,min, never waived, and 0.025 b d, or 0.020 of Grade 550', () => {
    // As,min = 1.4/420 · 300 · 437.5 = 437.5; 2-16 is 402.1, though Mu asks for next to nothing
    const light = { compression: [{ bar: '16', count: 2 }], demand: { muNmm: 1e6 } };
    expect(checkOf('seismic-steel', light)).toMatchObject({
      passes: false,
      reason: 'least steel of the compression face',
    });
    // d = 500 − 50 − 12 (5-25 in one layer of a 400 web): 0.025 · 400 · 437.5 = 4375 of 5-32 = 4021
    const heavy = { section: { widthMm: 400 }, tension: [{ bar: '32', count: 5 }] };
    expect(checkOf('seismic-steel', heavy)).toMatchObject({ passes: true });
    const grade550 = { ...heavy, section: { ...heavy.section, fyMPa: 550 } };
    expect(checkOf('seismic-steel', grade550)).toMatchObject({
      passes: false,
      reason: 'most steel of the tension face',
    });
    expect(checkOf('seismic-steel', grade550)!.capacity).toBeCloseTo(0.02 * 400 * 434, 6);
    // the 2014 edition knows no Grade 550
    expect(checkOf('seismic-steel', { ...grade550, basis: { ruleSet: 'aci318m-14' } })).toMatchObject({
      passes: false,
      kind: 'stress',
    });
  });

  it('has two bars at each face', () => {
    expect(checkOf('seismic-bars', { system: 'ordinary', compression: [] })).toMatchObject({
      passes: false,
      demand: 2,
      capacity: 0,
    });
    expect(checkOf('seismic-bars', { system: 'ordinary' })!.passes).toBe(true);
  });

  it('carries a share of its strength bent the other way: that of the section upside down', () => {
    const upright = evaluate();
    const turned = evaluate({
      tension: [{ bar: '25', count: 2 }],
      compression: [{ bar: '25', count: 3 }],
    });
    const check = checkOf('seismic-reversal')!;
    expect(check.capacity).toBeCloseTo(turned.flexure!.nominalMomentNmm, 3);
    expect(check.demand).toBeCloseTo(upright.flexure!.nominalMomentNmm / 2, 3);
    // 2-12 is 226 of 1473 mm²
    const light = [{ bar: '12', count: 2 }];
    expect(checkOf('seismic-reversal', { compression: light })!.passes).toBe(false);
    expect(checkOf('seismic-reversal', { compression: [] })).toMatchObject({ passes: false, capacity: 0 });
    // 2-16, 402 mm²: above a third of 982 mm² (2-25), below a half
    const two = { tension: [{ bar: '25', count: 2 }], compression: [{ bar: '16', count: 2 }] };
    expect(checkOf('seismic-reversal', two)!.passes).toBe(false);
    expect(checkOf('seismic-reversal', { ...two, system: 'intermediate' })!.passes).toBe(true);
  });

  it('takes its slab with it when it is bent the other way', () => {
    const slab = (face: 'tension' | 'compression') => ({
      section: {
        flange: {
          shape: 't' as const,
          thicknessMm: 120,
          face,
          width: { kind: 'given' as const, widthMm: 1200 },
        },
      },
      tension: [{ bar: '25', count: 3 }],
      compression: [{ bar: '25', count: 3 }],
    });
    const sagging = evaluate(slab('compression')).flexure!.nominalMomentNmm;
    const hogging = evaluate(slab('tension')).flexure!.nominalMomentNmm;
    expect(checkOf('seismic-reversal', slab('compression'))!.capacity).toBeCloseTo(hogging, 3);
    expect(checkOf('seismic-reversal', slab('tension'))!.capacity).toBeCloseTo(sagging, 3);
    expect(sagging).toBeGreaterThan(hogging);
  });

  it('spaces its hoops by d, by the smallest bar and the hoop, and they are thick enough', () => {
    // special: min(437.5/4, 6 · 25, 150)
    expect(checkOf('hoop-spacing')).toMatchObject({ passes: true, capacity: 437.5 / 4 });
    expect(checkOf('hoop-spacing', { compression: [{ bar: '16', count: 3 }] })!.capacity).toBe(96);
    expect(
      checkOf('hoop-spacing', { compression: [{ bar: '16', count: 3 }], section: { fyMPa: 500 } })!.capacity,
    ).toBe(80);
    // intermediate: 8 · 12 = 96
    expect(
      checkOf('hoop-spacing', { system: 'intermediate', compression: [{ bar: '12', count: 2 }] }),
    ).toMatchObject({
      passes: false,
      demand: 100,
      capacity: 96,
    });
    expect(
      checkOf('hoop-spacing', { section: { stirrup: { bar: '8', legs: 2, spacingMm: 80 } } }),
    ).toMatchObject({ passes: false, demand: 9.5, capacity: 8 });
    expect(checkOf('hoop-spacing', { section: { stirrup: null } })).toMatchObject({
      passes: false,
      capacity: null,
    });
  });

  it('governs a designed spacing, and writes its limits out', () => {
    const { stirrups, working } = evaluate({
      section: { stirrup: { bar: '10', legs: 2, spacingMm: 300, isDesigned: true } },
    });
    expect(stirrups).toMatchObject({ spacingMm: 100, governs: 'hoops-depth' });
    const valueOf = (id: string) => working.find((line) => line.id === id)!.value;
    expect(valueOf('hoop-limit')).toBe(437.5 / 4);
    expect(valueOf('seismic-width')).toBe(150);
    expect(valueOf('seismic-least-tension')).toBeCloseTo(437.5, 9);
    expect(valueOf('reversed-strength')).toBe(checkOf('seismic-reversal')!.capacity);
  });

  it('is no longer listed among what is not checked, but for what it leaves out', () => {
    const of = (change: Change) => evaluate(change).notChecked.join('; ');
    expect(of({ system: 'none' })).toContain('seismic detailing;');
    expect(of({})).toContain('of the seismic detailing: shear from the strengths at the joints');
    expect(of({})).toContain('clear span');
    expect(of({ demand: { spanMm: 6000 } })).not.toContain('clear span');
    expect(of({ basis: { skinBar: '12' } })).not.toContain('skin');
    expect(of({ demand: { vuN: 1e5 } })).toContain('shear and stirrup spacing elsewhere');
  });
});
