import type { BoundsProof, ViewResult } from '#shared/sweep/result.ts';
import { formatNumber, formatWhole } from '#shared/print/format-quantity.ts';
import { KeyValue } from '#client/src/ui/key-value.tsx';

/** Why nothing is counted in a run by bounds, and what to do for whoever needs the counts. */
export function NotCounted() {
  return (
    <p className="max-w-prose text-sm text-muted">
      By bounds most sections are ruled out in groups and never evaluated one by one. How many meet every
      check, and which check took how many, is not known then. A sweep of narrower ranges that evaluates every
      section tells.
    </p>
  );
}

/** What a search by bounds can say of the sections that are not on the front. */
export function BoundsLedger({
  result,
  bounds,
}: {
  readonly result: ViewResult;
  readonly bounds: BoundsProof;
}) {
  const { sectionCount, evaluated } = result;
  const { provenUnnecessary, boxes, isProven } = bounds;
  const withShare = (count: number) =>
    sectionCount === 0
      ? formatWhole(count)
      : `${formatWhole(count)}, ${formatNumber((count / sectionCount) * 100, 3, true)} %`;
  const items = [
    { label: 'Sections in the space', value: formatWhole(sectionCount) },
    { label: 'Evaluated one by one', value: withShare(evaluated) },
    { label: 'Ruled out in groups', value: withShare(provenUnnecessary) },
    ...(isProven
      ? []
      : [{ label: 'Not settled', value: withShare(sectionCount - evaluated - provenUnnecessary) }]),
    { label: 'Groups looked at', value: formatWhole(boxes) },
  ];
  return <KeyValue className="max-w-xl text-sm" items={items} />;
}
