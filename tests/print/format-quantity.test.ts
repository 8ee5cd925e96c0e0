import { describe, expect, it } from 'vitest';
import {
  fieldText,
  formatDifferenceTo,
  formatDuration,
  formatMoney,
  formatNumber,
  formatQuantity,
} from '#shared/print/format-quantity.ts';
import { toStored } from '#shared/print/units.ts';

describe('printing a number', () => {
  it.each([
    [352.178, 3, '352'],
    [6, 3, '6.00'],
    [0.0050963, 3, '0.00510'],
    [9.996, 3, '10.0'],
    [123456, 3, '123,000'],
    [-4.5, 3, '−4.50'],
    [0, 3, '0'],
    [2.3e-7, 3, '2.30 × 10⁻⁷'],
    [-4e-16, 4, '0'],
  ])('%s to %s figures is %s', (value, digits, text) => {
    expect(formatNumber(value, digits)).toBe(text);
  });

  it('drops zeros only of values that were chosen', () => {
    expect(formatQuantity(27 * 25.4, 'length', 'us')).toBe('27 in');
    expect(formatQuantity(38.1, 'length', 'us')).toBe('1.5 in');
    expect(formatQuantity(6, 'ratio', 'us')).toBe('6.00');
  });

  it('prints what is not known as nothing, never as zero', () => {
    expect(formatQuantity(null, 'tonnes', 'si')).toBe('');
    expect(formatQuantity(undefined, 'money', 'si')).toBe('');
    expect(formatQuantity(Number.NaN, 'length', 'si')).toBe('');
    expect(formatMoney(null, 'USD', 'money', 'us')).toBe('');
  });

  it('puts the currency before the amount and the length after it', () => {
    expect(formatMoney(toStored(99.2, 'money-per-length', 'us'), 'USD', 'money-per-length', 'us')).toBe(
      'USD 99.2/ft',
    );
  });

  it('prints a difference no finer than the two values', () => {
    expect(formatDifferenceTo(16.1, 15.1, 'ratio', 'si')).toBe('+1.0');
    expect(formatDifferenceTo(1.4603, 1.38, 'tonnes', 'si')).toBe('+0.08');
    expect(formatDifferenceTo(13.2, 13.6, 'ratio', 'si')).toBe('−0.4');
    expect(formatDifferenceTo(4972, 3860, 'co2e', 'si')).toBe('+1,110');
    expect(formatDifferenceTo(30, 30.5, 'length', 'si')).toBe('−0.5');
    expect(formatDifferenceTo(5, 5, 'ratio', 'si')).toBe('±0');
  });

  it('shows a field exactly what was typed, after the trip through SI', () => {
    for (const typed of [1.5, 0.375, 18, 29000, 350.25])
      expect(fieldText(toStored(typed, 'stress', 'us'), 'stress', 'us')).toBe(String(typed));
    expect(fieldText(null, 'length', 'us')).toBe('');
    expect(fieldText(0, 'length', 'us')).toBe('0');
  });

  it('gives durations in the unit a person would say', () => {
    expect(formatDuration(216.4)).toBe('216 ms');
    expect(formatDuration(1530)).toBe('1.5 s');
    expect(formatDuration(125_000)).toBe('2 min 5 s');
  });
});
