import { type Terms } from '../span.ts';
import { nameOf } from '../stitches.ts';
import { printPlace } from './print-place.ts';
import { readLine } from './read-line.ts';
import {
  type Group,
  type Item,
  type LineTree,
  type Loops,
  type Relative,
  type Shaped,
  type Sized,
  type Times,
  type Work,
} from './tree.ts';
import { printTotals } from './totals-text.ts';

export interface PrintOptions {
  readonly terms?: Terms;
}

const LOOPS: Readonly<Record<Loops, string>> = {
  back: 'BLO',
  front: 'FLO',
  third: 'in third loop',
  both: 'in both loops',
};

/**
 * A tree in house style. Reading it back gives the same tree.
 *
 * @example printLine(readLine('[sc, inc] 6 times').tree) === '(sc, inc) × 6'
 */
export function printLine(tree: LineTree, options: PrintOptions = {}): string {
  return printAll(tree.items, options.terms ?? 'US');
}

/**
 * The text in house style with its total, or null where it is so already or is not understood throughout.
 */
export function houseStyle(text: string, terms: Terms): string | null {
  const read = readLine(text, { terms });
  if (read.unread.length > 0 || read.tree.items.length === 0) return null;
  const line = printAll(read.tree.items, terms);
  const whole = read.total ? `${line}  (${printTotals(read.total, terms)})` : line;
  return whole === text.trim() ? null : whole;
}

/** A line with one stitch in it says its one; the name alone would be that stitch all round. */
function printAll(items: readonly Item[], terms: Terms): string {
  const text = printItems(items, terms);
  const works = items.filter((item) => item.type !== 'note' && item.type !== 'step' && item.type !== 'loops');
  const [only] = works;
  const isOne =
    works.length === 1 &&
    only?.type === 'work' &&
    !only.into &&
    only.stitch !== 'ch' &&
    !only.multiplied &&
    only.times.type === 'n' &&
    only.times.n.join() === '1' &&
    only.per.join() === '1';
  if (!isOne) return text;
  return printItems(
    items.map((item) => (item === only ? { ...item, type: 'note', text: `1 ${printItem(only, terms)}` } : item)),
    terms,
  );
}

function printItems(items: readonly Item[], terms: Terms): string {
  let out = '';
  items.forEach((item, i) => {
    const text = printItem(item, terms);
    const previous = items[i - 1];
    out += i === 0 ? text : previous?.type === 'loops' ? ` ${text}` : `, ${text}`;
  });
  return out;
}

export const printSized = ([first, ...others]: Sized): string =>
  others.length > 0 ? `${String(first)} (${others.join(', ')})` : String(first);

function printItem(item: Item, terms: Terms): string {
  switch (item.type) {
    case 'work':
      return printWork(item, terms);
    case 'group':
      return printGroup(item, terms);
    case 'skip':
      return printSkip(item, terms);
    case 'loops':
      return `${LOOPS[item.loops]}:`;
    case 'relative':
      return printRelative(item);
    case 'shaped':
      return printShaped(item);
    case 'straight':
      return 'work even';
    case 'step':
    case 'note':
      return item.text;
    case 'unread':
      return '';
  }
}

function printSkip(item: Extract<Item, { type: 'skip' }>, terms: Terms): string {
  const word = terms === 'US' ? 'sk' : 'miss';
  if (item.of?.which === 'every') return `${word} ${printPlace(item.of, 1, terms)}`;
  if (!item.of) return `${word} ${printSized(item.n)}`;
  return `${word} ${printPlace(item.of, item.n[0] ?? 1, terms, item.n)}`;
}

function printWork(item: Work, terms: Terms): string {
  const name = nameOf(item.stitch, terms);
  if (item.stitch === 'ch') return printChain(item, terms);
  const loops = item.loops ? ` ${LOOPS[item.loops]}` : '';
  if (item.colour) return `${item.colour} ${item.times.type === 'n' ? printSized(item.times.n) : ''}`;
  const isMany = item.per.some((n) => n > 1);
  const count = isMany ? `${printSized(item.per)} ` : '';
  if (item.into?.through)
    return `${item.times.type === 'n' && item.times.n[0] !== 1 ? `${printSized(item.times.n)} ` : ''}${name} through ${item.into.through === 'layers' ? 'both layers' : 'the other piece'}`;
  if (item.times.type === 'n') {
    if (!item.into) {
      if (item.multiplied) return `${name} × ${printSized(item.times.n)}${loops}`;
      if (item.behind) return `${name} ${printSized(item.times.n)}${loops}`;
      if (item.times.n.length === 1 && item.times.n[0] === 1) return `${name}${loops}`;
      return `${printSized(item.times.n)}${item.glued ? '' : ' '}${name}${loops}`;
    }
    return `${count}${name} in ${printPlace(item.into, item.times.n[0] ?? 1, terms, item.times.n)}${loops}${printCounts(item, terms)}`;
  }
  const where = item.into ? ` in ${printPlace(item.into, 1, terms)}` : '';
  return `${count}${name}${where}${printFill(item.times, terms)}${loops}`;
}

function printChain(item: Work, terms: Terms): string {
  const n = item.times.type === 'n' ? item.times.n : [1];
  const between = item.between ? ' between' : '';
  return `ch ${printSized(n)}${between}${printCounts(item, terms)}`;
}

/** `(counts as dc and ch 2)`, `(does not count)`. */
function printCounts({ counts }: Work, terms: Terms): string {
  if (!counts) return '';
  if (!counts.as) return ' (does not count)';
  const chains = counts.chains > 0 ? ` and ch ${String(counts.chains)}` : '';
  return ` (counts as ${counts.as === 'st' ? 'st' : nameOf(counts.as, terms)}${chains})`;
}

function printFill(times: Times, terms: Terms): string {
  if (times.type !== 'fill') return '';
  if (times.to) return ` to ${printPlace(times.to, 1, terms)}`;
  const leave = times.leave[0] ?? 0;
  if (leave === 0) return ' around';
  return ` to last ${leave === 1 && times.leave.length === 1 ? '' : `${printSized(times.leave)} `}${times.leaveOf ? printPlace({ ...times.leaveOf, which: 'next' }, leave, terms).replace(/^next /, '') : leave === 1 ? 'st' : 'sts'}`;
}

function printGroup(item: Group, terms: Terms): string {
  const inside = item.items.map((inner) => printItem(inner, terms));
  if (item.into?.what === 'loop') return `in ${printPlace(item.into, 1, terms)}: ${inside.join(', ')}`;
  if (item.mark === '' && inside.length === 1 && item.times.type === 'n')
    return `${inside[0]!} × ${printSized(item.times.n)}`;
  const stop = item.stop === null ? '' : '**';
  const body = inside.map((text, i) => (item.stop === i + 1 ? `${text}${stop}` : text)).join(', ');
  if (item.mark === '*') return `*${body}${printStar(item.times, terms)}`;
  const [open, close] = item.mark === '[' ? ['[', ']'] : item.mark === '{' ? ['{', '}'] : ['(', ')'];
  const into = item.into
    ? ` in ${printPlace(item.into, item.times.type === 'n' ? (item.times.n[0] ?? 1) : 1, terms, item.times.type === 'n' ? item.times.n : undefined)}`
    : '';
  if (into) return `${open}${body}${close}${into}${item.times.type === 'fill' ? printFill(item.times, terms) : ''}`;
  return `${open}${body}${close}${printTimes(item.times, terms)}`;
}

const printTimes = (times: Times, terms: Terms): string =>
  times.type === 'n' || times.type === 'rep' ? ` × ${printSized(times.n)}` : printFill(times, terms);

function printStar(times: Times, terms: Terms): string {
  if (times.type === 'rep') return `; rep from * ${printSized(times.n)} times`;
  if (times.type === 'n') return `* ${printSized(times.n)} times`;
  if (times.type === 'unsaid') return '*';
  return `; rep from *${printFill(times, terms)}`;
}

function printRelative(item: Relative): string {
  const lines =
    item.lines.length === 0
      ? 'last row'
      : `row ${item.lines.length > 2 ? `${String(item.lines[0])}-${String(item.lines.at(-1))}` : item.lines.join(' and ')}`;
  const more = item.more > 0 ? ` with ${String(item.more)} more st between` : '';
  const times = item.times ? ` ${printSized(item.times)} times` : '';
  const until = item.until === null ? '' : ` to row ${String(item.until)}`;
  const ending = item.ending === null ? '' : `, ending with row ${String(item.ending)}`;
  return `rep ${lines}${more}${times}${until}${ending}`;
}

function printShaped(item: Shaped): string {
  const change = item.change[0] ?? 0;
  const size = item.change.map((n) => Math.abs(n));
  if (item.how === 'as-set') return `as set, ${printSized(size)} ${change < 0 ? 'fewer' : 'more'} each round`;
  const until = item.until ? ` until ${printSized(item.until)} sts` : '';
  const word = change < 0 ? 'dec' : 'inc';
  if (item.how === 'evenly') return `${word} ${printSized(size)} evenly${until}`;
  return `${word} ${printSized(size.map((n) => n / 2))} each end${until ? ` of next and every ${item.every === 2 ? 'alt ' : ''}row` : ''}${until}`;
}
