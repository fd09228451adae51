import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  heldAgainst,
  type HeldInput,
  type SaidLine,
  type SaidPiece,
  type WrittenLine,
  type WrittenPiece,
} from '#crochet';

const written = (id: string, over: Partial<WrittenLine> = {}): WrittenLine => {
  const n = Number(/\d+$/.exec(id)?.[0] ?? NaN);
  const from = Number.isNaN(n) ? null : n;
  return {
    id,
    kind: 'round',
    label: '',
    from,
    to: from,
    text: 'sc around',
    total: null,
    work: [],
    filmed: true,
    ...over,
  };
};
const said = (from: number | null, over: Partial<SaidLine> = {}): SaidLine => ({
  kind: 'round',
  label: '',
  from,
  to: from,
  text: 'sc around',
  said: null,
  work: [],
  ...over,
});
const piece = (name: string, ...lines: WrittenLine[]): WrittenPiece => ({ id: name, name, make: 1, lines });
const heard = (name: string, ...lines: SaidLine[]): SaidPiece => ({ name, make: 1, lines });
const hold = (pieces: readonly WrittenPiece[], drafts: readonly SaidPiece[], terms: 'US' | 'UK' = 'US') =>
  heldAgainst({ written: { terms: 'US', pieces }, said: { terms, pieces: drafts } });
const step = (id: string, text: string) => written(id, { kind: 'step', from: null, to: null, text });
const saidStep = (text: string) => said(null, { kind: 'step', text });

describe('a recording held against a pattern that was written first', () => {
  test('finds each round by the number spoken, and tells what was never said and what is not written', () => {
    const held = hold(
      [piece('Body', written('r1'), written('r2'), written('r3'))],
      [heard('Body', said(1), said(3), said(4))],
    );
    expect(held.lines.map(({ lineId, said: at }) => [lineId, at.map(({ line }) => line)])).toEqual([
      ['r1', [0]],
      ['r2', []],
      ['r3', [1]],
    ]);
    expect(held.unwritten).toEqual([{ piece: 0, line: 2 }]);
  });

  test('finds a range where its rounds were said one by one, and rounds where a range was said', () => {
    const range = hold([piece('Body', written('r5', { to: 8 }))], [heard('Body', said(5), said(6), said(7), said(8))]);
    expect(range.lines[0]!.said).toHaveLength(4);
    const rounds = hold([piece('Body', written('r5'), written('r6'))], [heard('Body', said(5, { to: 6 }))]);
    expect(rounds.lines.map(({ said: at }) => at.length)).toEqual([1, 1]);
    expect([...range.unwritten, ...rounds.unwritten]).toEqual([]);
  });

  test('takes the same work in other words for the same, and tells another instruction and another total', () => {
    const work = ['2sc', '2sc'];
    const held = hold(
      [
        piece(
          'Body',
          written('r1', { text: 'inc × 2', work, total: { sts: [4] } }),
          written('r2', { text: '(sc, inc) × 6', total: { sts: [18] } }),
          written('r3', { text: '[dc, inc] 6 times', total: { sts: [24] } }),
          written('r4', { text: 'dc around' }),
        ),
      ],
      [
        heard(
          'Body',
          said(1, { text: 'inc around', work, said: { sts: [4] } }),
          said(2, { text: '(2 dc, inc) × 6', said: { sts: [24] } }),
          said(3, { text: '(tr, inc) × 6', said: { sts: [24] } }),
          said(4, { text: 'dc around' }),
        ),
      ],
      'UK',
    );
    expect(held.lines.map(({ unlike }) => unlike)).toEqual([[], ['instruction', 'total'], [], ['instruction']]);
  });

  test('a total in other kinds of stitches says nothing against what is written', () => {
    const total = { dc: [12], 'ch-2 sp': [4] };
    const held = hold([piece('Square', written('r1', { total }))], [heard('Square', said(1, { said: { sts: [16] } }))]);
    expect(held.lines[0]!.unlike).toEqual([]);
  });

  test('knows pieces by their names, one of several by its last word, and the one that is left over', () => {
    const pieces = [piece('Left ear', written('a1')), piece('Body', written('b1')), piece('Tail', written('c1'))];
    const held = hold(pieces, [heard('Mouse body', said(1)), heard('Ears', said(1)), heard('Rope', said(1))]);
    expect(held.pieces).toEqual(['Body', 'Left ear', 'Tail']);
  });

  test('knows a round that was miscounted aloud by its work', () => {
    const lines = [written('r1', { work: ['a'] }), written('r2', { work: ['b', 'b'] }), written('r3', { work: ['c'] })];
    const held = hold([piece('Body', ...lines)], [heard('Body', said(1), said(12, { work: ['b', 'b'] }), said(3))]);
    expect(held.lines[1]).toEqual({ lineId: 'r2', said: [{ piece: 0, line: 1 }], unlike: ['number'] });
  });

  test('knows steps by their words and where they stand, and asks nothing of notes', () => {
    const lines = [
      step('s', 'Stuff firmly.'),
      written('r9'),
      step('t', 'Top up the stuffing.'),
      written('n', { kind: 'note', from: null }),
    ];
    const held = hold(
      [piece('Body', ...lines)],
      [heard('Body', saidStep('now we stuff it'), said(9), saidStep('a little more stuffing'), saidStep('fasten off'))],
    );
    expect(held.lines.map(({ lineId, said: at }) => [lineId, at[0]?.line])).toEqual([
      ['s', 0],
      ['r9', 1],
      ['t', 2],
    ]);
    expect(held.unwritten).toEqual([{ piece: 0, line: 3 }]);
  });
});

const anyLine = fc.record({
  kind: fc.constantFrom('round', 'row', 'foundation', 'step', 'note'),
  from: fc.option(fc.integer({ min: 0, max: 30 }), { nil: null }),
  long: fc.integer({ min: 0, max: 4 }),
  text: fc.constantFrom('sc around', 'inc × 6', 'Stuff firmly.', 'fasten off and sew', '(sc, inc) × 6'),
});
type AnyLine = typeof anyLine extends fc.Arbitrary<infer T> ? T : never;
const anyPieces = fc.array(
  fc.tuple(fc.constantFrom('Body', 'Ear', 'Ears', 'Tail', ''), fc.array(anyLine, { maxLength: 12 })),
  {
    maxLength: 5,
  },
);
const numbers = ({ from, long }: AnyLine) => ({ from, to: from === null ? null : from + long });
const asInput = (a: readonly (readonly [string, AnyLine[]])[], b: typeof a): HeldInput => ({
  written: {
    terms: 'US',
    pieces: a.map(([name, lines], p) => ({
      id: `${p}`,
      name,
      make: 1,
      lines: lines.map((one, i) =>
        written(`p${p}i`, { ...numbers(one), id: `${p}.${i}`, kind: one.kind, text: one.text }),
      ),
    })),
  },
  said: {
    terms: 'US',
    pieces: b.map(([name, lines]) => ({
      name,
      make: 1,
      lines: lines.map((one) =>
        said(one.from, {
          ...numbers(one),
          kind: one.kind === 'note' ? 'step' : one.kind,
          text: one.text,
        }),
      ),
    })),
  },
});

test('whatever was written and said, every line is told once, and what was said is found or is not written', () => {
  fc.assert(
    fc.property(anyPieces, anyPieces, (a, b) => {
      const input = asInput(a, b);
      const held = heldAgainst(input);
      const sayable = input.written.pieces.flatMap(({ lines }) => lines.filter(({ kind }) => kind !== 'note'));
      expect(held.lines.map(({ lineId }) => lineId)).toEqual(sayable.map(({ id }) => id));
      const key = ({ piece: p, line }: { piece: number; line: number }) => `${p}.${line}`;
      const found = new Set(held.lines.flatMap((line) => line.said.map(key)));
      const unwritten = held.unwritten.map(key);
      expect(unwritten.some((one) => found.has(one))).toBe(false);
      expect(found.size + unwritten.length).toBe(input.said.pieces.reduce((sum, one) => sum + one.lines.length, 0));
      const taken = held.pieces.filter((id) => id !== null);
      expect(new Set(taken).size).toBe(taken.length);
    }),
  );
});

test('a pattern held against its own words is all as written', () => {
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 60 }), (n) => {
      const lines = Array.from({ length: n }, (_, i) => i + 1);
      const held = hold(
        [piece('Body', ...lines.map((i) => written(`r${i}`)))],
        [heard('Body', ...lines.map((i) => said(i)))],
      );
      expect(held.unwritten).toEqual([]);
      expect(held.lines.every((line) => line.said.length === 1 && line.unlike.length === 0)).toBe(true);
    }),
  );
});
