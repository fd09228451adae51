import { describe, expect, test } from 'vitest';
import { countPattern } from '#crochet';
import { countLines, inputFor } from './support.ts';

/** 12 sc, then a round of mesh with six ch-1 spaces, and one with two chains in each. */
const mesh = (total: string) => `(dc, ch 1, sk 1) around (${total})`;
const wide = (total: string) => `(dc in next dc, ch 2, sk next ch-1 sp) around (${total})`;
const START = '12 sc in ring (12)';

const told = (lines: readonly string[]) =>
  countLines(lines).map(({ verdict, countedWith }) => (countedWith ? `${verdict} ${countedWith}` : verdict));

describe('the plain totals of one piece of lace', () => {
  test.each([
    ['the stitches', [START, mesh('6'), wide('6')], ['agrees stitches', 'agrees stitches', 'agrees stitches']],
    ['the chains too', [START, mesh('12'), wide('18')], ['agrees stitches', 'agrees chains', 'agrees chains']],
    ['the spaces too', [START, mesh('12'), wide('12')], ['agrees stitches', 'agrees spaces', 'agrees spaces']],
  ])('may count %s', (_, lines, answers) => {
    expect(told(lines)).toEqual(answers);
  });

  test.each([
    ['stitches before chains', [START, mesh('6'), wide('18')], ['agrees stitches', 'agrees stitches', 'differs']],
    [
      'spaces that the line before shut out',
      [START, mesh('6'), wide('12')],
      ['agrees stitches', 'agrees stitches', 'differs'],
    ],
    [
      'one of three',
      [START, mesh('6'), wide('18'), '(dc in next dc, ch 1, sk next ch-2 sp) around (12)'],
      ['agrees stitches', 'differs', 'agrees chains', 'agrees chains'],
    ],
  ])('never agree in two ways: %s', (_, lines, answers) => {
    expect(told(lines)).toEqual(answers);
  });

  test('are ruled by no line without chains, and by none that is wrong in every reading', () => {
    expect(told([START, mesh('7'), wide('18')])).toEqual(['agrees stitches', 'differs', 'agrees chains']);
  });

  test('are ruled by no other piece', () => {
    const [one] = inputFor([START, mesh('6')]).pieces;
    const [other] = inputFor([START, mesh('12')]).pieces;
    const counted = countPattern({ terms: 'US', sizes: [], pieces: [one!, { ...other!, id: 'other' }] });
    expect(counted.pieces.map((piece) => piece.lines[1]!.verdict)).toEqual(['agrees', 'agrees']);
  });

  test('are the same whether or not the last count is at hand', () => {
    const before = countPattern(inputFor([START, mesh('12'), wide('18')]));
    const edited = inputFor([START, mesh('6'), wide('18')]);
    expect(countPattern(edited, before)).toEqual(countPattern(edited));
  });

  test('beside figures for spaces say the stitches', () => {
    expect(told([START, mesh('6 sts, 6 ch-1 sps')])[1]).toBe('agrees');
    expect(told([START, mesh('12 sts, 6 ch-1 sps')])[1]).toBe('differs');
  });

  test('said and written are meant in one sense', () => {
    const input = inputFor([START, mesh('12')]);
    const [piece] = input.pieces;
    const lines = piece!.lines.map((line, i) => (i === 1 ? { ...line, said: { sts: [6] } } : line));
    const counted = countPattern({ ...input, pieces: [{ ...piece!, lines }] });
    expect(counted.pieces[0]!.lines[1]).toMatchObject({ verdict: 'differs', odd: ['said', 'written'] });
  });
});
