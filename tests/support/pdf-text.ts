/** What a reader sees of an uncompressed PDF of pdfkit's: glyphs go back to letters by each font's own ToUnicode table. */
export function pdfText(file: Buffer): string {
  const source = file.toString('latin1');
  const objects = objectsOf(source);
  const fonts = fontMaps(objects);
  return [...source.matchAll(/stream\n([\s\S]*?)\nendstream/g)]
    .map(([, stream]) => stream!)
    .filter((stream) => stream.includes('BT'))
    .map((stream) => textOfPage(stream, fonts))
    .join('\n');
}

export const pdfPageCount = (file: Buffer): number =>
  (file.toString('latin1').match(/\/Type \/Page\n/g) ?? []).length;

export const pdfPageSize = (file: Buffer): string =>
  /\/MediaBox \[0 0 ([\d.]+ [\d.]+)\]/.exec(file.toString('latin1'))?.[1] ?? '';

type GlyphMap = ReadonlyMap<number, string>;

const objectsOf = (source: string): ReadonlyMap<string, string> =>
  new Map([...source.matchAll(/(\d+) 0 obj\n([\s\S]*?)\nendobj/g)].map(([, id, body]) => [id!, body!]));

function fontMaps(objects: ReadonlyMap<string, string>): ReadonlyMap<string, GlyphMap> {
  const maps = new Map<string, GlyphMap>();
  for (const body of objects.values())
    for (const [, name, id] of body.matchAll(/\/(F\d+) (\d+) 0 R/g)) {
      const toUnicode = /\/ToUnicode (\d+) 0 R/.exec(objects.get(id!) ?? '')?.[1];
      maps.set(name!, glyphMap(objects.get(toUnicode ?? '') ?? ''));
    }
  return maps;
}

/** `<first> <last> [<text of first> …]` */
function glyphMap(table: string): GlyphMap {
  const glyphs = new Map<number, string>();
  for (const [, first, , list] of table.matchAll(/<([0-9a-f]+)> <([0-9a-f]+)> \[([^\]]*)\]/gi))
    [...list!.matchAll(/<([0-9a-f ]*)>/gi)].forEach(([, hex], i) =>
      glyphs.set(
        parseInt(first!, 16) + i,
        Buffer.from(hex!.replaceAll(' ', ''), 'hex').swap16().toString('utf16le'),
      ),
    );
  return glyphs;
}

function textOfPage(stream: string, fonts: ReadonlyMap<string, GlyphMap>): string {
  let font: GlyphMap = new Map();
  let text = '';
  for (const [, name, shown] of stream.matchAll(/\/(F\d+) [\d.]+ Tf|\[([^\]]*)\] TJ/g)) {
    if (name !== undefined) font = fonts.get(name) ?? new Map();
    else {
      const glyphs = [...shown!.matchAll(/<([0-9a-f]*)>/gi)].flatMap(([, hex]) => hex!.match(/.{4}/g) ?? []);
      text += `${glyphs.map((glyph) => font.get(parseInt(glyph, 16)) ?? '').join('')} `;
    }
  }
  return text.replace(/\u00a0/g, ' ');
}
