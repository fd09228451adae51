import { readLine } from '../language/read-line.ts';
import { type Item, type ReadLine } from '../language/tree.ts';
import { type Edit } from './edits.ts';
import { type PatternInput, type PieceInput } from './input.ts';
import { countPattern } from './pattern.ts';
import { type LineCount, type PatternCount } from './result.ts';

/** The words of a line that were understood, and what stands around them. */
interface Understood {
  readonly before: string;
  readonly words: string;
  readonly after: string;
}

/**
 * For a line that trails off (`2 sc, inv dec, and so on`): its words, repeated as often as they go into what the line
 * before leaves. Only where a total was given that can bear it out.
 *
 * @param before label of the line before, for the sentence.
 * @returns the edit, still to be tried; null where the words do not go evenly into the places.
 */
export function repeatedWords(
  near: PatternInput,
  now: PatternCount,
  index: number,
  before: string | null,
): Edit | null {
  const piece = near.pieces[0]!;
  const line = piece.lines[index]!;
  const count = now.pieces[0]!.lines[index]!;
  const totals = totalsSaid(count);
  if (totals === null || count.base === null) return null;
  const read = readLine(line.text, {
    terms: near.terms,
    special: near.specialStitches ?? [],
    sizes: Math.max(1, near.sizes.length),
  });
  const understood = understoodIn(line.text, read);
  if (!understood) return null;
  const times = timesIn(piece, index);
  const textOf = (n: number) => `${understood.before}${times(understood.words, n)}${understood.after}`;
  const uses = usesOf({ ...near, pieces: [{ ...piece, lines: withText(piece, index, textOf(1)) }] }, now, index);
  if (uses === null || count.base % uses !== 0) return null;
  const n = count.base / uses;
  const base = `${before === null ? 'there are' : `${before} leaves`} ${String(count.base)}`;
  return {
    text: textOf(n),
    sentence: `One repeat uses ${String(uses)} and ${base}: ${inWords(n)} ${n === 1 ? 'repeat' : 'repeats'}. ${totals}`,
    weight: 1,
  };
}

const withText = (piece: PieceInput, index: number, text: string) =>
  piece.lines.map((one, i) => (i === index ? { ...one, text } : one));

/** Places that the line uses; null where that is not known. */
function usesOf(input: PatternInput, now: PatternCount, index: number): number | null {
  const { uses, verdict } = countPattern(input, now).pieces[0]!.lines[index]!;
  return verdict === 'unread' || uses === null || uses === 0 ? null : uses;
}

/** `18 was said.`, `18 is written.`; null where no plain total was given. */
function totalsSaid({ written, said }: LineCount): string | null {
  const [onPaper, aloud] = [written?.sts?.[0], said?.sts?.[0]];
  if (onPaper === undefined) return aloud === undefined ? null : `${String(aloud)} was said.`;
  return aloud === undefined ? `${String(onPaper)} is written.` : `${String(onPaper)} was said and is written.`;
}

const isWork = (item: Item): boolean => item.type === 'work' || item.type === 'group' || item.type === 'skip';

/** The work before the one stretch that was not understood, where nothing but that stretch stands in the way. */
function understoodIn(text: string, { tree, unread }: ReadLine): Understood | null {
  const gap = unread[0];
  if (!gap || unread.length > 1) return null;
  const at = tree.items.findIndex((item) => item.type === 'unread');
  const first = tree.items.findIndex(isWork);
  if (first < 0 || at <= first) return null;
  const working = tree.items.slice(first, at);
  const isPlain =
    working.every(isWork) &&
    working.every((item) => item.type !== 'work' || (item.stitch !== 'ch' && item.times.type === 'n')) &&
    !tree.items.slice(at + 1).some((item) => item.type !== 'note' && item.type !== 'step');
  if (!isPlain) return null;
  const start = working[0]!.span.start;
  return {
    before: text.slice(0, start),
    words: insideOf(text, working) ?? trimmed(text.slice(start, gap.start)),
    after: text.slice(gap.end).replace(/^\s*\.(?=\S)/u, ''),
  };
}

const trimmed = (words: string): string => words.replace(/[\s,;.–-]+$/u, '').trim();

/** What stands in the brackets, where the words are one bracket: its own number gives way. */
function insideOf(text: string, [only, ...others]: readonly Item[]): string | null {
  if (only?.type !== 'group' || others.length > 0 || only.into !== null || only.mark === '') return null;
  const [first, last] = [only.items[0], only.items.at(-1)];
  return first && last ? text.slice(first.span.start, last.span.end) : null;
}

/** How this piece writes a repeat, taken from the nearest line that has one: `(…) ×6`, `(…) x 6`, `(…) 6 times`. */
function timesIn(piece: PieceInput, index: number): (words: string, n: number) => string {
  const nearest = [...piece.lines.slice(0, index).toReversed(), ...piece.lines.slice(index + 1)];
  for (const { text } of nearest) {
    const sign = /[)\]](\s*[×xX]\s*)\d/u.exec(text)?.[1];
    if (sign) return (words, n) => `${bracketed(words)}${sign}${String(n)}`;
    if (/[)\]]\s*\d+ times/u.test(text)) return (words, n) => `${bracketed(words)} ${String(n)} times`;
  }
  return (words, n) => `${bracketed(words)} × ${String(n)}`;
}

/** A single stitch needs no bracket: `inc ×6`. */
const bracketed = (words: string): string => (/^\p{L}+(?: \p{L}+)?$/u.test(words) ? words : `(${words})`);

const WORDS = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten', 'eleven', 'twelve'];

const inWords = (n: number): string => WORDS[n] ?? String(n);
