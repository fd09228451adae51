import { alignWords, plainWord } from './align-words.ts';
import { type Word } from './words.ts';

/** A part of the recording that is still there in a new cut, and how far it moved. Times in milliseconds. */
export interface Shift {
  /** Where it lies in the recording as it was. */
  readonly fromMs: number;
  readonly toMs: number;
  /** Added to a moment in it; less than 0 where it comes earlier now. */
  readonly byMs: number;
  /** Words that show it. */
  readonly words: number;
  /** Something that was said after it is not in the new cut. */
  readonly isCutAfter: boolean;
}

/** How a recording as it was lies in its new cut. */
export interface Shifts {
  /** In order of time, none overlapping. What lies between two of them was cut out, if it is longer than a breath. */
  readonly kept: readonly Shift[];
  /** Share of the words as they were that are found in the new cut, from 0 to 1. */
  readonly found: number;
}

/** Word times are shares of their captions: within this they are the same moment. */
const SAME_MS = 1_500;
/** Fewer words in a row that agree are chance, as is what a small slip of the alignment gives. */
const LEAST_WORDS = 6;
/** Words that were not found between two parts show that something was cut out there. */
const CUT_WORDS = 4;
/** A mark may stand so much before its first word, or after its last. */
const BREATH_MS = 2_500;

interface Pair {
  /** Place of the word in the recording as it was. */
  readonly at: number;
  readonly word: Word;
  readonly byMs: number;
}

interface Group {
  readonly pairs: Pair[];
}

const medianOf = (pairs: readonly Pair[]): number => {
  const sorted = pairs.map(({ byMs }) => byMs).sort((a, b) => a - b);
  return sorted[sorted.length >> 1] ?? 0;
};

/** Pairs whose distance agrees with most of those just before them, in order; strays make small groups. */
function groupByDistance(pairs: readonly Pair[]): Group[] {
  const groups: Group[] = [];
  let open: Pair[] = [];
  for (const pair of pairs) {
    if (open.length > 0 && Math.abs(medianOf(open.slice(-LEAST_WORDS)) - pair.byMs) > SAME_MS) {
      groups.push({ pairs: open });
      open = [];
    }
    open.push(pair);
  }
  if (open.length > 0) groups.push({ pairs: open });
  return groups;
}

/** Joins groups that moved alike, once the strays between them are left out. */
function joinAlike(groups: readonly Group[]): Group[] {
  const joined: { pairs: Pair[]; byMs: number }[] = [];
  for (const { pairs } of groups) {
    const last = joined.at(-1);
    const byMs = medianOf(pairs);
    if (last && Math.abs(last.byMs - byMs) <= SAME_MS / 2) last.pairs.push(...pairs);
    else joined.push({ pairs: [...pairs], byMs });
  }
  return joined;
}

const isEnough = (least: number) => (group: Group) => group.pairs.length >= least;

/**
 * Finds how a recording lies in a new cut of it, from the words of both transcripts: one distance where all of it
 * moved alike, several where something was cut out or put in. Takes time linear in the words.
 */
export function findShifts(before: readonly Word[], after: readonly Word[]): Shifts {
  const found = alignWords(
    before.map(({ text }) => plainWord(text)),
    after.map(({ text }) => plainWord(text)),
  );
  const pairs = found.flatMap((at, n): Pair[] =>
    at < 0 ? [] : [{ at, word: before[at]!, byMs: after[n]!.startMs - before[at]!.startMs }],
  );
  const least = Math.min(LEAST_WORDS, Math.max(1, before.length >> 1));
  const groups = joinAlike(groupByDistance(pairs).filter(isEnough(least)));
  const kept = groups.map(({ pairs: own }, n): Shift => {
    const [first, last] = [own[0]!, own.at(-1)!];
    const wordsBefore = first.at - (groups[n - 1]?.pairs.at(-1)?.at ?? -1) - 1;
    const wordsAfter = (groups[n + 1]?.pairs[0]?.at ?? before.length) - last.at - 1;
    const isFirst = n === 0 && wordsBefore < CUT_WORDS;
    return {
      fromMs: isFirst ? 0 : first.word.startMs,
      toMs: last.word.endMs,
      byMs: Math.round(medianOf(own)),
      words: own.length,
      isCutAfter: wordsAfter >= CUT_WORDS,
    };
  });
  return { kept, found: before.length === 0 ? 0 : pairs.length / before.length };
}

/**
 * Where a moment stands in the new cut.
 * @returns milliseconds, never less than 0; null where it was cut out
 */
export function shiftMoment(kept: readonly Shift[], ms: number): number | null {
  const n = kept.findLastIndex(({ fromMs }) => ms >= fromMs);
  const [here, next] = [kept[n], kept[n + 1]];
  const to = (shift: Shift) => Math.max(0, Math.round(ms + shift.byMs));
  if (here && ms <= here.toMs) return to(here);
  // Between two parts a mark stands before its first word rather than after its last.
  if (next && next.fromMs - ms <= BREATH_MS) return to(next);
  if (here && (!here.isCutAfter || ms <= here.toMs + BREATH_MS)) return to(here);
  return null;
}
