import type { BelowPrinted, CaseValue, ComputeCase, ComputedValue, PublishedCase } from './published-case.ts';

/** What a computed value is held to: a relative or an absolute tolerance, or to lie below the printed one. */
export type Allowed =
  | { readonly kind: 'relative'; readonly by: number }
  | { readonly kind: 'absolute'; readonly by: number }
  | { readonly kind: 'below'; readonly because: string };

/** One printed number beside ours. */
export interface Comparison {
  readonly name: string;
  readonly printed: number;
  readonly computed: number;
  /** Of the printed value; the plain difference where that is zero. */
  readonly relative: number;
  readonly allowed: Allowed;
  readonly isWithin: boolean;
}

const isBelowPrinted = (value: ComputedValue | undefined): value is BelowPrinted =>
  typeof value === 'object' && 'belowPrinted' in value;

function compareOne(
  printed: number,
  ours: ComputedValue | undefined,
  tolerance: { readonly relative: number; readonly absolute: number | undefined },
): Omit<Comparison, 'name'> {
  const computed = isBelowPrinted(ours) ? ours.belowPrinted : typeof ours === 'number' ? ours : NaN;
  const difference = Math.abs(computed - printed);
  const relative = printed === 0 ? difference : difference / Math.abs(printed);
  const shared = { printed, computed, relative };
  if (isBelowPrinted(ours))
    return { ...shared, allowed: { kind: 'below', because: ours.because }, isWithin: computed < printed };
  if (tolerance.absolute !== undefined)
    return {
      ...shared,
      allowed: { kind: 'absolute', by: tolerance.absolute },
      isWithin: difference <= tolerance.absolute,
    };
  return {
    ...shared,
    allowed: { kind: 'relative', by: tolerance.relative },
    isWithin: relative <= tolerance.relative,
  };
}

/** Every printed number of a case against the computed one of the same name and place; one not computed is NaN. */
export function compare(published: PublishedCase, computed: ReturnType<ComputeCase>): Comparison[] {
  const walk = (
    name: string,
    key: string,
    printed: CaseValue,
    ours: ComputedValue | undefined,
  ): Comparison[] => {
    // Printed values a case leaves out on purpose are null.
    if (printed === null) return [];
    if (typeof printed === 'number') {
      const tolerance = { relative: published.tolerance, absolute: published.abs_tolerance?.[key] };
      return [{ name, ...compareOne(printed, ours, tolerance) }];
    }
    if (Array.isArray(printed))
      return printed.flatMap((item: CaseValue, i) =>
        walk(`${name}[${i}]`, key, item, Array.isArray(ours) ? (ours as ComputedValue[])[i] : undefined),
      );
    throw new Error(`${published.id} ${name} is not a number`);
  };
  return Object.entries(published.expected).flatMap(([key, printed]) =>
    walk(key, key, printed, computed[key]),
  );
}
