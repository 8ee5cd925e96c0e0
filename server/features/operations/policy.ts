import type { Role } from '#shared/contract/records.ts';

/** Whoever runs the service: it names people and projects of the whole office. */
export const OPERATORS: readonly Role[] = ['admin'];
