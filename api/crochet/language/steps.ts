import { type Item, type Step } from './tree.ts';
import { VERBS } from './step-words.ts';
import { totalBetween } from './totals.ts';
import { type Lex } from './lexer.ts';
import { isMark, isPlain, isSeparator, isWord, peek, spanFrom, take, takeAll, type Reading } from './reading.ts';

const KIND: Readonly<Record<string, Step['what']>> = {
  change: 'colour',
  changing: 'colour',
  switch: 'colour',
  colour: 'colour',
  color: 'colour',
  introduce: 'colour',
  fasten: 'finish',
  fo: 'finish',
  finish: 'finish',
  cut: 'finish',
  break: 'finish',
  mark: 'marker',
  place: 'marker',
  move: 'marker',
};

/** Takes everything to the next comma, semicolon or full stop at this depth. Brackets inside are taken whole. */
export function takeClause(reading: Reading, limit: number, stops: readonly string[] = [',', ';', '.']): void {
  while (reading.at < limit) {
    const lex = peek(reading);
    if (lex.kind === 'mark' && stops.includes(lex.text)) return;
    const close = isMark(lex, '(') || isMark(lex, '[') || isMark(lex, '{') ? reading.closes.get(reading.at) : undefined;
    if (close !== undefined && close < limit && isTotalBracket(reading, reading.at, close)) return;
    if (close !== undefined && close < limit && totalBetween(reading, reading.at + 1, close)) return;
    if (isMark(lex, '*') || isMark(lex, '**') || isMark(lex, '=')) return;
    if (isTotalSign(lex) && reading.lexes[reading.at + 1]!.kind === 'num') return;
    if (isMark(lex, '-') && !lex.glued && reading.lexes[reading.at + 1]!.kind === 'num') return;
    reading.at = close !== undefined && close < limit ? close + 1 : reading.at + 1;
  }
}

/** `→ 12`, `~ 12`: what stands behind is a total. */
const isTotalSign = (lex: Lex): boolean => isMark(lex, '>') || isMark(lex, '~');

function isTotalBracket(reading: Reading, open: number, close: number): boolean {
  return close - open >= 2 && reading.lexes[open + 1]!.kind === 'num' && close - open <= 6;
}

function step(reading: Reading, from: number, what: Step['what'], extra: Partial<Step> = {}): Step {
  const span = spanFrom(reading, from);
  return { type: 'step', span, what, text: textOf(reading, from), ...extra };
}

const textOf = (reading: Reading, from: number): string =>
  reading.lexes
    .slice(from, reading.at)
    .map((lex) => lex.text)
    .join(' ');

/** A step that begins here, or null and nothing taken. */
export function readStep(reading: Reading, limit: number): Item | null {
  const from = reading.at;
  const lex = peek(reading);
  if (isOnlyThese(reading)) {
    takeClause(reading, limit);
    return step(reading, from, 'leave', { n: -1 });
  }
  if (isWord(lex, 'not')) {
    reading.at += 1;
    const what = isWord(peek(reading), 'turn') ? 'no-turn' : isWord(peek(reading), 'join') ? 'do' : 'do';
    takeClause(reading, limit);
    return step(reading, from, what);
  }
  if (isWord(lex, 'turn')) {
    reading.at += 1;
    if (isPlain(peek(reading), 'over', 'work')) reading.at += 1;
    return step(reading, from, 'turn');
  }
  if (isWord(lex, 'join')) return readJoin(reading, limit);
  if (isWord(lex, 'marker', 'marked')) {
    reading.at += 1;
    takeClause(reading, limit);
    return step(reading, from, 'marker');
  }
  if (isWord(lex, 'counts')) {
    takeClause(reading, limit);
    return step(reading, from, 'do');
  }
  if (lex.kind === 'word' && VERBS.has(lex.text)) {
    if (lex.text === 'leave' || lex.text === 'leaving') return readLeave(reading, limit);
    if (lex.text === 'with' || lex.text === 'using') return null;
    reading.at += 1;
    // `attach leg: sc 2 through leg and body`: what stands behind the colon is worked.
    const isAttaching = ['attach', 'add', 'insert', 'pinch'].includes(lex.text);
    takeClause(reading, limit, isAttaching ? [',', ';', '.', ':'] : undefined);
    return step(reading, from, KIND[lex.text] ?? 'do');
  }
  return null;
}

/** `join`, `join with sl st to first dc`, `join to top of beg ch-3`. */
function readJoin(reading: Reading, limit: number): Item {
  const from = reading.at;
  reading.at += 1;
  let into: Step['into'] = 'unsaid';
  const clause = reading.at;
  takeClause(reading, limit);
  const words = reading.lexes.slice(clause, reading.at);
  if (words.some((lex) => isWord(lex, 'ring'))) return step(reading, from, 'ring');
  const isTop =
    words.some((lex) => isWord(lex, 'top', 'turningchain')) ||
    words.some((lex) => lex.kind === 'stitch' && lex.text === 'ch');
  if (isTop) into = 'chain';
  else if (
    words.some((lex) => isWord(lex, 'first')) &&
    words.some((lex) => lex.kind === 'stitch' && lex.text !== 'slst')
  )
    into = 'stitch';
  return step(reading, from, 'join', { into });
}

/** `leave last st unworked`, `leave 2 sts`; anything else left (`leave a long tail`) is only done. */
function readLeave(reading: Reading, limit: number): Item {
  const from = reading.at;
  reading.at += 1;
  takeAll(reading, 'the', 'last', 'next', 'remain');
  if (isOthers(reading)) {
    takeClause(reading, limit);
    return step(reading, from, 'leave', { n: -1 });
  }
  const number = peek(reading);
  const n = number.kind === 'num' ? number.value : 1;
  const isPlaces =
    number.kind === 'num'
      ? isWord(peek(reading, 1), 'st', 'skipped') || peek(reading, 1).kind === 'stitch' || isSeparator(peek(reading, 1))
      : isWord(number, 'st', 'skipped') || reading.lexes[reading.at - 1]!.text === 'last';
  const isRest = isWord(reading.lexes[reading.at - 1]!, 'remain') && number.kind !== 'num';
  takeClause(reading, limit);
  return isPlaces ? step(reading, from, 'leave', { n: isRest ? -1 : n }) : step(reading, from, 'do');
}

/** `cont on these 16 sts only`: what is left is not worked for now. */
const isOnlyThese = (reading: Reading): boolean => {
  const at = isPlain(peek(reading), 'cont', 'continue') ? 1 : 0;
  const isNumber = peek(reading, at + 2).kind === 'num';
  return (
    isWord(peek(reading, at), 'on') &&
    isPlain(peek(reading, at + 1), 'these') &&
    isWord(peek(reading, at + (isNumber ? 3 : 2)), 'st') &&
    isPlain(peek(reading, at + (isNumber ? 4 : 3)), 'only')
  );
};

/** `leave the rest`, `leaving the others for the present`: all that is left. */
function isOthers(reading: Reading): boolean {
  const isRest = isWord(reading.lexes[reading.at - 1]!, 'remain');
  const next = peek(reading, isRest ? 0 : 1);
  const isEnd = isSeparator(next) || next.kind === 'end' || isPlain(next, 'for');
  return isEnd && (isRest || isPlain(peek(reading), 'others'));
}

/** `sl st in first sc`, `sl st to join`, `ss to top of 3 ch`: a slip stitch that joins a round. */
export function readSlipJoin(reading: Reading, limit: number, hasWork: boolean): Item | null {
  const from = reading.at;
  const lex = peek(reading);
  if (lex.kind !== 'stitch' || lex.text !== 'slst') return null;
  reading.at += 1;
  const rest = reading.at;
  if (hasWork && endsRound(reading, limit)) return step(reading, from, 'join', { into: 'unsaid' });
  if (formsRing(reading)) {
    takeClause(reading, limit);
    return step(reading, from, 'ring');
  }
  if (isWord(peek(reading), 'join')) {
    takeClause(reading, limit);
    return step(reading, from, 'join', { into: joinPlace(reading, rest) });
  }
  if (take(reading, 'in', 'to')) {
    takeAll(reading, 'the');
    const place = peek(reading);
    const isFirst = isWord(place, 'first', 'top', 'turningchain') || isChainTop(reading);
    const goesOn =
      isWord(peek(reading, 1), 'sp', 'sp2', 'corner') || (isWord(place, 'first') && peek(reading, 1).kind === 'num');
    if (isWord(place, 'join', 'end') || (isFirst && !goesOn)) {
      takeClause(reading, limit);
      return step(reading, from, 'join', { into: joinPlace(reading, rest) });
    }
  }
  reading.at = from;
  return null;
}

/** `…, ss. 27 sc.`, `…, sl st, ch 1 (6)`: a slip stitch alone at the end of a round closes it. */
function endsRound(reading: Reading, limit: number): boolean {
  let i = 0;
  if (isMark(peek(reading, i), ',') || isMark(peek(reading, i), ';')) i += 1;
  const isChain = peek(reading, i).kind === 'stitch' && peek(reading, i).text === 'ch';
  if (isChain) i += peek(reading, i + 1).kind === 'num' ? 2 : 1;
  if (i === 1 && !isChain && !isWord(peek(reading, 1), 'turn')) return false;
  const lex = peek(reading, i);
  if (reading.at + i >= limit) return true;
  const close =
    isMark(lex, '(') || isMark(lex, '[') || isMark(lex, '{') ? reading.closes.get(reading.at + i) : undefined;
  if (close !== undefined) return totalBetween(reading, reading.at + i + 1, close) !== null;
  return isMark(lex, '.') || isMark(lex, '=') || isMark(lex, '>') || isWord(lex, 'turn');
}

/** `to form a ring`, `in first ch to make ring`, within this clause. */
function formsRing(reading: Reading): boolean {
  for (let i = 0; i < 12; i += 1) {
    const lex = peek(reading, i);
    if (lex.kind === 'end' || isMark(lex, ',') || isMark(lex, '.') || isMark(lex, ';')) return false;
    if (isPlain(lex, 'form', 'forming', 'forms') || (isWord(lex, 'work') && i > 0)) return true;
  }
  return false;
}

/** `3rd ch of beg ch-3`, `top of ch 3`. */
function isChainTop(reading: Reading): boolean {
  const lex = peek(reading);
  const isNth =
    lex.kind === 'ord' &&
    ((peek(reading, 1).kind === 'stitch' && peek(reading, 1).text === 'ch') ||
      (isWord(peek(reading, 1), 'of') && peek(reading, 2).kind === 'num') ||
      (isWord(peek(reading, 1), 'st') && isWord(peek(reading, 2), 'of') && peek(reading, 3).text === 'ch'));
  return isNth && !isWord(peek(reading, 2), 'hook');
}

function joinPlace(reading: Reading, from: number): NonNullable<Step['into']> {
  const words = reading.lexes.slice(from, reading.at);
  if (words.some((lex) => isWord(lex, 'top', 'turningchain') || (lex.kind === 'stitch' && lex.text === 'ch')))
    return 'chain';
  return words.some((lex) => lex.kind === 'stitch' && lex.text !== 'slst') ? 'stitch' : 'unsaid';
}
