import { type Item, type Sized, type Work } from './tree.ts';
import { finishGroup, hasWork, readBracket, readStars } from './groups.ts';
import { ONE, readSized } from './amounts.ts';
import {
  isMark,
  isPlain,
  isSeparator,
  isTimesSign,
  isWord,
  peek,
  spanFrom,
  take,
  takeAll,
  type Reading,
} from './reading.ts';
import { readRelative, readShaped, readStraight } from './relatives.ts';
import { readNoun } from './noun.ts';
import { readSlipJoin, readStep } from './steps.ts';
import { readLoops, readTarget } from './target.ts';
import { readFill, readTimes, times } from './times.ts';
import { readBareTotal } from './totals.ts';
import { readWork } from './works.ts';

/** Items up to an index. What begins no item becomes a note, or an unread stretch where it could change the count. */
export function readItems(reading: Reading, limit: number): Item[] {
  const items: Item[] = [];
  while (reading.at < limit) {
    const here = reading.at;
    if (skipSeparator(reading, limit, items)) continue;
    while (isWord(peek(reading), 'and', 'of') || (isWord(peek(reading), 'the') && !isColour(reading))) reading.at += 1;
    if (reading.at >= limit) break;
    const found = readItem(reading, limit, items);
    if (found) items.push(...found);
    else if (reading.at < limit) items.push(leftover(reading, limit));
    if (reading.at === here) reading.at += 1;
  }
  if (reading.at > limit) reading.at = limit;
  return items;
}

/** Separators between items; a total without a bracket may stand behind one. */
function skipSeparator(reading: Reading, limit: number, items: readonly Item[]): boolean {
  const lex = peek(reading);
  if (!isSeparator(lex)) return bareEnd(reading, limit, items);
  if (isMark(lex, '|') && bar(reading, limit) !== null) return false;
  const from = reading.at;
  reading.at += 1;
  if (isMark(lex, '=')) {
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
  if (next.kind !== 'num') return true;
  const ends = after.kind === 'end' || reading.at + 1 >= limit || isMark(after, '.') || isMark(after, '(');
  if (ends || isWord(after, 'st') || after.kind === 'stitch' || isWord(after, 'sp', 'sp2', 'group', 'loop', 'total')) {
    if (isTotalHere(reading, lex.text, items, limit, ends)) readBareTotal(reading, limit, from);
  }
  return true;
}

/** Whether figures behind this separator are a total and not the next work. */
function isTotalHere(
  reading: Reading,
  separator: string,
  items: readonly Item[],
  limit: number,
  ends: boolean,
): boolean {
  const next = peek(reading, 1);
  if (isWord(peek(reading, 2), 'in', 'on', 'around', 'across', 'to', 'each')) return false;
  if (ends) return true;
  if (separator === ',' && !isWord(next, 'st')) return false;
  if (isWord(next, 'st'))
    return isClosed(items) || separator === '-' || separator === '.' || separator === ':' || separator === ';'
      ? reading.at + 2 >= limit || endsSoon(reading, 2)
      : false;
  return isClosed(items) && endsSoon(reading, 2) && separator !== ',';
}

function endsSoon(reading: Reading, ahead: number): boolean {
  for (let i = ahead; i < ahead + 12; i += 1) {
    const lex = peek(reading, i);
    if (lex.kind === 'end' || isMark(lex, '.') || isWord(lex, 'join', 'turn', 'total', 'round', 'row')) return true;
    if (isPlain(lex, 'fasten', 'fo')) return true;
    if (
      !isMark(lex, ',') &&
      !isMark(lex, '+') &&
      !isWord(lex, 'and', 'sp', 'sp2', 'st', 'group', 'loop') &&
      lex.kind !== 'num' &&
      lex.kind !== 'stitch' &&
      !isMark(lex, '-')
    )
      return false;
  }
  return false;
}

/** Whether the work so far has said how far it goes, so that figures now can only be its total. */
function isClosed(items: readonly Item[]): boolean {
  const last = items.findLast((item) => item.type !== 'note');
  if (!last) return false;
  if (last.type === 'group') return last.times.type !== 'unsaid';
  if (last.type === 'work')
    return last.times.type === 'fill' || last.into?.what === 'ring' || last.into?.which === 'last' || last.multiplied;
  return last.type === 'step' || last.type === 'straight' || last.type === 'relative' || last.type === 'shaped';
}

/** `inc x 6 18`: a bare number at the very end. */
function bareEnd(reading: Reading, limit: number, items: readonly Item[]): boolean {
  if (peek(reading).kind !== 'num' || !hasWork(items)) return false;
  const next = peek(reading, 1);
  const atEnd = reading.at + 1 === limit || (isMark(next, '.') && reading.at + 2 >= limit);
  const withUnit = isWord(next, 'st') && (reading.at + 2 >= limit || isMark(peek(reading, 2), '.')) && isClosed(items);
  return (atEnd || withUnit) && readBareTotal(reading, limit, reading.at);
}

function readItem(reading: Reading, limit: number, items: Item[]): Item[] | null {
  const lex = peek(reading);
  if (lex.kind === 'mark') {
    if (lex.text === '(' || lex.text === '[' || lex.text === '{') return readBracket(reading, limit, items);
    if (lex.text === '*' || lex.text === '**') return readStars(reading, limit);
    if (lex.text === '|') return readBars(reading, limit);
    return null;
  }
  if (isWord(lex, 'total')) return readSentenceTotal(reading, limit);
  const relative = readRelative(reading, limit) ?? readShaped(reading, limit) ?? readStraight(reading, limit);
  if (relative?.type === 'shaped' && relative.how === 'evenly') {
    // `sc in each st, increasing 7 evenly`: the increases are spread over what was just said.
    const last = items.at(-1);
    if (last?.type === 'work' && last.times.type === 'fill' && last.per[0] === 1) items.pop();
  }
  if (relative) return [relative];
  if (isWord(lex, 'rep')) return readRepeat(reading, items);
  const slip = readSlipJoin(reading, limit);
  if (slip) return [slip];
  const skip = readSkip(reading);
  if (skip) return [skip];
  const lead = readLeadingTimes(reading, limit);
  if (lead) return lead;
  const colour = readColour(reading);
  if (colour) return [colour];
  const work = readWork(reading);
  if (work) return work;
  const lay = readLay(reading);
  if (lay) return [lay];
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
  return null;
}

/** `you will have 18 stitches`. */
function readSentenceTotal(reading: Reading, limit: number): Item[] | null {
  const from = reading.at;
  reading.at += 1;
  takeAll(reading, 'total', 'of', 'the');
  while (peek(reading).kind === 'word' && !isTimesSign(peek(reading))) reading.at += 1;
  if (isMark(peek(reading), ':') || isMark(peek(reading), '=')) reading.at += 1;
  if (peek(reading).kind === 'num' && readBareTotal(reading, limit, from)) return [];
  reading.at = from + 1;
  return [{ type: 'note', span: spanFrom(reading, from), text: 'total' }];
}

function bar(reading: Reading, limit: number): number | null {
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

function readBars(reading: Reading, limit: number): Item[] | null {
  const close = bar(reading, limit);
  if (close === null) return null;
  const from = reading.at;
  reading.at += 1;
  const items = readItems(reading, close);
  reading.at = close + 1;
  return [finishGroup(reading, from, items, '|', null)];
}

/** `rep around` without a star: everything before it that is not a start is repeated. */
function readRepeat(reading: Reading, items: Item[]): Item[] | null {
  const from = reading.at;
  if (isMark(peek(reading, 1), '(') || isMark(peek(reading, 1), '[')) {
    reading.at += 1;
    return [];
  }
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
  if (first < 0 || !hasWork(items)) {
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

function readSkip(reading: Reading): Item | null {
  const from = reading.at;
  if (!take(reading, 'skip')) return null;
  takeAll(reading, 'the', 'over');
  const start = reading.at;
  const n = readSized(reading);
  if (n) {
    const here = reading.at;
    takeAll(reading, 'of', 'the', 'next');
    const noun = readNoun(reading);
    if (!noun) reading.at = here;
    return { type: 'skip', span: spanFrom(reading, from), n, of: noun ? { ...noun, which: 'next' } : null };
  }
  const target = readTarget(reading);
  if (target) {
    if (target.target.which === 'every')
      return { type: 'skip', span: spanFrom(reading, from), n: ONE, of: target.target };
    return { type: 'skip', span: spanFrom(reading, from), n: target.count ?? ONE, of: target.target };
  }
  reading.at = start;
  return { type: 'skip', span: spanFrom(reading, from), n: ONE, of: null };
}

/** `6x (sc, inc)`, `6 × inc`, `6 times (…)`. */
function readLeadingTimes(reading: Reading, limit: number): Item[] | null {
  const from = reading.at;
  const n = readSized(reading);
  if (!n) return null;
  if (isTimesSign(peek(reading)) || isWord(peek(reading), 'times')) {
    reading.at += 1;
    if (isMark(peek(reading), ':')) reading.at += 1;
    const next = peek(reading);
    const close = reading.closes.get(reading.at);
    if (close !== undefined && close < limit) {
      const mark = next.text as '(' | '[' | '{';
      reading.at += 1;
      const inner = readItems(reading, close);
      reading.at = close + 1;
      return [
        { type: 'group', span: spanFrom(reading, from), items: inner, times: times(n), into: null, mark, stop: null },
      ];
    }
    const work = next.kind === 'stitch' ? readWork(reading) : null;
    const only = work?.[0];
    if (work?.length === 1 && only?.type === 'work' && only.times.type === 'n') {
      const count: Sized = only.times.n.map((k, i) => k * (n[i] ?? n[0]!));
      return [{ ...only, span: spanFrom(reading, from), times: times(count), multiplied: true }];
    }
  }
  reading.at = from;
  return null;
}

const isColour = (reading: Reading): boolean =>
  peek(reading).end - peek(reading).start === 1 && peek(reading, 1).kind === 'num' && isSeparatorOrEnd(reading, 2);

/** `A 4`, `4 A`: stitches told by their colour. */
function readColour(reading: Reading): Work | null {
  const from = reading.at;
  const isLetter = (ahead: number) => {
    const lex = peek(reading, ahead);
    const isA = isWord(lex, 'the') && lex.end - lex.start === 1;
    return isA || (lex.kind === 'word' && lex.text.length === 1 && 'bcdefghij'.includes(lex.text));
  };
  const letterFirst = isLetter(0) && peek(reading, 1).kind === 'num' && !peek(reading, 1).glued;
  const numberFirst = peek(reading).kind === 'num' && isLetter(1) && isSeparatorOrEnd(reading, 2);
  if (!letterFirst && !numberFirst) return null;
  const after = peek(reading, 2);
  if (letterFirst && !isSeparatorOrEnd(reading, 2) && after.kind !== 'num') return null;
  const letter = isWord(peek(reading, letterFirst ? 0 : 1), 'the') ? 'a' : peek(reading, letterFirst ? 0 : 1).text;
  const n = peek(reading, letterFirst ? 1 : 0).value;
  reading.at += 2;
  return {
    type: 'work',
    span: spanFrom(reading, from),
    stitch: 'st',
    per: ONE,
    times: times([n]),
    into: null,
    loops: null,
    glued: false,
    multiplied: false,
    colour: letter.toUpperCase(),
  };
}

function isSeparatorOrEnd(reading: Reading, ahead: number): boolean {
  const lex = peek(reading, ahead);
  return lex.kind === 'end' || lex.kind === 'mark';
}

/** `working along the other side of the chain`, `on opposite side`, `in the remaining loops of the foundation chain`. */
function readFar(reading: Reading): Item | null {
  const from = reading.at;
  const words = new Set([
    'now',
    'then',
    'continue',
    'continuing',
    'rotate',
    'down',
    'back',
    'bottom',
    'underside',
    'up',
    'piece',
    'you',
    'foundation',
    'starting',
    'unused',
    'free',
    'remaining',
    'to',
    'other',
    'opposite',
  ]);
  let far = false;
  while (reading.at < from + 14) {
    const lex = peek(reading);
    if (isWord(lex, 'side') || isPlain(lex, 'underside', 'bottom')) far = true;
    const isChain = far && lex.kind === 'stitch' && lex.text === 'ch';
    const fits =
      isChain ||
      isWord(
        lex,
        'work',
        'in',
        'on',
        'across',
        'around',
        'the',
        'of',
        'side',
        'turn',
        'to',
        'and',
        'loop',
        'remain',
        'first',
        'other',
        'skipped',
      ) ||
      (lex.kind === 'word' && words.has(lex.text));
    if (!fits || (isWord(lex, 'in') && far)) break;
    reading.at += 1;
  }
  if (far) return { type: 'step', span: spanFrom(reading, from), what: 'far', text: 'other side' };
  reading.at = from;
  return null;
}

/** `BLO:`, `in back loops only,`, `working in third loop`. */
function readLay(reading: Reading): Item | null {
  const from = reading.at;
  takeAll(reading, 'work', 'in', 'through');
  const start = reading.at;
  if (isWord(peek(reading), 'the')) reading.at += 1;
  const loops = readLoops(reading);
  if (!loops || isPlain(peek(reading), 'left', 'free', 'unused') || isWord(peek(reading), 'skipped', 'remain')) {
    reading.at = from;
    return null;
  }
  if (start > from && isWord(peek(reading), 'of') && isWord(peek(reading, 1), 'each', 'next')) {
    reading.at = from;
    return null;
  }
  return { type: 'loops', span: spanFrom(reading, from), loops };
}

/** `in next ch-2 sp work (2 dc, ch 2, 2 dc)`, `corners (3 dc, ch 2, 3 dc)`, `into the front loops left in R10: (…) × 6`. */
function readPrefixed(reading: Reading, limit: number): Item[] | null {
  const from = reading.at;
  takeAll(reading, 'work');
  const prep = take(reading, 'in', 'on', 'through');
  if (!prep && !isWord(peek(reading), 'corner')) {
    reading.at = from;
    return null;
  }
  const target = readTarget(reading);
  if (!target) {
    reading.at = from;
    return null;
  }
  if (isMark(peek(reading), ',') || isMark(peek(reading), ':') || isMark(peek(reading), '-')) reading.at += 1;
  takeAll(reading, 'work', 'and');
  if (target.target.what === 'loop') return [loopBase(reading, from, target.target, limit)];
  const next = peek(reading);
  if (isMark(next, '(') || isMark(next, '[') || isMark(next, '{')) {
    const inner = readBracket(reading, limit, []);
    const group = inner[0];
    if (inner.length === 1 && group?.type === 'group' && !group.into) {
      const count = target.count ? times(target.count) : target.fill ? readFillOr(reading) : times(ONE);
      return [
        {
          ...group,
          span: spanFrom(reading, from),
          into: target.target,
          times: group.times.type === 'unsaid' ? count : group.times,
        },
      ];
    }
    return inner;
  }
  const work = readWork(reading);
  if (!work) {
    reading.at = from;
    return null;
  }
  const only = work[0];
  if (work.length === 1 && only?.type === 'work' && !only.into) {
    const per = only.times.type === 'n' ? only.times.n : ONE;
    const rest = sameGroup(reading, only);
    const count = target.count ? times(target.count) : target.fill ? readFillOr(reading) : times(ONE);
    const span = spanFrom(reading, from);
    if (rest)
      return [
        {
          type: 'group',
          span,
          items: [{ ...only }, ...rest],
          times: count,
          into: target.target,
          mark: '(',
          stop: null,
        },
      ];
    return [{ ...only, span, per, times: count, into: target.target }];
  }
  return work;
}

function readFillOr(reading: Reading) {
  return readFill(reading) ?? ({ type: 'fill', leave: [0], leaveOf: null, to: null } as const);
}

/** `in next sp work 2 dc, ch 2, 2 dc`: a chain between like stitches keeps them in one place. */
function sameGroup(reading: Reading, first: Work): Item[] | null {
  const start = reading.at;
  if (isMark(peek(reading), ',')) reading.at += 1;
  const chain = readWork(reading)?.[0];
  if (chain?.type === 'work' && chain.stitch === 'ch') {
    if (isMark(peek(reading), ',')) reading.at += 1;
    const second = readWork(reading);
    const only = second?.[0];
    if (second?.length === 1 && only?.type === 'work' && only.stitch === first.stitch && !only.into)
      return [chain, only];
  }
  reading.at = start;
  return null;
}

/** All of what follows is worked into the loops named. */
function loopBase(
  reading: Reading,
  from: number,
  target: Extract<Item, { type: 'group' }>['into'] & object,
  limit: number,
): Item {
  const items = readItems(reading, limit);
  return { type: 'group', span: spanFrom(reading, from), items, times: times(ONE), into: target, mark: '', stop: null };
}

/** `Join yarn in free front loops of R3: …`: what follows is worked into those loops. */
function readJoinedLoops(reading: Reading, limit: number): Item[] | null {
  const from = reading.at;
  if (!isWord(peek(reading), 'join') && !isPlain(peek(reading), 'attach', 'rejoin')) return null;
  for (let i = 1; i < 14; i += 1) {
    const lex = peek(reading, i);
    if (lex.kind === 'end' || isMark(lex, ',') || isMark(lex, '.')) return null;
    if (!isWord(lex, 'blo', 'flo')) continue;
    reading.at += i;
    const target = readTarget(reading);
    if (target?.target.what !== 'loop') {
      reading.at = from;
      return null;
    }
    while (isSeparator(peek(reading)) && reading.at < limit) reading.at += 1;
    return [loopBase(reading, from, target.target, limit)];
  }
  return null;
}

/** Words in which a stitch, a number, a place or a repeat could hide are hot. */
const HOT = new Set([
  'each',
  'rep',
  'skip',
  'st',
  'sp',
  'sp2',
  'loop',
  'times',
  'corner',
  'gap',
  'twice',
  'thrice',
  'around',
  'across',
  'remain',
  'next',
  'evenly',
  'group',
]);

/** "And so on", "tapering": work that nobody has written down. */
function isLeftOpen(reading: Reading): boolean {
  const [word, then] = [reading.lexes[reading.at]?.text ?? '', reading.lexes[reading.at + 1]?.text ?? ''];
  return ['etc', 'taper', 'tapering'].includes(word) || (word === 'so' && ['on', 'forth'].includes(then));
}

/** A stretch that begins no item: prose is a note, anything hot is unread. */
function leftover(reading: Reading, limit: number): Item {
  const from = reading.at;
  let hot = false;
  while (reading.at < limit) {
    const lex = peek(reading);
    if (reading.at > from && (isSeparator(lex) || isMark(lex, '*') || isMark(lex, '**'))) break;
    if (reading.at > from && (isMark(lex, '(') || isMark(lex, '[') || isMark(lex, '{'))) break;
    if (reading.at > from && (lex.kind === 'num' || lex.kind === 'stitch') && !hot) {
      // A work may begin in the middle of a sentence: prose before it is only prose.
      const here = reading.at;
      const work = readWork(reading);
      reading.at = here;
      if (work) break;
    }
    if (lex.kind === 'num' || lex.kind === 'stitch' || lex.kind === 'ord' || (lex.kind === 'w' && HOT.has(lex.text)))
      hot = true;
    if (isLeftOpen(reading)) hot = true;
    reading.at += 1;
  }
  if (reading.at === from) reading.at += 1;
  const span = spanFrom(reading, from);
  if (hot) return { type: 'unread', span };
  const text = reading.lexes
    .slice(from, reading.at)
    .map((lex) => lex.text)
    .join(' ');
  return { type: 'note', span, text };
}
