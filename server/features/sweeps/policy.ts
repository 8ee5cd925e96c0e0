import type { Role } from '#shared/contract/records.ts';

export const EDIT_SWEEPS: readonly Role[] = ['admin', 'engineer'];
