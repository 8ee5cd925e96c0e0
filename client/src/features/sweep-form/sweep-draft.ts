import type { SweepFormValues } from './sweep-form-values.ts';

/** JSON knows no NaN: an unreadable number comes back as an empty field. */
const keyOf = (id: string): string => `sweep-draft ${id}`;

/** Unsaved work of this browser tab, kept over a reload, a lost session and going back. */
export const sweepDraft = {
  read(id: string): SweepFormValues | null {
    const text = sessionStorage.getItem(keyOf(id));
    if (text === null) return null;
    try {
      return JSON.parse(text) as SweepFormValues;
    } catch {
      sessionStorage.removeItem(keyOf(id));
      return null;
    }
  },
  write: (id: string, form: SweepFormValues): void => sessionStorage.setItem(keyOf(id), JSON.stringify(form)),
  drop: (id: string): void => sessionStorage.removeItem(keyOf(id)),
};
