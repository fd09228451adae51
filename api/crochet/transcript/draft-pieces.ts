import { type Terms } from '../span.ts';
import { type Confidence, type DraftLine, type DraftPiece } from './draft.ts';
import { evidence, evidenceOf, quote, unreadSpan } from './evidence.ts';
import { type ReadEntry, type ReadPiece } from './read-pieces.ts';
import { type Sentences } from './sentences.ts';
import { stepText } from './step-text.ts';
import { type Token } from './tokens.ts';
import { type Word } from './words.ts';
import { printWork } from './work/print-work.ts';

/** What the lines were read from. */
export interface Spoken {
  readonly tokens: readonly Token[];
  readonly words: readonly Word[];
  readonly sentences: Sentences;
}

/** Turns what was read into the draft that people see: labels, shorthand, times, evidence, confidence. */
export function draftPieces(pieces: readonly ReadPiece[], spoken: Spoken, terms: Terms): readonly DraftPiece[] {
  return pieces.map((piece) => ({
    name: piece.name,
    make: piece.make,
    worked: piece.worked,
    lines: [...piece.entries].sort((a, b) => a.at - b.at).map((entry) => draftLine(entry, spoken, terms)),
  }));
}

function draftLine(entry: ReadEntry, spoken: Spoken, terms: Terms): DraftLine {
  const { tokens, words, sentences } = spoken;
  const first = tokens[entry.at]!.first;
  const last = tokens[Math.max(entry.at, entry.to - 1)]!.last;
  const times = { startMs: words[first]!.startMs, endMs: words[last]!.endMs };
  if (entry.type === 'step') {
    return {
      ...times,
      kind: 'step',
      label: '',
      from: null,
      to: null,
      text: stepText(quote(words, tokens[entry.textFrom]!.first, last)),
      said: null,
      evidence: [evidence('work', { from: entry.trigger, to: Math.max(entry.trigger + 1, entry.to) }, tokens, words)],
      unread: null,
      confidence: 'sure',
      verdict: 'no-total',
      count: null,
      loops: 'both',
      units: [],
      topic: entry.topic,
    };
  }
  const { read, kind } = entry;
  const text = printWork(read.units, {
    isUk: terms === 'UK',
    isRows: kind === 'row',
    loops: read.loops,
    base: read.base,
    isRing: read.isRing,
    isInvisible: read.isInvisible,
  });
  const unread = unreadSpan(entry, tokens, sentences);
  const unreadQuote = unread === null ? '' : quote(words, tokens[unread.from]!.first, tokens[unread.to - 1]!.last);
  return {
    ...times,
    kind,
    label: labelOf(kind, read.from, read.to),
    from: read.from,
    to: read.to,
    text: read.vague === null ? text : withOpenEnd(text, unreadQuote),
    said: read.said === null ? null : { sts: [read.said] },
    evidence: evidenceOf(entry, tokens, words, sentences),
    unread: unread === null ? null : { quote: unreadQuote, atMs: words[tokens[unread.from]!.first]!.startMs },
    confidence: confidenceOf(entry),
    verdict: read.verdict,
    count: read.count,
    loops: read.loops,
    units: read.units,
    topic: null,
  };
}

/** What was told of the work, then in the maker's own words what leaves it open: `2 sc, dec, and so on as you like`. */
function withOpenEnd(text: string, open: string): string {
  const words = open.replace(/[\s.,;:!?…]+$/u, '');
  return text === '' ? words : `${text}, ${words}`;
}

function confidenceOf({ read }: Extract<ReadEntry, { type: 'line' }>): Confidence {
  if (read.verdict === 'unread') return 'ask';
  if (read.verdict === 'agrees') return read.lead < 0.5 ? 'look' : 'sure';
  if (read.verdict === 'no-total') return read.lead < 1 ? 'look' : 'sure';
  return 'look';
}

function labelOf(kind: 'foundation' | 'round' | 'row', from: number | null, to: number | null): string {
  if (kind === 'foundation' || from === null) return 'Foundation';
  const isRange = to !== null && to !== from;
  if (kind === 'row') return isRange ? `Rows ${from}–${to}` : `Row ${from}`;
  return isRange ? `R${from}–${to}` : `R${from}`;
}
