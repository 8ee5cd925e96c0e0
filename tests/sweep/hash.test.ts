import fc from 'fast-check';
import { expect, it } from 'vitest';
import { fingerprint } from '#shared/sweep/hash.ts';

/** Test vectors of the hash's authors (IETF draft-eastlake-fnv, appendix C; from memory). */
it.each([
  ['', 'cbf2·9ce4·8422·2325'],
  ['a', 'af63·dc4c·8601·ec8c'],
  ['foobar', '8594·4171·f739·67e8'],
])('the fingerprint of “%s” is the published one', (text, expected) => {
  expect(fingerprint(text)).toBe(expected);
});

it('a fingerprint is that of the definition in whole numbers of 64 bits, for any text', () => {
  const byDefinition = (text: string) => {
    let hash = 0xcbf29ce484222325n;
    for (let i = 0; i < text.length; i++)
      hash = ((hash ^ BigInt(text.charCodeAt(i))) * 0x100000001b3n) & 0xffffffffffffffffn;
    return hash.toString(16).padStart(16, '0');
  };
  fc.assert(
    fc.property(fc.string({ unit: 'binary', maxLength: 200 }), (text) => {
      expect(fingerprint(text).replaceAll('·', '')).toBe(byDefinition(text));
    }),
  );
});
