const WHOLE_NAME = 4;
const BEGINNING_OF_NAME = 3;
const BEGINNING_OF_WORDS = 2;

const wordsOf = (text: string): readonly string[] => text.toLowerCase().split(/\s+/).filter(Boolean);

interface RankedLine {
  readonly name: string;
  readonly note?: string;
}

/** How well a line answers what is typed: every word typed must be in it, 0 where one is not. */
export function paletteRank(typed: string, { name, note = '' }: RankedLine): number {
  const sought = wordsOf(typed);
  const line = `${name} ${note}`.toLowerCase();
  if (!sought.every((word) => line.includes(word))) return 0;
  const whole = sought.join(' ');
  const lowerName = name.toLowerCase();
  if (lowerName === whole) return WHOLE_NAME;
  if (lowerName.startsWith(whole)) return BEGINNING_OF_NAME;
  const words = wordsOf(line);
  return sought.every((word) => words.some((one) => one.startsWith(word))) ? BEGINNING_OF_WORDS : 1;
}
