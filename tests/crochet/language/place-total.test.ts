import { expect, test } from 'vitest';
import { countPattern, placeTotal } from '#crochet';

/** Where the count finds the written total of a round that stands alone. */
function spanIn(text: string) {
  const line = { id: 'a', kind: 'round' as const, label: 'R2', from: 2, to: 2, text, written: null, said: null };
  const pieces = [{ id: 'p', name: '', make: 1, worked: 'spiral' as const, lines: [line] }];
  return countPattern({ terms: 'US', sizes: [], pieces }).pieces[0]?.lines[0]?.writtenSpan ?? null;
}
const place = (text: string, printed: string | null) => placeTotal(text, spanIn(text)!, printed);

test.each([
  ['(sc, inc) ×6 (12)', '18', '(sc, inc) ×6 (18)'],
  ['(sc, inc) ×6 [12]', '18', '(sc, inc) ×6 [18]'],
  ['inc around (12)', null, 'inc around'],
  ['inc around. (12)', null, 'inc around.'],
])('%s with %j becomes %s', (text, printed, becomes) => {
  expect(place(text, printed)).toBe(becomes);
});

test('what was placed is what is read again', () => {
  for (const text of ['(sc, inc) ×6 (12)', '6 sc in a magic ring. [6 sts]', 'inc around – 12 sts']) {
    const span = spanIn(text);
    if (!span) continue;
    const placed = placeTotal(text, span, '30');
    const again = spanIn(placed);
    expect(again && placed.slice(again.start, again.end)).toMatch(/30/);
  }
});
