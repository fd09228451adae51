import { readClockTime } from './clock-time.ts';
import { type CueAtLine, type FileProblem, type ReadCues } from './problem.ts';

/** A time at the head of a line: `[1:04] …`, `(00:01:04) …`, `1:04 …`, `**1:04** …`, `- 1:04 – …`, `1:04 --> 1:09`, alone or not. */
const LED =
  /^[\s>*_#-]*[[(<{]?\s*(\d{1,3}:\d{1,2}(?::\d{1,2})?(?:[.,]\d{1,3})?)\s*(?:(?:-{1,2}>?|–|—|to)\s*(\d{1,3}:\d{1,2}(?::\d{1,2})?(?:[.,]\d{1,3})?)\s*)?[\])>}]?[*_]*\s*(?:[-–—:|]\s+)?(.*)$/;
/** A time behind a speaker's name: `Ismay (1:04): …`, `Ismay 1:04`. */
const NAMED = /^([\p{L}][\p{L}. ]{0,40}?)[\s:]*[[(]?(\d{1,3}:\d{2}(?::\d{2})?)[\])]?\s*:?\s*(.*)$/u;
const HEADING = /^#{1,6}\s/;
/** How slowly anybody speaks, in milliseconds for one character: the last paragraph ends by it. */
const SLOWEST_MS_PER_CHARACTER = 1000 / 11;

interface Led {
  readonly startMs: number;
  readonly endMs: number | null;
  readonly line: number;
  readonly text: string[];
}

/**
 * Reads text or markdown whose paragraphs are led by clock times. A paragraph lasts until the next begins, headings are
 * passed by and told, and words before the first time are told too.
 */
export function readTimedText(text: string): ReadCues {
  const problems: FileProblem[] = [];
  const paragraphs: Led[] = [];
  text
    .replaceAll('\0', '\uFFFD')
    .split(/\r\n|\r|\n/)
    .forEach((raw, at) => {
      const line = raw.trim();
      if (line === '') return;
      const led = readLed(line, at + 1);
      if (led !== null) paragraphs.push(led);
      else if (HEADING.test(line))
        problems.push({ line: at + 1, what: `A heading: “${line.slice(0, 60)}”.`, done: 'Passed by.' });
      else if (paragraphs.length > 0) paragraphs.at(-1)!.text.push(line);
      else problems.push({ line: at + 1, what: 'Words stand before the first time.', done: 'Left out.' });
    });
  return { cues: paragraphs.flatMap((one, n) => toCue(one, paragraphs[n + 1])), problems };
}

function readLed(line: string, at: number): Led | null {
  const led = LED.exec(line);
  const named = led === null ? NAMED.exec(line) : null;
  const startMs = readClockTime(led?.[1] ?? named?.[2] ?? '');
  if (startMs === null) return null;
  const words = led?.[3] ?? named?.[3] ?? '';
  return {
    startMs,
    endMs: led?.[2] === undefined ? null : readClockTime(led[2]),
    line: at,
    text: words === '' ? [] : [words],
  };
}

function toCue(one: Led, next: Led | undefined): CueAtLine[] {
  const text = one.text.join(' ');
  if (text === '') return [];
  const spoken = one.startMs + Math.ceil(text.length * SLOWEST_MS_PER_CHARACTER);
  const endMs = one.endMs ?? (next !== undefined && next.startMs > one.startMs ? next.startMs : spoken);
  return [{ startMs: one.startMs, endMs, text, line: one.line }];
}
