/** Words of the trade that a misspelling of five letters or more is held against, one letter away. */
export const TRADE: readonly string[] = (
  'stitch stitches single double treble triple half crochet chain chains increase increases decrease decreases round ' +
  'rounds repeat around across together magic circle front cluster clusters popcorn popcorns bobble bobbles picot ' +
  'picots shell shells space spaces corner corners between first until times center centre remaining skipped adjustable ' +
  'extended foundation invisible evenly spaced turning beginning previous'
).split(' ');

/** Ordinary words that stand one letter from a word of the trade. */
export const ORDINARY: ReadonlySet<string> = new Set(
  (
    'found bound sound wound mound pound hound grounds rounded snitch switch stitched shelf spell smell swell ' +
    'spade spare spice grace chair china charm frost fist enter entre cross crosses pilot pivot limes tiles tides ties ' +
    'singe tingle jingle mingle singer doubled corned bubble wobble gobble hobble repeated increased decreased being ' +
    'manic bluster stitching turnings crocheted trebled paces places place chained clutter skin chin inch cc mc'
  ).split(' '),
);

const KEYS = ['qwertyuiop', 'asdfghjkl', 'zxcvbnm'];

/** Letters beside a letter on the keyboard. */
function besides(letter: string): string[] {
  const row = KEYS.findIndex((keys) => keys.includes(letter));
  const column = KEYS[row]!.indexOf(letter);
  const above = KEYS[row - 1] ?? '';
  const below = KEYS[row + 1] ?? '';
  return [
    KEYS[row]![column - 1],
    KEYS[row]![column + 1],
    above[column],
    above[column + 1],
    below[column - 1],
    below[column],
  ].flatMap((key) => key ?? []);
}

/** Two letters beside each other swapped. */
function swaps(word: string): string[] {
  return Array.from(word.slice(1), (_, i) => word.slice(0, i) + word[i + 1]! + word[i]! + word.slice(i + 2));
}

/** Every way to slip on a short form: two letters swapped, or the key beside the right one. */
function slipsOf(word: string): string[] {
  const letters = Array.from(word);
  const keyed = letters.flatMap((letter, i) => besides(letter).map((key) => letters.with(i, key).join('')));
  return [...swaps(word), ...keyed];
}

const SHORT = ['sc', 'dc', 'hdc', 'inc', 'dec', 'slst'];

/** Slips on the commonest short forms; one that could be two of them is none. */
export const SHORT_TRADE: ReadonlyMap<string, string> = shortSlips();

function shortSlips(): ReadonlyMap<string, string> {
  const slips = new Map<string, string | null>();
  for (const word of SHORT) {
    for (const slip of new Set(slipsOf(word))) slips.set(slip, slips.has(slip) ? null : word);
  }
  for (const word of ['each', 'next', 'skip', 'turn', 'join', 'same', 'loop'])
    for (const slip of swaps(word)) slips.set(slip, word);
  // Ordinary words that a telephone puts in the place of `sk`, and what a scanner makes of `ch` and `rnd`.
  const others = { sky: 'sk', ask: 'sk', eh: 'ch', cb: 'ch', md: 'rnd', mds: 'rnds', stt: 'st' };
  for (const [slip, word] of Object.entries(others)) slips.set(slip, word);
  return new Map([...slips].flatMap(([slip, word]) => (word === null ? [] : [[slip, word] as const])));
}
