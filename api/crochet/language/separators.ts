import { type Item } from './tree.ts';
import { hasWork } from './groups.ts';
import { type Lex } from './lexer.ts';
import { isMark, isPlain, isSeparator, isTimesSign, isWord, peek, spanFrom, takeAll, type Reading } from './reading.ts';
import { isStepWord } from './step-words.ts';
import { readBareTotal } from './totals.ts';
import { readEachRoundTotal, readToldTotal } from './told-totals.ts';

/** Separators between items; a total without a bracket may stand behind one. */
export function skipSeparator(reading: Reading, limit: number, items: readonly Item[]): boolean {
  const lex = peek(reading);
  if (!isSeparator(lex)) return bareEnd(reading, limit, items);
  if (isMark(lex, '|') && bar(reading, limit) !== null) return false;
  const from = reading.at;
  reading.at += 1;
  if (isMark(lex, '=') || isMark(lex, '>') || isMark(lex, '~')) {
    if (isMark(peek(reading), '>')) reading.at += 1;
    if (readBareTotal(reading, limit, from)) return true;
    return true;
  }
  if (!hasWork(items) || reading.at >= limit) return true;
  if (isMark(lex, '<')) {
    if (readBareTotal(reading, limit, from)) return true;
    return true;
  }
  const next = peek(reading);
  const after = peek(reading, 1);
  if (readToldTotal(reading, limit)) return true;
  if (next.kind !== 'num') return true;
  if (isClosed(items) && readEachRoundTotal(reading)) return true;
  const ends =
    after.kind === 'end' ||
    reading.at + 1 >= limit ||
    isMark(after, '.') ||
    isMark(after, '(') ||
    onlyMarks(reading, limit) ||
    isStepWord(after) ||
    isDashed(reading);
  if (ends || isWord(after, 'st') || after.kind === 'stitch' || isWord(after, 'sp', 'sp2', 'group', 'loop', 'total')) {
    if (isTotalHere(reading, lex.text, items, limit, ends)) readBareTotal(reading, limit, from);
  }
  return true;
}

const isAll = (lex: Lex): boolean => isPlain(lex, 'all') || (isWord(lex, 'each') && lex.end - lex.start === 3);

/** `on rnd`, `in the round`. */
const isRoundWordAt = (reading: Reading, ahead: number): boolean =>
  isWord(peek(reading, ahead), 'round', 'row') ||
  (isWord(peek(reading, ahead), 'the') && isWord(peek(reading, ahead + 1), 'round', 'row'));

/** `--- 18 ---`, `|18|`: nothing but marks behind the figure. */
function onlyMarks(reading: Reading, limit: number, ahead = 1): boolean {
  let at = reading.at + ahead;
  while (at < limit && at < reading.at + 8 && isSeparator(reading.lexes[at]!)) at += 1;
  return at >= limit;
}

/** Whether figures behind this separator are a total and not the next work. */
export function isTotalHere(
  reading: Reading,
  separator: string,
  items: readonly Item[],
  limit: number,
  ends: boolean,
): boolean {
  const next = peek(reading, 1);
  if (isWord(peek(reading, 2), 'in', 'on') && isRoundWordAt(reading, 3)) return true;
  // `twenty stitches in all`.
  const after = peek(reading, 4);
  if (isWord(peek(reading, 2), 'in') && isAll(peek(reading, 3)) && (after.kind === 'end' || isSeparator(after)))
    return true;
  if (isWord(peek(reading, 2), 'in', 'on', 'around', 'across', 'to', 'each')) return false;
  if (ends) return true;
  if (isWord(peek(reading, 2), 'total')) return true;
  if (separator === ',' && !isWord(next, 'st')) return false;
  if (isWord(next, 'st'))
    return isClosed(items) || separator === '-' || separator === '.' || separator === ':' || separator === ';'
      ? reading.at + 2 >= limit || endsSoon(reading, 2)
      : false;
  if (separator === ':' && onlyMarks(reading, limit, 2)) return true;
  const isSaid = separator === '.' && (isAtLast(reading) || isAgain(reading, items));
  return (isClosed(items) || isSaid) && endsSoon(reading, 2) && separator !== ',';
}

export function endsSoon(reading: Reading, ahead: number): boolean {
  for (let i = ahead; i < ahead + 24; i += 1) {
    const lex = peek(reading, i);
    if (lex.kind === 'end' || isMark(lex, '.') || isWord(lex, 'join', 'turn', 'total', 'round', 'row', 'remain'))
      return true;
    if (isPlain(lex, 'fasten', 'fo')) return true;
    if (
      !isMark(lex, ',') &&
      !isMark(lex, '+') &&
      !isTimesSign(lex) &&
      !isWord(lex, 'and', 'sp', 'sp2', 'st', 'group', 'loop') &&
      lex.kind !== 'num' &&
      lex.kind !== 'stitch' &&
      !isMark(lex, '-')
    )
      return false;
  }
  return false;
}

/** `…, 1 dc in last 2.`: the sentence before went to the last place there is. */
function isAtLast(reading: Reading): boolean {
  let at = reading.at - 2;
  const isNoun = (lex: Lex | undefined): boolean => lex !== undefined && (isWord(lex, 'st') || lex.kind === 'stitch');
  if (isNoun(reading.lexes[at])) at -= 1;
  if (reading.lexes[at]?.kind === 'num') at -= 1;
  const lex = reading.lexes[at];
  return lex !== undefined && isWord(lex, 'last');
}

/** `1 dc in each of the 40 row ends. 40 dc.`: the figure and the stitch of the work before, once more. */
function isAgain(reading: Reading, items: readonly Item[]): boolean {
  const last = items.at(-1);
  return (
    last?.type === 'work' &&
    last.into !== null &&
    last.times.type === 'n' &&
    last.times.n[0] === peek(reading).value &&
    last.stitch === peek(reading, 1).text
  );
}

/** More notes than this do not stand between a work and its total. */
const FEW_NOTES = 20;

/** Whether the work so far has said how far it goes, so that figures now can only be its total. */
export function isClosed(items: readonly Item[]): boolean {
  const last = items.slice(-FEW_NOTES).findLast((item) => item.type !== 'note');
  if (!last) return false;
  if (last.type === 'group') return last.times.type !== 'unsaid';
  if (last.type === 'work')
    return last.times.type === 'fill' || last.into?.what === 'ring' || last.into?.which === 'last' || last.multiplied;
  return last.type === 'step' || last.type === 'straight' || last.type === 'relative' || last.type === 'shaped';
}

/** `inc x 6 18`: a bare number at the very end. */
export function bareEnd(reading: Reading, limit: number, items: readonly Item[]): boolean {
  if (peek(reading).kind !== 'num' || !hasWork(items)) return false;
  const next = peek(reading, 1);
  const atEnd = onlyMarks(reading, limit);
  const withUnit = isWord(next, 'st') && (reading.at + 2 >= limit || isMark(peek(reading, 2), '.')) && isClosed(items);
  return (atEnd || withUnit || isRoundByRound(reading, limit)) && readBareTotal(reading, limit, reading.at);
}

/** `20:15:10`: a total for each round of a range. */
function isRoundByRound(reading: Reading, limit: number): boolean {
  let at = reading.at;
  while (at + 2 < limit && reading.lexes[at]!.kind === 'num' && isMark(reading.lexes[at + 1]!, ':')) at += 2;
  return at > reading.at && at + 1 === limit && reading.lexes[at]!.kind === 'num';
}

/** `54 – if it ripples, go down half a size`: a figure, a dash and prose. */
function isDashed(reading: Reading): boolean {
  const dash = peek(reading, 1);
  const word = peek(reading, 2);
  return isMark(dash, '-') && !dash.glued && (word.kind === 'word' || isStepWord(word));
}

/** `you will have 18 stitches`. */
export function readSentenceTotal(reading: Reading, limit: number): Item[] | null {
  const from = reading.at;
  reading.at += 1;
  takeAll(reading, 'total', 'of', 'the');
  const most = reading.at + FEW_NOTES;
  while (reading.at < most && peek(reading).kind === 'word' && !isTimesSign(peek(reading))) reading.at += 1;
  if (isMark(peek(reading), ':') || isMark(peek(reading), '=')) reading.at += 1;
  if (peek(reading).kind === 'num' && readBareTotal(reading, limit, from)) return [];
  reading.at = from + 1;
  return [{ type: 'note', span: spanFrom(reading, from), text: 'total' }];
}

export function bar(reading: Reading, limit: number): number | null {
  for (let at = reading.at + 1; at < Math.min(limit, reading.at + 40); at += 1) {
    if (isMark(reading.lexes[at]!, '|'))
      return at > reading.at + 1 &&
        (isTimesSign(reading.lexes[at + 1]!) ||
          reading.lexes[at + 1]!.kind === 'num' ||
          isWord(reading.lexes[at + 1]!, 'rep', 'around'))
        ? at
        : null;
  }
  return null;
}
