import type { Formula, NamedCell } from './workbook-sheet.ts';

/** Formulas with what they come to. A cell without a number leaves the result blank: a missing rate is never a zero. */

const allKnown = (cells: readonly NamedCell[]): readonly number[] | null => {
  const values = cells.map(({ value }) => value);
  return values.every((value) => value !== null) ? values : null;
};

const guarded = (cells: readonly NamedCell[], sum: string): string =>
  `IF(COUNT(${cells.map(({ at }) => at).join(',')})=${cells.length},${sum},"")`;

/** The product of cells, and of a plain number where one is given. */
export function product(cells: readonly NamedCell[], factor = 1): Formula {
  const values = allKnown(cells);
  const named = cells.map(({ at }) => at).join('*');
  return {
    formula: guarded(cells, factor === 1 ? named : `${named}*${factor}`),
    result: values === null ? null : values.reduce((all, value) => all * value, factor),
  };
}

export function sum(cells: readonly NamedCell[]): Formula {
  const values = allKnown(cells);
  return {
    formula: guarded(cells, cells.map(({ at }) => at).join('+')),
    result: values === null ? null : values.reduce((all, value) => all + value, 0),
  };
}

/** The sum of cells times a share. */
export function shareOfSum(cells: readonly NamedCell[], share: NamedCell): Formula {
  const known = allKnown([...cells, share]);
  const total = cells.reduce((all, { value }) => all + (value ?? 0), 0);
  return {
    formula: guarded([...cells, share], `(${cells.map(({ at }) => at).join('+')})*${share.at}`),
    result: known === null ? null : total * share.value!,
  };
}

export function quotient(over: NamedCell, under: NamedCell): Formula {
  const known = allKnown([over, under]);
  return {
    formula: guarded([over, under], `${over.at}/${under.at}`),
    result: known === null ? null : over.value! / under.value!,
  };
}

export function difference(of: NamedCell, to: NamedCell): Formula {
  const known = allKnown([of, to]);
  return {
    formula: guarded([of, to], `${of.at}-${to.at}`),
    result: known === null ? null : of.value! - to.value!,
  };
}

/** The same cell on another sheet; blank where that is blank. */
export const cellOf = (sheet: string, { at, value }: NamedCell): Formula => ({
  formula: `IF(ISNUMBER('${sheet}'!${at}),'${sheet}'!${at},"")`,
  result: value,
});
