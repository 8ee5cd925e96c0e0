import { tokenize } from './tokens.ts';

/** Text in one style: symbols slant, their subscripts hang below the line. */
export interface TextRun {
  readonly text: string;
  readonly isSymbol: boolean;
  readonly isSub: boolean;
}

/** What reads as a symbol and is a word, a unit or a code in a sentence: a, metres, newtons, feet, T and L, A1–A3, A615, C50. */
const WORD_IN_PROSE = /^(?:a|m|A|I|N|L|ft|In|Is|An|At|[AC]\d+)$/;
const GREEK_SUB = /^[α-ω]$/;

/** A formula or a sentence as runs, for a page without formula setting and for paper. */
export function textRuns(text: string, { isProse }: { readonly isProse: boolean }): TextRun[] {
  const runs: TextRun[] = [];
  const add = (run: TextRun) => {
    const last = runs.at(-1);
    if (run.text === '') return;
    if (last !== undefined && last.isSymbol === run.isSymbol && last.isSub === run.isSub)
      runs[runs.length - 1] = { ...last, text: last.text + run.text };
    else runs.push(run);
  };
  for (const token of tokenize(text)) {
    const isWord = token.kind !== 'symbol' || (isProse && WORD_IN_PROSE.test(token.text));
    if (isWord) add({ text: token.text, isSymbol: false, isSub: false });
    else {
      const { factor, base, prime, sub } = token.parts;
      add({ text: factor + base, isSymbol: true, isSub: false });
      add({ text: prime, isSymbol: false, isSub: false });
      add({ text: sub, isSymbol: GREEK_SUB.test(sub), isSub: true });
    }
  }
  return runs;
}

/** Symbol and amount, `b 300 mm`: the first is set as a symbol, the second as it stands. */
export const symbolAndAmount = (symbol: string, amount: string): TextRun[] => [
  ...textRuns(symbol, { isProse: false }),
  { text: `\u00a0${amount.replaceAll(' ', '\u00a0')}`, isSymbol: false, isSub: false },
];
