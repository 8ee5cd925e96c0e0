import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { Ranking } from '#shared/contract/ranking.ts';
import type { Run } from '#shared/contract/records.ts';
import { viewOf, type View } from '#shared/sweep/problem.ts';
import { call } from '#client/src/lib/api.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { ratesText, type AskedRates } from './asked-rates.ts';

/** The run's sections at other rates. */
export interface RankedRun {
  /** Null where the run's own rates are asked for, or may not be changed. */
  readonly asked: AskedRates | null;
  /** Null until it has come. */
  readonly ranking: Ranking | null;
  /** The run as it would be at the rates ranked by; the run itself where none were asked for. */
  readonly run: Run;
  readonly isBusy: boolean;
  readonly error: Error | null;
  readonly retry: () => void;
  /** Whether this reader may ask for other rates of this run. */
  readonly isOffered: boolean;
}

interface RankingWish {
  readonly view: View;
  readonly rates: AskedRates | null;
  readonly bandShare: number;
}

/** Ranks the run at the rates asked for: the service does, from the sections the run kept. */
export function useRanking(run: Run, { view, rates, bandShare }: RankingWish): RankedRun {
  const isOffered = useMay('see-rates') && run.state === 'finished' && run.method === 'every-section';
  const asked = isOffered ? rates : null;
  const query = useQuery<Ranking>({
    queryKey: queryKeys.ranking(run.id, JSON.stringify(viewOf(view)), ratesText(asked) ?? '', bandShare),
    queryFn: ({ signal }) =>
      call('rankRun', {
        params: { id: run.id },
        body: {
          view: viewOf(view),
          rates: { base: asked!.base, changes: { ...asked!.changes } },
          filters: {},
          bandShare,
        },
        signal,
      }),
    enabled: asked !== null,
    placeholderData: keepPreviousData,
    structuralSharing: false,
  });
  const ranking = asked === null ? null : (query.data ?? null);
  const rankedRates = ranking?.rates;
  const ranked = useMemo(
    () => (rankedRates === undefined ? run : { ...run, basis: { ...run.basis, rates: rankedRates } }),
    [run, rankedRates],
  );
  return {
    asked,
    ranking,
    run: ranked,
    isBusy: asked !== null && query.isFetching,
    error: asked === null ? null : query.error,
    retry: () => void query.refetch(),
    isOffered,
  };
}
