import { type ChainCounts, type Sized, type Work } from './tree.ts';
import { ONE, readMultiple, readSized } from './amounts.ts';
import { isMark, isPlain, isWord, peek, spanFrom, take, type Reading } from './reading.ts';
import { type Lex } from './lexer.ts';
import { groupsAfterGap } from './noun.ts';
import { times } from './times.ts';

export function chain(reading: Reading, from: number, before: Sized | null, glued: boolean): Work {
  if (isMark(peek(reading), '-') && peek(reading, 1).kind === 'num') reading.at += 1;
  if (!before && isWord(peek(reading), 'of') && peek(reading, 1).kind === 'num') reading.at += 1;
  const after = before ? null : readSized(reading);
  if (after) take(reading, 'st');
  const multiple = after || before ? null : readMultiple(reading);
  if (isPlain(peek(reading), 'loosely', 'tightly', 'only')) reading.at += 1;
  const counts = readChainCounts(reading);
  const between = take(reading, 'gap');
  if (between) groupsAfterGap(reading);
  return {
    type: 'work',
    span: spanFrom(reading, from),
    stitch: 'ch',
    per: ONE,
    times: times(before ?? after ?? multiple ?? ONE),
    into: null,
    loops: null,
    glued,
    multiplied: multiple !== null,
    ...(between && { between: true as const }),
    ...(counts && { counts }),
  };
}

/** `(counts as first dc)`, `(does not count as a st)`, `counts as dc and ch 2 here and throughout`, `(1 tr)`. */
export function readChainCounts(reading: Reading): ChainCounts | null {
  const start = reading.at;
  if (isMark(peek(reading), ',') || isMark(peek(reading), '-')) reading.at += 1;
  const open =
    isMark(peek(reading), '(') || isMark(peek(reading), '[') || isMark(peek(reading), '{') ? reading.at : null;
  const close = open === null ? null : (reading.closes.get(open) ?? null);
  if (open !== null) {
    if (close === null) {
      reading.at = start;
      return null;
    }
    reading.at += 1;
    // `3 ch (1 tr)`: the chain stands for it.
    if (
      isBehindChain(reading, open) &&
      peek(reading).kind === 'num' &&
      peek(reading).value === 1 &&
      peek(reading, 1).kind === 'stitch' &&
      reading.at + 2 === close
    ) {
      const key = peek(reading, 1).text;
      reading.at = close + 1;
      return { as: key, chains: 0 };
    }
  }
  while (
    isPlain(peek(reading), 'this', 'which', 'that', 'will', 'always', 'throughout', 'here', 'these', 'ch') ||
    isWord(peek(reading), 'turningchain', 'the', 'skipped', 'skip', 'first') ||
    (peek(reading).kind === 'num' && isSkippedChain(reading))
  )
    reading.at += 1;
  if (peek(reading).kind === 'stitch' && peek(reading).text === 'ch') reading.at += 1;
  const negative = take(reading, 'not');
  if (!take(reading, 'counts')) {
    reading.at = start;
    return null;
  }
  const end = close ?? clauseEnd(reading);
  let as: string | null = null;
  let chains = 0;
  for (let i = reading.at; i < end; i += 1) {
    const lex = reading.lexes[i]!;
    if (isWord(lex, 'not')) {
      reading.at = close === null ? end : close + 1;
      return { as: null, chains: 0 };
    }
    if (lex.kind !== 'stitch') continue;
    if (lex.text === 'ch') {
      const next = reading.lexes[i + 1]!;
      const number = isMark(next, '-') ? reading.lexes[i + 2]! : next;
      const prior = reading.lexes[i - 1]!;
      chains = number.kind === 'num' ? number.value : prior.kind === 'num' ? prior.value : 1;
    } else as ??= lex.text;
  }
  reading.at = close === null ? end : close + 1;
  if (negative) return { as: null, chains: 0 };
  return { as: as ?? 'st', chains };
}

/** `3 skipped ch`, `first 3 chs` before *count*. */
function isSkippedChain(reading: Reading): boolean {
  const [next, after] = [peek(reading, 1), peek(reading, 2)];
  const isChain = (lex: Lex): boolean => lex.kind === 'stitch' && lex.text === 'ch';
  return isChain(next) || (isWord(next, 'skipped', 'skip') && isChain(after));
}

export function clauseEnd(reading: Reading): number {
  let at = reading.at;
  while (
    reading.lexes[at]!.kind !== 'end' &&
    !(reading.lexes[at]!.kind === 'mark' && [',', ';', '.', ')', '('].includes(reading.lexes[at]!.text))
  )
    at += 1;
  return at;
}

/** Right behind `3 ch` or `ch 3`: only there does `(1 tr)` say what the chain stands for. */
function isBehindChain(reading: Reading, open: number): boolean {
  const isChain = (at: number): boolean => reading.lexes[at]?.kind === 'stitch' && reading.lexes[at].text === 'ch';
  return isChain(open - 1) || (reading.lexes[open - 1]?.kind === 'num' && (isChain(open - 2) || isChain(open - 3)));
}
