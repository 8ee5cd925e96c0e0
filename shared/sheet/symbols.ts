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
const SUBSCRIPTED = 'fAEMIVTNLdyεβφμρσαγληνθΔδκ';
const LETTERS = [
  // Eurocode: design, characteristic and mean values, stirrups.
  'Ed|Rd|ck|yk|cd|yd|ud|uk|ctm|ct|cm|cc|ywd|ywk|sw|sy|su|max|min',
  'cu\\d?|cr|ty|ut|yt|ye|s\\d+|c\\d|\\d+|[slcyrtunwvbgkpφΔ]',
].join('|');
/** Words and letters after a comma: limits, and what a spacing follows from. */
const EXTREME = ',(?:min|max|waive|long|lim|req|eff|widest|least|along|shear|area|ties|hoops|skin|[csd])';
/** Lengths whose letter alone would make symbols of words (by, hat, lb). */
const NAMED = 'b(?:eff|[wft])|hf|sw|l(?:0|n(?!\\())';

/** One symbol from the place where the search stands; anything after it must not be a letter. */
const SYMBOL = new RegExp(
  [
    '(?<factor>φ(?=[MV]))?(?:',
    '(?<whole>kd)|(?<cover>c(?=c))(?<coverSub>c)',
    `|(?<named>${NAMED})(?<namedSub>${EXTREME})?`,
    `|(?<lettered>[${SUBSCRIPTED}])(?<prime>[′″]?)(?<sub>(?:${LETTERS})(?:${EXTREME})?)?`,
    `|(?<plain>[A-Za-z])(?<plainPrime>′?)(?<plainSub>\\d+|${EXTREME})?`,
    ')(?![\\p{L}\\p{Nd}′])',
  ].join(''),
  'uy',
);

/** The symbol that begins at `from`, with its length in the text; undefined where there is none. */
export function findSymbolAt(text: string, from: number): { parts: SymbolParts; length: number } | undefined {
  SYMBOL.lastIndex = from;
  const found = SYMBOL.exec(text);
  if (found?.groups === undefined) return undefined;
  const { factor, whole, cover, coverSub, named, namedSub = '' } = found.groups;
  const { lettered, prime, sub, plain, plainPrime, plainSub } = found.groups;
  return {
    length: found[0].length,
    parts: {
      factor: factor ?? '',
      base: whole ?? cover ?? named?.slice(0, 1) ?? lettered ?? plain ?? '',
      prime: prime ?? plainPrime ?? '',
      sub: coverSub ?? (named && named.slice(1) + namedSub) ?? sub ?? plainSub?.replace(',', '') ?? '',
    },
  };
}
