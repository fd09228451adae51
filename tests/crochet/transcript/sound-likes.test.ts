import { describe, expect, test } from 'vitest';
import { mendLetter, soundsLikeNumber, soundsLikeUnit } from '../../../api/crochet/transcript/sound-likes.ts';
import { tokensOf } from '../../../api/crochet/transcript/tokens.ts';
import { wordsOf } from '../../../api/crochet/transcript/words.ts';

/** The tokens that stand before a word. */
const heard = (text: string) => tokensOf(wordsOf([{ startMs: 0, endMs: 5000, text }])).tokens;

/** The number that the first word of `after` is taken for, behind what was heard before. */
const numberIn = (before: string, after: string, isJoined = true, misheard = false) =>
  soundsLikeNumber(after.split(' '), 0, isJoined, heard(before), misheard)?.value ?? null;

describe('a word that sounds like a number', () => {
  test.each([
    ['round', 'to is an increase', true, false, 2],
    ['row', 'for and turn', true, false, 4],
    ['crochet', 'to together', true, false, 2],
    ['chain', 'for and turn', true, true, 4],
    ['work', 'to single crochet', true, true, 2],
  ] as const)('is one beside what counts: %s %s', (before, after, isJoined, misheard, value) => {
    expect(numberIn(before, after, isJoined, misheard)).toBe(value);
  });

  test.each([
    ['go', 'to the marker'],
    ['chain', 'to the corner'],
    ['this is', 'for my niece'],
    ['we', 'won the game'],
    ['and then', 'seven of them'],
  ] as const)('is what it seems elsewhere: %s %s', (before, after) => {
    expect(numberIn(before, after)).toBeNull();
  });
});

describe('a word that sounds like a round or a row', () => {
  const unitIn = (text: string, before?: string) =>
    soundsLikeUnit(text.split(' '), 0, () => true, before === undefined ? undefined : heard(before).at(-1));

  test('is one at the head of a clause, with its number', () => {
    expect(unitIn('roe two is plain')).toBe('row');
    expect(unitIn('around five is plain')).toBe('round');
  });

  test('is none with a number that counts, without one, or inside a clause', () => {
    expect(unitIn('around five stitches')).toBeNull();
    expect(unitIn('around the edge')).toBeNull();
    expect(unitIn('around five', 'single crochet')).toBeNull();
    expect(unitIn('mound five')).toBeNull();
  });
});

describe('a word with a letter missing', () => {
  test.each([
    ['roud', 'round'],
    ['twety', 'twenty'],
    ['elven', 'eleven'],
    ['crchet', 'crochet'],
  ])('%s is %s', (typed, meant) => {
    expect(mendLetter(typed)).toBe(meant);
  });

  test.each(['even', 'tent', 'tree', 'second', 'loop', 'kettle', ''])('%j is left as it is', (word) => {
    expect(mendLetter(word)).toBe(word);
  });
});
