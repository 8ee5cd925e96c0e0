import { describe, expect, it } from 'vitest';
import { flangeOf } from '#shared/engine/flange.ts';
import { RULE_SETS } from '#shared/engine/rules/rule-sets.ts';

describe('effective width, ACI 318 Table 6.3.2.1', () => {
  const of = (shape: 't' | 'l', [hf, sw, ln]: readonly [number, number, number]) =>
    flangeOf(
      {
        widthMm: 300,
        flange: {
          shape,
          thicknessMm: hf,
          face: 'compression',
          width: { kind: 'effective', clearToNextWebMm: sw, spanMm: ln },
        },
      },
      RULE_SETS['aci318m-19'],
    )!.widthMm;

  it.each([
    ['t', [100, 9000, 90_000], 300 + 2 * 800],
    ['t', [100, 1000, 90_000], 300 + 2 * 500],
    ['t', [100, 9000, 4000], 300 + 2 * 500],
    ['l', [100, 9000, 90_000], 300 + 600],
    ['l', [100, 1000, 90_000], 300 + 500],
    ['l', [100, 9000, 4800], 300 + 400],
  ] as const)('%s with hf, sw and ln of %j', (shape, lengths, expected) => {
    expect(of(shape, lengths)).toBe(expected);
  });
});
