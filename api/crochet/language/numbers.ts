const ONES =
  'zero one two three four five six seven eight nine ten eleven twelve thirteen fourteen fifteen sixteen seventeen eighteen nineteen'.split(
    ' ',
  );
const TENS = 'twenty thirty forty fifty sixty seventy eighty ninety'.split(' ');
const ORDINALS =
  'first second third fourth fifth sixth seventh eighth ninth tenth eleventh twelfth thirteenth fourteenth fifteenth sixteenth seventeenth eighteenth nineteenth twentieth'.split(
    ' ',
  );

/** Numbers in words up to ninety-nine: single words only; the lexer joins `twenty` and `four`. */
export const NUMBER_WORDS: ReadonlyMap<string, number> = new Map([
  ...ONES.map((word, i) => [word, i] as const),
  ...TENS.map((word, i) => [word, 20 + i * 10] as const),
  ['fourty', 40] as const,
  ['hundred', 100] as const,
]);

/** Ordinals in words. `first` is left out: it is a place, not a number. */
export const ORDINAL_WORDS: ReadonlyMap<string, number> = new Map(
  ORDINALS.slice(1).map((word, i) => [word, i + 2] as const),
);

/** `th` in `4th`, `d` in the older `2d`. */
export const ORDINAL_TAILS: ReadonlySet<string> = new Set(['st', 'nd', 'rd', 'th', 'd']);
