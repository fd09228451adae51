import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { changedWords } from '../../web/parts/changed-words.ts';

const shown = (text: string, other: string) =>
  changedWords(text, other)
    .map(({ text: words, isChanged }) => (isChanged ? `[${words}]` : words))
    .join('');

describe('what of a wording is other than before', () => {
  test.each([
    ['Leave a 25 cm end.', 'Leave a 15 cm end.', 'Leave a [25] cm end.'],
    ['inc × 6 (12)', 'inc × 6 (12)', 'inc × 6 (12)'],
    ['between R14 and R15', 'between R14 and R15 there', 'between R14 and R15'],
    ['all new', '', '[all] [new]'],
  ])('in "%s" after "%s"', (text, other, marked) => {
    expect(shown(text, other)).toBe(marked);
  });

  test('keeps every word of the text, whatever it is compared with', () => {
    fc.assert(
      fc.property(fc.lorem({ maxCount: 30 }), fc.lorem({ maxCount: 30 }), (text, other) => {
        expect(
          changedWords(text, other)
            .map((stretch) => stretch.text)
            .join(''),
        ).toBe(text);
      }),
    );
  });
});
