import { type Terms } from '../span.ts';
import { formsOf } from '../stitches.ts';

/** What a word or several words mean: a stitch of the table, or a word of the grammar. */
export interface Meaning {
  readonly kind: 'stitch' | 'word';
  readonly value: string;
}

/** Words of the grammar, each with all its spellings. Longest match wins. */
const WORDS: Readonly<Record<string, string>> = {
  in: 'in, into, in to, inside, inside of, onto, under',
  on: 'on, upon, over',
  through: 'through, thru, thro',
  to: 'to, until, till, til, up to',
  of: 'of, from the',
  the: 'the, a, an, your, all the, its',
  each: 'each, every, ea, per, all, each of, every one of, each and every, eachof',
  allbut: 'all but, in all but, all but the, in all but the, each but, in each but, in each st but, in each st except',
  next: 'next, nxt, nex, following, foll, subsequent',
  same: 'same, the same, base of, at base of, at the base of',
  first: 'first, beginning, beg, 1st',
  last: 'last, final, lst',
  st: 'st, sts, stitch, stitches, stitich, stich, stiches, stitchs, stitche, stitces, sttiches, stst',
  sp: 'sp, sps, space, spaces, hole, holes, spc, spcs',
  loop: 'loop, loops, lp, lps, arch, arches',
  gap: 'gap, gaps, space between, spaces between, sp between, sps between, between',
  ring: 'ring, circle, magic ring, magic circle, magic loop, mr, mc, mgc, magic rng, adjustable ring, adjustable loop, sliding loop, slip ring, magical ring, magic, ml, m r',
  corner: 'corner, corners, cnr, corner sp, corner space, corner sps, corner spaces, corner loop',
  around:
    'around, arround, aroud, all around, all the way around, all the way round, all round, rnd around, around the whole round, entire round, around the circle, throughout, to complete round, to complete rnd',
  across: 'across, acros, along, all across, all along, all the way across, straight across',
  round: 'round, rounds, rnd, rnds, rd, rds, ronud, rond',
  row: 'row, rows, rwo, rw, rws',
  end: 'end, ends, beginning of round, end of round, end of row, end of rnd, end of the round, end of the row, end of the rnd',
  rep: 'rep, repeat, repeats, repeating, repeated, reps, rpt, repea, repeat pattern, replay',
  from: 'from, between',
  more: 'more, additional, extra, further',
  times: 'times, time, xs, tms',
  twice: 'twice, two times',
  once: 'once, one time',
  thrice: 'thrice',
  again: 'again',
  skip: 'sk, skip, skips, skipping, miss, missing, skp, ski, skipp, omit, pass over, missed',
  skipped: 'skipped, skipped sts, unworked, missed sts, sts left, remaining unworked',
  turn: 'turn, turning, trn, turn work, turn the work, turn your work, turn piece, t',
  join: 'join, joining, joined, close, connect, unite, jn, join rnd, join round',
  blo: 'blo, bl, blonly, back loop, back loops, back loop only, back loops only, bl only, blo only, back lp, back lps, back lp only, back lps only, back half, back part, back loop of, tbl, tblo, back stitch only',
  flo: 'flo, fl, front loop, front loops, front loop only, front loops only, fl only, front lp, front lps, front lp only, front lps only, front half, flonly, tfl',
  third: 'third loop, third loops, 3rd loop, third lp, back bump, third loop only, back bumps, back ridge',
  bothloops: 'both loops, both lps, bl and fl, under both loops',
  marker: 'marker, markers, stitch marker, mkr, pm, sm, marker st',
  marked: 'marked',
  centre: 'centre, center, middle, ctr, centr',
  and: 'and, &, plus, then, und',
  with: 'with, w, using',
  work: 'work, make, crochet, do, worked, working',
  evenly: 'evenly, evenly spaced, evenly around, evenly spaced around, evenly across',
  remain: 'remain, remaining, rem, left, are left, remains, rest, rest of',
  total:
    'total, totals, total of, in total, altogether, a total of, you will have, you should have, you have, there should be, makes, sts total',
  counts:
    'counts as, count as, counts, counted as, counting as, counts for, does count as, is counted as, stands for, acts as, takes the place of, count, serves as, considered',
  not: 'not, do not, does not, doesnt, dont, don t, doesn t, without, never, doesn, don',
  as: 'as, like',
  hook: 'hook, from hook, from the hook, from your hook, hk, from hk, from the hk',
  layers: 'both layers, both sides, both thicknesses, both pieces, both edges, two layers, layers',
  top: 'top, top of, head, head of, tops',
  side: 'side, sides, edge, edges, opposite side, other side',
  rowend:
    'row ends, row end, ends of rows, end of rows, end of each row, ends of each row, end of every row, side of each row, row edges, row sides',
  tog: 'tog, together, toge',
  other: 'other, alternate, alt, second other, oth',
  ch: 'chain space, chain spaces',
  sp2: 'ch sp, ch sps, ch space, ch spaces, chain sp, chain loop, ch loop, ch lp, ch lps, chain loops, ch loops, ch arch',
  turningchain:
    't ch, tch, turning chain, turning ch, t chain, beg ch, beginning ch, beginning chain, starting chain, starting ch, initial ch, initial chain, beg chain, start chain',
  even: 'even, straight, plain, as established, in pattern',
  group: 'group, groups, grp, grps, petal, petals, block, blocks, point, points',
  evenlytail: 'spaced',
};

/** A tree of words: each step is one word; a meaning stands where an entry ends. */
export interface Trie {
  readonly next: Map<string, Trie>;
  meaning: Meaning | null;
}

const emptyTrie = (): Trie => ({ next: new Map(), meaning: null });

function enter(trie: Trie, form: string, meaning: Meaning, replace: boolean): void {
  let node = trie;
  for (const word of form.split(' ')) {
    let next = node.next.get(word);
    if (!next) {
      next = emptyTrie();
      node.next.set(word, next);
    }
    node = next;
  }
  if (replace || !node.meaning) node.meaning = meaning;
}

function build(terms: Terms, own: readonly (readonly [string, string])[]): Trie {
  const trie = emptyTrie();
  for (const [value, forms] of Object.entries(WORDS)) {
    for (const form of forms.split(',')) enter(trie, form.trim(), { kind: 'word', value }, false);
  }
  for (const [form, value] of formsOf(terms)) enter(trie, form, { kind: 'stitch', value }, true);
  // A name that only the other side has is understood all the same; what is wrong with it is for the checks to say.
  for (const [form, value] of formsOf(terms === 'US' ? 'UK' : 'US'))
    enter(trie, form, { kind: 'stitch', value }, false);
  for (const [form, value] of own) enter(trie, form, { kind: 'stitch', value }, true);
  return trie;
}

const WORDS_OF = new WeakMap<Trie, ReadonlySet<string>>();

/** Every single word that stands somewhere in the lexicon. */
export function vocabularyOf(trie: Trie): ReadonlySet<string> {
  let words = WORDS_OF.get(trie);
  if (!words) {
    const found = new Set<string>();
    const walk = (node: Trie): void => {
      for (const [word, next] of node.next) {
        found.add(word);
        walk(next);
      }
    };
    walk(trie);
    words = found;
    WORDS_OF.set(trie, words);
  }
  return words;
}

/** Lexicons kept ready: those of the last patterns with stitches of their own. */
const READY = new Map<string, Trie>();
const MOST_KEPT = 8;

/**
 * The words known in these terms, with the stitches that a pattern defines for itself laid over them.
 *
 * @param own pairs of written form (small letters) and key.
 */
export function lexiconOf(terms: Terms, own: readonly (readonly [string, string])[] = []): Trie {
  const key = own.length === 0 ? terms : `${terms} ${JSON.stringify(own)}`;
  let ready = READY.get(key);
  if (!ready) {
    if (READY.size > MOST_KEPT) READY.clear();
    ready = build(terms, own);
    READY.set(key, ready);
  }
  return ready;
}
