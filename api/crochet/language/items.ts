import { type Item } from './tree.ts';
import { stitchOf } from '../stitches.ts';
import { finishGroup, hasWork, readBracket } from './groups.ts';
import { type Lex } from './lexer.ts';
import { isMark, isPlain, isWord, peek, spanFrom, take, type Reading } from './reading.ts';
import { readRelative } from './relatives.ts';
import { readSlipJoin, readStep } from './steps.ts';
import { readFill, readTimes } from './times.ts';
import { readWork } from './works.ts';
import { skipSeparator, readSentenceTotal, bar } from './separators.ts';
import { readLeadingTimes, readColour, readLay, readSkip, isColour, readFar } from './small-items.ts';
import { readBetween } from './first-and-last.ts';
import { leftover } from './leftover.ts';
import { readHookStart, readPicot, readRingCount } from './chain-items.ts';
import { combine } from './combine.ts';
import { readLeadingTotal, readToldTotal } from './told-totals.ts';
import { readShaped, readStraight } from './shaped-lines.ts';
import { readJoinedLoops, readLoopsOf, readPrefixed } from './prefixed.ts';
import { readStars } from './stars.ts';

/** Items up to an index. What begins no item becomes a note, or an unread stretch where it could change the count. */
export function readItems(reading: Reading, limit: number): Item[] {
  const items: Item[] = [];
  while (reading.at < limit) {
    const here = reading.at;
    if (skipSeparator(reading, limit, items)) continue;
    if (isBeginning(reading)) reading.at += 1;
    while (isWord(peek(reading), 'and', 'of') || (isWord(peek(reading), 'the') && !isColour(reading))) reading.at += 1;
    if (reading.at >= limit) break;
    const found = readItem(reading, limit, items);
    if (found) combine(items, found);
    else if (reading.at < limit) items.push(leftover(reading, limit));
    if (reading.at === here) reading.at += 1;
  }
  if (reading.at > limit) reading.at = limit;
  return items;
}

function readItem(reading: Reading, limit: number, items: Item[]): Item[] | null {
  const lex = peek(reading);
  if (lex.kind === 'mark') {
    if (lex.text === '(' || lex.text === '[' || lex.text === '{') return readBracket(reading, limit, items);
    if (lex.text === '*' || lex.text === '**') return readStars(reading, limit);
    if (lex.text === '|') return readBars(reading, limit);
    return null;
  }
  if (readBetween(reading, items)) return [];
  if (items.length === 0 && readLeadingTotal(reading)) return [];
  if (hasWork(items) && readToldTotal(reading, limit)) return [];
  if (isWord(lex, 'total')) return readSentenceTotal(reading, limit);
  const relative = readRelative(reading, limit) ?? readShaped(reading, limit) ?? readStraight(reading, limit);
  if (relative) return [relative];
  if (isWord(lex, 'rep')) return readLeadingTimes(reading, limit) ?? readRepeat(reading, items);
  const from = reading.at;
  const verb = leadVerb(reading);
  if (verb > 0) {
    reading.at += verb;
    const isEnding = isPlain(lex, 'ending', 'finishing');
    return isEnding ? [{ type: 'note', span: spanFrom(reading, from), text: 'ending with' }] : [];
  }
  if (isWord(lex, 'work') && isPlain(peek(reading, 1), 'this', 'that', 'these', 'it') && isTimesSoon(reading)) {
    reading.at += 1;
    return readRepeat(reading, items);
  }
  const rounds = readRoundsRemark(reading);
  if (rounds) return [rounds];
  const picot = readPicot(reading, items);
  if (picot) {
    items[items.length - 1] = picot;
    return [];
  }
  const slip = readSlipJoin(reading, limit, hasWork(items));
  if (slip) return [slip];
  const start = readHookStart(reading);
  if (start) {
    const first = items.findIndex((item) => item.type === 'work' && item.stitch !== 'ch');
    items.splice(first < 0 ? items.length : first, 0, start);
    return [];
  }
  const skip = readSkip(reading);
  if (skip) return [skip];
  const lead = readLeadingTimes(reading, limit);
  if (lead) return lead;
  const colour = readColour(reading);
  if (colour) return [colour];
  const work = readWork(reading);
  if (work) return work;
  const based = readLoopsOf(reading, limit);
  if (based) return [based];
  const lay = readLay(reading);
  if (lay) return [lay];
  const ringed = readRingCount(reading);
  if (ringed) return [ringed];
  const joined = readJoinedLoops(reading, limit);
  if (joined) return joined;
  const far = readFar(reading);
  if (far) return [far];
  const step = readStep(reading, limit);
  if (step) return [step];
  const prefixed = readPrefixed(reading, limit);
  if (prefixed) return prefixed;
  if (take(reading, 'work')) return [];
  const fill = items.length > 0 ? readFill(reading) : null;
  if (fill) {
    const last = items.at(-1);
    if (last?.type === 'group' && last.times.type === 'unsaid') items[items.length - 1] = { ...last, times: fill };
    else if (last?.type === 'work' && last.times.type === 'n' && last.times.n[0] === 1)
      items[items.length - 1] = { ...last, times: fill };
    return [];
  }
  const again = items.length > 0 ? readOnceMore(reading, items.at(-1)!) : null;
  if (again) {
    items[items.length - 1] = again;
    return [];
  }
  return null;
}

/** Words before a count or a stitch that only say that it is done: `begin with 6 sc in ring`, `put 2 sc in each`, `ending sk 1`. */
function leadVerb(reading: Reading): number {
  if (!isPlain(peek(reading), 'begin', 'start', 'continue', 'put', 'place', 'add', 'ending', 'finishing')) return 0;
  let length = 1;
  while (length < 5 && isWord(peek(reading, length), 'with', 'the', 'in', 'last', 'rep', 'round', 'row')) length += 1;
  return startsWork(peek(reading, length)) ? length : 0;
}

const startsWork = (lex: Lex): boolean =>
  lex.kind === 'num' || isWord(lex, 'skip') || (lex.kind === 'stitch' && lex.text !== 'ch');

/** `do that six times`. */
const isTimesSoon = (reading: Reading): boolean =>
  isWord(peek(reading, 2), 'twice', 'thrice', 'around', 'across') ||
  (peek(reading, 2).kind === 'num' && isWord(peek(reading, 3), 'times'));

/** `for the next 5 rounds`: how many rounds the line stands for, told to the reader of the whole pattern. */
function readRoundsRemark(reading: Reading): Item | null {
  if (!isPlain(peek(reading), 'for')) return null;
  let i = 1;
  while (isWord(peek(reading, i), 'the', 'next')) i += 1;
  const number = peek(reading, i);
  if (number.kind !== 'num' || !isWord(peek(reading, i + 1), 'round', 'row')) return null;
  const from = reading.at;
  reading.at += i + 2;
  return { type: 'note', span: spanFrom(reading, from), text: `rounds ${String(number.value)}` };
}

/** `inc once, then once more`: the last is worked so many times again. */
function readOnceMore(reading: Reading, last: Item): Item | null {
  const start = reading.at;
  const said = readTimes(reading);
  if (said?.type === 'n' && isWord(reading.lexes[reading.at - 1]!, 'more', 'again', 'times')) {
    if (last.type === 'work' && last.times.type === 'n')
      return { ...last, times: { type: 'n', n: last.times.n.map((n) => n * (said.n[0] ?? 1)) } };
    if (last.type === 'group' && last.times.type === 'unsaid') return { ...last, times: said };
  }
  reading.at = start;
  return null;
}

/** `beg cl`: the cluster that a round begins with. */
function isBeginning(reading: Reading): boolean {
  const next = peek(reading, 1);
  const family = next.kind === 'stitch' ? stitchOf(next.text)?.family : undefined;
  return isWord(peek(reading), 'first') && (family === 'bunch' || family === 'group');
}

function readBars(reading: Reading, limit: number): Item[] | null {
  const close = bar(reading, limit);
  if (close === null) return null;
  const from = reading.at;
  reading.at += 1;
  const items = readItems(reading, close);
  reading.at = close + 1;
  return [finishGroup(reading, from, items, '|', null)];
}

/** No series that is repeated without a mark is longer, in items. */
const LONGEST_SERIES = 200;

/** `rep around` without a star: everything before it that is not a start is repeated. */
function readRepeat(reading: Reading, items: Item[]): Item[] | null {
  const from = reading.at;
  const next = peek(reading, 1);
  if (
    next.kind === 'mark' &&
    '([{*|'.includes(next.text) &&
    !isMark(peek(reading, 2), ')') &&
    !isMark(peek(reading, 2), ']')
  ) {
    reading.at += 1;
    return [];
  }
  if (isPlain(peek(reading), 'this', 'that', 'these', 'it')) reading.at += 1;
  const said = readTimes(reading);
  if (!said) return null;
  const last = items.at(-1);
  if (last?.type === 'group' && last.times.type === 'unsaid' && !last.into) {
    items[items.length - 1] = { ...last, times: said };
    return [];
  }
  const first = items.findIndex(
    (item, i) => !(item.type === 'step' || item.type === 'note' || item.type === 'loops' || isStart(item, items, i)),
  );
  // One such repeat takes in the whole line; a second would have nothing of its own.
  const isWrapped =
    items.length > LONGEST_SERIES ||
    items.some((item) => item.type === 'group' && item.mark === '' && item.items.length > 1);
  if (first < 0 || isWrapped || !hasWork(items)) {
    reading.at = from + 1;
    return [{ type: 'unread', span: spanFrom(reading, from) }];
  }
  const inner = items.splice(first);
  const span = { start: inner[0]!.span.start, end: reading.lexes[reading.at - 1]!.end };
  return [{ type: 'group', span, items: inner, times: said, into: null, mark: '', stop: null }];
}

/** A starting chain, and what is worked at its foot, stand before the repeat. */
function isStart(item: Item, items: readonly Item[], i: number): boolean {
  if (item.type !== 'work') return false;
  if (item.stitch === 'ch') return i === 0 || items.slice(0, i).every((other) => other.type !== 'work');
  return item.into?.which === 'same' && i > 0;
}
