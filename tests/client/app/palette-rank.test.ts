import { expect, it } from 'vitest';
import { paletteRank } from '#client/src/app/palette-rank.ts';

const LINES = [
  { name: 'Reading room, run 2', note: 'B1, finished' },
  { name: 'Reading room, fine' },
  { name: 'Reading room' },
  { name: 'Beam B1', note: 'Reading room, grid 4' },
  { name: 'All projects' },
];

const found = (typed: string): string[] =>
  LINES.map((line) => ({ ...line, score: paletteRank(typed, line) }))
    .filter(({ score }) => score > 0)
    .sort((a, b) => b.score - a.score)
    .map(({ name }) => name);

it('the line of that very name comes before those it begins, and these before those it is merely in', () => {
  expect(found('reading room')).toEqual([
    'Reading room',
    'Reading room, run 2',
    'Reading room, fine',
    'Beam B1',
  ]);
});

it('every word typed must be there, in any order, from the name or from what stands beside it', () => {
  expect(found('B1 run')).toEqual(['Reading room, run 2']);
  expect(found('grid beam')).toEqual(['Beam B1']);
  expect(found('reading room canteen')).toEqual([]);
});

it('nothing typed keeps every line in its order', () => {
  expect(found('  ')).toEqual(LINES.map(({ name }) => name));
});
