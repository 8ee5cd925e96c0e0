import { useEffect, useRef } from 'react';

/** Something that can be done on the page that is open, by name. */
export interface PageAction {
  readonly name: string;
  /** The key that does the same, if any. */
  readonly key?: string;
  readonly act: () => void;
}

const offered = new Set<() => readonly PageAction[]>();

/** What the parts of the page that is open have to offer, in the order in which they came up. */
export const pageActions = (): readonly PageAction[] => [...offered].flatMap((ofPart) => ofPart());

/** Offers what this part of the page can do under Ctrl K, for as long as it is shown. */
export function usePageActions(actions: readonly PageAction[]): void {
  const latest = useRef(actions);
  useEffect(() => {
    latest.current = actions;
  });
  useEffect(() => {
    const ofThisPart = () => latest.current;
    offered.add(ofThisPart);
    return () => void offered.delete(ofThisPart);
  }, []);
}
