/** As long as every file system takes with a folder before it. */
const LONGEST = 100;

const plain = (part: string): string =>
  part
    .normalize('NFKD')
    .replaceAll('#', 'no')
    .replace(/\p{Mark}/gu, '')
    .replace(/[^A-Za-z0-9.]+/g, '-')
    .replace(/^[-.]+|[-.]+$/g, '');

/**
 * A file's name from what it is of, in letters that no system and no header has to escape; whatever people typed becomes
 * such letters or is left out.
 */
export function fileName(parts: readonly (string | number)[], extension: string): string {
  const words = parts.map((part) => plain(String(part))).filter((word) => word !== '');
  const stem = words
    .join('-')
    .slice(0, LONGEST)
    .replace(/[-.]+$/, '');
  return `${stem === '' ? 'fairweight' : stem}.${extension}`;
}
