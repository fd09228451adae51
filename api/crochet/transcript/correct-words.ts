import { plainWord } from './align-words.ts';
import { type WordCorrection } from './draft.ts';
import { type HeardCue, type HeardWord, wordsAsHeard } from './words-as-heard.ts';

/** A caption that a correction changes, and what it then says. */
export interface CorrectedCue {
  /** Index of the caption. */
  readonly cue: number;
  readonly text: string;
}

/** A mis-hearing where it stands in the captions. */
export interface PlacedCorrection extends WordCorrection {
  /** Index of the caption in which it begins. */
  readonly cue: number;
  /** Whether the captions say what was meant by now. */
  readonly isTaken: boolean;
  /** The words around it, as the captions stand. */
  readonly before: string;
  readonly after: string;
  /** The captions it changes; none where it is taken already. */
  readonly changes: readonly CorrectedCue[];
}

/** How many words are shown on each side. */
const AROUND = 6;

const plain = (words: readonly HeardWord[]) => words.map(({ text }) => plainWord(text)).join('');
const textOf = (words: readonly HeardWord[]) => words.map(({ text }) => text).join(' ');

/** `meant` with the capital and the marks of what it takes the place of. */
function dressed(meant: string, replaced: string): string {
  const [lead = ''] = /^[^\p{L}\p{N}]*/u.exec(replaced) ?? [];
  const [tail = ''] = /[^\p{L}\p{N}]*$/u.exec(replaced) ?? [];
  const first = replaced.slice(lead.length, lead.length + 1);
  const isCapital = first !== first.toLowerCase();
  return `${lead}${isCapital ? meant.charAt(0).toUpperCase() + meant.slice(1) : meant}${tail}`;
}

interface Place {
  readonly cue: number;
  readonly from: number;
  readonly to: number;
}

/** Where the words of a correction stand in the captions of now, a stretch a caption. */
function placesOf(cues: readonly (readonly HeardWord[])[], starts: readonly number[], one: WordCorrection): Place[] {
  const places: Place[] = [];
  for (let cue = cueOf(starts, one.firstWord); cue < cues.length && (starts[cue] ?? 0) <= one.lastWord; cue++) {
    const words = cues[cue]!;
    const isIn = ({ first, last }: HeardWord) => first >= 0 && last >= one.firstWord && first <= one.lastWord;
    const from = words.findIndex(isIn);
    if (from >= 0) places.push({ cue, from, to: words.findLastIndex(isIn) + 1 });
  }
  return places;
}

/** The caption in which a word of the file stands. */
function cueOf(starts: readonly number[], word: number): number {
  let low = 0;
  let high = starts.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (starts[middle]! <= word) low = middle + 1;
    else high = middle;
  }
  return Math.max(0, low - 1);
}

/** Puts what was meant in the place of what was heard; over the border of two captions its last word goes to the second. */
function changesOf(cues: readonly (readonly HeardWord[])[], places: readonly Place[], meant: string): CorrectedCue[] {
  const parts = meant.split(' ');
  return places.flatMap(({ cue, from, to }, n) => {
    const words = cues[cue]!;
    const isLast = n === places.length - 1;
    const share = places.length === 1 ? parts : isLast ? parts.slice(places.length - 1) : parts.slice(n, n + 1);
    const put = share.length === 0 ? '' : dressed(share.join(' '), textOf(words.slice(from, to)));
    const text = [textOf(words.slice(0, from)), put, textOf(words.slice(to))].filter((part) => part !== '').join(' ');
    // A caption that would say nothing is left as it is.
    return text === '' ? [] : [{ cue, text }];
  });
}

/**
 * Finds the mis-hearings of a reading in the captions as they stand now: where, whether they are put right already, and
 * what the captions say once they are. Takes time linear in captions and corrections.
 */
export function placeCorrections(
  cues: readonly HeardCue[],
  corrections: readonly WordCorrection[],
): PlacedCorrection[] {
  const captions = wordsAsHeard(cues);
  const starts: number[] = [];
  let start = 0;
  for (const { heard } of cues) {
    starts.push(start);
    start += heard.split(/\s+/u).filter((word) => /[\p{L}\p{N}]/u.test(word)).length;
  }
  return corrections.flatMap((one): PlacedCorrection[] => {
    const places = placesOf(captions, starts, one);
    const [first] = places;
    const end = places.at(-1);
    if (!first || !end) return [];
    const now = places.flatMap(({ cue, from, to }) => captions[cue]!.slice(from, to));
    const isTaken = plain(now) !== one.heard.split(' ').map(plainWord).join('');
    return [
      {
        ...one,
        cue: first.cue,
        isTaken,
        before: textOf(captions[first.cue]!.slice(Math.max(0, first.from - AROUND), first.from)),
        after: textOf(captions[end.cue]!.slice(end.to, end.to + AROUND)),
        changes: isTaken ? [] : changesOf(captions, places, one.meant),
      },
    ];
  });
}
