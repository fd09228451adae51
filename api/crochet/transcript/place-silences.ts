import { type Word } from './words.ts';

/** A silence at a paragraph's end longer than this may belong before a line that is announced inside it. */
const MOVABLE_MS = 2500;
const SLACK_MS = 2000;
/** At most so many announcements of a paragraph and the next are looked at. */
const NEARBY = 40;

/**
 * Moves the silences of paragraphs to where people fall silent: before a line is announced. A paragraph's time only says
 * when it begins. Where the next paragraph begins with an announcement, or so late that the silence must have ended this one, nothing is moved; else the silence lies before the
 * last line announced inside.
 * @param moments indices of words at which a line or a step is announced, ascending
 */
export function placeSilences(words: readonly Word[], moments: readonly number[]): readonly Word[] {
  const out = [...words];
  const usualMs = usualLength(words);
  let first = 0;
  let passed = 0;
  for (let next = 1; next < out.length; next++) {
    if (out[next]!.cue === out[next - 1]!.cue) continue;
    while (passed < moments.length && moments[passed]! <= first) passed += 1;
    const at = placeFor(out, first, next, moments.slice(passed, passed + NEARBY), usualMs);
    if (at !== null) shift(out, at, next);
    first = next;
  }
  return out;
}

/** How long paragraphs usually last before a new one is begun: nearly the shortest. */
function usualLength(words: readonly Word[]): number {
  const starts = words.filter((word, n) => n === 0 || word.cue !== words[n - 1]!.cue);
  const lengths = starts
    .slice(1)
    .map((word, n) => word.startMs - starts[n]!.startMs)
    .sort((a, b) => a - b);
  return lengths[Math.floor(lengths.length / 10)] ?? 0;
}

function placeFor(
  words: readonly Word[],
  first: number,
  next: number,
  moments: readonly number[],
  usualMs: number,
): number | null {
  const { silenceMs, startMs } = words[next]!;
  if (!words[first]!.isInParagraph || silenceMs < MOVABLE_MS) return null;
  if (beginsAnnounced(words, next, moments)) return null;
  let sentence = next - 1;
  while (sentence > first && words[sentence - 1]!.mark !== '.') sentence -= 1;
  const lastSentenceMs = words[next - 1]!.endMs - words[sentence]!.startMs;
  if (startMs - words[first]!.startMs > usualMs + lastSentenceMs + SLACK_MS) return null;
  return moments.findLast((word) => word < next && word > first) ?? null;
}

/** Whether the first sentence of a paragraph announces something first thing. */
function beginsAnnounced(words: readonly Word[], from: number, moments: readonly number[]): boolean {
  const moment = moments.find((word) => word >= from);
  if (moment === undefined || moment > from + 4) return false;
  return words.slice(from, moment).every((word) => word.mark !== '.');
}

function shift(words: Word[], at: number, next: number): void {
  const byMs = words[next]!.silenceMs;
  for (let i = at; i < next; i++) {
    const word = words[i]!;
    const silenceMs = i === at ? word.silenceMs + byMs : word.silenceMs;
    words[i] = { ...word, startMs: word.startMs + byMs, endMs: word.endMs + byMs, silenceMs };
  }
  words[next] = { ...words[next]!, silenceMs: 0 };
}
