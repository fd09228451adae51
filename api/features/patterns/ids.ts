import { randomInt } from 'node:crypto';

/** Without the letters and figures that are taken for one another on paper (0 o, 1 l i, u v), and without a hyphen. */
const ALPHABET = '23456789abcdefghjkmnpqrstwxyz';

const draw = (length: number): string => Array.from({ length }, () => ALPHABET[randomInt(ALPHABET.length)]).join('');

/** A pattern's code, printed as `/w/<code>`: eight places, so that nobody finds an unlisted pattern by trying. */
export const newCode = (): string => draw(8);

/**
 * Short ids for new lines of a pattern, printed as `/w/<code>#<line>`.
 * @param taken every short id the pattern ever had, deleted lines too: none is given twice
 */
export function newShortIds(taken: ReadonlySet<string>, howMany: number): string[] {
  const made = new Set<string>();
  while (made.size < howMany) {
    const id = draw(4);
    if (!taken.has(id)) made.add(id);
  }
  return [...made];
}
