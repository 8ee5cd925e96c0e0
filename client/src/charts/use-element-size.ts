import { useEffect, useRef, useState, type RefObject } from 'react';

export interface ElementSize {
  readonly width: number;
  readonly height: number;
}

/** Inner size of an element in whole CSS pixels; null until it has been laid out. */
export function useElementSize<E extends HTMLElement>(): readonly [RefObject<E | null>, ElementSize | null] {
  const ref = useRef<E>(null);
  const [size, setSize] = useState<ElementSize | null>(null);
  useEffect(() => {
    const element = ref.current;
    if (element === null) return;
    const observer = new ResizeObserver((entries) => {
      const box = entries[0]?.contentRect;
      if (box === undefined) return;
      const next = { width: Math.round(box.width), height: Math.round(box.height) };
      setSize((now) => (now?.width === next.width && now.height === next.height ? now : next));
    });
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return [ref, size];
}
