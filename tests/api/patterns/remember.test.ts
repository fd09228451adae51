import { expect, test } from 'vitest';
import { remember } from '../../../api/features/patterns/remember.ts';

test('the same input is worked out once, another for itself, and the longest unused is forgotten first', () => {
  const worked: number[] = [];
  const double = remember(({ n }: { n: number }) => {
    worked.push(n);
    return n * 2;
  }, 2);
  expect([1, 1, 2, 1, 3, 1, 2].map((n) => double({ n }))).toEqual([2, 2, 4, 2, 6, 2, 4]);
  expect(worked).toEqual([1, 2, 3, 2]);
});
