import { readFileSync } from 'node:fs';

/** Inputs and results of a case are numbers, texts and lists in the units its source prints. */
export type CaseValue = number | string | null | readonly CaseValue[] | { readonly [key: string]: CaseValue };

/** The inputs by the name the case file gives them; a case has those its source prints. */
export interface CaseInputs {
  readonly b: number;
  readonly h: number;
  readonly d: number;
  readonly d2: number;
  readonly As: number;
  readonly fc: number;
  readonly fy: number;
  readonly Es: number;
  readonly Ecc: number;
  readonly M: number;
  readonly Mu: number;
  readonly bf: number;
  readonly b_eff: number;
  readonly d_support: number;
  readonly d_midspan: number;
  readonly fdc: number;
  readonly fdy: number;
  readonly span_ft: number;
}

/** How a case is computed with the engine; keys of the result are the names in its `expected`. */
export type ComputeCase = (
  inputs: CaseInputs,
  raw: PublishedCase['inputs'],
) => { readonly [key: string]: CaseValue };

/** A list of an input. */
export const listOf = <T>(raw: PublishedCase['inputs'], name: string) => raw[name] as unknown as readonly T[];

/** One published worked example, table or rule, as kept in cases/published-cases.json. */
export interface PublishedCase {
  readonly id: string;
  readonly topic: string;
  readonly source: string;
  /** `read` from the source, or from `memory`. */
  readonly provenance: 'read' | 'memory';
  readonly inputs: { readonly [key: string]: CaseValue };
  readonly expected: { readonly [key: string]: CaseValue };
  readonly tolerance: number;
  readonly abs_tolerance?: { readonly [key: string]: number };
}

export const PUBLISHED_CASES = JSON.parse(
  readFileSync(new URL('./cases/published-cases.json', import.meta.url), 'utf8'),
) as readonly PublishedCase[];

/** One printed number beside ours. */
export interface Comparison {
  readonly name: string;
  readonly printed: number;
  readonly computed: number;
  readonly relative: number;
  readonly isWithin: boolean;
}

/** Printed values a case leaves out on purpose are null. */
function compareOne(
  { published, name, key }: { published: PublishedCase; name: string; key: string },
  printed: number,
  computed: number,
): Comparison {
  const absolute = published.abs_tolerance?.[key];
  const difference = Math.abs(computed - printed);
  const relative = printed === 0 ? difference : difference / Math.abs(printed);
  const isWithin = absolute === undefined ? relative <= published.tolerance : difference <= absolute;
  return { name, printed, computed, relative, isWithin };
}

/** Every printed number of a case against the computed one of the same name and place. */
export function compare(
  published: PublishedCase,
  computed: { readonly [key: string]: CaseValue },
): Comparison[] {
  const walk = (name: string, key: string, printed: CaseValue, ours: CaseValue | undefined): Comparison[] => {
    if (printed === null) return [];
    if (typeof printed === 'number')
      return [compareOne({ published, name, key }, printed, typeof ours === 'number' ? ours : NaN)];
    if (Array.isArray(printed))
      return printed.flatMap((item: CaseValue, i) =>
        walk(`${name}[${i}]`, key, item, (ours as readonly CaseValue[] | undefined)?.[i]),
      );
    throw new Error(`${published.id} ${name} is not a number`);
  };
  return Object.entries(published.expected)
    .filter(([key]) => key in computed)
    .flatMap(([key, printed]) => walk(key, key, printed, computed[key]));
}
