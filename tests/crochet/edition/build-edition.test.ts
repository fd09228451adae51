import { describe, expect, test } from 'vitest';
import { blocksOf, buildEdition, projectEdition } from '#crochet';
import { mouseSource, round } from '../../support/mouse-source.ts';

const linesOf = (source = mouseSource()) => buildEdition(source).pieces.flatMap((piece) => piece.lines);
const line = (shortId: string, source = mouseSource()) => linesOf(source).find((one) => one.shortId === shortId)!;

function withBody(lines: ReturnType<typeof round>[]) {
  const source = mouseSource();
  return { ...source, pieces: [{ ...source.pieces[0]!, lines }] };
}

describe('a pattern as it goes out', () => {
  test('prints instruction and total apart, in both terms', () => {
    const r3 = line('mr3');
    expect(r3.text).toEqual({ US: '(sc, inc) × 6', UK: '(dc, inc) × 6' });
    expect(r3.total).toEqual({ US: '18', UK: '18' });
    expect(r3.count).toBe(18);
    expect(r3.each).toBe(false);
  });

  test('says of a range that its total holds for each round', () => {
    const range = line('mr46');
    expect(range).toMatchObject({ label: 'R4–6', from: 4, to: 6, each: true, count: 18 });
    expect(range.total?.US).toBe('18');
  });

  test('offers the worked-out total where none is written', () => {
    const source = withBody([round('R1', '6 sc in magic ring', 1), round('R2', 'inc × 6', 2)]);
    expect(linesOf(source).map(({ total }) => total?.US)).toEqual(['6', '12']);
  });

  test('carries a walk of every stitch, and the repeat it is made of', () => {
    const r7 = line('mr7');
    expect(r7.walk.reduce((sum, stitch) => sum + stitch.makes, 0)).toBe(12);
    expect(r7.repeats).toEqual([{ stitches: 2, times: 6, makes: 2, rest: 0 }]);
  });

  test('names the likeliest slip for a difference of one', () => {
    const slips = line('mr7').slips;
    expect(slips.find(({ difference }) => difference === 1)?.text).toMatch(/decrease was worked as 2 stitches/);
    expect(slips.find(({ difference }) => difference === -1)?.text).toMatch(/before the marker/);
  });

  test('lists materials, abbreviations in both terms, and cautions with the sentence that defers', () => {
    const edition = buildEdition(mouseSource());
    expect(edition.materials.map(({ text }) => text)).toEqual([
      'DK cotton, wheat: weight 3, light; 12 m',
      'Hook 2.5 mm (old UK 12)',
      'Safety eyes 6 mm, 2',
    ]);
    const sc = edition.abbreviations.find(({ abbreviation }) => abbreviation.US === 'sc');
    expect(sc).toMatchObject({ abbreviation: { UK: 'dc' }, name: { US: 'single crochet', UK: 'double crochet' } });
    expect(edition.cautions.map(({ title }) => title)).toEqual(['Small parts', '']);
    expect(edition.deferral).toMatch(/not a safety certificate/);
  });

  test('is the same document each time', () => {
    const source = mouseSource();
    expect(buildEdition(source)).toEqual(buildEdition(source));
  });
});

describe('what holds an edition back', () => {
  test('is nothing where every line agrees', () => {
    expect(blocksOf(buildEdition(mouseSource()))).toEqual([]);
  });

  test('is each line that differs, does not fit, is not understood or is empty, by name', () => {
    const source = withBody([
      round('R1', '6 sc in magic ring (6)', 1),
      round('R2', 'inc × 6 (13)', 2),
      round('R3', '(3 sc, dec) × 6 (12)', 3),
      round('R4', '3 sc, frobnicate 4, 2 sc (9)', 4),
      round('R5', '', 5),
    ]);
    expect(blocksOf(buildEdition(source)).map(({ label, reason }) => [label, reason])).toEqual([
      ['R2', 'differs'],
      ['R3', 'does-not-fit'],
      ['R4', 'unread'],
      ['R5', 'empty'],
    ]);
  });

  test('is no longer a line that somebody left as it is and said why', () => {
    const source = withBody([
      round('R1', '6 sc in magic ring (6)', 1),
      round('R2', 'inc × 6 (13)', 2, { leftBecause: 'The clip says 13, and it is fixed in the next.' }),
    ]);
    expect(blocksOf(buildEdition(source))).toEqual([]);
  });
});

describe('what anybody with the link sees', () => {
  const secret = 'The clip says 13, and it is fixed in the next.';
  const document = buildEdition(
    withBody([
      round('R1', '6 sc in magic ring (6)', 1, { said: { sts: [6] } }),
      round('R2', 'inc × 6 (13)', 2, { leftBecause: secret }),
    ]),
  );

  test('holds the whole pattern and nothing of the studio', () => {
    const text = JSON.stringify(projectEdition(document));
    expect(text).not.toContain(secret);
    expect(text).not.toMatch(/"(studio|said|verdict|leftBecause|written|id)":(?!{"name"|"body")/);
    expect(projectEdition(document).pieces[0]?.lines.map(({ label }) => label)).toEqual(['R1', 'R2']);
  });

  test('while the stored document still knows', () => {
    expect(JSON.stringify(document)).toContain(secret);
  });
});
