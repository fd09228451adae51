import { wordsAsHeard } from '#crochet';
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

/**
 * Captions with numbered words. A corrected caption shows its new words under the numbers of those that were heard. What
 * has no number has the number -1.
 */
export function readCaptions(cues: readonly Cue[]): Caption[] {
  const words = wordsAsHeard(cues);
  return cues.map(({ id, startMs, endMs, heard, corrected }, i) => ({
    id,
    startMs,
    endMs,
    text: corrected ?? heard,
    words: (words[i] ?? []).map(({ first, text }) => ({ n: first, text })),
  }));
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
  /** Place of its first word in the caption. */
  readonly at: number;
  readonly words: readonly Word[];
  readonly isChosen: boolean;
  readonly sense: WordSense | null;
}

/** A caption's words cut where their sense changes, and where what was chosen begins and ends. */
export function stretchesOf(
  words: readonly Word[],
  senses: ReadonlyMap<number, WordSense>,
  chosen: { readonly firstWord: number; readonly lastWord: number } | null = null,
): Stretch[] {
  const stretches: { at: number; words: Word[]; sense: WordSense | null; isChosen: boolean }[] = [];
  words.forEach((word, at) => {
    const sense = senses.get(word.n) ?? null;
    const isChosen = chosen !== null && word.n >= chosen.firstWord && word.n <= chosen.lastWord;
    const last = stretches.at(-1);
    const isSame = last?.sense?.lineId === sense?.lineId && last?.sense?.role === sense?.role;
    if (last && isSame && last.isChosen === isChosen) last.words.push(word);
    else stretches.push({ at, words: [word], sense, isChosen });
  });
  return stretches;
}

/** Captions that hold `needle`, whatever its case. */
export function findCaptions(captions: readonly Caption[], needle: string): number[] {
  const wanted = needle.trim().toLocaleLowerCase();
  if (wanted === '') return [];
  return captions.flatMap((caption, i) => (caption.text.toLocaleLowerCase().includes(wanted) ? [i] : []));
}
