import { BARE } from '../event.ts';
import { number, type Made, type Rule, st, stitch, tog, unit } from '../made.ts';
import { type Token } from '../../tokens.ts';
import { type Unit } from '../../work/units.ts';

const ends = (one: Unit): Made => ({ type: 'ends', unit: one });

/** Several in one place at an end; "twelve on each side" is the length of a side. */
const isSeveral = (matched: readonly Token[]): boolean =>
  number(matched) > 1 && number(matched) < 6 && !matched.some((one) => one.text.includes('side'));

/** What is done at both ends of a row, and the ends named alone. */
export const END_RULES: readonly Rule[] = [
  { pattern: /(?:N?S)?NTe/y, make: (m) => ends(tog(stitch(m), number(m))) },
  { pattern: /SNTe/y, make: (m) => ends(tog(stitch(m), number(m))) },
  { pattern: /N?S?D,?e/y, make: (m) => ends(tog(stitch(m), 2)) },
  { pattern: /N?S?P,?e/y, make: (m) => ends(st(stitch(m), 1, 2)) },
  { pattern: /NS?,?e/y, make: (m) => (isSeveral(m) ? ends(st(stitch(m), 1, number(m))) : null) },
  { pattern: /we/y, make: (m) => (m[0]!.text.startsWith('doubl') ? ends(st(BARE, 1, 2)) : null) },
  { pattern: /e[,&=gw]{0,3}NS?(?![TtSC])/y, make: (m) => (isSeveral(m) ? ends(st(stitch(m), 1, number(m))) : null) },
  { pattern: /e[,&=gw]{0,3}P/y, make: () => ends(st(BARE, 1, 2)) },
  {
    pattern: /e[,&=gw]{0,3}(?:NT|D)/y,
    make: (m) => ends(tog(BARE, m.some((one) => one.kind === 'N') ? number(m) : 2)),
  },
  // "two in the first and two in the last"
  {
    pattern: /NS?IO[GZ]?,?&?NS?IL[GZ]?(?=,?&?NIE|,?&?S?IE)/y,
    make: (m) => (number(m) > 1 && number(m) === number(m, 1) ? ends(st(stitch(m), 1, number(m))) : null),
  },
  // "edge, two"
  { pattern: /d,?N(?=[.,|])/y, make: (m) => (isSeveral(m) ? unit(st(BARE, 1, number(m))) : null) },
  // "two together, eight, two together, on both sides"
  { pattern: /(?<=[,.])e/y, make: (m) => (m[0]!.text.includes('both') ? { type: 'times', n: 2 } : null) },
  { pattern: /d/y, make: () => ({ type: 'edge' }) },
];
