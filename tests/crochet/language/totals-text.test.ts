import { describe, expect, test } from 'vitest';
import { readTotals } from '#crochet';

describe('a total typed into its field', () => {
  test.each([
    ['24', { sts: [24] }],
    ['(24)', { sts: [24] }],
    ['24 sts', { sts: [24] }],
    ['12 dc, 4 ch-2 sps', { dc: [12], 'ch-2 sp': [4] }],
    ['18 (20, 22)', { sts: [18, 20, 22] }],
    ['14 A, 4 B', { A: [14], B: [4] }],
    ['14A, 4B', { A: [14], B: [4] }],
    ['14 A', { A: [14] }],
  ])('%s is read', (text, totals) => {
    expect(readTotals(text)).toEqual(totals);
  });

  test.each(['2a', '24s', '2A', '(2a)', '14a, 4b', '24 or so, I think', '', 'many'])('%j is no count', (text) => {
    expect(readTotals(text)).toBeNull();
  });
});
