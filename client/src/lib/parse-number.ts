/** What a person typed, read as a number; or the reason it cannot be read, in words that help. */
export type ParsedNumber =
  | { readonly kind: 'empty' }
  | { readonly kind: 'number'; readonly value: number }
  | { readonly kind: 'unreadable'; readonly problem: string };

const GROUPED = /^[-+]?\d{1,3}(,\d{3})+(\.\d*)?$/;
const PLAIN = /^[-+]?(\d+\.?\d*|\.\d+)(e[-+]?\d+)?$/i;
const MIXED_FRACTION = /^(\d+)[\s-]+(\d+)\/(\d+)$/;
const FRACTION = /^(\d+)\/(\d+)$/;
const DECIMAL_COMMA = /^[-+]?\d+,\d+$/;

/** Reads `1250.5`, `1,250.5`, `1 250.5`, `1 1/2`, a true minus sign, and forgives the unit typed after the number. */
export function parseNumber(text: string, unit = ''): ParsedNumber {
  const typed = withoutUnit(text.trim().replaceAll('−', '-'), unit);
  if (typed === '') return { kind: 'empty' };

  const mixed = MIXED_FRACTION.exec(typed);
  if (mixed) return number(Number(mixed[1]) + Number(mixed[2]) / Number(mixed[3]));
  const fraction = FRACTION.exec(typed);
  if (fraction) return number(Number(fraction[1]) / Number(fraction[2]));

  const compact = typed.replace(/(?<=\d)[\s\u00a0\u202f](?=\d{3}(\D|$))/g, '');
  if (GROUPED.test(compact)) return number(Number(compact.replaceAll(',', '')));
  if (PLAIN.test(compact)) return number(Number(compact));
  if (DECIMAL_COMMA.test(compact))
    return { kind: 'unreadable', problem: `Write decimals with a point: ${compact.replace(',', '.')}` };
  return { kind: 'unreadable', problem: `“${text.trim()}” is not a number` };
}

function number(value: number): ParsedNumber {
  return Number.isFinite(value)
    ? { kind: 'number', value }
    : { kind: 'unreadable', problem: 'This number is out of range' };
}

function withoutUnit(text: string, unit: string): string {
  return unit !== '' && text.toLowerCase().endsWith(unit.toLowerCase())
    ? text.slice(0, -unit.length).trim()
    : text;
}
