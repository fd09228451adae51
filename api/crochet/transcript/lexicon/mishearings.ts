/**
 * What speech recognition makes of trade words, and what was said. Longer phrases stand for themselves; nothing here
 * changes a number. "to", "too" and "for" are told from two and four by what stands beside them, not by this table.
 */
const HEARD: Readonly<Record<string, readonly string[]>> = {
  crochet: [
    'crow shay',
    'crow shade',
    'crow shays',
    'croquet',
    'croche',
    'crotchet',
    'crochet s',
    'crotchets',
    'crush',
    'crosier',
    'croissant',
    'crochets',
    'crow che',
    'cro shay',
    'crocheted',
  ],
  'single crochet': [
    'single crow shay',
    'single croquet',
    'sink crochet',
    'sync crochet',
    'singer crochet',
    'sing a crochet',
    'signal crochet',
    'single crew',
    'sink crow shay',
    'single crew shade',
    'single crow',
  ],
  'half double': ['half devil', 'half dabble', 'half a double'],
  treble: ['trouble', 'trebel', 'tremble'],
  trebles: ['troubles', 'trebels', 'trembles'],
  'slip stitch': [
    'slip ditch',
    'slip switch',
    'slips ditch',
    'slipped stitch',
    'slip stitched',
    'slips stitch',
    'sleep stitch',
    'slit stitch',
  ],
  increase: ['in crease', 'ink crease', 'encrease', 'in grease', 'increased'],
  increases: ['in creases', 'ink creases', 'in greases'],
  decrease: ['de crease', 'deck rease', 'decreased', 'the crease', 'degrees', 'decrees'],
  decreases: ['de creases', 'the creases'],
  inc: ['ink'],
  dec: ['deck', 'deke'],
  'magic ring': [
    'magic rain',
    'magic wing',
    'magic circle',
    'magic rings',
    'adjustable ring',
    'sliding ring',
    'magic loop',
    'adjustable loop',
    'magic string',
    'majic ring',
  ],
  'yarn over': ['yawn over', 'yarnover', 'yarn overs', "you're an over", 'young over'],
  'chain one': ['change one', 'jane one'],
  chain: ['chained', 'chaining', 'chane'],
  picot: ['pico', 'pekoe', 'pecan'],
  picots: ['picos', 'peacocks'],
  puff: ['puff stitch', 'poof'],
  popcorn: ['popcorn stitch', 'pop corn'],
  bobble: ['bobble stitch', 'bauble stitch', 'bubble stitch'],
  cluster: ['cluster stitch'],
  stitch: ['stich', 'stiches'],
  together: ['to gether', 'two gether', 'togethers'],
};

/** Every mis-heard phrase with the trade word it stands for. */
export const MISHEARINGS: readonly { readonly heard: readonly string[]; readonly meant: readonly string[] }[] =
  Object.entries(HEARD).flatMap(([meant, heards]) =>
    heards.map((heard) => ({ heard: heard.split(' '), meant: meant.split(' ') })),
  );

/** Forms that are ordinary ways of saying the word and so are no sign of a recogniser at work. */
export const ORDINARY: ReadonlySet<string> = new Set([
  'crochets',
  'crocheted',
  'chained',
  'chaining',
  'magic circle',
  'adjustable ring',
  'sliding ring',
  'magic rings',
  'yarn overs',
  'puff stitch',
  'popcorn stitch',
  'bobble stitch',
  'cluster stitch',
  'slip stitched',
  'increased',
  'decreased',
  'magic loop',
  'adjustable loop',
  'yarnover',
]);

/** What recognisers make of "round" and "row"; each is a word of its own, so that what stands around it decides. */
export const UNIT_LIKES: ReadonlyMap<string, 'round' | 'row'> = new Map([
  ['brown', 'round'],
  ['around', 'round'],
  ['ground', 'round'],
  ['rounded', 'round'],
  ['roe', 'row'],
  ['rho', 'row'],
  ['roll', 'row'],
  ['road', 'row'],
]);
