import { describe, expect, it } from 'vitest';
import { readSelection, toggleSelection } from '#client/src/features/shortlist/selection.ts';

const KNOWN = ['a', 'b', 'c', 'd', 'e', 'f', 'g'];

describe('the selection kept in the address', () => {
  it('drops ids that are unknown or repeated, and keeps the order they were ticked in', () => {
    expect(readSelection('c,zz,a,c', KNOWN)).toEqual(['c', 'a']);
    expect(readSelection(null, KNOWN)).toEqual([]);
    expect(readSelection('', KNOWN)).toEqual([]);
  });

  it('holds at most six', () => {
    expect(readSelection(KNOWN.join(','), KNOWN)).toHaveLength(6);
  });

  it('leaves the address when the last one is unticked', () => {
    expect(toggleSelection(['a'], 'a')).toBeNull();
    expect(toggleSelection(['a'], 'b')).toBe('a,b');
  });
});
