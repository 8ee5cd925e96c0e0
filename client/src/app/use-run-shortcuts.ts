import { useEffect, useRef } from 'react';
import type { FrontPoint } from '#shared/sweep/result.ts';
import { usePageActions } from '#client/src/lib/page-actions.ts';

/** Keys of a run's page, as the list under "?" names them. */
export const RUN_KEYS: readonly { readonly keys: readonly string[]; readonly name: string }[] = [
  { keys: ['[', ']'], name: 'Previous and next section of the front' },
  { keys: ['←', '→'], name: 'The same, on the chart and the strip' },
  { keys: ['+', '−', '0'], name: 'Enlarge the chart, reduce it, show the whole' },
  { keys: ['p'], name: 'Pin the chosen section' },
];

interface RunShortcuts {
  readonly front: readonly FrontPoint[];
  readonly selectedIndex: number | null;
  readonly onSelect: (index: number) => void;
  readonly onPin: ((index: number) => void) | null;
}

/** A second key within this time belongs to a `g` before it: `g p` goes to the projects and pins nothing. */
const AFTER_G_MS = 1200;

const isTyping = (target: EventTarget | null): boolean =>
  target instanceof HTMLElement &&
  (target.isContentEditable || ['INPUT', 'TEXTAREA', 'SELECT'].includes(target.tagName));

function act({ front, selectedIndex, onSelect, onPin }: RunShortcuts, key: string): void {
  if (key === 'p') {
    if (selectedIndex !== null) onPin?.(selectedIndex);
    return;
  }
  if (front.length === 0) return;
  const place = front.findIndex((point) => point.ties.includes(selectedIndex ?? -1));
  const to = place === -1 ? 0 : place + (key === ']' ? 1 : -1);
  onSelect(front[Math.min(Math.max(to, 0), front.length - 1)]!.index);
}

/** Keys that act wherever one is on the page and is not typing. */
export function useRunShortcuts(shortcuts: RunShortcuts): void {
  usePageActions([
    ...(shortcuts.onPin === null || shortcuts.selectedIndex === null
      ? []
      : [{ name: 'Pin the chosen section', key: 'p', act: () => act(shortcuts, 'p') }]),
    { name: 'Next section of the front', key: ']', act: () => act(shortcuts, ']') },
    { name: 'Previous section of the front', key: '[', act: () => act(shortcuts, '[') },
  ]);
  const latest = useRef(shortcuts);
  useEffect(() => {
    latest.current = shortcuts;
  });
  useEffect(() => {
    let wentAt = Number.NEGATIVE_INFINITY;
    const onKey = (event: KeyboardEvent) => {
      if (event.ctrlKey || event.metaKey || event.altKey || event.repeat || isTyping(event.target)) return;
      if (document.querySelector('[role="dialog"]') !== null) return;
      const isAfterG = event.timeStamp - wentAt < AFTER_G_MS;
      wentAt = event.key === 'g' ? event.timeStamp : Number.NEGATIVE_INFINITY;
      if (isAfterG || !['[', ']', 'p'].includes(event.key)) return;
      event.preventDefault();
      act(latest.current, event.key);
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, []);
}
