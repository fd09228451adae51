/**
 * Which cautions a pattern must carry, from its materials, its words and what the piece is for. Nothing here says that
 * a piece is safe, for whom it is, or that it should be made otherwise: it only sees to it that the usual words stand.
 */
export type CautionKind =
  'small-parts' | 'flame' | 'wire' | 'cords' | 'heat' | 'sleep' | 'handles' | 'pets' | 'teething';

export interface CautionSource {
  readonly materials: readonly { readonly name: string }[];
  /** Steps, notes and instructions; `label` is how a reader finds the line. */
  readonly lines: readonly { readonly label: string; readonly text: string }[];
  readonly uses: readonly ('hot' | 'carried' | 'sleep' | 'chewed' | 'pet')[];
}

export interface BroughtCaution {
  readonly kind: CautionKind;
  /** The usual words, which a creator may put otherwise. */
  readonly text: string;
  /** What brings it, as a reader knows it: "Safety eyes 9 mm", "R15", "made to be hot". */
  readonly broughtBy: readonly string[];
}

const USUAL: Readonly<Record<CautionKind, string>> = {
  'small-parts':
    'Eyes, buttons and beads can come off and choke a small child: do not use them for a child under three. ' +
    'Embroidering the face takes away that one hazard, not all of them.',
  flame: 'A flame or hot glue is for adults alone, away from yarn and filling, and never used on the finished toy.',
  wire: 'Turn in both ends of the wire and wrap them. Wire does not belong in a toy for a child.',
  cords: 'Keep cords, ties, loops, ribbons and pompoms short, and leave them off anything a baby wears or sleeps with.',
  heat: 'For what touches heat use cotton or wool, worked double: acrylic melts.',
  sleep: 'Take hats and blankets off a sleeping baby.',
  handles: 'Handles carry weight: sew them on firmly, and look them over before each use.',
  pets: 'A pet may chew off and swallow parts: leave off what can come loose, and take the piece away once it is damaged.',
  teething:
    'What is made to be chewed comes loose in time: look it over before each use, and take it away once it is damaged.',
};

/** The usual words of a caution. */
export const usualCaution = (kind: CautionKind): string => USUAL[kind];

// Words of the trade as they stand in materials, steps and speech.
const WORDS: readonly (readonly [CautionKind, RegExp])[] = [
  [
    'small-parts',
    /\b(?:(?:safety|toy|plastic|glass|bead(?:ed)?|button|doll'?s?) ?-?(?:eyes?|nos(?:e|es))|\d+ ?mm eyes?|buttons?|beads?|beans?|pellets?|bells?|magnets?|batter(?:y|ies)|squeakers?|rattles?|jingles?|sequins?|rhinestones?)\b/i,
  ],
  [
    'flame',
    /\b(?:flames?|lighters?|candles?|hot[- ]?glue|glue guns?|singe[sd]?|melt(?:ed|s)? the ends?|burn(?:ed|s)? the ends?)\b/i,
  ],
  ['wire', /\b(?:wires?|wired|pipe ?cleaners?|chenille stems?)\b/i],
  [
    'cords',
    /\b(?:cords?|drawstrings?|i-?cords?|ribbons?|pom ?-?poms?|shoelaces?|straps?|hanging loops?|loops? to hang|elastics?)\b/i,
  ],
  ['heat', /\b(?:pot ?-?holders?|kettle ?-?holders?|oven ?-?(?:gloves?|mitts?)|trivets?|cos(?:y|ies)|hot ?pads?)\b/i],
];

const OF_USE: Readonly<Record<CautionSource['uses'][number], readonly [CautionKind, string]>> = {
  hot: ['heat', 'made to be hot'],
  carried: ['handles', 'made to be carried'],
  sleep: ['sleep', 'made to sleep near'],
  chewed: ['teething', 'made to be chewed'],
  pet: ['pets', 'made for a pet'],
};

/** "Pony bead" is a bead; a bead stitch, a cord stitch or a button band is not a thing put on. */
const NOT_A_THING = /\b(?:bead|button|cord|ribbon|loop) (?:stitch(?:es)?|sts?|bands?|rounds?|rows?)\b/gi;

const kindsIn = (text: string): CautionKind[] => {
  const things = text.replace(NOT_A_THING, ' ');
  return WORDS.filter(([, words]) => words.test(things)).map(([kind]) => kind);
};

/**
 * The cautions that materials, words and use bring, each once, in the order of their weight.
 * @example broughtCautions({ materials: [{ name: 'Safety eyes, 9 mm' }], lines: [], uses: [] }) // small-parts, brought by it
 */
export function broughtCautions(source: CautionSource): BroughtCaution[] {
  const found = new Map<CautionKind, string[]>();
  const add = (kind: CautionKind, by: string) => {
    const all = found.get(kind) ?? [];
    if (!all.includes(by)) found.set(kind, [...all, by]);
  };
  for (const { name } of source.materials) for (const kind of kindsIn(name)) add(kind, name);
  for (const { label, text } of source.lines) for (const kind of kindsIn(text)) add(kind, label);
  for (const use of source.uses) add(...OF_USE[use]);
  return (Object.keys(USUAL) as CautionKind[]).flatMap((kind) => {
    const broughtBy = found.get(kind);
    return broughtBy ? [{ kind, text: USUAL[kind], broughtBy }] : [];
  });
}
