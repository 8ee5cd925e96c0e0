import { useCallback, useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { View } from '#shared/sweep/problem.ts';
import { readRunAddress, type AddressPart, type RunAddress } from './run-address.ts';

export interface RunAddressControls extends RunAddress {
  readonly write: (part: AddressPart) => void;
  readonly select: (index: number) => void;
}

/** Everything one sees of a run, kept in the address: it can be sent to a colleague as it is, and nothing resets itself. */
export function useRunAddress(first: View): RunAddressControls {
  const [params, setParams] = useSearchParams();
  const address = useMemo(() => readRunAddress(params, first), [params, first]);
  const write = useCallback(
    (part: AddressPart) =>
      setParams(
        (now) => {
          const next = new URLSearchParams(now);
          for (const [key, value] of Object.entries(part)) {
            if (value === null) next.delete(key);
            else next.set(key, value);
          }
          return next;
        },
        // At once: of two keys pressed in quick succession the second must begin where the first one led.
        { replace: true, preventScrollReset: true, flushSync: true },
      ),
    [setParams],
  );
  const select = useCallback((index: number) => write({ i: String(index) }), [write]);
  return useMemo(() => ({ ...address, write, select }), [address, write, select]);
}
