import { type SpecialStitch } from '../../count/input.ts';
import { type Terms } from '../../span.ts';
import { formsOf } from '../../stitches.ts';

/** `cluster (cl): …`, `Shell = 5 dc in one st`, `Puff st (PS) - yo, …`: a stitch that the pattern defines. */
const SHAPE = /^[\s•*\-–]*([A-Za-z][A-Za-z0-9 -]{0,34}?)\s*(?:\(([A-Za-z0-9 -]{1,14})\))?\s*(?:[:=–—]|\s-\s)\s*(\S.*)$/;

/**
 * The stitch that a line defines, or null. A name of the stitch table whose words behind it are only its long name is
 * an entry of an abbreviation list, no definition.
 */
export function definitionOf(line: string, terms: Terms): SpecialStitch | null {
  const match = SHAPE.exec(line);
  if (!match) return null;
  const [, name, abbreviation, text] = match;
  const plain = name!.trim().toLowerCase().replace(/-/g, ' ');
  const isPlain = formsOf(terms).some(
    ([form, key]) =>
      form === plain && !['cluster', 'bobble', 'popcorn', 'puff', 'shell', 'vst', 'picot', 'spike'].includes(key),
  );
  if (isPlain || /^(r|rnd|round|row|rows|rounds|note|ch)\b/.test(plain)) return null;
  if (!/\d|\b(dc|sc|hdc|tr|htr|double|treble|single|yo|insert)\b/i.test(text!)) return null;
  return { name: name!.trim(), ...(abbreviation && { abbreviation: abbreviation.trim() }), text: text!.trim() };
}

/** `sc = single crochet`, `inc: 2 sc in same st`: an entry of a list of abbreviations, not a line of work. */
export function isAbbreviation(line: string, terms: Terms): boolean {
  const match = /^[\s•*\-–]*([A-Za-z][A-Za-z0-9 ./-]{0,18}?)\s*(?:=|:|–|—|\s-\s)\s*([A-Za-z].*)$/.exec(line);
  if (!match) return false;
  const left = match[1]!.trim().toLowerCase().replace(/[-.]/g, ' ');
  const forms = formsOf(terms);
  const isKnown =
    forms.some(([form]) => form === left) ||
    /^(mr|mc|rnd|rnds|st|sts|sp|sk|blo|flo|fo|yo|rep|rs|ws|beg|pm|sm|tog|r|rd|bl|fl)$/.test(left);
  return isKnown && !/^\d/.test(match[2]!) && !/\b(each|around|across|next \d)\b/i.test(match[2]!);
}

/** `Key: X = sc, V = inc`, `v - increase` in a list: letters of the pattern's own that stand for a stitch of the table. */
export function aliasesOf(line: string, terms: Terms, inList: boolean): SpecialStitch[] {
  const headed = /^\W*(?:key|abbreviations?|legend|symbols?)\s*[:=–-]\s*(.*)$/i.exec(line);
  if (!headed && !inList) return [];
  const forms = new Map(formsOf(terms));
  return (headed?.[1] ?? line).split(/[,;\t]| {2,}/).flatMap((entry) => {
    const match = /^[\s•*\-–]*([A-Za-z]{1,3})\s*[:=–-]\s*([A-Za-z][A-Za-z -]*?)[\s.]*$/.exec(entry);
    const [, letters = '', name = ''] = match ?? [];
    const meant = forms.get(name.toLowerCase().replace(/-/g, ' '));
    return meant !== undefined && !forms.has(letters.toLowerCase()) ? [{ name: letters, text: name }] : [];
  });
}
