import type { PatternSpec } from '../spec.ts';

/** Worked round both sides of a chain; a transcript by clock times, and a film that stands elsewhere. */
export const OVAL_BASKET: PatternSpec = {
  id: '6b1f0a52-3c8e-4d0b-9a41-5f7c2e8d1a03',
  title: 'Oval basket',
  recordings: [
    {
      title: 'Base, wall and handles',
      transcript: 'oval-basket.txt',
      publicUrl: 'https://films.ninepinloft.example/oval-basket',
      publicOffsetMs: 12_000,
    },
  ],
  pieces: [
    {
      name: 'Basket',
      make: 1,
      worked: 'spiral',
      lines: [
        { kind: 'foundation', text: 'ch 9', heard: 'Chain nine' },
        {
          kind: 'round',
          from: 1,
          text: 'sc in 2nd ch from hook, sc in next 6 ch, 3 sc in last ch, on the other side sc in next 6 ch, 2 sc in last ch',
          total: 18,
          heard: 'Round one',
        },
        { kind: 'round', from: 2, text: 'inc, 6 sc, inc ×3, 6 sc, inc ×2', total: 24, heard: 'Round two' },
        {
          kind: 'round',
          from: 3,
          text: 'sc, inc, 6 sc, (sc, inc) ×3, 6 sc, (sc, inc) ×2',
          total: 30,
          heard: 'Round three',
        },
        {
          kind: 'round',
          from: 4,
          text: '2 sc, inc, 6 sc, (2 sc, inc) ×3, 6 sc, (2 sc, inc) ×2',
          total: 36,
          heard: 'Round four',
        },
        { kind: 'round', from: 5, text: 'BLO: sc around', total: 36, heard: 'Round five' },
        { kind: 'round', from: 6, to: 10, text: 'sc around', total: 36, heard: 'Rounds six to ten' },
        {
          kind: 'round',
          from: 11,
          text: '7 sc, ch 5, sk 4, 14 sc, ch 5, sk 4, 7 sc',
          total: 38,
          note: 'The two chains are the handles.',
          heard: 'Round eleven',
        },
        { kind: 'round', from: 12, text: 'sc in each st and ch around', total: 38, heard: 'Round twelve' },
        { kind: 'step', text: 'Fasten off, weave the end in along the rim.', heard: 'Fasten off' },
      ],
    },
  ],
  details: {
    introduction: 'A basket for pegs or eggs, with two handles worked in.',
    gauge: '12 sc and 14 rounds make 10 × 10 cm with two strands.',
    finishedSize: '16 × 11 cm, 8 cm high, measured.',
    level: 'easy',
    care: 'Wipe it with a damp cloth.',
    madeBy: 'Odile R.',
    permission: 'Make it for yourself, to give, or to sell what you made, and say whose pattern it is.',
    contact: 'Odile R., odile@ninepinloft.example',
    uses: ['carried'],
  },
  materials: [
    { kind: 'yarn', name: 'Worsted cotton, held double', details: { amount: '110 m', weight: 4, colour: 'rust' } },
    { kind: 'hook', name: 'Hook', details: { sizeMm: 5.5 } },
    { kind: 'notion', name: 'Stitch marker, yarn needle', details: {} },
  ],
  notes: ['Two strands held together throughout.'],
};
