import { type FileProblem } from './problem.ts';

/** One cue as the file holds it: its text still with tags and entities. */
export interface RawCue {
  readonly id: string;
  readonly startMs: number;
  readonly endMs: number;
  readonly text: string;
  readonly line: number;
}

export interface WebVtt {
  /** False where the first line is not the format's own; then there are no cues. */
  readonly signed: boolean;
  readonly cues: readonly RawCue[];
  readonly problems: readonly FileProblem[];
}

/**
 * Reads WebVTT as the W3C's parser does: blocks separated by blank lines, an arrow in the first or second line of a
 * block makes it a cue, a bad cue is skipped and the rest is read on. Never throws; what is skipped is told by line.
 */
export function readWebVtt(input: string): WebVtt {
  const lines = input.replaceAll('\0', '\uFFFD').replace(/\r\n?/g, '\n').split('\n');
  if (!/^WEBVTT(?:[ \t]|$)/.test(lines[0] ?? '')) return { signed: false, cues: [], problems: [] };
  const cues: RawCue[] = [];
  const problems: FileProblem[] = [];
  let at = 1;
  if ((lines[1] ?? '') !== '') at = skipHeader(lines, 1);
  while (at < lines.length) {
    if (lines[at] === '') at += 1;
    else at = readBlock(lines, at, cues, problems);
  }
  return { signed: true, cues, problems };
}

/** The lines straight after the signature belong to the header, up to a blank line or a line that starts a cue. */
function skipHeader(lines: readonly string[], from: number): number {
  let at = from;
  while (at < lines.length && lines[at] !== '' && !lines[at]!.includes('-->')) at += 1;
  return at;
}

/** Reads the block that begins at a line, and returns the line after it. */
function readBlock(lines: readonly string[], from: number, cues: RawCue[], problems: FileProblem[]): number {
  const timingAt = lines[from]!.includes('-->') ? from : lines[from + 1]?.includes('-->') === true ? from + 1 : -1;
  if (timingAt < 0) return skipBlock(lines, from, problems);
  let at = timingAt + 1;
  while (at < lines.length && lines[at] !== '' && !lines[at]!.includes('-->')) at += 1;
  const times = readTimingLine(lines[timingAt]!);
  if (times === null) {
    problems.push({
      line: timingAt + 1,
      what: `The times “${shorten(lines[timingAt]!)}” can't be read.`,
      done: at > timingAt + 1 ? `Left out, with its words: “${shorten(lines[timingAt + 1]!)}”` : 'Left out.',
    });
  } else {
    const id = timingAt === from ? '' : lines[from]!;
    cues.push({ id, ...times, text: lines.slice(timingAt + 1, at).join('\n'), line: timingAt + 1 });
  }
  return at;
}

/** A note, a style or a region is passed by silently; other words that stand outside a cue are told. */
function skipBlock(lines: readonly string[], from: number, problems: FileProblem[]): number {
  let at = from + 1;
  while (at < lines.length && lines[at] !== '' && !lines[at]!.includes('-->')) at += 1;
  if (!/^(?:NOTE(?:[ \t]|$)|STYLE[ \t]*$|REGION[ \t]*$)/.test(lines[from]!)) {
    problems.push({ line: from + 1, what: `Words without a time: “${shorten(lines[from]!)}”.`, done: 'Left out.' });
  }
  return at;
}

const TIMESTAMP = '(\\d+):(\\d\\d)(?::(\\d\\d))?\\.(\\d{3})(?!\\d)';
const TIMING = new RegExp(`^[ \\t\\f]*${TIMESTAMP}[ \\t\\f]*-->[ \\t\\f]*${TIMESTAMP}`);

function readTimingLine(line: string): { startMs: number; endMs: number } | null {
  const found = TIMING.exec(line);
  if (!found) return null;
  const startMs = timestamp(found.slice(1, 5));
  const endMs = timestamp(found.slice(5, 9));
  return startMs === null || endMs === null ? null : { startMs, endMs };
}

/** Minutes are two digits and less than 60; a longer or larger first number is hours, and then seconds must follow. */
function timestamp([first, second, third, fraction]: readonly (string | undefined)[]): number | null {
  const startsWithHours = first!.length !== 2 || Number(first) > 59;
  if (startsWithHours && third === undefined) return null;
  const [hours, minutes, seconds] = third === undefined ? [0, first, second] : [first, second, third];
  if (Number(minutes) > 59 || Number(seconds) > 59) return null;
  return ((Number(hours) * 60 + Number(minutes)) * 60 + Number(seconds)) * 1000 + Number(fraction);
}

function shorten(text: string): string {
  return text.length > 60 ? `${text.slice(0, 59)}…` : text;
}
