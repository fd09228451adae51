import { describe, expect, test } from 'vitest';
import { broughtCautions, type CautionSource } from '#crochet';

const source = (over: Partial<CautionSource>): CautionSource => ({ materials: [], lines: [], uses: [], ...over });
const kindsOf = (...names: string[]) =>
  broughtCautions(source({ materials: names.map((name) => ({ name })) })).map(({ kind }) => kind);

describe('what a material brings', () => {
  test.each([
    ['Safety eyes, 9 mm', ['small-parts']],
    ['2 buttons, 12 mm', ['small-parts']],
    ['Small jingle bell', ['small-parts']],
    ['Plastic pellets', ['small-parts']],
    ['Floral wire, 30 cm', ['wire']],
    ['Pipe cleaner', ['wire']],
    ['Satin ribbon', ['cords']],
    ['Pompom maker', ['cords']],
    ['Hot glue', ['flame']],
    ['Cotton yarn for a trivet', ['heat']],
    ['Worsted yarn', []],
    ['Crochet hook, 3.5 mm', []],
    ['Toy stuffing', []],
    ['Stitch marker', []],
  ])('%s: %j', (name, kinds) => {
    expect(kindsOf(name)).toEqual(kinds);
  });

  test('stitches that are called after a thing are not the thing', () => {
    expect(kindsOf('Yarn for the bead stitch', 'Button band in moss green')).toEqual([]);
  });

  test('comes once, with everything that brings it', () => {
    expect(broughtCautions(source({ materials: [{ name: 'Safety eyes' }, { name: 'Two beads' }] }))).toMatchObject([
      { kind: 'small-parts', broughtBy: ['Safety eyes', 'Two beads'] },
    ]);
  });
});

test('the words of a step bring one too, by the line’s own name', () => {
  const lines = [
    { label: 'R15', text: 'Insert safety eyes between R14 and R15, 5 sts apart.' },
    { label: 'R16', text: '(sc, inc) ×6 (18)' },
  ];
  expect(broughtCautions(source({ lines }))).toMatchObject([{ kind: 'small-parts', broughtBy: ['R15'] }]);
});

test('what the piece is for brings its own', () => {
  const brought = broughtCautions(source({ uses: ['hot', 'carried', 'sleep', 'chewed', 'pet'] }));
  expect(brought.map(({ kind }) => kind)).toEqual(['heat', 'sleep', 'handles', 'pets', 'teething']);
});

test('no caution says that a piece is safe, or for which age it is', () => {
  const everything = broughtCautions(
    source({
      materials: [{ name: 'Safety eyes, wire, ribbon, hot glue, trivet' }],
      uses: ['hot', 'carried', 'sleep', 'chewed', 'pet'],
    }),
  );
  expect(everything).toHaveLength(9);
  for (const { text } of everything) expect(text).not.toMatch(/\bsafe\b|\bsuitable\b|\bage \d/i);
});
