import type { Ranking } from '#shared/contract/ranking.ts';
import type { Run, ViewProgress } from '#shared/contract/records.ts';
import { formatDuration, formatWhole } from '#shared/print/format-quantity.ts';
import { feasibleClaim, proofClaim, takenClaim } from './proof-words.ts';
import { rankedClaim } from './ranking-words.ts';

/** What the result rests on: how many sections were judged, how many passed, and the mark that repeats with it. */
interface ProofLineProps {
  readonly run: Run;
  readonly progress: ViewProgress | null;
  /** What is shown instead of the run's own record; null for that. */
  readonly ranking: Ranking | null;
}

export function ProofLine({ run, progress, ranking }: ProofLineProps) {
  const result = progress?.result ?? null;
  if (progress === null || result === null)
    return <footer className="min-h-8 border-t border-ink px-4 py-1.5 sm:px-5">&nbsp;</footer>;
  if (ranking !== null)
    return (
      <footer className="num flex flex-wrap gap-x-6 gap-y-1 border-t border-ink px-4 py-1.5 text-sm sm:px-5">
        <strong className="font-semibold text-near">{rankedClaim(ranking)}</strong>
        <span>front {formatWhole(result.front.length)}</span>
        <span className="ml-auto text-muted">engine {run.engineVersion}</span>
      </footer>
    );
  const claim = proofClaim(result, progress.state);
  const taken = takenClaim(run);
  const inThree = result.frontInThree?.count ?? null;
  return (
    <footer className="num flex flex-wrap gap-x-6 gap-y-1 border-t border-ink px-4 py-1.5 text-sm sm:px-5">
      <strong className={`font-semibold ${result.front.length === 0 ? 'text-fails' : 'text-meets'}`}>
        {claim}
      </strong>
      <span className={result.feasible === null ? 'text-muted' : undefined}>{feasibleClaim(result)}</span>
      {taken !== null && <span>{taken}</span>}
      <span>front {formatWhole(result.front.length)}</span>
      {inThree !== null && <span>in three measures {formatWhole(inThree)}</span>}
      <span title="Equal for equal results, whatever the machine">{result.hash}</span>
      <span className="ml-auto text-muted">
        {formatDuration(progress.elapsedMs)}, engine {run.engineVersion}
      </span>
    </footer>
  );
}
