import { useSyncExternalStore } from 'react';
import type { ChartColours } from './front-chart-input.ts';

const TOKEN: Readonly<Record<keyof ChartColours, string>> = {
  paper: '--paper',
  ink: '--ink',
  muted: '--muted',
  rule: '--rule',
  steel: '--steel',
  meets: '--meets',
  near: '--near-mark',
};

let cached: { readonly key: string; readonly colours: ChartColours } | null = null;

/** A canvas cannot read style sheets, so the tokens are read for it; the same object as long as they are the same. */
function readColours(): ChartColours {
  const style = getComputedStyle(document.documentElement);
  const entries = Object.entries(TOKEN).map(([name, token]) => [name, style.getPropertyValue(token).trim()]);
  const key = entries.map(([, value]) => value).join();
  if (cached?.key !== key) cached = { key, colours: Object.fromEntries(entries) as ChartColours };
  return cached.colours;
}

function watchTheme(onChange: () => void): () => void {
  const dark = matchMedia('(prefers-color-scheme: dark)');
  const observer = new MutationObserver(onChange);
  observer.observe(document.documentElement, { attributes: true, attributeFilter: ['data-theme', 'class'] });
  dark.addEventListener('change', onChange);
  return () => {
    observer.disconnect();
    dark.removeEventListener('change', onChange);
  };
}

export const useChartColours = (): ChartColours => useSyncExternalStore(watchTheme, readColours);
