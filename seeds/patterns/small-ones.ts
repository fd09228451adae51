import type { PatternSpec } from '../spec.ts';

const LITTLE = { level: 'basic', madeBy: 'Odile R.', contact: 'Odile R., odile@ninepinloft.example' } as const;

/** Typed by hand, without a recording; published for everybody to find. */
export const PLUM_PINCUSHION: PatternSpec = {
  id: '6b1f0a52-3c8e-4d0b-9a41-5f7c2e8d1a05',
  title: 'Plum pincushion',
  pieces: [
    {
      name: 'Plum',
      make: 1,
      worked: 'spiral',
      lines: [
        { kind: 'round', from: 1, text: '6 sc in magic ring', total: 6 },
        { kind: 'round', from: 2, text: 'inc ×6', total: 12 },
        { kind: 'round', from: 3, text: '(sc, inc) ×6', total: 18 },
        { kind: 'round', from: 4, text: '(2 sc, inc) ×6', total: 24 },
        { kind: 'round', from: 5, text: '(3 sc, inc) ×6', total: 30 },
        { kind: 'round', from: 6, to: 10, text: 'sc around', total: 30 },
        { kind: 'round', from: 11, text: '(3 sc, inv dec) ×6', total: 24 },
        { kind: 'round', from: 12, text: '(2 sc, inv dec) ×6', total: 18 },
        { kind: 'step', text: 'Stuff firmly, to the rim.' },
        { kind: 'round', from: 13, text: '(sc, inv dec) ×6', total: 12 },
        { kind: 'step', text: 'Top up the filling.' },
        { kind: 'round', from: 14, text: 'inv dec ×6', total: 6 },
        {
          kind: 'step',
          text: 'Fasten off, leaving a 30 cm end. Gather the last 6, pull shut, draw the end down through the middle twice, bury it.',
        },
      ],
    },
    {
      name: 'Leaf',
      make: 2,
      worked: 'rows',
      lines: [
        {
          kind: 'row',
          from: 1,
          text: 'ch 8, sl st in 2nd ch from hook, sc in next ch, 3 hdc, sc, sl st',
          total: 7,
        },
        { kind: 'step', text: 'Fasten off, sew both leaves on at the dimple.' },
      ],
    },
  ],
  details: { ...LITTLE, introduction: 'A plum to stick pins in.', finishedSize: '6 cm across, measured.' },
  materials: [
    { kind: 'yarn', name: 'DK wool, plum', details: { amount: '28 m', weight: 3 } },
    { kind: 'yarn', name: 'DK wool, leaf green', details: { amount: '3 m', weight: 3 } },
    { kind: 'hook', name: 'Hook', details: { sizeMm: 3 } },
    { kind: 'filling', name: 'Wool for filling', details: { amount: '20 g' } },
  ],
  notes: [],
};

/** At rest in the archive. */
export const CURTAIN_TIE: PatternSpec = {
  id: '6b1f0a52-3c8e-4d0b-9a41-5f7c2e8d1a06',
  title: 'Curtain tie',
  pieces: [
    {
      name: 'Tie',
      make: 2,
      worked: 'rows',
      lines: [
        { kind: 'foundation', text: 'ch 81' },
        { kind: 'row', from: 1, text: 'sc in 2nd ch from hook and in each ch across', total: 80 },
        { kind: 'row', from: 2, to: 5, text: 'ch 1, turn, sc across', total: 80 },
        { kind: 'step', text: 'Fasten off, sew a ring to each end.' },
      ],
    },
  ],
  details: LITTLE,
  materials: [{ kind: 'hook', name: 'Hook', details: { sizeMm: 3.5 } }],
  notes: [],
};

/** Begun and put into the bin. */
export const BOOKMARK_TRIAL: PatternSpec = {
  id: '6b1f0a52-3c8e-4d0b-9a41-5f7c2e8d1a07',
  title: 'Bookmark, a trial',
  pieces: [
    {
      name: 'Strip',
      make: 1,
      worked: 'rows',
      lines: [{ kind: 'row', from: 1, text: 'ch 31, sc in 2nd ch from hook and in each ch across', total: 30 }],
    },
  ],
  details: LITTLE,
  materials: [],
  notes: [],
};
