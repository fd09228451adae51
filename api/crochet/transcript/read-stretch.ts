import { type Terms } from '../span.ts';
import { type Verdict } from '../count/result.ts';
import { withAliases } from './aliases.ts';
import { findCandidates } from './announce/candidates.ts';
import { type Announced } from './announce/chain.ts';
import { quote } from './evidence.ts';
import { type Before, readSpokenLine, type Talk } from './read-line.ts';
import { sentencesOf } from './sentences.ts';
import { stepText } from './step-text.ts';
import { findSuggestions } from './suggestions.ts';
import { inferTerms, inUsTerms } from './terms.ts';
import { type Token, tokensOf } from './tokens.ts';
import { printWork } from './work/print-work.ts';
import { type Word, wordsOf } from './words.ts';
import { type HeardCue, wordsAsHeard } from './words-as-heard.ts';

/** What is known of the line that chosen words shall become. */
export interface StretchSetting {
  /** First and last word, numbered over the whole transcript as the file has them. */
  readonly firstWord: number;
  readonly lastWord: number;
  readonly unit: 'round' | 'row';
  /** Places that the line before leaves; null where it is the first, or they are not known. */
  readonly base: number | null;
  /** Terms in which the recording is spoken; inferred from all of it where they are not given. */
  readonly spoken?: Terms;
  /** Terms in which the line is to be written. */
  readonly written: Terms;
}

/** What a stretch of speech reads as, whoever chose it. */
export interface StretchReading {
  /** The words themselves. */
  readonly words: string;
  readonly startMs: number;
  readonly endMs: number;
  /** The instruction in shorthand; empty where nothing of it was understood. */
  readonly text: string;
  /** As a step: the words as a sentence. */
  readonly step: string;
  /** The number that is most like a total. */
  readonly said: number | null;
  /** Numbers of the round or row that the words name. */
  readonly from: number | null;
  readonly to: number | null;
  readonly verdict: Verdict;
  /** Which material it would be. */
  readonly material: 'yarn' | 'hook' | 'notion';
}

/** A caption with its times, as the file had it and as it was corrected. */
export interface TimedHeardCue extends HeardCue {
  readonly startMs: number;
  readonly endMs: number;
}

/** The words of the captions as they stand now that were heard as words `first` to `last`. */
function chosenWords(
  cues: readonly TimedHeardCue[],
  { firstWord, lastWord }: StretchSetting,
): [readonly Word[], readonly Word[]] {
  const all = wordsOf(
    cues.map(({ startMs, endMs, heard, corrected }) => ({ startMs, endMs, text: corrected ?? heard })),
  );
  const numbers = wordsAsHeard(cues)
    .flat()
    .filter(({ first }) => first >= 0);
  return [all, all.filter((_, n) => numbers[n]!.last >= firstWord && numbers[n]!.first <= lastWord)];
}

/** The line that the words announce themselves, else one that stands before their first word. */
function announcedIn(tokens: readonly Token[], talk: Talk, unit: 'round' | 'row'): Announced {
  const named = findCandidates(tokens, talk.sentences).find(
    ({ kind, lines }) => kind === 'line' && lines.type === 'named',
  );
  if (named?.lines.type === 'named') {
    return { candidate: named, from: named.lines.from, to: named.lines.to, begins: false };
  }
  const lines = { type: 'next', many: 1 } as const;
  const candidate = { kind: 'line', at: 0, end: 0, mark: 0, unit, lines, strength: 0, needs: null } as const;
  return { candidate, from: null, to: null, begins: false };
}

/** The line before, as far as it matters: so many places of one stitch. */
const lineOf = (places: number): Before['piece'][number] => ({
  from: null,
  to: null,
  units: [{ type: 'stitch', stitch: 'sc', inOne: 1, times: places }],
  base: null,
  loops: 'both',
  said: null,
  isDoubtful: false,
  left: null,
  leavesOutInside: null,
  verdict: 'agrees',
});

/**
 * Reads words that somebody chose in a transcript as a line of a pattern: instruction, total, numbers, as a reading of the
 * whole would. Never throws. Null where there are no such words.
 */
export function readStretch(cues: readonly TimedHeardCue[], setting: StretchSetting): StretchReading | null {
  const [all, words] = chosenWords(cues, setting);
  const [first, last] = [words[0], words.at(-1)];
  if (!first || !last) return null;
  const spoken = setting.spoken ?? inferTerms(tokensOf(all).tokens).terms;
  const material = materialOf(words);
  const tokens = withAliases(inUsTerms(tokensOf(words).tokens, spoken));
  const said = quote(words, 0, words.length);
  const times = { material, words: said, startMs: first.startMs, endMs: last.endMs, step: stepText(said) };
  if (tokens.length === 0) return { ...times, text: '', said: null, from: null, to: null, verdict: 'unread' };
  const sentences = sentencesOf(tokens, words);
  const talk: Talk = { tokens, sentences, skipped: tokens.map(() => false) };
  const announced = announcedIn(tokens, talk, setting.unit);
  const read = readSpokenLine(
    talk,
    { announced, from: 0, to: tokens.length },
    {
      piece: setting.base === null ? [] : [lineOf(setting.base)],
      all: [],
      chains: null,
      introFrom: 0,
      stitch: 'sc',
      isRows: setting.unit === 'row',
      chainCounts: null,
      chainJoined: false,
    },
  );
  const text = printWork(read.units, {
    isUk: setting.written === 'UK',
    isRows: setting.unit === 'row',
    loops: read.loops,
    base: read.base,
    isRing: read.isRing,
    isInvisible: read.isInvisible,
  });
  return {
    ...times,
    text,
    said: read.said ?? totalIn(tokens),
    from: announced.from,
    to: announced.to,
    verdict: read.verdict,
  };
}

/** Yarn or a hook where the words speak of one, else a notion. */
function materialOf(words: readonly Word[]): StretchReading['material'] {
  const kinds = new Set(findSuggestions(words, words.length).map(({ kind }) => kind));
  return kinds.has('hook') ? 'hook' : kinds.has('yarn') ? 'yarn' : 'notion';
}

/** The last plain number said, where the words are nothing but a total: `that gives us eighteen`. */
function totalIn(tokens: readonly Token[]): number | null {
  if (tokens.some(({ kind }) => 'SPD'.includes(kind))) return null;
  const number = tokens.findLast(({ kind, isGuess }) => kind === 'N' && !isGuess);
  return number === undefined ? null : Number(number.value);
}
