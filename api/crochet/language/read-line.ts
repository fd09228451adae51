import { type Span, type Terms } from '../span.ts';
import { type SpecialStitch } from '../count/input.ts';
import { type Item, type LineTree, type Loops, type ReadLine, type Totals } from './tree.ts';
import { readItems } from './items.ts';
import { readLabel } from './labels.ts';
import { lexesOf, type Lex } from './lexer.ts';
import { closesOf, type Reading } from './reading.ts';
import { ownForms } from './special.ts';
import { stitchOf } from '../stitches.ts';
import { FILL } from './times.ts';

export interface ReadOptions {
  readonly terms?: Terms;
  readonly special?: readonly SpecialStitch[];
  /** How many sizes the pattern has; 1 where it has one. */
  readonly sizes?: number;
}

/**
 * Reads one line of shorthand. Never throws and takes time in proportion to the text; what it does not understand
 * comes back as spans. A label at the start (`R3:`) is passed over.
 *
 * @example readLine('(sc, inc) x 6 (18)').total // { sts: [18] }
 */
export function readLine(text: string, options: ReadOptions = {}): ReadLine {
  const lexes = lexesOf(text, options.terms ?? 'US', ownForms(options.special ?? [], options.terms ?? 'US'));
  const reading: Reading = {
    lexes,
    at: 0,
    closes: closesOf(lexes),
    stitch: null,
    totals: [],
    sizes: options.sizes ?? 1,
    readItems,
  };
  reading.at = readLabel(lexes, 0)?.after ?? 0;
  const start = lexes[reading.at]!.start;
  const items = allRound(readItems(reading, lexes.length - 1), lexes);
  const tree: LineTree = { span: { start, end: text.length }, items, loops: loopsOf(items) };
  const total = totalOf(reading);
  const readAs = lexes.flatMap(({ start: from, end, readAs: as }) => (as ? [{ span: { start: from, end }, as }] : []));
  return {
    tree,
    total: total?.kinds ?? null,
    totalSpan: total?.span ?? null,
    unread: unreadOf(items),
    ...(readAs.length > 0 && { readAs }),
  };
}

/** `Rnds 6-16: sc`, `R5: inc (12)`: a line that is only the name of a stitch is that stitch all round. */
function allRound(items: Item[], lexes: readonly Lex[]): Item[] {
  const works = items.filter((item) => item.type !== 'note' && item.type !== 'step' && item.type !== 'loops');
  const [only] = works;
  if (works.length !== 1 || only?.type !== 'work' || only.into || only.times.type !== 'n') return items;
  const isCounted =
    only.multiplied ||
    lexes.some((lex) => lex.kind === 'num' && lex.start >= only.span.start && lex.end <= only.span.end);
  const isName = !isCounted && only.times.n.length === 1 && only.times.n[0] === 1 && only.per[0] === 1;
  const family = stitchOf(only.stitch)?.family ?? '';
  if (!isName || !['plain', 'post', 'increase', 'decrease'].includes(family)) return items;
  return items.map((item) => (item === only ? { ...only, times: FILL } : item));
}

/** Loops that hold for the whole line: said alone at its start or at its end. */
function loopsOf(items: readonly Item[]): Loops | null {
  return items.find((item) => item.type === 'loops')?.loops ?? null;
}

/** The total in force: the last bracket, or several brackets for several rounds as one list. */
function totalOf(reading: Reading): { kinds: Totals; span: Span } | null {
  const { totals } = reading;
  const last = totals.at(-1);
  if (!last) return null;
  const plain = totals.filter((total) => Object.keys(total.kinds).length === 1 && total.kinds.sts?.length === 1);
  const adjacent =
    plain.length === totals.length &&
    totals.length > 1 &&
    totals.every((total, i) => i === 0 || total.span.start - totals[i - 1]!.span.end < 4);
  if (adjacent) {
    return {
      kinds: { sts: plain.map((total) => total.kinds.sts![0]!) },
      span: { start: totals[0]!.span.start, end: last.span.end },
    };
  }
  return last;
}

function unreadOf(items: readonly Item[]): Span[] {
  return items.flatMap((item) =>
    item.type === 'unread' ? [item.span] : item.type === 'group' ? unreadOf(item.items) : [],
  );
}
