import { type SpecialStitch } from '../count/input.ts';
import { type Terms } from '../span.ts';
import { formsOf, stitchOf } from '../stitches.ts';

/**
 * Written forms of the stitches that a pattern defines, with their keys: that of the stitch table for a letter that stands for
 * a stitch (`V = inc`) or another name of a cluster, bobble, popcorn or puff, else the pattern's own.
 */
export function ownForms(
  special: readonly SpecialStitch[],
  terms: Terms = 'US',
): readonly (readonly [string, string])[] {
  if (special.length === 0) return [];
  const known = new Map(formsOf(terms));
  return special.flatMap((stitch) => {
    const names = [stitch.name, stitch.abbreviation ?? ''].map(plain).filter((form) => /^[a-z ]+$/.test(form));
    const meant = known.get(plain(stitch.text));
    const bunch = names
      .map((name) => known.get(name))
      .find((key) => key !== undefined && stitchOf(key)?.family === 'bunch');
    const key = meant ?? bunch ?? keyOf(stitch);
    return names.flatMap((form) => [[form, key] as const, [`${form}s`, key] as const, [`${form} st`, key] as const]);
  });
}

const plain = (form: string): string => form.trim().toLowerCase().replace(/[-.]/g, ' ').replace(/\s+/g, ' ').trim();

export const keyOf = (stitch: SpecialStitch): string => (stitch.abbreviation ?? stitch.name).trim().toLowerCase();
