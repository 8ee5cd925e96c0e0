import { createHash } from 'node:crypto';

/** The same id for the same name each time, in the form of a version 8 UUID (RFC 9562): links into the demo stay good. */
export function stableId(name: string): string {
  const hex = createHash('sha256').update(`tidemill/${name}`).digest('hex');
  const variant = ((parseInt(hex.slice(16, 18), 16) & 0x3f) | 0x80).toString(16);
  const parts = [hex.slice(0, 8), hex.slice(8, 12), `8${hex.slice(13, 16)}`, variant + hex.slice(18, 20)];
  return [...parts, hex.slice(20, 32)].join('-');
}
