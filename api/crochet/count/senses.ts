import { type CountedWith } from './compare.ts';
import { type Counted } from './count-line.ts';

const SENSES: readonly CountedWith[] = ['stitches', 'chains', 'spaces'];

/** In what senses the plain totals of the lines with chains come out; null for a line that rules nothing out. */
const told = (counted: readonly Counted[]): (readonly CountedWith[])[] =>
  counted.flatMap(({ senses }) => (senses && senses.length > 0 ? [senses] : []));

/**
 * The one sense in which the plain totals of a piece are meant: a writer who counts the chains in one line does not
 * leave them out in the next.
 *
 * @returns the senses worth trying, the likeliest first; none where no line with chains agrees, or all are taken so already.
 */
export function sensesToTry(counted: readonly Counted[]): CountedWith[] {
  const lines = told(counted);
  const common = SENSES.filter((sense) => lines.every((senses) => senses.includes(sense)));
  const [shared] = common;
  if (shared !== undefined) return lines.every(([first]) => first === shared) ? [] : [shared];
  // They contradict one another: that of the first such line stands first, and holds where none has more on its side.
  const [first = []] = lines;
  return [...first, ...SENSES.filter((sense) => !first.includes(sense) && lines.some((one) => one.includes(sense)))];
}
