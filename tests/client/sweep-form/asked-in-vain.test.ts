import { describe, expect, it } from 'vitest';
import { MM_PER_IN } from '#shared/engine/units.ts';
import { askedInVain } from '#client/src/features/sweep-form/asked-in-vain.ts';
import { firstSweepForm } from '#client/src/features/sweep-form/sweep-form-defaults.ts';
import { BEAM, PROJECT } from './office-project.ts';

const FIRST = firstSweepForm(PROJECT, BEAM);
const { demand, rules } = FIRST;

describe('what a form asks in vain', () => {
  it('is nothing while some section can meet it', () => {
    expect(askedInVain(FIRST, 'us')).toEqual([]);
    const met = { columnWidthMm: 16 * MM_PER_IN, minDepthToWidth: 1.5, maxDepthToWidth: 3 };
    expect(askedInVain({ ...FIRST, rules: { ...rules, ...met } }, 'us')).toEqual([]);
  });

  it('is told before the run: a column, a cap, h/b that no section has, sizes both chosen and never used', () => {
    const form = {
      ...FIRST,
      demand: { ...demand, depthCapMm: 17 * MM_PER_IN },
      rules: {
        ...rules,
        columnWidthMm: 15 * MM_PER_IN,
        minDepthToWidth: 4,
        excludedBars: ['#9', '#18'],
      },
    };
    expect(askedInVain(form, 'us')).toEqual([
      'No width is that of the column, 15 in',
      'No depth is within the cap of 17 in',
      'No depth and width make an h/b that is allowed',
      '#9 is chosen, and never used by the rules',
    ]);
  });

  it('is nothing that could be said of ranges not yet typed', () => {
    const unread = { ...FIRST.axes.depth, step: null };
    expect(askedInVain({ ...FIRST, axes: { ...FIRST.axes, depth: unread } }, 'us')).toEqual([]);
  });
});
