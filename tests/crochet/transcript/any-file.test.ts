import fc from 'fast-check';
import { expect, test } from 'vitest';
import { readTranscript } from '#crochet';
import { printReading } from '../../../api/features/recordings/transcript-file/print-reading.ts';
import { readTranscriptFile } from '../../../api/features/recordings/transcript-file/read-transcript-file.ts';

const NAMES = fc.constantFrom('a.vtt', 'a.srt', 'a.txt', 'a', '', '.vtt', 'a.png');

/** Pieces of real files in any order, so that most of what is made is nearly right. */
const PIECES = fc.constantFrom(
  ...['WEBVTT', '\n', '\n\n', '\r\n', '\r', ' ', '\t', '\0', '\uFEFF', '<', '>', '&', '&amp;', '-->', ' --> '],
  ...['00:00:01,000 --> 00:00:04,000', '00:05.000 --> 00:09.000 align:start', '99:99:99.999', '[1:04] ', '1:05 ', '7'],
  ...['Round two. ', 'rounds five through three ', 'row zero ', 'chain nine hundred thousand ', 'repeat ', 'twice '],
  ...['single crochet in each stitch around ', 'two in one ', 'two together ', 'six times ', 'all the way around '],
  ...['increase ', 'skip ', 'in the same space ', 'twenty four ', 'again ', 'the same as round two ', 'half double '],
  ...[
    'stuff it ',
    'make two ',
    'corner ',
    'a squish is two together. ',
    '…',
    '\u{1F9F6}',
    'ø',
    '9999999999999 ',
    '-1 ',
  ],
);

function readAll(bytes: Uint8Array, name: string): void {
  const { cues, problems } = readTranscriptFile(bytes, name);
  const draft = readTranscript(cues);
  expect(() => JSON.stringify(printReading(draft, problems))).not.toThrow();
  for (const line of draft.pieces.flatMap((piece) => piece.lines)) {
    expect(Number.isFinite(line.startMs) && line.endMs >= line.startMs).toBe(true);
  }
}

test('any bytes under any name are read without a fault of ours', () => {
  fc.assert(
    fc.property(fc.uint8Array({ maxLength: 600 }), NAMES, (bytes, name) => {
      readAll(bytes, name);
    }),
    { numRuns: 300 },
  );
});

test('so are files that are nearly right', () => {
  fc.assert(
    fc.property(fc.array(PIECES, { maxLength: 80 }), NAMES, (pieces, name) => {
      readAll(new TextEncoder().encode(pieces.join('')), name);
    }),
    { numRuns: 200 },
  );
});
