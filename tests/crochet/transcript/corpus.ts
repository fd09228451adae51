import { mkdtempSync, readdirSync, readFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { type Cue, readTranscript } from '#crochet';
import { printReading } from '../../../api/features/recordings/transcript-file/print-reading.ts';
import { readTranscriptFile } from '../../../api/features/recordings/transcript-file/read-transcript-file.ts';
import { build, compare, KEYS } from '../corpus/corpus.mjs';

export interface Example {
  readonly name: string;
  readonly cues: readonly Cue[];
  readonly answers: { readonly form: string; readonly pieces: readonly unknown[] };
}

/** Builds a set of the corpus and reads its files into cues. */
export function examplesOf(set: 'dev' | 'fresh' | 'wide' | 'apart'): readonly Example[] {
  const into = mkdtempSync(path.join(tmpdir(), 'spoken-'));
  build(path.join(import.meta.dirname, '../corpus', set), into);
  return readdirSync(into)
    .filter((file) => file.endsWith('.answers.json'))
    .map((file) => {
      const answers = JSON.parse(readFileSync(path.join(into, file), 'utf8')) as Example['answers'];
      const name = file.replace('.answers.json', '');
      const transcript = `${name}.${answers.form}`;
      const { cues } = readTranscriptFile(readFileSync(path.join(into, transcript)), transcript);
      return { name, cues, answers };
    });
}

interface Line {
  readonly kind: string;
  readonly from?: number | null;
  readonly at: number;
  readonly verdict: string;
}

const linesOf = (pieces: unknown): readonly Line[] =>
  (pieces as readonly { readonly lines: readonly Line[] }[]).flatMap((piece) => piece.lines);

/** The lines whose maker meant them to be wrong, and that the reader says come out right. */
export function faultsLetThrough(examples: readonly Example[]): readonly string[] {
  return examples.flatMap(({ name, cues, answers }) => {
    const secondsOff = answers.form === 'txt' ? 7 : 3;
    const printed = printReading(readTranscript(cues), []) as { readonly pieces: unknown };
    const read = linesOf(printed.pieces);
    const meant = linesOf(answers.pieces).filter(({ verdict }) => verdict === 'differs' || verdict === 'does-not-fit');
    return meant
      .filter(({ kind, from, at }) =>
        read.some(
          (line) =>
            line.kind === kind &&
            line.from === from &&
            Math.abs(line.at - at) <= secondsOff &&
            line.verdict === 'agrees',
        ),
      )
      .map((line) => `${name}: ${line.kind} ${String(line.from)}`);
  });
}

export type Figures = Readonly<Record<string, number>>;

/** Reads every example and adds up how much was read right, in counts and in per cent of the lines. */
export function score(examples: readonly Example[], say: (miss: string) => void = () => undefined): Figures {
  const total: Record<string, number> = {};
  for (const { name, cues, answers } of examples) {
    const row = compare(answers, printReading(readTranscript(cues), []), (miss: string) => say(`${name}: ${miss}`));
    for (const key of KEYS) total[key] = (total[key] ?? 0) + Number(row[key as keyof typeof row]);
  }
  const share = (a: string, b: string) => (100 * (total[a] ?? 0)) / Math.max(1, total[b] ?? 0);
  return {
    ...total,
    foundShare: share('found', 'gold'),
    spuriousShare: 100 - share('found', 'pred'),
    workShare: share('work', 'gold'),
    saidShare: share('said', 'gold'),
    verdictShare: share('verdict', 'gold'),
    pieceShare: share('piece', 'gold'),
    stepsShare: share('stepsFound', 'steps'),
    stepsSpuriousShare: 100 - share('stepsFound', 'stepsPred'),
  };
}
