import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { countReport, type Terms } from '#crochet';
import { inShort } from './support.ts';

interface Whole {
  readonly title: string;
  readonly text: string;
  readonly answers: readonly string[];
  readonly terms: Terms | null;
  readonly base: number | null;
}

/** Patterns parted by `=====`; behind ` ## ` stands what each line comes to, worked out by hand. */
function readWholes(file: URL): Whole[] {
  return readFileSync(file, 'utf8')
    .split(/^=====/m)
    .slice(1)
    .map((chunk) => {
      const [title = '', ...lines] = chunk.split('\n');
      const answers: string[] = [];
      let terms: Terms | null = null;
      let base: number | null = null;
      const text: string[] = [];
      for (const line of lines) {
        const option = /^#(terms|base) (\w+)/.exec(line);
        if (option?.[1] === 'terms') terms = option[2] === 'UK' ? 'UK' : 'US';
        else if (option) base = Number(option[2]);
        else {
          const [words = '', answer] = line.split(' ## ');
          text.push(words);
          if (answer) answers.push(...answer.split(' | ').map((one) => one.trim()));
        }
      }
      return { title: title.trim(), text: text.join('\n'), answers, terms, base };
    });
}

const folder = new URL('./patterns/', import.meta.url);
const wholes = readdirSync(folder).flatMap((name) => readWholes(new URL(name, folder)));

interface Line {
  readonly kind: string;
  readonly base: number | null;
  readonly count: number | null;
  readonly verdict: 'agrees';
}

describe('whole written patterns, untidy as people write them', () => {
  test.each(wholes)('$title is counted line by line', ({ text, answers, terms, base }) => {
    const report = countReport(text, { terms, base }) as { pieces: { lines: Line[] }[] };
    const lines = report.pieces.flatMap((piece) => piece.lines).filter((line) => line.kind !== 'step');
    expect(lines.map(inShort)).toEqual(answers);
  });
});
