import { type Cue } from '#crochet';

/** Words of the trade and what recognisers have made of them. */
const CONFUSIONS: Readonly<Record<string, readonly string[]>> = {
  crochet: ['croquet', 'crow shay', 'crush'],
  crochets: ['croquets', 'crow shays'],
  two: ['to', 'too'],
  four: ['for'],
  eight: ['ate'],
  one: ['won'],
  stitch: ['stich'],
  slip: ['slit'],
  increase: ['in crease', 'ink crease'],
  decrease: ['degrees'],
  treble: ['trouble'],
  trebles: ['troubles'],
  chain: ['change'],
  turn: ['term'],
  together: ['to gether'],
  ring: ['rain'],
  round: ['brown', 'around'],
  row: ['roe', 'rho'],
  hook: ['hood'],
  single: ['sink', 'signal'],
  fifteen: ['fifty'],
  thirteen: ['thirty'],
};

/** Mis-hears a share of all words, the same ones for the same seed; a word without a known confusion loses a letter. */
export function misheard(cues: readonly Cue[], share: number, seed: number): readonly Cue[] {
  const random = generator(seed + 1);
  return cues.map((cue) => ({
    ...cue,
    text: cue.text
      .split(' ')
      .map((word) => (random() < share ? mishear(word, random) : word))
      .join(' '),
  }));
}

function mishear(word: string, random: () => number): string {
  const options = CONFUSIONS[word.toLowerCase().replace(/[^a-z]/g, '')];
  if (options !== undefined) return options[Math.floor(random() * options.length)]!;
  return word.length > 3 ? word.slice(0, -2) + word.slice(-1) : word;
}

/** A small linear congruential generator: tests need the same words each time. */
function generator(seed: number): () => number {
  let state = seed * 2_654_435_761;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
}
