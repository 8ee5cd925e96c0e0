const OFFSET = 0xcbf29ce484222325n;
const PRIME = 0x100000001b3n;
const MASK = 0xffffffffffffffffn;

/**
 * FNV-1a, 64 bit, over the UTF-16 units of a text: tells whether two results are the same result; not a seal.
 * (Fowler, Noll, Vo; IETF draft-eastlake-fnv.) Sixteen hex digits in groups of four.
 */
export function fingerprint(text: string): string {
  let hash = OFFSET;
  for (let i = 0; i < text.length; i++) {
    hash ^= BigInt(text.charCodeAt(i));
    hash = (hash * PRIME) & MASK;
  }
  return hash
    .toString(16)
    .padStart(16, '0')
    .replace(/(.{4})(?=.)/g, '$1·');
}
