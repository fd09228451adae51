import type { PatternSpec } from '../spec.ts';

/** Row work from a transcript alone, still drafting: one row has no total said, the fringe is not written yet. */
export const FLAT_SCARF: PatternSpec = {
  id: '6b1f0a52-3c8e-4d0b-9a41-5f7c2e8d1a04',
  title: 'Flat scarf',
  recordings: [{ title: 'Scarf, spoken notes', transcript: 'flat-scarf.srt' }],
  pieces: [
    {
      name: 'Scarf',
      make: 1,
      worked: 'rows',
      lines: [
        { kind: 'foundation', text: 'ch 25', heard: 'Chain twenty-five' },
        {
          kind: 'row',
          from: 1,
          text: 'sc in 2nd ch from hook and in each ch across',
          total: 24,
          heard: 'Row one',
        },
        { kind: 'row', from: 2, text: 'ch 1, turn, (sc, dc) ×12', total: 24, heard: 'Row two' },
        { kind: 'row', from: 3, text: 'ch 1, turn, (sc, dc) ×12', heard: 'Row three' },
        { kind: 'row', from: 4, to: 110, text: 'ch 1, turn, (sc, dc) ×12', total: 24, heard: 'Rows four to' },
        { kind: 'row', from: 111, text: 'ch 1, turn, sc across', total: 24, heard: 'Row one hundred and eleven' },
        { kind: 'step', text: 'Fasten off, weave in both ends.', heard: 'Fasten off' },
      ],
    },
  ],
  details: {
    introduction: 'A scarf with a pebbled face that is the same on both sides.',
    gauge: '16 sts and 13 rows make 10 × 10 cm.',
    finishedSize: '15 × 85 cm.',
    level: 'basic',
    madeBy: 'Ismay T.',
    contact: 'Ismay T., ismay@ninepinloft.example',
  },
  materials: [
    { kind: 'yarn', name: 'DK wool, moss green', details: { amount: '190 m', weight: 3 } },
    { kind: 'hook', name: 'Hook', details: { sizeMm: 4 } },
  ],
  notes: ['The chain at the start of a row is not a stitch.'],
};
