import { useDeferredValue, useMemo } from 'react';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Run } from '#shared/contract/records.ts';
import type { ViewResult } from '#shared/sweep/result.ts';
import { pricesOfChecks } from './price-of-checks.ts';
import { readableView } from './readable-view.ts';
import { useCancelRun, useRunEvents, useView } from './run-api.ts';
import { createSectionSource, type SectionSource } from './section-source.ts';
import { useRunAddress } from './use-run-address.ts';
import { isUnderWay } from './view-progress.ts';

/**
 * A section someone asked for by its number; else the best one; else, where none meets every check, the nearest. A
 * number outside the space is as if not given.
 */
function chosenIndex(source: SectionSource, asked: number | null, result: ViewResult | null): number | null {
  if (asked !== null && asked < source.size) return asked;
  if (result === null) return null;
  return result.front[0]?.index ?? pricesOfChecks(result)[0]?.index ?? null;
}

/** Everything a run's page shows, from the address, the service and the engine. */
export function useRunView(run: Run, units: UnitSystem) {
  const address = useRunAddress(run.definition.view);
  const { x, y } = address.view;
  const view = useMemo(() => readableView(run, { x, y }, units), [run, x, y, units]);
  const { definition, basis } = run;
  const source = useMemo(() => createSectionSource({ definition, basis }), [definition, basis]);
  const query = useView(run, view);
  const latest = query.data ?? null;
  // The drawing of a part waits for the hand: a click on Cancel is never queued behind a chart.
  const progress = useDeferredValue(latest);
  const isLive = isUnderWay(latest?.state ?? run.state);
  useRunEvents(run.id, isLive);
  const cancel = useCancelRun(run.id);
  const reader = useMemo(() => ({ units, currency: basis.rates?.currency ?? null }), [units, basis.rates]);

  const result = progress?.result ?? null;
  const index = chosenIndex(source, address.index, result);
  const selected = useMemo(() => (index === null ? null : source.evaluatedAt(index)), [source, index]);
  return {
    address,
    view,
    source,
    reader,
    latest,
    progress,
    result,
    selected,
    isLive,
    cancel,
    error: query.error,
    retry: () => void query.refetch(),
  };
}
