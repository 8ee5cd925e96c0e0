import type { Role } from '#shared/contract/records.ts';

export const EDIT_BEAMS: readonly Role[] = ['admin', 'engineer'];
