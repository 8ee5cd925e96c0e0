import type { Person, Role } from '#shared/contract/records.ts';

/** Everybody of the office; viewers, who are outside it, read. */
export const SAVE_VIEWS: readonly Role[] = ['admin', 'engineer', 'checker', 'estimator'];

/** Whoever made it, whoever leads the project, and an admin. */
export const mayChangeView = (
  { id, role }: Pick<Person, 'id' | 'role'>,
  { madeBy, ledBy }: { readonly madeBy: string; readonly ledBy: string },
): boolean => SAVE_VIEWS.includes(role) && (role === 'admin' || id === madeBy || id === ledBy);

/** Ranges of cost, and rates of one's own, tell rates: views that name them are not for those who may not see any. */
export const tellsRates = (address: Readonly<Record<string, string>>): boolean =>
  /cost|rate|price/i.test(Object.entries(address).flat().join(' '));
