import { describe, expect, it } from 'vitest';
import { DEMO_STANDARDS } from '#server/demo/standards.ts';
import {
  EMPTY_STANDARD,
  readStandard,
  standardValues,
  withBarStandard,
  withUnits,
} from '#client/src/features/office-standards/standard-values.ts';

const near = (value: unknown): unknown =>
  typeof value === 'number'
    ? expect.closeTo(value, 5)
    : Array.isArray(value)
      ? value.map(near)
      : typeof value === 'object' && value !== null
        ? Object.fromEntries(Object.entries(value).map(([key, one]) => [key, near(one)]))
        : value;

describe('a standard of the office as a form', () => {
  it.each(DEMO_STANDARDS.map(({ standard }) => [standard.name, standard] as const))(
    'reads back what was stored: %s',
    (_name, standard) => {
      const reading = readStandard(standardValues(standard));
      expect(reading.kind === 'complete' && reading.input).toEqual(near(standard));
    },
  );

  it('says at each field what is missing in an empty one', () => {
    const reading = readStandard(EMPTY_STANDARD);
    if (reading.kind === 'complete') throw new Error('an empty standard is none');
    for (const key of [
      'name',
      'bars.tension',
      'bars.compression',
      'bars.stirrups.0.spacingMm',
      'mixesMPa',
      'increments.depthMm',
      'ranges.0.name',
      'ranges.0.leastWidthMm',
      'ranges.0.tensionCounts',
    ])
      expect(reading.errors.get(key), key).toBeDefined();
  });

  it('keeps what was typed when the units change, and asks for the bars anew when their standard does', () => {
    const us = standardValues(DEMO_STANDARDS[0]!.standard);
    expect(withUnits(us, 'si').mixesText).toBe('27.57903, 34.47379, 41.36854, 48.2633');
    expect(withUnits({ ...us, mixesText: '4, x' }, 'si').mixesText).toBe('4, x');
    const iso = withBarStandard(us, 'iso', '8');
    expect([iso.tension, iso.stirrups[0]!.bar, iso.ranges]).toEqual([[], '8', us.ranges]);
  });
});
