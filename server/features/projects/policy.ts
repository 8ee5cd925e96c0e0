import type { Role } from '#shared/contract/records.ts';

/** Of those who can read the project at all (see http/project-access.ts). */
export const CREATE_PROJECT: readonly Role[] = ['admin', 'engineer'];
export const EDIT_PROJECT: readonly Role[] = ['admin', 'engineer'];
export const EDIT_PRICE_BOOK: readonly Role[] = ['admin', 'estimator'];
export const SET_MEMBERS: readonly Role[] = ['admin', 'engineer'];

/** Who leaves by own hand could not come back; an admin can, and reaches the project anyway. */
export const canLeaveByOwnHand = ({ role }: { readonly role: Role }): boolean => role === 'admin';
