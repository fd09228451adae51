import { BARE } from '../event.ts';
import { type Rule, either, fills, isPlural, nothing, number, SPECIAL, st, stitch, tog, unit } from '../made.ts';
import { inTurn, partedByChain, unlikeInOne } from '../shapes.ts';

/** Shaping that is only spoken of, corners and what stands in one place, stretches up to a number or to the last few. */
export const CORNER_RULES: readonly Rule[] = [
  // shaping that is only spoken of
  { pattern: /[LbnE]P/y, make: (m) => (isPlural(m[1]) ? nothing : null) },
  { pattern: /n[PDS]/y, make: () => nothing },
  { pattern: /pNIN[p=]NIN/y, make: () => nothing },
  { pattern: /NC=S/y, make: (m) => unit({ type: 'chain', many: number(m) }) },
  { pattern: /CN=S/y, make: (m) => unit({ type: 'chain', many: number(m) }) },
  // so many between the shapings
  { pattern: /NS?bP/y, make: (m) => unit(st(stitch(m), number(m)), st(BARE, 1, 2)) },
  { pattern: /NS?bD/y, make: (m) => unit(st(stitch(m), number(m)), tog(BARE, 2)) },
  { pattern: /N[GS](?:I[wG]?)?[wo]{0,2}&?E[GZ]?gN?S/y, make: (m) => unit(st(stitch(m), number(m))) },
  // corners
  {
    pattern: /I[XLOM]*E?Z(?=,?N?S?[,&]*(?:C|NC))/y,
    make: (m) => (m.at(-1)!.value === 'corner' ? { type: 'corner' } : null),
  },
  { pattern: /ZI[XLOM]*Z/y, make: (m) => (m[0]!.value === 'corner' ? { type: 'corner' } : nothing) },
  // "that gap gets three trebles"
  {
    pattern: /=?X?Z[IwFG]{0,4},?=?gNS?(?![CtTb])/y,
    make: (m) => (m.some((one) => one.value === 'corner') ? null : unit(st(stitch(m), 1, number(m)))),
  },
  // "corner, side, corner, side": the whole of it over again
  { pattern: /=?Z,?(?:[ZFwG]|N[SG]?),?Z,?(?:[ZFwG]|N[SG]?)(?:,?Z,?(?:[ZFwG]|N[SG]?))*,?[RA]*/y, make: inTurn },
  // "after your corner" tells that it was worked
  {
    pattern: /[=p]X?Z/y,
    make: (m) => (m[0]!.text === 'after' && m.at(-1)!.value === 'corner' ? { type: 'corner' } : nothing),
  },
  { pattern: /ZC+/y, make: () => nothing },
  // "two in the corner with two chain between them"
  { pattern: /NS?w?(?:I[XLOME]*Z)?[,&]*(?:CN|NC|C)(?:b|pw)[aw]?o?(?:I[XLOME]*N?[ZG])?/y, make: partedByChain },
  // "three trebles to a gap, for five gaps"
  { pattern: /NS[pI=E]+Z,?=?NZ/y, make: (m) => unit(st(stitch(m), number(m, 1), number(m))) },
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
  // "until there is one stitch left"
  {
    pattern: /[RA]*p+=?N[GS]?w/y,
    make: (m) => (/^(?:left|remaining|over)$/.test(m.at(-1)!.text) && number(m) < 8 ? { type: 'around' } : null),
  },
  // up to a number, or to the last few
  {
    pattern: /R?w?C?p=NS?(?![tTo])/y,
    make: (m) => ({ type: 'unit', options: [[st(stitch(m), number(m))]], reaches: true }),
  },
  { pattern: /N?S[IE]*[GZ]?p+LN?[GZ]?(?!T)/y, make: (m) => fills(st(stitch(m), 1)) },
  { pattern: /A?p+LN?[GZ]?(?!T)/y, make: () => fills(st(BARE, 1)) },
  { pattern: /N?S[IwG]{0,3}IES/y, make: (m) => fills(st(stitch(m), 1, number(m))) },
  { pattern: /SIOCH?[,&]*IECA?/y, make: (m) => fills(st(stitch(m), 1)) },
];
