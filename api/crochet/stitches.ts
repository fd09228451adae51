import { type Terms } from './span.ts';

/**
 * One stitch of the trade. Keys are US abbreviations in lower case without spaces or points (`slst`, `fpdc`).
 * `uses` is how many places it is worked into, `makes` how many stitches it leaves, `height` its height in chains.
 */
export interface StitchRow {
  readonly key: string;
  readonly family:
    'chain' | 'slip' | 'plain' | 'post' | 'foundation' | 'increase' | 'decrease' | 'bunch' | 'group' | 'edge';
  readonly us: readonly [abbreviation: string, name: string];
  readonly uk: readonly [abbreviation: string, name: string];
  readonly uses: number;
  readonly makes: number;
  readonly height: number;
  readonly symbol: string;
  /** Other spellings and spoken forms in US, and in UK where they are not the same. */
  readonly forms?: string;
  readonly ukForms?: string;
}

/** Key, family, US, its name, UK, its name, makes, height in chains, symbol, other forms (US | UK). Nearly all use one place. */
const TABLE = `
ch | chain | ch | chain | ch | chain | 0 | 1 | oval | chs, chains, chain stitch, chain stitches, ch st, ch sts, chn | chs, chains, chain stitch, chain stitches, ch st, ch sts
slst | slip | sl st | slip stitch | ss | slip stitch | 1 | 0 | dot | slst, sl, slip, slip st, sl sts, slip stitches, slip sts, ss, sl stitch, slsts, s st, sl s, slip stich | sl st, slst, sl, slip, slip st, sl sts, slip stitches, slip sts, sl stitch
sc | plain | sc | single crochet | dc | double crochet | 1 | 1 | cross | s c, scs, single crochets, singles, single, sgl, s crochet, single crochet stitch, single crochet stitches, single crotchet, sc st, sc sts, single c, sbn, pb, fm | d c, dcs, double crochets, double crochet stitch, double crochet stitches, doubles, double, dc st, dc sts
hdc | plain | hdc | half double crochet | htr | half treble crochet | 1 | 2 | tee | h d c, half dc, half d c, half double, half doubles, half double crochets, s d c, sdc, short double, short double crochet, hdcs, half double crochet stitch, half double crochet stitches | h tr, half tr, half treble, half trebles, half treble crochets, htrs, h t r
dc | plain | dc | double crochet | tr | treble crochet | 1 | 3 | tee-1 | d c, dcs, double, doubles, double crochets, dbl, double crochet stitch, double crochet stitches, dc st, dc sts, dbl crochet | treble, trebles, treble crochets, trs, t r, tr st, tr sts
tr | plain | tr | treble crochet | dtr | double treble crochet | 1 | 4 | tee-2 | tr c, trc, treble, trebles, triple, triple crochet, treble crochets, triple crochets, trs, tc, t c, trb, tr cr, trebel, tr st, tr sts | double treble, double trebles, double treble crochets, d tr, dtrs
dtr | plain | dtr | double treble crochet | trtr | triple treble crochet | 1 | 5 | tee-3 | d tr, double treble, double trebles, dbl tr, dtrs, double triple crochet | tr tr, ttr, triple treble, triple trebles, triple treble crochets
trtr | plain | trtr | triple treble crochet | qtr | quadruple treble crochet | 1 | 6 | tee-4 | tr tr, ttr, triple treble, triple trebles | quad tr, quadruple treble, quadruple trebles, quadtr
esc | plain | esc | extended single crochet | edc | extended double crochet | 1 | 2 | cross-1 | ext sc, exsc, extended single, extended sc | ext dc, exdc, extended double, extended dc
ehdc | plain | ehdc | extended half double crochet | ehtr | extended half treble crochet | 1 | 3 | tee | ext hdc, exhdc, extended half double | ext htr, exhtr, extended half treble
edc | plain | edc | extended double crochet | etr | extended treble crochet | 1 | 4 | tee-1 | ext dc, exdc, extended double, extended dc | ext tr, extr, extended treble
etr | plain | etr | extended treble crochet | edtr | extended double treble crochet | 1 | 5 | tee-2 | ext tr, extr, extended treble | ext dtr, exdtr, extended double treble
fpsc | post | FPsc | front post single crochet | FPdc | front post double crochet | 1 | 1 | post-front | fp sc, scfp, fsc post, front post sc | fp dc, dcfp, rdcf, rdc f, raised double crochet front
fphdc | post | FPhdc | front post half double crochet | FPhtr | front post half treble crochet | 1 | 2 | post-front | fp hdc, hdcfp, front post hdc | fp htr, htrfp, rhtrf
fpdc | post | FPdc | front post double crochet | FPtr | front post treble crochet | 1 | 3 | post-front | fp dc, dcfp, dc fp, front post dc, front post double, f p d c, fpd | fp tr, trfp, rtrf, rtr f, raised treble front, raised treble crochet front, front raised treble, tr rf, rftr, fptrs
fptr | post | FPtr | front post treble crochet | FPdtr | front post double treble crochet | 1 | 4 | post-front | fp tr, trfp, front post tr, front post treble | fp dtr, rdtrf, raised double treble front
fpdtr | post | FPdtr | front post double treble crochet | FPtrtr | front post triple treble crochet | 1 | 5 | post-front | fp dtr, front post dtr, front post double treble | fp trtr
bpsc | post | BPsc | back post single crochet | BPdc | back post double crochet | 1 | 1 | post-back | bp sc, scbp, back post sc | bp dc, dcbp, rdcb, raised double crochet back
bphdc | post | BPhdc | back post half double crochet | BPhtr | back post half treble crochet | 1 | 2 | post-back | bp hdc, hdcbp, back post hdc | bp htr, htrbp, rhtrb
bpdc | post | BPdc | back post double crochet | BPtr | back post treble crochet | 1 | 3 | post-back | bp dc, dcbp, dc bp, back post dc, back post double, bpd | bp tr, trbp, rtrb, rtr b, raised treble back, raised treble crochet back, rbtr
bptr | post | BPtr | back post treble crochet | BPdtr | back post double treble crochet | 1 | 4 | post-back | bp tr, trbp, back post tr, back post treble | bp dtr, rdtrb
bpdtr | post | BPdtr | back post double treble crochet | BPtrtr | back post triple treble crochet | 1 | 5 | post-back | bp dtr, back post dtr | bp trtr
fsc | foundation | fsc | foundation single crochet | fdc | foundation double crochet | 1 | 1 | cross | foundation sc | foundation dc
fhdc | foundation | fhdc | foundation half double crochet | fhtr | foundation half treble crochet | 1 | 2 | tee | foundation hdc | foundation htr
fdc | foundation | fdc | foundation double crochet | ftr | foundation treble crochet | 1 | 3 | tee-1 | foundation dc | foundation tr
ftr | foundation | ftr | foundation treble crochet | fdtr | foundation double treble crochet | 1 | 4 | tee-2 | foundation tr | foundation dtr
inc | increase | inc | increase | inc | increase | 2 | 1 | inc | increases, incr, increasing, incs |
dec | decrease | dec | decrease | dec | decrease | 1 | 1 | dec | decreases, decr, decs, decreasing |
invdec | decrease | inv dec | invisible decrease | inv dec | invisible decrease | 1 | 1 | dec | invdec, inv decs, invisible decreases, invisible dec, inv decrease, idec, indec |
cluster | bunch | cl | cluster | cl | cluster | 1 | 3 | cluster | clusters, cls, clus, clust, clstr |
bobble | bunch | bo | bobble | bo | bobble | 1 | 3 | bobble | bobbles, bob, bobs, bobble st, bobble stitch, bobble stitches, bbl |
popcorn | bunch | pc | popcorn | pc | popcorn | 1 | 3 | popcorn | popcorns, pop, pcs, pop st, popcorn st, popcorn stitch, popcorn stitches, pc st |
puff | bunch | puff | puff stitch | puff | puff stitch | 1 | 2 | puff | puff st, puffs, puff stitches, puff sts, ps, pf, puf |
shell | group | sh | shell | sh | shell | 5 | 3 | shell | shells, shs, shell st, shell stitch, fan, fans, scallop, scallops |
vst | group | V-st | V-stitch | V-st | V-stitch | 2 | 3 | vee | v st, vst, v sts, v stitch, v stitches, vsts |
picot | edge | picot | picot | picot | picot | 0 | 1 | picot | picots, pic |
crab | edge | rev sc | reverse single crochet | rev dc | reverse double crochet | 1 | 1 | cross | crab st, crab stitch, crab stitches, rsc, reverse sc, rev single crochet | crab st, crab stitch, rdc, reverse dc
spike | plain | spike sc | spike single crochet | spike dc | spike double crochet | 1 | 1 | spike | spike, spike st, spike stitch, spikes, spike sts, spike stitches, spsc | spike, spike st, spike stitch, spikes
`;

/** The one table of stitches. Nothing else in the library knows a stitch by its name. */
export const STITCHES: readonly StitchRow[] = TABLE.trim()
  .split('\n')
  .map((line) => rowOf(line.split('|').map((cell) => cell.trim())));

function rowOf(cells: readonly string[]): StitchRow {
  const [
    key = '',
    family = '',
    us = '',
    usName = '',
    uk = '',
    ukName = '',
    makes = '',
    height = '',
    symbol = '',
    forms,
    ukForms,
  ] = cells;
  const usesNone = family === 'chain' || family === 'foundation' || key === 'picot';
  return {
    key,
    family: family as StitchRow['family'],
    us: [us, usName],
    uk: [uk, ukName],
    uses: key === 'dec' || key === 'invdec' ? 2 : usesNone ? 0 : 1,
    makes: Number(makes),
    height: Number(height),
    symbol,
    ...(forms && { forms }),
    ...(ukForms && { ukForms }),
  };
}

const BY_KEY = new Map(STITCHES.map((row) => [row.key, row]));

/** Stitches of several legs closed together over places: `sc2tog`, `dc3tog`. */
const TOGETHER = /^([a-z]+?)(\d+)tog$/;

/**
 * The row of a stitch, also of those made by rule (`sc3tog` uses three places and makes one).
 *
 * @returns undefined for a name that the table does not hold, as one that a pattern defines for itself.
 */
export function stitchOf(key: string): StitchRow | undefined {
  const known = BY_KEY.get(key);
  if (known) return known;
  const together = TOGETHER.exec(key);
  const base = together && BY_KEY.get(together[1]!);
  if (!together || !base) return undefined;
  const legs = Number(together[2]);
  const tog = (abbreviation: string, name: string): readonly [string, string] => [
    `${abbreviation}${legs}tog`,
    `${name} ${legs} together`,
  ];
  return {
    ...base,
    key,
    family: 'decrease',
    us: tog(...base.us),
    uk: tog(...base.uk),
    uses: legs,
    makes: 1,
    symbol: 'dec',
  };
}

/** How a stitch is printed: `nameOf('dc', 'UK')` is `tr`. A stitch that the table does not hold keeps its own name. */
export function nameOf(key: string, terms: Terms): string {
  const row = stitchOf(key);
  return row ? row[terms === 'US' ? 'us' : 'uk'][0] : key;
}

/** Every way of writing each stitch in these terms, in lower case, spaces between words. */
export function formsOf(terms: Terms): readonly (readonly [form: string, key: string])[] {
  return STITCHES.flatMap((row) => {
    const [abbreviation, name] = terms === 'US' ? row.us : row.uk;
    const others = (terms === 'UK' ? (row.ukForms ?? row.forms) : row.forms) ?? '';
    const all = [abbreviation, name, ...others.split(',')].map((form) => form.trim().toLowerCase().replace(/-/g, ' '));
    return all.filter(Boolean).map((form) => [form, row.key] as const);
  });
}
