import { performance } from 'node:perf_hooks';
import { pathToFileURL } from 'node:url';
import { type Cue, readTranscript } from '#crochet';
import { examplesOf } from '../crochet/transcript/corpus.ts';

/**
 * How long reading takes: an hour of talk against splitting the same text into words, and how it grows. Run by hand:
 * `npm run bench`, or `node --import tsx tests/bench/read.ts`.
 */
const HOUR_MS = 3_600_000;

export interface BenchRow {
  readonly what: string;
  readonly figure: string;
}

/** The spoken tutorials one after another, as long as asked. */
function talkOf(lengthMs: number): readonly Cue[] {
  const examples = examplesOf('dev');
  const cues: Cue[] = [];
  let at = 0;
  for (let n = 0; at < lengthMs; n++) {
    const { cues: part } = examples[n % examples.length]!;
    for (const cue of part) cues.push({ ...cue, startMs: cue.startMs + at, endMs: cue.endMs + at });
    at = cues.at(-1)!.endMs + 5000;
  }
  return cues.filter((cue) => cue.endMs <= lengthMs);
}

/** The same talk over and over. */
function repeated(cues: readonly Cue[], times: number): readonly Cue[] {
  const lengthMs = cues.at(-1)!.endMs + 5000;
  return Array.from({ length: times }, (_, n) => n * lengthMs).flatMap((atMs) =>
    cues.map((cue) => ({ ...cue, startMs: cue.startMs + atMs, endMs: cue.endMs + atMs })),
  );
}

/** Milliseconds of the fastest of a few runs. */
function fastest(run: () => unknown, runs = 3): number {
  let best = Infinity;
  for (let n = 0; n < runs; n++) {
    const start = performance.now();
    run();
    best = Math.min(best, performance.now() - start);
  }
  return best;
}

export function benchReading(): readonly BenchRow[] {
  const hour = talkOf(HOUR_MS);
  readTranscript(hour);
  const read = fastest(() => readTranscript(hour));
  const split = fastest(() => hour.flatMap((cue) => cue.text.split(/\s+/)));
  const quarter = talkOf(HOUR_MS / 4);
  const short = fastest(() => readTranscript(quarter));
  // the same talk, as other talk is harder or easier to read
  const long = repeated(quarter, 100);
  const grown = fastest(() => readTranscript(long), 1);
  return [
    { what: 'an hour of talk read', figure: `${read.toFixed(0)} ms` },
    { what: 'the same split into words', figure: `${split.toFixed(1)} ms` },
    { what: 'a hundred times a quarter of an hour', figure: `×${(grown / short).toFixed(0)}` },
  ];
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) {
  for (const { what, figure } of benchReading()) process.stdout.write(`${what.padEnd(40)} ${figure}\n`);
}
