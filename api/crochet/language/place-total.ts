import { type Span } from '../span.ts';

const OPEN = '([{<';
const CLOSE = ')]}>';

/** Takes the brackets and the words "sts" or "stitches" that stand round the figure out of what is replaced. */
function innerSpan(text: string, { start, end }: Span): Span {
  const hasBrackets = OPEN.includes(text.charAt(start)) && CLOSE.includes(text.charAt(end - 1));
  return hasBrackets ? { start: start + 1, end: end - 1 } : { start, end };
}

/** The total's stretch with the brackets that stand round it, if they do, and the space before. */
function wholeSpan(text: string, { start, end }: Span): Span {
  const inBrackets = start > 0 && OPEN.includes(text.charAt(start - 1)) && CLOSE.includes(text.charAt(end) || ' ');
  const from = inBrackets ? start - 1 : start;
  const spaces = /[\s,;:–-]*$/.exec(text.slice(0, from))?.[0].length ?? 0;
  return { start: from - spaces, end: inBrackets ? end + 1 : end };
}

/**
 * Puts another total in the place of the one that stands in an instruction, in the brackets that were typed.
 * @param span where the total stands, as the count tells it, with or without its brackets
 * @param printed the new total as it is written; null takes the total out
 * @example placeTotal('(sc, inc) ×6 (12)', { start: 13, end: 17 }, '18') // '(sc, inc) ×6 (18)'
 */
export function placeTotal(text: string, span: Span, printed: string | null): string {
  const { start, end } = printed === null ? wholeSpan(text, span) : innerSpan(text, span);
  return `${text.slice(0, start)}${printed ?? ''}${text.slice(end)}`;
}
