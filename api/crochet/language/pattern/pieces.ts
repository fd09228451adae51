import { type Terms } from '../../span.ts';
import { type LineKind, type SpecialStitch } from '../../count/input.ts';
import { foundationOf } from '../../count/base.ts';
import { readLine } from '../read-line.ts';
import { type Item, type ReadLine } from '../tree.ts';
import { oneLine, type Part } from './gather.ts';
import { type LineText, type PieceText } from './pattern-text.ts';

interface Draft {
  name: string | null;
  make: number;
  start: number;
  lines: { part: Extract<Part, { type: 'line' | 'step' | 'note' }>; read: ReadLine }[];
}

/** Puts the parts into pieces: a heading, or numbers that begin again, begins a new one. */
export function piecesOf(
  text: string,
  parts: readonly Part[],
  terms: Terms,
  special: readonly SpecialStitch[],
  sizes: number,
): PieceText[] {
  const drafts: Draft[] = [];
  let current: Draft | null = null;
  /** A heading inside a piece: numbers may begin again without a new piece. */
  let within = false;
  let last = 0;
  const begin = (name: string | null, make: number, start: number): Draft => {
    const draft: Draft = { name, make, start, lines: [] };
    drafts.push(draft);
    last = 0;
    return draft;
  };
  const reads = parts.map((part) =>
    part.type === 'line'
      ? readLine(oneLine(text.slice(part.bodyStart, part.end)), { terms, special, sizes: Math.max(1, sizes) })
      : null,
  );
  parts.forEach((part, i) => {
    if (part.type === 'heading') {
      if (current !== null && last >= 1 && goesOn(parts, reads, i)) {
        current.lines.push({ part: { type: 'note', start: part.start, end: part.end }, read: readLine('', {}) });
        within = true;
        return;
      }
      within = false;
      current = begin(part.heading.name, part.heading.make, part.start);
      return;
    }
    const read = reads[i];
    if (part.type === 'line' && read) {
      const from = part.label?.from ?? null;
      const isChain = foundationOf(read.tree.items, 0) !== null && part.label === null;
      // A foundation or set-up line without a number stands before round 1 of the same piece.
      const isSetUp = part.label?.titled === true && last === 0 && (nextNumber(parts, i) ?? 2) <= 1;
      const restarts = from !== null && from <= 1 && last >= 1 && !within;
      const chainRestarts = isChain && last >= 1 && nextNumber(parts, i) !== null && nextNumber(parts, i)! <= 1;
      if (current === null || restarts || chainRestarts) current = begin(null, 1, part.start);
      within = false;
      if (!isChain && !isSetUp) last = part.label?.to ?? from ?? last + Math.max(1, part.label?.next ?? 1);
      current.lines.push({ part, read });
    } else if (current) current.lines.push({ part: part, read: readLine('', {}) });
  });
  return drafts
    .filter((draft) => draft.lines.some((line) => line.part.type === 'line'))
    .map((draft, i) => pieceOf(text, draft, i));
}

/** A heading with work that goes on where the line before left off: it says so by its places, and begins in nothing of its own. */
function goesOn(parts: readonly Part[], reads: readonly (ReadLine | null)[], at: number): boolean {
  const heading = parts[at];
  if (heading?.type !== 'heading' || heading.heading.make > 1) return false;
  for (let i = at + 1; i < Math.min(parts.length, at + NEAR); i += 1) {
    const part = parts[i]!;
    const read = reads[i];
    if (part.type === 'heading') return false;
    if (part.type !== 'line' || !read) continue;
    const { items } = read.tree;
    const isJoined = JOINED.test(items.map(wordsOf).join(' '));
    return !isJoined && !beginsItself(items) && worksOn(items);
  }
  return false;
}

const JOINED = /\b(attach|rejoin|join|pick)\b.*\byarn\b/;
const wordsOf = (item: Item): string => (item.type === 'step' || item.type === 'note' ? item.text : '');

/** In a ring, on a chain, or on what was left elsewhere. */
const beginsItself = (items: readonly Item[]): boolean =>
  foundationOf(items, 0) !== null ||
  items.some(
    (item) =>
      (item.type === 'step' && item.what === 'ring') ||
      ((item.type === 'work' || item.type === 'group') &&
        (item.into?.what === 'ring' ||
          item.into?.which === 'hook' ||
          item.into?.what === 'loop' ||
          item.into?.what === 'row-end' ||
          item.into?.which === 'skipped')),
  );

/** Goes into stitches, all round or so many of them. */
const worksOn = (items: readonly Item[]): boolean =>
  items.some(
    (item) =>
      item.type === 'skip' ||
      item.type === 'loops' ||
      ((item.type === 'work' || item.type === 'group') &&
        (item.times.type === 'fill' || (item.type === 'work' && item.into !== null))),
  );

/** The line that a heading or a chain leads to stands within so many parts. */
const NEAR = 30;

function nextNumber(parts: readonly Part[], from: number): number | null {
  for (let i = from + 1; i < Math.min(parts.length, from + NEAR); i += 1) {
    const part = parts[i]!;
    if (part.type === 'heading') return null;
    if (part.type === 'line' && part.label) return part.label.from;
  }
  return null;
}

function pieceOf(text: string, draft: Draft, index: number): PieceText {
  const worked = workedAs(draft);
  let last = 0;
  const lines = draft.lines.map(({ part, read }): LineText => {
    if (part.type !== 'line') return quietLine(text, part);
    const isChain = foundationOf(read.tree.items, 0) !== null;
    const kind = kindOf(part, isChain, worked);
    const label = part.label;
    const count = Math.max(1, label?.next ?? roundsIn(read));
    const from = kind === 'foundation' ? null : (label?.from ?? last + 1);
    const open = label !== null && label.from !== null && label.to === null;
    const isSetUp =
      label?.titled === true &&
      last === 0 &&
      draft.lines.some((line) => line.part.type === 'line' && line.part.label?.from === 1);
    const to = kind === 'foundation' ? null : open ? null : (label?.to ?? last + count);
    if (kind !== 'foundation' && !isSetUp) last = to ?? from ?? last + 1;
    const end = endOf(text, part.bodyStart, part.end, read);
    return {
      kind,
      label: part.labelText,
      from: isSetUp ? 0 : from,
      to: isSetUp ? 0 : to,
      text: oneLine(text.slice(part.bodyStart, part.end)).trimEnd(),
      textSpan: { start: part.bodyStart, end: part.end },
      span: { start: part.start, end },
      written: read.total,
      uncertain:
        label === null && !isChain
          ? 'It has no label of its own.'
          : label?.uncertain
            ? 'Its label is a number alone.'
            : null,
    };
  });
  const end = draft.lines.at(-1)!.part.end;
  return {
    name: draft.name ?? (index === 0 ? '' : `Piece ${String(index + 1)}`),
    make: draft.make,
    worked,
    lines,
    span: { start: draft.start, end },
  };
}

/** `sc in every st for the next 5 rounds`: how many rounds a line without a label stands for. */
function roundsIn(read: ReadLine): number {
  const said = read.tree.items.flatMap((item) => (item.type === 'note' ? [/^rounds (\d+)$/.exec(item.text)?.[1]] : []));
  return Number(said.find(Boolean) ?? 1);
}

function quietLine(
  text: string,
  part: { readonly type: 'step' | 'note'; readonly start: number; readonly end: number },
): LineText {
  const span = { start: part.start, end: part.end };
  return {
    kind: part.type,
    label: '',
    from: null,
    to: null,
    text: oneLine(text.slice(part.start, part.end)),
    textSpan: span,
    span,
    written: null,
    uncertain: null,
  };
}

/** To the end of the total, or of the words where there is none. */
function endOf(text: string, start: number, end: number, read: ReadLine): number {
  if (read.totalSpan) return start + read.totalSpan.end;
  return start + text.slice(start, end).trimEnd().length;
}

function kindOf(part: Extract<Part, { type: 'line' }>, isChain: boolean, worked: PieceText['worked']): LineKind {
  if (isChain) return 'foundation';
  if (part.label?.kind === 'row') return 'row';
  const isRoundWord = part.label?.kind === 'round' && /^\W*(\d+\w*\W+)?(round|rnd|rd)/i.test(part.labelText);
  return worked === 'rows' && !isRoundWord ? 'row' : 'round';
}

/** In rows where it turns or begins on a chain that is not closed; in joined rounds where rounds are joined. */
function workedAs(draft: Draft): PieceText['worked'] {
  let joins = 0;
  let turns = 0;
  let rows = 0;
  let rounds = 0;
  let ring = false;
  let chain = false;
  for (const { part, read } of draft.lines) {
    if (part.type !== 'line') continue;
    const items = read.tree.items;
    const text = JSON.stringify(items);
    if (text.includes('"what":"join"')) joins += 1;
    if (text.includes('"what":"turn"')) turns += 1;
    if (text.includes('"what":"ring"')) ring = true;
    if (text.includes('"which":"hook"') || text.includes('"what":"far"')) chain = true;
    if (text.includes('"what":"far"')) ring = true;
    if (part.label?.kind === 'row') rows += 1;
    if (part.label?.kind === 'round') rounds += 1;
    const base = foundationOf(items, 0);
    if (base) {
      if (base.shape === 'ring') ring = true;
      else chain = true;
    }
    const hookMany = items.some((item) => item.type === 'work' && item.into?.which === 'hook' && item.per[0]! > 3);
    if (hookMany) ring = true;
  }
  if (rows > 0 && rounds === 0)
    return ring && turns === 0 ? (joins > 0 ? 'joined' : 'spiral') : joins > turns && joins > 1 ? 'joined' : 'rows';
  if (ring) return joins > 0 ? 'joined' : 'spiral';
  if (joins > 0) return 'joined';
  if (turns > 0 || (chain && rounds === 0)) return 'rows';
  return chain && turns === 0 && rows === 0 && isPlainR(draft) ? 'rows' : 'spiral';
}

/** `R1` may be a row; `Round 1` may not. */
const isPlainR = (draft: Draft): boolean =>
  draft.lines.every(
    ({ part }) => part.type !== 'line' || part.label?.kind !== 'round' || /^\W*r\W*\d/i.test(part.labelText),
  );
