import { z } from 'zod';

/** Number schemas with plain messages; every limit is a bound of the trade, generous, to catch slips of unit. */
const finite = (label: string) =>
  z.number({ error: `${label} must be a number` }).refine(Number.isFinite, `${label} must be a number`);

export const bounded = (label: string, low: number, high: number, unit: string) =>
  finite(label)
    .refine((v) => v >= low, `${label} must be at least ${low} ${unit}`.trim())
    .refine((v) => v <= high, `${label} must be at most ${high} ${unit}`.trim());

export const nonEmptyText = (label: string, max: number) =>
  z
    .string({ error: `${label} is missing` })
    .trim()
    .min(1, `${label} is missing`)
    .max(max, `${label} is longer than ${max} characters`);

/** Limits shared by every schema that carries the quantity (SI). */
export const widthMmSchema = bounded('Width b', 50, 5000, 'mm');
export const depthMmSchema = bounded('Depth h', 50, 5000, 'mm');
export const fcMPaSchema = bounded('Concrete strength f′c', 10, 120, 'MPa');
export const fyMPaSchema = bounded('Yield strength fy', 200, 700, 'MPa');
export const coverMmSchema = bounded('Clear cover', 0, 200, 'mm');
/**
 * Least area of steel, mm²: the thinnest bar there is has 28. Far below one there is no steel to speak of, and strains
 * come out beyond every number.
 */
const LEAST_STEEL_MM2 = 1;
export const steelAreaSchema = (label: string) =>
  bounded(label, 0, 1e6, 'mm²').refine(
    (v) => v === 0 || v >= LEAST_STEEL_MM2,
    `${label} must be 0, or at least ${LEAST_STEEL_MM2} mm²`,
  );
export const momentNmmSchema = bounded('Moment Mu', 0, 1e12, 'N·mm');
export const shearNSchema = bounded('Shear Vu', 0, 1e9, 'N');
export const spanMmSchema = bounded('Span', 100, 100_000, 'mm');
export const idSchema = z.uuid('This is not a known id');
