import { BARE } from '../event.ts';
import { type Rule, either, fills, isPlural, nothing, number, SPECIAL, st, stitch, unit } from '../made.ts';
import { counted, eachInCounted, inEachOfMany, inOne } from '../shapes.ts';

/** Stitches in so many places, in every place, in one; plain lists; what is left over. */
export const PLACE_RULES: readonly Rule[] = [
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
  // "one in each of the next three"
  { pattern: /NI?E[XLO]*N[GZSC]?(?![tTD])/y, make: inEachOfMany },
  { pattern: /NI?E[GZC]*A?/y, make: (m) => (number(m) < 6 ? fills(st(BARE, 1, number(m))) : null) },
  { pattern: /IB?E[GZC]+[,]?N?S/y, make: (m) => fills(st(stitch(m), 1, number(m))) },
  { pattern: /IB?E[GZC]+[,]?N(?![GtT])/y, make: (m) => (number(m) < 6 ? fills(st(BARE, 1, number(m))) : null) },
  {
    pattern: /E[GZ]?g[NP]/y,
    make: (m) => (m.some((one) => one.kind === 'P') ? fills(st(BARE, 1, 2)) : fills(st(BARE, 1, number(m)))),
  },
  // "in each one you put two"
  { pattern: /IE[GZ]?,?N(?=[.,|&])/y, make: (m) => (number(m) < 8 ? fills(st(BARE, 1, number(m))) : null) },
  // several in one place
  { pattern: /NSI[XLO]*C(?![NC])/y, make: (m) => unit(st(stitch(m), 1, number(m))) },
  { pattern: /NI[XLO]*C(?=[.,|&w])/y, make: (m) => unit(st(BARE, 1, number(m))) },
  // "slip stitch round to the beginning"
  {
    pattern: /N?SU?A/y,
    make: (m) =>
      m.some((one) => one.value === 'slst') && /\b(?:beginning|start|join|began|started)\b/.test(m.at(-1)!.text)
        ? nothing
        : null,
  },
  { pattern: /NS[&,]?E?I[XLOM]*N?[GZ]?/y, make: inOne },
  { pattern: /NI[XLOM]*N?[GZ]?/y, make: inOne },
  { pattern: /NI[XLOM]+(?=N)/y, make: (m) => (number(m) < 8 ? unit(st(BARE, 1, number(m))) : null) },
  {
    pattern: /I?[XLO]+[GC]?gN?[SP]?/y,
    make: (m) => either([st(stitch(m), 1, m.some((one) => one.kind === 'P') ? 2 : number(m))]),
  },
  { pattern: /N[GS]gN(?=[^tT])/y, make: (m) => unit(st(BARE, number(m), number(m, 1))) },
  { pattern: /I[XLOM]+[GZ]?,?&?NS/y, make: (m) => either([st(stitch(m), 1, number(m))], [st(stitch(m), number(m))]) },
  { pattern: /IX[LO]?N[GS]?(?=[,.|&])/y, make: (m) => (number(m) > 1 ? unit(st(stitch(m), number(m))) : null) },
  { pattern: /I[XLOM]+[GZ]?,?&?N(?=[,.|&])(?!,(?:NC|CN))/y, make: (m) => either([st(BARE, 1, number(m))]) },
  { pattern: /I[XLOM]*Z/y, make: (m) => ({ type: m.at(-1)!.value === 'corner' ? 'corner' : 'here' }) },
  { pattern: /I[XLOM]*[GN][,&]/y, make: () => ({ type: 'here' }) },
  { pattern: /Z/y, make: (m) => (m[0]!.value === 'corner' ? { type: 'corner' } : nothing) },
  { pattern: /(?:E[,&]?)?o?I?(?:M|(?<=I)N)[GZC]/y, make: () => ({ type: 'oneplace' }) },
  // "and two trebles go in there": into the place just named
  { pattern: /N?SI(?=[.,|&])/y, make: (m) => unit(st(stitch(m), number(m))) },
  // plain lists
  {
    pattern: /NS/y,
    // "eight, slip stitch": a total and a join, where nobody would say "eight slip stitch"
    make: (m) => (m[1]!.text === 'slip stitch' && number(m) > 1 ? null : unit(st(stitch(m), number(m)))),
  },
  { pattern: /S[&,]?(?:IB?[XLOM]*(?:N(?!T))?[GZ]?)/y, make: (m) => (m.length > 1 ? unit(st(stitch(m), 1)) : null) },
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
  // "chain five again": as it was the last time
  { pattern: /(?<=[SCNGPDTZ])R/y, make: (m) => (m[0]!.value === 'again' ? nothing : null) },
  { pattern: /R/y, make: (m) => (m[0]!.value === 'again' ? { type: 'again' } : { type: 'around' }) },
  { pattern: /Y/y, make: () => ({ type: 'correction' }) },
  { pattern: /[IXLMEHGZ]+/y, make: () => nothing },
];
