import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  countPattern,
  type LineTree,
  printLine,
  readLine,
  readPattern,
  repairsFor,
  translate,
  type Terms,
} from '#crochet';
import { countLines, inputFor } from '../count/support.ts';

const stitch = fc.constantFrom('sc', 'hdc', 'dc', 'tr', 'inc', 'dec', 'sc2tog', 'dc3tog', 'FPdc', 'BPtr');
const small = fc.integer({ min: 1, max: 9 });
const place = fc.constantFrom('next st', 'next ch-1 sp', 'same st', 'first st', 'last st', 'next dc', 'next corner sp');
const work = fc.oneof(
  stitch,
  fc.tuple(small, stitch).map(([n, key]) => `${String(n)} ${key}`),
  fc
    .tuple(fc.integer({ min: 2, max: 6 }), fc.constantFrom('sc', 'dc', 'tr'), place)
    .map(([n, key, into]) => `${String(n)} ${key} in ${into}`),
  fc
    .tuple(fc.constantFrom('sc', 'hdc', 'dc'), fc.integer({ min: 2, max: 9 }))
    .map(([key, n]) => `${key} in next ${String(n)} sts`),
  small.map((n) => `ch ${String(n)}`),
  small.map((n) => `sk ${String(n)}`),
);
const series = fc.array(work, { minLength: 1, maxLength: 5 }).map((items) => items.join(', '));
const group = fc.tuple(series, fc.integer({ min: 2, max: 12 })).map(([inside, n]) => `(${inside}) × ${String(n)}`);
const line = fc.oneof(
  series,
  group,
  fc.tuple(series, group).map(([before, inside]) => `${before}, ${inside}`),
  series.map((inside) => `*${inside}; rep from * around`),
  fc.constantFrom('sc', 'dc').map((key) => `${key} in each st around`),
  series.map((inside) => `(${inside}) in next ch-2 sp`),
);

/** A tree without its places in the text, which printing moves. */
const bare = (tree: LineTree): unknown =>
  JSON.parse(
    JSON.stringify(tree.items, (key, value: unknown) =>
      key === 'span' || key === 'text' || key === 'glued' ? undefined : value,
    ),
  );

describe('shorthand', () => {
  test.each<Terms>(['US', 'UK'])('printed in %s terms and read back is the same line', (terms) => {
    fc.assert(
      fc.property(line, (text) => {
        const { tree } = readLine(text);
        const printed = printLine(tree, { terms });
        expect(bare(readLine(printed, { terms }).tree)).toEqual(bare(tree));
      }),
      { numRuns: 150 },
    );
  });

  test('goes from US to UK and back unchanged', () => {
    fc.assert(
      fc.property(line, (text) => {
        expect(translate(translate(text, 'US', 'UK'), 'UK', 'US')).toBe(text);
      }),
      { numRuns: 150 },
    );
  });

  test('is counted the same in either terms', () => {
    fc.assert(
      fc.property(line, fc.integer({ min: 1, max: 60 }), (text, base) => {
        const us = countLines([text], { base })[0]!;
        const uk = countLines([translate(text, 'US', 'UK')], { base, terms: 'UK' })[0]!;
        expect([uk.base, uk.count, uk.verdict, uk.work]).toEqual([us.base, us.count, us.verdict, us.work]);
      }),
      { numRuns: 80 },
    );
  });

  test('never throws, whatever is typed', () => {
    const word = fc.constantFrom(
      'sc',
      'dc',
      'ch',
      '(',
      ')',
      '[',
      '*',
      '**',
      '6',
      '(18)',
      'rep from *',
      'in next',
      'each',
      'around',
      'R3:',
      'x',
      'sk',
      'to last',
      'same',
      '=',
      '-',
      '6 (8, 10)',
      'BLO',
      'as R2',
      'until',
      'inc',
      ',',
      '.',
    );
    const noise = fc.oneof(
      fc.string(),
      fc.array(word, { maxLength: 30 }).map((words) => words.join(' ')),
    );
    fc.assert(
      fc.property(noise, noise, (first, second) => {
        const read = readLine(first);
        for (const span of read.unread) expect(span.end).toBeLessThanOrEqual(first.length);
        countPattern(inputFor([first, second], { base: 12 }));
        readPattern(`${first}\n${second}`);
      }),
      { numRuns: 150 },
    );
  });

  test('noise around a line leaves its tree as it is', () => {
    fc.assert(
      fc.property(group, (text) => {
        const noisy = `  ${text.toUpperCase().replace('×', 'x').replace(/ /g, '\u00a0 ')}  `;
        expect(bare(readLine(noisy).tree)).toEqual(bare(readLine(text).tree));
      }),
    );
  });
});

describe('the count', () => {
  test('of a range is that of its rounds one by one', () => {
    const n = fc.integer({ min: 2, max: 6 });
    fc.assert(
      fc.property(
        fc.constantFrom('sc around', '(sc, inc) around', 'inc 3 evenly', 'dec 2 evenly', '(2 sc, dec) around'),
        n,
        (text, rounds) => {
          const range = countLines([`R1-${String(rounds)}: ${text}`], { base: 24 })[0]!;
          const each = countLines(
            Array.from({ length: rounds }, () => text),
            { base: 24 },
          );
          expect(range.count).toBe(each.at(-1)!.count);
          expect(range.base).toBe(each[0]!.base);
        },
      ),
    );
  });

  test('stands every stitch on a place of the line before', () => {
    fc.assert(
      fc.property(line, fc.integer({ min: 1, max: 40 }), (text, base) => {
        const counted = countLines([text], { base })[0]!;
        for (const made of counted.walk) for (const on of made.on) expect(on).toBeLessThan(base);
        const tops = counted.walk.reduce((sum, made) => sum + made.makes, 0);
        if (counted.count !== null && counted.base !== null) expect(tops).toBe(counted.count);
      }),
      { numRuns: 50 },
    );
  });

  test('agrees with every repair that is offered, of which there are three at most', () => {
    const wrong = fc
      .tuple(small, fc.integer({ min: 2, max: 9 }), fc.integer({ min: 6, max: 80 }))
      .map(([n, times, total]) => `(${String(n)} sc, inc) × ${String(times)} (${String(total)})`);
    fc.assert(
      fc.property(wrong, fc.integer({ min: 6, max: 60 }), (text, base) => {
        const input = inputFor([text, 'sc around'], { base });
        const repairs = repairsFor(input, 'line-0');
        expect(repairs.length).toBeLessThanOrEqual(3);
        for (const repair of repairs) {
          const mended = countLines([repair.text, 'sc around'], { base })[0]!;
          expect(mended.verdict).toBe('agrees');
          expect([mended.base, mended.count]).toEqual([repair.fits.base, repair.fits.count]);
        }
      }),
      { numRuns: 15 },
    );
  });

  test('of an edited pattern is the same whether or not the last count is at hand', () => {
    fc.assert(
      fc.property(fc.array(line, { minLength: 2, maxLength: 6 }), line, fc.nat(5), (lines, edit, at) => {
        const before = countPattern(inputFor(lines, { base: 24 }));
        const edited = inputFor(
          lines.map((text, i) => (i === at % lines.length ? edit : text)),
          { base: 24 },
        );
        expect(countPattern(edited, before)).toEqual(countPattern(edited));
      }),
      { numRuns: 50 },
    );
  });
});
