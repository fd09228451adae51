import { lexesOf } from '../language/lexer.ts';
import { printTotals } from '../language/totals-text.ts';
import { type LineInput, type PatternInput } from './input.ts';
import { type LineCount } from './result.ts';

/** One small change to a line, not yet tried. */
export interface Edit {
  readonly text: string;
  readonly written?: LineInput['written'];
  /** Why, with a capital and a full stop. */
  readonly sentence: string;
  /** The smaller, the likelier. */
  readonly weight: number;
}

/** Edits of one line's text, each with its sentence. */
export function editsOf(line: LineInput, input: PatternInput, count: LineCount): Edit[] {
  const edits: Edit[] = [];
  const total = count.writtenSpan;
  const lexes = lexesOf(line.text, input.terms);
  const replace = (start: number, end: number, word: string): string =>
    line.text.slice(0, start) + word + line.text.slice(end);
  lexes.forEach((lex, i) => {
    if (total && lex.start >= total.start && lex.end <= total.end) return;
    if (lex.kind === 'num' && lex.value < 1000) {
      const isRepeat = ['×', 'x', '*'].includes(lexes[i - 1]?.text ?? '') || lexes[i + 1]?.text === 'times';
      for (let by = 1; by <= 6; by += 1) {
        for (const value of [lex.value + by, lex.value - by]) {
          if (value < 1) continue;
          const weight = by + (isRepeat ? 0 : 0.5);
          edits.push({
            text: replace(lex.start, lex.end, String(value)),
            sentence: isRepeat
              ? `Fits with ${String(value)} ${value === 1 ? 'repeat' : 'repeats'} instead of ${String(lex.value)}.`
              : `Fits with ${String(value)} in place of ${String(lex.value)}.`,
            weight,
          });
        }
      }
    }
    if (lex.kind === 'stitch' && (lex.text === 'inc' || lex.text === 'dec' || lex.text === 'invdec')) {
      const word = lex.text === 'inc' ? 'dec' : 'inc';
      edits.push({
        text: replace(lex.start, lex.end, word),
        sentence: `Fits with ${word} in place of ${line.text.slice(lex.start, lex.end)}.`,
        weight: 1.2,
      });
    }
  });
  edits.push(...totalEdits(line, count, replace));
  return edits;
}

/** The written total, changed to what was worked out. */
function totalEdits(
  line: LineInput,
  count: LineCount,
  replace: (start: number, end: number, word: string) => string,
): Edit[] {
  if (count.verdict !== 'differs' || count.count === null || !count.written?.sts || count.written.sts.length > 1)
    return [];
  const figure = String(count.count);
  const sentence = `Works out to ${figure}, not ${String(count.written.sts[0])}.`;
  if (!count.writtenSpan) return [{ text: line.text, written: { sts: [count.count] }, sentence, weight: 0.8 }];
  const { start, end } = count.writtenSpan;
  const stretch = line.text.slice(start, end);
  const changed = /\d/.test(stretch) ? stretch.replace(/\d+/, figure) : `(${printTotals({ sts: [count.count] })})`;
  return [{ text: replace(start, end, changed), sentence, weight: 0.8 }];
}
