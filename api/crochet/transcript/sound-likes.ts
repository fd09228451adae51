import { ORDINALS, readNumber, type SpokenNumber, TENS, UNITS } from './lexicon/numbers.ts';
import { UNIT_LIKES } from './lexicon/mishearings.ts';
import { PHRASES } from './lexicon/phrases.ts';
import { TRADE_WORDS } from './lexicon/trade-words.ts';
import { type Token } from './tokens.ts';

/** Words that sound like a number and are as often what they seem: to be taken for it only beside what counts. */
export const GUESSES: ReadonlyMap<string, number> = new Map([
  ['to', 2],
  ['too', 2],
  ['for', 4],
  ['won', 1],
  ['ate', 8],
]);
const NUMBER_LIKES_AFTER = /^(?:single|double|half|treble|singles|doubles|trebles|plain|together|crochet|more)$/;

/** "To" for two and "for" for four, where what stands beside it makes a number likely. */
export function soundsLikeNumber(
  texts: readonly string[],
  at: number,
  isJoined: boolean,
  before: readonly Token[],
  misheard: boolean,
): SpokenNumber | null {
  const value = GUESSES.get(texts[at]!);
  if (value === undefined) return null;
  const previous = before.at(-1);
  const next = texts[at + 1] ?? '';
  const parted = !isJoined;
  const afterName = previous?.kind === 'U' && (previous.value === 'round' || previous.value === 'row');
  const afterChain = previous?.kind === 'C' && /^(?:chain|chains|ch)$/.test(previous.text);
  const afterTens = previous?.kind === 'N' && Number(previous.value) % 10 === 0 && Number(previous.value) >= 20;
  const likely =
    (afterName && (parted || /^(?:is|and|it|in|i|we|you|single|double|half|magic|um|uh)$/.test(next) || misheard)) ||
    (value === 2 && next === 'together') ||
    ('LX'.includes(previous?.kind ?? '.') && /^(?:stitches|chains)$/.test(next)) ||
    (misheard &&
      (NUMBER_LIKES_AFTER.test(next) ||
        (afterChain && !/^(?:the|a|your|make|form|get)$/.test(next)) ||
        (afterTens && /^(?:stitches|stitch)$/.test(next)) ||
        (value === 2 && /^(?:in|rounds|rows|inches)$/.test(next)) ||
        (value === 4 && /^(?:and|inches|in)$/.test(next) && previous?.kind === 'v')));
  return likely ? { value, isOrdinal: false, length: 1, split: null } : null;
}

/** What may stand before a round's announcement; after anything else "around" goes around. */
const HEADS = '.|,&~=p';
const COUNTING = 'stitches stitch times time more of sets lots inches rounds rows single double half treble'.split(' ');

/** "Brown five" and "around five" for a round, "roe two" for a row: at a clause's head, with a number that counts nothing. */
export function soundsLikeUnit(
  texts: readonly string[],
  at: number,
  joined: (index: number) => boolean,
  before: Token | undefined,
): 'round' | 'row' | null {
  const unit = UNIT_LIKES.get(texts[at]!);
  if (unit === undefined || !joined(at) || !HEADS.includes(before?.kind ?? '.')) return null;
  const number = readNumber(texts, at + 1, joined);
  if (number === null || number.isOrdinal) return null;
  const isCounting = joined(at + number.length) && COUNTING.includes(texts[at + 1 + number.length] ?? '');
  return isCounting ? null : unit;
}

/** Words of English that are a number's with a letter missing. */
const WORDS = new Set('even seen seven tree thee fist tent fort second eight three ten nine one sixty sith'.split(' '));
const SHORTEST = 5;

/** Words of the trade that are long enough to be known with a letter missing. */
const TRADE = TRADE_WORDS.flatMap(([, , list]) => list.trim().split(/[\s,]+/)).filter((word) => word.length > SHORTEST);

/** Numbers, rounds and words of the trade with one letter missing, as typed transcripts have them. */
const MISSING_A_LETTER = new Map(
  [...UNITS.keys(), ...TENS.keys(), ...ORDINALS.keys(), 'round', 'rounds', ...TRADE]
    .filter((word) => word.length >= SHORTEST)
    .flatMap((word) => Array.from(word, (_, n): [string, string] => [word.slice(0, n) + word.slice(n + 1), word]))
    .filter(([typed]) => !WORDS.has(typed) && !UNITS.has(typed) && !TENS.has(typed) && !ORDINALS.has(typed))
    .filter(([typed]) => !PHRASES.has(typed) && !TRADE.includes(typed)),
);

/** The word that is meant where a letter is missing; any other word as it is. */
export function mendLetter(word: string): string {
  return MISSING_A_LETTER.get(word) ?? word;
}
