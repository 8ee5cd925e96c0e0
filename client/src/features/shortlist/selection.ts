/** Fewest and most candidates that stand side by side: more no longer fit one page at one scale. */
export const COMPARE_MIN = 2;
export const COMPARE_MAX = 6;

/** Ids kept in the address, `?compare=a,b`; unknown and repeated ones are dropped. */
export function readSelection(text: string | null, known: readonly string[]): readonly string[] {
  if (text === null) return [];
  return [...new Set(text.split(','))].filter((id) => known.includes(id)).slice(0, COMPARE_MAX);
}

export function toggleSelection(selected: readonly string[], id: string): string | null {
  const next = selected.includes(id) ? selected.filter((other) => other !== id) : [...selected, id];
  return next.length === 0 ? null : next.slice(0, COMPARE_MAX).join(',');
}
