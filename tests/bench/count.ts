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
  const [piece] = input.pieces;
  const edited: PatternInput = {
    ...input,
    pieces: [
      { ...piece!, lines: piece!.lines.map((line, i) => (i === 150 ? { ...line, text: `${line.text} ` } : line)) },
    ],
  };
  console.log(`one line of 300 changed: ${took(() => countPattern(edited, previous), 20).toFixed(2)} ms`);
}

main();
