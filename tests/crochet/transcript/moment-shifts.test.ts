import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { findShifts, shiftMoment, wordsOf, type Cue } from '#crochet';

const WORDS = 'round single then two increase and six times so loop yarn into the ring keep going'.split(' ');
/** One sentence of talk: a number that is said once, and words that are said all the time. */
const sentence = (n: number, pick: readonly number[]) =>
  [`Round ${n + 1}`, ...pick.map((i) => WORDS[i % WORDS.length]!), `makes ${n + 7}.`].join(' ');

interface Told {
  readonly text: string;
  readonly lengthMs: number;
}
const talk = fc
  .array(fc.tuple(fc.array(fc.nat(99), { minLength: 6, maxLength: 16 }), fc.integer({ min: 500, max: 6_000 })), {
    minLength: 30,
    maxLength: 80,
  })
  .map((rows) =>
    rows.map(([pick, silence], n): Told => {
      const text = sentence(n, pick);
      return { text, lengthMs: Math.round(text.length * 75) + silence };
    }),
  );

/** Captions one after the other, a silence after each. */
function cuesOf(told: readonly Told[], startMs = 0): Cue[] {
  let at = startMs;
  return told.map(({ text, lengthMs }) => {
    const cue = { startMs: at, endMs: at + Math.round(text.length * 75), text };
    at += lengthMs;
    return cue;
  });
}

/** Every so-many-th word heard as another. */
const mishear = (text: string, every: number) =>
  text
    .split(' ')
    .map((word, i) => ((i + text.length) % every === 0 ? `${word}x` : word))
    .join(' ');

describe('moments in a new cut', () => {
  test('of the same recording stay where they are', () => {
    fc.assert(
      fc.property(talk, (told) => {
        const words = wordsOf(cuesOf(told));
        const { kept, found } = findShifts(words, words);
        expect(found).toBe(1);
        expect(kept).toMatchObject([{ fromMs: 0, byMs: 0, isCutAfter: false }]);
        for (const { startMs } of words) expect(shiftMoment(kept, startMs)).toBe(startMs);
      }),
      { numRuns: 40 },
    );
  });

  test('land within a second of their words when parts are cut out and put in and words are mis-heard', () => {
    const edit = fc.record({
      headMs: fc.integer({ min: 0, max: 60_000 }),
      cutAt: fc.double({ min: 0.2, max: 0.4, noNaN: true }),
      cut: fc.integer({ min: 3, max: 8 }),
      putInMs: fc.integer({ min: 5_000, max: 40_000 }),
      every: fc.integer({ min: 15, max: 40 }),
    });
    fc.assert(
      fc.property(talk, edit, (told, { headMs, cutAt, cut, putInMs, every }) => {
        const first = Math.floor(told.length * cutAt);
        const putIn = Math.floor(told.length * 0.7);
        const before = cuesOf(told);
        // The new cut: it begins later, some sentences are gone, and there is a pause that was not there.
        const after: Cue[] = [];
        const shift = new Map<number, number>();
        let by = headMs;
        before.forEach((cue, n) => {
          if (n === first) by -= before[first + cut]!.startMs - cue.startMs;
          if (n === putIn) by += putInMs;
          if (n >= first && n < first + cut) return;
          shift.set(n, by);
          after.push({ startMs: cue.startMs + by, endMs: cue.endMs + by, text: mishear(cue.text, every) });
        });
        const { kept } = findShifts(wordsOf(before), wordsOf(after));
        before.forEach((cue, n) => {
          const to = shiftMoment(kept, cue.startMs);
          const real = shift.get(n);
          if (real !== undefined) expect(Math.abs((to ?? Infinity) - cue.startMs - real)).toBeLessThan(1_000);
          // The last words before the cut and the first after it may speak for a moment at its very edge.
          else if (n > first && n < first + cut - 1) expect(to).toBeNull();
        });
      }),
      { numRuns: 60 },
    );
  });

  test('of a recording that is another one altogether are found nowhere', () => {
    const other = cuesOf(
      Array.from({ length: 40 }, (_, n) => ({ text: `now fold ${n} seam edge pin press iron`, lengthMs: 5_000 })),
    );
    const mine = cuesOf(
      Array.from({ length: 40 }, (_, n) => ({ text: sentence(n, [n, n + 1, n + 2, 3, 4, 5]), lengthMs: 5_000 })),
    );
    const { kept, found } = findShifts(wordsOf(mine), wordsOf(other));
    expect(found).toBeLessThan(0.2);
    expect(mine.map(({ startMs }) => shiftMoment(kept, startMs)).filter((to) => to !== null)).toEqual([]);
    expect(findShifts([], wordsOf(mine))).toEqual({ kept: [], found: 0 });
  });
});
