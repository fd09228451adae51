import { isMark, isPlain, isTimesSign, isWord } from './reading.ts';
import { type Lex } from './lexer.ts';

/** A label that begins a line: `Round 4:`, `R5–8`, `4th row.`, `Rnds 5 to 8`, `Row 2 (RS)`, `4)`. */
export interface Label {
  readonly kind: 'round' | 'row' | 'bare';
  readonly from: number | null;
  /** Null for an open range (`Rounds 9+`). */
  readonly to: number | null;
  /** Index of the first meaning behind the label. */
  readonly after: number;
  /** `next round`, `next 5 rows`: how many, where no number is given. */
  readonly next: number;
  readonly uncertain: boolean;
  /** A label in words: `set-up round`, `foundation chain`. */
  readonly titled?: true;
}

const at = (lexes: readonly Lex[], i: number): Lex => lexes[Math.min(i, lexes.length - 1)]!;

/** The label at this index, or null. */
export function readLabel(lexes: readonly Lex[], start: number): Label | null {
  let i = start;
  while (
    isMark(at(lexes, i), '-') ||
    isMark(at(lexes, i), '.') ||
    isMark(at(lexes, i), '|') ||
    isMark(at(lexes, i), '#')
  )
    i += 1;
  return ordinal(lexes, i) ?? named(lexes, i) ?? next(lexes, i) ?? titled(lexes, i) ?? bare(lexes, i);
}

const isRoundWord = (lex: Lex): boolean => isWord(lex, 'round', 'row');

/** `Round 4`, `Rnds 5-8`, `R4`, `R: 4`, `Row three`. */
function named(lexes: readonly Lex[], start: number): Label | null {
  let i = start;
  if (at(lexes, i).kind === 'num' && isMark(at(lexes, i + 1), '.') && isRoundWord(at(lexes, i + 2))) i += 2;
  const word = at(lexes, i);
  const isR = isPlain(word, 'r', 'rn', 'rnd');
  if (!isRoundWord(word) && !isR) return null;
  i += 1;
  if (isMark(at(lexes, i), '.') || isMark(at(lexes, i), ':') || isMark(at(lexes, i), '#')) i += 1;
  const number = at(lexes, i);
  if (number.kind !== 'num' || number.broken) return null;
  const kind = isWord(word, 'row') ? 'row' : 'round';
  return ranged(lexes, i, kind, word);
}

/** The number is at `i`; a range may follow it. */
function ranged(lexes: readonly Lex[], i: number, kind: Label['kind'], word: Lex): Label {
  const from = at(lexes, i).value;
  let to: number | null = from;
  let after = i + 1;
  for (;;) {
    // `11)-14)`.
    if (isMark(at(lexes, after), ')') && isMark(at(lexes, after + 1), '-') && isNumber(at(lexes, after + 2)))
      after += 1;
    const joint = at(lexes, after);
    if (isMark(joint, '+') && !isNumber(at(lexes, after + 1))) {
      to = null;
      after += 1;
      break;
    }
    const isTo =
      isMark(joint, '-') ||
      isWord(joint, 'to', 'through', 'and') ||
      isMark(joint, ',') ||
      isMark(joint, '+') ||
      isMark(joint, '&') ||
      isMark(joint, '/') ||
      (isWord(joint, 'the') && joint.end - joint.start === 1 && isNumber(at(lexes, after + 1)));
    if (!isTo) break;
    let j = after + 1;
    while (isRoundWord(at(lexes, j)) || isPlain(at(lexes, j), 'r') || isWord(at(lexes, j), 'and', 'the')) j += 1;
    const second = at(lexes, j);
    if (!isNumber(second) || second.value <= to || !endsRange(lexes, j, joint, word)) break;
    to = second.value;
    after = j + 1;
    if (second.kind === 'ord' && isRoundWord(at(lexes, after))) after += 1;
  }
  return { kind, from, to, after: closing(lexes, after), next: 0, uncertain: false };
}

const isNumber = (lex: Lex): boolean => lex.kind === 'num' || lex.kind === 'ord';

/** `Round 4 – 2 sc …` is one round: a count goes on with a stitch, a range with a mark. */
function endsRange(lexes: readonly Lex[], j: number, joint: Lex, word: Lex): boolean {
  const next = at(lexes, j + 1);
  if (isWord(joint, 'to', 'through')) return true;
  if (isMark(next, ':') || isMark(next, ')') || isMark(next, '=') || isMark(next, '.')) return true;
  const plural = isPlural(word);
  if (next.kind === 'stitch' || isWord(next, 'st', 'in')) return plural && joint.glued;
  if (isMark(next, '-') || isMark(next, ',') || isMark(next, '(') || isMark(next, '+') || isMark(next, '&'))
    return true;
  if (isWord(next, 'and', 'to', 'times')) return !isWord(next, 'times');
  return plural || joint.glued || next.kind === 'end';
}

/** `rounds`, `rnds`, `rows`: known from the length of the word as it stands. */
const isPlural = (word: Lex): boolean => {
  const length = word.end - word.start;
  return isWord(word, 'row') ? length === 4 : length === 6 || length === 4 || word.end - word.start === 3;
};

/** What closes a label: a colon, stop, bracket, dash; `(RS)`, `(4 rounds)`; `incl`. */
function closing(lexes: readonly Lex[], start: number): number {
  let i = evenRows(lexes, start);
  for (;;) {
    const lex = at(lexes, i);
    if (isPlain(lex, 'incl', 'inclusive', 'rs', 'ws')) {
      i += 1;
      continue;
    }
    if ((isMark(lex, '(') || isMark(lex, '[')) && isRemark(lexes, i)) {
      while (!isMark(at(lexes, i), ')') && !isMark(at(lexes, i), ']')) i += 1;
      i += 1;
      continue;
    }
    if (
      isMark(lex, ':') ||
      isMark(lex, ')') ||
      isMark(lex, '.') ||
      isMark(lex, '-') ||
      (isMark(lex, '|') && !opensBars(lexes, i)) ||
      isMark(lex, '=') ||
      isMark(lex, ',') ||
      isMark(lex, ';') ||
      isMark(lex, '>')
    ) {
      i += 1;
      continue;
    }
    return i;
  }
}

/** `Row 2 and all even rows:`, `Row 3 and every alt row:`. */
function evenRows(lexes: readonly Lex[], start: number): number {
  if (!isWord(at(lexes, start), 'and', 'each')) return start;
  for (let i = start + 1; i < start + 7; i += 1) {
    if (isRoundWord(at(lexes, i)) && !isNumber(at(lexes, i + 1))) return i + 1;
    const isSaid =
      isWord(at(lexes, i), 'each', 'other', 'the', 'next', 'even', 'remain') ||
      isPlain(at(lexes, i), 'odd', 'numbered', 'wrong', 'right') ||
      isMark(at(lexes, i), '-');
    if (!isSaid && at(lexes, i).kind !== 'ord') return start;
  }
  return start;
}

/** `|3 sc, dec| × 6`: bars round a group, not the cell of a table. */
function opensBars(lexes: readonly Lex[], open: number): boolean {
  for (let i = open + 2; i < open + 30; i += 1) {
    if (isMark(at(lexes, i), '|')) return isTimesSign(at(lexes, i + 1)) || at(lexes, i + 1).kind === 'num';
  }
  return false;
}

/** `(RS)`, `(right side)`, `(4 rounds)`, `(wrong side)`. */
function isRemark(lexes: readonly Lex[], open: number): boolean {
  for (let i = open + 1; i < open + 6; i += 1) {
    const lex = at(lexes, i);
    if (isMark(lex, ')') || isMark(lex, ']')) return i > open + 1;
    if (
      isPlain(lex, 'rs', 'ws', 'right', 'wrong') ||
      isWord(lex, 'side', 'round', 'row') ||
      (lex.kind === 'num' && isRoundWord(at(lexes, i + 1)))
    )
      continue;
    return false;
  }
  return false;
}

/** `4th rnd:`, `2nd and 3rd rows`, `5th to 8th rnds incl`, `4 row:`, `4. row:`. */
function ordinal(lexes: readonly Lex[], start: number): Label | null {
  const first = at(lexes, start);
  const isFirst = isWord(first, 'first') && isRoundWord(at(lexes, start + 1));
  if (isFirst) {
    const kind = isWord(at(lexes, start + 1), 'row') ? 'row' : 'round';
    return { kind, from: 1, to: 1, after: closing(lexes, start + 2), next: 0, uncertain: false };
  }
  if (!isNumber(first)) return null;
  let i = start + 1;
  if (first.kind === 'num' && isMark(at(lexes, i), '.')) i += 1;
  let to = first.value;
  for (;;) {
    const joint = at(lexes, i);
    const isTo =
      isMark(joint, '-') || isWord(joint, 'to', 'through', 'and') || isMark(joint, ',') || isMark(joint, '&');
    if (!isTo || !isNumber(at(lexes, i + 1)) || at(lexes, i + 1).value <= to) break;
    to = at(lexes, i + 1).value;
    i += 2;
  }
  if (!isRoundWord(at(lexes, i))) return null;
  // `4 rounds of sc` is work, not a label.
  if (first.kind === 'num' && to === first.value && !isLabelEnd(at(lexes, i + 1))) return null;
  const kind = isWord(at(lexes, i), 'row') ? 'row' : 'round';
  return { kind, from: first.value, to, after: closing(lexes, i + 1), next: 0, uncertain: false };
}

const isLabelEnd = (lex: Lex): boolean => lex.kind === 'mark' && [':', '-', '.', ')', '=', '(', '|'].includes(lex.text);

/** `Next round:`, `next 5 rows`. */
function next(lexes: readonly Lex[], start: number): Label | null {
  if (!isWord(at(lexes, start), 'next')) return null;
  let i = start + 1;
  let count = 1;
  if (at(lexes, i).kind === 'num') {
    count = at(lexes, i).value;
    i += 1;
  }
  if (!isRoundWord(at(lexes, i))) return null;
  const kind = isWord(at(lexes, i), 'row') ? 'row' : 'round';
  return { kind, from: null, to: null, after: closing(lexes, i + 1), next: count, uncertain: false };
}

const TITLES = [
  'foundation',
  'base',
  'setup',
  'set',
  'up',
  'edging',
  'border',
  'final',
  'plain',
  'even',
  'shaping',
  'brim',
  'ribbing',
  'rib',
  'decreasing',
];

/** `Foundation chain:`, `Set-up round:`, `Increase rnd:`, `Edging row -`: a label in words without a number. */
function titled(lexes: readonly Lex[], start: number): Label | null {
  let i = start;
  while (
    i < start + 4 &&
    (isPlain(at(lexes, i), ...TITLES) || isTitleWord(at(lexes, i)) || (i > start && isMark(at(lexes, i), '-')))
  )
    i += 1;
  const noun = at(lexes, i);
  const isChain = noun.kind === 'stitch' && noun.text === 'ch';
  if (i === start || (!isRoundWord(noun) && !isChain)) return null;
  const close = at(lexes, i + 1);
  if (!isMark(close, ':') && !(isMark(close, '-') && !close.glued) && !(isMark(close, '.') && !isChain)) return null;
  const kind = isWord(noun, 'row') ? 'row' : 'round';
  return { kind, from: null, to: null, after: closing(lexes, i + 1), next: 1, uncertain: false, titled: true };
}

/** Words of the trade that may name a line: `increase`, `decrease`, `first` and `last`. */
const isTitleWord = (lex: Lex): boolean =>
  isWord(lex, 'last', 'first', 'join', 'even') || (lex.kind === 'stitch' && ['inc', 'dec'].includes(lex.text));

/** `4.`, `4)`, `4:`, `4 -`, `5) 8) sc`: a number alone. Never certain by itself. */
function bare(lexes: readonly Lex[], start: number): Label | null {
  const number = at(lexes, start);
  if (number.kind !== 'num') return null;
  let i = start + 1;
  let to = number.value;
  if (isMark(at(lexes, i), '+') && at(lexes, i).glued && at(lexes, i + 1).kind === 'stitch')
    return { kind: 'bare', from: number.value, to: null, after: i + 1, next: 0, uncertain: true };
  if (isMark(at(lexes, i), ')') && isMark(at(lexes, i + 1), '-')) i += 1;
  const joint = at(lexes, i);
  if (isMark(joint, '-') || isWord(joint, 'to') || isMark(joint, ')')) {
    const second = at(lexes, i + 1);
    if (second.kind === 'num' && second.value > to && isLabelEnd(at(lexes, i + 2)) && !isMark(at(lexes, i + 2), '(')) {
      to = second.value;
      i += 2;
    }
  }
  const end = at(lexes, i);
  if (
    !isMark(end, '.') &&
    !isMark(end, ')') &&
    !isMark(end, ':') &&
    !(isMark(end, '|') && start > 0) &&
    !(isMark(end, '-') && !end.glued) &&
    !(isMark(end, '=') && to === number.value)
  )
    return null;
  return { kind: 'bare', from: number.value, to, after: closing(lexes, i), next: 0, uncertain: true };
}
