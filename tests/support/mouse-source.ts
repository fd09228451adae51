import type { EditionSource, SourceLine } from '#crochet';

let made = 0;

/** A round of the mouse with a moment at `at` seconds of the first recording. */
export function round(label: string, text: string, at: number | null, over: Partial<SourceLine> = {}): SourceLine {
  const [, from, to] = /(\d+)(?:–(\d+))?/.exec(label) ?? [];
  made += 1;
  return {
    id: `id-${made}`,
    shortId: `m${label.replace(/\W/g, '').toLowerCase()}`,
    kind: 'round',
    label,
    from: Number(from),
    to: Number(to ?? from),
    text,
    note: '',
    written: null,
    said: null,
    leftBecause: null,
    mark: at === null ? null : { recordingNumber: 1, startMs: at * 1000, endMs: null },
    ...over,
  };
}

export function step(text: string, shortId: string): SourceLine {
  return round('0', text, null, { kind: 'step', label: '', from: null, to: null, shortId });
}

/** The harvest mouse, short enough to be followed by hand: a body, two ears, a tail in rows. */
export function mouseSource(over: Partial<EditionSource> = {}): EditionSource {
  return {
    code: 'h9m2k7p4',
    title: 'Harvest mouse',
    edition: 1,
    publishedAt: '2026-03-21T10:00:00.000Z',
    studio: { name: 'Ninepin Loft', foot: '' },
    maker: 'Ismay T.',
    checker: 'Corin H.',
    terms: 'US',
    sizes: [],
    details: {
      introduction: 'A toy 7 cm from rump to nose, tail apart.',
      gauge: '10 sc and 9 rounds make 4.4 × 4.5 cm',
      finishedSize: 'Rump to nose 7 cm, measured.',
      level: 'easy',
      care: 'Wash by hand.',
      permission: 'Make it for yourself, to give, or to sell what you made.',
      contact: 'ismay@ninepinloft.example',
    },
    materials: [
      { kind: 'yarn', name: 'DK cotton', details: { colour: 'wheat', weight: 3, amount: '12 m' } },
      { kind: 'hook', name: 'Hook', details: { sizeMm: 2.5 } },
      { kind: 'notion', name: 'Safety eyes', details: { sizeMm: 6, amount: '2' } },
    ],
    specialStitches: [],
    notes: ['Right side out.'],
    cautions: [
      { kind: 'small-parts', text: 'Eyes, buttons and beads can come off and choke a small child.' },
      { kind: 'own', text: 'Sew ears and tail down twice.' },
    ],
    pieces: [
      {
        id: 'body',
        name: 'Body',
        make: 1,
        worked: 'spiral',
        lines: [
          round('R1', '6 sc in magic ring (6)', 134),
          round('R2', 'inc × 6 (12)', 245),
          round('R3', '(sc, inc) × 6 (18)', 348),
          round('R4–6', 'sc around (18 each)', 451),
          step('Set the two eyes between R5 and R6.', 'eyes'),
          round('R7', '(sc, inv dec) × 6 (12)', 766, { note: 'Inv dec: both front loops as one.' }),
        ],
      },
      {
        id: 'ear',
        name: 'Ear',
        make: 2,
        worked: 'spiral',
        lines: [
          round('R1', '6 sc in magic ring (6)', 1446, { shortId: 'ear1' }),
          round('R2', 'inc × 6 (12)', 1512, { shortId: 'ear2' }),
        ],
      },
      {
        id: 'tail',
        name: 'Tail',
        make: 1,
        worked: 'rows',
        lines: [
          round('Row 1', 'ch 25, sc in 2nd ch from hook and in each ch across (24)', 1660, {
            kind: 'row',
            shortId: 'tail1',
          }),
        ],
      },
    ],
    recordings: [
      { number: 1, title: 'Mouse', durationMs: 1_900_000, publicUrl: null, publicOffsetMs: 0, hasClip: true },
    ],
    captions: [{ recordingNumber: 1, startMs: 134_000, endMs: 137_000, text: 'Six single in a magic ring.' }],
    errata: [],
    ...over,
  };
}
