/** A picture opened elsewhere may lack our faces; the ones after them are everywhere. */
export const PICTURE_FACE = {
  words: "'Archivo Variable', Archivo, Helvetica, Arial, sans-serif",
  numbers: "'IBM Plex Mono', Menlo, Consolas, monospace",
} as const;

const ESCAPES: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' };

export const escapeXml = (text: string): string => text.replace(/[&<>"]/g, (letter) => ESCAPES[letter]!);

interface TextLook {
  readonly x: number;
  readonly y: number;
  readonly sizePx: number;
  readonly fill: string;
  readonly face: keyof typeof PICTURE_FACE;
  readonly anchor?: 'start' | 'middle' | 'end';
  /** `y` is the middle of the letters; their base line otherwise. */
  readonly isCentred?: boolean;
  readonly turn?: string;
}

export function svgText(text: string, look: TextLook): string {
  const { x, y, sizePx, fill, face, anchor = 'start', isCentred = false, turn } = look;
  const centred = isCentred ? ' dy="0.35em"' : '';
  const turned = turn === undefined ? '' : ` transform="${turn}"`;
  return `<text x="${x.toFixed(2)}" y="${y.toFixed(2)}"${centred} font-family="${escapeXml(PICTURE_FACE[face])}" font-size="${sizePx}" fill="${fill}" text-anchor="${anchor}"${turned}>${escapeXml(text)}</text>`;
}
