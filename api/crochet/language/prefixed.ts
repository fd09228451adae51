import { type Item, type Work } from './tree.ts';
import { readBracket } from './groups.ts';
import { ONE } from './amounts.ts';
import { isMark, isPlain, isSeparator, isWord, peek, spanFrom, take, takeAll, type Reading } from './reading.ts';
import { readTarget } from './target.ts';
import { readFill, times } from './times.ts';
import { readWork } from './works.ts';
import { readItems } from './items.ts';

/** `in next ch-2 sp work (2 dc, ch 2, 2 dc)`, `corners (3 dc, ch 2, 3 dc)`, `into the front loops left in R10: (…) × 6`. */
export function readPrefixed(reading: Reading, limit: number): Item[] | null {
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
  const series = target.target.which === 'each' ? wholeSeries(reading, limit) : null;
  if (series) {
    return [
      {
        type: 'group',
        span: spanFrom(reading, from),
        items: series,
        times: readFillOr(reading),
        into: target.target,
        mark: '(',
        stop: null,
      },
    ];
  }
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

/** `in each lp make sc, hdc, 3 dc, hdc, sc`: all of a series, up to a full stop, where none of it names a place. */
function wholeSeries(reading: Reading, limit: number): Item[] | null {
  const start = reading.at;
  const items: Item[] = [];
  while (reading.at < limit) {
    const work = readWork(reading);
    const only = work?.[0];
    if (work?.length !== 1 || only?.type !== 'work' || only.into || only.times.type !== 'n') break;
    items.push(only);
    const isSeparated = isMark(peek(reading), ',') || isWord(peek(reading), 'and');
    if (!isSeparated) {
      const end = peek(reading);
      const ends = end.kind === 'end' || isMark(end, '.') || isMark(end, ';') || isMark(end, '(') || isMark(end, '[');
      if (ends && items.length > 1) return items;
      break;
    }
    while (isMark(peek(reading), ',') || isWord(peek(reading), 'and')) reading.at += 1;
  }
  reading.at = start;
  return null;
}

export function readFillOr(reading: Reading) {
  return readFill(reading) ?? ({ type: 'fill', leave: [0], leaveOf: null, to: null } as const);
}

/** `in next sp work 2 dc, ch 2, 2 dc`: a chain between like stitches keeps them in one place. */
export function sameGroup(reading: Reading, first: Work): Item[] | null {
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
export function loopBase(
  reading: Reading,
  from: number,
  target: Extract<Item, { type: 'group' }>['into'] & object,
  limit: number,
): Item {
  const items = readItems(reading, limit);
  return { type: 'group', span: spanFrom(reading, from), items, times: times(ONE), into: target, mark: '', stop: null };
}

/** `BL of rnd 16: …`: what follows is worked into the loops of that round. */
export function readLoopsOf(reading: Reading, limit: number): Item | null {
  const from = reading.at;
  const isNamed =
    isWord(peek(reading), 'blo', 'flo') &&
    (isWord(peek(reading, 1), 'of', 'in', 'from', 'round', 'row') || isPlain(peek(reading, 1), 'r'));
  if (!isNamed) return null;
  const target = readTarget(reading);
  if (target?.target.what !== 'loop' || target.target.line === undefined) {
    reading.at = from;
    return null;
  }
  while (isSeparator(peek(reading)) && reading.at < limit) reading.at += 1;
  return loopBase(reading, from, target.target, limit);
}

/** `Join yarn in free front loops of R3: …`: what follows is worked into those loops. */
export function readJoinedLoops(reading: Reading, limit: number): Item[] | null {
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
