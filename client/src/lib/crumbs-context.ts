import { createContext } from 'react';

/** The place in the top bar where a page writes its trail; null until the bar is there. */
export const CrumbsContext = createContext<HTMLElement | null>(null);
