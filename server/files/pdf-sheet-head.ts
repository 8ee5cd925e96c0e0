import { LARGE_SHEET } from '#shared/drawing/large-plan.ts';
import type { InputGroup, KeyText, Sheet } from '#shared/sheet/sheet.ts';
import { textRuns } from '#shared/sheet/text-runs.ts';
import type { PdfFlow } from './pdf-flow.ts';
import { breakSegments, lineHeightPt, writeLines, type RunLine } from './pdf-runs.ts';
import { drawSection } from './pdf-section-drawing.ts';

/** What it is of, and its verdict. */
export function writeTitle(flow: PdfFlow, { title, subtitle, verdict }: Sheet): void {
  flow.write(title, flow.leftPt, flow.yPt + 12, { font: 'bold', sizePt: 13 });
  flow.write(subtitle, flow.leftPt, flow.yPt + 23, { sizePt: 7.6, colour: 'muted' });
  const text = `${verdict.meets ? '✓' : '✕'} ${verdict.text}`;
  const style = { font: 'bold', sizePt: 8.5, colour: verdict.meets ? 'meets' : 'fails' } as const;
  flow.write(text, flow.leftPt + flow.widthPt - flow.measure(text, style), flow.yPt + 12, style);
  flow.yPt += 29;
  flow.rule(flow.yPt, { colour: 'ink', weightPt: 0.8 });
  flow.yPt += 5;
}

const DRAWING_SCALE = 0.58;
const COLUMN_GAP_PT = 12;
const HEAD_PT = 7.4;
const KEY_PT = 6.5;
const NAME_SHARE = 0.42;

/** The drawing on the left, what went into the numbers in two columns on the right. */
export function writeInputs(flow: PdfFlow, { drawing, inputs, units }: Sheet): void {
  const top = flow.yPt;
  drawSection(flow, { ...drawing, units }, { xPt: flow.leftPt - 8, yPt: top, scale: DRAWING_SCALE });
  const left = flow.leftPt + LARGE_SHEET.width * DRAWING_SCALE;
  const widthPt = (flow.leftPt + flow.widthPt - left - COLUMN_GAP_PT) / 2;
  const groups = inputs.map((group) => layGroup(flow, group, widthPt));
  const columns = inTwo(groups);
  flow.beside(
    columns.map((_, i) => ({ leftPt: left + i * (widthPt + COLUMN_GAP_PT), widthPt })),
    (i) => columns[i]!.forEach((group) => writeGroup(flow, group)),
  );
  flow.yPt = Math.max(flow.yPt, top + LARGE_SHEET.height * DRAWING_SCALE);
}

interface LaidKey {
  readonly name: readonly RunLine[];
  readonly value: readonly RunLine[];
  readonly heightPt: number;
}
interface LaidGroup {
  readonly title: string;
  readonly keys: readonly LaidKey[];
  readonly heightPt: number;
}

const HEAD_ROOM_PT = HEAD_PT + 4;
const GROUP_GAP_PT = 4;

function layGroup(flow: PdfFlow, { title, items }: InputGroup, widthPt: number): LaidGroup {
  const keys = items.map((item) => layKey(flow, item, widthPt));
  const heightPt = keys.reduce((sum, key) => sum + key.heightPt, HEAD_ROOM_PT + GROUP_GAP_PT);
  return { title, keys, heightPt };
}

/** A value that fits beside its name has the rest of the line; a longer one is broken. */
function layKey(flow: PdfFlow, { label, value }: KeyText, widthPt: number): LaidKey {
  const lay = (text: string, room: number, isName: boolean) =>
    breakSegments(
      flow,
      [
        {
          runs: textRuns(text, { isProse: true }),
          style: { sizePt: KEY_PT, colour: isName ? 'muted' : 'ink' },
        },
      ],
      room,
    );
  const name = lay(label, widthPt * NAME_SHARE, true);
  const used = Math.max(...name.map((line) => line.widthPt));
  const room = lay(value, widthPt - used - 6, false);
  return { name, value: room, heightPt: Math.max(name.length, room.length) * lineHeightPt(KEY_PT) };
}

/** Cut where the longer of the two is shortest. */
function inTwo(groups: readonly LaidGroup[]): LaidGroup[][] {
  const heightOf = (some: readonly LaidGroup[]) => some.reduce((sum, { heightPt }) => sum + heightPt, 0);
  const cuts = groups.map((_, i) => [groups.slice(0, i + 1), groups.slice(i + 1)]);
  const longest = (cut: LaidGroup[][]) => Math.max(...cut.map(heightOf));
  return cuts.reduce((best, cut) => (longest(cut) < longest(best) ? cut : best));
}

function writeGroup(flow: PdfFlow, { title, keys }: LaidGroup): void {
  flow.write(title, flow.leftPt, flow.yPt + HEAD_PT, { font: 'bold', sizePt: HEAD_PT });
  flow.yPt += HEAD_ROOM_PT;
  for (const { name, value, heightPt } of keys) {
    const box = { xPt: flow.leftPt, yPt: flow.yPt, widthPt: flow.widthPt };
    writeLines(flow, name, box, KEY_PT);
    writeLines(flow, value, { ...box, isRight: true }, KEY_PT);
    flow.yPt += heightPt;
  }
  flow.yPt += GROUP_GAP_PT;
}
