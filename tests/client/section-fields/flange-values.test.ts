import { describe, expect, it } from 'vitest';
import { readSectionForm } from '#client/src/features/evaluate-section/read-section-form.ts';
import { firstSectionForm, sectionForm } from '#client/src/features/evaluate-section/section-form-values.ts';
import { readSweepForm } from '#client/src/features/sweep-form/read-sweep-form.ts';
import { sweepForm } from '#client/src/features/sweep-form/sweep-form-defaults.ts';
import {
  effectiveWidthsMm,
  flangeValues,
  NO_FLANGE,
  typedFlange,
  type FlangeValues,
} from '#client/src/section-fields/flange-values.ts';
import { RULE_SETS } from '#shared/engine/rules/rule-sets.ts';
import type { Flange } from '#shared/engine/section.ts';
import { BASIS, DEFINITION } from '../run/problem.ts';

const SLAB: FlangeValues = { ...NO_FLANGE, shape: 't', thicknessMm: 150, clearToNextWebMm: 2400 };
const SPAN = { spanMm: 8000, support: 'both-ends-continuous' } as const;
const BASIS_SI = { ...BASIS, units: 'si', fyMPa: 420, fytMPa: 420, coverMm: 40 } as const;
const TYPED = {
  ...firstSectionForm(BASIS_SI),
  ...SPAN,
  widthMm: 300,
  depthMm: 600,
  fcMPa: 30,
  tensionText: '3-25',
  flange: SLAB,
};

describe('a slab as it is typed', () => {
  it('takes the span of the demand unless it has its own', () => {
    expect(typedFlange(SLAB, SPAN)).toMatchObject({ width: { spanMm: 8000, support: SPAN.support } });
    expect(typedFlange({ ...SLAB, spanMm: 7000 }, SPAN)).toMatchObject({ width: { spanMm: 7000 } });
    expect(typedFlange(NO_FLANGE, SPAN)).toBeNull();
  });

  it('is the same after a way through a form, given or effective', () => {
    const width: Flange['width'][] = [
      { kind: 'given', widthMm: 1200 },
      { kind: 'effective', clearToNextWebMm: 2400, ...SPAN },
      { kind: 'effective', clearToNextWebMm: 2400, spanMm: 5000, support: SPAN.support },
    ];
    for (const one of width) {
      const flange: Flange = { shape: 'l', thicknessMm: 120, face: 'tension', width: one };
      expect(typedFlange(flangeValues(flange, SPAN), SPAN)).toEqual(flange);
    }
  });

  it('counts the width of the code on every web, and none while something is missing', () => {
    // ACI 318-19 Table 6.3.2.1 (memory): b + 2 min(8 × 150, 2400/2, 8000/8) = b + 2000.
    expect(effectiveWidthsMm(SLAB, SPAN, [300, 500], RULE_SETS['aci318m-19'])).toEqual([2300, 2500]);
    expect(
      effectiveWidthsMm({ ...SLAB, thicknessMm: null }, SPAN, [300], RULE_SETS['aci318m-19']),
    ).toBeNull();
    expect(effectiveWidthsMm(SLAB, { spanMm: null }, [300], RULE_SETS['aci318m-19'])).toBeNull();
    expect(effectiveWidthsMm({ ...SLAB, thicknessMm: Number.NaN }, SPAN, [300], RULE_SETS.en1992)).toBeNull();
  });

  it.each([
    ['no thickness', { thicknessMm: null }, 'section.flange.thicknessMm'],
    ['a slab as thick as the beam', { thicknessMm: 600 }, 'section.flange.thicknessMm'],
    ['no distance to the next web', { clearToNextWebMm: null }, 'section.flange.width.clearToNextWebMm'],
    ['a width below the web’s', { widthKind: 'given', widthMm: 250 }, 'section.flange.width.widthMm'],
  ] as const)('reports %s at its field', (_, part, path) => {
    const reading = readSectionForm({ ...TYPED, flange: { ...SLAB, ...part } });
    expect(reading.kind === 'incomplete' && [...reading.errors.keys()]).toEqual([path]);
  });
});

describe('sections and sweeps with a slab and designed stirrups', () => {
  it('keep both over a way through the section form', () => {
    const reading = readSectionForm({ ...TYPED, stirrupBar: '10', spacingMm: 300, isSpacingDesigned: true });
    if (reading.kind === 'incomplete') throw new Error('incomplete');
    const { section, demand } = reading.input;
    expect(section.stirrup).toEqual({ bar: '10', legs: 2, spacingMm: 300, isDesigned: true });
    const again = readSectionForm(sectionForm({ section, demand, maxLayers: 2 }, BASIS_SI));
    expect(again).toEqual(reading);
  });

  it('keep both over a way through the sweep form, and name a slab’s fault at its field', () => {
    const flange: Flange = {
      shape: 't',
      thicknessMm: 150,
      face: 'compression',
      width: { kind: 'given', widthMm: 1500 },
    };
    const stirrups = [{ bar: '10', legs: 2, spacingMm: 300, isDesigned: true }, null];
    const definition = { ...DEFINITION, space: { ...DEFINITION.space, flange, stirrups } };
    const form = sweepForm({ name: 'Slab', definition }, 'si');
    const reading = readSweepForm(form, 'si');
    if (reading.kind === 'incomplete') throw new Error([...reading.errors].join('; '));
    expect(reading.input.definition.space.flange).toEqual(flange);
    expect(reading.input.definition.space.stirrups).toEqual(stirrups);

    const narrow = readSweepForm({ ...form, flange: { ...form.flange, widthMm: 350 } }, 'si');
    expect(narrow.kind === 'incomplete' && [...narrow.errors.keys()]).toEqual(['space.flange.width.widthMm']);
  });
});
