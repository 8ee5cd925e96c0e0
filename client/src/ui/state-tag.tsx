import type { StateLabel, StateMark, StateTone } from '#client/src/lib/state-labels.ts';

const TONE: Readonly<Record<StateTone, string>> = {
  ink: 'text-ink',
  muted: 'text-muted',
  meets: 'text-meets',
  near: 'text-near',
  fails: 'text-fails',
  steel: 'text-steel',
};

const ring = <circle cx="6" cy="6" r="4.6" fill="none" stroke="currentColor" strokeWidth="1.4" />;

const MARK: Readonly<Record<StateMark, React.ReactNode>> = {
  ring,
  half: (
    <>
      {ring}
      <path d="M6 1.4a4.6 4.6 0 0 0 0 9.2z" fill="currentColor" />
    </>
  ),
  full: <circle cx="6" cy="6" r="5.3" fill="currentColor" />,
  struck: (
    <>
      {ring}
      <path d="M2.8 9.2 9.2 2.8" stroke="currentColor" strokeWidth="1.4" />
    </>
  ),
  dashed: (
    <circle
      cx="6"
      cy="6"
      r="4.6"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.4"
      strokeDasharray="2 1.6"
    />
  ),
  cross: <path d="M2 2l8 8M10 2l-8 8" stroke="currentColor" strokeWidth="1.8" />,
};

/** A state as a mark and a word; colour only repeats it. */
export function StateTag({ word, mark, tone }: StateLabel) {
  return (
    <span className={`inline-flex items-center gap-1.5 text-sm font-medium whitespace-nowrap ${TONE[tone]}`}>
      <svg viewBox="0 0 12 12" className="size-3 shrink-0" aria-hidden="true">
        {MARK[mark]}
      </svg>
      {word}
    </span>
  );
}
