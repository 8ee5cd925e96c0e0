import { queryOptions } from '@tanstack/react-query';
import { ENGINE_VERSION } from '#shared/engine/version.ts';
import { computeTopic, type TopicResult } from '#shared/verification/book.ts';
import { TOPICS } from '#shared/verification/topics.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';

const nextTask = () => new Promise<void>((resolve) => setTimeout(resolve));

/** Computes every case of the book in this browser, one topic a task so that the page stays free in between. */
export const bookQuery = () =>
  queryOptions({
    queryKey: queryKeys.verification(ENGINE_VERSION),
    queryFn: async () => {
      const results: TopicResult[] = [];
      for (const topic of TOPICS) {
        await nextTask();
        results.push(computeTopic(topic));
      }
      return results;
    },
    // Nothing is fetched: the answer stays true as long as the engine, and computing again would fail again.
    networkMode: 'always',
    staleTime: Infinity,
    retry: false,
  });
