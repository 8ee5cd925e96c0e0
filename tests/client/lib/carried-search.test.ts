import { expect, it } from 'vitest';
import { carriedSearch } from '#client/src/lib/carried-search.ts';

it('carries ranges, columns, band and measures to the next run, and nothing that is one run’s own', () => {
  const search = '?x=costPerM&y=depthMm&f=depthMm:~600&cols=widthMm&band=3&i=42&zx=1~2&zy=3~4';
  expect(carriedSearch(search)).toBe('?x=costPerM&y=depthMm&f=depthMm%3A%7E600&cols=widthMm&band=3');
  expect(carriedSearch(search, ['x', 'y'])).toBe('?f=depthMm%3A%7E600&cols=widthMm&band=3');
  expect(carriedSearch('?i=7')).toBe('');
});
