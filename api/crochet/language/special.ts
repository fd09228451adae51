import { type SpecialStitch } from '../count/input.ts';

/** Written forms of the stitches that a pattern defines, with their keys (the abbreviation, else the name). */
export function ownForms(special: readonly SpecialStitch[]): readonly (readonly [string, string])[] {
  return special.flatMap((stitch) => {
    const key = keyOf(stitch);
    const forms = [stitch.name, stitch.abbreviation ?? '']
      .map((form) => form.trim().toLowerCase().replace(/[-.]/g, ' ').replace(/\s+/g, ' '))
      .filter((form) => /^[a-z ]+$/.test(form));
    return forms.flatMap((form) => [[form, key] as const, [`${form}s`, key] as const, [`${form} st`, key] as const]);
  });
}

export const keyOf = (stitch: SpecialStitch): string => (stitch.abbreviation ?? stitch.name).trim().toLowerCase();
