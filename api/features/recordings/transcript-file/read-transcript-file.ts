import { type Cue } from '#crochet';
import { decodeBytes, type Encoding } from './decode-bytes.ts';
import { type FileProblem, type ReadCues } from './problem.ts';
import { looksLikeSubRip, readSubRip } from './sub-rip.ts';
import { tidyCues } from './tidy-cues.ts';
import { readTimedText } from './timed-text.ts';
import { readWebVtt } from './web-vtt.ts';

export type TranscriptFormat = 'vtt' | 'srt' | 'text';

export interface TranscriptFile {
  readonly format: TranscriptFormat;
  readonly encoding: Encoding;
  /** In order of time; empty where the file holds no times, and then `problems` says so with an example of what does. */
  readonly cues: readonly Cue[];
  readonly problems: readonly FileProblem[];
}

/**
 * Turns the bytes of an uploaded transcript into cues. What the bytes hold decides the format, the name only helps.
 * Never throws, whatever the bytes; nothing is dropped without a line in `problems`.
 * @param name the file's own name, for its ending
 */
export function readTranscriptFile(bytes: Uint8Array, name: string): TranscriptFile {
  const { text, encoding, problems: decoding } = decodeBytes(bytes);
  const { format, read } = readAs(text, name);
  const { cues, problems } = tidyCues(read);
  const all = [...decoding, ...problems];
  if (cues.length === 0) {
    all.unshift({
      line: 0,
      what: 'The file holds no words with times.',
      done: 'Nothing was read. Lead each paragraph with its time, as in “[1:04] Round two is an increase in every stitch.”, or upload subtitles (.srt, .vtt).',
    });
  }
  return {
    format,
    encoding,
    cues: cues.map(({ startMs, endMs, text: words }) => ({ startMs, endMs, text: words })),
    problems: all,
  };
}

function readAs(text: string, name: string): { format: TranscriptFormat; read: ReadCues } {
  const vtt = readWebVtt(text);
  if (vtt.signed) return { format: 'vtt', read: vtt };
  if (looksLikeSubRip(text)) {
    const read = readSubRip(text);
    const unsigned = name.toLowerCase().endsWith('.vtt');
    const told = { line: 1, what: 'The first line is not WEBVTT.', done: 'Read as SubRip.' };
    return { format: 'srt', read: unsigned ? { ...read, problems: [told, ...read.problems] } : read };
  }
  return { format: 'text', read: readTimedText(text) };
}
