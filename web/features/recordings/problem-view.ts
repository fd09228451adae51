import type { Cue, TranscriptProblem } from '#contract/recordings';

export type ProblemKind = 'mended' | 'left-out' | 'left';

/** What was done about a problem: something was changed, words were dropped, or it was told and left as it is. */
export function kindOf({ done }: TranscriptProblem): ProblemKind {
  if (/^(?:left out|nothing was read)/i.test(done)) return 'left-out';
  return /^(?:left as|passed by|it was read|read as)/i.test(done) ? 'left' : 'mended';
}

const NUMBERS = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten'];
const inWords = (n: number) => NUMBERS[n] ?? String(n);
const WORDS: Readonly<Record<ProblemKind, readonly [string, string]>> = {
  mended: ['place was mended', 'places were mended'],
  'left-out': ['was left out', 'were left out'],
  left: ['was left as it is', 'were left as they are'],
};

/** "Four places were mended, one was left as it is. Your file is untouched." */
export function mendedWords(problems: readonly TranscriptProblem[]): string {
  if (problems.length === 0) return 'Every line was read as it stands.';
  const parts = (['mended', 'left-out', 'left'] as const).flatMap((kind) => {
    const n = problems.filter((problem) => kindOf(problem) === kind).length;
    return n === 0 ? [] : [`${inWords(n)} ${WORDS[kind][n === 1 ? 0 : 1]}`];
  });
  const sentence = parts.join(', ');
  return `${sentence.charAt(0).toUpperCase()}${sentence.slice(1)}. Your file is untouched.`;
}

export interface SourceLine {
  /** Counted from 1. */
  readonly number: number;
  readonly text: string;
  /** A time or a number of subtitles: set in the interface's face, since nobody said it. */
  readonly isTime: boolean;
}

const AROUND = 5;
const TIME = /-->|^\s*\[?\(?\d{1,2}:\d{2}/;

/** Lines of the file around one, and how many it has. */
export function linesAround(source: string, line: number): readonly SourceLine[] {
  const all = source.split(/\r\n|\n|\r/);
  const first = Math.max(0, Math.min(line - 1 - AROUND, all.length - 1 - 2 * AROUND));
  return all.slice(first, first + 2 * AROUND + 1).map((text, i) => ({
    number: first + i + 1,
    text,
    isTime: text.includes('-->') || /^\d+$/.test(text),
  }));
}

const CLOCK = /(?:(\d{1,3}):)?(\d{1,2}):(\d{2})(?:[.,](\d{1,3}))?/;

function msOf(text: string): number | null {
  const match = CLOCK.exec(text);
  if (!match) return null;
  const [, hours = '0', minutes = '0', seconds = '0', part = ''] = match;
  return ((Number(hours) * 60 + Number(minutes)) * 60 + Number(seconds)) * 1_000 + Number(part.padEnd(3, '0'));
}

/** The moment a line of the file belongs to: its own time, else that of the nearest line above. */
export function momentOfLine(source: string, line: number): number | null {
  const all = source.split(/\r\n|\n|\r/);
  const timed = (text: string | undefined) => text !== undefined && TIME.test(text);
  for (let i = line - 1; i >= 0 && i > line - 40; i -= 1) if (timed(all[i])) return msOf(all[i]!);
  return timed(all[line]) ? msOf(all[line]!) : null;
}

/** Captions as they were read about a moment: the one that begins there or last before, and its neighbours. */
export function cuesAround(cues: readonly Cue[], ms: number | null): readonly Cue[] {
  if (cues.length === 0) return [];
  const later = ms === null ? 1 : cues.findIndex(({ startMs }) => startMs > ms);
  const at = Math.max(0, (later < 0 ? cues.length : later) - 1);
  return cues.slice(Math.max(0, at - 1), at + 2);
}
