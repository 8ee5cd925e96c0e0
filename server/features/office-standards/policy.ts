import type { Role } from '#shared/contract/records.ts';

/** The office’s own people; viewers are clients and contractors. */
export const READ_OFFICE_STANDARDS: readonly Role[] = ['admin', 'engineer', 'checker', 'estimator'];
export const EDIT_OFFICE_STANDARDS: readonly Role[] = ['admin'];
