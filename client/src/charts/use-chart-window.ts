import { useCallback, useEffect, useMemo, useRef, useState } from 'react';
import { heldExtents, windowExtents, windowOf, type ChartWindow, type Extents } from './chart-window.ts';
import type { ChartAxis } from './front-chart-input.ts';

/** A turn of the wheel is many small steps; the address learns of the last one. */
const SETTLED_MS = 250;

interface WindowProps {
  readonly x: ChartAxis;
  readonly y: ChartAxis;
  readonly window: ChartWindow | null;
  readonly onWindow: (window: ChartWindow | null) => void;
}

/** What is shown: the whole, the window of the address, or one a hand is just choosing. */
export function useChartWindow({ x, y, window, onWindow }: WindowProps, whole: Extents) {
  const [draft, setDraft] = useState<{
    readonly from: ChartWindow | null;
    readonly extents: Extents | null;
  } | null>(null);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  useEffect(() => () => clearTimeout(timer.current), []);
  const settled = useMemo(() => (window === null ? null : windowExtents(window, { x, y })), [window, x, y]);
  // A draft is of the window it began from; any other window in the address has overtaken it.
  const drafted = draft !== null && draft.from === window ? draft : null;
  const extents = (drafted === null ? settled : drafted.extents) ?? whole;

  const latest = useRef({ extents, whole, window, x, y, onWindow });
  useEffect(() => {
    latest.current = { extents, whole, window, x, y, onWindow };
  });
  const show = useCallback((wanted: Extents | null) => {
    const now = latest.current;
    const next = wanted === null ? null : heldExtents(wanted, now.extents, now.whole);
    latest.current = { ...now, extents: next ?? now.whole };
    setDraft({ from: now.window, extents: next });
    clearTimeout(timer.current);
    timer.current = setTimeout(
      () => latest.current.onWindow(next === null ? null : windowOf(next, latest.current)),
      SETTLED_MS,
    );
  }, []);
  const change = useCallback((by: (now: Extents) => Extents) => show(by(latest.current.extents)), [show]);
  return { extents, show, change, isWhole: extents === whole };
}
