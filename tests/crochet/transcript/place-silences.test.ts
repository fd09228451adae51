import { expect, test } from 'vitest';
import { placeSilences } from '../../../api/crochet/transcript/place-silences.ts';
import { wordsOf } from '../../../api/crochet/transcript/words.ts';

const FILLER = 'and the wool is soft and the light is good and we have all the time that we want for it today';
const FIRST = `We begin with the ring and pull it shut. ${FILLER}. Now stuff it. Round two is an increase in every stitch. ${FILLER}.`;

/** Three paragraphs: when the second begins, and how long after it the third. */
const paragraphs = (second: string, startMs: number, usualMs = startMs) =>
  wordsOf([
    { startMs: 0, endMs: startMs, text: FIRST },
    { startMs, endMs: startMs + usualMs, text: second },
    { startMs: startMs + usualMs, endMs: startMs + 2 * usualMs, text: FILLER },
  ]);
const indexOf = (words: readonly { readonly text: string }[], text: string) =>
  words.findIndex((word) => word.text === text);

test('a silence that a paragraph runs across stands before the last line announced in it', () => {
  const words = paragraphs(`${FILLER}. ${FILLER}.`, 40_000);
  const moment = indexOf(words, 'Round');
  const placed = placeSilences(words, [indexOf(words, 'Now'), moment]);
  const silence = words.find((word) => word.cue === 1)!.silenceMs;
  expect(silence).toBeGreaterThan(2500);
  expect(placed[moment]!.startMs).toBe(words[moment]!.startMs + silence);
  expect(placed[moment - 1]).toEqual(words[moment - 1]);
  expect(placed.find((word) => word.cue === 1)!.silenceMs).toBe(0);
  expect(placed.map((word) => word.text)).toEqual(words.map((word) => word.text));
});

test('it stays where the next paragraph begins with an announcement', () => {
  const words = paragraphs('Round three is plain. And so on.', 40_000);
  const third = words.findIndex((word) => word.cue === 1);
  expect(placeSilences(words, [indexOf(words, 'Round'), third])).toEqual(words);
});

test('it stays where the next paragraph begins so late that the silence must have ended this one', () => {
  const words = paragraphs(`${FILLER}. ${FILLER}.`, 60_000, 20_000);
  expect(placeSilences(words, [indexOf(words, 'Round')])).toEqual(words);
});

test('it stays where nothing is announced inside, and where there is hardly any', () => {
  const words = paragraphs(`${FILLER}. ${FILLER}.`, 40_000);
  expect(placeSilences(words, [])).toEqual(words);
  const close = paragraphs(`${FILLER}. ${FILLER}.`, 21_000);
  expect(placeSilences(close, [indexOf(close, 'Round')])).toEqual(close);
});

test('time never runs backwards', () => {
  const words = paragraphs(`${FILLER}. ${FILLER}.`, 40_000);
  const placed = placeSilences(words, [indexOf(words, 'Now'), indexOf(words, 'Round')]);
  placed.slice(1).forEach((word, n) => {
    expect(word.startMs).toBeGreaterThanOrEqual(placed[n]!.endMs - 1);
  });
});
