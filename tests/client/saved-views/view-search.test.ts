import { describe, expect, it } from 'vitest';
import type { SavedView } from '#shared/contract/saved-view.ts';
import { readRunAddress } from '#client/src/features/run/run-address.ts';
import {
  isSameView,
  keptAddress,
  viewPath,
  viewWords,
} from '#client/src/features/saved-views/view-search.ts';

const FIRST = { x: 'steelKgPerM', y: 'depthMm' } as const;
const SEARCH =
  'x=costPerM&y=curvatureDuctility&by=widthMm&as=size&log=x&f=depthMm:500~700&cols=steelKgPerM&band=3&i=42';

const view: SavedView = {
  id: 'v',
  sweepId: 's',
  runId: 'r',
  runNumber: 2,
  name: 'Ours',
  address: keptAddress(new URLSearchParams(SEARCH), { i: '42' }),
  createdBy: { id: 'p', name: 'Somebody' },
  createdAt: '2026-01-01T00:00:00.000Z',
  mayChange: true,
};

describe('a saved view', () => {
  it('restores the address it was saved from, to the letter', () => {
    const path = viewPath('p', view);
    expect(path.startsWith('/projects/p/runs/r?')).toBe(true);
    const restored = readRunAddress(new URLSearchParams(path.split('?')[1]), FIRST);
    expect(restored).toEqual(readRunAddress(new URLSearchParams(SEARCH), FIRST));
  });

  it('says out loud what its address left to the page, and keeps nothing that is no part of one', () => {
    const kept = keptAddress(new URLSearchParams('f=depthMm:1~2&Q-1=x'), {
      x: 'depthMm',
      y: 'widthMm',
      i: null,
    });
    expect(kept).toEqual({ f: 'depthMm:1~2', x: 'depthMm', y: 'widthMm' });
  });

  it('is shown now whatever the order of its parts and the chosen section', () => {
    const { i: _i, ...rest } = view.address;
    const turned = Object.fromEntries(Object.entries(rest).reverse());
    expect(isSameView(view.address, turned)).toBe(true);
    expect(isSameView(view.address, { ...turned, band: '4' })).toBe(false);
  });

  it('is told by its measures', () => {
    expect(viewWords(view, 'us')).toBe('Curvature ductility against cost, filtered');
    expect(viewWords({ ...view, address: {} }, 'us')).toBe('Measures of the run');
  });
});
