import { type Class } from './classes.ts';

/** Words of the trade: stitches, places, loops, lines. Class, value, phrases. */
export const TRADE_WORDS: readonly (readonly [Class, string | number, string])[] = [
  [
    'S',
    'sc',
    `
    single crochet, single, singles, sc, scs, s c, single crochets, single stitch, single stitches`,
  ],
  [
    'S',
    'hdc',
    `
    half double crochet, half double, half doubles, hdc, hdcs, h d c, h t c, half double crochets, halfdouble,
    half double stitches`,
  ],
  ['S', 'dc', `double crochet, double, doubles, dc, dcs, d c, dee cee, deecee, double crochets`],
  ['S', 'htr', `half treble, half trebles, half treble crochet, htr, half triple`],
  ['S', 'tr', `treble, trebles, treble crochet, tr, trs, triple crochet, treble crochets, triple`],
  ['S', 'dtr', `double treble, double trebles, dtr, double treble crochet, double triple crochet`],
  ['S', 'slst', `slip stitch, slip stitches, slipstitch, slst, sl st, slip stitching, slips, ss`],
  ['S', 'bobble', `bobble, bobbles`],
  ['S', 'popcorn', `popcorn, popcorns`],
  ['S', 'puff', `puff, puffs`],
  ['S', 'cluster', `cluster, clusters`],
  ['S', 'picot', `picot, picots`],
  ['C', 0, `chain, chains, ch, chs, turning chain`],
  ['C', 1, `chain up, chains up`],
  [
    'K',
    0,
    `
    skip, skips, skipping, miss, missing, misses, pass over, jump over, hop over, leave out, passing
    over, ignore`,
  ],
  [
    'P',
    0,
    `increase, increases, inc, double it, double them, double those up, double up, double that, a pair, pairs, incs, increasing`,
  ],
  [
    'D',
    0,
    `
    decrease, decreases, dec, decs, invisible decrease, invisible decreases, inv dec, invdec, decreasing,
    invisibly decrease`,
  ],
  ['D', 'sc', `sc 2 tog, sc2tog, single crochet 2 together, single crochet decrease`],
  ['D', 'hdc', `hdc 2 tog, hdc2tog, half double decrease, half double crochet decrease`],
  ['D', 'dc', `dc 2 tog, dc2tog, double crochet decrease`],
  ['D', 'tr', `tr2tog, treble decrease`],
  ['T', 0, `together, tog, at once, as one, at a time`],
  [
    'G',
    'st',
    `
    stitch, stitches, st, sts, place, places, hole, foot, tip, bend, edge, edge stitch, end stitch, end chain, spot`,
  ],
  ['G', 'loop', `loop, loops`],
  [
    'Z',
    'sp',
    `
    arch, arches, space, spaces, sp, sps, chain space, chain spaces, chain 1 space, chain 2 space, chain 1 spaces, chain 2
    spaces, window, windows, chain sp, opening, mesh space`,
  ],
  [
    'Z',
    'corner',
    `
    centre, center, centre space, center space, middle space, corner, corners, corner space, corner spaces, corner hole, corner holes, corner stitch, corner stitches`,
  ],
  ['Z', 'gap', `gap, gaps`],
  [
    'H',
    0,
    `
    from the hook, from hook, from your hook, from my hook, from the needle, next to your hook, next to the
    hook, nearest the hook, hugging your hook`,
  ],
  [
    'F',
    0,
    `
    plain, straight, even, evenly, nothing added, nothing happens, no increases, no shaping, nothing, regular,
    work even, work straight, without shaping, no adding, just the same, with nothing in them, leave it alone,
    no increasing, no decreases, unchanged, ordinary, nothing cute, throughout, nothing fancy, nothing clever,
    normal, leave him be, leave it be, leave her be, walk, no change, nowt, naught, rest, flat`,
  ],
  [
    'B',
    'back',
    `
    back loop, back loops, back loop only, back loops only, back loop alone, blo, b l o, back half, rear loop,
    rear loops, back bump`,
  ],
  [
    'B',
    'front',
    `
    front loop, front loops, front loop only, front loops only, front loop alone, flo, f l o, near loop, near
    loops`,
  ],
  ['B', 'both', `both loops, both the loops, normal loops, regular loops, both loops again, both strands`],
  ['V', 0, `magic ring, ring, the ring, fresh ring, your ring`],
  [
    'E',
    0,
    `
    everything, everywhere, everything else, everything between, everything in between, all the others, all the other ones,
    all the rest, whatever is left, whatever 's left, what is left, the others`,
  ],
  ['X', 0, `far, opposite, furthest, farthest, outermost`],
  ['U', 'round', `round, rnd, lap, circuit, go round`],
  ['U', 'rounds', `rounds, rnds, laps`],
  ['U', 'row', `row`],
  ['U', 'rows', `rows`],
  ['#', 0, `number, no.`],
];
