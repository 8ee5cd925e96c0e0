import type { BelowPrinted, CaseValue, ComputeCase, ComputedValue, PublishedCase } from './published-case.ts';

/** What a computed value is held to: a relative or an absolute tolerance, or to lie below the printed one. */
export type Allowed =
  | { readonly kind: 'relative'; readonly by: number }
  | { readonly kind: 'absolute'; readonly by: number }
  | { readonly kind: 'below'; readonly because: string };

export interface Place {
  /** The input whose value this is; null where no input has as many values, and the value counts from one. */
  readonly input: string | null;
  readonly value: CaseValue;
}

/** One printed number beside ours. */
export interface Comparison {
  /** Key and indices in `expected`, e.g. `b_min[0][2]`. */
  readonly name: string;
  /** The key alone. */
  readonly quantity: string;
  /** For one of a list: the inputs it belongs to, e.g. n = 2 and bars = 6. */
  readonly places: readonly Place[];
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
): Omit<Comparison, 'name' | 'quantity' | 'places'> {
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

const isList = (value: CaseValue): value is readonly CaseValue[] => Array.isArray(value);

/** The input that has as many values as a list of `length` and has not named an outer place. */
function findInputOf(published: PublishedCase, length: number, outer: readonly Place[]) {
  for (const [input, value] of Object.entries(published.inputs))
    if (isList(value) && value.length === length && !outer.some((place) => place.input === input))
      return { input, values: value };
  return undefined;
}

interface Where {
  readonly name: string;
  readonly quantity: string;
  readonly places: readonly Place[];
}

/** Every printed number of a case against the computed one of the same name and place; one not computed is NaN. */
export function compare(published: PublishedCase, computed: ReturnType<ComputeCase>): Comparison[] {
  const walk = (at: Where, printed: CaseValue, ours: ComputedValue | undefined): Comparison[] => {
    // Printed values a case leaves out on purpose are null.
    if (printed === null) return [];
    const { name, quantity, places } = at;
    if (typeof printed === 'number') {
      const tolerance = { relative: published.tolerance, absolute: published.abs_tolerance?.[quantity] };
      return [{ ...at, ...compareOne(printed, ours, tolerance) }];
    }
    if (!isList(printed)) throw new Error(`${published.id} ${name} is not a number`);
    const named = findInputOf(published, printed.length, places);
    return printed.flatMap((item, i) => {
      const place = { input: named?.input ?? null, value: named?.values[i] ?? i + 1 };
      return walk(
        { name: `${name}[${i}]`, quantity, places: [...places, place] },
        item,
        Array.isArray(ours) ? (ours as ComputedValue[])[i] : undefined,
      );
    });
  };
  return Object.entries(published.expected).flatMap(([key, printed]) =>
    walk({ name: key, quantity: key, places: [] }, printed, computed[key]),
  );
}
