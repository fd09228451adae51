import { plainWord } from './align-words.ts';

/** What is compared of a line, drafted or standing in a pattern. */
export interface ComparedLine {
  readonly kind: string;
  readonly label: string;
  readonly from: number | null;
  readonly to: number | null;
  readonly text: string;
}

export interface ComparedPiece<L extends ComparedLine = ComparedLine> {
  readonly name: string;
  readonly lines: readonly L[];
}

/** How much of two pieces must be the same, and of two lines, to be taken for one under another name or number. */
const SAME_PIECE = 0.5;
const SAME_LINE = 0.6;
/** So many lines on are looked at for one that says nearly the same. */
const LOOK_ON = 8;

const plain = (text: string) => text.trim().toLowerCase().replace(/\s+/g, ' ');
const isNumbered = ({ kind }: ComparedLine) => kind === 'round' || kind === 'row';

const keyOf = (line: ComparedLine) =>
  isNumbered(line) ? `${line.kind} ${line.from} ${plain(line.text)}` : `${line.kind} ${plain(line.text)}`;

/** Share of lines that both pieces have, of the larger. */
function likeness(a: ComparedPiece, b: ComparedPiece): number {
  const keys = new Set(a.lines.map(keyOf));
  const both = new Set(b.lines.map(keyOf).filter((key) => keys.has(key)));
  return both.size / Math.max(1, a.lines.length, b.lines.length);
}

/**
 * Which piece of the pattern each drafted piece is: by its name, else, where somebody renamed it, by what it is made of.
 * @param mayBeRenamed whether a piece of the pattern can be one of the draft under another name
 * @returns for each drafted piece the index of the known one, or -1; none is given twice
 */
export function matchPieces<K extends ComparedPiece>(
  drafts: readonly ComparedPiece[],
  known: readonly K[],
  mayBeRenamed: (piece: K) => boolean = () => true,
): number[] {
  const taken = new Set<number>();
  const take = (index: number) => {
    if (index >= 0) taken.add(index);
    return index;
  };
  const named = drafts.map(({ name }) =>
    take(known.findIndex((piece, i) => !taken.has(i) && plain(piece.name) === plain(name))),
  );
  return drafts.map((draft, n) => {
    if (named[n]! >= 0) return named[n]!;
    let best = -1;
    let most = 0;
    known.forEach((piece, i) => {
      const like = taken.has(i) || !mayBeRenamed(piece) ? 0 : likeness(draft, piece);
      if (like >= SAME_PIECE && like > most) [best, most] = [i, like];
    });
    return take(best);
  });
}

/** Share of words that two lines have in common. */
function wordsInCommon(a: string, b: string): number {
  const left = a.split(/\s+/).map(plainWord);
  const right = b.split(/\s+/).map(plainWord);
  const counts = new Map<string, number>();
  for (const word of left) counts.set(word, (counts.get(word) ?? 0) + 1);
  let both = 0;
  for (const word of right) {
    const n = counts.get(word) ?? 0;
    if (n > 0) both += 1;
    counts.set(word, n - 1);
  }
  return (2 * both) / Math.max(1, left.length + right.length);
}

/** The same line with another end of its range, another number after a miscount, or other words of the same step. */
function isLikeLine(draft: ComparedLine, line: ComparedLine): boolean {
  if (draft.kind !== line.kind) return false;
  if (isNumbered(draft) && draft.from === line.from) return true;
  return (
    wordsInCommon(draft.text, line.text) >= SAME_LINE && (!isNumbered(draft) || plain(draft.text) === plain(line.text))
  );
}

interface Gap {
  readonly from: number;
  readonly to: number;
  readonly after: number;
  readonly before: number;
}

/** Fills in, between lines that were found, those that are the same but for their number or some words. */
function fillGap(drafts: readonly ComparedLine[], lines: readonly ComparedLine[], found: Found, gap: Gap): void {
  let next = gap.after + 1;
  for (let n = gap.from; n < gap.to; n++) {
    for (let i = next; i < Math.min(gap.before, next + LOOK_ON); i++) {
      if (found.taken.has(i) || !isLikeLine(drafts[n]!, lines[i]!)) continue;
      found.at[n] = i;
      found.taken.add(i);
      next = i + 1;
      break;
    }
  }
}

interface Found {
  readonly at: number[];
  readonly taken: Set<number>;
}

/** By what a line is known: its numbers, or its words and its label. */
function namesOf(line: ComparedLine): string[] {
  if (isNumbered(line)) return [`${line.kind} ${line.from} ${line.to}`];
  const label = line.label.trim() === '' ? [] : [`${line.kind} label ${plain(line.label)}`];
  return [`${line.kind} text ${plain(line.text)}`, ...label];
}

/** Finds each drafted line under a name that a known one has, the first of those that are free. */
function findByName(drafts: readonly ComparedLine[], lines: readonly ComparedLine[]): Found {
  const places = new Map<string, number[]>();
  lines.forEach((line, i) => {
    for (const name of namesOf(line)) places.set(name, [...(places.get(name) ?? []), i]);
  });
  const taken = new Set<number>();
  const free = (name: string) => {
    const list = places.get(name) ?? [];
    while (list.length > 0 && taken.has(list[0]!)) list.shift();
    return list[0] ?? -1;
  };
  const at = drafts.map((draft) => {
    const i =
      namesOf(draft)
        .map(free)
        .find((one) => one >= 0) ?? -1;
    if (i >= 0) taken.add(i);
    return i;
  });
  return { at, taken };
}

/**
 * Which line of a piece each drafted line is: the one of the same numbers (of a step: of the same words), else one between
 * the same neighbours that says nearly the same.
 * @returns for each drafted line the index of the known one, or -1; none is given twice
 */
export function matchLines(drafts: readonly ComparedLine[], lines: readonly ComparedLine[]): number[] {
  const found = findByName(drafts, lines);
  let after = -1;
  for (let n = 0; n < drafts.length; n++) {
    if (found.at[n]! >= 0) {
      after = found.at[n]!;
      continue;
    }
    let to = n;
    while (to < drafts.length && found.at[to]! < 0) to += 1;
    const before = to < drafts.length ? found.at[to]! : lines.length;
    if (before > after) fillGap(drafts, lines, found, { from: n, to, after, before });
    n = to - 1;
  }
  return found.at;
}
