import { parseSync } from 'subtitle';
import { readClockTime } from './clock-time.ts';
import { type CueAtLine, type FileProblem, type ReadCues } from './problem.ts';

const ARROW = /^\s*(\S+)\s*-{1,2}>\s*(\S+)(?:\s.*)?$/;
const NUMBER = /^\s*\d+\s*$/;

/** Whether a text holds a line of times such as SubRip has. */
export function looksLikeSubRip(text: string): boolean {
  return /^\s*[\d:.,]+\s*-{1,2}>\s*[\d:.,]+/m.test(text);
}

/**
 * Reads SubRip block by block, so that one bad block never loses the file. Times are taken as programs in the field
 * write them (a full stop for the comma, no hours, one or two digits) and numbers may be missing or wrong.
 */
export function readSubRip(text: string): ReadCues {
  const lines = text.replaceAll('\0', '\uFFFD').replace(/\r\n?/g, '\n').split('\n');
  const starts = lines.flatMap((line, at) => (line.includes('>') && ARROW.test(line) ? [at] : []));
  const cues: CueAtLine[] = [];
  const problems: FileProblem[] = [];
  starts.forEach((at, n) => {
    const next = starts[n + 1];
    const end = next === undefined ? lines.length : textEnd(lines, at, next);
    const words = lines
      .slice(at + 1, end)
      .join('\n')
      .trim();
    const cue = readBlock(lines[at]!, words, at + 1);
    if (cue === null) {
      problems.push({
        line: at + 1,
        what: `The times “${lines[at]!.trim().slice(0, 60)}” can't be read.`,
        done: 'Left out.',
      });
    } else cues.push(cue);
  });
  const stray = lines.slice(0, starts[0] ?? lines.length).findIndex((line) => line.trim() !== '' && !NUMBER.test(line));
  if (stray >= 0) problems.push({ line: stray + 1, what: 'Words stand before the first time.', done: 'Left out.' });
  return { cues, problems };
}

/** The number of the next block stands before its times and is no part of this one's words. */
function textEnd(lines: readonly string[], at: number, next: number): number {
  return next - 1 > at && NUMBER.test(lines[next - 1]!) && (next - 2 === at || lines[next - 2]!.trim() === '')
    ? next - 1
    : next;
}

function readBlock(timing: string, words: string, line: number): CueAtLine | null {
  const [, from, to] = ARROW.exec(timing) ?? [];
  const startMs = from === undefined ? null : readClockTime(from);
  const endMs = to === undefined ? null : readClockTime(to);
  if (startMs === null || endMs === null) return null;
  const block = `1\n${stamp(startMs)} --> ${stamp(endMs)}\n${words.replace(/\n\s*\n/g, '\n') || ' '}\n`;
  try {
    const [node] = parseSync(block);
    if (node?.type === 'cue') return { startMs, endMs, text: node.data.text.trim(), line };
  } catch {
    // What the package refuses is still a block with readable times: its words are kept as they stand.
  }
  return { startMs, endMs, text: words, line };
}

function stamp(ms: number): string {
  const pad = (n: number, width = 2) => String(n).padStart(width, '0');
  const seconds = Math.floor(ms / 1000);
  return `${pad(Math.floor(seconds / 3600))}:${pad(Math.floor(seconds / 60) % 60)}:${pad(seconds % 60)},${pad(ms % 1000, 3)}`;
}
