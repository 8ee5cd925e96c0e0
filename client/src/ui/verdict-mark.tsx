import { type Verdict } from './verdict.ts';

const TEXT: Readonly<Record<Verdict, string>> = {
  meets: 'text-meets',
  near: 'text-near',
  fails: 'text-fails',
};
const WORD: Readonly<Record<Verdict, string>> = { meets: 'meets', near: 'at limit', fails: 'fails' };

const PATH: Readonly<Record<Verdict, string>> = {
  meets: 'M2 6.5 5 9.5 10 3',
  near: 'M1.5 8.5h9M6 2v6.5',
  fails: 'M2.5 2.5l7 7M9.5 2.5l-7 7',
};

/** The verdict as a shape and a word; colour only repeats it. */
export function VerdictMark({ verdict, word }: { readonly verdict: Verdict; readonly word?: string }) {
  return (
    <span className={`inline-flex items-center gap-1.5 text-xs font-medium ${TEXT[verdict]}`}>
      <svg viewBox="0 0 12 12" className="size-3 shrink-0" aria-hidden="true">
        <path d={PATH[verdict]} fill="none" stroke="currentColor" strokeWidth="1.8" />
      </svg>
      {word ?? WORD[verdict]}
    </span>
  );
}
