import { describe, expect, test } from 'vitest';
import { type DraftLine, readTranscript } from '#crochet';
import { talk } from './talk.ts';

const lines = (text: string): readonly DraftLine[] => readTranscript(talk(text)).pieces.flatMap((piece) => piece.lines);
const START = 'Round one, six single crochet in a magic ring, six. | ';
const TO_24 = `${START}Round two, increase in every stitch, twelve. | Round three, single, increase, six times, eighteen. | Round four, two singles, increase, six times, twenty-four. | `;
const heard = (line: DraftLine | undefined) => line?.evidence.map((one) => `${one.role}: ${one.words}`);

describe('a step', () => {
  test.each([
    ['Now stuff it.', 'Stuff it.'],
    ['Then fasten off.', 'Fasten off.'],
    ['Fasten off, leave yourself twenty centimetres.', 'Fasten off, leave yourself twenty centimetres.'],
    ['So now put the eyes in, between rounds one and two.', 'Put the eyes in, between rounds one and two.'],
    [
      'Gather the last six through their front loops, and bury the end.',
      'Gather the last six through their front loops, and bury the end.',
    ],
  ])('is written as the whole sentence said: %s', (said, expected) => {
    expect(lines(TO_24 + said).at(-1)?.text).toBe(expected);
  });

  test('without full stops keeps the words around it', () => {
    const text = lines('okay round one six single crochet in a magic ring | now stuff it firmly with the filling').at(
      -1,
    );
    expect(text?.text).toBe('Stuff it firmly with the filling.');
  });
});

describe('the words shown for a line', () => {
  test('are those that announced it, gave its work and its total, and no remark', () => {
    const line = lines(
      `${START}Round two. This is where it gets wide. Increase in every stitch around. It cups by itself now. That gives you twelve stitches.`,
    )[1];
    expect(heard(line)).toEqual([
      'announcement: Round two.',
      'work: Increase in every stitch around.',
      'total: twelve',
    ]);
  });

  test('of an unread line are the words that were not understood', () => {
    const line = lines(
      `${TO_24}Round five. This is where we bring it in. Two single, then a decrease. Two single, decrease, and so on, tapering as you like. You should have eighteen.`,
    ).at(-1);
    expect(heard(line)).toEqual([
      'announcement: Round five.',
      'work: Two single, then a decrease.',
      'total: eighteen.',
      'unread: and so on, tapering as you like.',
    ]);
  });
});

describe('work that is left open', () => {
  test.each(['and so on, tapering as you like', 'and carry on like that by eye', 'wherever you like'])(
    'is quoted, not guessed: %s',
    (open) => {
      const line = lines(`${TO_24}Round five. Two single, then a decrease, ${open}. Eighteen.`).at(-1);
      expect(line?.verdict).toBe('unread');
      expect(line?.said).toEqual({ sts: [18] });
      expect(line?.text.startsWith('2 sc, dec, ')).toBe(true);
      expect(open).toContain(line!.unread!.quote.replace(/\.$/, ''));
    },
  );
});

describe('shorthand', () => {
  test.each([
    ['Round five, two single, then a decrease, six times, eighteen.', '(2 sc, dec) × 6'],
    ['Round five, decrease twelve times, twelve.', 'dec × 12'],
    ['Round five, increase in every stitch, forty-eight.', 'inc in each st around'],
    [
      'Round five. One single crochet in each stitch around. Just go round. Plain single crochet, twenty-four.',
      'sc in each st around',
    ],
    [
      "Round five, two single, then a decrease, under the front loops, so it doesn't leave a hole, six times, eighteen.",
      '(2 sc, inv dec) × 6',
    ],
  ])('is in house style: %s', (said, expected) => {
    expect(lines(TO_24 + said).at(-1)?.text).toBe(expected);
  });
});

describe('a first row', () => {
  test('may be numbered after its work', () => {
    const [chain, row] = lines(
      "Now the leaf. Chain nine. In the second chain from the hook slip stitch, then single, half double, double, double, half double, single, and slip stitch in the last one. That's row one, eight stitches.",
    );
    expect(chain?.text).toBe('ch 9');
    expect([row?.text, row?.verdict]).toEqual(['sl st, sc, hdc, 2 dc, hdc, sc, sl st', 'agrees']);
  });

  test('may make its own chain', () => {
    const [chain, row] = lines(
      "The tail. Row one. Chain twenty-five, slip stitch in the second chain from the hook and in each chain across. That's twenty-four.",
    );
    expect(chain?.text).toBe('ch 25');
    expect([row?.text, row?.verdict]).toEqual(['sl st in each st across', 'agrees']);
  });
});

describe('a pattern of rows', () => {
  test('worked turn about is written row by row', () => {
    const rows = lines(
      "Chain eleven. Row one, single crochet in each chain across, ten. | Row two, single crochet in each stitch across, ten. | Row three, half double crochet in each stitch across, ten. | So now it's turn about, row two, row three, row two, row three, till you have seven rows.",
    ).filter((line) => line.kind === 'row');
    expect(rows.map((row) => [row.label, row.text])).toEqual([
      ['Row 1', 'sc in each st across'],
      ['Row 2', 'sc in each st across'],
      ['Row 3', 'hdc in each st across'],
      ['Row 4', 'sc in each st across'],
      ['Row 5', 'hdc in each st across'],
      ['Row 6', 'sc in each st across'],
      ['Row 7', 'hdc in each st across'],
    ]);
  });
});

test('leaving two alone is skipping them, not stopping short', () => {
  const line = lines(
    'Chain nine. Row one, single crochet in each chain across, eight. | Row two. Three singles, then chain two and leave two alone, and three singles.',
  ).at(-1);
  expect(line?.text).toBe('3 sc, ch 2, sk 2, 3 sc');
});
