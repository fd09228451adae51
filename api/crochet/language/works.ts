import { type ChainCounts, type Item, type Loops, type Sized, type Times, type Work } from './tree.ts';
import { stitchOf } from '../stitches.ts';
import { ONE, readMultiple, readSized } from './amounts.ts';
import { isMark, isPlain, isWord, peek, spanFrom, take, takeAll, type Reading } from './reading.ts';
import { groupsAfterGap } from './noun.ts';
import { readLoops, readTarget, type TargetRead } from './target.ts';
import { FILL, readFill, times } from './times.ts';

/** A work that begins here: a count and a stitch, or a stitch and a count. May be several where one word does for all. */
export function readWork(reading: Reading): Item[] | null {
  const from = reading.at;
  let before = readSized(reading);
  const isGlued = before !== null && peek(reading).kind === 'stitch' && peek(reading).glued;
  if (before && isMark(peek(reading), '-') && peek(reading, 1).kind === 'stitch' && peek(reading, 1).glued)
    reading.at += 1;
  if (before && isWord(peek(reading), 'more')) reading.at += 1;
  const lead = readLoops(reading);
  if (lead) take(reading, 'of');
  // A drop or long stitch takes its place of this row like any other.
  if (
    isPlain(peek(reading), 'drop', 'dropped', 'long', 'tall', 'regular', 'normal', 'plain') &&
    peek(reading, 1).kind === 'stitch'
  )
    reading.at += 1;
  const lex = peek(reading);
  let key: string;
  if (lex.kind === 'stitch') {
    reading.at += 1;
    key = stitchWithTail(reading, lex.text);
    // `3-dc cluster` is one cluster of three legs.
    if (key !== lex.text && stitchOf(key)?.family === 'bunch') before = null;
  } else if (before && isWord(lex, 'st')) {
    reading.at += 1;
    if (isPlain(peek(reading), 'apart')) {
      reading.at += 1;
      return [{ type: 'note', span: spanFrom(reading, from), text: 'apart' }];
    }
    key = 'st';
  } else if (before && isWord(lex, 'in', 'on') && reading.stitch) {
    key = reading.stitch;
  } else {
    reading.at = from;
    return null;
  }
  if (key !== 'ch' && key !== 'slst' && key !== 'st' && key !== 'picot') reading.stitch = key;
  take(reading, 'st');
  if (key === 'ch') return [chain(reading, from, before, isGlued)];
  return placed(reading, from, key, before, isGlued, lead);
}

/** `hdc inc`, `sc dec`, `inc-sc`, `3-dc cluster`: names of two words, which the lexer leaves apart. */
function stitchWithTail(reading: Reading, key: string): string {
  const at = isMark(peek(reading), '-') && peek(reading).glued ? 1 : 0;
  const next = peek(reading, at);
  if (next.kind !== 'stitch') return key;
  const family = stitchOf(key)?.family;
  const tail = stitchOf(next.text)?.family;
  if (family === 'plain' && (tail === 'increase' || tail === 'decrease')) {
    reading.at += at + 1;
    return tail === 'increase' ? `${key}inc` : `${key}2tog`;
  }
  if (family === 'plain' && tail === 'bunch') {
    reading.at += at + 1;
    return next.text;
  }
  return key;
}

function chain(reading: Reading, from: number, before: Sized | null, glued: boolean): Work {
  if (isMark(peek(reading), '-') && peek(reading, 1).kind === 'num') reading.at += 1;
  const after = before ? null : readSized(reading);
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
    isWord(peek(reading), 'turningchain', 'the')
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

function clauseEnd(reading: Reading): number {
  let at = reading.at;
  while (
    reading.lexes[at]!.kind !== 'end' &&
    !(reading.lexes[at]!.kind === 'mark' && [',', ';', '.', ')', '('].includes(reading.lexes[at]!.text))
  )
    at += 1;
  return at;
}

/** The stitch has been read; now its count behind it, its place, how far it goes. */
function placed(
  reading: Reading,
  from: number,
  key: string,
  before: Sized | null,
  glued: boolean,
  lead: Loops | null,
): Item[] {
  let loops = lead;
  let after: Sized | null = null;
  belowWords(reading);
  if (!before) {
    if (isMark(peek(reading), '-') && peek(reading, 1).kind === 'num' && peek(reading, 1).glued) reading.at += 1;
    after = readMultiple(reading) ?? suffix(reading);
  }
  const more = before ? readMultiple(reading) : null;
  loops ??= readLoops(reading);
  belowWords(reading);
  const through = readThrough(reading);
  const read = readInto(reading);
  loops = read?.loops ?? loops ?? readLoops(reading);
  const target = read?.loopsOnly ? null : read;
  const fill = readFill(reading);
  const trailing = !after && !more ? readMultiple(reading) : null;
  if (take(reading, 'in') || take(reading, 'through')) {
    const late = readLoops(reading);
    if (late) loops = late;
    else reading.at -= 1;
  }
  const drawn = readTogether(reading, target, before ?? after);
  if (drawn) {
    const legs = {
      type: 'work' as const,
      span: spanFrom(reading, from),
      stitch: `${key}${String(drawn)}tog`,
      loops,
      glued: false,
    };
    return [{ ...legs, per: ONE, times: times(readMultiple(reading) ?? ONE), into: null, multiplied: false }];
  }
  const edge = readEdge(reading);
  const span = spanFrom(reading, from);
  const isIncrease = key.endsWith('inc') && key !== 'inc';
  const stitch = isIncrease ? key.slice(0, -3) : key;
  const multiple = more ?? trailing;
  const base: Omit<Work, 'per' | 'times' | 'into'> = {
    type: 'work',
    span,
    stitch,
    loops,
    glued,
    multiplied: multiple !== null,
  };
  const isSeries = before !== null && multiple !== null && !target;
  const found = amounts(before ?? after, isSeries ? null : multiple, target, fill);
  const work = { ...base, ...found, per: isIncrease ? found.per.map((n) => n * 2) : found.per };
  const into = through ? { ...(work.into ?? { what: 'st' as const, which: 'next' as const }), through } : work.into;
  const only: Work = edge
    ? {
        ...work,
        per: work.times.type === 'n' ? work.times.n : work.per,
        times: times(ONE),
        into: { what: 'edge', which: 'next' },
      }
    : { ...work, into };
  // `4 dc × 4` keeps both figures: it may be meant for more than the last.
  const items: Item[] = isSeries
    ? [
        {
          type: 'group',
          span,
          items: [{ ...only, multiplied: false }],
          times: times(multiple),
          into: null,
          mark: '',
          stop: null,
        },
      ]
    : [only];
  if (target?.also) items.push({ ...work, into: target.also });
  items.push(...conjoined(reading, base, into ? before : null));
  return items;
}

/** `sc next 2 sts tog`, `sc in next 2 sts together`: how many are drawn into one; null where none are. */
function readTogether(reading: Reading, target: TargetRead | null, count: Sized | null): number | null {
  const legs = target?.count?.[0] ?? (target === null ? count?.[0] : undefined);
  if (legs === undefined || legs < 2 || legs > 12 || !take(reading, 'tog')) return null;
  return legs;
}

/** `30 sc evenly around the edge`, `evenly along the side`: places that nothing tells the number of. */
function readEdge(reading: Reading): boolean {
  const start = reading.at;
  const isEven = take(reading, 'evenly');
  takeAll(reading, 'in', 'around', 'across', 'on', 'the', 'of');
  if (
    isPlain(
      peek(reading),
      'edge',
      'edges',
      'opening',
      'armhole',
      'neck',
      'neckline',
      'brim',
      'border',
      'perimeter',
      'outside',
    ) ||
    isWord(peek(reading), 'side', 'rowend')
  ) {
    reading.at += 1;
    return true;
  }
  reading.at = start;
  if (isEven) take(reading, 'evenly');
  return false;
}

/** `dc two rows down`: where a long stitch reaches to, which is no count. */
function belowWords(reading: Reading): void {
  const isDown = (ahead: number) => isPlain(peek(reading, ahead), 'down', 'below');
  if (peek(reading).kind === 'num' && isWord(peek(reading, 1), 'row', 'round') && isDown(2)) reading.at += 3;
}

/** `sc 6`, `inc 2`: a number behind the stitch, unless it begins the next work (`sc 6 dc`) or is the total. */
function suffix(reading: Reading): Sized | null {
  const next = peek(reading);
  if (next.kind !== 'num' || next.broken) return null;
  const after = peek(reading, 1);
  if (after.kind === 'stitch' && !after.broken) return null;
  if (isWord(after, 'st') && !isWord(peek(reading, 2), 'in')) return null;
  return readSized(reading);
}

function readThrough(reading: Reading): 'layers' | 'piece' | null {
  const start = reading.at;
  if (!take(reading, 'through', 'in', 'on')) return null;
  const isThrough = isWord(reading.lexes[start]!, 'through');
  takeAll(reading, 'the', 'of', 'both');
  if (take(reading, 'layers')) return 'layers';
  if (isThrough && (peek(reading).kind === 'word' || isWord(peek(reading), 'both', 'the'))) {
    const layered = isPlain(peek(reading), 'both', 'two');
    while (peek(reading).kind === 'word' || isWord(peek(reading), 'and', 'the')) {
      if (isPlain(peek(reading), 'x')) break;
      if (isWord(peek(reading), 'and') && peek(reading, 1).kind !== 'word' && !isWord(peek(reading, 1), 'the')) break;
      reading.at += 1;
    }
    return layered ? 'layers' : 'piece';
  }
  reading.at = start;
  return null;
}

/** `in next st`, `each st`, and `next 6 sts` or `around` where the preposition is left out. */
function readInto(reading: Reading): TargetRead | null {
  const start = reading.at;
  const prep =
    isWord(peek(reading), 'in', 'on', 'through') ||
    isSlipTo(reading) ||
    (isWord(peek(reading), 'around') && isPost(reading));
  if (prep) {
    reading.at += 1;
    if (isPlain(peek(reading), 'ring') || isWord(peek(reading), 'ring')) takeAll(reading, 'the');
    const target = readTarget(reading);
    if (target) return target;
    reading.at = start;
    return null;
  }
  if (
    isWord(peek(reading), 'each', 'next', 'same', 'last') ||
    (isWord(peek(reading), 'first') && isWord(peek(reading, 1), 'st'))
  ) {
    const target = readTarget(reading);
    if (target) return target;
    reading.at = start;
  }
  return null;
}

/** `sl st to next ch-2 sp`, `sl st to centre of shell`: a slip stitch may go to a place. */
function isSlipTo(reading: Reading): boolean {
  if (!isWord(peek(reading), 'to') || reading.lexes[reading.at - 1]?.text !== 'slst') return false;
  const next = peek(reading, isWord(peek(reading, 1), 'the') ? 2 : 1);
  return (
    isWord(next, 'next', 'same', 'centre', 'corner', 'sp', 'sp2', 'first', 'loop') ||
    (next.kind === 'stitch' && next.text === 'ch') ||
    next.kind === 'ord'
  );
}

/** `fpdc around next dc`, `around the post of each st`. */
function isPost(reading: Reading): boolean {
  const next = peek(reading, 1);
  return (
    isWord(next, 'next', 'each', 'same', 'first', 'last') ||
    isPlain(next, 'post') ||
    (isWord(next, 'the') && (isPlain(peek(reading, 2), 'post') || peek(reading, 2).kind === 'num')) ||
    next.kind === 'stitch' ||
    next.kind === 'ord'
  );
}

type Amounts = Pick<Work, 'per' | 'times' | 'into'>;

function amounts(count: Sized | null, more: Sized | null, target: TargetRead | null, fill: Times | null): Amounts {
  const into = target?.target ?? null;
  if (into?.which === 'skipped') return { per: ONE, times: times(target?.count ?? count ?? ONE), into };
  if (into?.what === 'ring' || into?.which === 'hook') return { per: count ?? ONE, times: times(more ?? ONE), into };
  if (target?.count) {
    const isEach = !target.each && count !== null && count[0] === target.count[0] && count[0]! > 1;
    return {
      per: isEach || !count ? ONE : count,
      times: fill && target.count[0] === 1 ? fill : times(target.count),
      into,
    };
  }
  if (target?.fill) return { per: count ?? ONE, times: fill && fill.type === 'fill' ? fill : FILL, into };
  if (fill) {
    // `24 sc around` is a count; `1 sc around` goes on.
    if (count && !into && count[0]! > 2) return { per: ONE, times: times(count), into };
    return { per: count ?? ONE, times: fill, into };
  }
  if (
    into &&
    (into.which === 'next' ||
      into.which === 'same' ||
      into.which === 'first' ||
      into.which === 'last' ||
      into.which === 'nth' ||
      into.which === 'centre')
  ) {
    return { per: count ?? ONE, times: times(more ?? ONE), into };
  }
  if (into) return { per: count ?? ONE, times: times(more ?? ONE), into };
  return {
    per: ONE,
    times: times(count && more ? count.map((n, i) => n * (more[i] ?? more[0]!)) : (count ?? more ?? ONE)),
    into,
  };
}

/** `… and in each ch across`, `… and next 2`: the same stitch goes on in another place. */
function conjoined(reading: Reading, base: Omit<Work, 'per' | 'times' | 'into'>, count: Sized | null): Item[] {
  const items: Item[] = [];
  for (;;) {
    const from = reading.at;
    if (isMark(peek(reading), ',')) reading.at += 1;
    if (!take(reading, 'and')) {
      reading.at = from;
      return items;
    }
    if (isPlain(peek(reading), 'then')) reading.at += 1;
    take(reading, 'in', 'on');
    const next = peek(reading);
    const isPlace =
      isWord(next, 'each', 'next', 'last', 'first', 'same', 'remain') ||
      isWord(reading.lexes[reading.at - 1]!, 'in', 'on') ||
      (isWord(next, 'the') && isWord(peek(reading, 1), 'next', 'last', 'remain'));
    if (isWord(next, 'across', 'around') || (isWord(next, 'to') && isWord(peek(reading, 1), 'end', 'the', 'last'))) {
      const fill = readFill(reading);
      if (fill) {
        items.push({ ...base, span: spanFrom(reading, from), per: ONE, times: fill, into: null });
        continue;
      }
    }
    const target = isPlace ? readTarget(reading) : null;
    if (!target) {
      reading.at = from;
      return items;
    }
    const fill = readFill(reading);
    items.push({ ...base, span: spanFrom(reading, from), ...amounts(count, null, target, fill) });
    if (target.also)
      items.push({
        ...base,
        span: spanFrom(reading, from),
        ...amounts(null, null, { ...target, target: target.also }, fill),
      });
  }
}
