import type { DisplayKind } from '../print/units.ts';

/** Significant figures of a sheet: four, and five where numbers are added up and compared (forces, moments). */
export const figuresOf = (kind: DisplayKind): number => (kind === 'force' || kind === 'moment' ? 5 : 4);
