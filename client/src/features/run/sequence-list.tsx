import { checkLabel } from '#shared/print/check-labels.ts';
import { formatNumber, formatWhole } from '#shared/print/format-quantity.ts';
import type { CheckSequence } from './check-sequence.ts';

interface RowProps {
  readonly left: number;
  readonly taken: number;
  readonly whole: number;
  readonly words: string;
  readonly isEnd?: boolean;
}

const ofWhole = (part: number, whole: number) => `${(part / whole) * 100}%`;

/** What is left stands solid; what the check took is hatched after it. */
function Row({ left, taken, whole, words, isEnd = false }: RowProps) {
  return (
    <li className="grid grid-cols-[6.5rem_minmax(0,1fr)_6.5rem] items-center gap-x-3 sm:grid-cols-[6.5rem_12rem_minmax(0,1fr)_7rem_4rem]">
      <span className="num text-right">{formatWhole(left)}</span>
      <span className={isEnd ? 'font-semibold text-meets' : ''}>{words}</span>
      <span
        className="relative order-last col-span-3 block h-2.5 border-b border-rule sm:order-none sm:col-span-1"
        aria-hidden="true"
      >
        <span
          className={`absolute inset-y-0 left-0 ${isEnd ? 'bg-meets' : 'bg-concrete-edge/50'}`}
          style={{ width: ofWhole(left, whole), minWidth: left > 0 ? 2 : 0 }}
        />
        <span
          className="hatched absolute inset-y-0 border border-concrete-edge"
          style={{
            left: ofWhole(left, whole),
            width: ofWhole(taken, whole),
            display: taken > 0 ? 'block' : 'none',
          }}
        />
      </span>
      <span className="num text-right text-muted">
        {taken > 0 && (
          <>
            −{formatWhole(taken)}
            <span className="sr-only"> taken out by it</span>
          </>
        )}
      </span>
      <span className="num hidden text-right text-muted sm:block">
        {formatNumber((left / whole) * 100, 3, true)} %
      </span>
    </li>
  );
}

/** From all sections to those that meet every check, one check after another. */
export function SequenceList({ sequence }: { readonly sequence: CheckSequence }) {
  const { evaluated, steps, idle, feasible } = sequence;
  if (evaluated === 0) return null;
  return (
    <section aria-label="One check after another">
      <p className="pb-1.5 text-xs text-muted">
        One check after another: what is left, and what each took of those the checks before it had left.
        Asked in another order, the same sections would be shared out differently.
      </p>
      <ol className="grid gap-1 text-sm">
        <Row left={evaluated} taken={0} whole={evaluated} words="evaluated" />
        {steps.map(({ check, taken, left }) => (
          <Row key={check} left={left} taken={taken} whole={evaluated} words={checkLabel(check).name} />
        ))}
        <Row left={feasible} taken={0} whole={evaluated} words="meet every check" isEnd />
      </ol>
      {idle.length > 0 && (
        <p className="pt-1.5 text-xs text-muted">
          Took none that were left to {idle.length === 1 ? 'it' : 'them'}:{' '}
          {idle.map((check) => checkLabel(check).name.toLowerCase()).join(', ')}.
        </p>
      )}
    </section>
  );
}
