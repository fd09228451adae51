import { describe, expect, test } from 'vitest';
import { examplesOf, faultsLetThrough, score } from './corpus.ts';
import { misheard } from './mishear.ts';

/** Reading whole sets takes its time on a machine that is busy otherwise. */
const WHOLE_SETS_MS = 90_000;

describe('of the spoken tutorials with known answers', () => {
  const figures = score(examplesOf('dev'));

  test('the reader finds the lines and the pieces', () => {
    expect(figures.foundShare).toBeGreaterThanOrEqual(98);
    expect(figures.spuriousShare).toBeLessThanOrEqual(1.5);
    expect(figures.pieceShare).toBeGreaterThanOrEqual(96);
  });

  test('it reads their work, their totals and how they come out', () => {
    expect(figures.workShare).toBeGreaterThanOrEqual(89);
    expect(figures.saidShare).toBeGreaterThanOrEqual(93);
    expect(figures.verdictShare).toBeGreaterThanOrEqual(89);
  });

  test('it finds what makers got wrong and blames hardly anybody else', () => {
    expect(figures.faultsFound).toBeGreaterThanOrEqual(17);
    expect(figures.falseAlarms).toBeLessThanOrEqual(3);
  });

  test('it finds what is done between the rounds', () => {
    expect(figures.stepsShare).toBeGreaterThanOrEqual(89);
    expect(figures.stepsSpuriousShare).toBeLessThanOrEqual(12);
  });
});

describe('of six voices it was not written with', () => {
  const figures = score(examplesOf('fresh'));

  test('the reader reads nearly everything', () => {
    expect(figures.foundShare).toBeGreaterThanOrEqual(96);
    expect(figures.workShare).toBeGreaterThanOrEqual(96);
    expect(figures.verdictShare).toBeGreaterThanOrEqual(96);
    expect(figures.faultsFound).toBe(2);
    expect(figures.falseAlarms).toBe(0);
  });
});

describe('of twelve more voices, written by somebody who does not know the reader', () => {
  const figures = score(examplesOf('wide'));

  test('every line is found, in its piece, and none that is not there', () => {
    expect(figures.foundShare).toBeGreaterThanOrEqual(98);
    expect(figures.spuriousShare).toBeLessThanOrEqual(2);
    expect(figures.pieceShare).toBeGreaterThanOrEqual(98);
  });

  test('most of the work and of the totals is read', () => {
    expect(figures.workShare).toBeGreaterThanOrEqual(84);
    expect(figures.saidShare).toBeGreaterThanOrEqual(93);
    expect(figures.stepsShare).toBeGreaterThanOrEqual(83);
    expect(figures.stepsSpuriousShare).toBeLessThanOrEqual(6);
  });
});

describe('of twelve voices kept apart until the reader had been written', () => {
  const figures = score(examplesOf('apart'));

  test('it is read no worse than when it was first met', () => {
    expect(figures.foundShare).toBeGreaterThanOrEqual(87);
    expect(figures.spuriousShare).toBeLessThanOrEqual(8);
    expect(figures.workShare).toBeGreaterThanOrEqual(58);
    expect(figures.verdictShare).toBeGreaterThanOrEqual(72);
  });
});

describe('of mistakes that a maker made', () => {
  test.each(['dev', 'fresh', 'wide'] as const)('none is said to come out right (%s)', (set) => {
    expect(faultsLetThrough(examplesOf(set))).toEqual([]);
  });
});

describe('of captions without a full stop or a comma', () => {
  const bare = (text: string) =>
    text
      .toLowerCase()
      .replace(/[.,;:!?…—–"“”()]/g, '')
      .replace(/ +/g, ' ');

  test.each([
    ['dev', 87],
    ['fresh', 94],
    ['wide', 92],
  ] as const)(
    'lines are still found (%s)',
    (set, floor) => {
      const examples = examplesOf(set).map((example) => ({
        ...example,
        cues: example.cues.map((cue) => ({ ...cue, text: bare(cue.text) })),
      }));
      expect(score(examples).foundShare).toBeGreaterThanOrEqual(floor);
    },
    WHOLE_SETS_MS,
  );
});

describe('of captions in which words were mis-heard', () => {
  test.each([
    ['dev', 95],
    ['fresh', 95],
    ['wide', 92],
  ] as const)(
    'lines are still found where three words in a hundred are wrong (%s)',
    (set, floor) => {
      const examples = examplesOf(set).map((example, n) => ({ ...example, cues: misheard(example.cues, 0.03, n) }));
      expect(score(examples).foundShare).toBeGreaterThanOrEqual(floor);
    },
    WHOLE_SETS_MS,
  );
});
