import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { countPattern, repairsFor, type LineCount } from '#crochet';
import { countLines, inputFor } from './support.ts';

/** Rounds that use six groups of what the round before made, so that they can be put together at will. */
const grow = (n: number): string => (n === 0 ? 'inc × 6' : `(${String(n)} sc, inc) × 6`);
const shrink = (n: number): string => (n === 0 ? 'dec × 6' : `(${String(n)} sc, dec) × 6`);

/** A piece that grows, stands and shrinks by six, each total as it comes out. */
const piece = fc.array(fc.constantFrom('grow', 'even', 'shrink'), { minLength: 1, maxLength: 7 }).map((moves) => {
  let n = 12;
  const lines = moves.map((move) => {
    const each = n / 6;
    if (move === 'grow') {
      n += 6;
      return `${grow(each - 1)} (${String(n)})`;
    }
    if (move === 'shrink' && each > 1) {
      n -= 6;
      return `${shrink(each - 2)} (${String(n)})`;
    }
    return `sc in each st around (${String(n)})`;
  });
  return lines;
});

const bare = (lines: readonly LineCount[]) => lines.map((line) => ({ ...line, id: '' }));

describe('the worker, whatever the rounds are', () => {
  test('a range is its rounds one by one', () => {
    fc.assert(
      fc.property(fc.integer({ min: 6, max: 60 }), fc.integer({ min: 2, max: 9 }), (base, rounds) => {
        const text = `sc in each st around (${String(base)})`;
        const range = countLines([`R1-${String(rounds)}: ${text}`], { base })[0]!;
        const single = countLines(
          Array.from({ length: rounds }, () => text),
          { base },
        ).at(-1)!;
        expect([range.base, range.count, range.verdict, range.work]).toEqual([
          single.base,
          single.count,
          single.verdict,
          single.work,
        ]);
      }),
      { numRuns: 30 },
    );
  });

  test('a range that shapes is its rounds one by one', () => {
    fc.assert(
      fc.property(fc.integer({ min: 2, max: 8 }), fc.integer({ min: 2, max: 5 }), (each, rounds) => {
        const lines = Array.from({ length: rounds }, (_, i) => grow(each + i));
        const single = countLines(lines, { base: each * 6 + 6 });
        const range = countLines([`R1-${String(rounds)}: as set, 6 more each round`], { base: each * 6 + 6 })[0]!;
        expect(range.rounds?.map((round) => round.count)).toEqual(single.map((line) => line.count));
      }),
      { numRuns: 30 },
    );
  });

  test('counting on from an earlier result is counting afresh', () => {
    fc.assert(
      fc.property(
        piece,
        fc.nat(),
        fc.constantFrom('sc around', '(sc, inc) × 6 (18)', '12 sc', 'and so on'),
        (lines, at, other) => {
          const before = countPattern(inputFor(lines, { base: 12 }));
          const edited = inputFor(
            lines.map((text, i) => (i === at % lines.length ? other : text)),
            { base: 12 },
          );
          expect(bare(countPattern(edited, before).pieces[0]!.lines)).toEqual(
            bare(countPattern(edited).pieces[0]!.lines),
          );
          // And back again, by way of the edit.
          const back = inputFor(lines, { base: 12 });
          expect(countPattern(back, countPattern(edited, before))).toEqual(countPattern(back));
        },
      ),
      { numRuns: 30 },
    );
  });

  test('every stitch stands on a place, each place is used once in order, and the stitches are the count', () => {
    fc.assert(
      fc.property(piece, (lines) => {
        for (const line of countLines(lines, { base: 12 })) {
          expect(line.verdict).toBe('agrees');
          expect(line.walk.every((stitch) => stitch.on.length > 0)).toBe(true);
          const places = [...new Set(line.walk.flatMap((stitch) => stitch.on))];
          expect(places).toEqual(Array.from({ length: line.base! }, (_, i) => i));
          expect(line.walk.reduce((n, stitch) => n + stitch.makes, 0)).toBe(line.count);
        }
      }),
      { numRuns: 30 },
    );
  });

  test('a repair makes its line agree and the next one still fit', () => {
    fc.assert(
      fc.property(piece, fc.nat(), fc.constantFrom(-6, -2, -1, 1, 2), (lines, at, by) => {
        const index = at % lines.length;
        const wrong = lines.map((text, i) =>
          i === index
            ? text.replace(/\((\d+)\)$/u, (_, n: string) => `(${String(Math.max(1, Number(n) + by))})`)
            : text,
        );
        const input = inputFor(wrong, { base: 12 });
        const id = `line-${String(index)}`;
        const repairs = repairsFor(input, id);
        expect(repairs.length).toBeGreaterThan(0);
        expect(repairs.length).toBeLessThanOrEqual(3);
        for (const repair of repairs) {
          const again = countPattern({
            ...input,
            pieces: input.pieces.map((one) => ({
              ...one,
              lines: one.lines.map((line) => (line.id === repair.lineId ? { ...line, text: repair.text } : line)),
            })),
          }).pieces[0]!.lines;
          expect(again.find((line) => line.id === id)!.verdict).toBe('agrees');
          const next = again[index + 1];
          if (next) expect(next.verdict).not.toBe('does-not-fit');
        }
      }),
      { numRuns: 25 },
    );
  });

  test('nothing that is typed makes it throw', () => {
    const words = fc.constantFrom(
      ...'( ) [ ] * ; , . 6 2 999999999 sc inc dec ch sk dc in next st sp ring around rep from times to last turn BLO each every 3rd evenly leg first same'.split(
        ' ',
      ),
    );
    fc.assert(
      fc.property(fc.array(fc.array(words, { maxLength: 14 }), { minLength: 1, maxLength: 4 }), (lines) => {
        const counted = countLines(
          lines.map((line) => line.join(' ')),
          { base: 12 },
        );
        expect(counted.length).toBe(lines.length);
      }),
      { numRuns: 30 },
    );
  });
});

describe('figures that no line has', () => {
  test.each([
    ['90000 sc, 90000 sc', 'does-not-fit'],
    ['(((sc) × 99) × 99) × 99', 'does-not-fit'],
    ['sc in 99999th st', 'does-not-fit'],
    ['(sk 1) × 99999, sc', 'does-not-fit'],
  ])('%s is said not to fit', (text, verdict) => {
    expect(countLines([text], { base: 12 })[0]!.verdict).toBe(verdict);
  });

  test('a range that doubles two thousand times stops, and says so', () => {
    const line = countLines(['R1-2000: inc in each st around'], { base: 6 })[0]!;
    expect(line.verdict).toBe('does-not-fit');
    expect(line.message).toBe('There are more stitches here than a line can have.');
  });
});

describe('pieces worked into what was finished earlier', () => {
  const joined = (line: string) => {
    const input = inputFor(['12 sc in ring (12)', 'sc around (12)']);
    const [leg] = input.pieces;
    const body = inputFor([line]).pieces[0]!;
    return countPattern({
      ...input,
      pieces: [
        { ...leg!, name: 'Leg' },
        { ...body, id: 'body', name: 'Body' },
      ],
    }).pieces[1]!.lines[0]!;
  };

  test('legs are joined with a chain between them', () => {
    const line = joined(
      '12 sc around first leg, 3 sc along the chain, 12 sc around second leg, 3 sc along the chain (30)',
    );
    expect([line.base, line.uses, line.count, line.verdict]).toEqual([30, 30, 30, 'agrees']);
  });

  test('more stitches along a leg than it has do not fit', () => {
    expect(joined('14 sc around first leg, 12 sc around second leg (26)').verdict).toBe('does-not-fit');
  });

  test('a left and a right leg are two', () => {
    expect(joined('12 sc around left leg, 12 sc around other leg (24)').verdict).toBe('agrees');
  });
});
