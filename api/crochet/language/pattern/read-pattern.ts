import { type Span, type Terms } from '../../span.ts';
import { type SpecialStitch } from '../../count/input.ts';
import { readLine } from '../read-line.ts';
import { ownForms } from '../special.ts';
import { entriesOf } from './cut.ts';
import { gather } from './gather.ts';
import { piecesOf } from './pieces.ts';
import { type PatternText } from './pattern-text.ts';
import { aliasesOf, definitionOf } from './special-lines.ts';
import { sectionOf } from './headings.ts';
import { termsOf } from './terms.ts';

/**
 * Tells a whole written pattern apart: pieces, lines, steps, materials and stitches of its own. Nothing is dropped:
 * what is no line of work is a note with its place in the text.
 *
 * @param terms as declared by the person; inferred, with the reason, where not given.
 */
export function readPattern(text: string, terms?: Terms): PatternText {
  const found = terms ? { terms, reason: `${terms} terms were chosen.` } : termsOf(text);
  const special = specialIn(text, found.terms);
  const own = ownForms(special, found.terms);
  const entries = entriesOf(text, found.terms, own);
  const sizes = sizesIn(text);
  const gathered = gather(text, entries, found.terms, special, sizes.length);
  return {
    terms: found.terms,
    termsReason: found.reason,
    title: gathered.title,
    sizes,
    pieces: piecesOf(text, gathered.parts, found.terms, special, sizes.length),
    materials: gathered.materials,
    notes: gathered.notes,
    specialStitches: special,
    base: null,
  };
}

/** No pattern defines more stitches of its own. */
const MOST_SPECIAL = 100;

/** Definitions of stitches, in their own section or before the first line. */
function specialIn(text: string, terms: Terms): (SpecialStitch & { readonly span: Span })[] {
  const special: (SpecialStitch & { readonly span: Span })[] = [];
  let section: ReturnType<typeof sectionOf> = null;
  let start = 0;
  for (const line of text.split('\n')) {
    const opened = sectionOf(line);
    if (opened) section = opened;
    const aliases = aliasesOf(line, terms, section !== null);
    if (aliases.length > 0 && special.length + aliases.length < MOST_SPECIAL) {
      const span = { start, end: start + line.trimEnd().length };
      special.push(...aliases.map((alias) => ({ ...alias, span })));
      start += line.length + 1;
      continue;
    }
    const isLine = /^\W*(r|rnd|rnds|round|rounds|row|rows)\W*\d/i.test(line);
    if (isLine) section = null;
    const inside = opened ? line.slice(line.indexOf(':') + 1) : line;
    const definition = isLine || (opened && !line.includes(':')) ? null : definitionOf(opened ? inside : line, terms);
    const isNamed =
      definition && (section === 'special' || section === 'abbreviations' || isDefining(definition, terms));
    if (isNamed && special.length < MOST_SPECIAL)
      special.push({ ...definition, span: { start, end: start + line.trimEnd().length } });
    start += line.length + 1;
  }
  return special;
}

/** Outside a section of its own a definition names a group stitch, or says `in one st`. */
function isDefining(definition: SpecialStitch, terms: Terms): boolean {
  const isGroup = /\b(shell|cluster|bobble|popcorn|puff|v-?st|fan|picot|cl|pc|bo|star|cross)\b/i.test(
    `${definition.name} ${definition.abbreviation ?? ''}`,
  );
  const read = readLine(definition.text, { terms });
  return (
    isGroup &&
    (read.tree.items.some((item) => item.type === 'work' || item.type === 'group') ||
      /yo|insert/i.test(definition.text))
  );
}

/** `Sizes: S (M, L)`, `To fit age 4 (6, 8)` give three. */
function sizesIn(text: string): string[] {
  const head = text.slice(0, 20_000);
  const match =
    /\bsizes?\b[^\n:]{0,20}:\s*([A-Za-z0-9/.\- ]+?)\s*[([]([^)\]\n]+)[)\]]/i.exec(head) ??
    /\bto fit\b[^\n\d([]{0,20}(\d[\d/.-]{0,6})\s*[([]([^)\]\n]+)[)\]]/i.exec(head);
  if (!match) return [];
  const others = match[2]!
    .split(/[,:;]/)
    .map((size) => size.trim())
    .filter(Boolean);
  const isSize = (word: string) =>
    /^(\d*x*[sml]{1,2}|xs|small|medium|large|x-?large|newborn|baby|child|toddler|adult|preemie|\d+(-\d+)?( ?(months?|m|yrs?|years?|mo|cm|in|"))?|[\d.]+)$/i.test(
      word,
    );
  return others.length > 0 && others.length < 12 && others.every(isSize) ? [match[1]!.trim(), ...others] : [];
}
