import { type Check, finding, listed, many } from './check.ts';
import { worksIn } from './naming.ts';
import { refsOf, type Scan, type ScanLine, wordsOf } from './scan.ts';

/** Colours in plain words; those that are called after a thing (wheat, moss) count where the materials have them. */
const WORDS =
  'black|white|cream|ivory|beige|brown|tan|gr[ae]y|silver|red|crimson|scarlet|burgundy|pink|coral|orange|peach|yellow|gold|green|olive|mint|teal|turquoise|blue|navy|purple|lilac|lavender|violet';
/** "change to grey", "with colour B", "join the dark green yarn". */
const CHANGE = new RegExp(
  `\\b(?:change|switch|swap|changing|switching)(?: back)? to (?:the )?(?:(?:light|dark|pale) )?(${WORDS})\\b|\\b(?:with|in|join) (?:the )?(?:(?:light|dark|pale) )?(${WORDS})(?= yarn\\b|[,.;:]|$)`,
  'giu',
);
const LETTER = /\bcolou?r ([A-H])\b|\b(MC|CC\d?)\b/gu;

/** The colours a line names: letters in capitals, words in lower case. */
function coloursIn(one: ScanLine): string[] {
  const text = wordsOf(one);
  return [
    ...worksIn(one).flatMap(({ colour }) => (colour ? [colour] : [])),
    ...[...text.matchAll(LETTER)].map(([, letter, main]) => letter ?? main!),
    ...[...text.matchAll(CHANGE)].map(([, to, withIt]) => (to ?? withIt!).toLowerCase()),
  ];
}

/** Colours that lines name and no yarn of the materials has. One deed adds a yarn for each. */
export function checkColours(scan: Scan): Check[] {
  const yarns = scan.source.materials
    .filter(({ kind }) => kind === 'yarn')
    .map(({ name, details }) => `${name} ${details.colour ?? ''} ${details.amount ?? ''}`);
  const has = (colour: string) => {
    const word = new RegExp(
      `(?<![a-z])${colour.replace('gray', 'gr[ae]y').replace('grey', 'gr[ae]y')}(?![a-z])`,
      colour === colour.toUpperCase() ? 'u' : 'iu',
    );
    return yarns.some((text) => word.test(text));
  };
  const lines = new Map<string, ScanLine[]>();
  for (const one of scan.lines) {
    for (const colour of new Set(coloursIn(one))) {
      const known = lines.get(colour);
      if (known) known.push(one);
      else lines.set(colour, [one]);
    }
  }
  const missing = [...lines.keys()].filter((colour) => !has(colour));
  if (missing.length === 0) return [];
  const naming = new Set(missing.flatMap((colour) => lines.get(colour) ?? []));
  const at = scan.lines.filter((one) => naming.has(one));
  const what = `${many(missing.length, 'colour', 'colours')} ${listed(missing)}`;
  return [
    finding(
      'colour-missing',
      `${many(at.length, 'names', 'name')} ${what}; no yarn in the materials is of ${many(missing.length, 'it', 'them')}.`,
      {
        refs: refsOf(at),
        mend: {
          words: `Add ${what}`,
          done: `Yarn added: ${what}`,
          changes: missing.map((colour) => ({
            op: 'add',
            row: 'material',
            fields: { kind: 'yarn', name: 'Yarn', details: { colour } },
          })),
        },
      },
    ),
  ];
}
