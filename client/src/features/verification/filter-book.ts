import type { TopicResult } from '#shared/verification/book.ts';
import { PROVENANCES, type Provenance, type PublishedCase } from '#shared/verification/published-case.ts';

export interface BookFilter {
  /** Words that must all occur in a case; empty for all cases. */
  readonly find: string;
  /** Null for all. */
  readonly topicId: string | null;
  readonly provenance: Provenance | null;
}

export const findProvenance = (text: string | null): Provenance | null =>
  PROVENANCES.find((provenance) => provenance === text) ?? null;

const textOf = (published: PublishedCase) =>
  [
    published.id,
    published.topic,
    published.source,
    published.kind,
    published.assumptions,
    ...(published.flags ?? []),
  ]
    .join(' ')
    .toLowerCase();

/** The cases that match, topic by topic; topics without one are left out. */
export function filterBook(results: readonly TopicResult[], filter: BookFilter): TopicResult[] {
  const words = filter.find.toLowerCase().split(/\s+/).filter(Boolean);
  const matches = ({ published }: { readonly published: PublishedCase }) => {
    if (filter.provenance !== null && published.provenance !== filter.provenance) return false;
    const text = textOf(published);
    return words.every((word) => text.includes(word));
  };
  return results
    .filter(({ topic }) => filter.topicId === null || topic.id === filter.topicId)
    .map(({ topic, computed, outOfScope }) => ({
      topic,
      computed: computed.filter(matches),
      outOfScope: outOfScope.filter(matches),
    }))
    .filter(({ computed, outOfScope }) => computed.length + outOfScope.length > 0);
}
