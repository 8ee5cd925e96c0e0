import type { SheetCells } from './workbook-text.ts';

type Value = number | string | null;

/**
 * Works a workbook's formulas out anew from its plain cells, as a spreadsheet does. It knows what our formulas use: the four
 * operations, IF, COUNT, ISNUMBER, text, cells of this sheet and of others. Anything else is an error.
 */
export function recalculate(sheets: ReadonlyMap<string, SheetCells>): (sheet: string, cell: string) => Value {
  const known = new Map<string, Value>();
  const valueOf = (sheet: string, name: string): Value => {
    const key = `${sheet}!${name}`;
    if (!known.has(key)) {
      const cell = sheets.get(sheet)?.get(name);
      known.set(key, cell?.formula ? new Reader(cell.formula, sheet, valueOf).read() : (cell?.value ?? null));
    }
    return known.get(key)!;
  };
  return valueOf;
}

const TOKEN = /\s*('[^']+'!|"[^"]*"|\$?[A-Z]+\$?\d+|[A-Z]+(?=\()|\d+(?:\.\d+)?|[-+*/(),=])/y;

class Reader {
  private readonly tokens: string[] = [];
  private at = 0;
  private readonly sheet: string;
  private readonly valueOf: (sheet: string, name: string) => Value;

  constructor(formula: string, sheet: string, valueOf: (sheet: string, name: string) => Value) {
    this.sheet = sheet;
    this.valueOf = valueOf;
    TOKEN.lastIndex = 0;
    while (TOKEN.lastIndex < formula.length) {
      const from = TOKEN.lastIndex;
      const found = TOKEN.exec(formula);
      if (found === null) throw new Error(`No formula of ours: ${formula} at ${from}`);
      this.tokens.push(found[1]!);
    }
  }

  read(): Value {
    const value = this.comparison();
    if (this.at < this.tokens.length) throw new Error(`Left over: ${this.tokens.slice(this.at).join(' ')}`);
    return value;
  }

  private take(token?: string): string {
    const next = this.tokens[this.at++];
    if (next === undefined || (token !== undefined && next !== token))
      throw new Error(`${token} wanted, ${next} found`);
    return next;
  }

  private comparison(): Value {
    const left = this.terms('+-', () => this.terms('*/', () => this.atom()));
    if (this.tokens[this.at] !== '=') return left;
    this.at++;
    return left === this.terms('+-', () => this.terms('*/', () => this.atom())) ? 1 : 0;
  }

  private terms(operators: string, part: () => Value): Value {
    let left = part();
    while (operators.includes(this.tokens[this.at] ?? ' ')) {
      const operator = this.take();
      const right = part();
      if (typeof left !== 'number' || typeof right !== 'number')
        throw new Error(`#VALUE! in ${this.tokens.join('')}`);
      left =
        operator === '+'
          ? left + right
          : operator === '-'
            ? left - right
            : operator === '*'
              ? left * right
              : left / right;
    }
    return left;
  }

  private atom(): Value {
    const token = this.take();
    if (token === '(') return this.closed(this.comparison());
    if (token.startsWith('"')) return token.slice(1, -1);
    if (/^\d/.test(token)) return Number(token);
    if (token === 'IF') return this.ifElse();
    if (token === 'COUNT' || token === 'ISNUMBER') return this.counted();
    const sheet = token.startsWith("'") ? token.slice(1, -2) : this.sheet;
    const name = token.startsWith("'") ? this.take() : token;
    return this.valueOf(sheet, name.replaceAll('$', ''));
  }

  private closed(value: Value): Value {
    this.take(')');
    return value;
  }

  private counted(): number {
    this.take('(');
    let count = 0;
    do if (typeof this.comparison() === 'number') count++;
    while (this.take() === ',');
    return count;
  }

  /** Only the branch that is taken is worked out, as a spreadsheet shows an error of that one alone. */
  private ifElse(): Value {
    this.take('(');
    const isTrue = this.comparison() !== 0;
    this.take(',');
    const then = isTrue ? this.comparison() : this.skip();
    this.take(',');
    const otherwise = isTrue ? this.skip() : this.comparison();
    this.take(')');
    return isTrue ? then : otherwise;
  }

  private skip(): null {
    for (let depth = 0; depth > 0 || ![',', ')'].includes(this.tokens[this.at]!); this.at++) {
      if (this.tokens[this.at] === '(') depth++;
      if (this.tokens[this.at] === ')') depth--;
    }
    return null;
  }
}
