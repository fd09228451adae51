import { alignWords, plainWord } from './align-words.ts';
import { type Draft, type DraftLine } from './draft.ts';

/** A caption as the file had it, and as somebody corrected it. */
export interface HeardCue {
  readonly heard: string;
  readonly corrected: string | null;
}

/** A word of a caption as it stands now, with the words of the file that it stands for, counted over the whole transcript. */
export interface HeardWord {
  readonly text: string;
  /** -1 and -1 for what is no word: a dash, a note sign. */
  readonly first: number;
  readonly last: number;
}

const split = (text: string) => text.split(/\s+/u).filter((word) => word !== '');
/** A dash or a note sign standing alone is no word to the reading, so it has no number. */
const isWord = (text: string) => /[\p{L}\p{N}]/u.test(text);

/** For each of `to` words that took the place of `from` words, which of them it stands for. */
function shared(from: number, to: number, start: number): { first: number; last: number }[] {
  return Array.from({ length: to }, (_, n) => {
    const first = Math.min(from - 1, Math.floor((n * from) / to));
    const last = Math.max(first, Math.floor(((n + 1) * from) / to) - 1);
    return { first: start + first, last: start + last };
  });
}

/** The numbers of corrected words: their own where they were heard so, else those of the words they replace. */
function numbersOf(heard: readonly string[], words: readonly string[], start: number) {
  const found = alignWords(heard.map(plainWord), words.map(plainWord));
  const numbers: { first: number; last: number }[] = [];
  let passed = 0;
  for (let n = 0; n < words.length;) {
    const own = found[n]!;
    if (own >= 0) {
      numbers.push({ first: start + own, last: start + own });
      passed = own + 1;
      n += 1;
      continue;
    }
    let end = n;
    while (end < words.length && found[end]! < 0) end += 1;
    const until = end < words.length ? found[end]! : heard.length;
    // Words put in between two others stand for the one before them.
    const from = until > passed ? passed : Math.max(0, passed - 1);
    numbers.push(...shared(Math.max(1, until - from), end - n, start + from));
    n = end;
  }
  return numbers;
}

/**
 * The words of each caption as they stand now, numbered as the file has them. Words of a transcript have one number for
 * ever, whatever is corrected, so that what was once said of them still points at them.
 */
export function wordsAsHeard(cues: readonly HeardCue[]): HeardWord[][] {
  let start = 0;
  return cues.map(({ heard, corrected }) => {
    const spoken = split(heard).filter(isWord);
    const shown = split(corrected ?? heard);
    const words = shown.filter(isWord);
    const numbers =
      corrected === null || spoken.length === 0
        ? words.map((_, n) => ({ first: start + n, last: start + n }))
        : numbersOf(spoken, words, start);
    start += spoken.length;
    let n = 0;
    return shown.map((text) => ({ text, ...(isWord(text) ? numbers[n++]! : { first: -1, last: -1 }) }));
  });
}

/** What was drafted from corrected captions, with its words numbered as the file has them. */
export function inHeardNumbers(draft: Draft, cues: readonly HeardCue[]): Draft {
  if (cues.every(({ corrected }) => corrected === null)) return draft;
  const words = wordsAsHeard(cues)
    .flat()
    .filter(({ first }) => first >= 0);
  const numbered = <T extends { readonly firstWord: number; readonly lastWord: number }>(one: T): T => {
    const firstWord = words[one.firstWord]?.first ?? 0;
    return { ...one, firstWord, lastWord: Math.max(firstWord, words[one.lastWord]?.last ?? 0) };
  };
  const inLine = (line: DraftLine): DraftLine => ({ ...line, evidence: line.evidence.map(numbered) });
  return {
    ...draft,
    pieces: draft.pieces.map((piece) => ({ ...piece, lines: piece.lines.map(inLine) })),
    corrections: draft.corrections.map(numbered),
  };
}
