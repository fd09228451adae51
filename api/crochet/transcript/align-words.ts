/** Gaps of at most this many pairs of words are compared pair by pair; larger ones are cut at words said only once. */
const MOST_PAIRS = 4_096;
/** How often a gap is cut again. With the limit above this keeps the whole linear in the words. */
const DEEPEST = 8;
/** So many words in a row must be the same, and said once on each side, to be taken for the same place. */
const RUN = 3;

interface Gap {
  readonly a: number;
  readonly aEnd: number;
  readonly b: number;
  readonly bEnd: number;
  readonly depth: number;
}

/** A word as it is compared: small letters and figures alone. */
export const plainWord = (text: string): string => text.toLowerCase().replace(/[^\p{L}\p{N}]/gu, '');

/**
 * Which word of `a` each word of `b` is, both in their order; -1 where it is none of them. Words are compared as they
 * stand: make them plain before. Takes time linear in the words.
 *
 * @example alignWords(['so', 'round', 'two'], ['round', 'two', 'then']) // [1, 2, -1]
 */
export function alignWords(a: readonly string[], b: readonly string[]): number[] {
  const found = new Array<number>(b.length).fill(-1);
  const gaps: Gap[] = [{ a: 0, aEnd: a.length, b: 0, bEnd: b.length, depth: 0 }];
  for (let gap = gaps.pop(); gap !== undefined; gap = gaps.pop()) gaps.push(...alignGap(a, b, gap, found));
  return found;
}

/** Takes what begins and ends alike, compares a small rest pair by pair, and gives back the parts of a large one. */
function alignGap(a: readonly string[], b: readonly string[], gap: Gap, found: number[]): Gap[] {
  let { a: from, aEnd: to, b: at, bEnd: end } = gap;
  while (from < to && at < end && a[from] === b[at]) found[at++] = from++;
  while (from < to && at < end && a[to - 1] === b[end - 1]) found[--end] = --to;
  if (from === to || at === end) return [];
  const rest: Gap = { a: from, aEnd: to, b: at, bEnd: end, depth: gap.depth + 1 };
  if ((to - from) * (end - at) <= MOST_PAIRS) {
    alignPairs(a, b, rest, found);
    return [];
  }
  return gap.depth === DEEPEST ? [] : cutAtAnchors(a, b, rest, found);
}

/** The longest common run of words of a small gap. */
function alignPairs(a: readonly string[], b: readonly string[], gap: Gap, found: number[]): void {
  const [rows, columns] = [gap.aEnd - gap.a, gap.bEnd - gap.b];
  const longest = new Uint16Array((rows + 1) * (columns + 1));
  const at = (i: number, j: number) => i * (columns + 1) + j;
  for (let i = rows - 1; i >= 0; i--) {
    for (let j = columns - 1; j >= 0; j--) {
      longest[at(i, j)] =
        a[gap.a + i] === b[gap.b + j]
          ? longest[at(i + 1, j + 1)]! + 1
          : Math.max(longest[at(i + 1, j)]!, longest[at(i, j + 1)]!);
    }
  }
  for (let i = 0, j = 0; i < rows && j < columns;) {
    if (a[gap.a + i] === b[gap.b + j]) found[gap.b + j++] = gap.a + i++;
    else if (longest[at(i + 1, j)]! >= longest[at(i, j + 1)]!) i++;
    else j++;
  }
}

/** Cuts a large gap where the same words in a row were said once on each side, in the same order. */
function cutAtAnchors(a: readonly string[], b: readonly string[], gap: Gap, found: number[]): Gap[] {
  const inA = runsOnce(a, gap.a, gap.aEnd);
  const inB = runsOnce(b, gap.b, gap.bEnd);
  const pairs: (readonly [number, number])[] = [];
  for (const [run, i] of inA) {
    const j = inB.get(run) ?? -1;
    if (i >= 0 && j >= 0) pairs.push([i, j]);
  }
  const parts: Gap[] = [];
  let { a: from, b: at } = gap;
  for (const [i, j] of longestRising(pairs)) {
    parts.push({ a: from, aEnd: i, b: at, bEnd: j, depth: gap.depth });
    found[j] = i;
    from = i + 1;
    at = j + 1;
  }
  return parts.length === 0 ? [] : [...parts, { ...gap, a: from, b: at }];
}

/** Runs of words with the place of each that is there once; -1 for the others. */
function runsOnce(words: readonly string[], from: number, to: number): Map<string, number> {
  const once = new Map<string, number>();
  for (let i = from; i + RUN <= to; i++) {
    const run = words.slice(i, i + RUN).join(' ');
    once.set(run, once.has(run) ? -1 : i);
  }
  return once;
}

/** The most pairs whose second numbers rise as their first ones do. Given in order of the first. */
function longestRising(pairs: readonly (readonly [number, number])[]): (readonly [number, number])[] {
  const tails: number[] = [];
  const before = new Int32Array(pairs.length).fill(-1);
  pairs.forEach(([, j], n) => {
    let low = 0;
    let high = tails.length;
    while (low < high) {
      const middle = (low + high) >> 1;
      if (pairs[tails[middle]!]![1] < j) low = middle + 1;
      else high = middle;
    }
    before[n] = low === 0 ? -1 : tails[low - 1]!;
    tails[low] = n;
  });
  const rising: (readonly [number, number])[] = [];
  for (let n = tails.at(-1) ?? -1; n >= 0; n = before[n]!) rising.push(pairs[n]!);
  return rising.reverse();
}
