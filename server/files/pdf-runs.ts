import type { TextRun } from '#shared/sheet/text-runs.ts';
import type { PdfColour, PdfFlow } from './pdf-flow.ts';
import type { PdfFont } from './pdf-fonts.ts';

export interface RunStyle {
  readonly sizePt: number;
  readonly colour?: PdfColour;
  readonly isBold?: boolean;
}

interface Piece {
  readonly text: string;
  readonly font: PdfFont;
  readonly sizePt: number;
  readonly dropPt: number;
  readonly widthPt: number;
}

/** Pieces without a place to break between them. */
interface Word {
  readonly pieces: readonly Piece[];
  readonly widthPt: number;
}

export interface RunLine {
  readonly words: readonly Word[];
  readonly widthPt: number;
}

const SUB_SIZE = 0.72;
const SUB_DROP = 0.18;
export const lineHeightPt = (sizePt: number) => sizePt * 1.28;

/** Breaks runs into lines of a width. A word wider than the line stands alone on it. */
export function breakRuns(
  flow: PdfFlow,
  runs: readonly TextRun[],
  widthPt: number,
  style: RunStyle,
): RunLine[] {
  const spacePt = flow.measure(' ', { sizePt: style.sizePt });
  const lines: RunLine[] = [];
  let words: Word[] = [];
  let usedPt = 0;
  for (const word of wordsOf(flow, runs, style)) {
    const neededPt = words.length === 0 ? word.widthPt : usedPt + spacePt + word.widthPt;
    if (words.length > 0 && neededPt > widthPt) {
      lines.push({ words, widthPt: usedPt });
      words = [];
    }
    usedPt = words.length === 0 ? word.widthPt : neededPt;
    words.push(word);
  }
  if (words.length > 0) lines.push({ words, widthPt: usedPt });
  return lines;
}

function wordsOf(flow: PdfFlow, runs: readonly TextRun[], style: RunStyle): Word[] {
  const words: Word[] = [];
  let pieces: Piece[] = [];
  const close = () => {
    if (pieces.length > 0)
      words.push({ pieces, widthPt: pieces.reduce((sum, { widthPt }) => sum + widthPt, 0) });
    pieces = [];
  };
  for (const run of runs)
    for (const [i, text] of run.text.split(' ').entries()) {
      if (i > 0) close();
      if (text !== '') pieces.push(pieceOf(flow, run, text, style));
    }
  close();
  return words;
}

function pieceOf(flow: PdfFlow, { isSymbol, isSub }: TextRun, text: string, style: RunStyle): Piece {
  const font: PdfFont = style.isBold ? 'bold' : isSymbol ? 'slanted' : 'plain';
  const sizePt = isSub ? style.sizePt * SUB_SIZE : style.sizePt;
  const dropPt = isSub ? style.sizePt * SUB_DROP : 0;
  return { text, font, sizePt, dropPt, widthPt: flow.measure(text, { font, sizePt }) };
}

/** Writes lines from a top edge down; `right` sets them against the right edge. */
export function writeLines(
  flow: PdfFlow,
  lines: readonly RunLine[],
  box: { readonly xPt: number; readonly yPt: number; readonly widthPt: number; readonly isRight?: boolean },
  style: RunStyle,
): void {
  const spacePt = flow.measure(' ', { sizePt: style.sizePt });
  lines.forEach((line, row) => {
    const baseline = box.yPt + style.sizePt + row * lineHeightPt(style.sizePt);
    let x = box.isRight ? box.xPt + box.widthPt - line.widthPt : box.xPt;
    for (const { pieces } of line.words) {
      for (const { text, font, sizePt, dropPt, widthPt } of pieces) {
        flow.write(text, x, baseline + dropPt, {
          font,
          sizePt,
          ...(style.colour ? { colour: style.colour } : {}),
        });
        x += widthPt;
      }
      x += spacePt;
    }
  });
}
