import { createContext, useContext } from 'react';
import type { Person } from '#shared/contract/records.ts';
import { isAllowed, type Action } from './permissions.ts';

/** The person signed in; null on pages that need no sign-in. */
export const ReaderContext = createContext<Person | null>(null);

export function useReader(): Person {
  const reader = useContext(ReaderContext);
  if (reader === null) throw new Error('This part of the page needs a signed-in person');
  return reader;
}

/** Whether an action is offered to the reader; the server decides in the end. */
export const useMay = (action: Action): boolean => isAllowed(useReader().role, action);
