import { type SaidPiece, type WrittenPiece } from './held-against.ts';

/** So many pieces with a line of the same numbers and total are looked at; more of them tell nothing apart. */
const MOST_ALIKE = 8;

/** A name as it is compared: small letters, its last word in the singular, without how often it is made. */
const plainName = (name: string): string =>
  name
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]+/gu, ' ')
    .trim()
    .replace(/^the /, '')
    .replace(/(?<=\p{L}{2})(?<!s)s$/u, '');

type Numbered = Pick<WrittenPiece['lines'][number], 'kind' | 'from' | 'to'>;
const signOf = ({ kind, from, to }: Numbered, total: number | undefined) => `${kind} ${from}-${to} ${total}`;

/** Gives each drafted piece the first free written one that `keysOf` names. */
function takeByKey(
  found: (number | null)[],
  taken: Set<number>,
  said: readonly string[],
  written: readonly string[],
): void {
  const places = new Map<string, number[]>();
  written.forEach((key, i) => {
    if (taken.has(i) || key === '') return;
    const list = places.get(key);
    if (list) list.push(i);
    else places.set(key, [i]);
  });
  for (const list of places.values()) list.reverse();
  said.forEach((key, n) => {
    const i = found[n] === null ? places.get(key)?.pop() : undefined;
    if (i === undefined) return;
    found[n] = i;
    taken.add(i);
  });
}

/** Lines that two pieces have in common, told by their numbers and totals. */
function takeByLines(
  found: (number | null)[],
  taken: Set<number>,
  written: readonly WrittenPiece[],
  said: readonly SaidPiece[],
): void {
  const places = new Map<string, number[]>();
  written.forEach((piece, i) => {
    if (taken.has(i)) return;
    for (const sign of new Set(piece.lines.map((line) => signOf(line, line.total?.sts?.[0])))) {
      const list = places.get(sign) ?? [];
      if (list.length < MOST_ALIKE) places.set(sign, [...list, i]);
    }
  });
  said.forEach((piece, n) => {
    if (found[n] !== null) return;
    const score = new Map<number, number>();
    for (const line of piece.lines) {
      for (const i of places.get(signOf(line, line.said?.sts?.[0])) ?? []) score.set(i, (score.get(i) ?? 0) + 1);
    }
    let best: number | null = null;
    for (const [i, many] of score) {
      if (!taken.has(i) && many * 2 >= Math.min(piece.lines.length, written[i]!.lines.length)) {
        if (best === null || many > score.get(best)!) best = i;
      }
    }
    if (best === null) return;
    found[n] = best;
    taken.add(best);
  });
}

/**
 * The written piece that each drafted piece is: by its name, by its first or last word, by what it is made of; the one
 * that is left over on either side is taken for the one that is left over on the other.
 * @returns for each drafted piece an index of `written`, or null; none is given twice
 */
export function matchHeldPieces(written: readonly WrittenPiece[], said: readonly SaidPiece[]): (number | null)[] {
  const found: (number | null)[] = said.map(() => null);
  const taken = new Set<number>();
  const names = { written: written.map(({ name }) => plainName(name)), said: said.map(({ name }) => plainName(name)) };
  const word = (place: 0 | -1) => (name: string) => name.split(' ').at(place) ?? '';
  takeByKey(found, taken, names.said, names.written);
  takeByKey(found, taken, names.said.map(word(-1)), names.written.map(word(-1)));
  takeByKey(found, taken, names.said.map(word(0)), names.written.map(word(0)));
  takeByLines(found, taken, written, said);
  const free = written.map((_, i) => i).filter((i) => !taken.has(i));
  const alone = found.flatMap((one, n) => (one === null ? [n] : []));
  if (free.length === 1 && alone.length === 1) found[alone[0]!] = free[0]!;
  return found;
}
