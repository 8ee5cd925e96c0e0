/** The offset basis, upper and lower half; the prime is 2^40 + LOW_OF_PRIME. */
const OFFSET_HIGH = 0xcbf29ce4;
const OFFSET_LOW = 0x84222325;
const LOW_OF_PRIME = 0x1b3;

const hex = (half: number) => half.toString(16).padStart(8, '0');

/**
 * FNV-1a, 64 bit, over the UTF-16 units of a text: tells whether two results are the same result; not a seal.
 * (Fowler, Noll, Vo; IETF draft-eastlake-fnv.) Sixteen hex digits in groups of four. In halves of 32 bits, some thirty
 * times as fast as in big integers: results are hashed on the thread that answers requests.
 */
export function fingerprint(text: string): string {
  let high = OFFSET_HIGH;
  let low = OFFSET_LOW;
  for (let i = 0; i < text.length; i++) {
    low = (low ^ text.charCodeAt(i)) >>> 0;
    // Below 2^41, so exact.
    const product = low * LOW_OF_PRIME;
    high = (Math.imul(high, LOW_OF_PRIME) + Math.floor(product / 2 ** 32) + (low << 8)) >>> 0;
    low = product >>> 0;
  }
  return (hex(high) + hex(low)).replace(/(.{4})(?=.)/g, '$1·');
}
