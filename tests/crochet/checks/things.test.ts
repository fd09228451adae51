import { describe, expect, test } from 'vitest';
import { checksOf, piece, saying, source } from './support.ts';

const BODY = ['R1: 6 sc in magic ring (6)', 'R2: inc x 6 (12)', 'R3: dec x 6 (6)'];
const of = (lines: readonly string[], more: Parameters<typeof source>[1] = {}) =>
  source([piece('Body', [...BODY, ...lines])], more);
const YARN = { kind: 'yarn', name: 'Cotton', details: { weight: 3 } } as const;
const HOOK = { kind: 'hook', name: 'Hook', details: { sizeMm: 3 } } as const;

describe('materials', () => {
  test.each([
    ['Set two 9 mm safety eyes between R2 and R3.', 'safety eyes'],
    ['Stuff firmly.', 'filling'],
    ['Thread the wire through.', 'wire'],
    ['Sew on the buttons.', 'buttons'],
    ['Close with a yarn needle.', 'yarn needle'],
    ['Embroider the mouth with embroidery floss.', 'embroidery thread'],
  ])('“%s” needs %s', (text, thing) => {
    const [check] = checksOf(of([text])).filter(({ kind }) => kind === 'material-missing');
    expect(check?.sentence).toBe(`names ${thing}, and the materials do not.`);
    expect(check?.mend?.changes).toMatchObject([{ op: 'add', row: 'material' }]);
  });

  test('the size that is named goes along', () => {
    const [check] = checksOf(of(['Set two 9 mm safety eyes between R2 and R3.'])).filter(
      ({ kind }) => kind === 'material-missing',
    );
    expect(check?.mend?.changes).toEqual([
      { op: 'add', row: 'material', fields: { kind: 'notion', name: 'Safety eyes', details: { sizeMm: 9 } } },
    ]);
  });

  test.each(['Do not stuff the ears.', 'Without buttons it lies flat.', 'Work the button band next.'])(
    '“%s” needs nothing',
    (text) => {
      expect(saying(of([text]), 'material-missing')).toEqual([]);
    },
  );

  test('what is listed and goes nowhere is told, tools apart', () => {
    const materials = [
      YARN,
      HOOK,
      { kind: 'notion', name: 'Safety eyes', details: {} },
      { kind: 'notion', name: 'Scissors, yarn needle', details: {} },
      { kind: 'filling', name: 'Toy filling', details: {} },
    ] as const;
    expect(saying(of([], { materials }), 'material-unused')).toEqual([
      'Safety eyes and Toy filling stand in the materials, and no line says where they go.',
    ]);
    expect(saying(of(['Put the eyes in, then stuff.'], { materials }), 'material-unused')).toEqual([]);
  });

  test('colours that no yarn has', () => {
    const lines = ['Change to colour B.', 'Change to grey for the rest.'];
    expect(saying(of(lines), 'colour-missing')).toEqual([
      'A step of Body, A step of Body name colours B and grey; no yarn in the materials is of them.',
    ]);
    const materials = [HOOK, YARN, { ...YARN, details: { weight: 3, colour: 'B, light gray' } }];
    expect(saying(of(lines, { materials }), 'colour-missing')).toEqual([]);
  });

  test('no hook, no yarn weight, no finished size', () => {
    const details = { introduction: '', gauge: 'firm', finishedSize: '', level: 'easy', uses: [] };
    expect(
      saying(
        of([], { materials: [{ ...YARN, details: {} }], details }),
        'hook-missing',
        'weight-missing',
        'size-missing',
      ),
    ).toEqual(['The materials name no hook.', 'Cotton: no yarn weight is given.', 'No finished size is given.']);
    expect(
      saying(of([], { materials: [HOOK, { ...YARN, name: 'DK cotton', details: {} }] }), 'weight-missing'),
    ).toEqual([]);
  });
});

describe('pieces made twice', () => {
  const mouse = (step: string) =>
    source([piece('Body', [...BODY, step]), piece('Ear', ['R1: 6 sc in magic ring (6)'], { make: 2 })]);

  test('that go nowhere', () => {
    expect(saying(mouse('Fasten off.'), 'never-attached')).toEqual([
      'Ear is made twice. Nothing says where the two go.',
    ]);
  });

  test.each(['Sew the ears on over R2.', 'Attach both ears.', 'Lay the ears together on the head.'])(
    '“%s” says where',
    (step) => {
      expect(saying(mouse(step), 'never-attached')).toEqual([]);
    },
  );

  test('worked into by another piece', () => {
    const legs = source([
      piece('Leg', ['R1: 6 sc in magic ring (6)'], { make: 2 }),
      piece('Body', ['R1: 6 sc on first leg, ch 3, 6 sc on second leg']),
    ]);
    expect(saying(legs, 'never-attached')).toEqual([]);
  });
});

describe('what goes inside', () => {
  test('comes before the piece is closed; the deed puts it there', () => {
    const late = of(['Pull the last round shut.', 'Stuff firmly.']);
    const [check] = checksOf(late).filter(({ kind }) => kind === 'inside-after-closing');
    expect(check?.sentence).toBe('comes after A step of Body closes the piece, and has to be done before.');
    expect(check?.mend?.changes).toEqual([
      { op: 'edit', row: 'line', id: 'Stuff firmly.', fields: { after: BODY[2] } },
    ]);
  });

  test.each([
    [['Stuff firmly.', 'Pull the last round shut.']],
    [['Pull the ring tight.', 'Stuff firmly.']],
    [['Close the hole.', 'Embroider two eyes.']],
  ])('%j is in order', (steps) => {
    expect(saying(of(steps), 'inside-after-closing')).toEqual([]);
  });
});

describe('cautions', () => {
  test('what the title says it is for brings its own', () => {
    const [check] = checksOf(of([], { title: 'Acorn pot holder' })).filter(({ kind }) => kind === 'caution-use');
    expect(check?.sentence).toBe('“pot holder” is made to be hot, and its usual caution is not on the sheet.');
    expect(check?.mend?.changes).toEqual([{ op: 'edit-pattern', fields: { details: { uses: ['hot'] } } }]);
  });

  test('reworded so that its hazard is no longer named', () => {
    const caution = (text: string) => of([], { cautions: [{ id: 'c', kind: 'small-parts', text }] });
    expect(saying(caution('Take care.'), 'caution-reworded')).toHaveLength(1);
    expect(saying(caution('Eyes can choke a child under three.'), 'caution-reworded')).toEqual([]);
    expect(
      saying(of([], { cautions: [{ id: null, kind: 'small-parts', text: 'Take care.' }] }), 'caution-reworded'),
    ).toEqual([]);
  });
});
