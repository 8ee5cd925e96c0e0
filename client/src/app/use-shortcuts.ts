import { useEffect } from 'react';
import { useNavigate, useParams } from 'react-router-dom';
import { paths, type ProjectTab } from '#client/src/lib/paths.ts';

/** Second key after `g` → where it goes. Pages of a project need one open. */
export const GO_TO: readonly {
  readonly key: string;
  readonly name: string;
  readonly tab: ProjectTab | null;
}[] = [
  { key: 'p', name: 'Projects', tab: null },
  { key: 'b', name: 'Beams of this project', tab: 'beams' },
  { key: 's', name: 'Sweeps of this project', tab: 'sweeps' },
  { key: 'c', name: 'Shortlist of this project', tab: 'shortlist' },
  { key: 'd', name: 'Design basis of this project', tab: 'basis' },
];

/** The second key must follow within this time, or a lone `g` would lie in wait for ever. */
const SECOND_KEY_WITHIN_MS = 1200;

const isTyping = (target: EventTarget | null): boolean =>
  target instanceof HTMLElement &&
  (target.isContentEditable || ['INPUT', 'TEXTAREA', 'SELECT'].includes(target.tagName));

/** Ctrl K, or ⌘ K, also while a field is being typed in: nothing else is written by it. */
const isPaletteKey = ({ key, ctrlKey, metaKey, altKey, shiftKey }: KeyboardEvent): boolean =>
  key.toLowerCase() === 'k' && (ctrlKey || metaKey) && !altKey && !shiftKey;

export function useShortcuts(openHelp: () => void, openPalette: () => void): void {
  const navigate = useNavigate();
  const { projectId } = useParams();
  useEffect(() => {
    let wentAt = Number.NEGATIVE_INFINITY;
    const onKey = (event: KeyboardEvent) => {
      const isInDialog = document.querySelector('[role="dialog"]') !== null;
      if (isPaletteKey(event)) {
        event.preventDefault();
        if (!isInDialog) openPalette();
        return;
      }
      if (event.ctrlKey || event.metaKey || event.altKey || isTyping(event.target) || isInDialog) return;
      if (event.key === '?') openHelp();
      else if (event.key === 'g') wentAt = event.timeStamp;
      else if (event.timeStamp - wentAt < SECOND_KEY_WITHIN_MS) {
        wentAt = Number.NEGATIVE_INFINITY;
        const goal = GO_TO.find(({ key }) => key === event.key);
        if (goal === undefined) return;
        if (goal.tab === null) void navigate(paths.projects());
        else if (projectId !== undefined) void navigate(paths.project(projectId, goal.tab));
      } else return;
      event.preventDefault();
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, [navigate, openHelp, openPalette, projectId]);
}
