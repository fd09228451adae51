import { expect, test } from 'vitest';
import type { Cue } from '../../api/contract/recordings.ts';
import { cuesAround, linesAround, mendedWords, momentOfLine } from '../../web/features/recordings/problem-view.ts';

const SOURCE = Array.from(
  { length: 30 },
  (_, n) => `1\n00:00:${String(n).padStart(2, '0')},500 --> 00:00:59,000\nline ${n}\n`,
).join('\n');
const problem = (done: string) => ({ line: 1, what: 'Odd.', done });

test('what was mended and what was left is said in one sentence, and that the file is untouched', () => {
  expect(mendedWords([])).toBe('Every line was read as it stands.');
  const four = Array.from({ length: 4 }, () => problem('Kept the start.'));
  expect(mendedWords([...four, problem('Left as it is: both are shown.')])).toBe(
    'Four places were mended, one was left as it is. Your file is untouched.',
  );
  expect(mendedWords([problem('Left out.'), problem('Passed by.')])).toBe(
    'One was left out, one was left as it is. Your file is untouched.',
  );
  expect(mendedWords([problem('Left as it is.')])).toBe('One was left as it is. Your file is untouched.');
});

test('a problem stands among the lines of the file around it, also at both ends', () => {
  expect(linesAround(SOURCE, 50).map(({ number }) => number)).toEqual([45, 46, 47, 48, 49, 50, 51, 52, 53, 54, 55]);
  expect(linesAround(SOURCE, 1)[0]?.number).toBe(1);
  expect(linesAround('one\r\ntwo', 2).map(({ text }) => text)).toEqual(['one', 'two']);
});

test('a line of the file leads to the captions read there', () => {
  expect(momentOfLine(SOURCE, 3)).toBe(500);
  expect(momentOfLine(SOURCE, 42)).toBe(10_500);
  const cues = Array.from({ length: 30 }, (_, n) => ({ ordinal: n + 1, startMs: n * 1_000 + 500 }) as Cue);
  expect(cuesAround(cues, 10_500).map(({ ordinal }) => ordinal)).toEqual([10, 11, 12]);
  expect(cuesAround(cues, null).map(({ ordinal }) => ordinal)).toEqual([1, 2]);
  expect(cuesAround([], 5)).toEqual([]);
});
