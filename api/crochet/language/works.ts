import { type Item, type Loops, type Sized, type Target, type Times, type Work } from './tree.ts';
import { type Lex } from './lexer.ts';
import { stitchOf } from '../stitches.ts';
import { ONE, readMultiple, readSized } from './amounts.ts';
import { isMark, isPlain, isWord, peek, spanFrom, take, type Reading } from './reading.ts';
import { readInto } from './into.ts';
import { readTarget } from './target.ts';
import { readFill, times } from './times.ts';
import { chain, readChainCounts } from './chain.ts';
import { amounts, drawnInto } from './work-amounts.ts';
import { isEdgeAhead, readAlongChain, readPieceEdge } from './edges.ts';
import { suffix, readEdge, readThrough, readTogether, belowWords } from './work-tails.ts';
import { readLoops } from './loops.ts';

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
  } else if (!before && isWord(lex, 'twice', 'thrice') && isWord(peek(reading, 1), 'in', 'on') && reading.stitch) {
    // `3 sc, twice in the next`.
    before = [lex.text === 'twice' ? 2 : 3];
    reading.at += 1;
    key = reading.stitch;
  } else if (before && isOldName(lex)) {
    reading.at += 1;
    key = lex.kind === 'word' ? 'dc' : 'sc';
  } else if (before && isEdgeAhead(reading)) {
    key = reading.stitch ?? 'st';
  } else {
    reading.at = from;
    return null;
  }
  if (key !== 'ch' && key !== 'slst' && key !== 'st' && key !== 'picot') reading.stitch = key;
  take(reading, 'st');
  if (key === 'ch') return [chain(reading, from, before, isGlued)];
  return placed(reading, from, key, before, isGlued, lead);
}

/** `5 long` and `5 plain` of old print. */
const isOldName = (lex: Lex): boolean =>
  isPlain(lex, 'long', 'longs') || (isWord(lex, 'even') && lex.end - lex.start === 5);

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

const ALL: Times = { type: 'fill', leave: [0], leaveOf: null, to: null };

/** All of an edge is meant where no number is given. */
const isEndless = (piece: Target | null, along: 'near' | 'far' | null, count: Sized | null): boolean =>
  count === null && (piece !== null || along !== null);

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
  let isBehind = false;
  let isMultiple = false;
  belowWords(reading);
  if (!before) {
    if (isMark(peek(reading), '-') && peek(reading, 1).kind === 'num' && peek(reading, 1).glued) reading.at += 1;
    after = readMultiple(reading);
    isMultiple = after !== null;
    isBehind = after === null && key === 'dec';
    after ??= suffix(reading);
  }
  const more = before ? readMultiple(reading) : null;
  if (isMark(peek(reading), '-') && isWord(peek(reading, 1), 'blo', 'flo', 'third')) reading.at += 1;
  loops ??= readLoops(reading);
  if (loops && isWord(peek(reading), 'of')) reading.at += 1;
  belowWords(reading);
  const through = readThrough(reading);
  const along = readAlongChain(reading);
  const ahead = readPieceEdge(reading);
  const read = ahead || along ? null : readInto(reading);
  loops = read?.loops ?? loops ?? readLoops(reading);
  const target = read?.loopsOnly ? null : read;
  const counts = target?.target.which === 'hook' ? readChainCounts(reading) : null;
  const piece = ahead ?? (target ? readPieceEdge(reading) : null);
  const fill = readFill(reading) ?? (isEndless(ahead, along, before ?? after ?? more) ? ALL : null);
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
    multiplied: multiple !== null || isMultiple,
    ...(counts && { counts }),
    ...(isBehind && after?.[0] === 2 && !target && !fill && { behind: true as const }),
  };
  const isSeries = before !== null && multiple !== null && !target;
  const found = drawnInto(key, amounts(before ?? after, isSeries ? null : multiple, target, fill), target);
  const work = { ...base, ...found, per: isIncrease ? found.per.map((n) => n * 2) : found.per };
  if (piece) return [{ ...work, into: piece }];
  if (along === 'far') return [{ type: 'step', span, what: 'far', text: 'other side' }, work];
  const into = through ? { ...(work.into ?? { what: 'st' as const, which: 'next' as const }), through } : work.into;
  const isRowEnds = target?.target.what === 'row-end';
  const only: Work =
    edge && !isRowEnds
      ? {
          ...work,
          per: work.times.type === 'n' ? work.times.n : work.per,
          times: times(ONE),
          into: { what: 'edge', which: 'next', ...(edge === 'rows' && { rows: true as const }) },
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
