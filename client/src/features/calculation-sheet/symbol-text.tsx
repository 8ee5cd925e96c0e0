import type { TextRun } from '#shared/sheet/text-runs.ts';

/** Text with its symbols slanted and their subscripts below the line. */
export function SymbolText({ runs }: { readonly runs: readonly TextRun[] }) {
  return runs.map(({ text, isSymbol, isSub }, i) => {
    const letters = isSymbol ? <i key={i}>{text}</i> : text;
    return isSub ? (
      <sub key={i} className="text-[0.72em] leading-none">
        {letters}
      </sub>
    ) : (
      letters
    );
  });
}
