/** Number words as they are said, and what they come to. */
export const UNITS: ReadonlyMap<string, number> = new Map(
  'zero one two three four five six seven eight nine ten eleven twelve thirteen fourteen fifteen sixteen seventeen eighteen nineteen'
    .split(' ')
    .map((word, n) => [word, n]),
);
export const TENS: ReadonlyMap<string, number> = new Map(
  'twenty thirty forty fifty sixty seventy eighty ninety'.split(' ').map((word, n) => [word, 10 * (n + 2)]),
);
const ORDINAL_UNITS =
  'first second third fourth fifth sixth seventh eighth ninth tenth eleventh twelfth thirteenth fourteenth fifteenth sixteenth seventeenth eighteenth nineteenth'.split(
    ' ',
  );
export const ORDINALS: ReadonlyMap<string, number> = new Map([
  ...ORDINAL_UNITS.map((word, n): [string, number] => [word, n + 1]),
  ...[...TENS].map(([word, n]): [string, number] => [word.replace(/y$/, 'ieth'), n]),
]);

export interface SpokenNumber {
  readonly value: number;
  readonly isOrdinal: boolean;
  /** How many words it took. */
  readonly length: number;
  /** `twenty four` may also be twenty, then four. */
  readonly split: readonly [number, number] | null;
}

/**
 * Reads a number at a place in a row of plain words: digits, words, ordinals, dozens, hundreds.
 * @param joined whether a word runs on into the next without a mark or a silence
 */
export function readNumber(
  words: readonly string[],
  at: number,
  joined: (index: number) => boolean,
): SpokenNumber | null {
  const word = words[at]!;
  const digits = /^(\d{1,4})(st|nd|rd|th)?$/.exec(word);
  if (digits) return { value: Number(digits[1]), isOrdinal: digits[2] !== undefined, length: 1, split: null };
  return readHundreds(words, at, joined) ?? readDozens(words, at) ?? readTens(words, at, joined);
}

function readDozens(words: readonly string[], at: number): SpokenNumber | null {
  if (words[at] === 'dozen') return number(12, 1);
  if (words[at + 1] !== 'dozen') return null;
  const many = words[at] === 'a' ? 1 : words[at] === 'couple' ? 2 : UNITS.get(words[at]!);
  return many === undefined ? null : number(12 * many, 2);
}

function readHundreds(words: readonly string[], at: number, joined: (index: number) => boolean): SpokenNumber | null {
  const lead = words[at] === 'hundred' ? 0 : words[at + 1] === 'hundred' ? 1 : -1;
  if (lead < 0) return null;
  const many = lead === 0 || words[at] === 'a' ? 1 : UNITS.get(words[at]!);
  if (many === undefined || many === 0) return null;
  let next = at + lead + 1;
  if (!joined(next - 1)) return number(100 * many, lead + 1);
  if (words[next] === 'and' && joined(next)) next += 1;
  const rest = readTens(words, next, joined);
  if (rest === null || rest.value > 99) return number(100 * many, lead + 1);
  return { value: 100 * many + rest.value, isOrdinal: rest.isOrdinal, length: next - at + rest.length, split: null };
}

function readTens(words: readonly string[], at: number, joined: (index: number) => boolean): SpokenNumber | null {
  const word = words[at];
  if (word === undefined) return null;
  const ordinal = ORDINALS.get(word);
  if (ordinal !== undefined) return { value: ordinal, isOrdinal: true, length: 1, split: null };
  const tens = TENS.get(word);
  const next = words[at + 1];
  if (tens !== undefined && next !== undefined && joined(at)) {
    const unit = UNITS.get(next);
    if (unit !== undefined && unit > 0 && unit < 10) return { ...number(tens + unit, 2), split: [tens, unit] };
    const last = ORDINALS.get(next);
    if (last !== undefined && last < 10) return { value: tens + last, isOrdinal: true, length: 2, split: null };
  }
  const plain = tens ?? UNITS.get(word);
  return plain === undefined ? null : number(plain, 1);
}

function number(value: number, length: number): SpokenNumber {
  return { value, isOrdinal: false, length, split: null };
}
