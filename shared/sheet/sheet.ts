import type { UnitSystem } from '../contract/design-basis.ts';
import type { CurvePlanInput } from '../drawing/curve-plan.ts';
import type { SectionGeometry } from '../drawing/section-geometry.ts';
import type { SectionInput } from '../engine/section.ts';
import type { DisplayKind } from '../print/units.ts';

/**
 * A calculation sheet as plain data: every word and digit of it is written here, once, and the page and the PDF only set
 * them. Made from the frozen snapshot alone; nothing is computed anew.
 */
export interface Sheet {
  readonly title: string;
  readonly subtitle: string;
  readonly units: UnitSystem;
  readonly verdict: { readonly meets: boolean; readonly text: string };
  readonly inputs: readonly InputGroup[];
  readonly drawing: { readonly section: SectionInput; readonly geometry: SectionGeometry };
  readonly conventions: readonly string[];
  readonly parts: readonly SheetPart[];
  readonly caution: readonly string[];
  readonly notChecked: readonly string[];
  readonly frozen: readonly KeyText[];
  readonly signatures: readonly Signature[];
}

export interface KeyText {
  readonly label: string;
  readonly value: string;
}

export interface InputGroup {
  readonly title: string;
  /** Follows from the inputs, as where the bars stand. */
  readonly isResult?: boolean;
  readonly items: readonly KeyText[];
}

export interface Signature {
  readonly role: string;
  readonly name: string;
  readonly date: string;
}

/** One numbered line of the sheet. A checker's own value is kept against `id` and compared with `value` (stored units). */
export interface NumberedLine {
  readonly id: string;
  readonly number: number;
  readonly value: number | null;
  readonly kind: DisplayKind;
}

/** A step of the working: formula, numbers put in, result, clause. */
export interface WorkingLine extends NumberedLine {
  readonly symbol: string;
  /** What stands between symbol and formula: an equation to be solved is `from`, a rule told in words `:`. */
  readonly relation: '=' | 'from' | ':';
  readonly expression: string;
  /** Words after the formula: limits, units. */
  readonly remark: string;
  readonly inputs: readonly { readonly symbol: string; readonly text: string }[];
  readonly result: string;
  readonly clause: string;
}

export interface SheetColumn {
  readonly label: string;
  readonly isFigure: boolean;
  /** Its word says whether the row passes. */
  readonly isVerdict?: boolean;
}

export interface SheetRow extends NumberedLine {
  readonly cells: readonly string[];
  /** Where the row has a verdict: whether it passes. */
  readonly passes?: boolean;
  readonly note?: string;
  /** Stands out among its neighbours. */
  readonly isStrong?: boolean;
}

export interface SheetTable {
  readonly columns: readonly SheetColumn[];
  readonly rows: readonly SheetRow[];
  /** Formulas and remarks that hold for every row. */
  readonly remarks: readonly string[];
  /** The column that a checker's own value is compared with; null where there is none. */
  readonly comparedColumn: string | null;
}

export type SheetPart = { readonly id: string; readonly title: string } & (
  | { readonly kind: 'working'; readonly lines: readonly WorkingLine[] }
  | { readonly kind: 'table'; readonly table: SheetTable }
  | { readonly kind: 'curve'; readonly plot: CurvePlanInput; readonly table: SheetTable }
);
