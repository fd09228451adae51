import { type Rule, isPlural, nothing, number, st, stitch, unit } from '../made.ts';

/** Chains and places passed over. */
export const CHAIN_RULES: readonly Rule[] = [
  // "if you count the chains"
  { pattern: /c[SwZE]{0,3}C+/y, make: () => nothing },
  // chains and places passed over
  { pattern: /K[^.,|]{0,3}C+[^.,|]{0,2}H/y, make: () => nothing },
  { pattern: /KOC+/y, make: () => nothing },
  { pattern: /K[OXL]?N?C+/y, make: (m) => unit({ type: 'skip', many: number(m) }) },
  // "one chain left over"
  { pattern: /NCw/y, make: (m) => (/^(?:left|leftover|remaining|remains)$/.test(m[2]!.text) ? nothing : null) },
  { pattern: /NCK/y, make: () => nothing },
  { pattern: /K[OL](?![GZNS])/y, make: () => nothing },
  { pattern: /K[XO]?N[GCZS]?/y, make: (m) => unit({ type: 'skip', many: number(m) }) },
  {
    pattern: /K[XO]?[GCZS]?/y,
    make: (m) => (m.some((one) => one.kind === 'C') ? nothing : unit({ type: 'skip', many: 1 })),
  },
  { pattern: /I[XLO]+C+H?,?&?g?NS(?![TtC])/y, make: (m) => unit(st(stitch(m), 1, number(m))) },
  { pattern: /IE[XOL]?N?C/y, make: () => nothing },
  { pattern: /(?:I|O|L|X|E|M)+C+H?/y, make: () => nothing },
  // "three chain two trebles" without its comma
  { pattern: /NC(?=NS)/y, make: (m) => unit({ type: 'chain', many: number(m) }) },
  { pattern: /C{1,2}N(?![StTDPG])/y, make: (m) => (isPlural(m[0]) ? null : unit({ type: 'chain', many: number(m) })) },
  { pattern: /C{1,2}N(?=S|G)/y, make: (m) => unit({ type: 'chain', many: number(m) }) },
  { pattern: /NC(?!N)/y, make: (m) => unit({ type: 'chain', many: number(m) }) },
  { pattern: /SC/y, make: (m) => (m[0]!.text === 'single' ? unit({ type: 'chain', many: 1 }) : null) },
];
