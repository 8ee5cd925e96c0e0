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
  readonly bw: number;
  readonly hf: number;
  readonly b_eff: number;
  readonly d_support: number;
  readonly d_midspan: number;
  readonly fdc: number;
  readonly fdy: number;
  readonly span_ft: number;
}

/** Where a number comes from: read in its source, remembered, or worked out for this project. */
export const PROVENANCES = ['read', 'memory', 'derived'] as const;
export type Provenance = (typeof PROVENANCES)[number];

/** One published worked example, table or rule, as kept in cases/. */
export interface PublishedCase {
  readonly id: string;
  readonly topic: string;
  readonly source: string;
  readonly provenance: Provenance;
  /** What the one word leaves out, e.g. that an optimum was found again. */
  readonly provenance_note?: string;
  /** How sure a remembered value is. */
  readonly recall_confidence?: string;
  /** Worked example, table, formula without a printed number, … */
  readonly kind: string;
  readonly inputs: { readonly [key: string]: CaseValue };
  /** Units of lengths, stresses, moments and forces; null where the numbers have none or name their own. */
  readonly units?: { readonly [quantity: string]: string } | null;
  readonly expected: { readonly [key: string]: CaseValue };
  /** Relative. */
  readonly tolerance: number;
  /** In the value's own unit, for the names given; takes the place of the relative one. */
  readonly abs_tolerance?: { readonly [key: string]: number };
  readonly assumptions: string;
  /** Misprints, oddities and doubts about the source. */
  readonly flags?: readonly string[];
}

/** A computed value that must lie below the printed one, since the source assumes what is not so; says what. */
export interface BelowPrinted {
  readonly belowPrinted: number;
  readonly because: string;
}

export type ComputedValue =
  number | BelowPrinted | readonly ComputedValue[] | readonly (readonly ComputedValue[])[];

/** How a case is computed with the engine; keys of the result are the names in its `expected`. */
export type ComputeCase = (
  inputs: CaseInputs,
  raw: PublishedCase['inputs'],
) => { readonly [key: string]: ComputedValue };

/** A list of an input. */
export const listOf = <T>(raw: PublishedCase['inputs'], name: string) => raw[name] as unknown as readonly T[];
