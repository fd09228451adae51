import { type Rule } from './made.ts';
import { CHAIN_RULES } from './rules/chains.ts';
import { CORNER_RULES } from './rules/corners.ts';
import { END_RULES } from './rules/ends.ts';
import { PLACE_RULES } from './rules/places.ts';
import { REPEAT_RULES } from './rules/repeats.ts';

/**
 * The grammar of a spoken instruction, over the letters of `lexicon/classes.ts`: the first rule that matches at a place
 * is taken. What it leaves alone is talk, except numbers, which may be stitches, repeats or totals.
 */
export const RULES: readonly Rule[] = [...END_RULES, ...CORNER_RULES, ...REPEAT_RULES, ...CHAIN_RULES, ...PLACE_RULES];
