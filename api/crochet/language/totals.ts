import { type Span } from '../span.ts';
import { isStepWord } from './step-words.ts';
import { isMark, isPlain, isTimesSign, isWord, type Reading } from './reading.ts';
import { figuresBetween } from './amounts.ts';
import { stitchOf } from '../stitches.ts';

type Kinds = Record<string, readonly number[]>;

/** Words that may stand in a total beside its figures. */
const FILLER = [
  'total',
  'in',
  'on',
  'the',
  'of',
  'each',
  'around',
  'round',
  'row',
  'now',
  'counts',
  'across',
  'made',
  'remain',
  'end',
  'side',
  'more',
  'with',
];
const PLAIN_FILLER = new Set([
  'total',
  'now',
  'left',
  'have',
  'you',
  'count',
  'increased',
  'decreased',
  'made',
  'there',
  'are',
  'is',
  'should',
  'complete',
  'completed',
  'all',
  's',
  'r',
  'at',
  'this',
  'point',
  'has',
  'will',
  'be',
  'us',
]);

/**
 * A total between two indices, as in brackets: `18`, `18 sts`, `12 dc, 4 ch-2 sps`, `sc 18`, `=18`, `24 each`,
 * `18 (20, 22)`, `14 A, 4 B`. Null where anything else stands there.
 */
export function totalBetween(reading: Reading, from: number, to: number): Kinds | null {
  const kinds: Kinds = {};
  let at = from;
  let figures = 0;
  if (to - from > 40) return null;
  const several = figuresBetween(reading, from, to);
  if (several && several.length > 1) return { sts: several };
  while (at < to) {
    const lex = reading.lexes[at]!;
    if (lex.kind === 'mark' && ',;+=>-.:&/~"|)]}'.includes(lex.text)) {
      at += 1;
      continue;
    }
    if (
      isWord(lex, 'and', ...FILLER.filter((word) => word !== 'the' || isArticle(reading, at))) ||
      (lex.kind === 'word' && PLAIN_FILLER.has(lex.text))
    ) {
      at += 1;
      continue;
    }
    if (figures > 0 && isWord(lex, 'each') && isWord(reading.lexes[at - 1]!, 'in')) {
      at += 1;
      continue;
    }
    // `at this point` is no group that is counted.
    if (isWord(lex, 'group') && isPlain(reading.lexes[at - 1]!, 'this')) {
      at += 1;
      continue;
    }
    if (lex.kind === 'num') {
      const sized = sizedAt(reading, at, to);
      const unit = unitAt(reading, sized.after, to);
      kinds[unit.kind] = sized.figures;
      figures += 1;
      at = unit.after;
      continue;
    }
    // `sc 18`, `A 14`, `sts 18`.
    // `(14 dc, counting ch)`: what is said of the chain is no figure of its own.
    if (figures > 0 && isPlain(lex, 'counting', 'including', 'incl', 'excluding')) return kinds;
    // `35 dc + ch 3`: the chain apart.
    if (figures > 0 && isChainApart(reading, at, to)) {
      kinds.ch = [reading.lexes[at + 1]!.value];
      at += 2;
      continue;
    }
    const unit = unitAt(reading, at, to);
    let after = unit.after;
    while (
      after > at &&
      after < to &&
      (isMark(reading.lexes[after]!, ':') || isMark(reading.lexes[after]!, '=') || isMark(reading.lexes[after]!, '-'))
    )
      after += 1;
    const number = reading.lexes[after];
    if (unit.after > at && after < to && number?.kind === 'num' && unit.kind !== 'ch') {
      const sized = sizedAt(reading, after, to);
      kinds[unit.kind] = sized.figures;
      figures += 1;
      at = sized.after;
      continue;
    }
    return null;
  }
  return figures > 0 ? kinds : null;
}

function isChainApart(reading: Reading, at: number, to: number): boolean {
  const lex = reading.lexes[at]!;
  const next = reading.lexes[at + 1]!;
  const after = reading.lexes[at + 2]!;
  return (
    lex.kind === 'stitch' &&
    lex.text === 'ch' &&
    next.kind === 'num' &&
    at + 2 <= to &&
    !isWord(after, 'sp', 'loop', 'corner') &&
    !isMark(after, '-')
  );
}

/** `the`, and the `a` of `18 stitches a row`, but not colour A. */
function isArticle(reading: Reading, at: number): boolean {
  const lex = reading.lexes[at]!;
  return lex.end - lex.start > 1 || isWord(reading.lexes[at + 1]!, 'round', 'row', 'total');
}

function sizedAt(reading: Reading, at: number, to: number): { figures: number[]; after: number } {
  const first = reading.lexes[at]!.value;
  const open = at + 1;
  const close = reading.closes.get(open);
  if (open < to && close !== undefined && close < to) {
    const others = figuresBetween(reading, open + 1, close);
    if (others) return { figures: [first, ...others], after: close + 1 };
  }
  return { figures: [first], after: at + 1 };
}

/** The kind that is counted: `dc`, `ch-2 sp`, `sp`, `A`; plain stitches are `sts`. */
function unitAt(reading: Reading, at: number, to: number): { kind: string; after: number } {
  const lex = reading.lexes[at];
  if (!lex || at >= to) return { kind: 'sts', after: at };
  if (isMark(lex, '-') && lex.glued && at + 1 < to) {
    const next = reading.lexes[at + 1]!;
    // `4 2-ch sps` and `6-inc` come here from the number before.
    if (next.kind === 'stitch') return unitAt(reading, at + 1, to);
  }
  if (isWord(lex, 'st')) return skipSts(reading, at + 1, to, 'sts');
  if (isTimesSign(lex) && reading.lexes[at + 1]?.kind === 'num' && at + 1 < to) return unitAt(reading, at + 1, to);
  if (lex.kind === 'num') {
    const skip = isMark(reading.lexes[at + 1]!, '-') ? 2 : 1;
    const next = reading.lexes[at + skip];
    if (next && at + skip < to) {
      if (isWord(next, 'sp2', 'corner')) return { kind: `ch-${lex.value} sp`, after: at + skip + 1 };
      const hyphen = isMark(reading.lexes[at + skip + 1]!, '-') ? 1 : 0;
      if (
        next.kind === 'stitch' &&
        next.text === 'ch' &&
        isWord(reading.lexes[at + skip + 1 + hyphen]!, 'sp', 'loop', 'corner')
      )
        return { kind: `ch-${lex.value} sp`, after: at + skip + 2 + hyphen };
      if (next.kind === 'stitch' && isWord(reading.lexes[at + skip + 1]!, 'group'))
        return { kind: 'group', after: at + skip + 2 };
      if (next.kind === 'stitch' && stitchOf(next.text)?.family === 'bunch')
        return { kind: next.text, after: at + skip + 1 };
    }
    return { kind: 'sts', after: at };
  }
  if (isWord(lex, 'corner')) {
    const after = isWord(reading.lexes[at + 1]!, 'sp', 'sp2') ? at + 2 : at + 1;
    return isWord(reading.lexes[after]!, 'sp2') ? { kind: 'sp', after: after + 1 } : { kind: 'corner', after };
  }
  if (isWord(lex, 'sp', 'sp2', 'loop', 'gap')) return { kind: lex.text === 'gap' ? 'gap' : 'sp', after: at + 1 };
  if (isWord(lex, 'group')) return skipSts(reading, at + 1, to, 'group');
  if (lex.kind === 'stitch') {
    if (lex.text === 'ch') {
      let next = at + 1;
      if (isMark(reading.lexes[next]!, '-')) next += 1;
      const number = reading.lexes[next]!;
      if (number.kind === 'num' && next < to) {
        let noun = next + 1;
        if (isMark(reading.lexes[noun]!, '-')) noun += 1;
        if (isWord(reading.lexes[noun]!, 'sp', 'loop', 'corner', 'sp2') && noun < to) {
          const extra = isWord(reading.lexes[noun + 1]!, 'sp', 'sp2') ? 1 : 0;
          return { kind: `ch-${number.value} sp`, after: noun + 1 + extra };
        }
        return { kind: `ch-${number.value} sp`, after: next + 1 };
      }
      if (isWord(reading.lexes[next]!, 'sp', 'loop') && next < to) return { kind: 'sp', after: next + 1 };
      return { kind: 'ch', after: at + 1 };
    }
    const row = stitchOf(lex.text);
    if (isWord(reading.lexes[at + 1]!, 'group') && at + 1 < to) return { kind: 'group', after: at + 2 };
    if (row?.family === 'increase' || row?.family === 'decrease') return { kind: lex.text, after: at + 1 };
    return skipSts(reading, at + 1, to, lex.text);
  }
  if (isWord(lex, 'the') && lex.end - lex.start === 1) return { kind: 'A', after: at + 1 };
  if (lex.kind === 'word' && lex.text.length === 1 && !isTimesSign(lex))
    return { kind: lex.text.toUpperCase(), after: at + 1 };
  return { kind: 'sts', after: at };
}

function skipSts(reading: Reading, at: number, to: number, kind: string): { kind: string; after: number } {
  let after = at;
  while (after < to && (isWord(reading.lexes[after]!, 'st') || isMark(reading.lexes[after]!, "'"))) after += 1;
  return { kind, after };
}

/** Whether what stands here, to the limit or the next step, is a total without a bracket; the cursor goes behind it. */
export function readBareTotal(reading: Reading, limit: number, from: number): boolean {
  const start = reading.at;
  const end = totalEnd(reading, limit);
  if (end === null) return false;
  const kinds = totalBetween(reading, start, end);
  if (!kinds) return false;
  const hasFigure = Object.keys(kinds).length > 0;
  if (!hasFigure) return false;
  pushTotal(reading, kinds, { start: reading.lexes[from]!.start, end: reading.lexes[end - 1]!.end });
  reading.at = end;
  return true;
}

/** Where a bare total would end: at the limit, a full stop, or before a step such as `join`. */
function totalEnd(reading: Reading, limit: number): number | null {
  for (let at = reading.at; at < Math.min(limit, reading.at + 24); at += 1) {
    const lex = reading.lexes[at]!;
    if (isMark(lex, '.') || isWord(lex, 'join', 'turn')) return at > reading.at ? at : null;
    if (isMark(lex, '-') && !lex.glued && at > reading.at && reading.lexes[at + 1]!.kind === 'word') return at;
    if (
      (lex.kind === 'word' && at > reading.at && isStepWord(lex)) ||
      (isMark(lex, '(') && reading.closes.get(at) === undefined)
    )
      return at > reading.at ? at : null;
  }
  return limit - reading.at <= 24 && limit > reading.at ? limit : null;
}

export function pushTotal(reading: Reading, kinds: Kinds, span: Span): void {
  reading.totals.push({ kinds, span });
}

/** Whether a bracket that holds only a total is followed by words that make it a group instead. */
export function isGroupAfterAll(reading: Reading, close: number): boolean {
  const next = reading.lexes[close + 1]!;
  const after = reading.lexes[close + 2]!;
  if (isTimesSign(next)) return true;
  if (isMark(next, '*') && after.kind === 'num') return true;
  if (next.kind === 'num') return isWord(after, 'times', 'more') || isTimesSign(after);
  if (isWord(next, 'in')) return !isWord(after, 'total');
  if (isWord(next, 'twice', 'thrice', 'rep', 'around', 'across', 'times', 'once')) return true;
  return isWord(next, 'to') && isWord(after, 'end', 'last', 'the');
}
