import type { BarGroup } from '#shared/engine/section.ts';
import { barsText } from '#shared/print/section-text.ts';

/** Groups read from a line of text, or what is wrong with it. */
export type GroupsReading =
  | { readonly kind: 'groups'; readonly groups: readonly BarGroup[] }
  | { readonly kind: 'unreadable'; readonly problem: string };

const BARS_OF_ONE_SIZE = /^(\d{1,2})\s*[-–×x]\s*(\S+)$/;

/** Reads groups of one or two sizes as the trade writes them: `2-#8 + 2-#6, 3-#8 + 2-#6`. */
export function parseGroups(text: string): GroupsReading {
  const groups: BarGroup[] = [];
  for (const written of text.split(/[,;\n]/).filter((piece) => piece.trim() !== '')) {
    const parts = written.split('+').map((part) => BARS_OF_ONE_SIZE.exec(part.trim()));
    if (parts.some((part) => part === null))
      return { kind: 'unreadable', problem: `“${written.trim()}” is not a bar group: write 2-#8 + 2-#6` };
    groups.push(parts.map((part) => ({ count: Number(part![1]), bar: part![2]! })));
  }
  return { kind: 'groups', groups };
}

export const groupsText = (groups: readonly BarGroup[]): string => groups.map(barsText).join(', ');
