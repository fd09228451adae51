import { type Token } from '../tokens.ts';
import { type Unit } from '../work/units.ts';
import { BARE } from './event.ts';

/** What a pattern makes of the tokens that it matched. */
export type Made =
  | {
      readonly type: 'unit';
      readonly options: readonly (readonly Unit[])[];
      readonly fills?: boolean;
      readonly reaches?: boolean;
    }
  | { readonly type: 'times'; readonly n: number }
  | { readonly type: 'around' | 'oneplace' | 'corner' | 'here' | 'again' | 'plain' | 'correction' | 'nothing' };

interface Rule {
  readonly pattern: RegExp;
  readonly make: (matched: readonly Token[], letters: string) => Made | null;
}

const number = (tokens: readonly Token[], nth = 0): number =>
  Number(tokens.filter((token) => token.kind === 'N')[nth]?.value ?? 1);
const stitch = (tokens: readonly Token[], nth = 0): string =>
  String(tokens.filter((token) => token.kind === 'S')[nth]?.value ?? BARE);
const isPlural = (token: Token | undefined): boolean => token?.text.endsWith('s') ?? false;

const st = (name: string, times: number, inOne = 1): Unit => ({ type: 'stitch', stitch: name, inOne, times });
const tog = (name: string, many: number, times = 1): Unit => ({ type: 'together', stitch: name, many, times });
const unit = (...units: Unit[]): Made => ({ type: 'unit', options: [units] });
const either = (...options: Unit[][]): Made => ({ type: 'unit', options });
const fills = (...units: Unit[]): Made => ({ type: 'unit', options: [units], fills: true });
const nothing: Made = { type: 'nothing' };
const SPECIAL = new Set(['bobble', 'popcorn', 'puff', 'cluster', 'picot']);

/**
 * The grammar of a spoken instruction, over the letters of `lexicon/classes.ts`: the first rule that matches at a place
 * is taken. What it leaves alone is talk, except numbers, which may be stitches, repeats or totals.
 */
export const RULES: readonly Rule[] = [
  // shaping that is only spoken of
  { pattern: /[LbnE]P/y, make: (m) => (isPlural(m[1]) ? nothing : null) },
  { pattern: /n[PD]/y, make: () => nothing },
  { pattern: /pNIN[p=]NIN/y, make: () => nothing },
  { pattern: /NC=S/y, make: (m) => unit({ type: 'chain', many: number(m) }) },
  { pattern: /CN=S/y, make: (m) => unit({ type: 'chain', many: number(m) }) },
  // so many between the shapings
  { pattern: /NS?bP/y, make: (m) => unit(st(stitch(m), number(m)), st(BARE, 1, 2)) },
  { pattern: /NS?bD/y, make: (m) => unit(st(stitch(m), number(m)), tog(BARE, 2)) },
  { pattern: /N[GS]I?[wo]{0,2}&?E[GZ]?gN?S/y, make: (m) => unit(st(stitch(m), number(m))) },
  // corners
  { pattern: /N?S[,&]*(?:CN|NC)[,&]*E?N?S[,&]*E?o?I[XLOME]*N?[ZG]/y, make: aroundChain },
  { pattern: /IEZ(?=N?S[,&]*[CN])/y, make: (m) => (m.at(-1)!.value === 'corner' ? { type: 'corner' } : null) },
  { pattern: /ZI[XLOM]*Z/y, make: (m) => (m[0]!.value === 'corner' ? { type: 'corner' } : nothing) },
  { pattern: /[=p]X?Z/y, make: () => nothing },
  {
    pattern: /NZ/y,
    make: (m) =>
      m[1]!.value !== 'corner'
        ? nothing
        : m[1]!.first === m[0]!.last + 1 && number(m) > 1
          ? { type: 'times', n: number(m) }
          : null,
  },
  {
    pattern: /I[XLOM]*Z[,&]?NS(?![,&]*[CN])/y,
    make: (m) =>
      m.some((one) => one.value === 'corner')
        ? null
        : either([st(stitch(m), 1, number(m))], [st(stitch(m), number(m))]),
  },
  { pattern: /IS(?=[,.|&])/y, make: (m) => (SPECIAL.has(stitch(m)) ? nothing : null) },
  { pattern: /NIO(?=NNT|NST)/y, make: (m) => unit(st(BARE, 1, number(m))) },
  {
    pattern: /NS?b(?=[,.|&])/y,
    make: (m) => either([st(stitch(m), number(m)), st(BARE, 1, 2)], [st(stitch(m), number(m)), tog(BARE, 2)]),
  },
  // unlike stitches in one place
  { pattern: /N?S(?:[,&m]*N?S)+[,&]?(?:E?o?I[XLOM]*N?[GZC]|E?T)/y, make: unlikeInOne },
  { pattern: /NI?V/y, make: (m) => unit(st(BARE, number(m))) },
  { pattern: /V&N(?![StTP])/y, make: (m) => unit(st(BARE, number(m))) },
  // so many places, so many in each
  { pattern: /LN[GS],?N(?:E|A)/y, make: (m) => unit(st(BARE, number(m), number(m, 1))) },
  { pattern: /N[GS]gNE?/y, make: (m) => unit(st(BARE, number(m), number(m, 1))) },
  { pattern: /[XLO]*[GC][wI]{0,4}gN[SP]?(?![tT])/y, make: (m) => unit(st(stitch(m), 1, number(m))) },
  { pattern: /XN[GS]?(?![tTU])/y, make: (m) => unit(st(stitch(m), number(m))) },
  // up to a number, or to the last few
  {
    pattern: /R?w?C?p=NS?(?![tTo])/y,
    make: (m) => ({ type: 'unit', options: [[st(stitch(m), number(m))]], reaches: true }),
  },
  { pattern: /N?S[IE]*[GZ]?p+LN?[GZ]?(?!T)/y, make: (m) => fills(st(stitch(m), 1)) },
  { pattern: /A?p+LN?[GZ]?(?!T)/y, make: () => fills(st(BARE, 1)) },
  { pattern: /N?S[IwG]{0,3}IES/y, make: (m) => fills(st(stitch(m), 1, number(m))) },
  { pattern: /SIOCH?[,&]*IECA?/y, make: (m) => fills(st(stitch(m), 1)) },
  // repeats and ends
  { pattern: /t[&,]?N(?![tS])/y, make: (m) => ({ type: 'times', n: number(m) }) },
  { pattern: /NNt/y, make: (m) => ({ type: 'times', n: number(m, 1) }) },
  { pattern: /(?:R|E|A)*[&,p]?N[Fm]?t(?:R|A|o)*/y, make: repeated },
  { pattern: /(?:R|E|A)*[&,p]?(?<![=c])N[Fm]?o(?=[.,|&=ARN]|$)(?:R|A|o)*/y, make: repeated },
  {
    pattern: /t(?:R|A)*/y,
    make: (m) => (Number(m[0]!.value) > 1 ? { type: 'times', n: Number(m[0]!.value) } : nothing),
  },
  // several drawn into one
  { pattern: /NSNT(?:IXN)?/y, make: manyTogether },
  { pattern: /SNT(?:[IA]?XN)?/y, make: (m) => unit(tog(stitch(m), number(m))) },
  { pattern: /NST/y, make: (m) => unit(tog(stitch(m), number(m))) },
  { pattern: /ST/y, make: (m) => unit(tog(stitch(m), 2)) },
  { pattern: /[XOL]?N[GS]?T/y, make: (m) => (number(m) > 1 && number(m) < 8 ? unit(tog(BARE, number(m))) : null) },
  { pattern: /ND/y, make: (m) => unit(tog(decName(m), 2, number(m))) },
  { pattern: /SD(?![IE])/y, make: (m) => unit(tog(stitch(m), 2)) },
  { pattern: /DIE[XOL]?N/y, make: (m) => unit(tog(decName(m), 2, number(m))) },
  {
    pattern: /DIE?[GZ]?/y,
    make: (m) => (m.some((one) => one.kind === 'E') ? fills(tog(decName(m), 2)) : unit(tog(decName(m), 2))),
  },
  { pattern: /(?<![&,])DA/y, make: (m) => fills(tog(decName(m), 2)) },
  { pattern: /D/y, make: (m) => unit(tog(decName(m), 2)) },
  // increases
  { pattern: /PI?E[XOL]?N[GS]?/y, make: (m) => unit(st(BARE, number(m), 2)) },
  { pattern: /PI[XOL]N[GS]?/y, make: (m) => unit(st(BARE, number(m), 2)) },
  { pattern: /NP/y, make: (m) => unit(st(BARE, number(m), 2)) },
  { pattern: /PI?EN?[GZ]?A?/y, make: () => fills(st(BARE, 1, 2)) },
  { pattern: /IE[GZ]?,?P/y, make: () => fills(st(BARE, 1, 2)) },
  { pattern: /(?<![&,])PA/y, make: () => fills(st(BARE, 1, 2)) },
  { pattern: /PI[XOLM]?N?[GZ]?/y, make: () => unit(st(BARE, 1, 2)) },
  { pattern: /P/y, make: () => unit(st(BARE, 1, 2)) },
  // chains and places passed over
  { pattern: /K[^.,|]{0,3}C+[^.,|]{0,2}H/y, make: () => nothing },
  { pattern: /KOC+/y, make: () => nothing },
  { pattern: /K[OXL]?N?C+/y, make: (m) => unit({ type: 'skip', many: number(m) }) },
  { pattern: /NCK/y, make: () => nothing },
  { pattern: /K[OL](?![GZNS])/y, make: () => nothing },
  { pattern: /K[XO]?N[GCZS]?/y, make: (m) => unit({ type: 'skip', many: number(m) }) },
  {
    pattern: /K[XO]?[GCZS]?/y,
    make: (m) => (m.some((one) => one.kind === 'C') ? nothing : unit({ type: 'skip', many: 1 })),
  },
  { pattern: /I[XL]C+,?&?NS/y, make: (m) => unit(st(stitch(m), 1, number(m))) },
  { pattern: /IE[XOL]?N?C/y, make: () => nothing },
  { pattern: /(?:I|O|L|X|E|M)+C+H?/y, make: () => nothing },
  { pattern: /C{1,2}N(?![StTDPG])/y, make: (m) => (isPlural(m[0]) ? null : unit({ type: 'chain', many: number(m) })) },
  { pattern: /C{1,2}N(?=S|G)/y, make: (m) => unit({ type: 'chain', many: number(m) }) },
  { pattern: /NC(?!N)/y, make: (m) => unit({ type: 'chain', many: number(m) }) },
  { pattern: /SC/y, make: (m) => (m[0]!.text === 'single' ? unit({ type: 'chain', many: 1 }) : null) },
  // so many stitches, each in its own place
  { pattern: /S[IE]*[XLO]?N[GSZC]?(?![tTD])/y, make: counted },
  { pattern: /NSIE?[XLO]?N[GSZC]?(?![tTD])/y, make: eachInCounted },
  { pattern: /[IE]+[XLO]?N[GZ],?S/y, make: (m) => (number(m) > 1 ? unit(st(stitch(m), number(m))) : null) },
  { pattern: /SN(?=[EA])/y, make: (m) => unit(st(stitch(m), number(m))) },
  // in every place
  {
    pattern: /N?SE/y,
    make: (m) => (/^(?:ever|each)/.test(m.at(-1)!.text) ? fills(st(stitch(m), 1, number(m))) : null),
  },
  { pattern: /N?S[&,]?IB?E[GZSC]*A?/y, make: (m) => fills(st(stitch(m), 1, number(m))) },
  { pattern: /NI?E[GZC]*A?/y, make: (m) => (number(m) < 6 ? fills(st(BARE, 1, number(m))) : null) },
  { pattern: /IB?E[GZC]+[,]?N?S/y, make: (m) => fills(st(stitch(m), 1, number(m))) },
  { pattern: /IB?E[GZC]+[,]?N(?![GtT])/y, make: (m) => (number(m) < 6 ? fills(st(BARE, 1, number(m))) : null) },
  {
    pattern: /E[GZ]?g[NP]/y,
    make: (m) => (m.some((one) => one.kind === 'P') ? fills(st(BARE, 1, 2)) : fills(st(BARE, 1, number(m)))),
  },
  // several in one place
  { pattern: /NS[&,]?E?I[XLOM]*N?[GZ]?/y, make: inOne },
  { pattern: /NI[XLOM]*N?[GZ]?/y, make: inOne },
  {
    pattern: /I?[XLO]+[GC]?gN?[SP]?/y,
    make: (m) => either([st(stitch(m), 1, m.some((one) => one.kind === 'P') ? 2 : number(m))]),
  },
  { pattern: /N[GS]gN(?=[^tT])/y, make: (m) => unit(st(BARE, number(m), number(m, 1))) },
  { pattern: /I[XLOM]+[GZ]?,?&?NS/y, make: (m) => either([st(stitch(m), 1, number(m))], [st(stitch(m), number(m))]) },
  { pattern: /I[XLOM]+[GZ]?,?&?N(?=[,.|&])/y, make: (m) => either([st(BARE, 1, number(m))]) },
  { pattern: /I[XLOM]*Z/y, make: (m) => ({ type: m.at(-1)!.value === 'corner' ? 'corner' : 'here' }) },
  { pattern: /I[XLOM]*[GN][,&]/y, make: () => ({ type: 'here' }) },
  { pattern: /Z/y, make: (m) => (m[0]!.value === 'corner' ? { type: 'corner' } : nothing) },
  { pattern: /(?:E[,&]?)?o?I?(?:M|(?<=I)N)[GZC]/y, make: () => ({ type: 'oneplace' }) },
  // plain lists
  {
    pattern: /NS/y,
    // "eight, slip stitch": a total and a join, where nobody would say "eight slip stitch"
    make: (m) => (m[1]!.text === 'slip stitch' && number(m) > 1 ? null : unit(st(stitch(m), number(m)))),
  },
  { pattern: /S[&,]?(?:IB?[XLOM]*N?[GZ]?)/y, make: (m) => (m.length > 1 ? unit(st(stitch(m), 1)) : null) },
  {
    pattern: /E?[SF]+[&,]?E?A/y,
    make: (m) => (m.some((one) => one.kind === 'S') ? fills(st(stitch(m), 1)) : { type: 'plain' }),
  },
  { pattern: /ES/y, make: (m) => fills(st(stitch(m), 1)) },
  {
    pattern: /S/y,
    make: (m) => (isPlural(m[0]) && SPECIAL.has(stitch(m)) ? nothing : unit(st(stitch(m), 1))),
  },
  { pattern: /[RE]*A/y, make: () => ({ type: 'around' }) },
  { pattern: /F/y, make: () => ({ type: 'plain' }) },
  { pattern: /R/y, make: (m) => (m[0]!.value === 'again' ? { type: 'again' } : { type: 'around' }) },
  { pattern: /Y/y, make: () => ({ type: 'correction' }) },
  { pattern: /[IXLMEHGZ]+/y, make: () => nothing },
];

function decName(matched: readonly Token[]): string {
  const value = matched.find((token) => token.kind === 'D')?.value;
  return typeof value === 'string' ? value : BARE;
}

function repeated(matched: readonly Token[]): Made | null {
  const times = matched.find((token) => token.kind === 't');
  if (times !== undefined && Number(times.value) > 0) return null;
  const n = number(matched);
  return n > 0 ? { type: 'times', n } : null;
}

/** `single crochet in each of the next four`, `half double in seven stitches`; "in one" is a single place. */
function counted(matched: readonly Token[], letters: string): Made | null {
  if (!/[IE]/.test(letters)) return null;
  const each = matched.find((token) => token.kind === 'E');
  if (each !== undefined && !/[XLO]/.test(letters) && each.text.endsWith(' one')) return null;
  return unit(st(stitch(matched), number(matched)));
}

/** `one single crochet in each of the next four`; `three in one` has that many in one place. */
function eachInCounted(matched: readonly Token[], letters: string): Made {
  const inEach = number(matched);
  const places = number(matched, 1);
  if (places === 1) return unit(st(stitch(matched), 1, inEach));
  if (letters.includes('E') || inEach === 1) return unit(st(stitch(matched), places, inEach));
  return inEach === places
    ? unit(st(stitch(matched), places))
    : either([st(stitch(matched), places, inEach)], [st(stitch(matched), inEach)]);
}

/** `two in the next`, `two trebles in the same stitch`; where the place is plural, one in each. */
function inOne(matched: readonly Token[], letters: string): Made | null {
  const many = number(matched);
  const place = matched.at(-1)!;
  if (place.kind === 'I' || (place.kind === 'Z' && !/[XLOMN]/.test(letters.slice(2)) && isPlural(place))) return null;
  if (place.kind === 'G' && isPlural(place) && place.value !== 'loop') return unit(st(stitch(matched), many));
  if (many === 1) return unit(st(stitch(matched), 1));
  if (many > 12) return null;
  return either([st(stitch(matched), 1, many)]);
}

/** `a single and a double together`, `a half double, a double and a half double, all in the one stitch`. */
function unlikeInOne(matched: readonly Token[], letters: string): Made | null {
  if (!/M|EI|EoI|IN|T/.test(letters)) return null;
  // "a slip stitch, three half trebles in one stitch": the place is the last ones' alone
  if (/[,&]NS[,&]?IN/.test(letters)) return null;
  const parts: string[] = [];
  let many = 1;
  for (const token of matched) {
    if (token.kind === 'N') many = Number(token.value);
    if (token.kind !== 'S') continue;
    for (let n = 0; n < Math.min(many, 12); n++) parts.push(String(token.value));
    many = 1;
  }
  if (letters.endsWith('T') && parts.every((part) => part === parts[0])) return null;
  if (parts.every((part) => part === parts[0])) return unit(st(parts[0]!, 1, parts.length));
  return unit({ type: 'oneplace', parts, times: 1 });
}

/** `three double crochets, chain two, three double crochets in the corner space`. */
function aroundChain(matched: readonly Token[], letters: string): Made | null {
  const place = matched.at(-1)!;
  if (place.kind !== 'Z' && !/M|IN|E/.test(letters)) return null;
  const parts: string[] = [];
  let many = 1;
  matched.forEach((token, n) => {
    if (token.kind === 'N') many = Math.min(12, Number(token.value));
    const chained =
      matched[n + 1]?.kind === 'N' && matched[n - 1]?.kind !== 'N' ? Math.min(12, Number(matched[n + 1]!.value)) : many;
    if (token.kind === 'C') parts.push(...new Array<string>(chained).fill('ch'));
    if (token.kind === 'S') parts.push(...new Array<string>(many).fill(String(token.value)));
    if (token.kind === 'C' || token.kind === 'S') many = 1;
    if (token.kind === 'N' && matched[n - 1]?.kind === 'C' && matched[n - 2]?.kind !== 'N') many = 1;
  });
  return unit({ type: 'oneplace', parts, times: 1 });
}

/** `six singles two together` is six decreases; `four singles, three together` are four stitches and a decrease. */
function manyTogether(matched: readonly Token[]): Made {
  const apart = [st(stitch(matched), number(matched)), tog(stitch(matched), number(matched, 1))];
  const joined = [tog(stitch(matched), number(matched, 1), number(matched))];
  return isPlural(matched[1]) ? either(apart, joined) : either(joined, apart);
}
