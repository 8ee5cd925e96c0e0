import { SUPPORTS, type Support } from '#shared/engine/section.ts';

const LABELS: Readonly<Record<Support, string>> = {
  simple: 'simply',
  'one-end-continuous': 'one end continuous',
  'both-ends-continuous': 'both ends continuous',
  cantilever: 'as a cantilever',
};

/** How a span is held, for a list; empty for not asked. */
export const SUPPORT_OPTIONS: readonly { readonly value: Support | ''; readonly label: string }[] = [
  { value: '', label: 'not asked for' },
  ...SUPPORTS.map((value) => ({ value, label: LABELS[value] })),
];
