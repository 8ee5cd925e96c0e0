import type { Evaluation } from '#shared/engine/evaluation.ts';

/** What the verdict covers and what it does not. Stands wherever a result is shown. */
export function LimitsNote({ evaluation }: { readonly evaluation: Evaluation }) {
  return (
    <div className="grid max-w-prose gap-2 text-sm">
      <p className={evaluation.meetsListedChecks ? 'font-semibold text-meets' : 'font-semibold text-fails'}>
        {evaluation.meetsListedChecks ? '✓ Meets the listed checks' : '✕ Does not meet every listed check'} of{' '}
        {evaluation.ruleSet.title}.
      </p>
      <p className="text-muted">Not checked: {evaluation.notChecked.join('; ')}.</p>
      <p className="text-muted">
        A licensed engineer verifies the design under the codes that apply at the site.
      </p>
    </div>
  );
}
