import type { TextRun } from '#shared/sheet/text-runs.ts';
import type { PdfColour, PdfFlow } from './pdf-flow.ts';
import type { PdfFont } from './pdf-fonts.ts';

export interface RunStyle {
  readonly sizePt: number;
  readonly colour?: PdfColour;
  readonly isBold?: boolean;
}

/** Runs of one style; several of them are set one behind the other. */
export interface Segment {
  readonly runs: readonly TextRun[];
  readonly style: RunStyle;
}

interface Piece {
  readonly text: string;
  readonly font: PdfFont;
  readonly sizePt: number;
  readonly dropPt: number;
  readonly widthPt: number;
  readonly colour: PdfColour;
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
export const lineHeightPt = (sizePt: number) => sizePt * 1.25;

/** Breaks segments into lines of a width; spaces are those of the first. A word wider than the line stands alone on it. */
export function breakSegments(flow: PdfFlow, segments: readonly Segment[], widthPt: number): RunLine[] {
  const spacePt = spaceOf(flow, segments[0]?.style.sizePt ?? 0);
  const lines: RunLine[] = [];
  let words: Word[] = [];
  let usedPt = 0;
  for (const word of segments.flatMap((segment) => wordsOf(flow, segment))) {
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

const spaceOf = (flow: PdfFlow, sizePt: number) => flow.measure(' ', { sizePt });

function wordsOf(flow: PdfFlow, { runs, style }: Segment): Word[] {
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
  const widthPt = flow.measure(text, { font, sizePt });
  return { text, font, sizePt, dropPt, widthPt, colour: style.colour ?? 'ink' };
}

/** Writes lines of a size from a top edge down; `isRight` sets them against the right edge. */
export function writeLines(
  flow: PdfFlow,
  lines: readonly RunLine[],
  box: { readonly xPt: number; readonly yPt: number; readonly widthPt: number; readonly isRight?: boolean },
  sizePt: number,
): void {
  const spacePt = spaceOf(flow, sizePt);
  lines.forEach((line, row) => {
    const baseline = box.yPt + sizePt + row * lineHeightPt(sizePt);
    let x = box.isRight ? box.xPt + box.widthPt - line.widthPt : box.xPt;
    for (const { pieces } of line.words) {
      for (const { text, widthPt, dropPt, ...style } of pieces) {
        flow.write(text, x, baseline + dropPt, style);
        x += widthPt;
      }
      x += spacePt;
    }
  });
}
