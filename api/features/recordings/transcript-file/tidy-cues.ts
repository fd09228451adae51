import { printClockTime } from './clock-time.ts';
import { type CueAtLine, type FileProblem, type ReadCues } from './problem.ts';

const ENTITIES: Readonly<Record<string, string>> = {
  amp: '&',
  lt: '<',
  gt: '>',
  nbsp: ' ',
  lrm: '',
  rlm: '',
  quot: '"',
  apos: "'",
};
const SPEAKER = /^\s*(?:>>+\s*)?(?:[A-Z][A-Z'. ]{1,30}|[A-Z]\p{L}+(?: [A-Z]\p{L}*\.?)?):\s+(?=\S)/u;
const NOISE = /[[(][^\])\d]{2,30}[\])]|♪+/g;

/**
 * Makes a file's cues fit to be read: tags, entities, noises and speakers' names taken off, order of time restored,
 * empty cues dropped, rolling captions (each repeating the one before) undoubled. Everything it does is told by line.
 */
export function tidyCues({ cues, problems }: ReadCues): ReadCues {
  const told: FileProblem[] = [...problems];
  const clean = cues.map((cue) => ({ ...cue, text: cleanText(cue.text) }));
  const ordered = inOrder(clean, told);
  const filled = ordered.filter((cue) => {
    if (cue.text === '') told.push({ line: cue.line, what: 'A cue without words.', done: 'Left out.' });
    return cue.text !== '';
  });
  return {
    cues: undouble(filled, told).map((cue) => rightTimes(cue, told)),
    problems: told.sort((a, b) => a.line - b.line),
  };
}

function cleanText(text: string): string {
  return text
    .replace(/<[^<>]{0,200}>/g, '')
    .replace(/\{\\[^{}]{0,100}\}/g, '')
    .replace(/&(#x?[0-9a-f]{1,6}|[a-z]{2,4});/gi, (whole, name: string) => entity(name.toLowerCase()) ?? whole)
    .replace(NOISE, ' ')
    .split('\n')
    .map((line) => line.replace(SPEAKER, '').replace(/^\s*(?:>>+|[-–—])\s*/, ''))
    .join(' ')
    .replace(/\s+/g, ' ')
    .trim();
}

function entity(name: string): string | undefined {
  if (!name.startsWith('#')) return ENTITIES[name];
  const code = name[1] === 'x' ? parseInt(name.slice(2), 16) : Number(name.slice(1));
  return code > 31 && code <= 0x10ffff && (code < 0xd800 || code > 0xdfff) ? String.fromCodePoint(code) : undefined;
}

function inOrder(cues: readonly CueAtLine[], told: FileProblem[]): CueAtLine[] {
  cues.forEach((cue, n) => {
    const before = cues[n - 1];
    if (before !== undefined && cue.startMs < before.startMs) {
      told.push({
        line: cue.line,
        what: `The time ${printClockTime(cue.startMs)} comes after ${printClockTime(before.startMs)}.`,
        done: 'Put in order of time.',
      });
    }
  });
  return [...cues].sort((a, b) => a.startMs - b.startMs);
}

/** Rolling captions repeat the words of the cue before; only what is new in each is kept. */
function undouble(cues: readonly CueAtLine[], told: FileProblem[]): CueAtLine[] {
  const out: CueAtLine[] = [];
  let first: number | null = null;
  let shown: readonly string[] = [];
  let shownUntil = -1;
  for (const cue of cues) {
    const words = cue.text.split(' ');
    const again = cue.startMs <= shownUntil + 1500 ? repeated(shown, words) : 0;
    const isRolling = again === words.length || again >= 3;
    if (isRolling) first ??= cue.line;
    const fresh = isRolling ? words.slice(again) : words;
    if (fresh.length > 0) out.push({ ...cue, text: fresh.join(' ') });
    shown = words;
    shownUntil = cue.endMs;
  }
  if (first !== null) {
    told.push({
      line: first,
      what: 'Rolling captions: cues repeat the words before them.',
      done: 'Each word kept once.',
    });
  }
  return out;
}

/** How many words at the end of what stood on screen are the first words of the next cue; at most 40 are looked at. */
function repeated(before: readonly string[], now: readonly string[]): number {
  const most = Math.min(before.length, now.length, 40);
  for (let n = most; n > 0; n--) {
    if (now.slice(0, n).every((word, i) => word === before[before.length - n + i])) return n;
  }
  return 0;
}

function rightTimes(cue: CueAtLine, told: FileProblem[]): CueAtLine {
  if (cue.endMs > cue.startMs) return cue;
  told.push({
    line: cue.line,
    what: 'A cue ends before it begins.',
    done: 'Its end was set by the length of its words.',
  });
  return { ...cue, endMs: cue.startMs + Math.max(400, cue.text.length * 70) };
}
