import { type Lex } from './lexer.ts';

const OPENING: ReadonlySet<string> = new Set(['(', '[', '{']);
const CLOSING: ReadonlySet<string> = new Set([')', ']', '}']);

const isMark = (lex: Lex | undefined, text: string): boolean => lex?.kind === 'mark' && lex.text === text;
const isStar = (lex: Lex | undefined): boolean => isMark(lex, '*') || isMark(lex, '**');
const as = (lex: Lex, text: string): Lex => ({ ...lex, kind: 'mark', text });

/**
 * Brackets and stars put right where one key was hit for another: `<sc, inc> × 6`, `(sc, inc* × 6`, `*sc, inc) × 6`,
 * `sc, inc) × 6`, `(sc, inc × 6`, `(sc, inc) 8 6`. A mark that is put in stands at its place with no width.
 */
export function mendMarks(lexes: readonly Lex[]): Lex[] {
  return mendPartners(mendSigns(mendAngles(mendCells(lexes))));
}

/** `6 inc | 12 |`: the last cell of a table, with a total alone in it, and no bars round a group. */
function mendCells(lexes: readonly Lex[]): readonly Lex[] {
  const last = lexes.length - 2;
  if (!isMark(lexes[last], '|')) return lexes;
  const before = lexes.slice(Math.max(0, last - 6), last).findLastIndex((lex) => isMark(lex, '|'));
  if (before < 0) return lexes;
  const open = Math.max(0, last - 6) + before;
  const first = lexes[open + 1];
  const isTotal = first?.kind === 'num' || (isMark(first, '(') && lexes[open + 2]?.kind === 'num');
  return isTotal ? lexes.map((lex, i) => (i === open || i === last ? as(lex, ';') : lex)) : lexes;
}

/** Angle brackets and quotes round work, with words of times behind them, are brackets. */
function mendAngles(lexes: readonly Lex[]): Lex[] {
  const out = [...lexes];
  let open: number | null = null;
  lexes.forEach((lex, i) => {
    const isQuote = isMark(lex, '"');
    if (isMark(lex, '<') || (isQuote && open === null)) open = i;
    else if (open !== null && (isMark(lex, '>') || isQuote)) {
      if (i - open > 2 && isTimesAt(lexes, i + 1)) {
        out[open] = as(lexes[open]!, '(');
        out[i] = as(lex, ')');
      }
      open = null;
    }
  });
  return out;
}

/** `sc*6, inc*6`, `6*sc`: stars between a stitch and its count, unless they are needed as partners of others. */
function mendSigns(lexes: readonly Lex[]): readonly Lex[] {
  const isSign = (lex: Lex, i: number): boolean => {
    const [before, next] = [lexes[i - 1], lexes[i + 1]];
    if (!isMark(lex, '*') || !lex.glued || !next?.glued) return false;
    return (before?.kind === 'stitch' && next.kind === 'num') || (before?.kind === 'num' && next.kind === 'stitch');
  };
  const others = lexes.filter((lex, i) => isStar(lex) && !isSign(lex, i)).length;
  return others % 2 === 0 ? lexes.map((lex, i) => (isSign(lex, i) ? as(lex, '×') : lex)) : lexes;
}

/** `× 6`, `6 times`, `* 6`, `twice`, `around` behind a closing mark. */
function isTimesAt(lexes: readonly Lex[], at: number): boolean {
  const lex = lexes[at];
  const next = lexes[at + 1];
  if (!lex || !next) return false;
  if (isTimesSign(lex)) return next.kind === 'num';
  if (isMark(lex, '*')) return next.kind === 'num';
  if (lex.kind === 'num') return isTimesSign(next) || (next.kind === 'w' && next.text === 'times');
  return lex.kind === 'w' && ['twice', 'thrice', 'rep', 'around', 'across'].includes(lex.text);
}

const isTimesSign = (lex: Lex): boolean => isMark(lex, '×') || (lex.kind === 'word' && lex.text === 'x');

const hasStitch = (lexes: readonly Lex[], from: number, to: number): boolean => {
  for (let i = from; i < to; i += 1) if (lexes[i]!.kind === 'stitch') return true;
  return false;
};

/** One opening and one closing mark that have no partner of their own are each other's. */
function mendPartners(lexes: readonly Lex[]): Lex[] {
  const open: number[] = [];
  const stray: number[] = [];
  const stars: number[] = [];
  lexes.forEach((lex, i) => {
    if (lex.kind !== 'mark') return;
    if (OPENING.has(lex.text)) open.push(i);
    else if (CLOSING.has(lex.text)) {
      if (open.length > 0) open.pop();
      else stray.push(i);
    } else if (isStar(lex)) stars.push(i);
  });
  const firstStitch = lexes.findIndex((lex) => lex.kind === 'stitch');
  const close = firstStitch < 0 ? undefined : stray.find((i) => i > firstStitch && isTimesAt(lexes, i + 1));
  const star = stars.length === 1 ? stars[0]! : null;
  if (close !== undefined) {
    // `*sc, inc) × 6`, else `sc, inc) × 6`.
    if (star !== null && star < close) return lexes.map((lex, i) => (i === close ? as(lex, '*') : lex));
    return insert(lexes, startOfWork(lexes, close), '(');
  }
  const opened = open.length === 1 ? open[0]! : null;
  if (star !== null && isTimesAt(lexes, star + 1) && star > 1) {
    if (opened !== null && opened < star) return lexes.map((lex, i) => (i === star ? as(lex, ')') : lex));
    const isGroupBefore = CLOSING.has(lexes[star - 1]!.text) || lexes[star - 1]!.kind === 'stitch';
    if (opened === null && !isGroupBefore) return lexes as Lex[];
    const isAlone = lexes[star - 1]!.kind === 'stitch' && hasStitch(lexes, 0, star - 1) && isSpaced(lexes, star);
    if (opened === null && isAlone && !CLOSING.has(lexes[star - 1]!.text))
      return insert(
        lexes.map((lex, i) => (i === star ? as(lex, ')') : lex)),
        startOfWork(lexes, star),
        '(',
      );
  }
  if (opened !== null) {
    const end = timesBehind(lexes, opened);
    if (end !== null) return insert(lexes, end, ')');
  }
  return slipOfKey(lexes);
}

/** `sc, inc* x6`: behind the star stand words of times; `inc*6` is a count of its own stitch. */
const isSpaced = (lexes: readonly Lex[], star: number): boolean => {
  const next = lexes[star + 1]!;
  return next.kind !== 'num' || !next.glued;
};

function insert(lexes: readonly Lex[], at: number, mark: string): Lex[] {
  const place = lexes[at]!.start;
  const put: Lex = { kind: 'mark', text: mark, value: 0, start: place, end: place, glued: false, broken: false };
  return [...lexes.slice(0, at), put, ...lexes.slice(at)];
}

/** The first count or stitch of the work before a closing mark, behind label, chain or full stop. */
function startOfWork(lexes: readonly Lex[], before: number): number {
  let at = before;
  while (at > 0) {
    const previous = lexes[at - 1]!;
    if (isMark(previous, ':') || isMark(previous, '.') || isMark(previous, ';') || isMark(previous, ')')) break;
    at -= 1;
  }
  return at;
}

/** In a bracket that is never closed: the words of times in front of its end, total or full stop. */
function timesBehind(lexes: readonly Lex[], open: number): number | null {
  let stitches = 0;
  for (let i = open + 1; i < lexes.length - 1; i += 1) {
    const lex = lexes[i]!;
    if (lex.kind === 'stitch') stitches += 1;
    if (
      stitches > 1 &&
      lex.kind !== 'mark' &&
      lexes[i - 1]!.kind !== 'num' &&
      isTimesAt(lexes, i) &&
      endsBehind(lexes, i)
    )
      return isMark(lexes[i - 1], ',') ? i - 1 : i;
  }
  return null;
}

function endsBehind(lexes: readonly Lex[], at: number): boolean {
  const next = lexes[at + 2] ?? lexes[at + 1]!;
  return next.kind === 'end' || (next.kind === 'mark' && !isMark(next, ','));
}

/** `(sc, inc) 8 6` with nothing else behind it: the star and the eight share a key. */
function slipOfKey(lexes: readonly Lex[]): Lex[] {
  return lexes.map((lex, i) => {
    const before = lexes[i - 1];
    const [next, after] = [lexes[i + 1], lexes[i + 2]];
    const isEight = lex.kind === 'num' && lex.value === 8 && before !== undefined && CLOSING.has(before.text);
    const ends = after === undefined || after.kind === 'end' || (after.kind === 'mark' && after.text !== ',');
    return isEight && next?.kind === 'num' && !next.glued && ends ? as({ ...lex, readAs: '*' }, '*') : lex;
  });
}
