import { describe, expect, it } from 'vitest';
import { parseNumber } from '#client/src/lib/parse-number.ts';

const read = (text: string, unit?: string) => {
  const parsed = parseNumber(text, unit);
  return parsed.kind === 'number' ? parsed.value : parsed.kind;
};

describe('reading a typed number', () => {
  it.each([
    ['1250.5', 1250.5],
    ['1,250.5', 1250.5],
    ['1 250.5', 1250.5],
    ['1,234,567', 1234567],
    ['.75', 0.75],
    ['12.', 12],
    ['−3.5', -3.5],
    ['+4', 4],
    ['1e3', 1000],
    ['1 1/2', 1.5],
    ['2-3/4', 2.75],
    ['3/8', 0.375],
  ])('reads %s', (text, value) => {
    expect(read(text)).toBeCloseTo(value, 12);
  });

  it('forgives the unit typed after the number', () => {
    expect(read('18 in', 'in')).toBe(18);
    expect(read('350 kip·ft', 'kip·ft')).toBe(350);
  });

  it('takes an empty field for empty, not for zero', () => {
    expect(read('   ')).toBe('empty');
  });

  it.each(['12,5', '1,25', '12,34,567', 'twelve', '1.2.3', '--4', '1/0', '1e999', 'NaN', 'Infinity', '0x10'])(
    'does not guess what %s means',
    (text) => {
      expect(read(text)).toBe('unreadable');
    },
  );

  it('says how to write a decimal comma', () => {
    expect(parseNumber('12,5')).toEqual({
      kind: 'unreadable',
      problem: 'Write decimals with a point: 12.5',
    });
  });
});
