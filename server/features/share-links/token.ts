import { createHmac, timingSafeEqual } from 'node:crypto';

const ID_BYTES = 16;
const SEAL_BYTES = 16;

const seal = (id: Buffer, secret: string): Buffer =>
  createHmac('sha256', secret).update('share-link').update(id).digest().subarray(0, SEAL_BYTES);

const toBytes = (uuid: string) => Buffer.from(uuid.replaceAll('-', ''), 'hex');
const toUuid = (bytes: Buffer) =>
  bytes.toString('hex').replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, '$1-$2-$3-$4-$5');

/**
 * The link's id under a seal of the service's secret. It can be shown again without being stored, so that a copy of
 * the database opens no link; with another secret all links end.
 */
export function createShareToken(linkId: string, secret: string): string {
  const id = toBytes(linkId);
  return Buffer.concat([id, seal(id, secret)]).toString('base64url');
}

/** The id of the link, where the seal is ours. */
export function findShareLinkId(token: string, secret: string): string | undefined {
  const bytes = Buffer.from(token, 'base64url');
  if (bytes.length !== ID_BYTES + SEAL_BYTES) return undefined;
  const id = bytes.subarray(0, ID_BYTES);
  return timingSafeEqual(bytes.subarray(ID_BYTES), seal(id, secret)) ? toUuid(id) : undefined;
}
