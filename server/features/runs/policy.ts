import type { Person, Role } from '#shared/contract/records.ts';
import type { View } from '#shared/sweep/problem.ts';
import { canSeeRates } from '../../http/project-access.ts';

export const RUNNERS: readonly Role[] = ['admin', 'engineer'];

const isCostView = ({ x, y, z }: View): boolean => [x, y, z].includes('costPerM');

/** A view that ranks by cost shows costs. */
export const canSeeView = (person: Pick<Person, 'role'>, view: View): boolean =>
  canSeeRates(person) || !isCostView(view);
