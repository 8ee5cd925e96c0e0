import { describe, expect, it } from 'vitest';
import { MM_PER_IN } from '#shared/engine/units.ts';
import { faceTable } from '#shared/sweep/face-table.ts';
import { placementAt, prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import { fitPreview } from '#client/src/features/sweep-form/fit-preview.ts';
import { fitWords } from '#client/src/features/sweep-form/fit-words.ts';
import { readSweepForm } from '#client/src/features/sweep-form/read-sweep-form.ts';
import { problemOf } from '#client/src/features/sweep-form/space-estimate.ts';
import { firstSweepForm } from '#client/src/features/sweep-form/sweep-form-defaults.ts';
import type { SweepFormValues } from '#client/src/features/sweep-form/sweep-form-values.ts';
import { BEAM, PROJECT } from './office-project.ts';

const FIRST = firstSweepForm(PROJECT, BEAM);
const previewOf = (form: SweepFormValues) => fitPreview(form, 'tension', PROJECT.designBasis, 'us');

describe('the preview of layers', () => {
  it('says at both ends of the widths what the sweep will find there, bar by bar', () => {
    const reading = readSweepForm(FIRST, 'us');
    if (reading.kind === 'incomplete') throw new Error('the first form cannot be run');
    const problem = problemOf(PROJECT, reading.input.definition);
    const prepared = prepareSweep(problem, { x: 'steelKgPerM', y: 'depthMm' });
    const ends = [0, prepared.space.widthsMm.length - 1];
    const preview = previewOf(FIRST)!;
    expect(preview.rows.map(({ name }) => name)).toEqual(FIRST.steel.tension.sizes);
    ends.forEach((end, k) => {
      const { context, widthMm } = placementAt(prepared, end);
      const entries = faceTable('tension', prepared.space.tension, context, {
        rules: problem.rules,
        throughMm: 0,
      });
      preview.rows.forEach(({ name, at }) => {
        const fit = at[k]!;
        expect(fit.widthMm).toBeCloseTo(widthMm, 9);
        prepared.space.tension.forEach((set, t) => {
          if (set.kind !== 'bars' || set.bars[0]!.bar !== name) return;
          const { count } = set.bars[0]!;
          const layers = fit.byLayers.findIndex((counts) => counts.includes(count)) + 1;
          expect([layers > 0, layers], `${count}-${name}`).toEqual([
            entries[t]!.fits,
            entries[t]!.layerCount,
          ]);
          expect(fit.tooMany.includes(count)).toBe(!entries[t]!.fits);
        });
      });
    });
  });

  it('is drawn once where all sections are of one width, and follows cover, layers and groups of two sizes', () => {
    const narrow: SweepFormValues = {
      ...FIRST,
      axes: { ...FIRST.axes, width: { ...FIRST.axes.width, to: FIRST.axes.width.from } },
      rules: { ...FIRST.rules, maxLayers: 1, excludedBars: ['#9'] },
      steel: { ...FIRST.steel, tension: { ...FIRST.steel.tension, mixedText: '2-#8 + 2-#6, 2-#8 + 40-#6' } },
    };
    const { rows } = previewOf(narrow)!;
    expect(rows.every(({ at }) => at.length === 1 && at[0]!.byLayers.length === 1)).toBe(true);
    expect(rows.find(({ isExcluded }) => isExcluded)?.name).toBe('#9');
    const [fits, not] = rows.slice(-2);
    expect([fits!.name, fits!.at[0]!.most?.bars.length]).toEqual(['2-#8 + 2-#6', 4]);
    expect([not!.at[0]!.most, not!.at[0]!.tooMany]).toEqual([null, [42]]);
    const covered = {
      ...narrow,
      axes: { ...narrow.axes, cover: { ...narrow.axes.cover, listText: '1.5, 4' } },
    };
    const least = (form: SweepFormValues) => previewOf(form)!.rows[0]!.at[0]!.byLayers[0]!.length;
    expect(least(covered)).toBeLessThan(least(narrow));
  });

  it('says nothing of what cannot be read', () => {
    const unread = { ...FIRST, axes: { ...FIRST.axes, width: { ...FIRST.axes.width, to: Number.NaN } } };
    expect(previewOf(unread)).toBeNull();
    expect(previewOf({ ...FIRST, rules: { ...FIRST.rules, maxLayers: null } })).toBeNull();
    const areas = {
      ...FIRST,
      steel: { ...FIRST.steel, tension: { ...FIRST.steel.tension, kind: 'areas' as const } },
    };
    expect(previewOf(areas)).toBeNull();
    const thin = { ...FIRST, axes: { ...FIRST.axes, cover: { ...FIRST.axes.cover, listText: '8' } } };
    expect(previewOf(thin)).toBeNull();
  });

  it('is put in words a detailer would use', () => {
    const fit = {
      widthMm: 12 * MM_PER_IN,
      most: null,
      byLayers: [
        [2, 3, 4],
        [5, 6],
      ],
      tooMany: [7, 8, 9],
    };
    expect(fitWords(fit)).toBe('2–4 in one layer, 5, 6 in two layers; 7–9 do not fit');
    expect(fitWords({ ...fit, byLayers: [[], []], tooMany: [1] })).toBe('1 does not fit');
  });
});
