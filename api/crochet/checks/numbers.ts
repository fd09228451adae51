import { allItems } from '../count/tree-walk.ts';
import { type Check, type CheckChange, type CheckRef, finding, listed, many, type Mend } from './check.ts';
import { isCounted, type Scan, type ScanLine, wordsOf } from './scan.ts';

/** The rounds a line stands for; `to` is null where a measure ends them, or where their number is not told. */
interface Extent {
  readonly at: ScanLine;
  readonly from: number | null;
  readonly to: number | null;
}

function extentOf(at: ScanLine): Extent {
  const { line, count, read } = at;
  const rows = count.rows ?? [];
  if (rows.length > 0) return { at, from: rows[0]!.from, to: rows.at(-1)!.to };
  const isOpen = allItems(read?.tree.items ?? []).some(
    (item) => (item.type === 'straight' && item.open) || (item.type === 'shaped' && item.until !== null),
  );
  const several = line.from !== null && line.to !== null && line.to > line.from;
  return { at, from: line.from, to: isOpen && !several ? null : line.to };
}

/** A gap between two numbers of a piece. */
interface Gap {
  readonly after: Extent;
  readonly next: Extent;
  readonly from: number;
  readonly to: number;
}

interface Walked {
  readonly gaps: readonly Gap[];
  readonly doubled: readonly Extent[];
  readonly overlapping: readonly [Extent, Extent][];
  readonly disordered: readonly [Extent, Extent][];
}

/**
 * Walks over the numbers of a piece in order. Rounds that a length ends, and lines without a number, leave the next
 * number open, so nothing after them is missing. Rounds after rows, or the other way round, may begin at 1 again.
 */
function walk(extents: readonly Extent[]): Walked {
  const gaps: Gap[] = [];
  const doubled: Extent[] = [];
  const overlapping: [Extent, Extent][] = [];
  const disordered: [Extent, Extent][] = [];
  const seen = new Set<string>();
  let before: Extent | null = null;
  let last: number | null = null;
  let isOpen = false;
  for (const one of extents) {
    const { from, to } = one;
    if (from === null) {
      isOpen = true;
      continue;
    }
    const restarts = from === 1 && before?.at.line.kind !== one.at.line.kind;
    if (restarts) {
      seen.clear();
      last = null;
    }
    const key = `${from} ${String(to)}`;
    if (before && last !== null) {
      if (seen.has(key)) doubled.push(one);
      else if (from > last + 1 && !isOpen) gaps.push({ after: before, next: one, from: last + 1, to: from - 1 });
      else if (from <= last && from >= before.from!) overlapping.push([before, one]);
      else if (from <= last) disordered.push([before, one]);
    }
    seen.add(key);
    last = Math.max(last ?? 0, to ?? from);
    isOpen = to === null;
    before = one;
  }
  return { gaps, doubled, overlapping, disordered };
}

const NUMBER_NAMED = /\b(?:r|rnds?|rounds?|rows?)\.? ?(\d+)(?:\s*(?:–|-|to|and|,)\s*(\d+))?/giu;

/** The highest round or row that any words of the pattern name; 0 where none is. */
function highestNamed(scan: Scan): number {
  let highest = 0;
  for (const one of scan.lines) {
    for (const [, from = '0', to = '0'] of wordsOf(one).matchAll(NUMBER_NAMED))
      highest = Math.max(highest, Number(from), Number(to));
  }
  return highest;
}

/** Moves the numbers from `next` on; none where words name a number that would move. */
function renumber(extents: readonly Extent[], next: Extent, by: number, named: number): Mend | null {
  const rest = extents.slice(extents.indexOf(next));
  if (named >= next.from! || rest.some(({ from, at }) => from === null || at.count.rows !== null)) return null;
  const changes = rest.map(({ at: { line } }): CheckChange => ({
    op: 'edit',
    row: 'line',
    id: line.id,
    fields: { from: line.from! + by, to: line.to === null ? null : line.to + by },
  }));
  return { words: `Number on from ${next.from! + by}`, done: `Numbered on from ${next.from! + by}`, changes };
}

const named = (from: number, to: number) => (to > from ? `${from}–${to}` : String(from));

function missing(extents: readonly Extent[], gaps: readonly Gap[], highest: number): Check[] {
  const [gap, ...others] = gaps;
  if (!gap) return [];
  const { line, piece, count } = gap.next.at;
  // A line that agrees with the one before it was only numbered wrong; else something stands between that is missing.
  const slip = count.verdict === 'agrees' ? renumber(extents, gap.next, gap.from - gap.next.from!, highest) : null;
  const name = `${line.kind === 'row' ? 'Row ' : 'R'}${named(gap.from, gap.to)}`;
  const fields = { pieceId: piece.id, kind: line.kind, after: gap.after.at.line.id, from: gap.from, to: gap.to };
  const added: Mend = {
    words: `Add ${name}`,
    done: `${name} added, to be written`,
    changes: [{ op: 'add', row: 'line', fields: { ...fields, text: '' } }],
  };
  const numbers = listed(gaps.map(({ from, to }) => named(from, to)));
  const isOne = others.length === 0;
  return [
    finding(
      'number-missing',
      `${many(gaps.length, 'follows', 'follow')} a gap: ${numbers} ${isOne && gap.from === gap.to ? 'is' : 'are'} missing.`,
      {
        subject: piece.id,
        refs: gaps.map(({ next }) => next.at.ref),
        mend: isOne ? (slip ?? added) : null,
      },
    ),
  ];
}

const pair = ([one, other]: readonly [Extent, Extent]): CheckRef[] => [one.at.ref, other.at.ref];

/** Missing and doubled numbers, ranges that share rounds, and lines that stand in another order than their numbers. */
export function checkNumbers(scan: Scan): Check[] {
  const highest = highestNamed(scan);
  return scan.pieces.flatMap(({ piece, lines }) => {
    const extents = lines.filter(({ line }) => isCounted(line)).map(extentOf);
    const { gaps, doubled, overlapping, disordered } = walk(extents);
    const [first] = doubled;
    const at = first ? extents[extents.indexOf(first) - 1] : undefined;
    const end = at?.to ?? null;
    const by = first && end !== null ? end + 1 - first.from! : null;
    const subject = piece.id;
    return [
      ...missing(extents, gaps, highest),
      ...(first
        ? [
            finding('number-doubled', `${many(doubled.length, 'stands', 'stand')} twice.`, {
              subject,
              refs: doubled.map((one) => one.at.ref),
              mend: doubled.length === 1 && by !== null && by > 0 ? renumber(extents, first, by, highest) : null,
            }),
          ]
        : []),
      ...(overlapping.length > 0
        ? [
            finding('range-overlaps', 'share rounds: one goes on where the other has not ended.', {
              subject,
              refs: overlapping.flatMap(pair),
            }),
          ]
        : []),
      ...(disordered.length > 0
        ? [
            finding(
              'number-order',
              `${many(disordered.length, 'stands', 'stand')} behind ${listed(disordered.map(([before]) => before.at.ref.name))}, out of order.`,
              {
                subject,
                refs: disordered.map(([, one]) => one.at.ref),
              },
            ),
          ]
        : []),
    ];
  });
}
