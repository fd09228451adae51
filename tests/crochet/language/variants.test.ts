import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { countReport, type Terms } from '#crochet';
import { inShort } from '../count/support.ts';

interface Line {
  readonly kind: string;
  readonly base: number | null;
  readonly count: number | null;
  readonly verdict: 'agrees';
}

/**
 * Ways in which patterns are written in print, by kind. A row is `base ¦ terms ¦ text ## answer`; `-` where the text
 * says it itself, `\n` for a line end, `|` between the answers of several lines.
 */
const SECTIONS = readFileSync(new URL('./variants.txt', import.meta.url), 'utf8')
  .split(/^=====/m)
  .slice(1)
  .map((section) => {
    const [name = '', ...rows] = section.trim().split('\n');
    return {
      name: name.trim(),
      rows: rows.map((row) => {
        const [spec = '', answer = ''] = row.split(' ## ');
        const [base = '', terms = '', text = ''] = spec.split(' ¦ ');
        return {
          base: base === '-' ? null : Number(base),
          terms: terms === '-' ? null : (terms as Terms),
          text: text.replaceAll('\\n', '\n').replaceAll('\\t', '\t'),
          answer,
        };
      }),
    };
  });

describe.each(SECTIONS)('$name, as they are printed', ({ rows }) => {
  test.each(rows)('$text', ({ base, terms, text, answer }) => {
    const report = countReport(text, { base, terms }) as { pieces: { lines: Line[] }[] };
    const lines = report.pieces.flatMap((piece) => piece.lines).filter((line) => line.kind !== 'step');
    expect(lines.map(inShort).join(' | ')).toBe(answer);
  });
});
