import { formsOf, nameOf, STITCHES } from '../stitches.ts';
import { type Terms } from '../span.ts';
import { type Check, type CheckChange, finding, listed, many } from './check.ts';
import { refsOf, type Scan, type ScanLine } from './scan.ts';

/** Words that only one side of the trade has, each with the stitch it names; "" is a word that is no stitch. */
const ONLY: Readonly<Record<Terms, ReadonlyMap<string, string>>> = { US: onlyIn('US'), UK: onlyIn('UK') };

function onlyIn(terms: Terms): Map<string, string> {
  const other = new Set(formsOf(terms === 'US' ? 'UK' : 'US').map(([form]) => form));
  const side = terms === 'US' ? 'us' : 'uk';
  const words = STITCHES.flatMap((row) => row[side].map((name) => [name.toLowerCase(), row.key] as const));
  const own = new Map(words.filter(([name]) => !other.has(name)));
  if (terms === 'UK') for (const word of ['yrh', 'yoh', 'wrh', 'miss']) own.set(word, '');
  return own;
}

const WORDS: Readonly<Record<Terms, RegExp>> = { US: anyOf('US'), UK: anyOf('UK') };

function anyOf(terms: Terms): RegExp {
  const words = [...ONLY[terms].keys()].sort((a, b) => b.length - a.length);
  return new RegExp(`(?<![a-z])(?:${words.join('|')})(?![a-z])`, 'giu');
}

/** Names that both sides have for different stitches: beside them nobody can tell what a line means. */
const TWO_MEANINGS = /(?<![a-z])(?:s?dc|d?tr|trtr|double|treble|triple)(?![a-z])/iu;
const PLAIN: Readonly<Record<string, string>> = { miss: 'sk', yrh: 'yo', yoh: 'yo', wrh: 'yo' };

const foundIn = (text: string, terms: Terms) => [...text.matchAll(WORDS[terms])].map(([word]) => word.toLowerCase());

/** The line in the pattern's own terms, where each foreign word has one meaning alone. */
function translated({ line }: ScanLine, from: Terms, to: Terms): CheckChange | null {
  const rest = line.text.replace(WORDS[from], ' ');
  if (TWO_MEANINGS.test(rest)) return null;
  const text = line.text.replace(WORDS[from], (word) => {
    const key = ONLY[from].get(word.toLowerCase());
    return key ? nameOf(key, to) : (PLAIN[word.toLowerCase()] ?? word);
  });
  return { op: 'edit', row: 'line', id: line.id, fields: { text } };
}

/** Words of the other terms than the pattern's own. Where all speak the other terms, the pattern is theirs. */
export function checkTerms(scan: Scan): Check[] {
  const { terms } = scan.source;
  const other = terms === 'US' ? 'UK' : 'US';
  const foreign = scan.lines.filter(({ line }) => line.kind !== 'note' && foundIn(line.text, other).length > 0);
  if (foreign.length === 0) return [];
  const words = [...new Set(foreign.flatMap(({ line }) => foundIn(line.text, other)))];
  const isAllForeign = !scan.lines.some(({ line }) => foundIn(line.text, terms).length > 0);
  const changes = foreign.map((line) => translated(line, other, terms));
  const sentence = `${many(foreign.length, 'says', 'say')} ${listed(words)}, ${many(words.length, 'a word', 'words')} of ${other} terms; the pattern is in ${terms} terms.`;
  return [
    finding('terms-mixed', sentence, {
      refs: refsOf(foreign),
      mend: isAllForeign
        ? {
            words: `Read it in ${other} terms`,
            done: `The lines are read in ${other} terms`,
            changes: [{ op: 'edit-pattern', fields: { terms: other } }],
          }
        : changes.every((change) => change !== null)
          ? { words: `Write ${terms} terms`, done: `All lines are in ${terms} terms`, changes }
          : null,
    }),
  ];
}
