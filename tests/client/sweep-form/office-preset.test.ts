import { describe, expect, it } from 'vitest';
import { MM_PER_IN, MPA_PER_PSI } from '#shared/engine/units.ts';
import type { OfficeStandard } from '#shared/contract/office-standard.ts';
import { DEMO_STANDARDS } from '#server/demo/standards.ts';
import { departuresFrom, presetsFor, withPreset } from '#client/src/features/sweep-form/office-preset.ts';
import { readSweepForm } from '#client/src/features/sweep-form/read-sweep-form.ts';
import { firstSweepForm, sweepForm } from '#client/src/features/sweep-form/sweep-form-defaults.ts';
import { BEAM, PROJECT } from './office-project.ts';

const STANDARDS = DEMO_STANDARDS.map(({ key, standard }): OfficeStandard => ({
  ...standard,
  id: key,
  updatedBy: { id: 'a', name: 'An admin' },
  updatedAt: '2026-01-01T00:00:00.000Z',
}));
const PRESETS = presetsFor(STANDARDS, PROJECT.designBasis);
const floor = PRESETS[0]!;

describe('presets of the office', () => {
  it('are those of standards for the project’s bars in its units', () => {
    expect(PRESETS.map(({ ranges }) => ranges.name)).toEqual([
      'Floor beams',
      'Wide and shallow',
      'Transfer beams',
    ]);
    expect(presetsFor(STANDARDS, { units: 'us', barStandard: 'iso' })).toEqual([]);
  });

  it('fill a new sweep, which can be run as it stands and says what it was filled from', () => {
    const form = firstSweepForm(PROJECT, BEAM, floor);
    expect(form.filledFrom).toBe('US customary, Grade 60: Floor beams');
    const reading = readSweepForm(form, 'us');
    if (reading.kind === 'incomplete') throw new Error([...reading.errors.values()].join('; '));
    const { space, demand, rules } = reading.input.definition;
    const { standard, ranges } = floor;
    expect(space.width).toEqual({
      kind: 'range',
      from: ranges.leastWidthMm,
      to: ranges.mostWidthMm,
      step: standard.increments.widthMm,
    });
    expect(space.fc.kind === 'list' && space.fc.values.map((mpa) => Math.round(mpa / MPA_PER_PSI))).toEqual([
      4000, 5000, 6000, 7000,
    ]);
    expect(space.tension).toEqual({
      kind: 'bars',
      sizes: standard.bars.tension,
      counts: ranges.tensionCounts,
      none: false,
    });
    expect(space.compression).toMatchObject({ sizes: standard.bars.compression, none: true });
    expect(space.stirrups).toEqual(standard.bars.stirrups);
    expect(rules).toMatchObject(standard.rules);
    expect(demand.muNmm).toBe(BEAM.muNmm);
    expect(departuresFrom(form, standard, 'us')).toEqual([]);
  });

  it('leave demand, slab, cover, fy and the measures as they were', () => {
    const own = firstSweepForm(PROJECT, BEAM);
    const filled = withPreset(own, floor, 'us');
    for (const key of ['name', 'demand', 'flange', 'view'] as const) expect(filled[key]).toBe(own[key]);
    expect([filled.axes.fy, filled.axes.cover]).toEqual([own.axes.fy, own.axes.cover]);
  });

  it('say each thing in which a form departs from what the office builds', () => {
    const form = firstSweepForm(PROJECT, BEAM, floor);
    const odd = {
      ...form,
      axes: {
        ...form.axes,
        depth: { ...form.axes.depth, step: 0.5 * MM_PER_IN },
        fc: { ...form.axes.fc, listText: '4, 6.5, 8' },
      },
      steel: { ...form.steel, tension: { ...form.steel.tension, sizes: ['#8', '#14'] } },
      stirrups: [{ bar: '#4', legs: 2, spacingMm: 6 * MM_PER_IN, isDesigned: false }],
    };
    expect(departuresFrom(odd, floor.standard, 'us')).toEqual([
      'h = 16.5 in is no multiple of the office’s 1 in',
      '6.5 ksi, 8 ksi are no mixes of the office',
      '#14 is not on the office’s bar list',
      'stirrups #4 @ 6 in, 2 legs are of a size the office does not bend',
    ]);
  });

  it('are not guessed for a stored sweep', () => {
    const reading = readSweepForm(firstSweepForm(PROJECT, BEAM, floor), 'us');
    if (reading.kind === 'incomplete') throw new Error('not complete');
    expect(sweepForm(reading.input, 'us').filledFrom).toBeNull();
  });
});
