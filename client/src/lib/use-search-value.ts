import { useCallback } from 'react';
import { useSearchParams } from 'react-router-dom';

/** One value kept in the address. `read` turns the text (or its absence) into a value; null takes it out again. */
export function useSearchValue<T>(
  key: string,
  read: (text: string | null) => T,
): readonly [value: T, set: (text: string | null) => void] {
  const [params, setParams] = useSearchParams();
  const set = useCallback(
    (text: string | null) =>
      setParams(
        (now) => {
          const next = new URLSearchParams(now);
          if (text === null) next.delete(key);
          else next.set(key, text);
          return next;
        },
        // At once: a ticked box must not jump back until the address has followed, nor a second tick undo the first.
        { replace: true, preventScrollReset: true, flushSync: true },
      ),
    [key, setParams],
  );
  return [read(params.get(key)), set];
}
