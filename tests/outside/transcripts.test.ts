import { describe, expect, test } from 'vitest';
import { type Cue, readTranscript } from '#crochet';
import { readSubRip } from '../../api/features/recordings/transcript-file/sub-rip.ts';
import { readWebVtt } from '../../api/features/recordings/transcript-file/web-vtt.ts';

/** W3C, "WebVTT: The Web Video Text Tracks Format", specification source of 14 May 2026. */
describe('by the WebVTT specification', () => {
  const times = (line: string) => readWebVtt(`WEBVTT\n\n${line}\nwords\n`).cues.map((cue) => [cue.startMs, cue.endMs]);

  test('hours are optional, and of two or more digits', () => {
    expect(times('00:01.000 --> 00:02.000')).toEqual([[1000, 2000]]);
    expect(times('01:00:01.000 --> 123:00:02.000')).toEqual([[3_601_000, 442_802_000]]);
  });

  test('the fraction has exactly three digits behind a full stop', () => {
    expect(times('00:01.00 --> 00:02.000')).toEqual([]);
    expect(times('00:01,000 --> 00:02,000')).toEqual([]);
  });

  test('minutes and seconds end at 59', () => {
    expect(times('00:60.000 --> 02:00.000')).toEqual([]);
  });

  test('notes, styles and regions between blocks are no cues', () => {
    const text = 'WEBVTT\n\nSTYLE\n::cue {}\n\nNOTE a --\nb\n\n00:01.000 --> 00:02.000\nwords\n';
    expect(readWebVtt(text)).toMatchObject({ cues: [{ text: 'words' }], problems: [] });
  });
});

/** SubRip has no specification: these are forms that readers in the field take (common practice). */
describe('by the practice of SubRip', () => {
  const cues = (text: string) => readSubRip(text).cues.map((cue) => [cue.startMs, cue.endMs, cue.text]);

  test('a comma or a full stop, hours or none, a number or none', () => {
    expect(cues('1\n00:00:01,000 --> 00:00:02,500\na\n\n00:03.5 --> 00:04\nb\n')).toEqual([
      [1000, 2500, 'a'],
      [3500, 4000, 'b'],
    ]);
  });

  test('coordinates behind the times, and blank lines inside the words', () => {
    expect(
      cues('1\n00:00:01,000 --> 00:00:02,000 X1:40 X2:600\na\n\nb\n\n2\n00:00:03,000 --> 00:00:04,000\nc\n'),
    ).toEqual([
      [1000, 2000, 'a\nb'],
      [3000, 4000, 'c'],
    ]);
  });
});

/** Confusions of speech recognition seen in captions on public pages, or generally known (common practice and memory). */
describe('what recognisers make of crochet', () => {
  const cue = (text: string): readonly Cue[] => [{ startMs: 0, endMs: text.length * 70, text }];
  const read = (text: string) => readTranscript(cue(text)).pieces.flatMap((piece) => piece.lines);

  test.each(['single croquet', 'single crow shay', 'sink crochet'])('"%s" is single crochet', (heard) => {
    expect(read(`Round one, six ${heard} in a magic ring.`)[0]!.text).toBe('6 sc in magic ring');
  });

  test.each([
    ['slip ditch', 'sl st'],
    ['slip switch', 'sl st'],
    ['half devil', 'hdc'],
  ])('"%s" is %s', (heard, stitch) => {
    const lines = read(`Round one, six single crochet in a magic ring. Round two, ${heard} in each stitch around.`);
    expect(lines[1]!.text).toBe(`${stitch} in each st around`);
  });

  test('counting aloud behind a chain is not work: chain four, one, two, three, four', () => {
    expect(
      read('Chain fourteen: one, two, three, four. Row one, single crochet in each chain across, thirteen.').map(
        (line) => line.count,
      ),
    ).toEqual([14, 13]);
  });

  test('"chain two" is no stitch of a magic ring: two chains that the speaker says do not count', () => {
    const [line] = read('Round one, chain two, that does not count, and eight half double crochet in a magic ring.');
    expect(line!.text).toBe('8 hdc in magic ring');
  });
});
