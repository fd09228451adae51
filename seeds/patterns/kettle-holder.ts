import type { LineSpec, PatternSpec } from '../spec.ts';

const NUMBERS = ['three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten'];

/** R3 to R10 of a six-sided disc: one stitch more between the increases each time. */
const growing: readonly LineSpec[] = NUMBERS.map((word, i) => ({
  kind: 'round',
  from: i + 3,
  text: i === 0 ? '(sc, inc) ×6' : `(${i + 1} sc, inc) ×6`,
  total: 6 * (i + 3),
  heard: `Round ${word}.`,
}));

/** As it went out in edition 1, with what edition 2 puts right. */
export const KETTLE_HOLDER: PatternSpec = {
  id: '6b1f0a52-3c8e-4d0b-9a41-5f7c2e8d1a02',
  title: 'Kettle holder',
  recordings: [{ title: 'Hexagon and edge', transcript: 'kettle-holder.vtt', clip: 'kettle-holder.mp4' }],
  pieces: [
    {
      name: 'Hexagon',
      make: 2,
      worked: 'joined',
      lines: [
        { kind: 'round', from: 1, text: '6 sc in magic ring', total: 6, heard: 'Round one. Six' },
        { kind: 'round', from: 2, text: 'inc ×6', total: 12, heard: 'Round two.' },
        ...growing,
        {
          kind: 'step',
          text: 'Fasten off the first and weave in its ends. Leave the second on the hook.',
          heard: 'Fasten off the first',
        },
      ],
    },
    {
      name: 'Edge',
      make: 1,
      worked: 'joined',
      lines: [
        { kind: 'step', text: 'Lay both hexagons together.', heard: 'Now the edge.' },
        { kind: 'round', from: 1, text: '60 sc through both', total: 60, heard: 'Round one. One' },
        { kind: 'step', text: 'ch 10, sl st in the first sc, for a loop to hang it by.', heard: 'Chain twelve' },
        { kind: 'step', text: 'Fasten off, weave in the end, press it flat.', heard: 'Fasten off, weave in the end' },
      ],
    },
  ],
  details: {
    introduction: 'Two hexagons laid together: thick enough for a kettle, stiff enough to stand it on.',
    gauge: '14 sc and 16 rounds make 10 × 10 cm.',
    finishedSize: '17 cm from corner to corner, measured.',
    level: 'basic',
    care: 'Wash at 60 degrees if the yarn can take it. Press it damp.',
    madeBy: 'Ismay T.',
    checkedBy: 'Corin H.',
    permission: 'Make it for yourself, to give, or to sell what you made, and say whose pattern it is.',
    contact: 'Ismay T., ismay@ninepinloft.example',
    uses: ['hot'],
  },
  materials: [
    { kind: 'yarn', name: 'Worsted cotton or wool', details: { amount: '60 g', weight: 4, colour: 'slate' } },
    { kind: 'hook', name: 'Hook', details: { sizeMm: 4 } },
    { kind: 'notion', name: 'Yarn needle', details: {} },
  ],
  notes: ['Each round: ch 1 (not a stitch), sl st in the first sc to join.', 'Right side out on both.'],
};
