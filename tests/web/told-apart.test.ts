import { readPattern } from '#crochet';
import { describe, expect, test } from 'vitest';
import { decide, nextQuestion } from '../../web/features/written/decide.ts';
import { tellApart, type Entry } from '../../web/features/written/told-apart.ts';
import { inParts, toWritten } from '../../web/features/written/to-pattern.ts';

const TEXT = `Oval basket

Materials:
Cotton, 100 g
3.5 mm hook

Base
R1: ch 6, sc in 2nd ch from hook, sc in next 3, 3 sc in last ch, working along the other side of the chain sc in next 3, 2 sc in last ch (12)
R2: inc, sc in next 3, inc x 3,
sc in next 3, inc x 2 (18)
Press it flat under a book.

HANDLE (make 2)
Row 1: ch 11, sc in 2nd ch from hook and in each ch across (10)
Sew on both handles.
`;
const ABOUT = {
  id: '0190a000-0000-7000-8000-000000000000',
  studioId: '0190a000-0000-7000-8000-000000000001',
  title: 'Oval basket',
  terms: 'US',
} as const;
const read = (text: string) => ({ read: readPattern(text), entries: tellApart(text, readPattern(text)) });
const words = (text: string) => text.match(/[\p{L}\p{N}]+/gu) ?? [];

describe('a written pattern told apart', () => {
  test('keeps every word of the text, each once and in its order', () => {
    for (const text of [
      TEXT,
      'no pattern at all\n12 things\n\nand more',
      TEXT.replaceAll('\n', '\r\n'),
      '* * *\nR1: 6 sc in MR (6)',
    ]) {
      const { entries } = read(text);
      expect(entries.flatMap((entry) => words(entry.text))).toEqual(words(text));
    }
  });

  test('knows pieces, lines and what is no work', () => {
    const { entries } = read(TEXT);
    const roles = Object.fromEntries(entries.map((entry) => [entry.text.slice(0, 12), entry.role]));
    expect(roles).toMatchObject({ 'Oval basket': 'title', 'Cotton, 100 ': 'material', 'HANDLE (make': 'piece' });
    expect(entries.find(({ role, text }) => role === 'piece' && text.startsWith('HANDLE'))!.piece!.make).toBe(2);
  });

  test('asks where a round is printed over two lines, and goes from question to question', () => {
    const { entries } = read(TEXT);
    const asked = entries.filter(({ question }) => question !== null);
    expect(asked.some(({ text }) => text.startsWith('R2: inc, sc in next 3'))).toBe(true);
    const first = nextQuestion(entries, null)!;
    const rest = entries.map((entry) => (entry.id === first.id ? decide(entry, 'kept') : entry));
    expect(nextQuestion(rest, first.id)?.id).not.toBe(first.id);
  });
});

describe('what is decided', () => {
  const entry = (text: string): Entry => read(text).entries[0]!;

  test('a note becomes a piece with its number, a line takes the next number', () => {
    const pieces = [
      decide(entry('Ear flaps x 2'), 'piece'),
      decide({ ...entry('6 sc in magic ring'), id: 'a', begins: null }, 'line'),
      decide({ ...entry('inc x 6'), id: 'b', begins: null }, 'line'),
    ];
    const written = toWritten(pieces, { sizes: [], specialStitches: [] }, ABOUT);
    expect(written.pieces).toHaveLength(1);
    expect(written.pieces[0]).toMatchObject({ name: 'Ear flaps', make: 2 });
    expect(written.pieces[0]!.lines.map(({ from, text }) => [from, text])).toEqual([
      [1, '6 sc in magic ring'],
      [2, 'inc x 6'],
    ]);
  });

  test('what goes on from above is one line with it', () => {
    const { read: pattern, entries } = read(TEXT);
    const at = entries.findIndex(({ text }) => text.startsWith('Press it'));
    const joined = entries.map((one, i) => (i === at ? decide(one, 'joined') : one));
    const [base] = toWritten(joined, pattern, ABOUT).pieces;
    expect(base!.lines.at(-1)!.text).toMatch(/inc x 2 \(18\) Press it flat under a book\.$/);
  });

  test('nothing is dropped on the way to the pattern, however long a paragraph is', () => {
    const long = `Notes:\n${'Keep the tension even. '.repeat(400)}\n\nR1: 6 sc in magic ring (6)`;
    const { read: pattern, entries } = read(long);
    const written = toWritten(entries, pattern, ABOUT);
    const all = [...written.notes, ...written.pieces.flatMap(({ lines }) => lines.map(({ text }) => text))].join(' ');
    expect(all.match(/tension/g)).toHaveLength(400);
    expect(inParts('x'.repeat(9_000), 4_000).map((part) => part.length)).toEqual([4_000, 4_000, 1_000]);
  });
});
