import type { SymbolParts } from './symbols.ts';
import { tokenize, type Token } from './tokens.ts';

const GREEK: Readonly<Record<string, string>> = {
  ε: '\\varepsilon ',
  β: '\\beta ',
  φ: '\\phi ',
  μ: '\\mu ',
  σ: '\\sigma ',
  ρ: '\\rho ',
  α: '\\alpha ',
  γ: '\\gamma ',
  λ: '\\lambda ',
  η: '\\eta ',
  ν: '\\nu ',
  θ: '\\theta ',
  Δ: '\\Delta ',
  δ: '\\delta ',
  κ: '\\kappa ',
};
const RELATIONS: Readonly<Record<string, string>> = {
  '+': '+',
  '−': '-',
  '±': '\\pm ',
  '=': '=',
  '≤': '\\le ',
  '≥': '\\ge ',
  ',': ',\\ ',
  ';': ';\\ ',
};
const PRIME: Readonly<Record<string, string>> = { '′': "'", '″': "''" };
const POWERS: Readonly<Record<string, string>> = { '²': '^{2}', '³': '^{3}' };
const FRACTIONS: Readonly<Record<string, string>> = { '⅓': '1/3', '⅔': '2/3' };

/** Functions, which are set as such. */
const FUNCTIONS = ['max', 'min', 'cot', 'tan', 'sin', 'cos', 'ln'];

/** A rule told in words, with no formula to set. */
export const isSentence = (formula: string): boolean =>
  tokenize(splitRemark(formula).expression).filter(
    ({ kind, text }) => kind === 'word' && !FUNCTIONS.includes(text),
  ).length > 1;

/** A formula and the words after it: `0.85 − …, within 0.65 and 0.85` is the sum and the remark. */
export function splitRemark(formula: string): { readonly expression: string; readonly remark: string } {
  let depth = 0;
  for (let i = 0; i < formula.length; i++) {
    if (formula[i] === '(') depth++;
    if (formula[i] === ')') depth--;
    if (depth === 0 && /^[,;] /.test(formula.slice(i, i + 2)))
      return { expression: formula.slice(0, i), remark: formula.slice(i + 2) };
  }
  return { expression: formula, remark: '' };
}

/** The formula as TeX. Whatever is written is set: an unknown word stands as text. */
export function formulaTex(formula: string): string {
  return new Setter(tokenize(formula).filter((token) => token.kind !== 'space')).setAll();
}

function symbolTex({ factor, base, prime, sub }: SymbolParts): string {
  const letters = GREEK[base] ?? base;
  const below = sub === '' ? '' : `_{${GREEK[sub] ?? `\\mathrm{${sub}}`}}`;
  return `${GREEK[factor] ?? factor}${letters}${PRIME[prime] ?? ''}${below}`;
}

/** Writes a product, a quotient of the product before the stroke and the one factor after it, and sums of these. */
class Setter {
  readonly #tokens: readonly Token[];
  #at = 0;
  #depth = 0;

  constructor(tokens: readonly Token[]) {
    this.#tokens = tokens;
  }

  setAll(): string {
    let tex = '';
    while (this.#at < this.#tokens.length) {
      tex += this.#sum();
      // A parenthesis that nothing opened.
      if (this.#text() === ')') tex += this.#take() ?? '';
    }
    return tex;
  }

  #text = () => this.#tokens[this.#at]?.text;
  #take = () => this.#tokens[this.#at++]?.text;

  #sum(): string {
    let tex = '';
    for (let text = this.#text(); text !== undefined && text !== ')'; text = this.#text()) {
      const relation = RELATIONS[text];
      if (relation === undefined) tex += this.#product();
      else {
        this.#at++;
        tex += relation;
      }
    }
    return tex;
  }

  #endsProduct(): boolean {
    const text = this.#text();
    return text === undefined || text === ')' || RELATIONS[text] !== undefined;
  }

  #product(): string {
    let factors: string[] = [];
    while (!this.#endsProduct()) {
      if (this.#text() !== '/') {
        factors.push(this.#factor());
        continue;
      }
      this.#at++;
      const command = this.#depth === 0 ? '\\dfrac' : '\\frac';
      this.#depth++;
      factors = [`${command}{${bare(factors)}}{${bare(this.#divisor())}}`];
      this.#depth--;
    }
    return factors.join('\\,');
  }

  /** One factor; after a sum sign all that it sums. */
  #divisor(): string[] {
    const isSum = this.#text() === 'Σ';
    const factors = this.#endsProduct() ? [] : [this.#factor()];
    while (isSum && !this.#endsProduct() && this.#tokens[this.#at]?.kind !== 'word')
      factors.push(this.#factor());
    return factors;
  }

  #factor(): string {
    const token = this.#tokens[this.#at++]!;
    let tex = this.#atom(token);
    for (let power = POWERS[this.#text() ?? '']; power !== undefined; power = POWERS[this.#text() ?? '']) {
      this.#at++;
      tex += power;
    }
    if (this.#text() === '^') {
      this.#at++;
      const exponent = this.#take() ?? '';
      tex += `^{${FRACTIONS[exponent] ?? exponent}}`;
    }
    return tex;
  }

  #atom(token: Token): string {
    if (token.kind === 'symbol') return symbolTex(token.parts);
    if (token.kind === 'number') return token.text.replaceAll(',', '{,}');
    if (token.kind === 'word') return this.#word(token.text);
    if (token.text === '(') return this.#parenthesis();
    if (token.text === '√') return `\\sqrt{${this.#endsProduct() ? '' : bare([this.#factor()])}}`;
    if (token.text === 'Σ') return '\\textstyle\\sum ';
    if (token.text === '×') return '\\times ';
    if (token.text === '·') return '\\cdot ';
    return `\\text{${token.text.replace(/[\\{}$&#^_~%]/g, '')}}`;
  }

  #word(text: string): string {
    if (FUNCTIONS.includes(text)) return `\\${text}`;
    const words = [text];
    while (this.#tokens[this.#at]?.kind === 'word') words.push(this.#take()!);
    return `\\text{ ${words.join(' ')} }`;
  }

  #parenthesis(): string {
    const inside = this.#sum();
    if (this.#text() === ')') this.#at++;
    return `\\left(${inside}\\right)`;
  }
}

/** Factors over or under a stroke need no parentheses of their own. */
function bare(factors: readonly string[]): string {
  const only = factors.length === 1 ? factors[0]! : '';
  const isWrapped = only.startsWith('\\left(') && only.endsWith('\\right)') && isOneGroup(only);
  return isWrapped ? only.slice('\\left('.length, -'\\right)'.length) : factors.join('\\,');
}

function isOneGroup(tex: string): boolean {
  let depth = 0;
  for (const [word] of tex.matchAll(/\\(?:left|right)/g)) depth += word === '\\left' ? 1 : -1;
  return (
    depth === 0 &&
    tex.split('\\left(').length === tex.split('\\right)').length &&
    !/\\right\).*\\left\(/.test(tex)
  );
}
