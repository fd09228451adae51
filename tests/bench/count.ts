import { setFlagsFromString } from 'node:v8';
import { runInNewContext } from 'node:vm';
import { countPattern, type PatternInput } from '#crochet';

const ROUNDS = [
  '(sc, inc) × 6 (18)',
  '(2 sc, inc) × 6 (24)',
  'sc in each st around (24)',
  '(2 sc, dec) × 6 (18)',
  '(sc, dec) × 6 (12)',
  'inc × 6, 6 sc (18)',
  '(sc, dec) × 6 (12)',
];

/** A pattern of so many rounds, none of which grows without end. */
function patternOf(lines: number): PatternInput {
  return {
    terms: 'US',
    sizes: [],
    base: 12,
    pieces: [
      {
        id: 'piece',
        name: 'Piece',
        make: 1,
        worked: 'spiral',
        lines: Array.from({ length: lines }, (_, i) => ({
          id: String(i),
          kind: 'round' as const,
          label: `R${String(i + 1)}`,
          from: i + 1,
          to: i + 1,
          text: ROUNDS[i % ROUNDS.length]!,
          written: null,
          said: null,
        })),
      },
    ],
  };
}

/** Milliseconds of the fastest of a few runs. */
function took(run: () => unknown, runs = 5): number {
  let best = Number.POSITIVE_INFINITY;
  for (let n = 0; n < runs; n += 1) {
    const start = performance.now();
    run();
    best = Math.min(best, performance.now() - start);
  }
  return best;
}

/** Time a line, growth from 100 to 10,000 lines, one line changed of 300, against splitting the same text into words. */
function main(): void {
  took(() => countPattern(patternOf(300)));
  for (const lines of [100, 10_000]) {
    const input = patternOf(lines);
    const text = input.pieces[0]!.lines.map((line) => line.text).join('\n');
    const counted = took(() => countPattern(input));
    const words = took(() => text.split(/\s+/));
    console.log(
      `${String(lines)} lines: ${counted.toFixed(1)} ms, ${((counted / lines) * 1000).toFixed(0)} µs a line, ${(counted / words).toFixed(0)} × splitting into words`,
    );
  }
  const input = patternOf(300);
  const previous = countPattern(input);
  for (const [what, text] of [
    ['a space', `${input.pieces[0]!.lines[150]!.text} `],
    ['its total', '(2 sc, dec) × 6 (17)'],
    ['its work, and so the line after it', '(2 sc, dec) × 5, 4 sc (19)'],
  ] as const) {
    const edited = withLine(input, 150, text);
    console.log(`one line of 300 changed in ${what}: ${took(() => countPattern(edited, previous), 40).toFixed(2)} ms`);
  }
  const before = heapLeft();
  const kept = countPattern(patternOf(10_000));
  const used = (heapLeft() - before) / 1024 / 1024;
  console.log(`10,000 lines counted and kept: about ${used.toFixed(0)} MB (${String(kept.pieces.length)} piece)`);
  const long: PatternInput = withLine({ ...patternOf(1), base: 50_000 }, 0, '(sc, inc) × 25000 (75000)');
  const wide = took(() => countPattern(long), 3);
  console.log(`one line of 75,000 stitches: ${wide.toFixed(0)} ms, ${((wide / 75_000) * 1000).toFixed(1)} µs a stitch`);
}

/** What is held after everything else was let go of. */
function heapLeft(): number {
  setFlagsFromString('--expose-gc');
  (runInNewContext('gc') as () => void)();
  return process.memoryUsage().heapUsed;
}

function withLine(input: PatternInput, at: number, text: string): PatternInput {
  const [piece] = input.pieces;
  return {
    ...input,
    pieces: [{ ...piece!, lines: piece!.lines.map((line, i) => (i === at ? { ...line, text } : line)) }],
  };
}

main();
