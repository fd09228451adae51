import { describe, expect, test } from 'vitest';
import type { Change } from '#contract/changes';
import type { Line } from '#contract/rows';
import { lineSteps, standsSo } from '../../web/features/bench/history/steps.ts';

const ISMAY = { id: '00000000-0000-4000-8000-000000000001', name: 'Ismay T.' };
const change = (id: number, over: Partial<Change>): Change => ({
  id,
  deedId: '00000000-0000-4000-8000-0000000000aa',
  at: `2026-12-01T10:0${id}:00.000Z`,
  person: ISMAY,
  entity: 'line',
  entityId: '00000000-0000-4000-8000-0000000000bb',
  before: {},
  after: {},
  row: null,
  undoesDeedId: null,
  ...over,
});

describe('a line from the start', () => {
  test('says of each step who did what, a reading among them', () => {
    const steps = lineSteps([
      change(4, { after: { deletedAt: '2026-12-01' } }),
      change(3, { after: { text: '6 sc' }, undoesDeedId: '00000000-0000-4000-8000-0000000000cc' }),
      change(2, { after: { text: '7 sc', said: { sts: [7] } } }),
      change(1, { before: null, after: { text: '6 sc' }, person: null }),
    ]);
    expect(steps.map(({ who, did }) => [who, did])).toEqual([
      ['Ismay T.', 'took it away'],
      ['Ismay T.', 'wrote the instruction (undone)'],
      ['Ismay T.', 'wrote the instruction, put the total said right'],
      [null, 'was drafted'],
    ]);
  });

  test('is made again by its words, numbers and totals, never by its place among the others', () => {
    const row = { text: '6 sc', from: 3, to: 3, said: null, orderKey: 'a1', pieceId: 'p', filmed: true, version: 4 };
    const [step] = lineSteps([change(1, { row })]);
    expect(step?.stood).toEqual({ text: '6 sc', from: 3, to: 3, said: null });
    const line = { ...row, note: 'snug' } as unknown as Line;
    expect(standsSo(line, step!)).toBe(true);
    expect(standsSo({ ...line, text: '7 sc' }, step!)).toBe(false);
  });
});
