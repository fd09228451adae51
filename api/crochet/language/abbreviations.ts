import { type PatternInput } from '../count/input.ts';
import { stitchOf } from '../stitches.ts';
import { type Item } from './tree.ts';
import { readLine } from './read-line.ts';
import { keyOf } from './special.ts';

export interface Abbreviation {
  readonly abbreviation: string;
  readonly name: string;
  readonly uk: { readonly abbreviation: string; readonly name: string };
}

/** Words of a place that are abbreviated and no stitches, in the order in which they are listed. */
const WORDS: readonly (readonly [key: string, abbreviation: string, name: string])[] = [
  ['back', 'BLO', 'back loops only'],
  ['front', 'FLO', 'front loops only'],
  ['st', 'st', 'stitch'],
];

/** The stitches, loops and places that the lines of a pattern use, with their names in both terms, in the order of the stitch table. */
export function abbreviationsUsed(input: PatternInput): Abbreviation[] {
  const keys = new Set<string>();
  for (const piece of input.pieces) {
    for (const line of piece.lines) {
      if (line.kind === 'note' || line.kind === 'step') continue;
      collect(readLine(line.text, { terms: input.terms, special: input.specialStitches ?? [] }).tree.items, keys);
    }
  }
  const own = new Map((input.specialStitches ?? []).map((stitch) => [keyOf(stitch), stitch]));
  const words = WORDS.filter(([key]) => keys.delete(key)).map(([, abbreviation, name]) => ({
    abbreviation,
    name,
    uk: { abbreviation, name },
  }));
  const stitches = [...keys].flatMap((key): Abbreviation[] => {
    const special = own.get(key);
    if (special)
      return [
        {
          abbreviation: special.abbreviation ?? special.name,
          name: special.name,
          uk: { abbreviation: special.abbreviation ?? special.name, name: special.name },
        },
      ];
    const row = stitchOf(key);
    return row ? [{ abbreviation: row.us[0], name: row.us[1], uk: { abbreviation: row.uk[0], name: row.uk[1] } }] : [];
  });
  return [...stitches, ...words];
}

function collect(items: readonly Item[], keys: Set<string>): void {
  for (const item of items) {
    if (item.type === 'work') keys.add(item.stitch);
    if ((item.type === 'work' || item.type === 'loops') && item.loops) keys.add(item.loops);
    if ((item.type === 'work' || item.type === 'group') && item.into?.what === 'st' && !item.into.stitch)
      keys.add('st');
    if (item.type === 'group') collect(item.items, keys);
  }
}
