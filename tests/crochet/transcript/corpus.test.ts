import { describe, expect, test } from 'vitest';
import { examplesOf, score } from './corpus.ts';
import { misheard } from './mishear.ts';

describe('of the spoken tutorials with known answers', () => {
  const figures = score(examplesOf('dev'));

  test('the reader finds the lines and the pieces', () => {
    expect(figures.foundShare).toBeGreaterThanOrEqual(98);
    expect(figures.spuriousShare).toBeLessThanOrEqual(1.5);
    expect(figures.pieceShare).toBeGreaterThanOrEqual(96);
  });

  test('it reads their work, their totals and how they come out', () => {
    expect(figures.workShare).toBeGreaterThanOrEqual(86);
    expect(figures.saidShare).toBeGreaterThanOrEqual(93);
    expect(figures.verdictShare).toBeGreaterThanOrEqual(89);
  });

  test('it finds what makers got wrong and blames hardly anybody else', () => {
    expect(figures.faultsFound).toBeGreaterThanOrEqual(15);
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

describe('of captions in which words were mis-heard', () => {
  test('lines are still found where three words in a hundred are wrong', () => {
    const examples = examplesOf('fresh').map((example, n) => ({ ...example, cues: misheard(example.cues, 0.03, n) }));
    expect(score(examples).foundShare).toBeGreaterThanOrEqual(85);
  });
});
