import { expect, test } from 'vitest';
import { countReport } from '#crochet';

interface Line {
  readonly count: number | null;
  readonly verdict: string;
}
const lastLine = (text: string): Line => {
  const report = countReport(text, { terms: 'US', base: null }) as { pieces: { lines: Line[] }[] };
  const { count, verdict } = report.pieces.at(-1)!.lines.at(-1)!;
  return { count, verdict };
};

test.each([
  ['Row 1: ch 8, sl st in 2nd ch from hook, sc in next ch, 3 hdc, sc, sl st (7)', 7, 'agrees'],
  ['Row 1: ch 8, sc in 2nd ch from hook, 5 sc, sl st. 7 sts', 7, 'agrees'],
  ['Row 1: ch 8, sc in 2nd ch from hook, 6 sc, sl st (7)', 7, 'agrees'],
  ['Rnd 1: 6 sc in magic ring, sl st (6)', 6, 'agrees'],
  ['Rnd 1: 12 sc in magic ring (12)\nRnd 2: (sc, inc) x 5, sc, sl st', 16, 'does-not-fit'],
])(
  'a last slip stitch is worked into the one place that a row has left, and joins a round: %s',
  (text, count, verdict) => {
    expect(lastLine(text)).toEqual({ count, verdict });
  },
);
