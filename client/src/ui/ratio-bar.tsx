import { formatNumber } from '#shared/print/format-quantity.ts';
import { judge, type Verdict } from './verdict.ts';
import { VerdictMark } from './verdict-mark.tsx';

/** The limit's tick stands here, so that a bar past its limit has room to show by how much. */
const LIMIT_AT = 0.75;
const FULL_SCALE = 1 / LIMIT_AT;

const FILL: Readonly<Record<Verdict, string>> = {
  meets: 'bg-meets',
  near: 'bg-near-mark',
  fails: 'hatched border border-fails',
};

interface RatioBarProps {
  /** Demand over capacity; null where the check has no number. */
  readonly ratio: number | null;
  readonly passes: boolean;
  /** For counts, where meeting the limit exactly is the rule and nothing to look at twice. */
  readonly isExact?: boolean;
}

/** A check as a bar against its limit, with the number, and the verdict as a mark and a word. */
export function RatioBar({ ratio, passes, isExact = false }: RatioBarProps) {
  const verdict = judge(isExact ? null : ratio, passes);
  const share = ratio === null ? 0 : Math.min(Math.max(ratio, 0), FULL_SCALE) / FULL_SCALE;
  return (
    <span className="@container block">
      <span className="grid grid-cols-[3rem_4.6rem] items-center gap-x-2 @[11rem]:grid-cols-[minmax(3rem,1fr)_3.2rem_4.6rem]">
        <span className="relative col-span-2 block h-4 @[11rem]:col-span-1" aria-hidden="true">
          {ratio !== null && (
            <>
              <span
                className={`absolute top-1 left-0 h-2 ${FILL[verdict]}`}
                style={{ width: `${share * 100}%` }}
              />
              <span
                className="absolute inset-y-0 border-l border-ink"
                style={{ left: `${LIMIT_AT * 100}%` }}
              />
            </>
          )}
        </span>
        <span className="num text-right">{ratio === null ? '' : formatRatio(ratio)}</span>
        <VerdictMark verdict={verdict} />
      </span>
    </span>
  );
}

/** Two decimals, and never `1.00` for a ratio that is past its limit. */
function formatRatio(ratio: number): string {
  if (ratio > 99) return '> 99';
  if (ratio > 1 && ratio < 1.005) return formatNumber(ratio, 4);
  return ratio.toFixed(2);
}
