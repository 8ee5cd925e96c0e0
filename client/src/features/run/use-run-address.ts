import { useCallback, useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { View } from '#shared/sweep/problem.ts';
import { readRunAddress, type RunAddress } from './run-address.ts';

export interface RunAddressControls extends RunAddress {
  readonly setView: (view: View) => void;
  readonly select: (index: number) => void;
  readonly setBandShare: (share: number) => void;
}

/** View, section and band, kept in the address: what one sees can be sent to a colleague as it is. */
export function useRunAddress(first: View): RunAddressControls {
  const [params, setParams] = useSearchParams();
  const address = useMemo(() => readRunAddress(params, first), [params, first]);
  const write = useCallback(
    (values: Readonly<Record<string, string>>) =>
      setParams(
        (now) => {
          const next = new URLSearchParams(now);
          for (const [key, value] of Object.entries(values)) next.set(key, value);
          return next;
        },
        // At once: of two keys pressed in quick succession the second must begin where the first one led.
        { replace: true, preventScrollReset: true, flushSync: true },
      ),
    [setParams],
  );
  return {
    ...address,
    setView: useCallback((view) => write({ x: view.x, y: view.y }), [write]),
    select: useCallback((index) => write({ i: String(index) }), [write]),
    setBandShare: useCallback((share) => write({ band: String(Math.round(share * 1000) / 10) }), [write]),
  };
}
