import { type Cue } from '#contract/recordings';
import { type Evidence } from '#contract/rows';

/** A word as it was heard, with its number over the whole transcript; evidence names words by these. */
export interface Word {
  readonly n: number;
  readonly text: string;
}

export interface Caption {
  readonly id: string;
  readonly startMs: number;
  readonly endMs: number;
  /** As corrected, where somebody corrected it. */
  readonly text: string;
  readonly words: readonly Word[];
}

const split = (text: string) => text.split(/\s+/u).filter((word) => word !== '');
/** A dash or a note sign standing alone is no word to the reading, so it has no number. */
const isSpoken = (word: string) => /[\p{L}\p{N}]/u.test(word);

/**
 * Captions with numbered words. A corrected caption shows its new words under the numbers of those that were heard, as far
 * as there are any, so that the numbers after it stay right. What has no number has the number -1.
 */
export function readCaptions(cues: readonly Cue[]): Caption[] {
  let next = 0;
  return cues.map(({ id, startMs, endMs, heard, corrected }) => {
    const end = next + split(heard).filter(isSpoken).length;
    let n = next;
    next = end;
    const text = corrected ?? heard;
    const words = split(text).map((word) => ({ n: isSpoken(word) && n < end ? n++ : -1, text: word }));
    return { id, startMs, endMs, text, words };
  });
}

/** The last thing that has begun at `ms`; -1 before the first. The list is in order of time. */
export function lastBegun(list: readonly { readonly startMs: number }[], ms: number): number {
  let low = 0;
  let high = list.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((list[middle]?.startMs ?? Infinity) <= ms) low = middle + 1;
    else high = middle;
  }
  return low - 1;
}

/** What a word is evidence of. */
export interface WordSense {
  readonly lineId: string;
  readonly role: Evidence['role'];
}

/** Word numbers to the line they are evidence of. Where roles overlap, what was not understood shows. */
export function sensesOf(evidence: readonly Evidence[]): ReadonlyMap<number, WordSense> {
  const senses = new Map<number, WordSense>();
  for (const { lineId, role, firstWord, lastWord } of evidence) {
    for (let n = firstWord; n <= lastWord; n += 1) {
      if (senses.get(n)?.role !== 'unread') senses.set(n, { lineId, role });
    }
  }
  return senses;
}

/** A stretch of words of one sense, to be drawn under one line. */
export interface Stretch {
  readonly words: readonly Word[];
  readonly sense: WordSense | null;
}

/** A caption's words cut where their sense changes. */
export function stretchesOf(words: readonly Word[], senses: ReadonlyMap<number, WordSense>): Stretch[] {
  const stretches: { words: Word[]; sense: WordSense | null }[] = [];
  for (const word of words) {
    const sense = senses.get(word.n) ?? null;
    const last = stretches.at(-1);
    if (last?.sense?.lineId === sense?.lineId && last?.sense?.role === sense?.role && last) last.words.push(word);
    else stretches.push({ words: [word], sense });
  }
  return stretches;
}

/** Captions that hold `needle`, whatever its case. */
export function findCaptions(captions: readonly Caption[], needle: string): number[] {
  const wanted = needle.trim().toLocaleLowerCase();
  if (wanted === '') return [];
  return captions.flatMap((caption, i) => (caption.text.toLocaleLowerCase().includes(wanted) ? [i] : []));
}
