/**
 * Whether a person has seen the first steps, kept in their browser: what it costs to be wrong is one click on "Skip", and
 * two people at one machine are told apart.
 */
const keyOf = (personId: string): string => `fairweight.first-steps.${personId}`;

export function hasSeenFirstSteps(personId: string): boolean {
  try {
    return localStorage.getItem(keyOf(personId)) !== null;
  } catch {
    // Storage switched off: they would come up on every page.
    return true;
  }
}

export function rememberFirstSteps(personId: string): void {
  try {
    localStorage.setItem(keyOf(personId), 'seen');
  } catch {
    // Nothing is kept, and nothing shown either, see above.
  }
}
