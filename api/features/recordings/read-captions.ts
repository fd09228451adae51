import type { TranscriptProblem } from '#contract/recordings';
import { decodeBytes } from './transcript-file/decode-bytes.ts';
import { readTranscriptFile, type TranscriptFile } from './transcript-file/read-transcript-file.ts';

/** A caption that begins later than this is taken for a slip in its time: no recording is as long. */
const LONGEST_MS = 100 * 3_600_000;

/** Kinds that some programs give a text file; all others that are not text speak for another file. */
const NEUTRAL_TYPES = /^(?:$|text\/|application\/(?:octet-stream|x-subrip|subrip|markdown|ttml))/;
/** How the commonest files that are not text begin: ZIP, PDF, PNG, JPEG, GIF, WebM, gzip, RIFF, Ogg, PostScript. */
const BEGINNINGS = [
  'PK\x03\x04',
  '%PDF-',
  '\x89PNG',
  '\xff\xd8\xff',
  'GIF8',
  '\x1aE\xdf\xa3',
  '\x1f\x8b',
  'RIFF',
  'OggS',
  '%!PS',
];
/** White space and escape: the only control characters that stand in text. */
const IN_TEXT: ReadonlySet<number> = new Set([0x09, 0x0a, 0x0b, 0x0c, 0x0d, 0x1b]);
const isControl = (char: string) => char.charCodeAt(0) < 0x20 && !IN_TEXT.has(char.charCodeAt(0));
const SAMPLE = 8_192;

/**
 * Whether a file is text inside, as its name says.
 * @param type the kind that the browser gave it
 */
export function isText(type: string, bytes: Uint8Array): boolean {
  if (!NEUTRAL_TYPES.test(type.toLowerCase())) return false;
  const head = String.fromCharCode(...bytes.subarray(0, 12));
  if (BEGINNINGS.some((each) => head.startsWith(each)) || head.slice(4, 8) === 'ftyp') return false;
  const { text } = decodeBytes(bytes.subarray(0, SAMPLE & ~1));
  return Array.from(text).filter(isControl).length * 20 <= text.length;
}

/** PostgreSQL keeps no zero characters; subtitle readers put the sign for "unknown" in their place. */
const withoutZeros = (text: string) => text.replaceAll('\0', '\ufffd');

export interface ReadCaptions extends TranscriptFile {
  readonly problems: readonly TranscriptProblem[];
  /** The file as it came, decoded. */
  readonly sourceText: string;
}

/** A transcript's bytes as captions that can be kept, and what was odd about them. Never throws. */
export function readCaptions(bytes: Uint8Array, name: string): ReadCaptions {
  const read = readTranscriptFile(bytes, name);
  const cues = read.cues.filter(({ endMs }) => endMs <= LONGEST_MS);
  const late = read.cues.length - cues.length;
  const told = { line: 0, what: `${late} captions stand after the hundredth hour.`, done: 'They were left out.' };
  return {
    ...read,
    cues: cues.map(({ text, ...times }) => ({ ...times, text: withoutZeros(text) })),
    problems: late === 0 ? read.problems : [...read.problems, told],
    sourceText: withoutZeros(decodeBytes(bytes).text),
  };
}
