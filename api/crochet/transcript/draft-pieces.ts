import { type Terms } from '../span.ts';
import { type Confidence, type DraftLine, type DraftPiece, type Evidence } from './draft.ts';
import { type ReadEntry, type ReadPiece } from './read-pieces.ts';
import { type Token } from './tokens.ts';
import { type Word } from './words.ts';
import { printWork } from './work/print-work.ts';

/** Turns what was read into the draft that people see: labels, shorthand, times, evidence, confidence. */
export function draftPieces(
  pieces: readonly ReadPiece[],
  tokens: readonly Token[],
  words: readonly Word[],
  terms: Terms,
): readonly DraftPiece[] {
  return pieces.map((piece) => ({
    name: piece.name,
    make: piece.make,
    worked: piece.worked,
    lines: [...piece.entries].sort((a, b) => a.at - b.at).map((entry) => draftLine(entry, tokens, words, terms)),
  }));
}

function draftLine(entry: ReadEntry, tokens: readonly Token[], words: readonly Word[], terms: Terms): DraftLine {
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
      text: quote(words, first, last),
      said: null,
      evidence: [evidence('work', words, first, last)],
      unread: null,
      confidence: 'sure',
      verdict: 'no-total',
      count: null,
      loops: 'both',
      units: [],
      topic: entry.topic,
    };
  }
  const { read, kind, announced } = entry;
  const text = printWork(read.units, {
    isUk: terms === 'UK',
    isRows: kind === 'row',
    loops: read.loops,
    base: read.base,
    isRing: read.isRing,
  });
  const { candidate } = announced;
  const workFirst = tokens[Math.min(candidate.end, tokens.length - 1)]!.first;
  const isUnread = read.verdict === 'unread';
  const announcementLast = tokens[Math.max(entry.at, candidate.end - 1)]!.last;
  return {
    ...times,
    kind,
    label: labelOf(kind, read.from, read.to),
    from: read.from,
    to: read.to,
    text,
    said: read.said === null ? null : { sts: [read.said] },
    evidence: [
      evidence('announcement', words, first, announcementLast),
      ...(workFirst <= last ? [evidence(isUnread ? 'unread' : 'work', words, workFirst, last)] : []),
      ...totalEvidence(entry, tokens, words),
    ],
    unread: isUnread
      ? { quote: quote(words, Math.min(workFirst, last), last), atMs: words[Math.min(workFirst, last)]!.startMs }
      : null,
    confidence: confidenceOf(entry),
    verdict: read.verdict,
    count: read.count,
    loops: read.loops,
    units: read.units,
    topic: null,
  };
}

function totalEvidence(
  entry: Extract<ReadEntry, { type: 'line' }>,
  tokens: readonly Token[],
  words: readonly Word[],
): Evidence[] {
  const { said, events } = entry.read;
  const event = events.findLast((one) => one.type === 'number' && one.n === said);
  return event === undefined ? [] : [evidence('total', words, tokens[event.at]!.first, tokens[event.at]!.last)];
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

function evidence(role: Evidence['role'], words: readonly Word[], firstWord: number, lastWord: number): Evidence {
  return {
    role,
    firstWord,
    lastWord,
    startMs: words[firstWord]!.startMs,
    endMs: words[lastWord]!.endMs,
    words: quote(words, firstWord, lastWord),
  };
}

function quote(words: readonly Word[], first: number, last: number): string {
  return words
    .slice(first, last + 1)
    .map((word) => word.text)
    .join(' ');
}
