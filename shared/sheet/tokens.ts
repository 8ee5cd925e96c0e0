import { findSymbolAt, type SymbolParts } from './symbols.ts';

/** A piece of a formula or of a sentence with symbols in it. */
export type Token =
  | { readonly kind: 'symbol'; readonly text: string; readonly parts: SymbolParts }
  | { readonly kind: 'number' | 'word' | 'sign' | 'space'; readonly text: string };

const SPACE = /\s+/y;
const NUMBER = /\d{1,3}(?:,\d{3})+(?:\.\d+)?|\d+(?:\.\d+)?/y;
const WORD = /\p{L}[\p{L}\p{N}′-]*/uy;

function matchAt(pattern: RegExp, text: string, from: number): string | undefined {
  pattern.lastIndex = from;
  return pattern.exec(text)?.[0];
}

/** All of the text in order: joined again, the tokens' texts are the text. */
export function tokenize(text: string): Token[] {
  const tokens: Token[] = [];
  for (let at = 0; at < text.length; at += tokens.at(-1)!.text.length) tokens.push(tokenAt(text, at));
  return tokens;
}

function tokenAt(text: string, at: number): Token {
  const space = matchAt(SPACE, text, at);
  if (space !== undefined) return { kind: 'space', text: space };
  const number = matchAt(NUMBER, text, at);
  if (number !== undefined) return { kind: 'number', text: number };
  // `318M` is the number of a book, `section’s` a word.
  const symbol = /[\d’]/.test(text[at - 1] ?? '') ? undefined : findSymbolAt(text, at);
  if (symbol !== undefined)
    return { kind: 'symbol', text: text.slice(at, at + symbol.length), parts: symbol.parts };
  const word = text[at] === 'Σ' ? undefined : matchAt(WORD, text, at);
  if (word !== undefined) return { kind: 'word', text: word };
  return { kind: 'sign', text: String.fromCodePoint(text.codePointAt(at)!) };
}
