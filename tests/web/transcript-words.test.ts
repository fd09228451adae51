import { describe, expect, test } from 'vitest';
import {
  findCaptions,
  lastBegun,
  readCaptions,
  sensesOf,
  stretchesOf,
} from '../../web/features/bench/transcript/captions.ts';

const cue = (startMs: number, heard: string, corrected: string | null = null) => ({
  id: `c${startMs}`,
  ordinal: 1,
  startMs,
  endMs: startMs + 900,
  heard,
  corrected,
  version: 1,
});
const evidence = (
  firstWord: number,
  lastWord: number,
  role: 'work' | 'unread' | 'total' | 'announcement',
  lineId = 'r9',
) => ({
  id: `${lineId}${firstWord}`,
  lineId,
  transcriptId: 't',
  role,
  firstWord,
  lastWord,
  startMs: 0,
  endMs: 0,
  words: '',
});

describe('words of a transcript', () => {
  test('words are counted over the whole transcript; a dash alone is none', () => {
    const [first, second] = readCaptions([cue(0, 'Round nine — two single,'), cue(1000, 'then a decrease.')]);
    expect(first?.words.map((word) => word.n)).toEqual([0, 1, -1, 2, 3]);
    expect(second?.words.map((word) => word.n)).toEqual([4, 5, 6]);
  });

  test('a corrected caption shows its new words and leaves the numbers after it as they were', () => {
    const [first, second] = readCaptions([cue(0, 'to singles', 'Two single, then a'), cue(1000, 'decrease')]);
    expect(first?.text).toBe('Two single, then a');
    expect(first?.words.map((word) => word.n)).toEqual([0, 0, 1, 1]);
    expect(second?.words[0]?.n).toBe(2);
  });

  test('evidence is drawn under exactly its words, and what was not understood shows over the rest', () => {
    const [caption] = readCaptions([cue(0, 'Two single, decrease, and so on, as you like.')]);
    const senses = sensesOf([evidence(3, 8, 'unread'), evidence(0, 4, 'work')]);
    const drawn = stretchesOf(caption!.words, senses).map(({ words, sense }) => [
      words.map((word) => word.text).join(' '),
      sense?.role,
    ]);
    expect(drawn).toEqual([
      ['Two single, decrease,', 'work'],
      ['and so on, as you like.', 'unread'],
    ]);
  });

  test('the spoken caption is the last that has begun', () => {
    const list = [{ startMs: 1000 }, { startMs: 2000 }, { startMs: 2000 }, { startMs: 9000 }];
    expect([0, 1000, 2000, 8999, 99_000].map((ms) => lastBegun(list, ms))).toEqual([-1, 0, 2, 2, 3]);
  });

  test('words are found whatever their case; an empty search finds nothing', () => {
    const captions = readCaptions([cue(0, 'Round Nine.'), cue(1000, 'Eighteen.'), cue(2000, 'nine again')]);
    expect(findCaptions(captions, ' NINE ')).toEqual([0, 2]);
    expect(findCaptions(captions, '  ')).toEqual([]);
  });
});
