import { useDeferredValue, useMemo } from 'react';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Run, ViewProgress } from '#shared/contract/records.ts';
import { viewOf, type View } from '#shared/sweep/problem.ts';
import type { Point, ViewResult } from '#shared/sweep/result.ts';
import type { ExploreKey } from '#shared/sweep/explore-axis.ts';
import { exploreKeys, usualAxes } from './explore-keys.ts';
import { pricesOfChecks } from './price-of-checks.ts';
import { readableView } from './readable-view.ts';
import { useCancelRun, useRunEvents, useView } from './run-api.ts';
import { createSectionSource, type EvaluatedSection, type SectionSource } from './section-source.ts';
import { useExplore } from './use-explore.ts';
import { askedView } from './run-address.ts';
import { useRanking, type RankedRun } from './use-ranking.ts';
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

/** Where the chosen section stands on the chart; null where it has no numbers, as one whose bars do not fit. */
function placeOf(chosen: EvaluatedSection | null, { x, y }: View): Point | null {
  const across = chosen?.evaluation.measures[x] ?? null;
  const up = chosen?.evaluation.measures[y] ?? null;
  return chosen === null || across === null || up === null ? null : { index: chosen.index, x: across, y: up };
}

/** The view with the ranking's result where other rates are asked for; nothing until that has come. */
function atRates(progress: ViewProgress | null, { asked, ranking }: RankedRun): ViewProgress | null {
  if (asked === null || progress === null) return progress;
  return { ...progress, result: ranking?.result ?? null };
}

const NO_KEYS: readonly ExploreKey[] = [];

/** The view, live or finished, and how it comes: what the service is asked and told. */
function useProgress(run: Run, view: View) {
  const query = useView(run, view);
  const latest = query.data ?? null;
  // The drawing of a part waits for the hand: a click on Cancel is never queued behind a chart.
  const progress = useDeferredValue(latest);
  const isLive = isUnderWay(latest?.state ?? run.state);
  useRunEvents(run.id, isLive);
  return { latest, progress, isLive, error: query.error, retry: () => void query.refetch() };
}

/** Everything a run's page shows, from the address, the service and the engine. */
export function useRunView(run: Run, units: UnitSystem) {
  const address = useRunAddress(run.definition.view);
  const { x, y, z } = askedView(address);
  const view = useMemo(() => readableView(run, viewOf({ x, y, z }), units), [run, x, y, z, units]);
  const ranked = useRanking(run, { view, rates: address.rates, bandShare: address.bandShare });
  // The run as it would be at the rates asked for; its own record stays what the head and the pins go by.
  const { definition, basis } = ranked.run;
  const source = useMemo(() => createSectionSource({ definition, basis }), [definition, basis]);
  const reader = useMemo(
    () => ({ units, currency: basis.rates?.currency ?? null, code: basis.ruleSet }),
    [units, basis.rates, basis.ruleSet],
  );
  const own = useProgress(run, view);
  const { latest, isLive, error, retry } = own;
  const progress = useMemo(() => atRates(own.progress, ranked), [own.progress, ranked]);
  const cancel = useCancelRun(run.id);

  const result = progress?.result ?? null;
  const index = chosenIndex(source, address.index, result);
  const selected = useMemo(() => (index === null ? null : source.evaluatedAt(index)), [source, index]);
  const place = useMemo(() => placeOf(selected, view), [selected, view]);

  const keys = useMemo(
    () => exploreKeys({ definition, basis }, source.space, units),
    [definition, basis, source, units],
  );
  const axes = useMemo(
    () => address.axes?.filter((key) => keys.includes(key)) ?? usualAxes(keys),
    [address.axes, keys],
  );
  const explore = useExplore({
    run: ranked.run,
    view,
    result,
    isFinished: progress?.state === 'finished',
    source,
    address,
    keys: address.panel === 'ranges' ? axes : NO_KEYS,
  });
  return {
    address,
    ranked,
    view,
    source,
    reader,
    latest,
    progress,
    result,
    /** What the run found itself, at its own rates. */
    recorded: own.progress?.result ?? null,
    selected,
    place,
    isLive,
    cancel,
    error,
    retry,
    keys,
    axes,
    explore,
  };
}
