import { expect, test } from 'vitest';
import { groupKnots, snapTo, worstFault } from '../../web/parts/thread/thread-knots.ts';

const knot = (id: string, startMs: number, verdict?: 'agrees' | 'differs' | 'unread') => ({
  id,
  startMs,
  label: id,
  name: `R${id}`,
  ...(verdict ? { verdict } : {}),
});

test('knots that would lie over each other share one, in order of time', () => {
  const groups = groupKnots([knot('2', 10_000), knot('1', 0), knot('3', 10_500)], 0.01);
  expect(groups.map((group) => group.knots.map((one) => one.id))).toEqual([['1'], ['2', '3']]);
});

test('a shared knot shows the worst of its lines', () => {
  expect(worstFault([knot('1', 0, 'agrees'), knot('2', 0, 'differs'), knot('3', 0, 'unread')])).toBe('unread');
  expect(worstFault([knot('1', 0, 'agrees')])).toBeUndefined();
});

test('a dragged knot is drawn to the start of a caption within 0.4 s, and to nothing while Alt is held', () => {
  const starts = [1000, 5000, 5300];
  expect(snapTo(1390, starts, false)).toBe(1000);
  expect(snapTo(1450, starts, false)).toBe(1500);
  expect(snapTo(5200, starts, false)).toBe(5300);
  expect(snapTo(1390, starts, true)).toBe(1400);
});
