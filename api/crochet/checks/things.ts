/** A thing that lines name and materials list. */
export interface Thing {
  /** As it is put into the materials. */
  readonly name: string;
  readonly kind: 'notion' | 'filling';
  readonly words: RegExp;
  /** Goes into the piece, so that a line says where; a tool only has to be at hand. */
  readonly isPart: boolean;
}

const part = (name: string, words: RegExp): Thing => ({ name, kind: 'notion', words, isPart: true });
const tool = (name: string, words: RegExp): Thing => ({ name, kind: 'notion', words, isPart: false });

/** Things of the trade beside yarn and hook. */
export const THINGS: readonly Thing[] = [
  part('Safety eyes', /\b(?:(?:safety|toy|plastic|glass|button|doll'?s?)[- ]eyes?|\d+ ?mm eyes?)\b/i),
  part('Safety nose', /\b(?:safety|toy|plastic)[- ]nos(?:e|es)\b/i),
  part('Buttons', /\bbuttons?\b(?![- ](?:band|eyes?|hole|loop))/i),
  part('Beads', /\bbeads?\b(?! (?:st|stitch))/i),
  part('Bell', /\bbells?\b(?! (?:st|stitch))/i),
  part('Rattle', /\brattles?\b/i),
  part('Magnet', /\bmagnets?\b/i),
  part('Wire', /\b(?:wires?|pipe ?cleaners?|chenille stems?)\b/i),
  part('Ribbon', /\bribbons?\b/i),
  part('Elastic', /\belastic\b/i),
  part('Zip', /\b(?:zips?|zippers?)\b/i),
  part('Felt', /\bfelt\b(?! (?:like|right|as|it|too))/i),
  part('Sequins', /\bsequins?\b/i),
  part('Pellets', /\bpellets?\b/i),
  part('Embroidery thread', /\b(?:embroidery (?:thread|floss|cotton)|floss)\b/i),
  {
    name: 'Filling',
    kind: 'filling',
    words: /\b(?:stuff(?:ed|ing)?|fib(?:re|er)[- ]?fill|(?:the|toy|polyester) filling|wadding)\b/i,
    isPart: true,
  },
  tool('Stitch marker', /\b(?:stitch )?markers?\b|\bpm\b/i),
  tool('Yarn needle', /\b(?:yarn|tapestry|darning|wool|sewing) needles?\b|\bneedle\b/i),
  tool('Glue', /\bglue[ds]?\b/i),
];

const NOT_DONE = /\b(?:not|n['’]t|never|without|no|un)[ -]?(?:\w+ )?$/i;

/** Whether words name a thing, and not only to say that there is none of it. */
export function names(text: string, words: RegExp): boolean {
  const found = words.exec(text);
  return found !== null && !NOT_DONE.test(text.slice(Math.max(0, found.index - 24), found.index));
}
