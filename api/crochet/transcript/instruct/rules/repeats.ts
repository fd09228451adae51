import { BARE } from '../event.ts';
import { type Rule, fills, nothing, number, st, stitch, tog, unit } from '../made.ts';
import { decName, manyTogether, repeated } from '../shapes.ts';

/** Repeats and ends, several drawn into one, increases. */
export const REPEAT_RULES: readonly Rule[] = [
  // repeats and ends
  { pattern: /t[&,]?N(?![tS])/y, make: (m) => ({ type: 'times', n: number(m) }) },
  { pattern: /NNt/y, make: (m) => ({ type: 'times', n: number(m, 1) }) },
  { pattern: /(?:R|E|A)*[&,p]?N[Fm]?t(?:R|A|o)*/y, make: repeated },
  { pattern: /(?:R|E|A)*[&,p]?(?<![=c])N[Fm]?o(?:IE)?(?=[.,|&=ARN]|$)(?:R|A|o)*/y, make: repeated },
  {
    pattern: /t(?:R|A)*/y,
    make: (m) => (Number(m[0]!.value) > 1 ? { type: 'times', n: Number(m[0]!.value) } : nothing),
  },
  // several drawn into one
  { pattern: /NSNT(?:IXN)?/y, make: manyTogether },
  { pattern: /SNT(?:[IA]?XN)?/y, make: (m) => unit(tog(stitch(m), number(m))) },
  { pattern: /NST/y, make: (m) => unit(tog(stitch(m), number(m))) },
  { pattern: /ST/y, make: (m) => unit(tog(stitch(m), 2)) },
  { pattern: /[XOLE]?N[GSo]?T/y, make: (m) => (number(m) > 1 && number(m) < 8 ? unit(tog(BARE, number(m))) : null) },
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
  // "seventeen pairs" says how often the two of them are worked
  {
    pattern: /NP(?=[.|]|$)/y,
    make: (m) => (m[1]!.text === 'pairs' && number(m) > 2 ? { type: 'times', n: number(m) } : null),
  },
  { pattern: /NP/y, make: (m) => unit(st(BARE, number(m), 2)) },
  { pattern: /PI?EN?[GZ]?A?/y, make: () => fills(st(BARE, 1, 2)) },
  { pattern: /IE[GZ]?,?P/y, make: () => fills(st(BARE, 1, 2)) },
  { pattern: /(?<![&,])PA/y, make: () => fills(st(BARE, 1, 2)) },
  { pattern: /PI[XOLM]?N?[GZ]?/y, make: () => unit(st(BARE, 1, 2)) },
  { pattern: /P/y, make: () => unit(st(BARE, 1, 2)) },
];
