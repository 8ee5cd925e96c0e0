/** A cell of a table: words, a number, or nothing. */
export type PlainCell = string | number | null;

/**
 * Spreadsheets take words that begin with one of these for a formula, so a project named `=HYPERLINK(…)` would run where
 * the file is opened. OWASP names = + - @, tab and carriage return ("CSV Injection"); their full-width forms and the true
 * minus are read alike in some locales.
 */
const FORMULA_LIKE = /^[=+\-@\t\r\n\u2212\uff1d\uff0b\uff0d\uff20]/;

/** Words with an apostrophe before what a spreadsheet would run; numbers stay numbers. */
export const plainCell = (cell: PlainCell): PlainCell =>
  typeof cell === 'string' && FORMULA_LIKE.test(cell) ? `'${cell}` : cell;

/** Figures that tell any two values apart and drop the noise of conversion (24.000000000000004 in). */
const FIGURES = 9;

export const plainNumber = (value: number | null | undefined): number | null =>
  value === null || value === undefined || !Number.isFinite(value)
    ? null
    : Number(value.toPrecision(FIGURES));
