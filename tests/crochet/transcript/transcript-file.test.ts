import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { readTranscriptFile } from '../../../api/features/recordings/transcript-file/read-transcript-file.ts';

const read = (text: string, name: string) => readTranscriptFile(new TextEncoder().encode(text), name);

describe('a creator who uploads a transcript', () => {
  test('as SubRip keeps every good cue when one is bad, and is told which', () => {
    const file = read(
      '1\r\n00:00:01,000 --> 00:00:02,000\r\nRound one\r\n\r\n2\r\n00:00:xx --> 00:00:04,000\r\nlost\r\n\r\n3\r\n0:05.5 --> 0:07\r\nRound two',
      'a.srt',
    );
    expect(file.format).toBe('srt');
    expect(file.cues).toEqual([
      { startMs: 1000, endMs: 2000, text: 'Round one' },
      { startMs: 5500, endMs: 7000, text: 'Round two' },
    ]);
    expect(file.problems).toEqual([expect.objectContaining({ line: 6, done: 'Left out.' })]);
  });

  test('as WebVTT gets tags, entities, noises and names taken off', () => {
    const file = read(
      'WEBVTT\n\nNOTE hello\n\n00:01.000 --> 00:03.000 align:start\n<v Ismay>Chain &amp; turn, [Music] <b>now</b>\n',
      'a.vtt',
    );
    expect(file.cues).toEqual([{ startMs: 1000, endMs: 3000, text: 'Chain & turn, now' }]);
    expect(file.problems).toEqual([]);
  });

  test.each([
    ['[1:04] Round one.\n\n[1:30] Round two.'],
    ['1:04 Round one.\n1:30 Round two.'],
    ['(00:01:04) Round one.\n\n(00:01:30) Round two.'],
    ['1:04\nRound one.\n\n1:30\nRound two.'],
    ['**1:04** Round one.\n\n**1:30** Round two.'],
    ['- 1:04 – Round one.\n- 1:30 – Round two.'],
    ['Ismay (1:04): Round one.\nIsmay (1:30): Round two.'],
  ])('as text may write its times as people do: %j', (text) => {
    const { cues, problems } = read(text, 'a.md');
    expect(cues.map((cue) => [cue.startMs, cue.text])).toEqual([
      [64_000, 'Round one.'],
      [90_000, 'Round two.'],
    ]);
    expect(problems).toEqual([]);
  });

  test('with headings is told by line that they were passed by', () => {
    expect(read('# The mouse\n[0:01] Hello.', 'a.md').problems).toEqual([
      expect.objectContaining({ line: 1, done: 'Passed by.' }),
    ]);
  });

  test('without any times is told so, with an example of what has them', () => {
    const file = read('Round one, six single crochet in a ring.', 'a.txt');
    expect(file.cues).toEqual([]);
    expect(file.problems[0]!.done).toContain('[1:04]');
  });

  test('in UTF-16 or Windows-1252 finds its accents kept', () => {
    const text = '[0:01] Café — done';
    const units = Uint16Array.from({ length: text.length + 1 }, (_, i) => (i === 0 ? 0xfeff : text.charCodeAt(i - 1)));
    const utf16 = new Uint8Array(units.buffer);
    expect(readTranscriptFile(utf16, 'a.txt')).toMatchObject({ encoding: 'UTF-16LE', cues: [{ text: 'Café — done' }] });
    const latin = new Uint8Array([...new TextEncoder().encode('[0:01] Caf'), 0xe9, 0x20, 0x97, 0x20, 0x61]);
    expect(readTranscriptFile(latin, 'a.txt')).toMatchObject({
      encoding: 'Windows-1252',
      cues: [{ text: 'Café — a' }],
    });
  });

  test('with rolling captions has each word once', () => {
    const file = read(
      'WEBVTT\n\n00:01.000 --> 00:03.000\nso we chain thirty\n\n00:03.000 --> 00:05.000\nso we chain thirty\nand then we turn\n\n00:05.000 --> 00:07.000\nand then we turn\nround one\n',
      'a.vtt',
    );
    expect(file.cues.map((cue) => cue.text).join(' ')).toBe('so we chain thirty and then we turn round one');
    expect(file.problems).toEqual([
      expect.objectContaining({ line: 6, what: expect.stringContaining('Rolling') as string }),
    ]);
  });

  test('out of order has it put in order, and is told', () => {
    const file = read('WEBVTT\n\n00:09.000 --> 00:10.000\nlater\n\n00:01.000 --> 00:02.000\nsooner\n', 'a.vtt');
    expect(file.cues.map((cue) => cue.text)).toEqual(['sooner', 'later']);
    expect(file.problems).toHaveLength(1);
  });

  test('of any bytes whatever gets cues or problems, never a failure', () => {
    const HEADS = ['', 'WEBVTT\n\n', '1\n00:00:01,000 --> 00:00:02,000\n', '[0:01] ', '\uFEFF'];
    fc.assert(
      fc.property(fc.constantFrom(...HEADS), fc.uint8Array({ maxLength: 400 }), (head, tail) => {
        const file = readTranscriptFile(new Uint8Array([...new TextEncoder().encode(head), ...tail]), 'x');
        expect(file.cues.length + file.problems.length).toBeGreaterThan(0);
        for (const { line } of file.problems) expect(line).toBeGreaterThanOrEqual(0);
      }),
      { numRuns: 300 },
    );
  });
});
