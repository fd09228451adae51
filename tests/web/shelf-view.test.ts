import { describe, expect, test } from 'vitest';
import type { ShelfPattern } from '#contract/shelf';
import {
  findPatterns,
  formatCount,
  groupNeeds,
  groupPatterns,
  inState,
  namePieces,
} from '../../web/features/shelf/shelf-view.ts';

const pattern = (title: string, over: Partial<ShelfPattern> = {}): ShelfPattern => ({
  id: '00000000-0000-4000-8000-000000000001',
  code: 'k7mq2rxw',
  title,
  state: 'drafting',
  group: 'in-hand',
  pieces: [],
  lines: 0,
  stitches: null,
  needs: [],
  lastMarked: null,
  unmarked: 0,
  print: null,
  edition: null,
  touchedAt: '2026-03-12T09:00:00.000Z',
  version: 1,
  ...over,
});
const titles = (found: readonly ShelfPattern[]) => found.map(({ title }) => title);

describe('finding', () => {
  const all = [
    pattern('Harvest mouse', { pieces: [{ name: 'Tail', make: 1 }] }),
    pattern('Crème basket', { code: 'zzzz2222' }),
  ];
  test.each([
    ['mouse harvest', ['Harvest mouse']],
    ['creme', ['Crème basket']],
    ['TAIL', ['Harvest mouse']],
    ['zzzz', ['Crème basket']],
    ['  ', ['Harvest mouse', 'Crème basket']],
    ['mouse basket', []],
  ])('“%s”', (words, found) => {
    expect(titles(findPatterns(all, words))).toEqual(found);
  });
});

test('what waits comes first, and empty groups are left out', () => {
  const all = [
    pattern('a', { group: 'at-rest' }),
    pattern('b', { group: 'waiting' }),
    pattern('c', { group: 'waiting' }),
  ];
  expect(groupPatterns(all).map(({ name, patterns }) => [name, titles(patterns)])).toEqual([
    ['Waiting for you', ['b', 'c']],
    ['At rest', ['a']],
  ]);
});

test('one state alone', () => {
  const all = [pattern('a', { state: 'in-proof' }), pattern('b')];
  expect(titles(inState(all, 'in-proof'))).toEqual(['a']);
  expect(titles(inState(all, 'all'))).toEqual(['a', 'b']);
});

test('pieces are named as the sheet names them', () => {
  const pieces = [
    { name: 'Body', make: 1 },
    { name: 'Ear', make: 2 },
    { name: 'Tail', make: 1 },
  ];
  expect(namePieces(pieces)).toBe('Body, ear (make 2), tail');
});

test('thousands stand apart', () => {
  expect([414, 1286, 1234567].map(formatCount)).toEqual(['414', '1 286', '1 234 567']);
});

test('findings of one kind stand together, and of many lines three are named', () => {
  const needs = ['R1', 'R2', 'R3', 'R4', 'R5'].map((label) => ({
    verdict: 'differs' as const,
    lineId: '00000000-0000-4000-8000-000000000001',
    label,
    piece: 'Body',
  }));
  const unread = { ...needs[0]!, verdict: 'unread' as const, label: '' };
  expect(groupNeeds([unread, ...needs]).map(({ verdict, words }) => [verdict, words])).toEqual([
    ['unread', 'a step'],
    ['differs', 'R1, R2, R3 and 2 more'],
  ]);
});
