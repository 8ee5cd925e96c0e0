/** Unsaved work of this browser tab, kept over a reload, a lost session and going back. */
export interface SessionDraft<T> {
  readonly read: (id: string) => T | null;
  readonly write: (id: string, value: T) => void;
  readonly drop: (id: string) => void;
}

/**
 * Drafts of one kind of form, as JSON: NaN comes back as null, an unreadable number as an empty field. `kind` carries a
 * number, raised when the form changes shape, so that an old draft is not taken for a new one.
 */
export function sessionDraft<T>(kind: string): SessionDraft<T> {
  const keyOf = (id: string) => `draft ${kind} ${id}`;
  return {
    read: (id) => {
      const text = sessionStorage.getItem(keyOf(id));
      if (text === null) return null;
      try {
        return JSON.parse(text) as T;
      } catch {
        sessionStorage.removeItem(keyOf(id));
        return null;
      }
    },
    write: (id, value) => sessionStorage.setItem(keyOf(id), JSON.stringify(value)),
    drop: (id) => sessionStorage.removeItem(keyOf(id)),
  };
}
