import { type Token } from './tokens.ts';
import { type Word } from './words.ts';

/** Where sentences begin and end among the tokens: by full stops, by silences, and a little by words. */
export interface Sentences {
  /** For each token the index of the first token of its sentence. */
  readonly startOf: readonly number[];
  /** For each token the index after the last token of its sentence. */
  readonly endOf: readonly number[];
  /** Whether the transcript has full stops at all. */
  readonly isPunctuated: boolean;
}

/** Splits tokens into sentences. The break belongs to the sentence that it ends. */
export function sentencesOf(tokens: readonly Token[], words: readonly Word[]): Sentences {
  const startOf: number[] = [];
  const endOf: number[] = new Array<number>(tokens.length).fill(tokens.length);
  let start = 0;
  tokens.forEach((token, i) => {
    startOf.push(start);
    if (token.kind === '.' || token.kind === '|') {
      endOf.fill(i + 1, start, i + 1);
      start = i + 1;
    }
  });
  // counted by the words: before a silence the token for the break is the silence's
  const stops = words.filter((word) => word.mark === '.').length;
  return { startOf, endOf, isPunctuated: stops * 40 > tokens.length };
}
