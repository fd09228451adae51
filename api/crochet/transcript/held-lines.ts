import { type SaidLine, type WrittenLine } from './held-against.ts';

/** A range of more rounds than this is found by its first ones. */
const MOST_ROUNDS = 400;
/** Words shorter than this, and letters behind this many, do not tell steps apart: "stuffing" is "stuff". */
const SHORTEST = 4;
const STEM = 4;
/** So many steps that share a word are looked at, on either side of where the step stands. */
const MOST_ALIKE = 6;

/** Drafted lines that a written line was found in; indices into the drafted ones, in order. */
export interface LinePair {
  readonly said: readonly number[];
}

type Numbered = Pick<WrittenLine, 'kind' | 'from' | 'to'>;

const isNumbered = ({ kind, from }: Numbered) => from !== null && (kind === 'round' || kind === 'row');

function numbersOf({ from, to }: Numbered): number[] {
  const many = Math.min(MOST_ROUNDS, Math.max(1, (to ?? from!) - from! + 1));
  return Array.from({ length: many }, (_, i) => from! + i);
}

/** By the numbers spoken: a range is found where any of its rounds was said, and one round in a range that holds it. */
function findByNumber(written: readonly WrittenLine[], said: readonly SaidLine[], pairs: Set<number>[]): void {
  const places = new Map<string, number>();
  said.forEach((line, at) => {
    if (!isNumbered(line)) return;
    for (const n of numbersOf(line)) {
      // Said twice, the first stands: what comes after it is a look back.
      for (const key of [`${line.kind} ${n}`, `any ${n}`]) if (!places.has(key)) places.set(key, at);
    }
  });
  // Where only one of the two is written, what was called the other is meant: "row nine" of a spiral.
  const isMixed = new Set(written.filter(isNumbered).map(({ kind }) => kind)).size > 1;
  written.forEach((line, i) => {
    if (!isNumbered(line)) return;
    for (const n of numbersOf(line)) {
      const at = places.get(`${line.kind} ${n}`) ?? (isMixed ? undefined : places.get(`any ${n}`));
      if (at !== undefined) pairs[i]!.add(at);
    }
  });
}

const workOf = (line: { readonly work: readonly string[]; readonly kind: string }) =>
  line.work.length > 0 ? line.work.join() : '';

/** What bears another number but is the same work, between lines that were found before and after it. */
function findByWork(written: readonly WrittenLine[], said: readonly SaidLine[], pairs: Set<number>[]): void {
  const met = new Set(pairs.flatMap((pair) => [...pair]));
  let next = 0;
  written.forEach((line, i) => {
    const own = pairs[i]!;
    if (own.size > 0) {
      next = Math.max(next, ...own) + 1;
      return;
    }
    if (!isNumbered(line) || workOf(line) === '') return;
    const at = next < said.length && !met.has(next) && workOf(said[next]!) === workOf(line) ? next : -1;
    if (at < 0) return;
    own.add(at);
    met.add(at);
    next = at + 1;
  });
}

/** Foundations in their order: there is nothing else to know them by. */
function findFoundations(written: readonly WrittenLine[], said: readonly SaidLine[], pairs: Set<number>[]): void {
  const places = said.flatMap(({ kind }, at) => (kind === 'foundation' ? [at] : []));
  let next = 0;
  written.forEach(({ kind }, i) => {
    const at = kind === 'foundation' ? places[next++] : undefined;
    if (at !== undefined) pairs[i]!.add(at);
  });
}

const stemsOf = (text: string): Set<string> =>
  new Set(
    text
      .toLowerCase()
      .split(/[^\p{L}]+/u)
      .filter((word) => word.length >= SHORTEST)
      .map((word) => word.slice(0, STEM)),
  );

/** For each line the last number before it: where between the rounds a step stands. */
function slotsOf(lines: readonly Numbered[]): number[] {
  let slot = 0;
  return lines.map((line) => (isNumbered(line) ? (slot = line.to ?? line.from!) : slot));
}

/** The steps of a list nearest to a place between the rounds. */
function nearSlot(list: readonly number[], slots: readonly number[], slot: number): readonly number[] {
  let low = 0;
  let high = list.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (slots[list[middle]!]! < slot) low = middle + 1;
    else high = middle;
  }
  return list.slice(Math.max(0, low - MOST_ALIKE), low + MOST_ALIKE);
}

/** Steps by the words they share, the nearest between the rounds first; each drafted step is one written step. */
function findSteps(written: readonly WrittenLine[], said: readonly SaidLine[], pairs: Set<number>[]): void {
  const places = new Map<string, number[]>();
  said.forEach((line, at) => {
    if (line.kind !== 'step') return;
    for (const stem of stemsOf(line.text)) {
      const list = places.get(stem);
      if (list) list.push(at);
      else places.set(stem, [at]);
    }
  });
  const [slots, saidSlots] = [slotsOf(written), slotsOf(said)];
  const met = new Set<number>();
  written.forEach((line, i) => {
    if (line.kind !== 'step') return;
    const shared = new Map<number, number>();
    for (const stem of stemsOf(line.text)) {
      for (const at of nearSlot(places.get(stem) ?? [], saidSlots, slots[i]!)) {
        if (!met.has(at)) shared.set(at, (shared.get(at) ?? 0) + 1);
      }
    }
    const worth = ([at, many]: readonly [number, number]) => many - Math.abs(saidSlots[at]! - slots[i]!) / 2;
    const best = [...shared].sort((a, b) => worth(b) - worth(a) || a[0] - b[0])[0];
    if (best === undefined || worth(best) <= 0) return;
    pairs[i]!.add(best[0]);
    met.add(best[0]);
  });
}

/**
 * Finds each written line of a piece among those drafted for it: rounds and rows by the numbers spoken, then by their
 * work; foundations by their order; steps by the words they share.
 */
export function matchHeldLines(written: readonly WrittenLine[], said: readonly SaidLine[]): LinePair[] {
  const pairs = written.map(() => new Set<number>());
  findByNumber(written, said, pairs);
  findByWork(written, said, pairs);
  findFoundations(written, said, pairs);
  findSteps(written, said, pairs);
  return pairs.map((pair) => ({ said: [...pair].sort((a, b) => a - b) }));
}
