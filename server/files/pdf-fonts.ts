import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';

const require = createRequire(import.meta.url);

/** The one family with all of Latin, Greek, mathematics, sub- and superscripts. */
const FILES = {
  plain: require.resolve('dejavu-fonts-ttf/ttf/DejaVuSansCondensed.ttf'),
  bold: require.resolve('dejavu-fonts-ttf/ttf/DejaVuSansCondensed-Bold.ttf'),
  slanted: require.resolve('dejavu-fonts-ttf/ttf/DejaVuSansCondensed-Oblique.ttf'),
} as const;
export type PdfFont = keyof typeof FILES;
export const PDF_FONTS = Object.keys(FILES) as PdfFont[];

const read = new Map<PdfFont, Buffer>();

/** Read once; a document embeds the letters it uses. */
export function pdfFontFile(font: PdfFont): Buffer {
  const file = read.get(font) ?? readFileSync(FILES[font]);
  read.set(font, file);
  return file;
}
