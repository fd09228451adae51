import { describe, expect, test } from 'vitest';
import { buildEdition, differenceOf, type EditionSource, type SourceLine } from '#crochet';
import { mouseSource, round } from '../../support/mouse-source.ts';

/** The mouse with one of its body's lines changed, or with lines put in or taken out. */
function changed(change: (lines: readonly SourceLine[]) => readonly SourceLine[], over: Partial<EditionSource> = {}) {
  const source = mouseSource(over);
  const [body, ...rest] = source.pieces;
  return buildEdition({ ...source, pieces: [{ ...body!, lines: change(body!.lines) }, ...rest] });
}

const edit = (shortId: string, fields: Partial<SourceLine>) => (lines: readonly SourceLine[]) =>
  lines.map((line) => (line.shortId === shortId ? { ...line, ...fields } : line));

const before = buildEdition(mouseSource());

describe('what changed between two editions', () => {
  test('is nothing between two that say the same', () => {
    expect(differenceOf(before, buildEdition(mouseSource()))).toEqual({ countsChanged: false, errata: [] });
  });

  test('is a correction where a total is another, with both as they are printed', () => {
    const after = changed(edit('mr7', { text: '(sc, inv dec) × 5, 3 sc (13)' }));
    expect(differenceOf(before, after)).toMatchObject({
      countsChanged: true,
      errata: [
        {
          shortId: 'mr7',
          place: 'Body, R7',
          weight: 'correction',
          was: '(sc, inv dec) × 6 (12)',
          now: '(sc, inv dec) × 5, 3 sc (13)',
        },
      ],
    });
  });

  test('is made clearer where only words changed', () => {
    const after = changed(edit('mr3', { text: '(1 sc, inc) × 6 (18)' }));
    expect(differenceOf(before, after)).toMatchObject({ countsChanged: false, errata: [{ weight: 'clearer' }] });
  });

  test('is of the look alone where only a moment moved', () => {
    const after = changed(edit('mr3', { mark: { recordingNumber: 1, startMs: 345_000, endMs: null } }));
    expect(differenceOf(before, after).errata).toEqual([
      { shortId: 'mr3', place: 'Body, R3', weight: 'look', was: '05:48', now: '05:45', why: '' },
    ]);
  });

  test('tells a line that came and one that went', () => {
    const after = changed((lines) => [
      ...lines.filter(({ shortId }) => shortId !== 'eyes'),
      round('R8', 'inv dec × 6 (6)', 800, { shortId: 'mr8' }),
    ]);
    const { countsChanged, errata } = differenceOf(before, after);
    expect(countsChanged).toBe(true);
    expect(errata.map(({ shortId, weight, now }) => [shortId, weight, now])).toEqual([
      ['mr8', 'added', 'inv dec × 6 (6)'],
      ['eyes', 'clearer', ''],
    ]);
  });

  test('follows a line by its short id wherever it was moved to, so moving alone is no erratum', () => {
    const after = changed((lines) => [lines[4]!, ...lines.slice(0, 4), lines[5]!]);
    expect(differenceOf(before, after).errata).toEqual([]);
  });

  test('tells what changed round the lines', () => {
    const source = mouseSource();
    const materials = [
      ...source.materials,
      { kind: 'filling' as const, name: 'Toy filling', details: { amount: '6 g' } },
    ];
    const after = buildEdition({
      ...source,
      materials,
      details: { ...source.details, care: 'Wash at 30.', level: null },
    });
    expect(differenceOf(before, after).errata.map(({ place, weight }) => [place, weight])).toEqual([
      ['Materials', 'clearer'],
      ['Level', 'clearer'],
      ['Care', 'clearer'],
    ]);
  });

  test('counts a piece made another number of times as a correction', () => {
    const source = mouseSource();
    const pieces = source.pieces.map((piece) => (piece.id === 'ear' ? { ...piece, make: 3 } : piece));
    expect(differenceOf(before, buildEdition({ ...source, pieces }))).toMatchObject({
      countsChanged: true,
      errata: [{ place: 'Ear, make', weight: 'correction', was: '2', now: '3' }],
    });
  });
});
