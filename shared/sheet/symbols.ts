/** A symbol of the trade taken apart: `φMn` is φ, M with the subscript n. */
export interface SymbolParts {
  readonly factor: string;
  readonly base: string;
  readonly prime: string;
  readonly sub: string;
}

/**
 * Letters that carry a subscript of letters. Other letters stand alone or are numbered, so that no word of a sentence is
 * taken for a symbol.
 */
const SUBSCRIPTED = 'fAEMIVFTdyεβφμρσ';
const LETTERS = 'cu|cr|ty|ut|yt|s\\d+|\\d+|[scyrtunwvbgφ]';
const EXTREME = ',(?:min|max|waive)';

/** One symbol from the place where the search stands; anything after it must not be a letter. */
const SYMBOL = new RegExp(
  [
    '(?<factor>φ(?=[MV]))?(?:',
    '(?<whole>kd)|(?<cover>c(?=c))(?<coverSub>c)',
    // bf, bt, hf, sw, ln of a flange
    '|(?<slab>b(?=[ft])|h(?=f)|s(?=w)|l(?=n))(?<slabSub>[ftwn])',
    `|(?<lettered>[${SUBSCRIPTED}])(?<prime>′?)(?<sub>(?:${LETTERS})(?:${EXTREME})?)?`,
    `|(?<plain>[A-Za-z])(?<plainPrime>′?)(?<plainSub>\\d+|${EXTREME})?`,
    ')(?![\\p{L}′])',
  ].join(''),
  'uy',
);

/** The symbol that begins at `from`, with its length in the text; undefined where there is none. */
export function findSymbolAt(text: string, from: number): { parts: SymbolParts; length: number } | undefined {
  SYMBOL.lastIndex = from;
  const found = SYMBOL.exec(text);
  if (found?.groups === undefined) return undefined;
  const { factor, whole, cover, coverSub, slab, slabSub, lettered, prime, sub, plain, plainPrime, plainSub } =
    found.groups;
  return {
    length: found[0].length,
    parts: {
      factor: factor ?? '',
      base: whole ?? cover ?? slab ?? lettered ?? plain ?? '',
      prime: prime ?? plainPrime ?? '',
      sub: coverSub ?? slabSub ?? sub ?? plainSub?.replace(',', '') ?? '',
    },
  };
}
