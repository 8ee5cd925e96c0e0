import PDFDocument from 'pdfkit';
import type { Paper } from '#shared/contract/endpoints.ts';
import { PDF_FONTS, pdfFontFile, type PdfFont } from './pdf-fonts.ts';

/** Points of 1/72 in. */
const MARGIN_PT = 38;
const FOOTER_PT = 16;
const PAPER_SIZE: Readonly<Record<Paper, 'A4' | 'LETTER'>> = { a4: 'A4', letter: 'LETTER' };

export const PDF_COLOURS = {
  ink: '#1e2629',
  muted: '#5d666a',
  rule: '#b8b4a8',
  concrete: '#e6e6e6',
  concreteEdge: '#777777',
  steel: '#a8442a',
  meets: '#1f6b5c',
  fails: '#7a3b5e',
} as const;
export type PdfColour = keyof typeof PDF_COLOURS;

export interface PdfHead {
  readonly title: string;
  /** Stands for the moment of writing, so that the same sheet is the same file. */
  readonly writtenAt: Date;
  readonly footer: string;
}

export interface PdfTextStyle {
  readonly font?: PdfFont;
  readonly sizePt: number;
  readonly colour?: PdfColour;
}

/** A part of a page's width. */
export interface PdfBox {
  readonly leftPt: number;
  readonly widthPt: number;
}

/** Pages that are filled from the top; whoever writes asks for room first. */
export class PdfFlow {
  readonly doc: PDFKit.PDFDocument;
  readonly #head: PdfHead;
  /** Width at 1000 points of what was measured before: most words of a sheet come many times. */
  readonly #widths = new Map<string, number>();
  yPt = MARGIN_PT;
  #box: PdfBox | undefined;

  readonly #density: number;

  constructor(
    paper: Paper,
    head: PdfHead,
    { isCompressed, density }: { readonly isCompressed: boolean; readonly density: number },
  ) {
    this.#head = head;
    this.#density = density;
    this.doc = new PDFDocument({
      size: PAPER_SIZE[paper],
      margin: 0,
      bufferPages: true,
      compress: isCompressed,
      lang: 'en',
      displayTitle: true,
      info: {
        Title: head.title,
        Creator: 'Fairweight',
        Producer: 'Fairweight',
        CreationDate: head.writtenAt,
        ModDate: head.writtenAt,
      },
    });
    for (const font of PDF_FONTS) this.doc.registerFont(font, pdfFontFile(font));
    this.doc.scale(density);
  }

  /** Everything on a page is drawn at the density's size, so that more of it has room: points here are larger ones. */
  get #pageWidthPt() {
    return this.doc.page.width / this.#density;
  }
  get #pageHeightPt() {
    return this.doc.page.height / this.#density;
  }
  get pageCount() {
    return this.doc.bufferedPageRange().count;
  }

  get leftPt() {
    return this.#box?.leftPt ?? MARGIN_PT;
  }
  get widthPt() {
    return this.#box?.widthPt ?? this.#pageWidthPt - 2 * MARGIN_PT;
  }

  /** Writes side by side what fits on one page together, each from the same top, and goes on below the longest. */
  beside(boxes: readonly PdfBox[], write: (i: number) => void): void {
    const top = this.yPt;
    let lowest = top;
    boxes.forEach((box, i) => {
      this.#box = box;
      this.yPt = top;
      write(i);
      lowest = Math.max(lowest, this.yPt);
    });
    this.#box = undefined;
    this.yPt = lowest;
  }
  get #bottomPt() {
    return this.#pageHeightPt - MARGIN_PT - FOOTER_PT;
  }

  hasRoom = (heightPt: number): boolean => this.yPt + heightPt <= this.#bottomPt;

  /** Begins another page where the height is not left on this one. Answers whether it did. */
  ensure(heightPt: number): boolean {
    if (this.hasRoom(heightPt)) return false;
    this.doc.addPage();
    this.doc.scale(this.#density);
    this.yPt = MARGIN_PT;
    return true;
  }

  measure(text: string, { font = 'plain', sizePt }: PdfTextStyle): number {
    const key = `${font} ${text}`;
    const known = this.#widths.get(key) ?? this.doc.font(font).fontSize(1000).widthOfString(text);
    this.#widths.set(key, known);
    return (known * sizePt) / 1000;
  }

  /** One piece of text on its base line. */
  write(text: string, xPt: number, baselinePt: number, style: PdfTextStyle): void {
    const { font = 'plain', sizePt, colour = 'ink' } = style;
    this.doc
      .font(font)
      .fontSize(sizePt)
      .fillColor(PDF_COLOURS[colour])
      .text(text, xPt, baselinePt, { lineBreak: false, baseline: 'alphabetic' });
  }

  rule(
    yPt: number,
    { colour = 'rule', weightPt = 0.4 }: { colour?: PdfColour; weightPt?: number } = {},
  ): void {
    this.doc
      .moveTo(this.leftPt, yPt)
      .lineTo(this.leftPt + this.widthPt, yPt)
      .lineWidth(weightPt)
      .strokeColor(PDF_COLOURS[colour])
      .stroke();
  }

  /** Writes the foot of every page and ends the file. */
  async finish(): Promise<Buffer> {
    const { start, count } = this.doc.bufferedPageRange();
    for (let page = start; page < start + count; page++) {
      this.doc.switchToPage(page);
      const baseline = this.#pageHeightPt - MARGIN_PT + 4;
      const style = { sizePt: 6.5, colour: 'muted' } as const;
      const pageText = `page ${page + 1} of ${count}`;
      this.write(this.#head.footer, this.leftPt, baseline, style);
      this.write(pageText, this.leftPt + this.widthPt - this.measure(pageText, style), baseline, style);
    }
    const parts: Buffer[] = [];
    this.doc.on('data', (part: Buffer) => parts.push(part));
    const ended = new Promise<void>((resolve, reject) => this.doc.once('end', resolve).once('error', reject));
    this.doc.end();
    await ended;
    return Buffer.concat(parts);
  }
}
